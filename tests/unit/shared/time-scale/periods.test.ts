import { describe, expect, it } from 'vitest'
import { findTimeDivision, timeDivisions } from '@shared/time-scale/periods'

describe('the time scale', () => {
  it('runs from the youngest to the oldest', () => {
    const bases = timeDivisions.map((division) => division.baseMa)
    expect(bases).toEqual(bases.toSorted((a, b) => a - b))
  })

  it.each([
    ['Devonian', 'Devonian'],
    ['Upper Devonian', 'Devonian'],
    ['Silurian and Devonian', 'Silurian'],
    ['late QUATERNARY', 'Quaternary'],
  ])('finds the division that %s names', (age, name) => {
    expect(findTimeDivision(age)?.name).toBe(name)
  })

  it('finds none in free words', () => {
    expect(findTimeDivision('post-Silurianesque')).toBeUndefined()
    expect(findTimeDivision('')).toBeUndefined()
  })
})
