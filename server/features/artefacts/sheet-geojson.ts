import { rewind } from '@turf/turf'
import type { Face } from '@shared/api/faces'
import type { Sheet } from '@shared/api/sheets'
import { sheetProjection } from '@shared/geometry/projection'
import type { Item } from '@shared/items/item'
import type { UnitProperties } from '@shared/items/legend'
import { CAUTION } from '@shared/sheet-face/caution'
import { unitsById } from '@shared/sheet-face/compose-face'
import { sheetFaceOf } from '@shared/sheet-face/compose-margin'
import type { EditionStatement } from '@shared/sheet-face/edition-statement'
import { describeAttitude } from '@shared/structure/attitude-words'
import { describeFault } from '@shared/structure/fault-words'
import { describeFold } from '@shared/structure/fold-words'
import { sideWords, type ConvergenceAt } from '@shared/structure/line-side'
import { describeLineation } from '@shared/structure/lineation-words'
import { legendEntryOf } from '@shared/symbols/legend-entries'
import { describePlace } from '@shared/symbols/place-words'
import type { LonLat, XY } from '@shared/units'
import { breathe } from './breathe'

/** Eight decimals of a degree are about a millimetre, as fine as the sheet's own grid. */
const DECIMALS = 1e8
/** Features written between two pauses. */
const AT_A_TIME = 500

export interface SheetData {
  sheet: Pick<Sheet, 'number' | 'title' | 'scale' | 'crs' | 'footprint'>
  items: readonly Item[]
  faces: readonly Face[]
  edition: EditionStatement
}

type UnitOf = (id: string | null) => UnitProperties | undefined

/** A sheet's data as GeoJSON (RFC 7946): WGS 84 longitude and latitude, every line and point with its properties and what
 *  it is in words, every unit area, and beside the features the sheet, the edition, the legend and the caution. */
export async function sheetGeoJson(data: SheetData): Promise<string> {
  const { toLonLat, convergenceAt } = sheetProjection(data.sheet.crs.proj4)
  const place = (xy: XY): LonLat => roundLonLat(toLonLat(xy))
  const units = unitsById(data.items)
  const unitOf: UnitOf = (id) => (id === null ? undefined : units.get(id))
  const features = [
    ...data.faces.map((face, index) => () => faceFeature(face, index, place, unitOf)),
    ...data.items
      .filter((item) => item.geometry !== null)
      .map((item) => () => itemFeature(item, { place, convergenceAt }, unitOf)),
  ]
  const written: string[] = []
  for (const [index, feature] of features.entries()) {
    written.push(JSON.stringify(feature()))
    if (index % AT_A_TIME === 0) await breathe()
  }
  const head = JSON.stringify({ type: 'FeatureCollection', ...members(data, units) }).slice(0, -1)
  return `${head},"features":[\n${written.join(',\n')}\n]}\n`
}

/** Everything beside the features (RFC 7946, section 6.1: foreign members). */
function members({ sheet, items, edition }: SheetData, units: ReadonlyMap<string, UnitProperties>): object {
  const { authors, credit } = sheetFaceOf(items)
  return {
    sheet: {
      number: sheet.number,
      title: sheet.title,
      scale: sheet.scale,
      crs: { srid: sheet.crs.srid, name: sheet.crs.name },
      footprint: sheet.footprint.map(roundLonLat),
      authors,
      credit,
    },
    edition: {
      number: edition.edition,
      revision: edition.revision,
      releasedAt: edition.released?.at ?? null,
      approvedBy: edition.released?.approvedBy ?? null,
    },
    directions:
      'Strikes, trends and azimuths are degrees clockwise from true north, strikes by the right-hand rule. The side of a fault or ' +
      'fold is left or right of its line, seen along its coordinates.',
    legend: [...units].map(([id, unit]) => ({ id, ...unit })).toSorted((a, b) => a.rank - b.rank),
    caution: CAUTION,
  }
}

function itemFeature(
  item: Item,
  { place, convergenceAt }: { place: (xy: XY) => LonLat; convergenceAt: ConvergenceAt },
  unitOf: UnitOf,
): object {
  const unit = item.kind === 'unit-label' ? unitOf(item.properties.unit) : undefined
  return {
    type: 'Feature',
    id: item.id,
    geometry: toLonLatGeometry(item, place),
    properties: {
      kind: item.kind,
      words: wordsOf(item, unit, convergenceAt),
      ...item.properties,
      ...(item.kind === 'unit-label' ? { unitLabel: unit?.label ?? null, unitName: unit?.name ?? null } : {}),
    },
  }
}

function toLonLatGeometry({ geometry }: Item, place: (xy: XY) => LonLat): object | null {
  if (geometry === null) return null
  return geometry.type === 'Point'
    ? { type: 'Point', coordinates: place(geometry.coordinates) }
    : { type: 'LineString', coordinates: geometry.coordinates.map(place) }
}

/** What an item is, as one would say it. */
function wordsOf(item: Item, unit: UnitProperties | undefined, convergenceAt: ConvergenceAt): string {
  switch (item.kind) {
    case 'attitude':
      return describeAttitude(item.properties)
    case 'lineation':
      return describeLineation(item.properties)
    case 'station':
      return describePlace(item.properties)
    case 'axial-trace': {
      const side = sideWords(item.geometry.coordinates, item.properties.side, convergenceAt)
      return describeFold(item.properties, side)
    }
    case 'fault': {
      const words = describeFault(item.properties, item.geometry.coordinates, convergenceAt)
      return `${words}, ${item.properties.locationConfidence}`
    }
    case 'unit-label':
      return unit ? `${unit.name} (${unit.label})` : 'Unit label without a unit'
    case 'unit':
    case 'sheet-face':
      return ''
    default:
      return legendEntryOf(item).title
  }
}

/** A unit area. Outer ring counter-clockwise, holes clockwise (RFC 7946, section 3.1.6). */
function faceFeature(face: Face, index: number, place: (xy: XY) => LonLat, unitOf: UnitOf): object {
  const unit = unitOf(face.unit)
  return rewind({
    type: 'Feature',
    id: `face-${index + 1}`,
    geometry: { type: 'Polygon', coordinates: face.rings.map((ring) => ring.map(place)) },
    properties: {
      kind: 'face',
      words: unit ? `${unit.name} (${unit.label})` : 'Area without a unit',
      unit: face.unit,
      unitLabel: unit?.label ?? null,
      unitName: unit?.name ?? null,
    },
  })
}

const roundLonLat = ([lon, lat]: readonly [number, number]): LonLat => [
  Math.round(lon * DECIMALS) / DECIMALS,
  Math.round(lat * DECIMALS) / DECIMALS,
]
