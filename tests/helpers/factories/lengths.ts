import { randomUUID } from 'node:crypto'
import { Cut, CutList, CutListPlan } from '@server/models/cut-list'
import { Batch, RackPiece } from '@server/models/rack'
import type { Issue } from '@server/models/review'
import { SAW_CARD } from './cards'
import { unique } from './people'
import { anIssue } from './review'

export interface PieceWish {
  readonly issue?: Issue
  readonly lengthMm?: number
  readonly state?: RackPiece['state']
  readonly trueWidthMm?: number | null
  readonly trueRebateMm?: number | null
}

/** A piece on the rack, in a batch of its own. */
export async function aRackPiece(wish: PieceWish = {}): Promise<RackPiece> {
  const issue = wish.issue ?? (await anIssue({ state: 'approved' }))
  const batch = await Batch.create({
    orderId: null,
    issueId: issue.id,
    shapeSha256: issue.shapeSha256,
    species: 'basswood',
    finish: '',
    trueWidthMm: wish.trueWidthMm ?? null,
    trueRebateMm: wish.trueRebateMm ?? null,
    at: new Date(),
  })
  return RackPiece.create({
    code: `T-${unique()}`,
    batchId: batch.id,
    lengthMm: wish.lengthMm ?? 2440,
    trimStartMm: 75,
    trimEndMm: 75,
    state: wish.state ?? 'on-rack',
    parentId: null,
    reservedById: null,
    at: new Date(),
  })
}

/** A cut list of two rails from one new length. */
export async function aCutList(issue: Issue, state: CutList['state'] = 'closed'): Promise<CutList> {
  const list = await CutList.create({
    commissionId: issue.commissionId,
    issueId: issue.id,
    no: (await CutList.count({ where: { commissionId: issue.commissionId } })) + 1,
    inputs: { pictures: [], batchIds: [], saw: SAW_CARD, sawCardId: randomUUID() },
    state,
    byId: randomUUID(),
    at: new Date(),
  })
  const cuts = [75, 882].map((at, index) => ({ id: `rail ${index}`, copy: 1, length: 800, mitre: 45, at }))
  await CutListPlan.create({
    cutListId: list.id,
    no: 1,
    document: {
      opened: [
        {
          from: '2440',
          source: 'order',
          length: 2440,
          trims: [75, 75],
          cuts,
          offcut: 758,
          isOffcutUsable: true,
        },
      ],
      count: 1,
      cost: '18.50',
      bound: '18.50',
      proven: true,
      toOrder: [{ length: 2440, count: 1 }],
      warnings: [],
      steps: 1,
    },
    byId: randomUUID(),
    at: new Date(),
  })
  for (const [index, at] of [75, 882].entries()) {
    await Cut.create({
      cutListId: list.id,
      no: index + 1,
      lengthNo: 0,
      pieceId: null,
      picture: 'Harbour',
      frame: 'frame 1',
      side: index === 0 ? 'left' : 'right',
      lengthMm: 800,
      rebateMm: 614,
      sightMm: 598,
      mitreDeg: 45,
      atMm: at,
    })
  }
  return list
}
