import type { Reading } from '../items/points'
import { parseAttitude } from '../structure/attitude-text'
import { toTrueAzimuth } from '../structure/north-reference'
import { planeFromFields } from '../structure/plane-check'
import { normalizeAzimuth, type Azimuth, type Degrees } from '../units'
import type { Mapping } from './mapping'
import { parseNumber } from './numbers'
import { attributeText, type IntakeRecord } from './records'

export type ReadingOutcome =
  | {
      outcome: 'plane'
      /** By the right-hand rule, from the north that the mapping names; null for a horizontal plane. */
      strike: Degrees | null
      dip: Degrees
      overturned: boolean
      text: string
      convention: Reading['convention']
      conversions: string[]
    }
  | { outcome: 'refused'; field: string; value: string; reason: string }

/** The attitude that a record states, in one text or in two columns. Refused where a part is missing, is not a number,
 *  is beyond its range, or contradicts another. */
export function readReading(record: IntakeRecord, mapping: Mapping['points']): ReadingOutcome {
  const { readingColumn, azimuthColumn, dipColumn } = mapping
  if (readingColumn !== null) {
    const text = attributeText(record, readingColumn)
    if (text === '') return refused(readingColumn, '', 'No reading is given.')
    return readText(text, readingColumn, mapping)
  }
  if (azimuthColumn === null || dipColumn === null) {
    return refused('reading', '', 'No columns are chosen for strike (or dip direction) and dip.')
  }
  return readTwo(record, azimuthColumn, dipColumn, mapping)
}

function readText(text: string, field: string, mapping: Mapping['points']): ReadingOutcome {
  const read = parseAttitude(text, mapping.convention)
  if (read.outcome === 'refused') return refused(field, text, read.reason)
  const { strike, dip, overturned, convention } = read
  return { outcome: 'plane', strike, dip, overturned, text, convention, conversions: [] }
}

function readTwo(
  record: IntakeRecord,
  azimuthColumn: string,
  dipColumn: string,
  mapping: Mapping['points'],
): ReadingOutcome {
  const azimuthText = attributeText(record, azimuthColumn)
  const dipText = attributeText(record, dipColumn)
  const what = mapping.convention === 'strike-dip' ? 'strike' : 'dip direction'
  if (dipText === '') return refused(dipColumn, '', 'No dip is given.')
  const dip = parseNumber(dipText)
  const azimuth = parseNumber(azimuthText)
  if (azimuthText === '' && dip !== 0) return refused(azimuthColumn, '', `No ${what} is given.`)
  // A bearing written with letters (N45E), or a dip with its side (40SE): one reading in two columns.
  const lettered = /[a-z]/i.test(azimuthText) || /[a-z]/i.test(dipText)
  if (lettered) return readText(`${azimuthText} ${dipText}`, azimuthColumn, mapping)
  if (dip === undefined) return refused(dipColumn, dipText, 'The dip is not a number.')
  if (azimuth === undefined && azimuthText !== '')
    return refused(azimuthColumn, azimuthText, `The ${what} is not a number.`)
  const read = planeFromFields({ azimuth: azimuth ?? null, dip, overturned: false }, mapping.convention)
  const text = `${azimuthText}/${dipText}`
  if (read.outcome === 'refused') {
    return dip >= 0 && dip <= 90
      ? refused(azimuthColumn, azimuthText, read.reason)
      : refused(dipColumn, dipText, read.reason)
  }
  return { ...read, text, conversions: conversionOf(azimuth, read.strike, mapping) }
}

function conversionOf(
  azimuth: number | undefined,
  strike: number | null,
  mapping: Mapping['points'],
): string[] {
  if (azimuth === undefined) return []
  const direction = mapping.convention === 'dip-direction-dip'
  if (strike === null)
    return [`a horizontal plane has no ${direction ? 'dip direction' : 'strike'}: left away`]
  return direction ? [`strike = dip direction ${azimuth}° − 90°, right-hand rule`] : []
}

const refused = (field: string, value: string, reason: string): ReadingOutcome => ({
  outcome: 'refused',
  field,
  value,
  reason,
})

/** An azimuth counted from the north that the mapping names, as an azimuth from true north to a hundredth of a degree,
 *  with the step in words. `convergence` is the grid convergence at the place, asked for only where it is needed. */
export function fromStatedNorth(
  azimuth: Degrees,
  { northReference, declination }: Pick<Mapping, 'northReference' | 'declination'>,
  convergence: () => Degrees,
): { azimuth: Azimuth; conversions: string[] } {
  if (northReference === 'true') return { azimuth: normalizeAzimuth(azimuth), conversions: [] }
  const correction = {
    declination: declination ?? 0,
    convergence: northReference === 'grid' ? convergence() : 0,
  }
  const grid = northReference === 'grid'
  const turn = grid ? correction.convergence : correction.declination
  const words = `${grid ? 'grid convergence' : 'declination'} ${Math.abs(turn).toFixed(2)}° ${turn < 0 ? 'west' : 'east'}`
  return {
    azimuth: normalizeAzimuth(Math.round(toTrueAzimuth(azimuth, northReference, correction) * 100) / 100),
    conversions: [`${northReference} north to true north: ${words}`],
  }
}
