import type { Millimetres } from '../../units'
import { confidenceStrokes, type Decoration, type LineSymbol } from '../definition'
import type { Mark } from '../display-list'
import { circle, polyline } from '../paths'
import { placeMarks } from '../place-marks'

/** Faults are visibly heavier than contacts (symbolization.md section 3). */
const WIDTH: Millimetres = 0.6
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
  interval: 28,
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

/** One side is down at one end, the other at the other. */
const ballsAtBothSides: Decoration = {
  ...ballAndBar,
  size: 6 * BALL,
  marks: ({ side }) => [
    ...placeMarks(ballAndBar.marks({ side }), ([x, y]) => [x - 2 * BALL, y]),
    ...placeMarks(ballAndBar.marks({ side: side === 1 ? -1 : 1 }), ([x, y]) => [x + 2 * BALL, y]),
  ],
}

const TOOTH: Millimetres = 2.3
const TOOTH_HEIGHT: Millimetres = 1.9

const tooth = (side: 1 | -1, base: Millimetres, height: Millimetres, foot: Millimetres) =>
  polyline(
    [
      [-base / 2, side * foot],
      [0, side * (foot + height)],
      [base / 2, side * foot],
    ],
    true,
  )

/** Solid teeth on the upper plate, pointing down the dip of the thrust. */
const solidTeeth: Decoration = {
  size: TOOTH,
  interval: 9,
  bearingOver: TOOTH,
  marks: ({ side }) => [{ mark: 'fill', path: tooth(side, TOOTH, TOOTH_HEIGHT, WIDTH / 4), ink: 'black' }],
}

/** Open teeth on the hanging wall, wider apart than those of a thrust. */
const openTeeth: Decoration = {
  size: TOOTH,
  interval: 14,
  bearingOver: TOOTH,
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

/** One half arrow beside the line. @param side +1 left of the line   @param along +1 pointing along it, −1 back */
function halfArrow(side: 1 | -1, along: 1 | -1): Mark[] {
  const y = side * ARROW_OFFSET
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
  interval: 60,
  bearingOver: ARROW,
  marks: () => [...halfArrow(1, left), ...halfArrow(-1, left === 1 ? -1 : 1)],
})

/** Faults: heavy near-black lines; the decoration stands on the stated side. */
export const faults: readonly LineSymbol[] = [
  {
    ...fault,
    variant: 'unspecified',
    title: 'Fault',
    published: { concealed: { standard: 'FGDC-STD-013-2006', number: '2.1.7' } },
  },
  {
    ...fault,
    variant: 'normal',
    title: 'Normal fault',
    decoration: ballAndBar,
    published: { certain: { standard: 'FGDC-STD-013-2006', number: '2.2.1' } },
  },
  { ...fault, variant: 'reverse', title: 'Reverse fault', decoration: openTeeth },
  { ...fault, variant: 'thrust', title: 'Thrust', decoration: solidTeeth },
  // Standing on the right side and looking left across a left-lateral fault, the left side has moved to the left: back.
  { ...fault, variant: 'left-lateral', title: 'Left-lateral fault', decoration: halfArrows(-1) },
  { ...fault, variant: 'right-lateral', title: 'Right-lateral fault', decoration: halfArrows(1) },
  { ...fault, variant: 'rotational', title: 'Rotational fault', decoration: ballsAtBothSides },
]
