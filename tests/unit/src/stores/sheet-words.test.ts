import { describe, expect, it } from 'vitest'
import { changedSinceSentence, readOnlyReason } from '@/stores/sheet-words'
import { aLine } from '../../../support/sheet-items'

const contact = aLine(
  'contact',
  [
    [0, 0],
    [10, 0],
  ],
  {},
)

describe('sentences', () => {
  it('say who changed an item since, and when', () => {
    const entry = {
      revision: 12,
      kind: 'edit' as const,
      author: { id: contact.id, name: 'Tove Orr', initials: 'TO' },
      at: '2026-12-01T09:05:00.000Z',
      message: '',
      what: 'drew 1 contact',
      changed: 1,
    }
    expect(changedSinceSentence(contact, [entry])).toMatch(
      /^Tove Orr changed this contact since \(revision 12, /,
    )
  })

  it('say why a sheet cannot be changed, by role and by state', () => {
    expect(readOnlyReason('drafting', ['compiler'])).toBeNull()
    expect(readOnlyReason('drafting', ['approver'])).toMatch(/role/)
    expect(readOnlyReason('submitted', ['editor'])).toMatch(/submitted/)
  })
})
