import { z } from 'zod'
import { itemKinds } from '../items/item'
import { roles } from './accounts'
import { nothing, personSchema, sheetParams, timestamp } from './common'
import { endpoint } from './endpoint'
import { jobSchema } from './jobs'
import { ledgerEntrySchema } from './sheets'

export const decisionSchema = z.strictObject({
  decision: z.enum(['approved', 'returned']),
  by: personSchema,
  at: timestamp,
  note: z.string(),
})

const countSchema = z.strictObject({ kind: z.enum(itemKinds), items: z.number().int() })

/** What a revision holds, and how it differs from the edition before. */
export const revisionContentsSchema = z
  .strictObject({
    revision: z.number().int(),
    /** Revision of the edition before; 0 for a first edition. */
    since: z.number().int(),
    contents: z.array(countSchema),
    /** Items put, changed and removed since the edition before, per kind; kinds without any are left out. */
    differences: z.array(
      z.strictObject({
        kind: z.enum(itemKinds),
        added: z.number().int(),
        changed: z.number().int(),
        removed: z.number().int(),
      }),
    ),
    /** Everyone whose changes are in it. */
    authors: z.array(personSchema),
    /** Ledger entries since the edition before, newest first. */
    entries: z.array(ledgerEntrySchema),
  })
  .meta({ id: 'RevisionContents' })
export type RevisionContents = z.infer<typeof revisionContentsSchema>

/** What an editor hands to an approver: one revision, pinned by its digest. */
export const submissionSchema = z
  .strictObject({
    id: z.uuid(),
    /** SHA-256 of exactly what would be released: the sheet and every item at the revision. */
    digest: z.string(),
    submittedBy: personSchema,
    at: timestamp,
    message: z.string(),
    ...revisionContentsSchema.shape,
    decision: decisionSchema.nullable(),
    /** Why you may not decide or release it; null if you may. */
    obstacle: z.string().nullable(),
    /** The release job of an approved submission, once asked for. */
    job: jobSchema.nullable(),
    /** Number of the edition that it became; null until it is released. */
    edition: z.number().int().nullable(),
  })
  .meta({ id: 'Submission' })
export type Submission = z.infer<typeof submissionSchema>

export const getSubmission = endpoint({
  id: 'getSubmission',
  room: 'review',
  method: 'get',
  path: '/sheets/{sheet}/submission',
  summary: 'The latest submission; null if there was none',
  access: { to: 'members', roles },
  params: sheetParams,
  query: nothing,
  body: nothing,
  answer: submissionSchema.nullable(),
  problems: ['not-found'],
})

export const getSubmittable = endpoint({
  id: 'getSubmittable',
  room: 'review',
  method: 'get',
  path: '/sheets/{sheet}/submission/next',
  summary: 'What a submission of the latest revision would hold',
  access: { to: 'members', roles },
  params: sheetParams,
  query: nothing,
  body: nothing,
  answer: z.strictObject({
    ...revisionContentsSchema.shape,
    /** Why it cannot be submitted as it is; null if it can. */
    obstacle: z.string().nullable(),
  }),
  problems: ['not-found'],
})

export const submitSheet = endpoint({
  id: 'submitSheet',
  room: 'review',
  method: 'post',
  path: '/sheets/{sheet}/submission',
  summary: 'Submit a revision for review; the sheet is read-only until it is decided',
  access: { to: 'members', roles: ['editor'] },
  params: sheetParams,
  query: nothing,
  body: z.strictObject({ revision: z.number().int(), message: z.string().trim().max(2000).default('') }),
  answer: submissionSchema,
  status: 201,
  problems: ['invalid-input', 'not-found', 'not-allowed', 'wrong-state', 'cannot-print', 'stale-form'],
})

export const decideSubmission = endpoint({
  id: 'decideSubmission',
  room: 'review',
  method: 'post',
  path: '/sheets/{sheet}/submission/decision',
  summary: 'Approve a submission, or return it with a note',
  access: { to: 'members', roles: ['approver'] },
  params: sheetParams,
  query: nothing,
  body: z
    .strictObject({
      decision: z.enum(['approved', 'returned']),
      digest: z.string(),
      note: z.string().trim().max(2000).default(''),
    })
    .refine((body) => body.decision === 'approved' || body.note !== '', {
      message: 'Say what has to change.',
      path: ['note'],
    }),
  answer: submissionSchema,
  problems: [
    'invalid-input',
    'not-found',
    'not-allowed',
    'own-work',
    'wrong-state',
    'already-decided',
    'digest-changed',
    'cannot-print',
    'stale-form',
  ],
})

export const releaseSheet = endpoint({
  id: 'releaseSheet',
  room: 'review',
  method: 'post',
  path: '/sheets/{sheet}/release',
  summary: 'Release the approved revision as the next edition, in a job',
  access: { to: 'members', roles: ['approver'] },
  params: sheetParams,
  query: nothing,
  body: nothing,
  answer: jobSchema,
  status: 202,
  problems: ['not-found', 'not-allowed', 'own-work', 'wrong-state', 'stale-form'],
})
