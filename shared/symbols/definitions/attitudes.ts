import type { Millimetres, MM } from '../../units'
import type { AttitudeDrawings, AttitudeSymbol } from '../definition'
import type { Mark, Path, PathStep } from '../display-list'
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
/** Height of a wave's crests, and how a cubic curve follows half a wave. Source: derived; the curve's middle is at 3/4 of
 *  its handles' height. */
const CREST: Millimetres = 0.34
const HANDLE = { height: 4 / 3, along: 0.36 }

/** A line up y that waves about it, at rest in its middle, where the mark stands.
 *  @param halves half waves, an even number */
function wave(length: Millimetres, halves: number): PathStep[] {
  const half = length / halves
  return [
    ['move', 0, -length / 2],
    ...Array.from({ length: halves }, (_, index): PathStep => {
      const from = (index - halves / 2) * half
      const x = (index % 2 === 0 ? 1 : -1) * CREST * HANDLE.height
      return ['curve', x, from + HANDLE.along * half, x, from + (1 - HANDLE.along) * half, 0, from + half]
    }),
  ]
}
const waveLine = line(wave(STRIKE, 6))

const arm = polyline([
  [0, -CROSS],
  [0, CROSS],
])
const crossWith = (level: Path): Mark => line([...mapPath(level, turnTo(90, [0, 0])), ...arm])
const cross = crossWith(arm)
const waveCross = crossWith(wave(2 * CROSS, 4))

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

const BALL: Millimetres = 0.46
const ball = (at: MM): Mark => solid(circle(at, BALL))

/** The cases of a plane whose strike line and cross are given: straight ones, or waves. */
const drawings = (head: Head, strike: Mark, level: readonly Mark[]): AttitudeDrawings => ({
  inclined: [strike, head(1)],
  horizontal: level,
  vertical: [strike, ...bothSides(head)],
})

const ring = outline(circle([0, 0], 1.25))
const solidDiamond = solid(polyline(diamond(1.1), true))

/** Plane symbols: a long strike line with its mark down dip. Kinds of plane differ by the mark alone; a strike line that
 *  waves says that the plane does. */
export const attitudes: readonly AttitudeSymbol[] = [
  {
    type: 'bedding',
    title: 'Bedding',
    drivenBy: ['strike', 'dip', 'overturned', 'undulating', 'tops known'],
    cases: { ...drawings(tick, strikeLine, [cross, ring]), overturned: [strikeLine, hook] },
    undulating: { ...drawings(tick, waveLine, [waveCross, ring]), overturned: [waveLine, hook] },
    topsKnown: {
      inclined: [ball([TICK, 0])],
      horizontal: [ball([0, 0])],
      vertical: [ball([TICK, 0])],
      overturned: [ball([TICK, -HOOK])],
    },
  },
  {
    type: 'foliation',
    title: 'Foliation',
    drivenBy: ['strike', 'dip', 'undulating'],
    cases: drawings(solidTriangle, strikeLine, [cross, solidDiamond]),
    undulating: drawings(solidTriangle, waveLine, [waveCross, solidDiamond]),
  },
  {
    type: 'cleavage',
    title: 'Cleavage',
    drivenBy: ['strike', 'dip'],
    cases: drawings(openTriangle, strikeLine, [cross, outline(polyline(diamond(1.25), true))]),
  },
  {
    type: 'joint',
    title: 'Joint',
    drivenBy: ['strike', 'dip'],
    cases: drawings(bar, strikeLine, [cross, crossBars]),
  },
]

/** The dip's figure: upright, beyond the mark, on the down-dip side. */
export const dipNumeral = { size: 2.3, weight: 700, gap: 0.45 } as const
