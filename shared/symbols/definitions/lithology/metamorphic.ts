import type { Millimetres, MM } from '../../../units'
import type { PathStep, TileMark } from '../../display-list'
import { dash, dot, FINE, line } from './glyphs'
import { pattern, type LithologyPattern } from './pattern'

/** A short wave from its left end: up, then down. */
const wave = ([x, y]: MM, { length, high }: { length: Millimetres; high: Millimetres }): TileMark => ({
  mark: 'stroke',
  path: [
    ['move', x, y],
    ['curve', x + length / 6, y + high, x + length / 3, y + high, x + length / 2, y],
    ['curve', x + (length * 2) / 3, y - high, x + (length * 5) / 6, y - high, x + length, y],
  ],
  width: FINE,
  cap: 'round',
})

/** A long wave that runs through the whole cell. */
function swell([x, y]: MM, length: Millimetres, high: Millimetres): TileMark {
  const half = length / 2
  // Handles of a third of the half wave follow a sine closely.
  const handle = half * 0.3642
  const path: PathStep[] = [
    ['move', x, y - high / 2],
    ['curve', x + handle, y - high / 2, x + half - handle, y + high / 2, x + half, y + high / 2],
    ['curve', x + half + handle, y + high / 2, x + length - handle, y - high / 2, x + length, y - high / 2],
  ]
  return { mark: 'stroke', path, width: FINE }
}

/** Steep strokes side by side. Over the cell's height a stroke leans by four of the eight, so the one that goes on above it
 *  is of its own sort, and each of the four sorts has its gap at another height. */
function cleavage(): TileMark[] {
  const heights = [0, 4, 2, 6]
  return Array.from({ length: 8 }, (_, index) => {
    const y = heights[index % 4] ?? 0
    return line([
      [index + y / 2, y],
      [index + (y + 6.1) / 2, y + 6.1],
    ])
  })
}

/** Metamorphic rocks. Waves for foliation, close slants for cleavage: common practice; the drawings are our own. */
export const metamorphicPatterns: readonly LithologyPattern[] = [
  pattern('schist', 'Schist', () => ({
    width: 8,
    height: 4.5,
    marks: [0, 1, 2].flatMap((row) =>
      [0, 1].map((column) => wave([column * 4 + row * 1.4, (row + 0.5) * 1.5], { length: 2.9, high: 0.42 })),
    ),
  })),
  pattern('gneiss', 'Gneiss', () => ({
    width: 10,
    height: 7,
    marks: [0, 1].flatMap((row) => {
      const y = row * 3.5 + 0.75
      const x = row * 5
      return [
        swell([x, y], 10, 0.55),
        swell([x, y + 0.8], 10, 0.55),
        wave([x + 1.3, y + 2.2], { length: 2.6, high: -0.3 }),
        wave([x + 6.3, y + 2.2], { length: 2.6, high: 0.3 }),
      ]
    }),
  })),
  pattern('slate', 'Slate', () => ({ width: 8, height: 8, marks: cleavage() })),
  pattern('quartzite', 'Quartzite', () => ({
    width: 6.5,
    height: 5.5,
    marks: [0, 1].flatMap((row) =>
      [0, 1].flatMap((column) => {
        const [x, y] = [column * 3.25 + row * 1.625 + 0.6, row * 2.75 + 0.75]
        return [
          dot([x, y], 0.16),
          dot([x + 0.7, y], 0.16),
          dot([x + 0.35, y + 0.6], 0.16),
          dash([x + 1.35, y + 0.2], 0.9),
        ]
      }),
    ),
  })),
]
