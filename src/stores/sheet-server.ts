import { getFaces } from '@shared/api/faces'
import { listMembers } from '@shared/api/accounts'
import { getChanges, getItems, listRevisions, postRevision } from '@shared/api/ledger'
import { getSheet } from '@shared/api/sheets'
import type { ChangeSet } from '@shared/changes/change-set'
import type { z } from 'zod'
import { ApiProblem, call } from '@/api/client'
import type { Delivery } from '@/offline/sender'

export type RevisionAnswer = z.infer<typeof postRevision.answer>
export type ChangesAnswer = z.infer<typeof getChanges.answer>

/** Ledger entries that the workplace shows without asking for more. */
const FIRST_ENTRIES = 30

/** Everything that opening a sheet reads. */
export async function readSheet(number: string) {
  const params = { sheet: number }
  const [sheet, items, ledger, members] = await Promise.all([
    call(getSheet, { params }),
    call(getItems, { params, query: {} }),
    call(listRevisions, { params, query: { limit: FIRST_ENTRIES } }),
    call(listMembers, { params }),
  ])
  return { sheet, ...items, entries: ledger.entries, members }
}

export const readSheetOnly = (number: string) => call(getSheet, { params: { sheet: number } })

export const readChanges = (number: string, since: number): Promise<ChangesAnswer> =>
  call(getChanges, { params: { sheet: number }, query: { since } })

export const readFaces = (number: string) => call(getFaces, { params: { sheet: number } })

/** Posts one change set. Without an answer, or with one that says the server could not do its work just now, nobody
 *  knows more than before: the same key may ask again. */
export async function deliver(
  number: string,
  body: ChangeSet,
  key: string,
): Promise<Delivery<RevisionAnswer>> {
  try {
    const answer = await call(postRevision, {
      params: { sheet: number },
      body,
      headers: { 'Idempotency-Key': key },
    })
    return { outcome: 'done', answer }
  } catch (error) {
    if (!(error instanceof ApiProblem)) return { outcome: 'unreachable' }
    const { problem } = error
    const passing = problem.status >= 500 || problem.status === 429
    return passing ? { outcome: 'unreachable' } : { outcome: 'refused', problem }
  }
}
