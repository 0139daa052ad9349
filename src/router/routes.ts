import type { Component } from 'vue'
import type { RouteRecordRaw } from 'vue-router'
import { COMMISSION_ROUTE } from './commission-routes'

/** A page in the plain frame, for whoever comes: no account is needed. */
const openRoute = (
  path: string,
  name: string,
  title: string,
  component: () => Promise<Component>,
): RouteRecordRaw => ({
  path,
  component: () => import('@/layouts/PlainLayout.vue'),
  children: [{ path: '', name, component, props: path.includes(':'), meta: { title, open: true } }],
})

const OPEN_ROUTES: RouteRecordRaw[] = [
  openRoute('/sign-in', 'sign-in', 'Sign in', () => import('@/pages/SignInPage.vue')),
  openRoute('/welcome/:token', 'welcome', 'Welcome', () => import('@/pages/WelcomePage.vue')),
  openRoute('/link/:token', 'link', 'Knife order', () => import('@/pages/LinkPage.vue')),
  openRoute('/out-of-reach', 'out-of-reach', 'Out of reach', () => import('@/pages/OutOfReachPage.vue')),
]

const WORKSHOP_ROUTES: RouteRecordRaw[] = [
  {
    path: '',
    name: 'waiting',
    component: () => import('@/pages/WaitingPage.vue'),
    meta: { title: 'What waits for you' },
  },
  {
    path: 'commissions',
    name: 'commissions',
    component: () => import('@/pages/CommissionsPage.vue'),
    meta: { title: 'Commissions', right: 'commission.list' },
  },
  {
    path: 'commissions/new',
    name: 'new-commission',
    component: () => import('@/pages/NewCommissionPage.vue'),
    meta: { title: 'New commission', right: 'commission.manage' },
  },
  {
    path: 'orders',
    name: 'orders',
    component: () => import('@/pages/orders/OrdersPage.vue'),
    meta: { title: 'Knife orders', right: 'order.list' },
  },
  {
    path: 'orders/:id',
    name: 'order',
    component: () => import('@/pages/orders/OrderPage.vue'),
    props: true,
    meta: { title: 'Knife order', right: 'order.list' },
  },
  {
    path: 'cut-lists',
    name: 'cut-lists',
    component: () => import('@/pages/cut-lists/CutListsPage.vue'),
    meta: { title: 'Bench', right: 'cut-list.list' },
  },
  {
    path: 'rack',
    name: 'rack',
    component: () => import('@/pages/RackPage.vue'),
    meta: { title: 'Rack', right: 'rack.read' },
  },
  {
    path: 'people',
    name: 'people',
    component: () => import('@/pages/PeoplePage.vue'),
    meta: { title: 'People', right: 'people.manage' },
  },
  {
    path: 'clients',
    name: 'clients',
    component: () => import('@/pages/ClientsPage.vue'),
    meta: { title: 'Clients', right: 'client.manage' },
  },
  {
    path: 'mills',
    name: 'mills',
    component: () => import('@/pages/MillsPage.vue'),
    meta: { title: 'Mills', right: 'mill.read' },
  },
  {
    path: 'mills/:id',
    name: 'mill',
    component: () => import('@/pages/MillPage.vue'),
    props: true,
    meta: { title: 'Mill', right: 'mill.read' },
  },
  {
    path: 'post',
    name: 'post',
    component: () => import('@/pages/PostPage.vue'),
    meta: { title: 'Post', right: 'post.read' },
  },
  {
    path: 'post/:id',
    name: 'letter',
    component: () => import('@/pages/LetterPage.vue'),
    props: true,
    meta: { title: 'Letter', right: 'post.read' },
  },
  {
    path: 'settings',
    name: 'settings',
    component: () => import('@/pages/SettingsPage.vue'),
    meta: { title: 'Settings', right: 'settings.change' },
  },
  {
    path: ':rest(.*)*',
    name: 'not-found',
    component: () => import('@/pages/NotFoundPage.vue'),
    meta: { title: 'Nothing here' },
  },
]

export const ROUTES: RouteRecordRaw[] = [
  ...OPEN_ROUTES,
  COMMISSION_ROUTE,
  {
    path: '/cut-lists/:id',
    component: () => import('@/layouts/BenchLayout.vue'),
    children: [
      {
        path: '',
        name: 'cut-list',
        component: () => import('@/pages/cut-lists/CutListPage.vue'),
        props: true,
        meta: { title: 'Bench', right: 'cut-list.read' },
      },
    ],
  },
  { path: '/', component: () => import('@/layouts/WorkshopLayout.vue'), children: WORKSHOP_ROUTES },
]
