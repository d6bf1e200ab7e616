import { describe, expect, it } from 'vitest'
import type { IntakeColumn } from '@shared/intake/report'
import { counted, extentWords, fileSize, samplesOf } from '@/components/intake/file-words'

describe('fileSize', () => {
  it.each([
    [0, '0 bytes'],
    [999, '999 bytes'],
    [1000, '1 kB'],
    [79_104, '79 kB'],
    [999_499, '999 kB'],
    [999_500, '1.0 MB'],
    [2_784_899, '2.8 MB'],
  ])('says %i as %s', (bytes, words) => {
    expect(fileSize(bytes)).toBe(words)
  })
})

describe('counted', () => {
  it('has one form for one, and spaces that do not break between thousands', () => {
    expect([counted(1, 'line'), counted(0, 'line'), counted(4478, 'line')]).toEqual([
      '1 line',
      '0 lines',
      '4\u00a0478 lines',
    ])
  })
})

describe('extentWords', () => {
  const plain = (extent: [number, number, number, number]) => extentWords(extent).replaceAll('\u00a0', ' ')

  it('gives each side its letter', () => {
    expect(plain([-29.87662, 47.6265, -29.2381, 47.7188])).toBe(
      '29.8766° W to 29.2381° W, 47.6265° N to 47.7188° N',
    )
    expect(plain([-1.5, -2.25, 1.5, 2.25])).toBe('1.5000° W to 1.5000° E, 2.2500° S to 2.2500° N')
  })

  it('says a single place once, and gives zero no letter', () => {
    expect(plain([3, 0, 3, 0])).toBe('3.0000° E, 0°')
    expect(plain([-0.00001, 45, 0, 45])).toBe('0°, 45.0000° N')
  })
})

describe('samplesOf', () => {
  const column: IntakeColumn = {
    name: 'type',
    samples: ['bedding', 'dike'],
    filled: 12,
    numbers: null,
    values: [
      { value: 'bedding', count: 7, points: 7, lines: 0 },
      { value: '', count: 3, points: 1, lines: 2 },
      { value: 'dike', count: 2, points: 0, lines: 2 },
    ],
  }

  it('shows the values that records of the form have', () => {
    expect(samplesOf(column, 'points')).toEqual(['bedding'])
    expect(samplesOf(column, 'lines')).toEqual(['dike'])
  })

  it('shows any where there are too many to be counted', () => {
    expect(samplesOf({ ...column, values: [] }, 'lines')).toEqual(['bedding', 'dike'])
  })
})
