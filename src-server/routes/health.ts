import { HealthAnswer, ReadyAnswer } from '@shared/contracts'
import { requireReady } from '../services/readiness'
import { route } from './route'

/** The process runs. */
const healthRoute = route({
  method: 'get',
  path: '/health',
  right: 'public',
  answer: HealthAnswer,
  handle: async () => ({ alive: true as const }),
})

/** The process can do its work: the database answers and has every migration. */
const readyRoute = route({
  method: 'get',
  path: '/ready',
  right: 'public',
  answer: ReadyAnswer,
  handle: async () => {
    await requireReady()
    return { ready: true as const }
  },
})

export const HEALTH_ROUTES = [healthRoute, readyRoute]
