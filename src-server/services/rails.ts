import type { Actor } from '@shared/access'
import { faultsOfSection, sectionFromDraft } from '@shared/section'
import type { Section } from '@shared/section'
import type { Measurement, Picture } from '../models/commission'
import { Draft } from '../models/draft'
import { Batch } from '../models/rack'
import { Issue } from '../models/review'
import { railsOfPictures } from './frame-rails'
import type { RailedPicture } from './frame-rails'
import { picturesOf } from './pictures'
import { requireCommission } from './require-commission'
import { sectionOfIssue } from './require-issue'
import type { Tx } from './transaction'

export interface CommissionRails {
  readonly issue: Issue | null
  readonly fromDraft: boolean
  /** What lacks before everything can be worked out, in words. */
  readonly missing: readonly string[]
  readonly pictures: readonly RailedPicture[]
}

/** The rails of a commission as far as they are known: from the approved issue, else the latest, else the draft. */
export async function readRails(actor: Actor, commissionId: string): Promise<CommissionRails> {
  await requireCommission(commissionId, { actor, right: 'rails.read' })
  const issues = await Issue.findAll({ where: { commissionId }, order: [['no', 'DESC']] })
  const issue = issues.find(({ state }) => state === 'approved') ?? issues[0] ?? null
  const section = issue === null ? await sectionOfDraft(commissionId) : sectionOfIssue(issue)
  const { measured, missing } = await measuredPictures(commissionId)
  if (section === null) {
    return {
      issue,
      fromDraft: issue === null,
      missing: [...missing, 'The section is not drawn yet.'],
      pictures: [],
    }
  }
  const batch = issue === null ? null : await latestBatchOf(issue.shapeSha256)
  return { issue, fromDraft: issue === null, missing, pictures: railsOfPictures(section, measured, batch) }
}

/** The draft's section, unless it is bare or faulty. */
async function sectionOfDraft(commissionId: string): Promise<Section | null> {
  const draft = await Draft.findOne({ where: { commissionId }, rejectOnEmpty: true })
  const section = sectionFromDraft(draft.document)
  return section.members.length === 0 || faultsOfSection(section).length > 0 ? null : section
}

export interface MeasuredPictures {
  readonly measured: readonly { readonly picture: Picture; readonly measurement: Measurement }[]
  readonly missing: readonly string[]
}

/** The open pictures that are measured, and words for what is not. */
export async function measuredPictures(commissionId: string, tx?: Tx): Promise<MeasuredPictures> {
  const pictures = (await picturesOf(commissionId, tx)).filter(({ picture }) => picture.state === 'open')
  return {
    measured: pictures.flatMap(({ picture, measurement }) =>
      measurement === null ? [] : [{ picture, measurement }],
    ),
    missing: [
      ...(pictures.length === 0 ? ['No picture yet: enter one and measure it.'] : []),
      ...pictures.flatMap(({ picture, measurement }) =>
        measurement === null ? [`The picture "${picture.name}" is not measured yet.`] : [],
      ),
    ],
  }
}

/** The latest batch of moulding of a shape whose true size was measured; null: lengths are worked out as drawn. */
export async function latestBatchOf(shape: string, tx?: Tx): Promise<Batch | null> {
  const batches = await Batch.findAll({
    where: { shapeSha256: shape },
    order: [['at', 'DESC']],
    ...(tx === undefined ? {} : { transaction: tx }),
  })
  return (
    batches.find(({ trueWidthMm, trueRebateMm }) => trueWidthMm !== null && trueRebateMm !== null) ?? null
  )
}
