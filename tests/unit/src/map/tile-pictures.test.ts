import { describe, expect, it } from 'vitest'
import { wholeCells } from '@/map/tile-pictures'

describe('how many cells make a picture', () => {
  it('is one where a cell is whole pixels', () => {
    expect(wholeCells(60)).toBe(1)
  })

  it('is the fewest that come to whole pixels', () => {
    expect(wholeCells(22.5)).toBe(2)
    expect(wholeCells(26.25)).toBe(4)
  })

  it('keeps the period within four pixels on a screen 4000 pixels wide, for cells of any usual size', () => {
    for (let cell = 15; cell < 100; cell += 0.37) {
      const count = wholeCells(cell)
      const width = Math.round(count * cell)
      expect(width).toBeLessThanOrEqual(640)
      expect(Math.abs(width / (count * cell) - 1) * 4000).toBeLessThan(4)
    }
  })

  it('is one for a cell that fills a picture by itself', () => {
    expect(wholeCells(1000.4)).toBe(1)
  })
})
