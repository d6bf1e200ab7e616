import { ref, shallowRef, watch } from 'vue'
import { listMembers, setMember, type Role } from '@shared/api/accounts'
import type { Problem } from '@shared/api/problems'
import { ApiProblem, call } from '@/api/client'

/** Who may do what on one sheet; a change is sent at once, and taken back where it is refused. */
export function useMemberships(sheet: () => string | null) {
  const rolesOf = shallowRef<ReadonlyMap<string, readonly Role[]> | null>(null)
  const problem = ref<Problem | null>(null)
  /** What was last saved, in words, for the eye and for a screen reader. */
  const saved = ref('')

  async function read(number: string): Promise<void> {
    rolesOf.value = null
    problem.value = null
    saved.value = ''
    try {
      const members = await call(listMembers, { params: { sheet: number } })
      if (sheet() === number) rolesOf.value = new Map(members.map(({ person, roles }) => [person.id, roles]))
    } catch (error) {
      take(error)
    }
  }

  function take(error: unknown): void {
    if (!(error instanceof ApiProblem)) throw error
    problem.value = error.problem
  }

  function put(account: string, roles: readonly Role[]): void {
    rolesOf.value = new Map([...(rolesOf.value ?? []), [account, roles]])
  }

  /** Gives a role or takes it away. */
  async function set(account: { id: string; name: string }, role: Role, isGiven: boolean): Promise<void> {
    const number = sheet()
    if (!number) return
    const before = rolesOf.value?.get(account.id) ?? []
    const others = before.filter((known) => known !== role)
    const after = isGiven ? [...others, role] : others
    problem.value = null
    saved.value = ''
    put(account.id, after)
    try {
      await call(setMember, { params: { sheet: number, account: account.id }, body: { roles: after } })
      saved.value = `${account.name} ${isGiven ? 'is now' : 'is no longer'} ${role} on ${number}.`
    } catch (error) {
      put(account.id, before)
      take(error)
    }
  }

  watch(
    sheet,
    (number) => {
      if (number) void read(number)
    },
    { immediate: true },
  )

  return { rolesOf, problem, saved, set }
}
