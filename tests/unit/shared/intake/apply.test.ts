import { expect, it } from 'vitest'
import { aLine, aMapping, aPoint, applied, aRecord } from '../../../support/intake-records'

it('ends every part of every record in exactly one of three counts', () => {
  const records = [
    aRecord({ Type: 'contact' }, [aLine([3, 45], [3.01, 45]), aLine([3, 45], [3, 45])]),
    aRecord({ Type: 'road' }, [aLine([3, 45], [3.01, 45])]),
    aRecord({}, [aPoint(3, 45)]),
    aRecord({}, []),
  ]
  const lines = {
    typeColumn: 'Type',
    types: { contact: { kind: 'contact' } },
    otherwise: { kind: 'leave-out' },
  } as const
  const { items, refusals, leftOut } = applied(records, aMapping({ lines }))
  expect([items.length, refusals.length, leftOut]).toEqual([2, 2, 1])
})
