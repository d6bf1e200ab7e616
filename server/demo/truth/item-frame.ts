import { snapToGrid } from '@shared/geometry/grid'
import type { Degrees, XY } from '@shared/units'
import type { Line } from './contours'
import { randomId, type Random } from './random'

/** Puts the island's places on a sheet, and hands out ids. */
export class ItemFrame {
  /** @param origin the island's origin in sheet metres   @param convergence of the grid at a place, sheet metres */
  constructor(
    private readonly origin: XY,
    private readonly convergence: (xy: XY) => Degrees,
    readonly random: Random,
  ) {}

  /** A place of the island in sheet metres, on the 1 mm grid. */
  toSheet([x, y]: XY): XY {
    return snapToGrid([this.origin[0] + x, this.origin[1] + y])
  }

  line(line: Line) {
    return { type: 'LineString' as const, coordinates: line.map((place) => this.toSheet(place)) }
  }

  point(place: XY) {
    return { type: 'Point' as const, coordinates: this.toSheet(place) }
  }

  /** Grid convergence at a place of the island, degrees. */
  convergenceAt([x, y]: XY): Degrees {
    return this.convergence([this.origin[0] + x, this.origin[1] + y])
  }

  id(): string {
    return randomId(this.random)
  }
}
