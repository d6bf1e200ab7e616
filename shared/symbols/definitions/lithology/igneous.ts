import type { Degrees, Millimetres, MM } from '../../../units'
import type { TileMark } from '../../display-list'
import { scatter } from '../../scatter'
import { between, dot, graded, strokesAt } from './glyphs'
import { pattern, type LithologyPattern } from './pattern'

function tuff(): LithologyPattern {
  const cell = { width: 16, height: 14 }
  return pattern('tuff', 'Tuff', () => ({
    ...cell,
    marks: scatter([...graded(30, 0.5, 0.5), ...graded(44, 0.15, 0.1)], cell, 31).map(({ at, radius }) =>
      radius > 0.3 ? wedge(at, { half: 0.42, high: 0.75, turn: 180 }) : dot(at, radius),
    ),
  }))
}

function basalt(): LithologyPattern {
  const [across, up] = [2.75, 2.25]
  return pattern('basalt', 'Basalt', () => ({
    width: 2 * across,
    height: 2 * up,
    marks: [0, 1].flatMap((row) =>
      [0, 1].map((column) =>
        wedge([(column + row / 2 + 0.25) * across, (row + 0.5) * up], { half: 0.6, high: 1.1, turn: 0 }),
      ),
    ),
  }))
}

function granite(): LithologyPattern {
  const cell = { width: 18, height: 16 }
  return pattern('granite', 'Granite', () => ({
    ...cell,
    marks: scatter(graded(58, 0.62, 0.62), cell, 41).map(({ at, radius, random }) =>
      cross(at, radius, between(-14, 14, random)),
    ),
  }))
}

function gabbro(): LithologyPattern {
  const cell = { width: 18, height: 16 }
  return pattern('gabbro', 'Gabbro', () => ({
    ...cell,
    marks: scatter(graded(56, 0.7, 0.7), cell, 53).map(({ at, random }) =>
      elbow(at, 1.05, Math.floor(random() * 4) * 90 + between(-12, 12, random)),
    ),
  }))
}

/** A wedge like a v, its point down unless turned. */
const wedge = (
  at: MM,
  { half, high, turn }: { half: Millimetres; high: Millimetres; turn: Degrees },
): TileMark =>
  strokesAt(at, turn, [
    [
      [-half, high / 2],
      [0, -high / 2],
      [half, high / 2],
    ],
  ])

const cross = (at: MM, arm: Millimetres, turn: Degrees): TileMark =>
  strokesAt(at, turn, [
    [
      [-arm, 0],
      [arm, 0],
    ],
    [
      [0, -arm],
      [0, arm],
    ],
  ])

/** Two arms at a right angle. */
const elbow = (at: MM, arm: Millimetres, turn: Degrees): TileMark =>
  strokesAt(at, turn, [
    [
      [-arm / 3, (arm * 2) / 3],
      [-arm / 3, -arm / 3],
      [(arm * 2) / 3, -arm / 3],
    ],
  ])

/** Volcanic and intrusive rocks. Wedges for lavas and ash, crosses for granite: common practice; the drawings are our own. */
export const igneousPatterns: readonly LithologyPattern[] = [tuff(), basalt(), granite(), gabbro()]
