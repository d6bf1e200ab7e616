import { describe, expect, it } from 'vitest'
import { cutDashes } from '@shared/symbols/dashes'
import { flatten, polyline } from '@shared/symbols/paths'
import { lineSymbols } from '@shared/symbols/draw-item'
import { measureLine } from '@shared/geometry/measured-line'
import { straight, waving } from '../../../support/drawn-items'

const lengthOf = (points: [number, number][]) => measureLine(points).length

describe('dashes', () => {
  const patterns = lineSymbols.flatMap(({ strokes }) =>
    Object.values(strokes).flatMap(({ dash }) => (dash ? [dash] : [])),
  )

  it('begin and end the line, whole, for every pattern and length', () => {
    for (const pattern of patterns) {
      for (let length = 0.5; length < 60; length += 0.83) {
        const line = waving(40, length, 0.4)
        if (line.length < 2) continue
        const dashes = flatten(cutDashes(polyline(line), pattern))
        expect(dashes[0]?.[0]).toEqual(line[0])
        const end = dashes.at(-1)?.at(-1)
        expect(end?.[0]).toBeCloseTo(line.at(-1)?.[0] ?? NaN, 9)
        expect(end?.[1]).toBeCloseTo(line.at(-1)?.[1] ?? NaN, 9)
        const lengths = dashes.map(lengthOf)
        lengths.forEach((dash) => expect(dash).toBeCloseTo(lengths[0] ?? NaN, 6))
      }
    }
  })

  it('are stretched or shrunk by a third at most once four of them fit', () => {
    const [drawn, left] = [3.5, 0.75]
    for (let length = 4 * drawn + 3 * left; length < 80; length += 0.9) {
      const [first] = flatten(cutDashes(polyline(straight(10, length)), [drawn, left]))
      const dash = first ? lengthOf(first) : 0
      expect(dash).toBeGreaterThan((drawn * 2) / 3)
      expect(dash).toBeLessThan((drawn * 4) / 3)
    }
  })

  it('keep the stated gaps, whatever length they fit, where dashes are longer than gaps', () => {
    for (const pattern of patterns.filter(([drawn = 0, left = 0]) => drawn >= left)) {
      for (let length = 4; length < 60; length += 1.3) {
        const dashes = flatten(cutDashes(polyline(straight(10, length)), pattern))
        const gaps = dashes.slice(1).map(([from], index) => {
          const end = dashes[index]?.at(-1)
          return from && end ? lengthOf([end, from]) : NaN
        })
        for (const gap of gaps) expect(gap).toBeCloseTo(pattern[1] ?? NaN, 6)
      }
    }
  })

  it('are cut anew in each part of a path', () => {
    const parts = [...polyline(straight(0, 10)), ...polyline(straight(0, 10, [5, 0]))]
    const dashes = flatten(cutDashes(parts, [2, 1]))
    expect(dashes.filter(([from]) => from?.[0] === 0)).toHaveLength(dashes.length / 2)
  })

  it('refuse a pattern that is none', () => {
    expect(() => cutDashes(polyline(straight(0, 10)), [2])).toThrow(RangeError)
    expect(() => cutDashes(polyline(straight(0, 10)), [0, 0])).toThrow(RangeError)
  })
})

describe('the four location confidences', () => {
  it.each(lineSymbols)('of a $title $variant put less ink on the line step by step', ({ strokes }) => {
    const inkShare = ({ width, dash, cap }: (typeof strokes)['certain']) => {
      if (!dash) return width
      const [drawn = 0, left = 0] = dash
      return cap === 'round' ? (Math.PI * width ** 2) / 4 / (drawn + left) : (width * drawn) / (drawn + left)
    }
    const { certain, approximate, inferred, concealed } = strokes
    expect(inkShare(certain)).toBeGreaterThan(inkShare(approximate))
    expect(inkShare(approximate)).toBeGreaterThan(inkShare(inferred))
    expect(inkShare(inferred)).toBeGreaterThan(inkShare(concealed))
  })
})
