import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { measureLine } from '@shared/geometry/measured-line'
import { lineSymbols } from '@shared/symbols/draw-item'
import type { LineDrawing } from '@shared/symbols/line-drawing'
import { layOutLine } from '@shared/symbols/line-layout'
import type { LineSymbol } from '@shared/symbols/definition'
import type { MM } from '@shared/units'
import { aWalk, aZigzag } from '../../../support/arbitrary-lines'

const drawing: LineDrawing = {
  locationConfidence: 'certain',
  identity: 'certain',
  attributes: { side: 1 },
}
const decorated = lineSymbols.filter((symbol) => symbol.decoration)
const aSymbol = fc.constantFrom(...decorated)
const aRepeated = fc.constantFrom(
  ...decorated.filter((symbol) => symbol.decoration && 'every' in symbol.decoration.placed),
)
const everyOf = ({ decoration }: LineSymbol): number =>
  decoration && 'every' in decoration.placed ? decoration.placed.every : 0
const sizeOf = ({ decoration }: LineSymbol): number => decoration?.size ?? 0

const layOut = (line: readonly MM[], symbol: LineSymbol, more: Partial<LineDrawing> = {}) => {
  const measured = measureLine(line)
  return { ...layOutLine(measured, symbol, { ...drawing, ...more }), measured }
}

/** Turn of a line at its vertices, degrees, with their distances from its start. */
function corners(line: readonly MM[]): { at: number; turn: number }[] {
  let at = 0
  return line.slice(1, -1).map(([x, y], index) => {
    const [ax, ay] = line[index] ?? [0, 0]
    const [bx, by] = line[index + 2] ?? [0, 0]
    at += Math.hypot(x - ax, y - ay)
    const cosine =
      ((x - ax) * (bx - x) + (y - ay) * (by - y)) / (Math.hypot(x - ax, y - ay) * Math.hypot(bx - x, by - y))
    return { at, turn: (Math.acos(Math.max(-1, Math.min(1, cosine))) * 180) / Math.PI }
  })
}

describe('decorations', () => {
  it('are equally spaced on a line without sharp bends', () => {
    fc.assert(
      fc.property(aWalk({ steps: [20, 80], step: [2, 5], turn: 8 }), aRepeated, (line, symbol) => {
        const { decorations, measured } = layOut(line, symbol)
        const spacing = measured.length / decorations.length
        expect(decorations.length).toBe(Math.max(1, Math.round(measured.length / everyOf(symbol))))
        decorations.forEach(({ at }, index) => expect(at).toBeCloseTo(spacing * (index + 0.5), 6))
      }),
    )
  })

  it('stay near their even places on any line, and never meet', () => {
    fc.assert(
      fc.property(aWalk(), aRepeated, (line, symbol) => {
        const { decorations } = layOut(line, symbol)
        decorations.slice(1).forEach(({ at, scale }, index) => {
          const before = decorations[index]?.at ?? 0
          expect(at - before).toBeGreaterThan(sizeOf(symbol) * scale)
        })
      }),
    )
  })

  it('stand on no bend sharper than 45°, but for one that would else leave the line bare', () => {
    // The stated limit is 30° as the line turns over the decoration; a corner between the places looked at may be a
    // little sharper.
    fc.assert(
      fc.property(aZigzag(4), aSymbol, (line, symbol) => {
        const { decorations } = layOut(line, symbol)
        if (decorations.length <= 1 || (symbol.decoration && 'fromEnds' in symbol.decoration.placed)) return
        const sharp = corners(line).filter(({ turn }) => turn > 45)
        for (const { at, scale } of decorations) {
          const reach = sizeOf(symbol) * scale * 0.45
          expect(sharp.filter((corner) => Math.abs(corner.at - at) < reach)).toEqual([])
        }
      }),
    )
  })

  it('never reach over an end of the line', () => {
    fc.assert(
      fc.property(aWalk({ steps: [1, 8], step: [0.3, 6] }), aSymbol, (line, symbol) => {
        const { decorations, measured } = layOut(line, symbol)
        for (const { at, scale } of decorations) {
          const half = (sizeOf(symbol) * scale) / 2
          expect(at - half).toBeGreaterThanOrEqual(-1e-9)
          expect(at + half).toBeLessThanOrEqual(measured.length + 1e-9)
        }
      }),
    )
  })

  it('are there, if smaller, on a line a little too short for them', () => {
    for (const symbol of decorated) {
      const isAtEnds = symbol.decoration && 'fromEnds' in symbol.decoration.placed
      const length = sizeOf(symbol) * (isAtEnds ? 2 : 0.7)
      const { decorations } = layOut(
        [
          [0, 0],
          [length, 0],
        ],
        symbol,
      )
      expect(decorations.map(({ end }) => end)).toEqual(isAtEnds ? ['start', 'end'] : [expect.anything()])
      expect(decorations[0]?.scale).toBeLessThan(1)
    }
  })

  it('come before the arrow of a dip, and a question mark before them, where there is no room for all', () => {
    const thrust = decorated.find(({ id }) => id === 'fault.thrust')
    if (!thrust) throw new Error('There is no thrust.')
    const short: MM[] = [
      [0, 0],
      [5, 0],
    ]
    const dip = { degrees: 30, figure: true }
    const certain = layOut(short, thrust, { dip })
    expect([certain.decorations.length, certain.dipAt, certain.queries]).toEqual([1, undefined, []])
    const doubtful = layOut(short, thrust, { dip, identity: 'questionable' })
    expect([doubtful.decorations.length, doubtful.dipAt, doubtful.queries.length]).toEqual([0, undefined, 1])
  })

  it('leave the middle to the arrow of a dip', () => {
    fc.assert(
      fc.property(aWalk({ steps: [20, 60], step: [2, 5], turn: 8 }), aRepeated, (line, symbol) => {
        const { decorations, dipAt, measured } = layOut(line, symbol, { dip: { degrees: 60, figure: true } })
        expect(dipAt).toBeCloseTo(measured.length / 2, 6)
        expect(decorations.length % 2).toBe(0)
      }),
    )
  })
})

describe('question marks', () => {
  const questioned = { identity: 'questionable' } as const

  it('are never missing from a questioned line, however crooked and short', () => {
    fc.assert(
      fc.property(aWalk({ steps: [1, 30] }), fc.constantFrom(...lineSymbols), (line, symbol) => {
        expect(layOut(line, symbol, questioned).queries.length).toBeGreaterThan(0)
      }),
    )
  })

  it('keep off decorations, arrows and one another', () => {
    fc.assert(
      fc.property(aWalk({ steps: [10, 60], step: [1, 5] }), aSymbol, (line, symbol) => {
        const more = { ...questioned, dip: { degrees: 60, figure: true } }
        const { queries, decorations, dipAt } = layOut(line, symbol, more)
        const others = [...decorations.map(({ at }) => at), ...(dipAt === undefined ? [] : [dipAt])]
        for (const at of queries) {
          for (const other of others) expect(Math.abs(other - at)).toBeGreaterThan(1.5)
          expect(queries.filter((query) => Math.abs(query - at) < 3)).toHaveLength(1)
        }
      }),
    )
  })
})
