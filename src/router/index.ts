import { createRouter, createWebHistory, type RouteRecordRaw } from 'vue-router'
import { installGuards } from './guards'

declare module 'vue-router' {
  interface RouteMeta {
    /** What the browser's tab and the announcement of the page say. */
    title: string
    access?: 'signed-in' | 'administrator'
    /** The places of a sheet have a bar of their own. */
    workplace?: boolean
  }
}

const sheetPlaces: RouteRecordRaw[] = [
  { path: '', redirect: (to) => `${to.path.replace(/\/$/, '')}/compile` },
  {
    path: 'compile',
    name: 'compile',
    component: () => import('@/views/CompileView.vue'),
    meta: place('Compile'),
  },
  {
    path: 'intake',
    name: 'intake',
    component: () => import('@/views/IntakeView.vue'),
    meta: place('Intake'),
  },
  {
    path: 'review',
    name: 'review',
    component: () => import('@/views/ReviewView.vue'),
    meta: place('Review'),
  },
  {
    path: 'ledger',
    name: 'ledger',
    component: () => import('@/views/LedgerView.vue'),
    meta: place('Ledger'),
  },
  {
    path: 'compare',
    name: 'compare',
    component: () => import('@/views/CompareView.vue'),
    meta: place('Compare'),
  },
]

function place(title: string) {
  return { title, access: 'signed-in', workplace: true } as const
}

export const routes: RouteRecordRaw[] = [
  {
    path: '/',
    name: 'start',
    component: () => import('@/views/CatalogueView.vue'),
    meta: { title: 'Catalogue' },
  },
  {
    path: '/sign-in',
    name: 'sign-in',
    component: () => import('@/views/SignInView.vue'),
    meta: { title: 'Sign in' },
  },
  {
    path: '/link/:token',
    name: 'link',
    component: () => import('@/views/LinkView.vue'),
    meta: { title: 'One-time link' },
  },
  {
    path: '/sheets',
    name: 'sheets',
    component: () => import('@/views/SheetsView.vue'),
    meta: { title: 'Sheets', access: 'signed-in' },
  },
  {
    path: '/sheets/new',
    name: 'new-sheet',
    component: () => import('@/views/NewSheetView.vue'),
    meta: { title: 'New sheet', access: 'signed-in' },
  },
  { path: '/sheets/:sheet', children: sheetPlaces },
  {
    path: '/administration',
    name: 'administration',
    component: () => import('@/views/AdministrationView.vue'),
    meta: { title: 'Administration', access: 'administrator' },
  },
  {
    path: '/catalogue',
    name: 'catalogue',
    component: () => import('@/views/CatalogueView.vue'),
    meta: { title: 'Catalogue' },
  },
  {
    path: '/catalogue/:sheet/:edition(\\d+)',
    name: 'edition',
    component: () => import('@/views/EditionView.vue'),
    meta: { title: 'Edition' },
  },
  {
    path: '/symbols',
    name: 'symbols',
    component: () => import('@/views/SymbolsView.vue'),
    meta: { title: 'Symbol set' },
  },
  {
    path: '/api-reference',
    name: 'api-reference',
    component: () => import('@/views/ApiReferenceView.vue'),
    meta: { title: 'API' },
  },
  {
    path: '/problems/:slug',
    name: 'problem',
    component: () => import('@/views/ProblemView.vue'),
    meta: { title: 'Problem' },
  },
  {
    path: '/:rest(.*)*',
    name: 'not-found',
    component: () => import('@/views/NotFoundView.vue'),
    meta: { title: 'Nothing here' },
  },
]

export const router = createRouter({
  history: createWebHistory(),
  routes,
  scrollBehavior: (to, from, saved) => saved ?? (to.path === from.path ? undefined : { top: 0 }),
})
installGuards(router)
