import { z } from 'zod'

const revision = z.number().int()
const roles = z.array(z.string())
/** Network address that a call came from, as the server saw it. */
const address = z.string()

/** Everything that the audit trail keeps: what is done beside the changes of sheets, which the ledger keeps. */
export const auditEventSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('sign-in'), email: z.string(), address }),
  z.strictObject({ kind: z.literal('sign-in-refused'), email: z.string(), address }),
  z.strictObject({ kind: z.literal('sign-out'), address }),
  z.strictObject({ kind: z.literal('invitation'), email: z.string(), administrator: z.boolean() }),
  z.strictObject({ kind: z.literal('password-set'), email: z.string(), purpose: z.string() }),
  z.strictObject({
    kind: z.literal('membership'),
    email: z.string(),
    before: roles,
    after: roles,
  }),
  z.strictObject({ kind: z.literal('submission'), revision, digest: z.string() }),
  z.strictObject({
    kind: z.literal('decision'),
    decision: z.enum(['approved', 'returned']),
    revision,
    digest: z.string(),
  }),
  z.strictObject({ kind: z.literal('release-asked'), revision }),
  z.strictObject({
    kind: z.literal('release'),
    edition: z.number().int(),
    revision,
    digest: z.string(),
  }),
  z.strictObject({ kind: z.literal('download'), path: z.string() }),
  z.strictObject({ kind: z.literal('revision-named'), revision, name: z.string() }),
  z.strictObject({ kind: z.literal('revision-unnamed'), revision, name: z.string() }),
])
export type AuditEvent = z.infer<typeof auditEventSchema>
export type AuditKind = AuditEvent['kind']

export const auditKinds = auditEventSchema.options.map((option) => option.shape.kind.value)
