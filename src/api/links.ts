import { Done, LinkAnswer } from '@shared/contracts'
import type { LinkAcknowledgeRequest, OutputOf } from '@shared/contracts'
import { ask, send } from './request'

/** What a signed link shows; asking changes nothing. */
export const readLink = (token: string, signal?: AbortSignal) => ask(LinkAnswer, ['links', token], { signal })
export const acknowledgeByLink = (token: string, body: OutputOf<typeof LinkAcknowledgeRequest>) =>
  send(Done, 'POST', ['links', token, 'acknowledge'], { body })
