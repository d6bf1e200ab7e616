import { newSheetSchema, type Area, type NewSheet, type Page } from '../api/sheets'
import { utmSrid } from '../geometry/utm'
import { isoPages } from '../sheet-face/page-layout'
import { parseDegrees, parseMetres, parseMillimetres, parseScale, type TypedFigure } from './typed-figures'

export const sides = ['west', 'south', 'east', 'north'] as const
export type Side = (typeof sides)[number]

/** A new sheet as a person has typed it so far: texts, which may be anything. */
export interface SheetDraft {
  number: string
  title: string
  authors: string
  attitudeConvention: NewSheet['attitudeConvention']
  areaBy: Area['by']
  degrees: Record<Side, string>
  metres: Record<Side, string>
  /** EPSG code; empty takes the one proposed from the area. */
  srid: string
  scale: string
  /** `proposed`, the name of an ISO page such as `A1 landscape`, or `own`. */
  page: string
  ownPage: { width: string; height: string }
}

export type DraftField =
  Side | 'number' | 'title' | 'authors' | 'srid' | 'scale' | 'page' | 'width' | 'height'
export type DraftErrors = Partial<Record<DraftField, string>>

export const emptyDraft = (): SheetDraft => ({
  number: '',
  title: '',
  authors: '',
  attitudeConvention: 'strike-dip',
  areaBy: 'degrees',
  degrees: { west: '', south: '', east: '', north: '' },
  metres: { west: '', south: '', east: '', north: '' },
  srid: '',
  scale: '',
  page: 'proposed',
  ownPage: { width: '', height: '' },
})

/** ISO pages, lying and standing, millimetres. */
export const namedPages: readonly { name: string; width: number; height: number }[] = Object.entries(
  isoPages,
).flatMap(([name, [short, long]]) => [
  { name: `${name} landscape`, width: long, height: short },
  { name: `${name} portrait`, width: short, height: long },
])

/** What of a draft can be read, with a sentence for each field that cannot. Empty fields are named too. */
export interface ReadDraft {
  area: Area | undefined
  srid: number | undefined
  /** EPSG code of the UTM zone around the middle of an area in degrees. */
  proposedSrid: number | undefined
  scale: number | undefined
  /** The page chosen; undefined while it is the proposed one or cannot be read. */
  page: Page | undefined
  errors: DraftErrors
}

/** Reads a draft. Nothing here needs the server: what depends on the projected system is in `proposeLayout`. */
export function readDraft(draft: SheetDraft): ReadDraft {
  const errors: DraftErrors = {}
  const area = readArea(draft, errors)
  const proposedSrid =
    area?.by === 'degrees' ? utmSrid((area.west + area.east) / 2, (area.south + area.north) / 2) : undefined
  const srid = readSrid(draft.srid, proposedSrid, draft.areaBy, errors)
  const scale = take(parseScale(draft.scale), 'Write the scale, for example 1:24 000.', 'scale', errors)
  const page = readPage(draft, errors)
  for (const field of ['number', 'title', 'authors'] as const) {
    const read = newSheetSchema.shape[field].safeParse(draft[field])
    if (!read.success) errors[field] = read.error.issues[0]?.message ?? 'This cannot be read.'
  }
  if (draft.number.trim() === '') errors.number = 'A sheet needs a number, for example MI-14.'
  return { area, srid, proposedSrid, scale, page, errors }
}

/** The figure, or undefined with the reason put among the errors. */
function take(
  read: TypedFigure,
  ifEmpty: string,
  field: DraftField,
  errors: DraftErrors,
): number | undefined {
  if (read.outcome === 'figure') return read.value
  errors[field] = read.outcome === 'empty' ? ifEmpty : read.reason
  return undefined
}

function readArea(draft: SheetDraft, errors: DraftErrors): Area | undefined {
  const read = (side: Side): number | undefined => {
    const text = draft[draft.areaBy][side]
    const axis = side === 'west' || side === 'east' ? 'longitude' : 'latitude'
    const figure = draft.areaBy === 'degrees' ? parseDegrees(text, axis) : parseMetres(text)
    return take(figure, `Write the ${side}ern edge.`, side, errors)
  }
  const [west, south, east, north] = [read('west'), read('south'), read('east'), read('north')]
  if (west !== undefined && east !== undefined && west >= east) {
    errors.east = 'The eastern edge must lie east of the western one.'
  }
  if (south !== undefined && north !== undefined && south >= north) {
    errors.north = 'The northern edge must lie north of the southern one.'
  }
  if (draft.areaBy === 'degrees' && ((south ?? 0) < -80 || (north ?? 0) > 84)) {
    errors[(south ?? 0) < -80 ? 'south' : 'north'] = 'Sheets lie between 80° S and 84° N.'
  }
  if (west === undefined || south === undefined || east === undefined || north === undefined) return undefined
  if (errors.east || errors.north || errors.south) return undefined
  return { by: draft.areaBy, west, south, east, north }
}

function readSrid(
  text: string,
  proposed: number | undefined,
  areaBy: Area['by'],
  errors: DraftErrors,
): number | undefined {
  const digits = text.trim().replace(/^EPSG:?\s*/i, '')
  if (digits === '') {
    if (areaBy === 'metres') errors.srid = 'Write the EPSG code of the grid that the metres belong to.'
    return proposed
  }
  if (/^\d{4,6}$/.test(digits)) return Number(digits)
  errors.srid = 'An EPSG code is a number of four to six figures, for example 32626.'
  return undefined
}

function readPage(draft: SheetDraft, errors: DraftErrors): Page | undefined {
  if (draft.page === 'proposed') return undefined
  const named = namedPages.find(({ name }) => name === draft.page)
  if (named) return { width: named.width, height: named.height }
  const width = take(parseMillimetres(draft.ownPage.width), 'Write the width of the page.', 'width', errors)
  const height = take(
    parseMillimetres(draft.ownPage.height),
    'Write the height of the page.',
    'height',
    errors,
  )
  return width !== undefined && height !== undefined ? { width, height } : undefined
}
