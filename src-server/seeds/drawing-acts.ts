import { randomUUID } from 'node:crypto'
import type { Actor } from '@shared/access'
import type { CommissionRequest, Measurement, OutputOf } from '@shared/contracts'
import { draftFromSection } from '@shared/section'
import type { DraftMember, Section, SectionEdit } from '@shared/section'
import { takeOnCommission } from '../services/commissions'
import { editDraft, readDraft } from '../services/drafts'
import { addPicture, measurePicture } from '../services/pictures'

/** Takes a commission on and gives its key. */
export async function takeOn(
  actor: Actor,
  about: Omit<OutputOf<typeof CommissionRequest>, 'operationId'>,
): Promise<string> {
  const { commission } = await takeOnCommission(actor, { operationId: randomUUID(), ...about })
  return commission.id
}

export interface DemoPicture {
  readonly name: string
  readonly copies?: number
  readonly measurement: Measurement
}

export async function addMeasuredPicture(
  actor: Actor,
  commissionId: string,
  { name, copies = 1, measurement }: DemoPicture,
): Promise<void> {
  const { picture } = await addPicture(actor, commissionId, { operationId: randomUUID(), name, copies })
  await measurePicture(actor, picture.id, { operationId: randomUUID(), document: measurement })
}

/** A canvas or panel measured out of its frame; diagonals, thickness and the rest as the picture says. */
export function measurementOf(
  by: Actor,
  on: string,
  readings: Pick<Measurement, 'width' | 'height'> & Partial<Measurement>,
): Measurement {
  return {
    diagonals: [],
    thickness: null,
    allowance: 3,
    lining: 0.5,
    stack: { glazing: null, airGap: null, backing: null, fixings: null },
    measuredBy: by.name,
    measuredOn: on,
    inFrame: false,
    ...readings,
  }
}

/** One step of drawing, as its history names it. */
export interface DrawnStep {
  readonly name: string
  readonly edit: SectionEdit
}

/** Takes steps on the draft as it stands. */
export async function drawSteps(
  actor: Actor,
  commissionId: string,
  steps: readonly DrawnStep[],
): Promise<void> {
  const { draft } = await readDraft(actor, commissionId)
  const saving = await editDraft(actor, commissionId, {
    version: draft.version,
    operationId: randomUUID(),
    steps: steps.map((step) => ({ act: 'do', ...step })),
  })
  if (saving.kind === 'stale') throw new Error('somebody drew while the demo was filled in')
}

/** Draws a section onto a bare draft: the block first, then member after member. */
export function drawSection(actor: Actor, commissionId: string, section: Section): Promise<void> {
  const { members, basis, gesso, ...block } = draftFromSection(section, randomUUID)
  const start: SectionEdit = {
    act: 'together',
    edits: [
      { act: 'set', field: 'sightEdgeHeight', value: block.sightEdgeHeight },
      { act: 'set', field: 'rebate', value: block.rebate },
      { act: 'set', field: 'backSplay', value: block.backSplay },
      { act: 'set', field: 'gesso', value: gesso },
      { act: 'set', field: 'tolerance', value: block.tolerance },
      ...(basis === undefined ? [] : [{ act: 'set', field: 'basis', value: basis } as const]),
    ],
  }
  return drawSteps(actor, commissionId, [
    { name: 'Set the sight edge, the rebate and the gesso', edit: start },
    ...members.map((member, at) => ({
      name: `Put in ${member.kind.replace('-', ' ')}`,
      edit: { act: 'put-in', at, member } as const,
    })),
  ])
}

/** Changes the member at a place, counted from the sight edge, 1 first. */
export async function redraw(
  actor: Actor,
  commissionId: string,
  name: string,
  place: number,
  change: (member: DraftMember) => DraftMember,
): Promise<void> {
  const { draft } = await readDraft(actor, commissionId)
  const member = draft.document.members[place - 1]
  if (member === undefined) throw new Error(`the draft has no member ${place}`)
  const edit: SectionEdit = { act: 'change', key: member.key, member: change(member) }
  await drawSteps(actor, commissionId, [{ name, edit }])
}
