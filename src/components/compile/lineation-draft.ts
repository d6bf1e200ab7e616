import type {
  AttitudeConvention,
  LineationProperties,
  LineationReading,
  planeTypes,
} from '@shared/items/points'
import { parseAttitude } from '@shared/structure/attitude-text'
import { formatAttitude } from '@shared/structure/attitude-words'
import { formatLine, offPlaneWarning, type Line } from '@shared/structure/line-on-plane'
import { lineOf, parseLineation } from '@shared/structure/lineation-text'
import type { Plane } from '@shared/structure/plane'
import { normalizeAzimuth, type Degrees } from '@shared/units'
import { northOf, readNorth, type NorthDraft } from './north-draft'

/** A line's reading as it is being written, with the plane that it was measured on. */
export interface LineationDraft extends NorthDraft {
  text: string
  /** Empty where the line was measured for itself. */
  planeType: (typeof planeTypes)[number] | ''
  planeText: string
}

/** What a draft says: a line against true north, with its plane and its reading, or why it says none. */
export type LineationOutcome =
  | {
      outcome: 'lineation'
      line: Line
      plane: LineationProperties['plane']
      reading: LineationReading
      /** Degrees added to come to true north. */
      turned: Degrees
      /** Why line and plane contradict each other; empty where they agree. */
      warning: string
    }
  | { outcome: 'refused'; field: 'text' | 'planeText' | 'declination'; reason: string }

/** Reads a draft. Line and plane were read against the same north.
 *  @param convention how the sheet writes attitudes   @param convergence grid convergence at the place, degrees */
export function readLineation(
  draft: LineationDraft,
  convention: AttitudeConvention,
  convergence: Degrees,
): LineationOutcome {
  const written = parseLineation(draft.text)
  if (written.outcome === 'refused') return { ...written, field: 'text' }
  const on = draft.planeType === '' ? null : parseAttitude(draft.planeText, convention)
  if (on?.outcome === 'refused') return { ...on, field: 'planeText' }
  const line = lineOf(written, on)
  if (line.outcome === 'refused') return { ...line, field: 'text' }
  const north = readNorth(draft, convergence)
  if (north.outcome === 'refused') return north
  const turn = (azimuth: Degrees | null) => (azimuth === null ? null : north.toTrue(azimuth))
  const trend = turn(line.trend)
  const plane = on && { strike: turn(on.strike), dip: on.dip, overturned: on.overturned }
  return {
    outcome: 'lineation',
    // A rake gives more decimals than anybody measured; it is kept with the reading.
    line: {
      trend: trend === null ? null : normalizeAzimuth(hundredths(trend)),
      plunge: hundredths(line.plunge),
    },
    plane: plane && { type: draft.planeType || 'foliation', ...plane },
    reading: {
      text: draft.text.trim(),
      convention: written.outcome === 'rake' ? 'rake' : 'trend-plunge',
      ...north.stated,
    },
    turned: north.turned,
    warning: (on && offPlaneWarning(line, on)) ?? '',
  }
}

const hundredths = (degrees: Degrees): Degrees => Math.round(degrees * 100) / 100

/** A lineation as a draft to go on with: its reading as it was written, and its plane written as the sheet does, against
 *  the same north.
 *  @param convergence grid convergence at the place, degrees */
export function lineationDraftOf(
  { reading, trend, plunge, plane }: LineationProperties,
  convention: AttitudeConvention,
  convergence: Degrees,
): LineationDraft {
  const north = northOf(reading)
  const read = readNorth(north, convergence)
  const turned = read.outcome === 'north' ? read.turned : 0
  return {
    text: reading?.text ?? formatLine({ trend, plunge }),
    planeType: plane?.type ?? '',
    planeText: plane ? formatAttitude(turnedBack(plane, turned), convention) : '',
    ...north,
  }
}

const turnedBack = ({ strike, dip, overturned }: Plane, turned: Degrees): Plane => ({
  strike: strike === null ? null : normalizeAzimuth(strike - turned),
  dip,
  overturned,
})

/** Trend and plunge as separate fields, from a text that reads; empty where it does not, or is a rake. */
export function lineFieldsOf(text: string): [trend: string, plunge: string] {
  const parsed = parseLineation(text)
  if (parsed.outcome !== 'line') return ['', '']
  if (parsed.trend === null) return ['', '90']
  const [trend = '', plunge = ''] = formatLine(parsed).split('/')
  return [trend, plunge]
}

/** The text that two fields stand for. */
export const lineTextOf = ([trend, plunge]: readonly [trend: string, plunge: string]): string =>
  trend.trim() === '' ? plunge.trim() : `${trend.trim()}/${plunge.trim()}`
