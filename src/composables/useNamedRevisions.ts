import { computed, ref, shallowRef, watch } from 'vue'
import { listNamedRevisions, nameRevision, unnameRevision, type NamedRevision } from '@shared/api/ledger'
import type { Problem } from '@shared/api/problems'
import { ApiProblem, call } from '@/api/client'
import { useSheetStore } from '@/stores/sheet'

/** The named revisions of the open sheet, and putting names on them and taking them off. */
export function useNamedRevisions() {
  const sheet = useSheetStore()
  /** Newest first. */
  const names = shallowRef<readonly NamedRevision[]>([])
  const problem = ref<Problem | null>(null)
  const byRevision = computed(() => new Map(names.value.map((name) => [name.revision, name])))

  /** Runs one step; a problem is kept to be shown where the name was asked for. */
  async function take(step: (number: string) => Promise<void>): Promise<boolean> {
    const number = sheet.sheet?.number
    if (!number) return false
    problem.value = null
    try {
      await step(number)
      return true
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error
      problem.value = error.problem
      return false
    }
  }

  const others = (revision: number) => names.value.filter((name) => name.revision !== revision)

  /** Names a revision; answers whether it was done. */
  const give = (revision: number, name: string, note = ''): Promise<boolean> =>
    take(async (number) => {
      const params = { sheet: number, revision }
      const given = await call(nameRevision, { params, body: { name, note } })
      names.value = [given, ...others(revision)].sort((a, b) => b.revision - a.revision)
    })

  /** Takes the name off a revision; answers whether it was done. */
  const remove = (revision: number): Promise<boolean> =>
    take(async (number) => {
      await call(unnameRevision, { params: { sheet: number, revision } })
      names.value = others(revision)
    })

  watch(
    () => sheet.sheet?.number,
    () => {
      names.value = []
      void take(async (number) => {
        const listed = await call(listNamedRevisions, { params: { sheet: number } })
        if (sheet.sheet?.number === number) names.value = listed
      })
    },
    { immediate: true },
  )

  return { names, byRevision, problem, give, remove }
}
