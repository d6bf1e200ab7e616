import { measureLine } from '../geometry/measured-line'
import type { Millimetres } from '../units'
import type { Path, PathStep } from './display-list'
import { flatten, polyline } from './paths'

/** Fewest dashes a dashed line may be cut into: with one it would look certain. */
const FEWEST_DASHES = 2

/** A path cut into its dashes. Each part of it starts and ends in a whole dash: the pattern is stretched or shrunk a little
 *  to fit, never cut. A part too short for two dashes of half their size is drawn whole.
 *  @param pattern lengths drawn and left out in turn, an even number of them */
export function cutDashes(path: Path, pattern: readonly Millimetres[]): Path {
  const period = pattern.reduce((sum, piece) => sum + piece, 0)
  const first = pattern[0] ?? 0
  if (pattern.length === 0 || pattern.length % 2 === 1 || period <= 0) {
    throw new RangeError('A dash pattern needs pairs of a drawn and a left out length.')
  }
  return flatten(path).flatMap((part): PathStep[] => {
    const line = measureLine(part)
    const repeats = Math.max(FEWEST_DASHES - 1, Math.round((line.length - first) / period))
    const fit = line.length / (repeats * period + first)
    if (fit < 0.5) return polyline(part)
    return dashStarts(pattern, repeats, fit).flatMap(([from, to]) =>
      polyline(line.slice(from, Math.min(to, line.length))),
    )
  })
}

/** From where to where each dash runs, the last one closing the line. */
function dashStarts(pattern: readonly Millimetres[], repeats: number, fit: number): [number, number][] {
  const dashes: [number, number][] = []
  let at = 0
  for (let repeat = 0; repeat < repeats; repeat++) {
    for (let index = 0; index < pattern.length; index += 2) {
      const drawn = (pattern[index] ?? 0) * fit
      dashes.push([at, at + drawn])
      at += drawn + (pattern[index + 1] ?? 0) * fit
    }
  }
  dashes.push([at, at + (pattern[0] ?? 0) * fit])
  return dashes
}
