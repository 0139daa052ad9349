import { useQueryClient } from '@tanstack/vue-query'
import { shallowRef } from 'vue'
import { useRouter } from 'vue-router'
import type { Failure } from '@shared/failure'
import { useSessionStore } from '@/stores/session'
import { failureOf } from './use-asked'

/** Coming in and going out. What one person was shown is never left for the next. */
export function useDoor() {
  const session = useSessionStore()
  const queryClient = useQueryClient()
  const router = useRouter()
  const isRunning = shallowRef(false)
  const failure = shallowRef<Failure>()

  async function through(passage: () => Promise<void>, to: string): Promise<void> {
    isRunning.value = true
    failure.value = undefined
    try {
      await passage()
      queryClient.clear()
      await router.replace(to)
    } catch (error) {
      failure.value = failureOf(error)
    } finally {
      isRunning.value = false
    }
  }

  return {
    isRunning,
    failure,
    enter: (email: string, password: string, to: string) => through(() => session.enter(email, password), to),
    enterAsFirstManager: (first: Parameters<typeof session.enterAsFirstManager>[0]) =>
      through(() => session.enterAsFirstManager(first), '/'),
    leave: () => through(() => session.leave(), '/sign-in'),
  }
}
