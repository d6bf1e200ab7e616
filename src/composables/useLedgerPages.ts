import { computed, ref, shallowRef, watch } from 'vue'
import { listRevisions } from '@shared/api/ledger'
import type { Problem } from '@shared/api/problems'
import type { LedgerEntry } from '@shared/api/sheets'
import { ApiProblem, call } from '@/api/client'
import { useSheetStore } from '@/stores/sheet'

const PAGE = 50

/** Ledger entries of the open sheet, newest first: those the sheet store follows live, and older ones page by page. */
export function useLedgerPages() {
  const sheet = useSheetStore()
  const older = shallowRef<readonly LedgerEntry[]>([])
  const isLoading = ref(false)
  const problem = ref<Problem | null>(null)

  watch(
    () => sheet.sheet?.number,
    () => {
      older.value = []
      problem.value = null
    },
  )

  const entries = computed<readonly LedgerEntry[]>(() => {
    const oldest = sheet.entries.at(-1)?.revision ?? Infinity
    return [...sheet.entries, ...older.value.filter((entry) => entry.revision < oldest)]
  })
  /** A sheet's ledger begins with its creation, revision 1 or 0: nothing is older. */
  const hasOlder = computed(() => {
    const last = entries.value.at(-1)
    return last !== undefined && last.kind !== 'creation'
  })

  async function loadOlder(): Promise<void> {
    const number = sheet.sheet?.number
    const before = entries.value.at(-1)?.revision
    if (!number || before === undefined || isLoading.value) return
    isLoading.value = true
    problem.value = null
    try {
      const page = await call(listRevisions, { params: { sheet: number }, query: { before, limit: PAGE } })
      if (sheet.sheet?.number === number) older.value = [...older.value, ...page.entries]
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error
      problem.value = error.problem
    } finally {
      isLoading.value = false
    }
  }

  return { entries, hasOlder, isLoading, problem, loadOlder }
}
