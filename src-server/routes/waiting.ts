import { WaitingAnswer } from '@shared/contracts'
import { presentWaiting } from '../presenters/waiting'
import { whatWaits } from '../services/what-waits'
import { route } from './route'

const waitingRoute = route({
  method: 'get',
  path: '/waiting',
  right: 'waiting.read',
  answer: WaitingAnswer,
  handle: async ({ actor }) => (await whatWaits(actor)).map(presentWaiting),
})

export const WAITING_ROUTES = [waitingRoute]
