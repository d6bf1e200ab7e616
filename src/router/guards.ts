import type { Router } from 'vue-router'
import { useSessionStore } from '@/stores/session'
import { pathBack } from './path-back'

/** Decides who may see a page; the server decides again about everything on it. */
export function installGuards(router: Router): void {
  router.beforeEach(async (to) => {
    const session = useSessionStore()
    try {
      await session.load()
    } catch {
      // The page itself meets the same trouble and says so in its place.
    }
    const { account } = session
    if (to.name === 'start') return account ? { name: 'sheets' } : { name: 'catalogue' }
    if (to.name === 'sign-in' && account && !session.hasEnded) return pathBack(to.query['back'])
    if (to.meta.access && !account) return { name: 'sign-in', query: { back: to.fullPath } }
    if (to.meta.access === 'administrator' && !account?.administrator) {
      return { name: 'not-found', params: { rest: to.path.slice(1).split('/') } }
    }
    return true
  })
  router.afterEach((to) => {
    const sheet = to.params['sheet']
    document.title = [typeof sheet === 'string' ? sheet : '', to.meta.title, 'Sheetwright']
      .filter(Boolean)
      .join(' · ')
  })
}
