import { parseNumber } from '@shared/intake/numbers'
import type { RecordPart } from '@shared/intake/records'
import { parseDegrees } from '@shared/sheets/typed-figures'

/** What tables write where nothing is known. Source: common practice. */
const isNothing = (text: string): boolean => /^(|-|n\/?a|nan|null|none)$/i.test(text)

/** A point from its longitude and latitude as a table writes them: decimal, or in degrees, minutes and seconds. */
export function csvPosition(lonText: string, latText: string): RecordPart {
  if (isNothing(lonText) || isNothing(latText)) {
    return { form: 'unreadable', reason: 'No longitude and latitude are given.' }
  }
  const lon = degreesOf(lonText, 'longitude')
  const lat = degreesOf(latText, 'latitude')
  if (typeof lon === 'string') return { form: 'unreadable', reason: `“${lonText}”: ${lon}` }
  if (typeof lat === 'string') return { form: 'unreadable', reason: `“${latText}”: ${lat}` }
  return { form: 'point', position: [lon, lat] }
}

/** Degrees, or why not. A plain number is taken as it is, however large: what it means is judged with the others. */
function degreesOf(text: string, axis: 'longitude' | 'latitude'): number | string {
  const plain = parseNumber(text)
  if (plain !== undefined) return plain
  const read = parseDegrees(text, axis)
  if (read.outcome === 'figure') return read.value
  return read.outcome === 'refused' ? read.reason : `No ${axis} is given.`
}
