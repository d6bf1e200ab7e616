import type { ItemOf } from '@shared/items/item'
import { doublyPlunging, type DoublyPlunging } from '@shared/items/lines'
import { plungeAgainstTrace, traceTrends } from '@shared/structure/axial-trace'
import { azimuthFigure } from '@shared/structure/compass'
import { drawItem } from '@shared/symbols/draw-item'
import type { DisplayList } from '@shared/symbols/display-list'
import { drawMark, lineMarks } from '@shared/symbols/line-marks'
import { boundsOf } from '@shared/symbols/place-marks'
import type { Box } from '@shared/sheet-face/page-layout'
import { normalizeAzimuth, type Azimuth, type Degrees, type XY } from '@shared/units'
import type { SampleOption } from '@/components/common/location-samples'

type AxialTrace = ItemOf<'axial-trace'>
type ConvergenceAt = (xy: XY) => Degrees

/** A number as typed, or why it is none. */
export type Typed = { outcome: 'number'; value: Degrees } | { outcome: 'refused'; reason: string }

/** A plunge or dip as typed: degrees below horizontal, 0–90.
 *  @param what it is, to begin a sentence: `A plunge` */
export function parseInclination(text: string, what: string): Typed {
  const value = parseDegrees(text)
  return value !== undefined && value >= 0 && value <= 90
    ? { outcome: 'number', value }
    : { outcome: 'refused', reason: `${what} is measured down from the horizontal: 0 to 90 degrees.` }
}

/** A trend as typed: azimuth from true north, 0–360, that runs along the trace toward one of its ends. */
export function parseTrend(text: string, line: readonly XY[], convergenceAt: ConvergenceAt): Typed {
  const value = parseDegrees(text)
  if (value === undefined || value < 0 || value > 360) {
    return { outcome: 'refused', reason: 'A trend is an azimuth from true north: 0 to 360 degrees.' }
  }
  const check = plungeAgainstTrace(line, normalizeAzimuth(value), convergenceAt)
  return check.outcome === 'across'
    ? { outcome: 'refused', reason: check.reason }
    : { outcome: 'number', value: normalizeAzimuth(value) }
}

function parseDegrees(text: string): Degrees | undefined {
  const match = /^(\d{1,3}(?:[.,]\d+)?)\s*°?$/.exec(text.trim())
  return match?.[1] === undefined ? undefined : Number(match[1].replace(',', '.'))
}

const DOUBLY_MARKS: Record<DoublyPlunging, string> = {
  no: 'mark.plunge',
  outward: 'mark.plunge-outward',
  inward: 'mark.plunge-inward',
}
const DOUBLY_TITLES: Record<DoublyPlunging, string> = {
  no: 'Plunging one way, or not stated',
  outward: 'Plunging both ways from a culmination',
  inward: 'Plunging both ways into a depression',
}
const SAMPLE = { width: 15, height: 6 }

/** The ways an axis may go down along its trace, as drawn samples. */
export const doublyOptions: readonly SampleOption<DoublyPlunging>[] = doublyPlunging.map((value) => {
  const mark = lineMarks.find(({ id }) => id === DOUBLY_MARKS[value])
  const list = mark ? drawMark(mark, SAMPLE).filter(({ mark: kind }) => kind !== 'text') : []
  return { value, title: DOUBLY_TITLES[value], list, box: { x: 0, y: 0, ...SAMPLE } }
})

/** One of the two ways an axis may plunge along its trace. */
export interface TrendProposal {
  value: 'start' | 'end'
  trend: Azimuth
  title: string
  text: string
  list: DisplayList
  box: Box
}

/** Room for the small picture of a trace, millimetres. */
const PICTURE = { width: 15, height: 9 }

/** Both ways an axis may plunge, each with its azimuth in whole degrees and the trace drawn small with its arrow there. */
export function trendProposals(
  item: AxialTrace,
  plunge: Degrees,
  convergenceAt: ConvergenceAt,
): TrendProposal[] {
  const line = item.geometry.coordinates
  const { atStart, atEnd } = traceTrends(line, convergenceAt)
  return [['start', atStart] as const, ['end', atEnd] as const].map(([value, azimuth]) => {
    const trend = normalizeAzimuth(Math.round(azimuth))
    const text = `${azimuthFigure(trend)}°`
    const list = picture(item, plunge, trend, convergenceAt)
    return { value, trend, title: `Plunging toward ${text}`, text, list, box: pictureBox(list) }
  })
}

/** Shown larger than life, a plunge of a horizontal axis has no arrow; any plunge shows where it would point. */
function picture(
  item: AxialTrace,
  plunge: Degrees,
  trend: Azimuth,
  convergenceAt: ConvergenceAt,
): DisplayList {
  const line = item.geometry.coordinates
  const east = line.map((point) => point[0])
  const north = line.map((point) => point[1])
  const origin: XY = [Math.min(...east), Math.min(...north)]
  const [width, height] = [Math.max(...east) - origin[0], Math.max(...north) - origin[1]]
  const mmPerMetre = Math.min(PICTURE.width / Math.max(width, 1), PICTURE.height / Math.max(height, 1))
  const properties = {
    ...item.properties,
    locationConfidence: 'certain',
    identity: 'certain',
    plunge: Math.max(1, plunge),
    trend,
    doubly: 'no',
    otherPlunge: null,
  } as const
  return drawItem({ ...item, properties }, { origin, mmPerMetre, convergenceAt }).filter(
    (mark) => mark.mark !== 'text',
  )
}

function pictureBox(list: DisplayList): Box {
  const bounds = boundsOf(list) ?? { x: 0, y: 0, ...PICTURE }
  return { x: bounds.x - 1, y: bounds.y - 1, width: bounds.width + 2, height: bounds.height + 2 }
}
