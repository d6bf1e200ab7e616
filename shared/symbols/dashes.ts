import { measureLine } from '../geometry/measured-line'
import type { Millimetres } from '../units'
import type { Path, PathStep } from './display-list'
import { flatten, polyline } from './paths'

/** Fewest dashes a dashed line may be cut into: with one it would look certain. */
const FEWEST_DASHES = 2

/** Least share of its length that what gives way keeps: below, the pattern would look like another one. */
const LEAST_SHARE = 0.5

/** A path cut into its dashes. Each part of it starts and ends in a whole dash: to fit, the dashes are made a little longer or
 *  shorter and the gaps kept, or, of a pattern that is mostly gaps as dots are, the other way round; nothing is cut. A part
 *  too short for two dashes of half their size is drawn whole.
 *  @param pattern lengths drawn and left out in turn, an even number of them */
export function cutDashes(path: Path, pattern: readonly Millimetres[]): Path {
  const drawn = sumOf(pattern.filter((_, index) => index % 2 === 0))
  const left = sumOf(pattern.filter((_, index) => index % 2 === 1))
  const first = pattern[0] ?? 0
  if (pattern.length === 0 || pattern.length % 2 === 1 || drawn + left <= 0) {
    throw new RangeError('A dash pattern needs pairs of a drawn and a left out length.')
  }
  return flatten(path).flatMap((part): PathStep[] => {
    const line = measureLine(part)
    const repeats = Math.max(FEWEST_DASHES - 1, Math.round((line.length - first) / (drawn + left)))
    const allDrawn = repeats * drawn + first
    const allLeft = repeats * left
    const fit =
      drawn >= left
        ? { drawn: (line.length - allLeft) / allDrawn, left: 1 }
        : { drawn: 1, left: (line.length - allDrawn) / allLeft }
    if (Math.min(fit.drawn, fit.left) < LEAST_SHARE) return polyline(part)
    return dashesOf(pattern, repeats, fit).flatMap(([from, to]) =>
      polyline(line.slice(from, Math.min(to, line.length))),
    )
  })
}

const sumOf = (lengths: readonly Millimetres[]): Millimetres =>
  lengths.reduce((sum, length) => sum + length, 0)

/** From where to where each dash runs, the last one closing the line. */
function dashesOf(
  pattern: readonly Millimetres[],
  repeats: number,
  fit: { drawn: number; left: number },
): [number, number][] {
  const dashes: [number, number][] = []
  let at = 0
  for (let repeat = 0; repeat < repeats; repeat++) {
    for (let index = 0; index < pattern.length; index += 2) {
      const drawn = (pattern[index] ?? 0) * fit.drawn
      dashes.push([at, at + drawn])
      at += drawn + (pattern[index + 1] ?? 0) * fit.left
    }
  }
  dashes.push([at, at + (pattern[0] ?? 0) * fit.drawn])
  return dashes
}
