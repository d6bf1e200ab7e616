import { snapToGrid } from '@shared/geometry/grid'
import type { XY } from '@shared/units'

/** Spaces of every kind, as people and our own foot write them inside a number. */
const spaces = /[\s\u2009\u00a0\u202f']/g

/** A place typed as easting and northing in sheet metres: `288430 5283107`, `288 430, 5 283 107`, `E 288430 N 5283107`.
 *  @returns on the 1 mm grid, or why it cannot be read, as a sentence */
export function parsePlace(
  text: string,
): { outcome: 'place'; at: XY } | { outcome: 'refused'; reason: string } {
  const numbers = pairOf(text.trim())
  if (!numbers) {
    return {
      outcome: 'refused',
      reason: 'Type easting and northing in metres, for example 288430 5283107, or with a comma between.',
    }
  }
  return { outcome: 'place', at: snapToGrid(numbers) }
}

function pairOf(text: string): XY | undefined {
  const plain = text
    .replace(/(\d)\s*m\b/gi, '$1')
    .replace(/[EN]/gi, ' ')
    .trim()
  const halves = /[,;]/.test(plain)
    ? plain.split(/[,;]/)
    : plain.split(/ +/).length === 2
      ? plain.split(/ +/)
      : cutGroups(plain)
  const [east, north, ...more] = halves.map((half) => Number(half.replace(spaces, '')))
  if (east === undefined || north === undefined || more.length > 0) return undefined
  const written = halves.every((half) => half.trim() !== '')
  return written && Number.isFinite(east) && Number.isFinite(north) ? [east, north] : undefined
}

/** Cuts two numbers written in groups of three: a group of fewer than three figures, or the first, begins a number. */
function cutGroups(text: string): string[] {
  const groups = text.split(/\s+/)
  const second = groups.findIndex((group, index) => index > 0 && group.replace(/\..*$/, '').length < 3)
  return second > 0 ? [groups.slice(0, second).join(''), groups.slice(second).join('')] : [text]
}
