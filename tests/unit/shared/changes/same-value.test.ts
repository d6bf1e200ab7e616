import { describe, expect, it } from 'vitest'
import { isSame } from '@shared/changes/same-value'

describe('sameness of items', () => {
  it('does not depend on the order of keys, which the database changes', () => {
    expect(isSame({ a: 1, b: [{ c: null, d: 2 }] }, { b: [{ d: 2, c: null }], a: 1 })).toBe(true)
  })

  it('sees every difference in depth, in length and in kind', () => {
    expect(isSame({ a: [1, 2] }, { a: [1, 2, 3] })).toBe(false)
    expect(isSame({ a: undefined }, { b: undefined })).toBe(false)
    expect(isSame([], {})).toBe(false)
    expect(isSame({ a: { b: 1 } }, { a: { b: 2 } })).toBe(false)
  })
})
