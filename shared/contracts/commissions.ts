import { z } from 'zod'
import { Day, Id, Instant, LengthMm, LongText, OperationId, PositiveMm, Sha256, ShortText } from './scalars'
import { DraftSectionSchema, SectionEditSchema } from './section'

/** Stages in the order of the work; see shared/course. */
export const Stage = z.enum([
  'picture',
  'evidence',
  'section',
  'review',
  'knife',
  'lengths',
  'bench',
  'finish',
])

// ---- commission ------------------------------------------------------------------------------------------------

export const CommissionRequest = z.strictObject({
  operationId: OperationId,
  clientId: Id,
  title: ShortText,
  artist: z.string().trim().max(200),
  accession: z.string().trim().max(100),
  due: Day.nullable(),
})
export const CommissionChangeRequest = z.strictObject({
  version: z.int(),
  title: ShortText.optional(),
  artist: z.string().trim().max(200).optional(),
  accession: z.string().trim().max(100).optional(),
  due: Day.nullable().optional(),
  state: z.enum(['open', 'archived']).optional(),
})
/** One line of the list; `waitsFor` says in words what is missing or stuck, `stuck` that it is overdue or refused. */
export const CommissionLine = z.strictObject({
  id: Id,
  number: z.string(),
  title: z.string(),
  artist: z.string(),
  accession: z.string(),
  client: z.strictObject({ id: Id, name: z.string() }),
  due: Day.nullable(),
  state: z.enum(['open', 'archived']),
  stage: Stage,
  waitsFor: z.string(),
  waitsForRole: z.enum(['manager', 'designer', 'curator', 'mill', 'bench']).nullable(),
  stuck: z.boolean(),
  latestIssue: z
    .strictObject({
      id: Id,
      letter: z.string(),
      state: z.enum(['put-forward', 'returned', 'approved', 'withdrawn', 'superseded']),
    })
    .nullable(),
})

// ---- pictures and their measurements ----------------------------------------------------------------------------

/** Readings in mm; every optional part absent = not measured. */
export const MeasurementDocument = z.strictObject({
  width: z.array(PositiveMm).min(1).max(20),
  height: z.array(PositiveMm).min(1).max(20),
  diagonals: z.array(PositiveMm).max(2),
  thickness: LengthMm.nullable(),
  allowance: LengthMm,
  lining: LengthMm,
  stack: z.strictObject({
    glazing: LengthMm.nullable(),
    airGap: LengthMm.nullable(),
    backing: LengthMm.nullable(),
    fixings: LengthMm.nullable(),
  }),
  measuredBy: ShortText,
  measuredOn: Day,
  inFrame: z.boolean(),
})
export const MeasurementRequest = z.strictObject({ operationId: OperationId, document: MeasurementDocument })
export const MeasurementAnswer = z.strictObject({
  id: Id,
  no: z.int(),
  at: Instant,
  document: MeasurementDocument,
})
export const PictureRequest = z.strictObject({
  operationId: OperationId,
  name: ShortText,
  copies: z.int().min(1).max(200),
})
export const PictureChangeRequest = z.strictObject({
  version: z.int(),
  name: ShortText.optional(),
  copies: z.int().min(1).max(200).optional(),
  state: z.enum(['open', 'archived']).optional(),
})
export const PictureAnswer = z.strictObject({
  id: Id,
  position: z.int(),
  name: z.string(),
  copies: z.int(),
  state: z.enum(['open', 'archived']),
  version: z.int(),
  measurement: MeasurementAnswer.nullable(),
})

// ---- photographs and what is read off them ----------------------------------------------------------------------

const ImagePoint = z.tuple([z.number(), z.number()])
/**
 * What was read off a photograph; image coordinates of the upright original (0, 0 = outer corner of the top-left pixel).
 * `scale`: two points a known distance apart. `lay`: how the photograph lies under the drawing: which image point is the
 * sight edge's foot, and how far the photograph is turned, degrees.
 */
