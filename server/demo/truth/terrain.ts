import type { Metres, XY } from '@shared/units'
import { wave } from './curves'
import type { FoldAxes } from './fold-belt'

/** What the land looks like at a place. */
export interface Land {
  /** Height above sea, metres; negative beneath the sea. */
  ground(xy: XY): Metres
  /** Distance inland from the general line of the coast, metres; negative offshore. */
  inland(xy: XY): Metres
  /** Place across the great valleys: 0 on a valley's middle line, 1 on the divide. */
  fromValley(xy: XY): number
  /** How high the side of a great valley rises at a place, about 0 to 1; highest halfway up. */
  flank(xy: XY): number
  /** Distance along the coast, by which one valley differs from another, metres. */
  alongCoast(xy: XY): Metres
}

/** Between the middle lines of two great valleys. */
const VALLEY_SPACING: Metres = 2750
/** Between the streams that follow the strike. */
const STREAM_SPACING: Metres = 1330

const GULLY_SPACING: Metres = 760

/** A valley's cross-section from |sin|: V-shaped, its floor rounded over `floor`. */
const notch = (sine: number, floor: number): number => Math.sqrt(sine * sine + floor * floor) - floor

/** An island whose great valleys cross the folds on their way to a drowned coast in the north-west, and whose streams
 *  follow the strike between them. */
export function land(axes: FoldAxes): Land {
  const inland: Land['inland'] = ([x, y]) =>
    0.75 * x - 0.66 * y + 6000 + 520 * wave(0.66 * x + 0.75 * y, 6100, 0.4) + 170 * wave(y - x, 2300, 1)
  const valleyPhase = (along: Metres, across: Metres): number =>
    Math.sin(
      (Math.PI *
        (along + 380 * wave(across, 7300, 0.9) + 170 * wave(across, 2900, 2.1) + 60 * wave(across, 1150))) /
        VALLEY_SPACING +
        0.55,
    )
  const streamPhase = (along: Metres, across: Metres): number =>
    Math.sin(
      (Math.PI * (across + 210 * wave(along, 3300, 0.3) + 80 * wave(along, 1270, 1.2))) / STREAM_SPACING +
        1.1,
    )
  // Gullies run down the sides of the great valleys, aslant to the strike.
  const gullyPhase = (along: Metres, across: Metres): number =>
    Math.sin(
      (Math.PI * (across + 0.45 * along + 120 * wave(along - across, 2100, 0.8) + 40 * wave(along, 810))) /
        GULLY_SPACING,
    )
  return {
    inland,
    fromValley: (xy) => Math.abs(valleyPhase(...axes.toOwn(xy))),
    flank(xy) {
      const sine = valleyPhase(...axes.toOwn(xy))
      return 2 * Math.abs(sine) * Math.sqrt(1 - sine * sine)
    },
    alongCoast: (xy) => axes.toOwn(xy)[0],
    ground(xy) {
      const [along, across] = axes.toOwn(xy)
      const from = inland(xy)
      const floor = 210 * Math.tanh(from / 14_000) + 42 * Math.tanh((from - 500) / 550) - 26
      const relief = 0.3 + 0.7 / (1 + Math.exp(-(from - 1200) / 1100))
      const divide = notch(valleyPhase(along, across), 0.12)
      const spur = notch(streamPhase(along, across), 0.1)
      const gully = notch(gullyPhase(along, across), 0.2)
      const swell = 60 * wave(xy[0] + 0.3 * xy[1], 5200, 0.5) * wave(xy[1] - 0.2 * xy[0], 6400, 1)
      return floor + relief * divide * (165 + swell + spur * (120 + 75 * gully))
    },
  }
}
