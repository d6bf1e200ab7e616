import type { Millimetres, MM } from '../../../units'
import type { TileMark } from '../../display-list'
import { polyline } from '../../paths'
import { scatter } from '../../scatter'
import { dash, dot, FINE, fragment, graded, line, outline, pebble } from './glyphs'
import { pattern, type LithologyPattern } from './pattern'

/** Rows one above the other. */
function rows(
  count: number,
  apart: Millimetres,
  draw: (y: Millimetres, row: number) => TileMark[],
): TileMark[] {
  return Array.from({ length: count }, (_, row) => draw((row + 0.5) * apart, row)).flat()
}

/** Two courses of bricks, the upper moved by half a brick.
 *  @param lean how far the upper end of a joint stands to the right of its lower end */
function bricks({ lean }: { lean: Millimetres }): TileMark[] {
  return [0, 1].flatMap((course) => {
    const [y, x] = [course * 2.5, course * 1.75]
    return [
      outline(
        polyline([
          [0, y],
          [7, y],
        ]),
      ),
      ...[0, 1].map((joint) =>
        outline(
          polyline([
            [x + joint * 3.5 + 0.6, y],
            [x + joint * 3.5 + 0.6 + lean, y + 2.5],
          ]),
        ),
      ),
    ]
  })
}

function sandstone(): LithologyPattern {
  const cell = { width: 14, height: 12 }
  return pattern('sandstone', 'Sandstone', () => ({
    ...cell,
    marks: scatter(graded(130, 0.16, 0.1), cell, 3).map(({ at, radius }) => dot(at, radius)),
  }))
}

function conglomerate(): LithologyPattern {
  const cell = { width: 22, height: 18 }
  return pattern('conglomerate', 'Conglomerate', () => ({
    ...cell,
    marks: scatter([...graded(38, 1.15, 0.45), ...graded(46, 0.18, 0.12)], cell, 11).map(
      ({ at, radius, random }) => (radius > 0.3 ? pebble(at, radius, random) : dot(at, radius)),
    ),
  }))
}

function breccia(): LithologyPattern {
  const cell = { width: 22, height: 18 }
  return pattern('breccia', 'Breccia', () => ({
    ...cell,
    marks: scatter([...graded(42, 1.2, 0.5), ...graded(40, 0.16, 0.11)], cell, 23).map(
      ({ at, radius, random }, index) =>
        radius > 0.3 ? fragment(at, radius, index % 2 === 0 ? 3 : 4, random) : dot(at, radius),
    ),
  }))
}

const triangle = ([x, y]: MM): TileMark =>
  outline(
    polyline(
      [
        [x, y],
        [x + 1, y],
        [x + 0.5, y + 0.9],
      ],
      true,
    ),
  )

/** A crystal of salt seen square on. */
const cube = ([x, y]: MM): TileMark =>
  outline(
    polyline(
      [
        [x, y],
        [x + 1, y],
        [x + 1, y + 1],
        [x, y + 1],
      ],
      true,
    ),
  )

const bar = ([x, y]: MM, length: Millimetres): TileMark =>
  line(
    [
      [x, y],
      [x + length, y],
    ],
    FINE * 3,
  )

/** Bedded rocks. Dots for sand, dashes for mud, bricks for carbonate: common practice; the drawings are our own. */
export const beddedPatterns: readonly LithologyPattern[] = [
  pattern('shale', 'Shale', () => ({
    width: 6,
    height: 5,
    marks: rows(4, 1.25, (y, row) => [dash([row * 3.75, y], 2), dash([row * 3.75 + 3, y], 2)]),
  })),
  pattern('siltstone', 'Siltstone', () => ({
    width: 5,
    height: 4.5,
    marks: rows(3, 1.5, (y, row) => [
      dash([row * 1.75, y], 1.9),
      dot([row * 1.75 + 2.75, y], 0.15),
      dot([row * 1.75 + 3.45, y], 0.15),
      dot([row * 1.75 + 4.15, y], 0.15),
    ]),
  })),
  sandstone(),
  conglomerate(),
  breccia(),
  pattern('limestone', 'Limestone', () => ({ width: 7, height: 5, marks: bricks({ lean: 0 }) })),
  pattern('dolomite', 'Dolomite', () => ({ width: 7, height: 5, marks: bricks({ lean: 0.9 }) })),
  pattern('marl', 'Marl', () => ({
    width: 7,
    height: 5,
    marks: [
      ...bricks({ lean: 0 }),
      ...rows(2, 2.5, (y, row) => [dash([row * 1.75 + 1.5, y], 1.7), dash([row * 1.75 + 5, y], 1.7)]),
    ],
  })),
  pattern('chert', 'Chert', () => ({
    width: 7,
    height: 5,
    marks: rows(2, 2.5, (y, row) =>
      [0, 3.5].flatMap((x) => [
        triangle([row * 1.75 + x + 0.25, y - 0.25]),
        dash([row * 1.75 + x + 1.75, y], 1),
      ]),
    ),
  })),
  pattern('evaporite', 'Evaporite', () => ({
    width: 5.5,
    height: 4.5,
    marks: rows(2, 2.25, (y, row) => [cube([row * 1.5 + 0.75, y]), cube([row * 1.5 + 3.5, y])]),
  })),
  pattern('coal', 'Coal', () => ({
    width: 9,
    height: 5.5,
    marks: rows(2, 2.75, (y, row) => [bar([row * 4.5 + 0.3, y], 3.3), dash([row * 4.5 + 4.9, y], 2.9)]),
  })),
]
