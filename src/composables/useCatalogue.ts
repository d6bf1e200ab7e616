import { onScopeDispose, ref, shallowRef, watch } from 'vue'
import { listEditions, type Edition } from '@shared/api/catalogue'
import type { Problem } from '@shared/api/problems'
import { ApiProblem, call } from '@/api/client'

/** The server is asked when the hand rests. */
const REST_MS = 250

/** The released editions that hold the words searched for; an older answer never replaces a newer one. */
export function useCatalogue(text: () => string) {
  const editions = shallowRef<readonly Edition[] | null>(null)
  const problem = ref<Problem | null>(null)
  let asking: AbortController | undefined
  let timer: ReturnType<typeof setTimeout> | undefined

  async function ask(): Promise<void> {
    asking?.abort()
    const mine = (asking = new AbortController())
    problem.value = null
    try {
      const wanted = text().trim()
      const query = wanted ? { text: wanted } : {}
      editions.value = await call(listEditions, { query, signal: mine.signal })
    } catch (error) {
      if (mine.signal.aborted) return
      if (!(error instanceof ApiProblem)) throw error
      problem.value = error.problem
    }
  }

  watch(text, () => {
    clearTimeout(timer)
    timer = setTimeout(() => void ask(), REST_MS)
  })
  void ask()
  onScopeDispose(() => {
    clearTimeout(timer)
    asking?.abort()
  })

  return { editions, problem, again: ask }
}
