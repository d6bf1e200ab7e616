import { describe, expect, it } from 'vitest'
import type { LedgerEntry } from '@shared/api/sheets'
import { byDay } from '@/components/ledger/by-day'

const entry = (revision: number, at: string): LedgerEntry => ({
  revision,
  kind: 'edit',
  author: { id: '00000000-0000-4000-8000-000000000001', name: 'Rosa Kelp', initials: 'RK' },
  at,
  message: '',
  what: 'drew 1 contact',
  changed: 1,
})

describe('the ledger by day', () => {
  it('keeps the order and makes one heading of each day', () => {
    const days = byDay([
      entry(4, '2026-03-04T15:00:00Z'),
      entry(3, '2026-03-04T10:00:00Z'),
      entry(2, '2026-03-01T12:00:00Z'),
    ])
    expect(days.map((day) => [day.day, day.entries.map((each) => each.revision)])).toEqual([
      ['4 March 2026', [4, 3]],
      ['1 March 2026', [2]],
    ])
  })

  it('is empty for an empty ledger', () => {
    expect(byDay([])).toEqual([])
  })
})
