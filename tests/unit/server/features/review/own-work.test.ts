import { expect, it } from 'vitest'
import type { LedgerEntry } from '@shared/api/sheets'
import { ownWork } from '../../../../../server/features/review/own-work'

const person = (name: string) => ({ id: name, name, initials: name.slice(0, 2) })
const entry = (revision: number, author: string): LedgerEntry => ({
  revision,
  kind: 'edit',
  author: person(author),
  at: '2026-12-01T10:00:00.000Z',
  message: `moved contact ${revision}`,
  what: 'drew 1 contact',
  changed: 1,
})
const submission = { submittedBy: person('Orr'), revision: 9 }

it('lets an approver decide who has nothing in it', () => {
  expect(ownWork(person('Marr'), submission, [entry(8, 'Kelp'), entry(7, 'Orr')])).toBeNull()
})

it('stops whoever submitted it', () => {
  expect(ownWork(person('Orr'), submission, [])).toContain('You submitted revision 9')
})

it('stops whoever changed something, and names what', () => {
  const entries = [9, 8, 7, 6].map((revision) => entry(revision, 'Marr'))
  expect(ownWork(person('Marr'), submission, entries)).toBe(
    'Changes of yours are in it: revision 9 (“moved contact 9”), revision 8 (“moved contact 8”) and 2 more. Another approver has to look at it.',
  )
})
