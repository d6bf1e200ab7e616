import type { Metres, XY } from '@shared/units'
import type { Surface } from './vectors'

/** A valley floor: its middle line as north over east, both from the sheet's south-west corner, and where it has a head. */
export interface Valley {
  north(east: Metres): Metres
  /** East of its head; the valley lies on the side that `side` names. */
  head: Metres
  side: 'west' | 'east'
}

const wave = (at: number, length: number, phase = 0): number => Math.sin((2 * Math.PI * at) / length + phase)

export const valleys: readonly Valley[] = [
  {
    north: (east) => 2500 + 850 * wave(east, 9000, 0.4) + 150 * wave(east, 2100),
    head: 7300,
    side: 'west',
  },
  {
    north: (east) => 8150 - 420 * wave(east, 8000, 2.4) - 130 * wave(east, 1900, 1),
    head: 3000,
    side: 'east',
  },
]

/** Distance from a valley's middle line, metres; good to a few per cent near it. */
export function fromValley({ north }: Valley, [east, northing]: XY): Metres {
  const fall = (north(east + 1) - north(east - 1)) / 2
  return (northing - north(east)) / Math.hypot(1, fall)
}

/** How far a place lies beyond a valley's head, metres; negative inside the valley. */
export const beyondHead = ({ head, side }: Valley, [east]: XY): Metres =>
  side === 'west' ? east - head : head - east

/** Ground height above sea level, metres, of a place given from the sheet's south-west corner. */
export function terrain(): Surface {
  return (xy) => {
    const [x, y] = xy
    const hills =
      54 * wave(x + 0.3 * y, 2900, 0.5) * Math.cos((2 * Math.PI * (y - 0.2 * x)) / 3700) +
      24 * wave(x + y, 1500, 1) * wave(x - 0.6 * y, 1900) +
      6 * wave(x, 690, 2) * wave(y, 810)
    const cut = valleys.reduce((sum, valley) => {
      const along = 1 / (1 + Math.exp(beyondHead(valley, xy) / 350))
      return sum + 55 * along * Math.exp(-((fromValley(valley, xy) / 420) ** 2))
    }, 0)
    return 235 + hills - cut
  }
}
