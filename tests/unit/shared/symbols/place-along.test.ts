import { describe, expect, it } from 'vitest'
import { measureLine } from '@shared/geometry/measured-line'
import { placeAlong } from '@shared/symbols/place-along'
import { straight, waving } from '../../../support/drawn-items'

const size = 2
const interval = 9
const on = (line: [number, number][], taken: [number, number][] = []) => {
  const measured = measureLine(line)
  return { places: placeAlong(measured, { size, interval, within: [0, measured.length], taken }), measured }
}

describe('decorations along a line', () => {
  it('are equally spaced, symmetric, and never within half their size of an end', () => {
    for (let length = 1; length < 120; length += 0.7) {
      const { places } = on(straight(33, length))
      const gaps = places.slice(1).map((place, index) => place - (places[index] ?? 0))
      gaps.forEach((gap) => expect(gap).toBeCloseTo(gaps[0] ?? 0, 9))
      places.forEach((place, index) => expect(place + (places.at(-1 - index) ?? 0)).toBeCloseTo(length, 9))
      places.forEach((place) => {
        expect(place).toBeGreaterThanOrEqual(size / 2 - 1e-9)
        expect(place).toBeLessThanOrEqual(length - size / 2 + 1e-9)
      })
    }
  })

  it('number one on a short line, none where one does not fit', () => {
    expect(on(straight(0, 2.1)).places).toHaveLength(1)
    expect(on(straight(0, 1.9)).places).toHaveLength(0)
    expect(on(straight(0, 10)).places).toHaveLength(1)
  })

  it('keep their spacing on a gently waving line', () => {
    const { places, measured } = on(waving(70, 90))
    expect(places).toHaveLength(Math.round(measured.length / interval))
  })

  it('move off a sharp bend, and no further than they must', () => {
    // One place, in the middle, where the line turns by a right angle.
    const { places, measured } = on([
      [0, 0],
      [5, 0],
      [5, 5],
    ])
    expect(places).toHaveLength(1)
    const [place = 0] = places
    expect(Math.abs(place - 5)).toBeGreaterThanOrEqual(size * 0.45)
    expect(Math.abs(place - 5)).toBeLessThan(size)
    expect(measured.turnAt(place, size)).toBeLessThanOrEqual(30)
  })

  it('move off what is taken, or give way', () => {
    const { places } = on(straight(0, 9), [[3.5, 5.5]])
    expect(places).toHaveLength(1)
    expect(Math.abs((places[0] ?? 0) - 4.5)).toBeGreaterThanOrEqual(2)
    expect(on(straight(0, 9), [[0, 9]]).places).toEqual([])
  })
})
