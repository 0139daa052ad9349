import { createRouter, createWebHistory } from 'vue-router'
import type { Router } from 'vue-router'
import { guardRoutes } from './guard'
import { ROUTES } from './routes'

export function makeRouter(): Router {
  const router = createRouter({
    history: createWebHistory(),
    routes: ROUTES,
    scrollBehavior: (to, from, saved) => saved ?? (to.path === from.path ? false : { top: 0 }),
  })
  guardRoutes(router)
  return router
}
