import { z } from 'zod'
import { MeasurementDocument, ReadingDocument } from './commissions'
import { Id, Instant, LongText, OperationId, Place, Sha256, ShortText } from './scalars'
import { SectionSchema } from './section'

export const IssueState = z.enum(['put-forward', 'returned', 'approved', 'withdrawn', 'superseded'])

/** When an order of an earlier issue is open, `openOrders` must say what is to happen to it. */
export const PutForwardRequest = z.strictObject({
  version: z.int(),
  operationId: OperationId,
  note: z.string().trim().max(5000),
  openOrders: z.strictObject({ act: z.enum(['hold', 'continue']), reason: LongText }).nullable(),
})
/** What an issue rests on, frozen with it under a hash of its own. */
export const EvidenceDocument = z.strictObject({
  pictures: z.array(
    z.strictObject({
      name: z.string(),
      copies: z.int(),
      measurementNo: z.int(),
      measurement: MeasurementDocument,
    }),
  ),
  photographs: z.array(
    z.strictObject({
      key: z.string(),
      title: z.string(),
      source: z.string(),
      citation: z.string(),
      sha256: Sha256,
      readingNo: z.int().nullable(),
      reading: ReadingDocument.nullable(),
    }),
  ),
})
export const DecisionAnswer = z.strictObject({
  kind: z.enum(['approve', 'return', 'withdraw']),
  by: z.string(),
  typedName: z.string(),
  statement: z.string(),
  sha256: Sha256,
  at: Instant,
})
export const RemarkEntryAnswer = z.strictObject({ by: z.string(), at: Instant, text: z.string() })
export const RemarkAnswer = z.strictObject({
  id: Id,
  no: z.int(),
  place: Place,
  state: z.enum(['open', 'answered', 'settled']),
  entries: z.array(RemarkEntryAnswer),
})
export const IssueAnswer = z.strictObject({
  id: Id,
  commission: z.strictObject({
    id: Id,
    number: z.string(),
    title: z.string(),
    artist: z.string(),
    accession: z.string(),
    client: z.string(),
  }),
  letter: z.string(),
  state: IssueState,
  latest: z.boolean(),
  note: z.string(),
  putForwardBy: z.strictObject({ id: Id, name: z.string() }),
  putForwardAt: Instant,
  section: SectionSchema,
  sha256: Sha256,
  shapeSha256: Sha256,
  evidence: EvidenceDocument,
  evidenceSha256: Sha256,
  /** Photographs of the evidence that can be shown: key in the evidence → id for /photographs/:id/image. */
  photographIds: z.record(z.string(), Id),
  decisions: z.array(DecisionAnswer),
  remarks: z.array(RemarkAnswer),
})
export const IssueLine = z.strictObject({
  id: Id,
  letter: z.string(),
  state: IssueState,
  latest: z.boolean(),
  sha256: Sha256,
  putForwardBy: z.string(),
  putForwardAt: Instant,
  openRemarks: z.int(),
})
export const RemarkRequest = z.strictObject({ operationId: OperationId, place: Place, text: LongText })
export const RemarkEntryRequest = z.strictObject({
  operationId: OperationId,
  text: LongText,
  state: z.enum(['open', 'answered', 'settled']),
})
export const DecisionRequest = z.strictObject({
  operationId: OperationId,
  kind: z.enum(['approve', 'return', 'withdraw']),
  typedName: ShortText,
  statement: LongText,
  /** The hash that the person saw: a decision on anything else is refused. */
  sha256: Sha256,
})
/** Difference of an issue from the one before, or from the last approved one. */
export const DifferenceAnswer = z.strictObject({
  from: z.strictObject({ id: Id, letter: z.string() }).nullable(),
  fromSection: SectionSchema.nullable(),
  areaBetweenMm2: z.number().nullable(),
  greatestDistanceMm: z.number().nullable(),
  changes: z.array(z.strictObject({ says: z.string() })),
})

export type IssueStateName = z.infer<typeof IssueState>
export type IssueView = z.infer<typeof IssueAnswer>
export type IssueLineView = z.infer<typeof IssueLine>
export type RemarkView = z.infer<typeof RemarkAnswer>
export type DecisionView = z.infer<typeof DecisionAnswer>
export type DifferenceView = z.infer<typeof DifferenceAnswer>
export type Evidence = z.infer<typeof EvidenceDocument>
