import fc from 'fast-check'
import type { MM } from '@shared/units'

// The same lines in every run, so that a failure can be looked at again.
fc.configureGlobal({ seed: 26, numRuns: 200 })

/** A line as a hand draws it: steps of random length, each turning at most so far from the one before, in a random direction. */
export const aWalk = ({
  steps = [2, 60],
  step = [0.3, 5],
  turn = 60,
}: {
  steps?: [number, number]
  /** Millimetres. */
  step?: [number, number]
  /** Most that it turns between two steps, degrees. */
  turn?: number
} = {}): fc.Arbitrary<MM[]> =>
  fc
    .record({
      heading: fc.double({ min: 0, max: 360, noNaN: true }),
      moves: fc.array(
        fc.tuple(
          fc.double({ min: step[0], max: step[1], noNaN: true }),
          fc.double({ min: -turn, max: turn, noNaN: true }),
        ),
        { minLength: steps[0], maxLength: steps[1] },
      ),
    })
    .map(({ heading, moves }) => {
      let [x, y, azimuth] = [0, 0, heading]
      const line: MM[] = [[x, y]]
      for (const [length, turned] of moves) {
        azimuth += turned
        x += length * Math.sin((azimuth * Math.PI) / 180)
        y += length * Math.cos((azimuth * Math.PI) / 180)
        line.push([x, y])
      }
      return line
    })

/** A line with corners far apart: legs of at least so many millimetres and turns of any sharpness. */
export const aZigzag = (leg: number): fc.Arbitrary<MM[]> =>
  aWalk({ steps: [1, 12], step: [leg, 4 * leg], turn: 150 })
