import type { Random } from '../../../seeded-random'
import type { Degrees, Millimetres, MM } from '../../../units'
import type { TileMark } from '../../display-list'
import { circle } from '../../paths'
import { scatter } from '../../scatter'
import { between, dash, dot, FINE, fragment, graded, line, outline, strokesAt } from './glyphs'
import { pattern, type LithologyPattern } from './pattern'

function alluvium(): LithologyPattern {
  const cell = { width: 20, height: 16 }
  return pattern('alluvium', 'Alluvium', () => ({
    ...cell,
    marks: scatter([...graded(20, 0.55, 0.32), ...graded(60, 0.16, 0.11)], cell, 61).map(({ at, radius }) =>
      radius > 0.3 ? outline(circle(at, radius)) : dot(at, radius),
    ),
  }))
}

function till(): LithologyPattern {
  const cell = { width: 22, height: 18 }
  const stones = graded(14, 1, 0.55)
  const streaks = graded(26, 0.5, 0.5)
  const grains = graded(40, 0.16, 0.11)
  return pattern('till', 'Till', () => ({
    ...cell,
    marks: scatter([...stones, ...streaks, ...grains], cell, 71).map(({ at, radius, random }) => {
      if (radius > 0.5) return fragment(at, radius, 5, random)
      return radius === 0.5 ? streak(at, radius, between(0, 180, random)) : dot(at, radius)
    }),
  }))
}

const streak = (at: MM, half: Millimetres, turn: Degrees): TileMark =>
  strokesAt(at, turn, [
    [
      [-half, 0],
      [half, 0],
    ],
  ])

function talus(): LithologyPattern {
  const cell = { width: 20, height: 16 }
  return pattern('talus', 'Talus', () => ({
    ...cell,
    marks: scatter(graded(44, 0.9, 0.4), cell, 83).map(({ at, radius, random }) => heap(at, radius, random)),
  }))
}

/** A block that lies on the slope: three-cornered, its point up, a little askew. */
const heap = (at: MM, size: Millimetres, random: Random): TileMark =>
  strokesAt(at, between(-16, 16, random), [
    [
      [-size, -size * 0.6],
      [between(-0.2, 0.2, random) * size, size],
      [size, -size * 0.6],
      [-size, -size * 0.6],
    ],
  ])

function landslide(): LithologyPattern {
  const cell = { width: 22, height: 18 }
  return pattern('landslide', 'Landslide', () => ({
    ...cell,
    marks: scatter(graded(30, 1.6, 0.8), cell, 97).map(({ at, radius }) => slip(at, radius)),
  }))
}

/** The scar of a slip: an arc open downhill. */
const slip = ([x, y]: MM, half: Millimetres): TileMark => ({
  mark: 'stroke',
  path: [
    ['move', x - half, y - half * 0.4],
    ['curve', x - half * 0.7, y + half * 0.55, x + half * 0.7, y + half * 0.55, x + half, y - half * 0.4],
  ],
  width: FINE,
  cap: 'round',
})

/** A tuft of moss on wet ground. */
function tuft([x, y]: MM): TileMark[] {
  const middle = x + 1.2
  return [
    dash([x, y], 2.4),
    line([
      [middle, y],
      [middle, y + 1.3],
    ]),
    line([
      [middle - 0.35, y],
      [middle - 0.8, y + 0.95],
    ]),
    line([
      [middle + 0.35, y],
      [middle + 0.8, y + 0.95],
    ]),
  ]
}

/** Deposits of the surface: open grounds, so that they read as cover. Common practice; the drawings are our own. */
export const depositPatterns: readonly LithologyPattern[] = [
  alluvium(),
  till(),
  talus(),
  landslide(),
  pattern('peat', 'Peat', () => ({
    width: 8,
    height: 6,
    marks: [
      [0.8, 1],
      [4.8, 4],
    ].flatMap(([x = 0, y = 0]) => tuft([x, y])),
  })),
]
