import type { Intake } from '@shared/api/intake'
import type { IntakeColumn } from '@shared/intake/report'
import { groupThousands } from '@shared/sheet-face/figures'

/** A file's size for people: 812 bytes, 79 kB, 2.8 MB. */
export function fileSize(bytes: number): string {
  if (bytes < 1000) return `${bytes} bytes`
  if (bytes < 999_500) return `${Math.round(bytes / 1000)} kB`
  return `${(bytes / 1_000_000).toFixed(1)} MB`
}

/** 1 line, 2 lines, 4 478 lines. */
export const counted = (count: number, one: string, many = `${one}s`): string =>
  `${groupThousands(count)} ${count === 1 ? one : many}`

/** What has become of a file that was brought. */
export function fateOf(intake: Intake): string {
  if (intake.state === 'taken-in') return `taken in at revision ${intake.revision ?? ''}`
  return intake.state === 'discarded' ? 'put aside' : 'waiting to be taken in'
}

/** An extent in degrees with the letters of its sides: 29.8766° W to 29.2381° W, 47.6265° N to 47.7188° N. */
export function extentWords([west, south, east, north]: NonNullable<Intake['extent']>): string {
  const longitude = (degrees: number) => lettered(degrees, 'E', 'W')
  const latitude = (degrees: number) => lettered(degrees, 'N', 'S')
  return `${span(longitude(west), longitude(east))}, ${span(latitude(south), latitude(north))}`
}

const span = (from: string, to: string): string => (from === to ? from : `${from} to ${to}`)

function lettered(degrees: number, positive: string, negative: string): string {
  const text = Math.abs(degrees).toFixed(4)
  // Zero has no side.
  if (Number(text) === 0) return '0°'
  return `${text}°\u00a0${degrees < 0 ? negative : positive}`
}

const MAX_SAMPLES = 5

/** Different values of a column in records of one form, most frequent first; any of its samples where there are too many
 *  to be listed. */
export function samplesOf({ values, samples }: IntakeColumn, form: 'points' | 'lines'): string[] {
  if (values.length === 0) return samples
  return values
    .filter((entry) => entry.value !== '' && entry[form] > 0)
    .map(({ value }) => value)
    .slice(0, MAX_SAMPLES)
}
