/** One line of the bench's table: what we do against what it is held against, both measured in one run. */
export interface BenchRow {
  what: string
  /** What ours is held against. */
  reference: string
  oursMs: Spread
  referenceMs: Spread
  /** Median of ours over median of the reference. */
  ratio: number
  target: number
}

/** Milliseconds of several rounds. */
export interface Spread {
  least: number
  median: number
  most: number
}

/** Times two kinds of work in turn, A B A B …, so that both see the machine in the same moods; the first round warms up
 *  and is not counted. */
export async function inTurn(
  rounds: number,
  ours: () => Promise<unknown>,
  reference: () => Promise<unknown>,
): Promise<{ oursMs: Spread; referenceMs: Spread; ratio: number }> {
  const times: { ours: number[]; reference: number[] } = { ours: [], reference: [] }
  for (let round = -1; round < rounds; round++) {
    const [a, b] = [await timed(ours), await timed(reference)]
    if (round < 0) continue
    times.ours.push(a)
    times.reference.push(b)
  }
  const [oursMs, referenceMs] = [spreadOf(times.ours), spreadOf(times.reference)]
  return { oursMs, referenceMs, ratio: oursMs.median / referenceMs.median }
}

async function timed(work: () => Promise<unknown>): Promise<number> {
  const begin = performance.now()
  await work()
  return performance.now() - begin
}

/** Least, median and most of some times. */
export function spreadOf(times: readonly number[]): Spread {
  const sorted = times.toSorted((a, b) => a - b)
  const at = (index: number): number => sorted[index] ?? NaN
  return { least: at(0), median: at(sorted.length >> 1), most: at(sorted.length - 1) }
}
