import {
  AttachmentParams,
  Done,
  IdParams,
  LetterAnswer,
  LettersAnswer,
  LinkAcknowledgeRequest,
  LinkAnswer,
  TokenParams,
} from '@shared/contracts'
import { presentLetter, presentLetterBrief, presentLink } from '../presenters/orders'
import { acknowledgeLink, readLink } from '../services/acknowledge-link'
import {
  listLetters,
  readAttachment,
  readCaughtLetter,
  readLetter,
  readRawLetter,
  sendLetterAgain,
} from '../services/post'
import { route } from './route'

const listLettersRoute = route({
  method: 'get',
  path: '/letters',
  right: 'post.read',
  answer: LettersAnswer,
  handle: async ({ actor }) => (await listLetters(actor)).map(presentLetterBrief),
})

const readLetterRoute = route({
  method: 'get',
  path: '/letters/:id',
  right: 'post.read',
  params: IdParams,
  answer: LetterAnswer,
  handle: async ({ actor, params }) => presentLetter(await readLetter(actor, params.id)),
})

const readRawLetterRoute = route({
  method: 'get',
  path: '/letters/:id/raw',
  right: 'post.read',
  params: IdParams,
  answer: 'file',
  handle: ({ actor, params }) => readRawLetter(actor, params.id),
})

const readCaughtLetterRoute = route({
  method: 'get',
  path: '/letters/:id/caught',
  right: 'post.read',
  params: IdParams,
  answer: 'file',
  handle: ({ actor, params }) => readCaughtLetter(actor, params.id),
})

const readAttachmentRoute = route({
  method: 'get',
  path: '/letters/:id/attachments/:index',
  right: 'post.read',
  params: AttachmentParams,
  answer: 'file',
  handle: ({ actor, params }) => readAttachment(actor, params.id, params.index),
})

const sendLetterAgainRoute = route({
  method: 'post',
  path: '/letters/:id/send-again',
  right: 'post.send-again',
  params: IdParams,
  answer: LetterAnswer,
  handle: async ({ actor, params }) => presentLetter(await sendLetterAgain(actor, params.id)),
})

const readLinkRoute = route({
  method: 'get',
  path: '/links/:token',
  right: 'public',
  params: TokenParams,
  answer: LinkAnswer,
  handle: async ({ params, request }) => presentLink(await readLink(params.token, request.from)),
})

const acknowledgeLinkRoute = route({
  method: 'post',
  path: '/links/:token/acknowledge',
  right: 'public',
  params: TokenParams,
  body: LinkAcknowledgeRequest,
  answer: Done,
  handle: async ({ params, body, request }) => {
    await acknowledgeLink(params.token, request.from, body)
    return { done: true as const }
  },
})

export const POST_ROUTES = [
  listLettersRoute,
  readLetterRoute,
  readRawLetterRoute,
  readCaughtLetterRoute,
  readAttachmentRoute,
  sendLetterAgainRoute,
  readLinkRoute,
  acknowledgeLinkRoute,
]
