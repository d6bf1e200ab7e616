import { expect, it } from 'vitest'
import { graticuleInterval, gridInterval, multiplesBetween } from '@shared/sheet-face/intervals'

it.each([
  [5_000, 200],
  [10_000, 500],
  [24_000, 1000],
  [25_000, 1000],
  [50_000, 2000],
  [62_500, 2000],
  [100_000, 5000],
  [250_000, 10_000],
  [1_000_000, 50_000],
])('at 1:%i the grid is %i m', (scale, interval) => {
  expect(gridInterval(1000 / scale, 10_000)).toBe(interval)
})

it('keeps grid lines 15 to 60 mm apart at every scale', () => {
  for (let scale = 500; scale <= 10_000_000; scale = Math.ceil(scale * 1.07)) {
    const gap = gridInterval(1000 / scale, 0) * (1000 / scale)
    expect(gap).toBeGreaterThanOrEqual(15)
    expect(gap).toBeLessThanOrEqual(60)
  }
})

it('draws no more than 200 ticks on a side however far one zooms in', () => {
  const metresShown = 10_000
  expect(metresShown / gridInterval(1000, metresShown)).toBeLessThanOrEqual(200)
  expect(metresShown / 111_000 / graticuleInterval(1000, metresShown)).toBeLessThanOrEqual(200)
})

it('gives the multiples themselves, both ends included', () => {
  expect(multiplesBetween(284_000, 286_000, 1000)).toEqual([284_000, 285_000, 286_000])
  expect(multiplesBetween(2.4, 0.2, 0.5)).toEqual([0.5, 1, 1.5, 2])
  expect(multiplesBetween(0.1, 0.4, 0.5)).toEqual([])
})
