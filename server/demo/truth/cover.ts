import type { Metres } from '@shared/units'
import { wave } from './curves'
import type { Land } from './terrain'
import type { Surface } from './vectors'

/** What lies on the rock and hides it. The sea hides even what is known beneath. */
export type CoverKind = 'sea' | 'alluvium' | 'peat' | 'talus'

/** A kind of cover: it lies where its surface is positive, unless a cover before it in the list does. */
export interface Cover {
  kind: CoverKind
  surface: Surface
}

/** Cover of an island, the uppermost first. */
export function coverOf(land: Land): readonly Cover[] {
  return [
    { kind: 'sea', surface: (xy) => -land.ground(xy) },
    { kind: 'alluvium', surface: alluvium(land) },
    { kind: 'talus', surface: talus(land) },
    { kind: 'peat', surface: peat(land) },
  ]
}

/** Floors of the great valleys, narrower upstream to a rounded head; each valley has its own. Distances across a valley
 *  are shares of the way to its divide. */
const alluvium =
  (land: Land): Surface =>
  (xy) => {
    const along = land.alongCoast(xy)
    const head: Metres = 7600 + 2600 * wave(along, 7900, 1.4)
    const beyond = (land.inland(xy) - head) / 900
    const half = 0.12 + 0.03 * wave(xy[0] - xy[1], 2300) + 0.015 * wave(xy[0], 930, 1)
    // Smooth at the middle line, so that the head is round.
    const away = Math.hypot(land.fromValley(xy), 0.06) - 0.06
    return half - away - 0.35 * Math.log1p(Math.exp(beyond * 4))
  }

/** Blankets on broad high ground, away from the valleys and the coast. */
const peat =
  (land: Land): Surface =>
  (xy) => {
    const [x, y] = xy
    const swell = wave(x + 0.35 * y, 3900, 0.3) * wave(y - 0.25 * x, 5100, 1.9)
    const frayed =
      0.17 * wave(x, 1430) * wave(y, 1190, 1) + 0.07 * wave(x + y, 710) + 0.2 * wave(x - y, 9100, 1)
    const edge = 0.25 * Math.exp(-((land.inland(xy) / 2500) ** 2))
    return swell + frayed + 0.75 * Math.min(1, land.fromValley(xy)) - edge - 1.27
  }

/** Blocks on the sides of the great valleys, here and there. */
const talus =
  (land: Land): Surface =>
  (xy) => {
    const [x, y] = xy
    const patches = wave(x - 0.4 * y, 2700, 2) * wave(y + 0.4 * x, 2900, 0.5) + 0.2 * wave(x + y, 890)
    return land.flank(xy) + 0.55 * patches - 1.45
  }
