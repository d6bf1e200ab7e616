import { describe, expect, it } from 'vitest'
import { byDay } from '@/components/ledger/by-day'
import { aRow, rosa, tove } from '../../../../support/ledger-rows'

describe('the ledger by day and person', () => {
  it('keeps the order and makes one heading of each day', () => {
    const days = byDay([
      aRow(4, { at: '2026-03-04T15:00:00Z' }),
      aRow(3, { at: '2026-03-04T10:00:00Z' }),
      aRow(2, { at: '2026-03-01T12:00:00Z' }),
    ])
    const told = days.map(({ day, people }) => [
      day,
      people.flatMap((run) => run.entries.map((each) => each.revision)),
    ])
    expect(told).toEqual([
      ['4 March 2026', [4, 3]],
      ['1 March 2026', [2]],
    ])
  })

  it('names a person once for entries in a row, and again after somebody else', () => {
    const [day] = byDay([
      aRow(4, { author: rosa }),
      aRow(3, { author: rosa }),
      aRow(2, { author: tove }),
      aRow(1, { author: rosa }),
    ])
    expect(day?.people.map(({ author, entries }) => [author.name, entries.length])).toEqual([
      ['Rosa Kelp', 2],
      ['Tove Orr', 1],
      ['Rosa Kelp', 1],
    ])
  })

  it('is empty for an empty ledger', () => {
    expect(byDay([])).toEqual([])
  })
})
