import { createRouter, createWebHistory, type RouteRecordRaw } from 'vue-router'
import { useSessionStore } from '@/stores/session'

declare module 'vue-router' {
  interface RouteMeta {
    title: string
    /** Readable without signing in. */
    public?: boolean
    /** For administrators only. */
    administrator?: boolean
    /** The view brings its own bar: the places of a sheet's workplace. */
    ownBar?: boolean
  }
}

/** A place of a sheet's workplace. */
const place = (name: string, view: RouteRecordRaw['component'], title: string): RouteRecordRaw =>
  ({ path: `/sheets/:sheet/${name}`, name, component: view, meta: { title, ownBar: true } }) as RouteRecordRaw

const routes: RouteRecordRaw[] = [
  { path: '/', redirect: () => (useSessionStore().account ? '/sheets' : '/catalogue') },
  {
    path: '/sign-in',
    name: 'sign-in',
    component: () => import('@/views/SignInView.vue'),
    meta: { title: 'Sign in', public: true },
  },
  {
    path: '/link/:token',
    name: 'link',
    component: () => import('@/views/LinkView.vue'),
    meta: { title: 'Your account', public: true },
  },
  {
    path: '/sheets',
    name: 'sheets',
    component: () => import('@/views/SheetsView.vue'),
    meta: { title: 'Sheets' },
  },
  {
    path: '/sheets/new',
    name: 'new-sheet',
    component: () => import('@/views/NewSheetView.vue'),
    meta: { title: 'New sheet' },
  },
  { path: '/sheets/:sheet', redirect: (to) => ({ name: 'compile', params: to.params }) },
  place('compile', () => import('@/views/CompileView.vue'), 'Compile'),
  place('intake', () => import('@/views/IntakeView.vue'), 'Intake'),
  place('review', () => import('@/views/ReviewView.vue'), 'Review'),
  place('ledger', () => import('@/views/LedgerView.vue'), 'Ledger'),
  {
    path: '/administration',
    name: 'administration',
    component: () => import('@/views/AdministrationView.vue'),
    meta: { title: 'Administration', administrator: true },
  },
  {
    path: '/catalogue',
    name: 'catalogue',
    component: () => import('@/views/CatalogueView.vue'),
    meta: { title: 'Catalogue', public: true },
  },
  {
    path: '/catalogue/:sheet/:edition',
    name: 'edition',
    component: () => import('@/views/EditionView.vue'),
    meta: { title: 'Edition', public: true },
  },
  {
    path: '/api-reference',
    name: 'api-reference',
    component: () => import('@/views/ApiReferenceView.vue'),
    meta: { title: 'API', public: true },
  },
  {
    path: '/problems/:slug',
    name: 'problem',
    component: () => import('@/views/ProblemView.vue'),
    meta: { title: 'Problem', public: true },
  },
  {
    path: '/:path(.*)*',
    name: 'not-found',
    component: () => import('@/views/NotFoundView.vue'),
    meta: { title: 'Nothing here', public: true },
  },
]

export const router = createRouter({
  history: createWebHistory(),
  routes,
  scrollBehavior: (_to, _from, saved) => saved ?? { top: 0 },
})

router.beforeEach(async (to) => {
  const session = useSessionStore()
  // Public pages show themselves even if the server cannot say who is signed in.
  await session.load().catch((error: unknown) => {
    if (!to.meta.public) throw error
  })
  if (!to.meta.public && !session.account) return { name: 'sign-in', query: { to: to.fullPath } }
  if (to.meta.administrator && !session.account?.administrator)
    return { name: 'not-found', params: { path: ['administration'] } }
  return true
})

router.afterEach((to) => {
  const sheet = typeof to.params['sheet'] === 'string' ? `${to.params['sheet']} · ` : ''
  document.title = `${sheet}${to.meta.title} · Sheetwright`
})
