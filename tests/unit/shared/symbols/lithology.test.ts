import { describe, expect, it } from 'vitest'
import { lithologies } from '@shared/items/lithology'
import { findPattern, lithologyPatterns } from '@shared/symbols/definitions/lithology'

/** Lines finer than this may fail in print. Source: symbolization.md section 1 (FGDC's guidance page). */
const LEAST_LINE_MM = 0.125

describe('lithology patterns', () => {
  it('are one for each lithology, in their order', () => {
    expect(lithologyPatterns.map(({ id }) => id)).toEqual(lithologies)
    for (const id of lithologies) expect(findPattern(id)?.tile.id).toBe(id)
    expect(findPattern('none')).toBeUndefined()
  })

  it.each(lithologyPatterns)('$id has no line too fine to print, and no dot', ({ tile }) => {
    for (const mark of tile.marks) {
      if (mark.mark === 'stroke') expect(mark.width).toBeGreaterThanOrEqual(LEAST_LINE_MM)
      else {
        const xs = mark.path.flatMap((step) => (step[0] === 'close' ? [] : [step.at(-2) as number]))
        expect(Math.max(...xs) - Math.min(...xs)).toBeGreaterThanOrEqual(LEAST_LINE_MM)
      }
    }
  })
})
