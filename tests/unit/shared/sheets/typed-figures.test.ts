import { describe, expect, it } from 'vitest'
import { parseDegrees, parseMetres, parseMillimetres, parseScale } from '@shared/sheets/typed-figures'

describe('parseDegrees', () => {
  it.each([
    ['-35.875', -35.875],
    ['−35.875', -35.875],
    ['35.875 W', -35.875],
    ['35,875w', -35.875],
    ['35°52\'30" W', -35.875],
    ['35°52′30″W', -35.875],
    ['35 52 30 W', -35.875],
    ["35°52.5'W", -35.875],
    ["35° 52' 30'' W", -35.875],
    ['35°45′ W', -35.75],
    ['0', 0],
    ['180 E', 180],
    ['7', 7],
  ])('reads the longitude %s', (text, value) => {
    const read = parseDegrees(text, 'longitude')
    expect(read).toMatchObject({ outcome: 'figure' })
    // A second has no exact binary fraction: a millionth of an arc second is far below the 1 mm grid.
    expect(read.outcome === 'figure' && read.value).toBeCloseTo(value, 10)
  })

  it.each([
    ['181', 'longitude', /at most 180°/],
    ['91 N', 'latitude', /at most 90°/],
    ['47.5 W', 'latitude', /ends in N or S, not in W/],
    ['35.8 N', 'longitude', /ends in E or W, not in N/],
    ['-35.8 W', 'longitude', /not both/],
    ["35°61' W", 'longitude', /less than 60/],
    ['thirty-five', 'longitude', /is written like/],
    ['35.8.1', 'longitude', /is written like/],
    ['NaN', 'longitude', /is written like/],
    ['1e3', 'longitude', /is written like/],
  ] as const)('refuses %s as %s in a sentence', (text, axis, reason) => {
    const read = parseDegrees(text, axis)
    expect(read.outcome === 'refused' && read.reason).toMatch(reason)
  })

  it('knows an empty field from a wrong one', () => {
    expect(parseDegrees('  ', 'latitude')).toEqual({ outcome: 'empty' })
  })
})

describe('parseMetres', () => {
  it.each([
    ['284000', 284_000],
    ['284 000', 284_000],
    ['5\u202f278\u202f000.5', 5_278_000.5],
    ['-12,5 m', -12.5],
  ])('reads %s', (text, value) => {
    expect(parseMetres(text)).toEqual({ outcome: 'figure', value })
  })

  it.each(['12 km', 'Infinity', '0x10', '1.2.3'])('refuses %s', (text) => {
    expect(parseMetres(text).outcome).toBe('refused')
  })
})

describe('parseScale', () => {
  it.each(['24000', '24 000', '1:24 000', '1 : 24,000', '1/24000', '1:24.000'])('reads %s', (text) => {
    expect(parseScale(text)).toEqual({ outcome: 'figure', value: 24_000 })
  })

  it.each(['0', '499', '1:10 000 001', '2:24000', '-24000', '1:24000.5', 'large'])('refuses %s', (text) => {
    expect(parseScale(text).outcome).toBe('refused')
  })
})

describe('parseMillimetres', () => {
  it('reads a side of a page and refuses one that no page has', () => {
    expect(parseMillimetres('841 mm')).toEqual({ outcome: 'figure', value: 841 })
    expect(parseMillimetres('99').outcome).toBe('refused')
    expect(parseMillimetres('2001').outcome).toBe('refused')
    expect(parseMillimetres('A1').outcome).toBe('refused')
  })
})
