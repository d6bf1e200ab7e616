import { ref, shallowRef, watch } from 'vue'
import { listAuditEntries, type AuditEntry } from '@shared/api/audit'
import type { Problem } from '@shared/api/problems'
import type { AuditKind } from '@shared/audit/audit-event'
import { ApiProblem, call } from '@/api/client'

/** What the trail is narrowed to; an empty field leaves all. */
export interface AuditFilter {
  kind: AuditKind | ''
  person: string
  sheet: string
}

const PAGE = 50

/** The audit trail, newest first, page by page; it begins again whenever the filter changes. */
export function useAuditTrail(filter: () => AuditFilter) {
  const entries = shallowRef<readonly AuditEntry[]>([])
  const next = ref<number | null>(null)
  const isReading = ref(false)
  const problem = ref<Problem | null>(null)
  /** Counts questions, so that the answer to an earlier filter is dropped. */
  let turn = 0

  async function read(before?: number): Promise<void> {
    const mine = ++turn
    const { kind, person, sheet } = filter()
    isReading.value = true
    problem.value = null
    try {
      const query = {
        limit: PAGE,
        ...(before === undefined ? {} : { before }),
        ...(kind ? { kind } : {}),
        ...(person ? { person } : {}),
        ...(sheet ? { sheet } : {}),
      }
      const page = await call(listAuditEntries, { query })
      if (mine !== turn) return
      entries.value = before === undefined ? page.entries : [...entries.value, ...page.entries]
      next.value = page.next
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error
      if (mine === turn) problem.value = error.problem
    } finally {
      if (mine === turn) isReading.value = false
    }
  }

  const readOlder = (): Promise<void> => (next.value === null ? Promise.resolve() : read(next.value))
  watch(filter, () => void read(), { immediate: true, deep: true })

  return { entries, next, isReading, problem, readOlder, readAgain: () => read() }
}
