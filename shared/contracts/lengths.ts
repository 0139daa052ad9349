import { z } from 'zod'
import { Id, Instant, LengthMm, LongText, Money, OperationId, PositiveMm, Sha256, ShortText } from './scalars'

// ---- rack ---------------------------------------------------------------------------------------------------------

export const RackPieceRequest = z.strictObject({
  operationId: OperationId,
  length: PositiveMm,
  count: z.int().min(1).max(200),
  endTrim: z.tuple([LengthMm, LengthMm]),
  species: ShortText,
  finish: z.string().trim().max(200),
  /** The issue whose wood shape the piece has. */
  issueId: Id,
  trueWidth: PositiveMm.nullable(),
  trueRebate: LengthMm.nullable(),
})
export const RackMovementRequest = z.strictObject({
  operationId: OperationId,
  pieceId: Id,
  act: z.enum(['scrap', 'correct']),
  length: PositiveMm.nullable(),
  reason: LongText,
})
export const RackPieceAnswer = z.strictObject({
  id: Id,
  code: z.string(),
  length: z.number(),
  endTrim: z.tuple([z.number(), z.number()]),
  species: z.string(),
  finish: z.string(),
  shapeSha256: Sha256,
  shapeOf: z.string(),
  state: z.enum(['on-rack', 'reserved', 'used', 'scrapped']),
  offcutOf: z.string().nullable(),
  batch: z.strictObject({
    id: Id,
    trueWidth: z.number().nullable(),
    trueRebate: z.number().nullable(),
    at: Instant,
  }),
})

// ---- rails and plans ------------------------------------------------------------------------------------------------

export const RailAnswer = z.strictObject({
  side: z.string(),
  count: z.int(),
  longPoint: z.number(),
  rebate: z.number(),
  sight: z.number(),
  mitre: z.number(),
})
export const RailsAnswer = z.strictObject({
  issue: z.strictObject({ id: Id, letter: z.string(), state: z.string() }).nullable(),
  /** Worked out from the draft when nothing has been put forward yet. */
  fromDraft: z.boolean(),
  missing: z.array(z.string()),
  pictures: z.array(
    z.strictObject({
      picture: z.strictObject({ id: Id, name: z.string(), copies: z.int(), measurementNo: z.int() }),
      rebateOpening: z.tuple([z.number(), z.number()]),
      sight: z.tuple([z.number(), z.number()]),
      outside: z.tuple([z.number(), z.number()]),
      cover: z.tuple([z.number(), z.number()]),
      skewDeg: z.number(),
      rails: z.array(RailAnswer),
      footage: z.number(),
      volumeMm3: z.number(),
    }),
  ),
})
/** Makes a cut list: plans the rails of the approved issue's pictures on the rack and the lengths that can be ordered. */
export const PlanRequest = z.strictObject({
  operationId: OperationId,
  issueId: Id,
  /** null: the lengths of the mill's card. */
  lengths: z
    .array(z.strictObject({ length: PositiveMm, price: Money.nullable(), count: z.int().min(1).nullable() }))
    .max(50)
    .nullable(),
  useRack: z.boolean(),
  order: z.strictObject({
    setupPieces: z.int().min(0).max(100),
    firstOff: LengthMm,
    reserve: z.number().min(0).max(2),
  }),
})
export const PlannedCut = z.strictObject({
  id: Id,
  no: z.int(),
  side: z.string(),
  picture: z.string(),
  frame: z.string(),
  length: z.number(),
  rebate: z.number(),
  sight: z.number(),
  mitre: z.number(),
  at: z.number(),
  /** What the bench did: absent until ticked. */
  fact: z
    .strictObject({
      trueLength: z.number().nullable(),
      by: z.string(),
      at: Instant,
      kind: z.enum(['cut', 'mis-cut']),
      conflict: z.boolean(),
    })
    .nullable(),
})
export const PlannedLength = z.strictObject({
  no: z.int(),
  from: z.string(),
  source: z.enum(['rack', 'order']),
  length: z.number(),
  trims: z.tuple([z.number(), z.number()]),
  cuts: z.array(PlannedCut),
  offcut: z.number(),
  offcutUsable: z.boolean(),
  offcutFact: z
    .strictObject({ code: z.string(), length: z.number(), by: z.string(), at: Instant })
    .nullable(),
})
/** `cost` and prices are absent for whoever may not see them. */
export const CutListAnswer = z.strictObject({
  id: Id,
  no: z.int(),
  state: z.enum(['closed', 'open', 'done', 'superseded']),
  version: z.int(),
  commission: z.strictObject({ id: Id, number: z.string(), title: z.string() }),
  issue: z.strictObject({ id: Id, letter: z.string(), sha256: Sha256 }),
  /** Reasons why the list no longer fits what it was worked out from; empty while it does. */
  outOfDate: z.array(z.string()),
  /** Why the bench may not start yet; null when it may. */
  closedBecause: z.string().nullable(),
  saw: z.strictObject({
    name: z.string(),
    kerf: z.number(),
    margin: z.number(),
    endTrim: z.number(),
    shortestSafe: z.number(),
    smallestUsableOffcut: z.number(),
  }),
  lengths: z.array(PlannedLength),
  count: z.int(),
  cost: Money.nullable().optional(),
  bound: z.string(),
  proven: z.boolean(),
  toOrder: z.array(z.strictObject({ length: z.number(), count: z.int() })),
  warnings: z.array(z.string()),
  at: Instant,
})
export const CutListLine = z.strictObject({
  id: Id,
  no: z.int(),
  state: z.enum(['closed', 'open', 'done', 'superseded']),
  commission: z.strictObject({ id: Id, number: z.string(), title: z.string() }),
  issueLetter: z.string(),
  cuts: z.int(),
  done: z.int(),
  outOfDate: z.boolean(),
  at: Instant,
})
/** A manager opens a list before the first-off is accepted; designers and managers when it is. */
export const OpenCutListRequest = z.strictObject({
  operationId: OperationId,
  reason: z.string().trim().max(5000),
})
/** Facts from the bench are never refused because a list moved on: they are recorded against its version. */
export const CutFactRequest = z.strictObject({
  operationId: OperationId,
  listVersion: z.int(),
  kind: z.enum(['cut', 'mis-cut', 'undo', 'offcut']),
  cutId: Id.nullable(),
  lengthNo: z.int().nullable(),
  trueLength: PositiveMm.nullable(),
  deviceTime: Instant,
})

export type RackPieceView = z.infer<typeof RackPieceAnswer>
export type RailsView = z.infer<typeof RailsAnswer>
export type CutListView = z.infer<typeof CutListAnswer>
export type CutListLineView = z.infer<typeof CutListLine>
export type PlannedLengthView = z.infer<typeof PlannedLength>
export type PlannedCutView = z.infer<typeof PlannedCut>
