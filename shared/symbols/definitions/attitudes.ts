import type { Millimetres, MM } from '../../units'
import type { AttitudeSymbol } from '../definition'
import type { Mark, Path } from '../display-list'
import { circle, halfCircleLeft, mapPath, polyline, turnTo } from '../paths'

const STRIKE: Millimetres = 5.6
const STROKE: Millimetres = 0.34
const TICK: Millimetres = 1.3
const CROSS: Millimetres = 2.2
const BAR: Millimetres = 1.1
const BAR_HALF: Millimetres = 0.75

const line = (path: Path): Mark => ({ mark: 'stroke', path, width: STROKE, ink: 'black' })
const outline = (path: Path): Mark => ({ mark: 'stroke', path, width: 0.28, ink: 'black' })
const solid = (path: Path): Mark => ({ mark: 'fill', path, ink: 'black' })

const strikeLine = line(
  polyline([
    [0, -STRIKE / 2],
    [0, STRIKE / 2],
  ]),
)
const cross = line([
  ...polyline([
    [-CROSS, 0],
    [CROSS, 0],
  ]),
  ...polyline([
    [0, -CROSS],
    [0, CROSS],
  ]),
])

/** A head that stands on the strike line, on the down-dip side (+1) or the other (−1). */
type Head = (side: 1 | -1) => Mark

const bothSides = (head: Head): Mark[] => [head(1), head(-1)]

const tick: Head = (side) =>
  line(
    polyline([
      [0, 0],
      [side * TICK, 0],
    ]),
  )

const triangle = (side: 1 | -1, half: Millimetres, height: Millimetres): Path =>
  polyline(
    [
      [0, half],
      [side * height, 0],
      [0, -half],
    ],
    true,
  )
const solidTriangle: Head = (side) => solid(triangle(side, 0.95, 1.35))
const openTriangle: Head = (side) => outline(triangle(side, 0.9, 1.3))
/** A tick with a bar across its end. */
const bar: Head = (side) =>
  line([
    ...polyline([
      [0, 0],
      [side * BAR, 0],
    ]),
    ...polyline([
      [side * BAR, BAR_HALF],
      [side * BAR, -BAR_HALF],
    ]),
  ])

const HOOK: Millimetres = 0.72

/** Leaves the strike line on the up-dip side, curls round and crosses to the down-dip side as the tick of a bed that was
 *  turned over. */
const hook = line([
  ['move', 0, HOOK],
  ['line', -0.35, HOOK],
  ...halfCircleLeft([-0.35, 0], HOOK),
  ['line', TICK, -HOOK],
])

const crossBars = line(
  [0, 90, 180, 270].flatMap((azimuth) =>
    mapPath(
      polyline([
        [-BAR_HALF, CROSS],
        [BAR_HALF, CROSS],
      ]),
      turnTo(azimuth, [0, 0]),
    ),
  ),
)
const diamond = (half: Millimetres): MM[] => [
  [0, -half],
  [half, 0],
  [0, half],
  [-half, 0],
]

/** Plane symbols: a long strike line with its mark down dip. Kinds of plane differ by the mark alone. */
export const attitudes: readonly AttitudeSymbol[] = [
  {
    type: 'bedding',
    title: 'Bedding',
    cases: {
      inclined: [strikeLine, tick(1)],
      horizontal: [cross, outline(circle([0, 0], 1.25))],
      vertical: [strikeLine, ...bothSides(tick)],
      overturned: [strikeLine, hook],
    },
  },
  {
    type: 'foliation',
    title: 'Foliation',
    cases: {
      inclined: [strikeLine, solidTriangle(1)],
      horizontal: [cross, solid(polyline(diamond(1.1), true))],
      vertical: [strikeLine, ...bothSides(solidTriangle)],
    },
  },
  {
    type: 'cleavage',
    title: 'Cleavage',
    cases: {
      inclined: [strikeLine, openTriangle(1)],
      horizontal: [cross, outline(polyline(diamond(1.25), true))],
      vertical: [strikeLine, ...bothSides(openTriangle)],
    },
  },
  {
    type: 'joint',
    title: 'Joint',
    cases: {
      inclined: [strikeLine, bar(1)],
      horizontal: [cross, crossBars],
      vertical: [strikeLine, ...bothSides(bar)],
    },
  },
]

/** The dip's figure: upright, beyond the mark, on the down-dip side. */
export const dipNumeral = { size: 2.3, weight: 700, gap: 0.45 } as const
