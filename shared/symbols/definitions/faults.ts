import type { Millimetres, MM } from '../../units'
import {
  confidenceStrokes,
  type Beneath,
  type Decoration,
  type LineSymbol,
  type Published,
  type SideSign,
} from '../definition'
import type { FaultType } from '../../items/lines'
import type { Mark } from '../display-list'
import { circle, polyline } from '../paths'

/** Faults are visibly heavier than contacts (symbolization.md section 3). */
const WIDTH: Millimetres = 0.6
const opposite = (side: SideSign): SideSign => (side === 1 ? -1 : 1)
const fgdc = (number: string): Published => ({ standard: 'FGDC-STD-013-2006', number })

const fault = {
  kind: 'fault',
  ink: 'black',
  strokes: confidenceStrokes({
    width: WIDTH,
    long: [4.2, 1.2],
    short: [1.9, 1.1],
    dot: { size: 0.62, apart: 1.4 },
  }),
} as const

const BALL: Millimetres = 0.6
const BAR: Millimetres = 2

/** Ball on a bar, on the downthrown side. */
const ballAndBar: Decoration = {
  size: 2 * BALL,
  placed: { every: 28 },
  bearingOver: 4,
  marks: ({ side }) => [
    {
      mark: 'stroke',
      path: polyline([
        [0, 0],
        [0, side * BAR],
      ]),
      width: 0.34,
      ink: 'black',
    },
    { mark: 'fill', path: circle([0, side * (BAR + BALL * 0.8)], BALL), ink: 'black' },
  ],
}

/** The ball and bar of a fault whose downthrown side changes along it: one near each end, on opposite sides. What happens
 *  between them is not stated, so nothing is drawn there. */
const ballsAtEnds: Decoration = {
  ...ballAndBar,
  placed: { fromEnds: 6 },
  marks: ({ side }, beneath) =>
    ballAndBar.marks({ side: beneath.end === 'start' ? side : opposite(side) }, beneath),
}

const TOOTH: Millimetres = 2.3
const TOOTH_HEIGHT: Millimetres = 1.9

/** A triangle whose foot lies on the line in several pieces, so that it bends where the line does. */
const tooth = (side: SideSign, base: Millimetres, height: Millimetres, foot: Millimetres) =>
  polyline(
    [
      [0, side * (foot + height)],
      ...[0.5, 0.3, 0.1, -0.1, -0.3, -0.5].map((share): MM => [share * base, side * foot]),
    ],
    true,
  )

/** Solid teeth on the upper plate, pointing down the dip of the thrust. */
const solidTeeth: Decoration = {
  size: TOOTH,
  placed: { every: 9 },
  bearingOver: TOOTH,
  follows: true,
  marks: ({ side }) => [{ mark: 'fill', path: tooth(side, TOOTH, TOOTH_HEIGHT, WIDTH / 4), ink: 'black' }],
}

/** Open teeth on the hanging wall, wider apart than those of a thrust. */
const openTeeth: Decoration = {
  size: TOOTH,
  placed: { every: 14 },
  bearingOver: TOOTH,
  follows: true,
  marks: ({ side }) => [
    {
      mark: 'stroke',
      path: tooth(side, TOOTH - 0.3, TOOTH_HEIGHT - 0.1, WIDTH / 4),
      width: 0.3,
      ink: 'black',
    },
  ],
}

const ARROW: Millimetres = 6.4
const ARROW_OFFSET: Millimetres = 1.35
const BARB: Millimetres = 2

/** One half arrow beside the line, clear of it however it bows.
 *  @param side +1 left of the line   @param along +1 pointing along it, −1 back */
function halfArrow(side: SideSign, along: 1 | -1, { bow }: Beneath): Mark[] {
  const y = side * (ARROW_OFFSET + (side === 1 ? bow.left : bow.right))
  const tip = (along * ARROW) / 2
  return [
    {
      mark: 'stroke',
      path: polyline([
        [-tip, y],
        [tip - along * 0.4, y],
      ]),
      width: 0.32,
      ink: 'black',
    },
    {
      mark: 'fill',
      path: polyline(
        [
          [tip, y - side * 0.16],
          [tip - along * BARB, y + side * 1],
          [tip - along * BARB * 0.8, y - side * 0.16],
        ],
        true,
      ),
      ink: 'black',
    },
  ]
}