export const ReadingDocument = z.strictObject({
  scale: z
    .strictObject({ from: ImagePoint, to: ImagePoint, distance: PositiveMm, plusMinus: LengthMm })
    .nullable(),
  lay: z
    .strictObject({ at: ImagePoint, turn: z.number().min(-360).max(360), mirrored: z.boolean() })
    .nullable(),
})
export const ReadingRequest = z.strictObject({ operationId: OperationId, document: ReadingDocument })
export const ReadingAnswer = z.strictObject({ id: Id, no: z.int(), at: Instant, document: ReadingDocument })
/** Goes with the file of a multipart upload, as the field `about` in JSON. */
export const PhotographRequest = z.strictObject({
  operationId: OperationId,
  title: ShortText,
  source: z.string().trim().max(500),
  citation: z.string().trim().max(500),
})
export const PhotographChangeRequest = z.strictObject({
  version: z.int(),
  title: ShortText.optional(),
  source: z.string().trim().max(500).optional(),
  citation: z.string().trim().max(500).optional(),
  state: z.enum(['open', 'archived']).optional(),
})
/** `key` is the photograph's name in the commission file (p1, p2 …). */
export const PhotographAnswer = z.strictObject({
  id: Id,
  key: z.string(),
  title: z.string(),
  source: z.string(),
  citation: z.string(),
  state: z.enum(['open', 'archived']),
  version: z.int(),
  width: z.int(),
  height: z.int(),
  type: z.string(),
  bytes: z.int(),
  sha256: Sha256,
  reading: ReadingAnswer.nullable(),
})

// ---- draft ------------------------------------------------------------------------------------------------------

export const DraftHistoryLine = z.strictObject({
  seq: z.int(),
  name: z.string(),
  by: z.string(),
  at: Instant,
  undone: z.boolean(),
})
/** `undo` and `redo` name the step that would be undone or done again next; null when there is none. */
export const DraftAnswer = z.strictObject({
  version: z.int(),
  document: DraftSectionSchema,
  undo: z.string().nullable(),
  redo: z.string().nullable(),
  history: z.array(DraftHistoryLine),
})
export const DraftStep = z.discriminatedUnion('act', [
  z.strictObject({ act: z.literal('do'), name: ShortText, edit: SectionEditSchema }),
  z.strictObject({ act: z.literal('undo') }),
  z.strictObject({ act: z.literal('redo') }),
])
/** Steps on the version they were made from. 409 version-stale carries `draft`: the current DraftAnswer; what was sent stays with the sender. */
export const DraftEditsRequest = z.strictObject({
  version: z.int(),
  operationId: OperationId,
  steps: z.array(DraftStep).min(1).max(500),
})

// ---- trail ------------------------------------------------------------------------------------------------------

export const TrailLine = z.strictObject({
  seq: z.int(),
  at: Instant,
  by: z.string(),
  act: z.string(),
  says: z.string(),
  hash: Sha256,
})

export const CommissionAnswer = CommissionLine.extend({
  version: z.int(),
  pictures: z.array(PictureAnswer),
  photographs: z.array(PhotographAnswer),
})

/** One thing that waits for the person asking: the words, where to go, since when. */
export const WaitingLine = z.strictObject({
  kind: z.enum([
    'measure',
    'draw',
    'answer-remarks',
    'review',
    'order',
    'order-reply',
    'first-off',
    'plan',
    'cut',
    'post-failed',
    'overdue',
  ]),
  says: z.string(),
  commission: z.strictObject({ id: Id, number: z.string(), title: z.string() }).nullable(),
  /** Path in the client. */
  to: z.string(),
  since: Instant,
  urgent: z.boolean(),
})

/** Import of a commission file: the file itself is parsed by the same code as `compute`'s. */
export const ImportRequest = z.strictObject({ operationId: OperationId, clientId: Id, file: z.unknown() })
export const ImportAnswer = z.strictObject({ commissionId: Id, sectionSha256: Sha256.nullable() })
export const NoteText = LongText

export type StageName = z.infer<typeof Stage>
export type CommissionLineView = z.infer<typeof CommissionLine>
export type CommissionView = z.infer<typeof CommissionAnswer>
export type PictureView = z.infer<typeof PictureAnswer>
export type Measurement = z.infer<typeof MeasurementDocument>
export type MeasurementView = z.infer<typeof MeasurementAnswer>
export type PhotographView = z.infer<typeof PhotographAnswer>
export type Reading = z.infer<typeof ReadingDocument>
export type DraftView = z.infer<typeof DraftAnswer>
export type DraftStepInput = z.infer<typeof DraftStep>
export type TrailLineView = z.infer<typeof TrailLine>
export type WaitingLineView = z.infer<typeof WaitingLine>
