import { composeEdits, editedId, toChanges, type ChangeSet, type Edit } from '@shared/changes/change-set'

/** Edits that wait to be sent as one change set. Once it has a `request` it is frozen: key and body were stored before
 *  the first sending, and every retry sends the same ones. */
export interface Batch {
  /** Revision that the edits were made on. */
  base: number
  edits: readonly Edit[]
  /** One sentence per gesture, in order. */
  labels: readonly string[]
  /** Why the person makes these edits, where they said so: the ledger's message instead of the labels. */
  whys?: readonly string[]
  request: { key: string; body: ChangeSet } | null
}

/** Longest message that a ledger entry takes, characters. */
const LONGEST_MESSAGE = 500

/** Edits as a gesture makes them. */
export interface Added {
  base: number
  label: string
  edits: readonly Edit[]
  why?: string
}

/** Adds edits to the last batch, or opens a new one where the last is frozen. Edits that take each other back leave no
 *  batch at all: what was never sent and then undone is never sent. */
export function addEdits(batches: readonly Batch[], added: Added): Batch[] {
  const last = batches.at(-1)
  if (!last || last.request) {
    const { base, edits, label, why } = added
    return [...batches, { base, edits, labels: [label], ...withWhy([], why), request: null }]
  }
  const edits = composeEdits(last.edits, added.edits)
  const before = batches.slice(0, -1)
  if (edits.length === 0) return before
  const labels = [...last.labels, added.label]
  return [...before, { ...last, edits, labels, ...withWhy(last.whys ?? [], added.why) }]
}

/** Each reason once, in order; nothing where none was given. */
function withWhy(whys: readonly string[], why: string | undefined): Pick<Batch, 'whys'> {
  const all = [...new Set([...whys, ...(why ? [why] : [])])]
  return all.length > 0 ? { whys: all } : {}
}

/** The first batch with its request fixed under a key; batches without a first one stay as they are. */
export function freezeFirst(batches: readonly Batch[], key: string): Batch[] {
  const [first, ...rest] = batches
  if (!first || first.request) return [...batches]
  const body: ChangeSet = {
    base: first.base,
    message: messageOf(first.whys ?? first.labels),
    changes: toChanges(first.edits),
  }
  return [{ ...first, request: { key, body } }, ...rest]
}

/** The first batch made free again after a refusal: it may be changed, and will be sent under another key. */
export function thawFirst(batches: readonly Batch[]): Batch[] {
  const [first, ...rest] = batches
  return first ? [{ ...first, request: null }, ...rest] : []
}

/** Moves the base of unsent batches along with the revision that is known. A batch stays behind where somebody else
 *  changed one of its items in between, and one that stayed behind before stays there: the server must see its conflict.
 *  @param foreign ids that others changed after `from` */
export function advanceBase(
  batches: readonly Batch[],
  { from, to, foreign }: { from: number; to: number; foreign: ReadonlySet<string> },
): Batch[] {
  return batches.map((batch) => {
    const staysBehind = batch.base !== from || batch.edits.some((edit) => foreign.has(editedId(edit)))
    return batch.request || staysBehind ? batch : { ...batch, base: to }
  })
}

/** Batches without the edits of some items; empty batches go. */
export const dropItems = (batches: readonly Batch[], ids: ReadonlySet<string>): Batch[] =>
  batches
    .map((batch) => ({ ...batch, edits: batch.edits.filter((edit) => !ids.has(editedId(edit))) }))
    .filter((batch) => batch.edits.length > 0)

/** All ids that batches touch. */
export const touchedIds = (batches: readonly Batch[]): string[] => [
  ...new Set(batches.flatMap((batch) => batch.edits.map(editedId))),
]

/** How many gestures wait: what a person counts as changes. */
export const countWaiting = (batches: readonly Batch[]): number =>
  batches.reduce((sum, batch) => sum + batch.labels.length, 0)

/** One sentence for the ledger from the gestures of a batch, with equal ones counted and the rest named by number
 *  where the message would grow too long. */
export function messageOf(labels: readonly string[]): string {
  const counts = new Map<string, number>()
  for (const label of labels) counts.set(label, (counts.get(label) ?? 0) + 1)
  const parts = [...counts].map(([label, count]) => (count > 1 ? `${label} (${count} times)` : label))
  let message = ''
  for (const [index, part] of parts.entries()) {
    const next = message === '' ? part : `${message}; ${part}`
    const rest = `; and ${parts.length - index} more`
    if (next.length > LONGEST_MESSAGE - rest.length) {
      return message === '' ? part.slice(0, LONGEST_MESSAGE) : message + rest
    }
    message = next
  }
  return message
}
