import type { XY } from '@shared/units'
import { beyondHead, fromValley, valleys, type Valley } from './terrain'
import type { Surface } from './vectors'

/** A body of younger cover: it lies where its surface is positive. */
export interface CoverPatch {
  /** Which of the cover units it is. */
  unit: 'alluvium' | 'peat'
  surface: Surface
}

const wave = (at: number, length: number, phase = 0): number => Math.sin((2 * Math.PI * at) / length + phase)

/** Alluvium along a valley floor, wider and narrower, up to its head. */
const ribbon =
  (valley: Valley): Surface =>
  (xy) => {
    const half = 175 + 55 * wave(xy[0], 2300) + 22 * wave(xy[0], 930, 1)
    // Smooth at the middle line, so that the head is round.
    const away = Math.sqrt(fromValley(valley, xy) ** 2 + 60 ** 2)
    const narrowing = 120 * Math.log1p(Math.exp((beyondHead(valley, xy) + 100) / 120))
    return half - away - narrowing
  }

/** A blanket of peat: an ellipse with an uneven edge. */
const blanket =
  (middle: XY, [long, short]: XY, turn: number, phase: number): Surface =>
  ([x, y]) => {
    const [dx, dy] = [x - middle[0], y - middle[1]]
    const u = (dx * Math.sin(turn) + dy * Math.cos(turn)) / long
    const v = (dx * Math.cos(turn) - dy * Math.sin(turn)) / short
    const around = Math.atan2(v, u)
    const edge = 1 + 0.13 * Math.sin(2 * around + phase) + 0.09 * Math.sin(3 * around - phase)
    return edge - Math.hypot(u, v)
  }

/** All cover of the demo sheet. Patches do not touch one another. */
export const coverPatches: readonly CoverPatch[] = [
  ...valleys.map((valley): CoverPatch => ({ unit: 'alluvium', surface: ribbon(valley) })),
  { unit: 'peat', surface: blanket([1500, 6250], [830, 430], 0.35, 0.6) },
  { unit: 'peat', surface: blanket([4550, 5350], [640, 380], 0.75, 2.2) },
  { unit: 'peat', surface: blanket([8900, 5450], [700, 420], 0.2, 4) },
  { unit: 'peat', surface: blanket([5300, 10250], [560, 340], 0.6, 1.4) },
  { unit: 'peat', surface: blanket([3350, 700], [520, 330], 0.5, 3) },
]
