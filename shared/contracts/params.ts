import { z } from 'zod'
import { CommissionLine, MeasurementAnswer, Stage, TrailLine, WaitingLine } from './commissions'
import { ClientAnswer, MillAnswer, MillCardAnswer, PersonAnswer, SawCardAnswer } from './people'
import { CutListLine, RackPieceAnswer } from './lengths'
import { LetterBrief, OrderLine } from './orders'
import { IssueLine } from './review'
import { Id } from './scalars'

/** What stands in a path or after its question mark. */

/** For what takes nothing there. */
export const Nothing = z.strictObject({})
export const IdParams = z.strictObject({ id: Id })
export const CommissionListQuery = z.strictObject({
  state: z.enum(['open', 'archived', 'all']).default('open'),
  clientId: Id.optional(),
  stage: Stage.optional(),
  /** Words sought in number, title, artist, accession number and client. */
  find: z.string().trim().max(200).optional(),
})
export const ListQuery = z.strictObject({ state: z.enum(['active', 'archived', 'all']).default('active') })
export const ImageQuery = z.strictObject({ size: z.enum(['screen', 'thumb']).default('screen') })

export const HealthAnswer = z.strictObject({ alive: z.literal(true) })
export const ReadyAnswer = z.strictObject({ ready: z.literal(true) })
export const FaultAnswer = z.strictObject({
  error: z.looseObject({
    code: z.string(),
    says: z.string(),
    faults: z.array(z.strictObject({ path: z.string(), code: z.string(), says: z.string() })).optional(),
  }),
  requestId: z.string(),
})

/** Lists, as they are answered. */
export const PeopleAnswer = z.array(PersonAnswer)
export const ClientsAnswer = z.array(ClientAnswer)
export const MillsAnswer = z.array(MillAnswer)
export const MillCardsAnswer = z.array(MillCardAnswer)
export const SawsAnswer = z.array(SawCardAnswer)
export const CommissionsAnswer = z.array(CommissionLine)
export const MeasurementsAnswer = z.array(MeasurementAnswer)
export const TrailAnswer = z.array(TrailLine)
export const WaitingAnswer = z.array(WaitingLine)

export const IssuesAnswer = z.array(IssueLine)
/** A sheet is asked for by its thing and its form. */
export const SheetParams = z.strictObject({ id: Id, format: z.enum(['pdf', 'dxf', 'svg']) })
export const OrdersAnswer = z.array(OrderLine)
export const LettersAnswer = z.array(LetterBrief)
export const AttachmentParams = z.strictObject({ id: Id, index: z.coerce.number().int().min(0).max(100) })
export const TokenParams = z.strictObject({ token: z.string().min(20).max(200) })
export const RackAnswer = z.array(RackPieceAnswer)
export const CutListsAnswer = z.array(CutListLine)
