import type { SheetProjection } from '../geometry/projection'
import type { Sheet } from '../api/sheets'
import type { DisplayList, Mark } from '../symbols/display-list'
import { toMm, type DrawingFrame } from '../symbols/frame'
import { polyline } from '../symbols/paths'
import type { Millimetres, MM, XY } from '../units'
import { cornerFigures, kilometreFigure, latitudeFigure, longitudeFigure } from './figures'
import { graticuleCrossings, graticuleNodes, gridCrossings, type Crossing } from './frame-ticks'
import { graticuleInterval, gridInterval } from './intervals'
import { neatlineCorners, neatlineEdges, offsetRing, openRing, type Edge, type Side } from './neatline'
import { neatlineBounds } from './page-layout'

export { facePath } from './neatline'

/** Distance from the neatline to the outer line of the frame; grid ticks stand between the two. */
export const FRAME_GAP: Millimetres = 2.4
const FIGURE_SIZE: Millimetres = 2.5
const CORNER_SIZE: Millimetres = 2.1
/** From the neatline to the middle of the figures. */
const FIGURE_OFFSET: Millimetres = FRAME_GAP + 2.1
const CORNER_OFFSET: Millimetres = FRAME_GAP + 5.6
const GRATICULE_TICK: Millimetres = 2
const CROSS_ARM: Millimetres = 2
/** Figures of the graticule keep this far from a corner, whose own figures say more. */
const CLEAR_OF_CORNER: Millimetres = 22

const outwards: Record<Side, MM> = { top: [0, 1], bottom: [0, -1], left: [-1, 0], right: [1, 0] }

/** The frame of a map face: double neatline following the neatline polygon, grid ticks with figures in kilometres at
 *  top and left, graticule ticks with figures at bottom and right, crosses inside, latitude and longitude at the corners.
 *  @param frame where the ground lies; intervals follow its scale, sizes are millimetres of the drawing
 *  Intervals: round kilometres 24–60 mm apart; round minutes at least 90 mm apart. */
export function drawSheetFrame(
  sheet: Pick<Sheet, 'neatline'>,
  projection: SheetProjection,
  frame: DrawingFrame,
): DisplayList {
  const edges = neatlineEdges(sheet.neatline)
  const { min, max } = neatlineBounds(sheet.neatline)
  const extent = Math.max(max[0] - min[0], max[1] - min[1])
  const gridStep = gridInterval(frame.mmPerMetre, extent)
  const graticuleStep = graticuleInterval(frame.mmPerMetre, extent)
  return [
    ...graticuleNodes(sheet.neatline, projection, graticuleStep).flatMap((node) => cross(node, frame)),
    ...graticuleMarks(edges, projection, graticuleStep, frame),
    ...neatlines(sheet, frame),
    ...gridMarks(edges, gridStep, frame),
    ...cornerMarks(edges, projection, frame),
  ]
}

function neatlines(sheet: Pick<Sheet, 'neatline'>, frame: DrawingFrame): Mark[] {
  const ring = openRing(sheet.neatline).map((xy) => toMm(frame, xy))
  return [
    { mark: 'stroke', path: polyline(ring, true), width: 0.35, ink: 'frame' },
    { mark: 'stroke', path: polyline(offsetRing(ring, FRAME_GAP), true), width: 0.13, ink: 'frame' },
  ]
}

const shift = ([x, y]: MM, side: Side, distance: Millimetres): MM => [
  x + outwards[side][0] * distance,
  y + outwards[side][1] * distance,
]

const tick = (at: MM, side: Side, from: Millimetres, to: Millimetres): Mark => {
  const [start, end] = [shift(at, side, from), shift(at, side, to)]
  return { mark: 'stroke', path: polyline([start, end]), width: 0.13, ink: 'frame' }
}

/** A figure outside the frame: centred above and below, set against the frame at the sides. */
function figure(text: string, at: MM, side: Side, size: Millimetres, weight: 400 | 700): Mark {
  const upright = side === 'top' || side === 'bottom'
  return {
    mark: 'text',
    text,
    at: shift(at, side, upright ? FIGURE_OFFSET : FRAME_GAP + 1),
    size,
    weight,
    ink: 'frame',
    align: upright ? 'middle' : side === 'left' ? 'end' : 'start',
  }
}

function gridMarks(edges: readonly Edge[], step: number, frame: DrawingFrame): Mark[] {
  const crossings = gridCrossings(edges, step)
  const named = new Set(
    (['top', 'left'] as const)
      .map((side) => firstOn(crossings, side))
      .filter((crossing) => crossing !== undefined),
  )
  return crossings.flatMap((crossing) => {
    const at = toMm(frame, crossing.at)
    const marks = [tick(at, crossing.side, 0, FRAME_GAP)]
    if (crossing.side === 'bottom' || crossing.side === 'right') return marks
    const unit = named.has(crossing) ? (crossing.side === 'top' ? ' km E' : ' km N') : ''
    const text = kilometreFigure(crossing.value) + unit.replaceAll(' ', '\u00a0')
    return [...marks, figure(text, at, crossing.side, FIGURE_SIZE, 400)]
  })
}

/** The crossing with the smallest figure on a side: the one that also carries the unit. */
const firstOn = (crossings: readonly Crossing[], side: Side): Crossing | undefined =>
  crossings.filter((crossing) => crossing.side === side).toSorted((a, b) => a.value - b.value)[0]

function graticuleMarks(
  edges: readonly Edge[],
  projection: SheetProjection,
  step: number,
  frame: DrawingFrame,
): Mark[] {
  const corners = neatlineCorners(edges).map((corner) => toMm(frame, corner.at))
  return graticuleCrossings(edges, projection, step).flatMap((crossing) => {
    const at = toMm(frame, crossing.at)
    const marks = [tick(at, crossing.side, -GRATICULE_TICK, 0)]
    const crowded = corners.some(([x, y]) => Math.hypot(at[0] - x, at[1] - y) < CLEAR_OF_CORNER)
    if (crowded || crossing.side === 'top' || crossing.side === 'left') return marks
    const text =
      crossing.side === 'right' ? latitudeFigure(crossing.value, true) : longitudeFigure(crossing.value, true)
    return [...marks, figure(text, at, crossing.side, CORNER_SIZE, 400)]
  })
}

function cross(node: XY, frame: DrawingFrame): Mark[] {
  const [x, y] = toMm(frame, node)
  return [
    {
      mark: 'stroke',
      path: [
        ['move', x - CROSS_ARM, y],
        ['line', x + CROSS_ARM, y],
        ['move', x, y - CROSS_ARM],
        ['line', x, y + CROSS_ARM],
      ],
      width: 0.13,
      ink: 'frame',
    },
  ]
}

/** Latitude over longitude, above or below each corner and flush with its side. */
function cornerMarks(edges: readonly Edge[], projection: SheetProjection, frame: DrawingFrame): Mark[] {
  return neatlineCorners(edges).flatMap(({ at, sides }) => {
    const upright = sides.find((side) => side === 'top' || side === 'bottom')
    if (!upright) return []
    const lines = cornerFigures(projection.toLonLat(at))
    const align = sides.includes('left') ? ('start' as const) : ('end' as const)
    const away = upright === 'top' ? lines.toReversed() : lines
    return away.map((text, index): Mark => ({
      mark: 'text',
      text,
      at: shift(toMm(frame, at), upright, CORNER_OFFSET + index * CORNER_SIZE * 1.25),
      size: CORNER_SIZE,
      weight: 700,
      ink: 'frame',
      align,
    }))
  })
}
