import { DraftAnswer, DraftEditsRequest, IdParams } from '@shared/contracts'
import { Failure } from '@shared/failure'
import { presentDraft } from '../presenters/drafts'
import { editDraft, readDraft } from '../services/drafts'
import { route } from './route'

const readDraftRoute = route({
  method: 'get',
  path: '/commissions/:id/draft',
  right: 'draft.read',
  see: 'commission.read',
  params: IdParams,
  answer: DraftAnswer,
  handle: async ({ actor, params }) => presentDraft(await readDraft(actor, params.id)),
})

const editDraftRoute = route({
  method: 'post',
  path: '/commissions/:id/draft/edits',
  right: 'draft.edit',
  see: 'commission.read',
  params: IdParams,
  body: DraftEditsRequest,
  answer: DraftAnswer,
  handle: async ({ actor, params, body }) => {
    const saving = await editDraft(actor, params.id, body)
    if (saving.kind === 'saved') return presentDraft(saving.now)
    throw new Failure('version-stale', {
      says: 'Somebody else drew on this section meanwhile. Nothing of yours is lost: look at what changed, then put your steps on top or let them go.',
      draft: presentDraft(saving.now),
    })
  },
})

export const DRAFT_ROUTES = [readDraftRoute, editDraftRoute]
