import { defineStore } from 'pinia'
import { computed, ref, shallowRef } from 'vue'
import {
  acceptLink,
  getSession,
  signIn,
  signOut,
  type Account,
  type DemoAccount,
  type Session,
} from '@shared/api/accounts'
import { call, keepCsrfToken, whenSignedOut } from '@/api/client'

/** Who is signed in. */
export const useSessionStore = defineStore('session', () => {
  const account = shallowRef<Account | null>(null)
  const demoAccounts = shallowRef<DemoAccount[]>([])
  /** The session ended while someone was at work: the page stays, and asks them to sign in again. */
  const hasExpired = ref(false)
  const isSignedIn = computed(() => account.value !== null && !hasExpired.value)
  let loading: Promise<void> | undefined

  whenSignedOut(() => {
    if (account.value) hasExpired.value = true
  })

  function keep(session: Session): void {
    account.value = session.account
    demoAccounts.value = session.demoAccounts
    hasExpired.value = false
    keepCsrfToken(session.csrfToken)
  }

  /** Asks once who is signed in; a failed try may be repeated. */
  function load(): Promise<void> {
    loading ??= call(getSession)
      .then(keep)
      .catch((error: unknown) => {
        loading = undefined
        throw error
      })
    return loading
  }

  const enter = async (email: string, password: string): Promise<void> =>
    keep(await call(signIn, { body: { email, password } }))
  const leave = async (): Promise<void> => keep(await call(signOut))
  const accept = async (
    token: string,
    person: { email: string; name: string; password: string },
  ): Promise<void> => keep(await call(acceptLink, { params: { token }, body: person }))

  return { account, demoAccounts, hasExpired, isSignedIn, load, enter, leave, accept }
})
