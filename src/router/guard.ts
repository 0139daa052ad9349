import type { Router } from 'vue-router'
import type { Right } from '@shared/access'
import { useSessionStore } from '@/stores/session'

declare module 'vue-router' {
  interface RouteMeta {
    /** The window's title; a page that shows one thing sets its own once the thing is there. */
    title?: string
    /** Needs no account. */
    open?: boolean
    /** The right without which the page has nothing to show. */
    right?: Right
  }
}

/** Lets nobody in who is not signed in, and shows no page that has nothing for whoever asks. The server decides all the same. */
export function guardRoutes(router: Router): void {
  router.beforeEach(async (to) => {
    if (to.meta.open === true) return true
    const session = useSessionStore()
    try {
      await session.load()
    } catch {
      // Out of reach: the page itself asks again and says so in place, instead of a door that may be the wrong one.
      return { name: 'out-of-reach', query: { then: to.fullPath } }
    }
    if (!session.session) return { name: 'sign-in', query: to.fullPath === '/' ? {} : { then: to.fullPath } }
    const { right } = to.meta
    if (right !== undefined && !session.mayEver(right))
      return { name: 'not-found', params: { rest: to.path.slice(1).split('/') } }
    return true
  })
  router.afterEach((to) => {
    document.title = to.meta.title === undefined ? 'Listel' : `${to.meta.title} · Listel`
  })
}
