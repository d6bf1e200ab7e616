import { z } from 'zod'
import { differenceSchema } from '../changes/differences'
import { itemKinds } from '../items/item'
import { nothing, sheetParams } from './common'
import { differenceCountSchema } from './comparisons'
import { endpoint } from './endpoint'
import { ledgerEntrySchema } from './sheets'

const revision = z.number().int().min(1)

/** What to go back to. Whatever it is, going back is a new entry; nothing is taken out of the ledger. */
export const restoreSchema = z
  .discriminatedUnion('what', [
    /** The whole sheet as it was at a revision. */
    z.strictObject({ what: z.literal('revision'), revision }),
    /** One item as it was at a revision; it goes if it was not there. */
    z.strictObject({ what: z.literal('item'), item: z.uuid(), revision }),
    /** Everything that one entry changed, an intake say, as it was before that entry. */
    z.strictObject({ what: z.literal('entry'), revision }),
  ])
  .meta({ id: 'Restore' })
export type Restore = z.infer<typeof restoreSchema>

/** An item that was changed after the state gone back to, and the entries that did it, newest first. */
export const laterChangeSchema = z
  .strictObject({
    id: z.uuid(),
    kind: z.enum(itemKinds),
    name: z.string(),
    entries: z.array(ledgerEntrySchema),
  })
  .meta({ id: 'LaterChange' })
export type LaterChange = z.infer<typeof laterChangeSchema>

export const previewRestore = endpoint({
  id: 'previewRestore',
  room: 'ledger',
  method: 'post',
  path: '/sheets/{sheet}/restores/preview',
  summary: 'What going back would change and which later changes it would undo; changes nothing',
  access: { to: 'members', roles: ['compiler', 'editor'] },
  params: sheetParams,
  query: nothing,
  body: restoreSchema,
  answer: z.strictObject({
    /** Revision that this was looked at on: send it as `base`. */
    base: z.number().int(),
    counts: z.array(differenceCountSchema),
    /** The first of them. */
    differences: z.array(differenceSchema),
    /** Later changes that would be undone too: the first items of them. */
    later: z.array(laterChangeSchema),
    /** How many items were changed later. */
    laterItems: z.number().int(),
    /** What the entry would say unless another message is given. */
    message: z.string(),
    /** Why it cannot be done, whatever is accepted; null where it can. */
    obstacle: z.string().nullable(),
  }),
  problems: ['invalid-input', 'not-found', 'not-allowed', 'stale-form'],
})
export type RestorePreview = z.infer<typeof previewRestore.answer>

export const restoreSheet = endpoint({
  id: 'restoreSheet',
  room: 'ledger',
  method: 'post',
  path: '/sheets/{sheet}/restores',
  summary:
    'Go back to a revision, with one item, or behind one entry, as a new entry. Send an Idempotency-Key header (a UUID)',
  access: { to: 'members', roles: ['compiler', 'editor'] },
  params: sheetParams,
  query: nothing,
  body: z.strictObject({
    restore: restoreSchema,
    /** Revision that the preview was of. Changes after it are never undone. */
    base: z.number().int().min(0),
    message: z.string().trim().max(500).default(''),
    /** Whether later changes that the preview named may be undone. */
    undoLater: z.boolean().default(false),
  }),
  answer: z.strictObject({ revision: z.number().int(), entry: ledgerEntrySchema }),
  status: 201,
  problems: [
    'invalid-input',
    'not-found',
    'not-allowed',
    'wrong-state',
    'later-changes',
    'nothing-to-restore',
    'cannot-restore',
    'key-reused',
    'stale-form',
  ],
})
export type RestoreRequest = z.output<typeof restoreSheet.body>
