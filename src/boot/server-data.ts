import { MutationCache, QueryCache, QueryClient, VueQueryPlugin } from '@tanstack/vue-query'
import type { App } from 'vue'
import type { Router } from 'vue-router'
import { Failure } from '@shared/failure'
import { useSessionStore } from '@/stores/session'

/** How long an answer counts as fresh, ms: people at the next bench change things, but not by the second. */
const FRESH_MS = 15_000
const TRIES = 3

/** Server data: asked again when stale, retried only where a retry can help, and back to the door when the session has ended. */
export function useServerData(app: App, router: Router): void {
  const onError = (error: unknown) => {
    if (error instanceof Failure && error.code === 'not-signed-in') backToTheDoor(router)
  }
  const queryClient = new QueryClient({
    queryCache: new QueryCache({ onError }),
    mutationCache: new MutationCache({ onError }),
    defaultOptions: {
      // Whether a request gets through is found by asking: a workshop's own network is not the internet.
      queries: { staleTime: FRESH_MS, networkMode: 'always', retry: isWorthAnotherTry },
      mutations: { networkMode: 'always' },
    },
  })
  app.use(VueQueryPlugin, { queryClient })
}

function isWorthAnotherTry(failedTimes: number, error: unknown): boolean {
  return error instanceof Failure && error.code === 'out-of-service' && failedTimes < TRIES - 1
}

function backToTheDoor(router: Router): void {
  const session = useSessionStore()
  if (session.session === null) return
  session.forget()
  const { fullPath, meta } = router.currentRoute.value
  if (meta.open !== true) void router.push({ name: 'sign-in', query: { then: fullPath } })
}
