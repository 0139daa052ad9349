import type { RouteRecordRaw } from 'vue-router'

/** The stages of a commission; every page is given the commission's id. */
export const COMMISSION_ROUTE: RouteRecordRaw = {
  // A UUID, so that /commissions/new is not one.
  path: '/commissions/:id([0-9a-f-]{36})',
  component: () => import('@/layouts/CommissionLayout.vue'),
  props: true,
  meta: { title: 'Commission', right: 'commission.list' },
  children: [
    {
      path: '',
      name: 'commission',
      component: () => import('@/pages/commission/StageEntryPage.vue'),
      props: true,
    },
    {
      path: 'picture',
      name: 'commission-picture',
      component: () => import('@/pages/commission/PicturePage.vue'),
      props: true,
    },
    {
      path: 'evidence',
      name: 'commission-evidence',
      component: () => import('@/pages/commission/EvidencePage.vue'),
      props: true,
    },
    {
      path: 'section',
      name: 'commission-section',
      component: () => import('@/pages/commission/SectionPage.vue'),
      props: true,
    },
    {
      path: 'review',
      name: 'commission-review',
      component: () => import('@/pages/commission/ReviewPage.vue'),
      props: true,
    },
    {
      path: 'issues/:issueId([0-9a-f-]{36})',
      name: 'commission-issue',
      component: () => import('@/pages/commission/IssuePage.vue'),
      props: true,
    },
    {
      path: 'knife',
      name: 'commission-knife',
      component: () => import('@/pages/commission/KnifePage.vue'),
      props: true,
    },
    {
      path: 'lengths',
      name: 'commission-lengths',
      component: () => import('@/pages/commission/LengthsPage.vue'),
      props: true,
    },
    {
      path: 'bench',
      name: 'commission-bench',
      component: () => import('@/pages/commission/BenchPage.vue'),
      props: true,
    },
    {
      path: 'finish',
      name: 'commission-finish',
      component: () => import('@/pages/commission/FinishPage.vue'),
      props: true,
    },
  ],
}
