import { describe, expect, it } from 'vitest'
import { newSheetSchema } from '@shared/api/sheets'
import { itemSchema } from '@shared/items/item'
import { sizedSheet } from '../../../../server/demo/sized-sheet'
import { itemsOf } from '../../../../server/demo/truth/generate-sheet'
import { fieldNoise } from '../../../../server/demo/truth/noise'

describe('a sheet of any size', () => {
  it.each([100, 333, 1500])(
    'of %i items has exactly so many, all valid, of all kinds',
    (items) => {
      const { sheet, items: made } = sizedSheet({ items })
      const all = itemsOf(made)
      expect(all).toHaveLength(items)
      for (const item of all) expect(itemSchema.safeParse(item).error).toBeUndefined()
      expect(new Set(all.map(({ id }) => id)).size).toBe(items)
      expect(newSheetSchema.safeParse(sheet).error).toBeUndefined()
      for (const kind of ['contact', 'attitude', 'unit-label', 'unit', 'axial-trace'] as const) {
        expect(all.some((item) => item.kind === kind)).toBe(true)
      }
    },
    60_000,
  )

  it('has more lines among its items where these are farther apart', () => {
    const lines = (perKm2: number) => {
      const { items } = sizedSheet({ items: 600, perKm2 })
      return itemsOf(items).filter((item) => item.geometry?.type === 'LineString').length
    }
    expect(lines(8)).toBeGreaterThan(1.4 * lines(18))
  }, 60_000)

  it('differs by its seed, and by the errors of measuring in its points only', () => {
    const made = (options: object) => sizedSheet({ items: 200, ...options }).items
    const [plain, other, noisy] = [made({}), made({ seed: 2 }), made({ noise: fieldNoise })]
    const places = ({ attitudes }: typeof plain) => attitudes.map(({ geometry }) => geometry.coordinates)
    expect(places(other)).not.toEqual(places(plain))
    expect(noisy.contacts.map(({ geometry }) => geometry)).toEqual(
      plain.contacts.map(({ geometry }) => geometry),
    )
    const moved = places(noisy).map((at, index) =>
      Math.hypot(at[0] - (places(plain)[index]?.[0] ?? NaN), at[1] - (places(plain)[index]?.[1] ?? NaN)),
    )
    // Four metres in east and in north: the mean of the distance is σ√(π/2) = 5.0.
    const mean = moved.reduce((sum, distance) => sum + distance, 0) / moved.length
    expect(Math.abs(mean - 4 * Math.sqrt(Math.PI / 2))).toBeLessThan(1.2)
  }, 60_000)
})
