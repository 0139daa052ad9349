import type { Actor } from '@shared/access'
import { DraftSectionSchema, invalid, requireValid } from '@shared/contracts'
import type { DraftEditsRequest, DraftStepInput, OutputOf } from '@shared/contracts'
import { Failure } from '@shared/failure'
import { applyEdit } from '@shared/section'
import type { DraftSection, SectionEdit } from '@shared/section'
import { Draft, DraftEdit } from '../models/draft'
import { now } from './clock'
import { onceOnly } from './operation'
import { requireCommission } from './require-commission'
import { enterTrail } from './trail'
import { inTransaction } from './transaction'
import type { Tx } from './transaction'

/** What a new commission's section starts from: a sight edge and a rebate, no member yet. */
export const BARE_SECTION: DraftSection = {
  sightEdgeHeight: 30,
  rebate: { width: 8, depth: 20 },
  backSplay: { x: 0, height: 0 },
  gesso: 0,
  tolerance: 0.2,
  members: [],
}

/** A draft with its steps, the first first. */
export interface DraftWithSteps {
  readonly draft: Draft
  readonly steps: readonly DraftEdit[]
}

export async function enterDraft(
  tx: Tx,
  commissionId: string,
  document: DraftSection = BARE_SECTION,
): Promise<Draft> {
  return Draft.create({ commissionId, document, version: 1 }, { transaction: tx })
}

export async function readDraft(actor: Actor, commissionId: string): Promise<DraftWithSteps> {
  await requireCommission(commissionId, { actor, right: 'draft.read' })
  return inTransaction((tx) => draftWithSteps(tx, commissionId))
}

async function draftWithSteps(tx: Tx, commissionId: string): Promise<DraftWithSteps> {
  const draft = await requireDraft(tx, commissionId)
  const steps = await DraftEdit.findAll({
    where: { draftId: draft.id },
    attributes: { exclude: ['edit', 'inverse'] },
    order: [['seq', 'ASC']],
    transaction: tx,
  })
  return { draft, steps }
}

/** The draft of a commission, held until the transaction ends. */
export async function requireDraft(tx: Tx, commissionId: string): Promise<Draft> {
  return Draft.findOne({
    where: { commissionId },
    transaction: tx,
    lock: tx.LOCK.UPDATE,
    rejectOnEmpty: true,
  })
}

export type DraftSaving =
  | { readonly kind: 'saved'; readonly now: DraftWithSteps }
  /** Somebody saved meanwhile: nothing was done, this is what stands. */
  | { readonly kind: 'stale'; readonly now: DraftWithSteps }

/** Ends the transaction when the save was made from another version. */
class StaleSave extends Error {}

/** Takes steps on the version they were made from, all or none. */
export async function editDraft(
  actor: Actor,
  commissionId: string,
  request: OutputOf<typeof DraftEditsRequest>,
): Promise<DraftSaving> {
  try {
    const saved = await inTransaction(async (tx) => {
      await requireCommission(commissionId, {
        actor,
        right: 'draft.edit',
        see: 'commission.read',
        tx,
        lock: true,
      })
      const { operationId, ...asked } = request
      await onceOnly(tx, { operationId, actor, request: { what: 'draft', commissionId, ...asked } }, () =>
        takeSteps(tx, actor, commissionId, request),
      )
      return draftWithSteps(tx, commissionId)
    })
    return { kind: 'saved', now: saved }
  } catch (error) {
    if (!(error instanceof StaleSave)) throw error
    return { kind: 'stale', now: await readDraft(actor, commissionId) }
  }
}

async function takeSteps(
  tx: Tx,
  actor: Actor,
  commissionId: string,
  { version, operationId, steps }: OutputOf<typeof DraftEditsRequest>,
): Promise<number> {
  const draft = await requireDraft(tx, commissionId)
  if (draft.version !== version) throw new StaleSave()
  const names: string[] = []
  let document = draft.document
  for (const [index, step] of steps.entries()) {
    const taken = await takeStep(tx, { draft, actor, operationId, path: `/steps/${index}` }, document, step)
    document = taken.document
    names.push(taken.name)
  }
  await draft.update(
    { document: requireValid(DraftSectionSchema, document), version: version + 1 },
    { transaction: tx },
  )
  await enterTrail(tx, {
    commissionId,
    actor,
    act: 'section-drawn',
    says: `Drew: ${names.join('; ')}`,
    document: { version: version + 1, steps: names },
  })
  return version + 1
}

interface StepPlace {
  readonly draft: Draft
  readonly actor: Actor
  readonly operationId: string
  /** JSON pointer of the step in the request. */
  readonly path: string
}

interface Taken {
  readonly document: DraftSection
  readonly name: string
}

function takeStep(tx: Tx, place: StepPlace, document: DraftSection, step: DraftStepInput): Promise<Taken> {
  switch (step.act) {
    case 'do':
      return doStep(tx, place, document, step)
    case 'undo':
      return undoStep(tx, place, document)
    case 'redo':
      return redoStep(tx, place, document)
  }
}

/** A new step ends the chance to redo those that were undone; their rows stay. */
async function doStep(
  tx: Tx,
  { draft, actor, operationId, path }: StepPlace,
  document: DraftSection,
  { name, edit }: Extract<DraftStepInput, { act: 'do' }>,
): Promise<Taken> {
  const { draft: next, inverse } = edited(document, edit, `${path}/edit`)
  const draftId = draft.id
  await DraftEdit.update({ state: 'superseded' }, { where: { draftId, state: 'undone' }, transaction: tx })
  const seq = (await DraftEdit.count({ where: { draftId }, transaction: tx })) + 1
  await DraftEdit.create(
    {
      draftId,
      seq,
      name,
      edit,
      inverse,
      state: 'done',
      authorId: actor.personId,
      authorName: actor.name,
      operationId,
      at: now(),
    },
    { transaction: tx },
  )
  return { document: next, name }
}

async function undoStep(tx: Tx, { draft, path }: StepPlace, document: DraftSection): Promise<Taken> {
  const last = await DraftEdit.findOne({
    where: { draftId: draft.id, state: 'done' },
    order: [['seq', 'DESC']],
    transaction: tx,
  })
  if (last === null) throw nothingTo('undo')
  await last.update({ state: 'undone' }, { transaction: tx })
  return { document: edited(document, last.inverse, path).draft, name: `undo ${last.name}` }
}

async function redoStep(tx: Tx, { draft, path }: StepPlace, document: DraftSection): Promise<Taken> {
  const next = await DraftEdit.findOne({
    where: { draftId: draft.id, state: 'undone' },
    order: [['seq', 'ASC']],
    transaction: tx,
  })
  if (next === null) throw nothingTo('redo')
  await next.update({ state: 'done' }, { transaction: tx })
  return { document: edited(document, next.edit, path).draft, name: `redo ${next.name}` }
}

const nothingTo = (act: 'undo' | 'redo'): Failure =>
  new Failure('not-ready', { says: `There is no step to ${act}.` })

/** Applies an edit; what is wrong with it is told with its place in the request. */
function edited(document: DraftSection, edit: SectionEdit, path: string) {
  try {
    return applyEdit(document, edit)
  } catch (error) {
    if (!(error instanceof Failure) || error.code !== 'input-invalid') throw error
    throw invalid([{ path, code: 'edit-refused', says: error.message }])
  }
}
