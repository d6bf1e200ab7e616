import { expect } from 'vitest'
import type { Sheet } from '@shared/api/sheets'
import { sheetProjection } from '@shared/geometry/projection'
import type { ItemOf } from '@shared/items/item'
import type { DisplayList } from '@shared/symbols/display-list'
import { drawItem } from '@shared/symbols/draw-item'
import { mmPerMetreAtScale, toMm, type DrawingFrame } from '@shared/symbols/frame'
import { angleBetween, normalizeAzimuth, toDegrees, type MM, type XY } from '@shared/units'

/** The one filled triangle along the trace points where the axis plunges, and stands at that end of the line. */
export function expectArrowDownPlunge(trace: ItemOf<'axial-trace'>, sheet: Sheet): void {
  const projection = sheetProjection(sheet.crs.proj4)
  const frame: DrawingFrame = {
    origin: [0, 0],
    mmPerMetre: mmPerMetreAtScale(sheet.scale),
    convergenceAt: projection.convergenceAt,
  }
  const [first, last] = [trace.geometry.coordinates[0], trace.geometry.coordinates.at(-1)] as [XY, XY]
  const [start, end] = [toMm(frame, first), toMm(frame, last)]
  const arrows = fillsOf(drawItem(trace, frame)).map(arrowOf)
  const largest = arrows.sort((a, b) => b.length - a.length)[0]
  if (!largest) throw new Error('The trace carries no arrowhead.')
  // Grid azimuth = true azimuth − convergence.
  const wanted = normalizeAzimuth((trace.properties.trend ?? NaN) - projection.convergenceAt(last))
  expect(angleBetween(largest.azimuth, wanted)).toBeLessThan(5)
  expect(distance(largest.tip, end)).toBeLessThan(distance(largest.tip, start))
}

const distance = (a: MM, b: MM): number => Math.hypot(a[0] - b[0], a[1] - b[1])

/** Tip, direction and length of a filled arrowhead: its tip is the corner farthest from the middle of the others. */
function arrowOf(corners: MM[]): { tip: MM; azimuth: number; length: number } {
  const middle = (points: MM[]): MM => [
    points.reduce((sum, point) => sum + point[0], 0) / points.length,
    points.reduce((sum, point) => sum + point[1], 0) / points.length,
  ]
  const measured = corners.map((tip) => {
    const tail = middle(corners.filter((corner) => corner !== tip))
    const azimuth = normalizeAzimuth(toDegrees(Math.atan2(tip[0] - tail[0], tip[1] - tail[1])))
    return { tip, azimuth, length: distance(tip, tail) }
  })
  return measured.sort((a, b) => b.length - a.length)[0] ?? { tip: [0, 0], azimuth: 0, length: 0 }
}

/** Corners of every filled path of a display list, groups included, millimetres. */
const fillsOf = (list: DisplayList): MM[][] =>
  list.flatMap((mark): MM[][] => {
    if (mark.mark === 'group') return fillsOf(mark.marks)
    if (mark.mark !== 'fill') return []
    return [
      mark.path.flatMap((step): MM[] => {
        if (step[0] === 'move' || step[0] === 'line') return [[step[1], step[2]]]
        return step[0] === 'curve' ? [[step[5], step[6]]] : []
      }),
    ]
  })
