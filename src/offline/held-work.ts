import type { Problem } from '@shared/api/problems'
import { composeEdits, editedId, type Edit } from '@shared/changes/change-set'
import { isSame } from '@shared/changes/same-value'
import { addEdits, thawFirst, touchedIds, type Added, type Batch } from './batches'

/** Edits that are not sent because somebody else changed their items too: they wait for a decision, and hold nothing up. */
export interface HeldWork {
  batch: Batch
  /** What the server said of them. */
  problem: Problem
}

/** Takes the refused first batch out of the queue, and with it what later ones did to the same items. */
export function holdFirst(
  batches: readonly Batch[],
  problem: Problem,
): { held: HeldWork[]; queue: readonly Batch[] } {
  const [first, ...rest] = thawFirst(batches)
  if (!first) return { held: [], queue: [] }
  let batch = first
  const queue: Batch[] = []
  for (const later of rest) {
    if (touches(batch, later.edits)) batch = joined(batch, later)
    else queue.push(later)
  }
  return { held: batch.edits.length > 0 ? [{ batch, problem }] : [], queue }
}

/** Held work with edits that touch its items; undefined where they touch none, and belong in the queue. */
export function addToHeld(held: readonly HeldWork[], added: Added): HeldWork[] | undefined {
  const at = held.findIndex(({ batch }) => touches(batch, added.edits))
  const found = held[at]
  if (!found) return undefined
  const [batch] = addEdits([found.batch], added)
  return held.toSpliced(at, 1, ...(batch ? [{ ...found, batch }] : []))
}

/** What becomes of an item that two people changed: `before` as it is now, `after` as it was decided to be. */
export type Decision = Edit

/** A batch with what was decided on its items, on top of a revision; undefined where nothing is left to send. */
export function decideBatch(
  batch: Batch,
  { revision, decisions }: { revision: number; decisions: ReadonlyMap<string, Decision> },
): Batch | undefined {
  const decided = [...decisions.values()].filter(({ before, after }) => !isSame(before, after))
  const undisputed = batch.edits.filter((edit) => !decisions.has(editedId(edit)))
  const edits = [...undisputed, ...decided]
  return edits.length > 0 ? { ...batch, base: revision, edits, request: null } : undefined
}

function touches(batch: Batch, edits: readonly Edit[]): boolean {
  const ids = new Set(touchedIds([batch]))
  return edits.some((edit) => ids.has(editedId(edit)))
}

const joined = (first: Batch, second: Batch): Batch => ({
  ...first,
  edits: composeEdits(first.edits, second.edits),
  labels: [...first.labels, ...second.labels],
  ...(first.whys || second.whys ? { whys: [...(first.whys ?? []), ...(second.whys ?? [])] } : {}),
})
