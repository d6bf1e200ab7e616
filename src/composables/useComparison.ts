import { computed, ref, shallowRef, watch } from 'vue'
import { compareStates, type DifferenceCount, type NamedState } from '@shared/api/comparisons'
import { getItems } from '@shared/api/ledger'
import type { Problem } from '@shared/api/problems'
import type { Difference } from '@shared/changes/differences'
import type { Item } from '@shared/items/item'
import { ApiProblem, call } from '@/api/client'
import { useSheetStore } from '@/stores/sheet'

/** Differences read at a time. */
const PAGE = 2000

/** What differs between two states of the open sheet, page by page, and what is the same in both.
 *  @param states a revision's number, `edition-2` or `latest`; the latest is followed as the sheet changes */
export function useComparison(states: () => { from: string; to: string }) {
  const sheet = useSheetStore()
  const differences = shallowRef<readonly Difference[]>([])
  const counts = shallowRef<readonly DifferenceCount[]>([])
  /** The two states as revisions; null before the answer. */
  const compared = shallowRef<{ from: NamedState; to: NamedState } | null>(null)
  /** Everything on the sheet in the later state. */
  const items = shallowRef<readonly Item[]>([])
  const next = ref<string | null>(null)
  const isLoading = ref(false)
  const problem = ref<Problem | null>(null)
  let turn = 0

  const same = computed(() => {
    const differing = new Set(differences.value.map(({ id }) => id))
    return items.value.filter(({ id }) => !differing.has(id))
  })

  async function read(after?: string): Promise<void> {
    const number = sheet.sheet?.number
    if (!number) return
    const mine = ++turn
    isLoading.value = true
    problem.value = null
    try {
      const params = { sheet: number }
      const query = { ...states(), limit: PAGE, ...(after === undefined ? {} : { after }) }
      const page = await call(compareStates, { params, query })
      if (mine !== turn) return
      if (after === undefined) await begin(params, page.to.revision, mine)
      if (mine !== turn) return
      differences.value = after === undefined ? page.differences : [...differences.value, ...page.differences]
      counts.value = page.counts ?? counts.value
      compared.value = { from: page.from, to: page.to }
      next.value = page.next
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error
      if (mine !== turn) return
      problem.value = error.problem
      if (after === undefined) forget()
    } finally {
      if (mine === turn) isLoading.value = false
    }
  }

  /** Nothing of other states stays under the names of these. */
  function forget(): void {
    differences.value = []
    counts.value = []
    items.value = []
    compared.value = null
    next.value = null
  }

  /** What the later state has on the sheet; the open sheet itself where that is it. */
  async function begin(params: { sheet: string }, revision: number, mine: number): Promise<void> {
    const isOpen = revision === sheet.saved.revision && sheet.saved.waiting === 0
    const found = isOpen ? sheet.all() : (await call(getItems, { params, query: { revision } })).items
    if (mine === turn) items.value = found
  }

  watch(
    [
      () => sheet.sheet?.number,
      () => states().from,
      () => states().to,
      () => (Object.values(states()).includes('latest') ? sheet.saved.revision : 0),
    ],
    () => void read(),
    { immediate: true },
  )

  const readMore = (): Promise<void> =>
    next.value === null || isLoading.value ? Promise.resolve() : read(next.value)

  return { differences, counts, compared, same, next, isLoading, problem, readMore }
}
