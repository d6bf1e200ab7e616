import { angleBetween, normalizeAzimuth, type Azimuth, type Degrees } from '../units'
import { normalizeAttitudeText } from './attitude-spelling'
import { parseAzimuth } from './azimuth-text'
import { angleToLine, compassAzimuth, quadrantFigure } from './compass'
import { formatLine, lineAtRake, type Line } from './line-on-plane'
import type { Plane } from './plane'

/** What a text says of a line: the line itself, a rake that needs its plane, or why neither, as a sentence. */
export type LineationReading =
  | ({ outcome: 'line' } & Line)
  | { outcome: 'rake'; rake: Degrees; from: Azimuth | null }
  | { outcome: 'refused'; reason: string }

type Refused = Extract<LineationReading, { outcome: 'refused' }>
const refused = (reason: string): Refused => ({ outcome: 'refused', reason })

const NUMBER = '(-?\\d+(?:\\.\\d+)?)'
/** A trend in letters: a quadrant or a compass point. */
const LETTERED = '[NS]\\s*\\d+(?:\\.\\d+)?\\s*[EW]|[NESW]{1,3}'
const AZIMUTH = `(-?\\d+(?:\\.\\d+)?|${LETTERED})`
const SEPARATOR = '(?:\\s*[/\\\\,;:|]\\s*|\\s+-\\s+|-|\\s+)'

const trendFirst = new RegExp(`^${AZIMUTH}${SEPARATOR}${NUMBER}$`)
const plungeFirst = new RegExp(`^${NUMBER}\\s*(?:→|->|=>|>|AT)\\s*${AZIMUTH}$`)
/** With a trend in letters there is no doubt which figure is the plunge. */
const plungeThenLetters = new RegExp(`^${NUMBER}\\s+(${LETTERED})$`)
const rakeForm = new RegExp(`^(?:RAKE|PITCH)\\s*${NUMBER}\\s*([NESW]{1,3})?$`)
const rakeLast = new RegExp(`^${NUMBER}\\s*([NESW]{1,3})?\\s*(?:RAKE|PITCH)$`)
const oneNumber = new RegExp(`^${NUMBER}$`)

const EXAMPLE = '120/35 (trend and plunge), 35→120, or rake 40'

/** Reads a line as it stands in a notebook: `120/35` as trend and plunge, `35→120` or `35 toward 120` as plunge and trend,
 *  `S60E 35`, `120 horizontal`, `vertical`, and `rake 40` or `pitch 40 NE` for a line on a plane.
 *  Trends come back against the north they were read against. Refused: what does not read, plunges outside 0–90, trends
 *  outside 0–360, rakes outside 0–180. Source: orientation.md section 1. */
export function parseLineation(text: string): LineationReading {
  const body = bodyOf(text)
  if (body === '') return refused(`Write a line, for example ${EXAMPLE}.`)
  const single = oneNumber.exec(body)
  if (single) return readSingle(Number(single[1]))
  const rake = rakeForm.exec(body) ?? rakeLast.exec(body)
  if (rake) return readRake(Number(rake[1]), rake[2])
  const arrow = plungeFirst.exec(body) ?? plungeThenLetters.exec(body)
  if (arrow) return readLine(arrow[2] ?? '', Number(arrow[1]))
  const pair = trendFirst.exec(body)
  if (pair) return readLine(pair[1] ?? '', Number(pair[2]))
  const shown = text.trim().length > 40 ? `${text.trim().slice(0, 40)}…` : text.trim()
  return refused(`“${shown}” does not read as a line. Write it like ${EXAMPLE}.`)
}

/** One spelling: `toward` and its like become an arrow before the shared spelling takes words away. */
const bodyOf = (text: string): string =>
  normalizeAttitudeText(
    text.replace(/\b(plunges|plunging|plunge|trends|trending|trend)\b/gi, ' ').replace(/\btowards?\b/gi, '→'),
  ).body

function readSingle(value: Degrees): LineationReading {
  if (value === 90) return { outcome: 'line', trend: null, plunge: 90 }
  if (value === 0) return refused('A horizontal line needs a trend too, for example 120/00.')
  return refused(`${value} alone is not a line. Write it like ${EXAMPLE}.`)
}

