import { ref, shallowRef } from 'vue'
import type { Problem } from '@shared/api/problems'
import { previewRestore, restoreSheet, type Restore, type RestorePreview } from '@shared/api/restores'
import type { LedgerEntry } from '@shared/api/sheets'
import { ApiProblem, call } from '@/api/client'
import { newId } from '@/offline/new-id'
import { useSheetStore } from '@/stores/sheet'

/** Going back to a revision, with an item or behind an entry: first what it would do, then doing it. */
export function useRestore(restore: Restore) {
  const sheet = useSheetStore()
  const preview = shallowRef<RestorePreview | null>(null)
  const problem = ref<Problem | null>(null)
  const isBusy = ref(false)
  /** The entry that was written. */
  const done = shallowRef<LedgerEntry | null>(null)
  /** The call that may be under way: sent again after a lost answer, it has to go by the same key. */
  let sent = { body: '', key: '' }

  async function take(step: (params: { sheet: string }) => Promise<void>): Promise<void> {
    const number = sheet.sheet?.number
    if (!number || isBusy.value) return
    isBusy.value = true
    problem.value = null
    try {
      await step({ sheet: number })
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error
      problem.value = error.problem
    } finally {
      isBusy.value = false
    }
  }

  /** Looks at what it would do now. */
  const look = (): Promise<void> =>
    take(async (params) => {
      preview.value = await call(previewRestore, { params, body: restore })
    })

  /** Goes back as previewed. */
  const goBack = (message: string, undoLater: boolean): Promise<void> =>
    take(async (params) => {
      const body = { restore, base: preview.value?.base ?? 0, message, undoLater }
      done.value = (
        await call(restoreSheet, { params, body, headers: { 'Idempotency-Key': keyOf(body) } })
      ).entry
    })

  function keyOf(body: object): string {
    const text = JSON.stringify(body)
    if (sent.body !== text) sent = { body: text, key: newId() }
    return sent.key
  }

  return { preview, problem, isBusy, done, look, goBack }
}
