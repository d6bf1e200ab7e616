import type { Millimetres, MM } from '../../units'
import type { LineationSymbol } from '../definition'
import type { Mark, Path } from '../display-list'
import { mapPath, polyline, turnTo } from '../paths'

const STROKE: Millimetres = 0.34
/** From the place, where the arrow starts, to its tip: clear of the strike line and mark of a plane it lies on. */
const LENGTH: Millimetres = 6
/** Half of a horizontal line, which has an arrowhead at either end. */
const HALF: Millimetres = 4.2
const HEAD = { length: 1.7, halfWidth: 0.62 } as const

const line = (path: Path): Mark => ({ mark: 'stroke', path, width: STROKE, ink: 'black' })
const solid = (points: MM[]): Mark => ({ mark: 'fill', path: polyline(points, true), ink: 'black' })
const shaft = (from: Millimetres, to: Millimetres): Mark =>
  line(
    polyline([
      [0, from],
      [0, to],
    ]),
  )

/** A solid, slender head with its tip at a distance up y. */
const solidHead = (tip: Millimetres): Mark =>
  solid([
    [0, tip],
    [HEAD.halfWidth, tip - HEAD.length],
    [-HEAD.halfWidth, tip - HEAD.length],
  ])

/** An open head of two barbs. */
const openHead = (tip: Millimetres): Mark => ({
  mark: 'stroke',
  path: polyline([
    [-0.8, tip - 1.3],
    [0, tip],
    [0.8, tip - 1.3],
  ]),
  width: STROKE,
  ink: 'black',
  cap: 'round',
})

/** Where the crown of a minor fold's arch stands on a plunging axis: beyond the mark of a plane. */
const ARCH: Millimetres = 3.7

/** A small fold across the shaft: an arch whose crown points up y. */
const arch = (crown: Millimetres): Mark =>
  line([
    ['move', -1.15, crown - 1.1],
    ['curve', -0.95, crown + 0.3, 0.95, crown + 0.3, 1.15, crown - 1.1],
  ])

const turned = (mark: Mark): Mark =>
  mark.mark === 'stroke' || mark.mark === 'fill'
    ? { ...mark, path: mapPath(mark.path, turnTo(180, [0, 0])) }
    : mark

const diamond = (half: Millimetres): MM[] => [
  [0, -half],
  [half, 0],
  [0, half],
  [-half, 0],
]

/** Symbols of lines: an arrow along the trend, from the place down the plunge. A horizontal line has a head at either end,
 *  a vertical one is seen along itself. A minor fold axis has open heads and carries a small fold. */
export const lineations: readonly LineationSymbol[] = [
  {
    type: 'lineation',
    title: 'Lineation',
    drivenBy: ['trend', 'plunge', 'plane'],
    cases: {
      plunging: [shaft(0, LENGTH - HEAD.length + 0.1), solidHead(LENGTH)],
      horizontal: [
        shaft(HEAD.length - HALF - 0.1, HALF - HEAD.length + 0.1),
        solidHead(HALF),
        turned(solidHead(HALF)),
      ],
      vertical: [solid(diamond(1.05))],
    },
  },
  {
    type: 'minor-fold-axis',
    title: 'Minor fold axis',
    drivenBy: ['trend', 'plunge', 'plane'],
    cases: {
      plunging: [shaft(0, LENGTH), openHead(LENGTH), arch(ARCH)],
      horizontal: [shaft(-HALF, HALF), openHead(HALF), turned(openHead(HALF)), arch(2.1), turned(arch(2.1))],
      vertical: [solid(diamond(0.85)), arch(2), turned(arch(2))],
    },
  },
]

/** The two ends of a line's arrow, in its symbol's frame: a plunging one's tip, beyond which its figure stands, is the
 *  second. */
export const arrowEnds: Record<'plunging' | 'horizontal', readonly [MM, MM]> = {
  plunging: [
    [0, 0],
    [0, LENGTH],
  ],
  horizontal: [
    [0, -HALF],
    [0, HALF],
  ],
}

/** The plunge's figure: upright, beyond the arrow's head. */
export const plungeNumeral = { size: 2.3, weight: 700, gap: 0.45 } as const