/** A half arrow on each side: of the two sides, the far one has moved the way its arrow points, whichever side one
 *  stands on; so the pair is the same when the line is reversed. @param left way of the left side's arrow */
const halfArrows = (left: 1 | -1): Decoration => ({
  size: ARROW,
  placed: { every: 60 },
  bearingOver: ARROW,
  marks: (_, beneath) => [...halfArrow(1, left, beneath), ...halfArrow(-1, opposite(left), beneath)],
})

/** The arrow of a fault's dip: a thin shaft square to the line and a small solid head, on the side to which the plane dips. */
export const faultDip = {
  size: 2,
  bearingOver: 5,
  numeral: { size: 2.3, weight: 700, gap: 0.45 },
} as const

const DIP_REACH: Millimetres = 4.2
const DIP_HEAD: Millimetres = 1.5
const DIP_STROKE: Millimetres = 0.28

/** The dip arrow's own frame is that of a decoration. A vertical fault has a bar across instead: it dips to neither side. */
export const faultDipMarks = (side: SideSign, isVertical: boolean): readonly Mark[] =>
  isVertical
    ? [dipShaft(-VERTICAL_REACH, VERTICAL_REACH)]
    : [
        dipShaft(0, side * (DIP_REACH - DIP_HEAD)),
        {
          mark: 'fill',
          path: polyline(
            [
              [0, side * DIP_REACH],
              [-0.55, side * (DIP_REACH - DIP_HEAD)],
              [0.55, side * (DIP_REACH - DIP_HEAD)],
            ],
            true,
          ),
          ink: 'black',
        },
      ]

const VERTICAL_REACH: Millimetres = 1.6

const dipShaft = (from: Millimetres, to: Millimetres): Mark => ({
  mark: 'stroke',
  path: polyline([
    [0, from],
    [0, to],
  ]),
  width: DIP_STROKE,
  ink: 'black',
})

type Own = Pick<LineSymbol, 'decoration' | 'published' | 'explains'>

const symbol = (variant: FaultType, title: string, drivenBy: readonly string[], own: Own): LineSymbol => ({
  ...fault,
  id: `fault.${variant}`,
  variant,
  title,
  drivenBy: ['locationConfidence', 'identity', ...drivenBy],
  ...own,
})

/** Faults: heavy near-black lines; the decoration stands on the stated side, and so does the arrow of the dip. */
export const faults: readonly LineSymbol[] = [
  symbol('unspecified', 'Fault', ['dip', 'side'], { published: { concealed: fgdc('2.1.7') } }),
  symbol('normal', 'Normal fault', ['side', 'dip'], {
    decoration: ballAndBar,
    explains: 'ball on the downthrown side',
    published: { certain: fgdc('2.2.1') },
  }),
  symbol('reverse', 'Reverse fault', ['side', 'dip'], {
    decoration: openTeeth,
    explains: 'open teeth on the hanging wall',
  }),
  symbol('thrust', 'Thrust', ['side', 'dip'], {
    decoration: solidTeeth,
    explains: 'teeth on the upper plate',
  }),
  // Standing on the right side and looking left across a left-lateral fault, the left side has moved to the left: back.
  symbol('left-lateral', 'Left-lateral fault', ['dip', 'side'], {
    decoration: halfArrows(-1),
    explains: 'half arrows show how the sides moved',
  }),
  symbol('right-lateral', 'Right-lateral fault', ['dip', 'side'], {
    decoration: halfArrows(1),
    explains: 'half arrows show how the sides moved',
  }),
  symbol('rotational', 'Rotational fault', ['side'], {
    decoration: ballsAtEnds,
    explains: 'balls on the side that is downthrown near each end',
  }),
]
