import { expect, it } from 'vitest'
import { MAX_COLUMNS, summarizeColumns } from '@shared/intake/columns'
import { aLine, aPoint, aRecord } from '../../../support/intake-records'

it('counts values by form, most frequent first, with the missing ones', () => {
  const records = [
    aRecord({ Type: 'fault' }, [aLine()]),
    aRecord({ Type: ' fault ' }, [aLine()]),
    aRecord({ Type: 'bedding' }, [aPoint(3, 45)]),
    aRecord({ Type: null }, [aLine()]),
  ]
  expect(summarizeColumns(records)).toEqual([
    {
      name: 'Type',
      samples: ['fault', 'bedding'],
      filled: 3,
      numbers: null,
      values: [
        { value: 'fault', count: 2, points: 0, lines: 2 },
        { value: 'bedding', count: 1, points: 1, lines: 0 },
        { value: '', count: 1, points: 0, lines: 1 },
      ],
    },
  ])
})

it('gives the range of numbers and does not list too many values', () => {
  const records = Array.from({ length: 100 }, (_, index) => aRecord({ strike: index }))
  const [strike] = summarizeColumns(records)
  expect(strike).toMatchObject({ values: [], filled: 100, numbers: { count: 100, least: 0, greatest: 99 } })
})

it('stays bounded for a file with ten thousand columns', () => {
  const wide = Object.fromEntries(Array.from({ length: 10_000 }, (_, index) => [`c${index}`, index]))
  expect(summarizeColumns([aRecord(wide)])).toHaveLength(MAX_COLUMNS)
})
