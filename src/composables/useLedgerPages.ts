import { ref, shallowRef, watch } from 'vue'
import { listRevisions, type LedgerFilter, type LedgerRow } from '@shared/api/ledger'
import type { Problem } from '@shared/api/problems'
import { ApiProblem, call } from '@/api/client'
import { useSheetStore } from '@/stores/sheet'
import { isSameFilter } from './ledger-filter'
import { joinPages } from './join-pages'

const PAGE = 50

/** Entries of the open sheet's ledger that a filter leaves, newest first: older ones page by page, new ones as they come. */
export function useLedgerPages(filter: () => LedgerFilter) {
  const sheet = useSheetStore()
  const entries = shallowRef<readonly LedgerRow[]>([])
  /** Older entries than this one are to be had; null at the ledger's beginning. */
  const next = ref<number | null>(null)
  const isLoading = ref(false)
  const problem = ref<Problem | null>(null)
  /** Counts questions, so that an answer to an earlier one is dropped. */
  let turn = 0

  async function read(before?: number): Promise<void> {
    const number = sheet.sheet?.number
    if (!number) return
    const mine = ++turn
    isLoading.value = true
    problem.value = null
    try {
      const query = { ...filter(), limit: PAGE, ...(before === undefined ? {} : { before }) }
      const page = await call(listRevisions, { params: { sheet: number }, query })
      if (mine !== turn) return
      const joined = joinPages({ entries: entries.value, next: next.value }, page)
      entries.value = joined.entries
      next.value = joined.next
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error
      if (mine === turn) problem.value = error.problem
    } finally {
      if (mine === turn) isLoading.value = false
    }
  }

  watch(
    [() => sheet.sheet?.number, filter, () => sheet.saved.revision],
    ([number, now], [numberBefore, before]) => {
      if (number !== numberBefore || !before || !isSameFilter(now, before)) {
        entries.value = []
        next.value = null
      }
      void read()
    },
    { immediate: true },
  )

  const readOlder = (): Promise<void> =>
    next.value === null || isLoading.value ? Promise.resolve() : read(next.value)

  return { entries, next, isLoading, problem, readOlder }
}