function readLine(trendText: string, plunge: Degrees): LineationReading {
  const trend = readTrend(trendText)
  if (typeof trend !== 'number') return trend
  return lineFromFields({ trend, plunge })
}

function readTrend(text: string): Azimuth | Refused {
  if (/^-?\d/.test(text)) return Number(text)
  const parsed = parseAzimuth(text)
  return parsed.outcome === 'refused' ? parsed : parsed.azimuth
}

/** A line from separate fields, checked exactly as text is.
 *  @param fields degrees; null where none is given */
export function lineFromFields(fields: { trend: Degrees | null; plunge: Degrees | null }): LineationReading {
  const { trend, plunge } = fields
  if (plunge === null) return refused('The plunge is missing: add it after the trend.')
  if (!Number.isFinite(plunge)) return refused('The plunge is not a number.')
  if (plunge < 0) {
    const up = trend !== null && trend >= 0 && trend <= 360 && plunge >= -90
    const down = { trend: normalizeAzimuth((trend ?? 0) + 180), plunge: -plunge }
    const hint = up
      ? ` A line that rises toward ${trend} plunges the other way: write ${formatLine(down)}.`
      : ''
    return refused(
      `Plunge ${plunge} is less than 0: a plunge is measured down from the horizontal, 0 to 90.${hint}`,
    )
  }
  if (plunge > 90) return refused(tooSteep(trend, plunge))
  if (plunge === 90) return { outcome: 'line', trend: null, plunge: 90 }
  if (trend === null) return refused(`A line that plunges ${plunge} needs a trend as well.`)
  if (!Number.isFinite(trend)) return refused('The trend is not a number.')
  if (trend < 0 || trend > 360) {
    return refused(
      `Trend ${trend} is ${trend < 0 ? 'less than 0' : 'more than 360'}: azimuths run from 0 to 360.`,
    )
  }
  return { outcome: 'line', trend: normalizeAzimuth(trend), plunge }
}

function tooSteep(trend: Degrees | null, plunge: Degrees): string {
  const isSwapped = trend !== null && trend >= 0 && trend <= 90 && plunge <= 360
  const hint = isSwapped
    ? ` Perhaps the two numbers are swapped: the trend comes first, ${formatLine({ trend: plunge, plunge: trend })}.`
    : ''
  return `Plunge ${plunge} is more than 90: plunges run from 0 to 90.${hint}`
}

function readRake(rake: Degrees, letters: string | undefined): LineationReading {
  if (letters === undefined) {
    if (rake >= 0 && rake <= 180) return { outcome: 'rake', rake, from: null }
    return refused(
      `Rake ${rake} does not read: a rake runs from 0 to 180, from the strike by the right-hand rule.`,
    )
  }
  const from = compassAzimuth(letters)
  if (from === undefined) return refused(`“${letters}” is not a compass direction.`)
  if (rake >= 0 && rake <= 90) return { outcome: 'rake', rake, from }
  return refused(
    `Rake ${rake} from ${letters} does not read: from an end of the strike it runs from 0 to 90.`,
  )
}

/** Nearest to the dip direction that the letter of a rake may lie and still say which end of the strike is meant. */
const LETTER_OFF_DIP: Degrees = 30

/** The line that a reading says: a rake is resolved on its plane, refused without one. */
export function lineOf(
  reading: LineationReading,
  plane: Plane | null,
): Extract<LineationReading, { outcome: 'line' | 'refused' }> {
  if (reading.outcome !== 'rake') return reading
  if (!plane) return refused('A rake needs the plane that it was measured on: give its reading too.')
  if (plane.strike === null)
    return refused('A rake needs a plane that dips: on a horizontal one give the trend.')
  if (reading.from === null) return { outcome: 'line', ...lineAtRake(plane, reading.rake) }
  const offStrike = angleToLine(reading.from, plane.strike)
  if (offStrike > 90 - LETTER_OFF_DIP) {
    return refused(
      `The letter of the rake lies across the strike ${quadrantFigure(plane.strike)}: name the end it is measured from.`,
    )
  }
  const isStrikeEnd = angleBetween(reading.from, plane.strike) < 90
  return { outcome: 'line', ...lineAtRake(plane, isStrikeEnd ? reading.rake : 180 - reading.rake) }
}
