import { seededRandom, type Random } from '../seeded-random'
import type { Millimetres, MM } from '../units'

/** How many places are tried for each that is taken: more give a more even spread. */
const TRIES = 240

/** Places for round things of given sizes, spread evenly, yet without order, over a cell that goes on beyond its edges.
 *  Each takes, of many places tried, the one with the widest gap to all before it, measured around the edges; so the first
 *  few are spread evenly among themselves too, and large things should come first. The same seed gives the same places.
 *  Source: D. P. Mitchell 1991, Spectrally optimal sampling for distribution ray tracing, Computer Graphics 25(4), the
 *  best-candidate method; from memory, with gaps in place of distances.
 *  @param radii one for each thing, millimetres */
export function scatter(
  radii: readonly Millimetres[],
  cell: { width: Millimetres; height: Millimetres },
  seed: number,
): { at: MM; radius: Millimetres; random: Random }[] {
  const random = seededRandom(seed)
  const placed: { at: MM; radius: Millimetres; random: Random }[] = []
  radii.forEach((radius, index) => {
    let best: { at: MM; gap: number } = { at: [0, 0], gap: -Infinity }
    for (let tried = 0; tried < TRIES; tried++) {
      const at: MM = [random() * cell.width, random() * cell.height]
      const gap = leastGap(at, radius, placed, cell, best.gap)
      if (gap > best.gap) best = { at, gap }
    }
    placed.push({ at: best.at, radius, random: seededRandom(seed * 1009 + index) })
  })
  return placed
}

/** The narrowest gap to what is placed already; any that is not above `enough` will do as an answer. */
function leastGap(
  at: MM,
  radius: Millimetres,
  placed: readonly { at: MM; radius: Millimetres }[],
  cell: { width: Millimetres; height: Millimetres },
  enough: number,
): number {
  let least = Infinity
  for (const other of placed) {
    const dx = Math.abs(at[0] - other.at[0])
    const dy = Math.abs(at[1] - other.at[1])
    const apart = Math.hypot(Math.min(dx, cell.width - dx), Math.min(dy, cell.height - dy))
    least = Math.min(least, apart - radius - other.radius)
    if (least <= enough) return least
  }
  return least
}
