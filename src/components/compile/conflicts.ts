import { z } from 'zod'
import type { Problem } from '@shared/api/problems'
import { describeChanges } from '@shared/changes/describe-changes'
import { itemSchema, type Item } from '@shared/items/item'

const conflictSchema = z.object({
  id: z.uuid(),
  base: itemSchema.nullable(),
  theirs: itemSchema.nullable(),
  yours: itemSchema.nullable(),
})

/** One item that two people changed. */
export type Conflict = z.infer<typeof conflictSchema>

/** The items of a conflict that the server reported; empty for any other problem. */
export function conflictsOf(problem: Problem | undefined): Conflict[] {
  if (!problem?.type.endsWith('/item-conflict')) return []
  return (problem.items ?? []).flatMap((item) => conflictSchema.safeParse(item).data ?? [])
}

/** What one side did to the item, in words. */
export const sideWords = (base: Item | null, after: Item | null): string =>
  describeChanges([{ before: base, after }])
