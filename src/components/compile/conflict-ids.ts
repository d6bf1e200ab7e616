import { z } from 'zod'
import type { Problem } from '@shared/api/problems'

/** An item in conflict, as the ledger's refusal names it: by id, or as the item itself. */
const conflictSchema = z.union([z.uuid(), z.looseObject({ id: z.uuid() })])

/** Ids of the items that a refusal is about. */
export function conflictIds(problem: Problem | undefined): string[] {
  return (problem?.items ?? []).flatMap((entry) => {
    const read = conflictSchema.safeParse(entry).data
    if (read === undefined) return []
    return [typeof read === 'string' ? read : read.id]
  })
}
