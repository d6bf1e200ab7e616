import { describe, expect, it } from 'vitest'
import { auditEventSchema, auditKinds } from '@shared/audit/audit-event'
import { auditKindWords, describeAudit } from '@shared/audit/audit-words'

describe('the audit trail in words', () => {
  it('says what was done, going on from the name of who did it', () => {
    const before = ['compiler']
    expect(
      describeAudit({
        kind: 'membership',
        email: 'nan@merrow.example',
        before,
        after: ['compiler', 'editor'],
      }),
    ).toBe('changed the roles of nan@merrow.example: compiler → compiler, editor')
    expect(describeAudit({ kind: 'membership', email: 'nan@merrow.example', before, after: [] })).toBe(
      'changed the roles of nan@merrow.example: compiler → none',
    )
    expect(describeAudit({ kind: 'decision', decision: 'returned', revision: 12, digest: 'a' })).toBe(
      'returned revision 12',
    )
    expect(describeAudit({ kind: 'sign-in-refused', email: 'x', address: '127.0.0.1' })).toBe(
      'was refused to sign in as “x” from 127.0.0.1',
    )
  })

  it('has a word for every kind, and refuses an event that lacks what its kind has', () => {
    expect(Object.keys(auditKindWords).sort()).toEqual([...auditKinds].sort())
    expect(auditEventSchema.safeParse({ kind: 'submission', revision: 3 }).success).toBe(false)
  })
})
