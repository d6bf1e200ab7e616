import { describe, expect, it } from 'vitest'
import type { Problem } from '@shared/api/problems'
import { conflictsOf, differencesOf } from '@/components/compile/conflicts'
import { aLine, aPoint } from '../../../../support/sheet-items'

const problem = (slug: string, items: unknown[]): Problem => ({
  type: `/problems/${slug}`,
  title: 'Someone else changed the same items',
  status: 409,
  detail: '',
  instance: 'urn:uuid:0',
  todo: '',
  items,
})
const base = aPoint('attitude', [286_000, 5_280_000], { strike: 45, dip: 40 })
const withDip = (dip: number) => ({ ...base, properties: { ...base.properties, dip } })

describe('a conflict', () => {
  it('names each field with what both sides have', () => {
    const conflict = { id: base.id, base, theirs: withDip(53), yours: withDip(48) }
    expect(conflictsOf(problem('item-conflict', [conflict])).map(differencesOf)).toEqual([
      [{ what: 'dip', theirs: '53', yours: '48' }],
    ])
  })

  it('says what each did to the line, apart from other fields', () => {
    const line = aLine('contact', [[0, 0], [100, 0], [200, 0]], {}) // prettier-ignore
    const theirs = { ...line, geometry: { ...line.geometry, coordinates: [[0, 0], [100, 5], [200, 0]] as [number, number][] } } // prettier-ignore
    const yours = { ...line, properties: { ...line.properties, name: 'Skua' } }
    expect(differencesOf({ id: line.id, base: line, theirs, yours })).toEqual([
      { what: 'line', theirs: 'moved 1 vertex of contact', yours: 'as it was' },
      { what: 'name', theirs: 'none', yours: 'Skua' },
    ])
  })

  it('says that one side removed the item', () => {
    expect(differencesOf({ id: base.id, base, theirs: null, yours: withDip(48) })).toEqual([
      { what: 'item', theirs: 'removed 1 attitude', yours: 'dip of attitude: 40 → 48' },
    ])
  })

  it('is none for another problem', () => {
    expect(conflictsOf(problem('wrong-state', [{ id: base.id, base, theirs: null, yours: null }]))).toEqual(
      [],
    )
  })
})
