import Flatbush from 'flatbush'
import type { Metres, XY } from '@shared/units'
import { levelLines, type Line } from './contours'
import { isClosed, lengthOf } from './cut-lines'
import type { Sampled } from './lattice'

/** A surface whose smallest patches and gaps are filled in with what surrounds them, and their outlines. */
export function settle(sampled: Sampled, shortest: Metres): { sampled: Sampled; leftOut: Line[] } {
  const leftOut = levelLines(sampled, 0).filter((line) => isClosed(line) && lengthOf(line) < shortest)
  if (leftOut.length === 0) return { sampled, leftOut }
  const rings = new RingIndex(leftOut)
  const { lattice } = sampled
  const values = sampled.values.slice()
  for (const ring of leftOut) {
    for (const [index, xy] of nodesInBox(lattice, boxOf(ring))) {
      if (isInside(ring, xy)) values[index] = -(values[index] ?? 0)
    }
  }
  return {
    leftOut,
    sampled: { lattice, values, surface: (xy) => (rings.holds(xy) ? -1 : 1) * sampled.surface(xy) },
  }
}

/** Closed lines, to be asked whether any of them holds a place. */
export class RingIndex {
  private readonly boxes: Flatbush | undefined

  constructor(private readonly rings: readonly Line[]) {
    // An index of nothing cannot be built.
    if (rings.length === 0) return
    this.boxes = new Flatbush(rings.length)
    for (const ring of rings) this.boxes.add(...boxOf(ring))
    this.boxes.finish()
  }

  holds([x, y]: XY): boolean {
    const near = this.boxes?.search(x, y, x, y) ?? []
    return near.some((index) => isInside(this.rings[index] ?? [], [x, y]))
  }
}

type Box = readonly [west: Metres, south: Metres, east: Metres, north: Metres]

/** West, south, east and north end of a line. */
export const boxOf = (ring: Line): Box => [
  Math.min(...ring.map(([x]) => x)),
  Math.min(...ring.map(([, y]) => y)),
  Math.max(...ring.map(([x]) => x)),
  Math.max(...ring.map(([, y]) => y)),
]

function nodesInBox({ extent, columns, rows, nodeAt }: Sampled['lattice'], box: Box): [number, XY][] {
  const [cellX, cellY] = [extent.width / columns, extent.height / rows]
  const found: [number, XY][] = []
  const [west, south, east, north] = box
  for (
    let row = Math.ceil((south - extent.origin[1]) / cellY);
    extent.origin[1] + row * cellY <= north;
    row++
  ) {
    for (
      let column = Math.ceil((west - extent.origin[0]) / cellX);
      extent.origin[0] + column * cellX <= east;
      column++
    ) {
      found.push([row * (columns + 1) + column, nodeAt(column, row)])
    }
  }
  return found
}

/** Whether a place lies inside a closed line. Source: the even-odd rule. */
export function isInside(ring: Line, [x, y]: XY): boolean {
  return ring.slice(1).reduce((inside, [x2, y2], index) => {
    const [x1, y1] = ring[index] ?? [x2, y2]
    const crosses = y1 > y !== y2 > y && x < x1 + ((y - y1) / (y2 - y1)) * (x2 - x1)
    return crosses ? !inside : inside
  }, false)
}
