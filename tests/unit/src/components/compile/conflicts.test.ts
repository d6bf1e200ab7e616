import { describe, expect, it } from 'vitest'
import type { Problem } from '@shared/api/problems'
import type { Item } from '@shared/items/item'
import { combine, conflictsOf, rowsOf } from '@/components/compile/conflicts'
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
const line = aLine('contact', [[0, 0], [100, 0], [200, 0]], {}) // prettier-ignore
const bent: Item = { ...line, geometry: { ...line.geometry, coordinates: [[0, 0], [100, 5], [200, 0]] } } // prettier-ignore
const named: Item = { ...line, properties: { ...line.properties, name: 'Skua' } }

describe('a conflict', () => {
  it('takes both sides as they are now, not as they were when it was refused', () => {
    const sides = { theirs: () => withDip(53), mine: () => withDip(48) }
    const stale = [{ id: base.id, base, theirs: withDip(50), yours: withDip(41) }]
    const [conflict] = conflictsOf(problem('item-conflict', stale), sides)
    expect(conflict && rowsOf(conflict)).toEqual([
      { field: { property: 'dip' }, what: 'dip', theirs: '53', mine: '48' },
    ])
  })

  it('is none for another problem', () => {
    const sides = { theirs: () => undefined, mine: () => base }
    expect(conflictsOf(problem('wrong-state', [{ id: base.id, base }]), sides)).toEqual([])
  })

  it('says what each did to the line, apart from other fields, and who alone changed what', () => {
    expect(rowsOf({ id: line.id, base: line, theirs: bent, mine: named })).toEqual([
      {
        field: 'geometry',
        what: 'line',
        theirs: 'moved 1 vertex of contact',
        mine: 'as it was',
        changedBy: 'theirs',
      },
      { field: { property: 'name' }, what: 'name', theirs: 'none', mine: 'Skua', changedBy: 'mine' },
    ])
  })

  it('says that one side removed the item', () => {
    expect(rowsOf({ id: base.id, base, theirs: null, mine: withDip(48) })).toEqual([
      { field: 'item', what: 'item', theirs: 'removed 1 attitude', mine: 'dip of attitude: 40 → 48' },
    ])
  })
})

describe('the combination', () => {
  const conflict = { id: line.id, base: line, theirs: bent, mine: named }

  it('has every row from the side that was chosen', () => {
    expect(combine(conflict, (row) => row.changedBy ?? 'mine')).toEqual({
      ...named,
      geometry: bent.geometry,
    })
    expect(combine(conflict, () => 'mine')).toEqual(named)
    expect(combine(conflict, () => 'theirs')).toEqual(bent)
  })

  it('removes the item, or keeps it, as a whole', () => {
    const removed = { id: line.id, base: line, theirs: null, mine: named }
    expect(combine(removed, () => 'theirs')).toBeNull()
    expect(combine(removed, () => 'mine')).toEqual(named)
  })
})
