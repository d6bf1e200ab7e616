import { describe, expect, it } from 'vitest'
import { joinPages, type LedgerPage } from '@/composables/join-pages'
import { aRow } from '../../../support/ledger-rows'

const page = (revisions: number[], next: number | null): LedgerPage => ({
  entries: revisions.map((revision) => aRow(revision)),
  next,
})
const told = ({ entries, next }: LedgerPage) => [entries.map(({ revision }) => revision), next]

describe('pages of the ledger', () => {
  it('go on below what is known', () => {
    expect(told(joinPages(page([9, 8], 8), page([7, 6], 6)))).toEqual([[9, 8, 7, 6], 6])
  })

  it('come on top where the ledger has grown, and keep older ones', () => {
    expect(told(joinPages(page([9, 8, 7, 6], 6), page([10, 9], 9)))).toEqual([[10, 9, 8, 7, 6], 6])
  })

  it('begin anew where entries may lie between the newest page and what is known', () => {
    expect(told(joinPages(page([9, 8], 8), page([14, 13], 13)))).toEqual([[14, 13], 13])
  })

  it('take over what an entry says now', () => {
    const joined = joinPages(page([9, 8], 8), { entries: [aRow(9, { message: 'why' }), aRow(8)], next: 8 })
    expect(joined.entries[0]?.message).toBe('why')
    expect(joined.entries).toHaveLength(2)
  })

  it('end at the beginning of the ledger', () => {
    expect(told(joinPages(page([2], 2), page([1], null)))).toEqual([[2, 1], null])
    expect(told(joinPages(page([], null), page([], null)))).toEqual([[], null])
  })
})
