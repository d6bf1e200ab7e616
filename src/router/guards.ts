import type { RouteLocationNormalized, Router } from 'vue-router'
import { useSessionStore } from '@/stores/session'

/** Where one goes after signing in: a path of ours from `?back=`, else the sheets. */
export function pathBack(to: RouteLocationNormalized): string {
  const { back } = to.query
  // Two slashes would lead to another host.
  return typeof back === 'string' && /^\/(?![/\\])/.test(back) ? back : '/sheets'
}

/** Decides who may see a page; the server decides again about everything on it. */
export function installGuards(router: Router): void {
  router.beforeEach(async (to) => {
    const session = useSessionStore()
    try {
      await session.load()
    } catch {
      // The page itself meets the same trouble and says so in its place; sign-in cannot, and comes up empty.
    }
    if (to.name === 'start') return session.account ? { name: 'sheets' } : { name: 'catalogue' }
    if (to.name === 'sign-in' && session.account && !session.hasEnded) return pathBack(to)
    if (to.meta.access && !session.account) return { name: 'sign-in', query: { back: to.fullPath } }
    if (to.meta.access === 'administrator' && !session.account?.administrator)
      return { name: 'not-found', params: { rest: to.path.slice(1).split('/') } }
    return true
  })
  router.afterEach((to) => {
    const sheet = to.params['sheet']
    document.title = [typeof sheet === 'string' ? sheet : '', to.meta.title, 'Sheetwright']
      .filter(Boolean)
      .join(' · ')
  })
}
