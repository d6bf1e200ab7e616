import { defineStore } from 'pinia'
import { computed, ref, shallowRef } from 'vue'
import { acceptLink, getSession, signIn, signOut, type Session } from '@shared/api/accounts'
import { call, tieSession } from '@/api/client'

/** Who is signed in, and the token that goes with every change. */
export const useSessionStore = defineStore('session', () => {
  const session = shallowRef<Session | null>(null)
  const account = computed(() => session.value?.account ?? null)
  const demoAccounts = computed(() => session.value?.demoAccounts ?? [])
  /** The session ended while someone was at work: the page stays, and asks to sign in again. */
  const hasEnded = ref(false)
  let loading: Promise<void> | undefined

  /** Asks the server once who is signed in; again only after a failure. */
  function load(): Promise<void> {
    loading ??= renew().catch((error: unknown) => {
      loading = undefined
      throw error
    })
    return loading
  }

  /** Asks anew. A session that ended meanwhile keeps the name of who it was, so that the page can ask for them. */
  async function renew(): Promise<void> {
    const fresh = await call(getSession)
    if (!fresh.account && account.value && session.value) {
      session.value = { ...session.value, csrfToken: fresh.csrfToken }
      hasEnded.value = true
    } else take(fresh)
  }

  function take(fresh: Session): void {
    session.value = fresh
    hasEnded.value = false
  }

  const enter = async (email: string, password: string): Promise<void> =>
    take(await call(signIn, { body: { email, password } }))

  const enterByLink = async (
    token: string,
    person: { email: string; name: string; password: string },
  ): Promise<void> => take(await call(acceptLink, { params: { token }, body: person }))

  /** Signs out; one whose session has ended by itself is out already. */
  async function leave(): Promise<void> {
    take(await call(signOut))
  }

  tieSession({
    csrfToken: () => session.value?.csrfToken ?? '',
    renewToken: renew,
    ended: () => {
      if (account.value) hasEnded.value = true
    },
  })

  return { session, account, demoAccounts, hasEnded, load, renew, enter, enterByLink, leave }
})
