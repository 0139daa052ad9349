import { z } from 'zod'
import {
  Email,
  Id,
  Instant,
  LengthMm,
  LongText,
  Money,
  OperationId,
  PositiveMm,
  Role,
  ShortText,
  Units,
  Vocabulary,
} from './scalars'

// ---- session -------------------------------------------------------------------------------------------------

export const SignInRequest = z.strictObject({ email: Email, password: z.string().min(1).max(1000) })
/** The first manager of an empty installation, by the one-time link that the start prints. */
export const FirstManagerRequest = z.strictObject({
  token: z.string().min(20).max(200),
  name: ShortText,
  email: Email,
  password: z.string().min(8).max(1000),
  workshop: ShortText,
})
export const MembershipAnswer = z.strictObject({
  role: Role,
  client: z.strictObject({ id: Id, name: z.string() }).nullable(),
  mill: z.strictObject({ id: Id, name: z.string() }).nullable(),
})
export const SessionAnswer = z.strictObject({
  person: z.strictObject({
    id: Id,
    name: z.string(),
    email: z.string(),
    units: Units.nullable(),
    vocabulary: Vocabulary.nullable(),
  }),
  memberships: z.array(MembershipAnswer),
  workshop: z.strictObject({ name: z.string(), units: Units, vocabulary: Vocabulary, currency: z.string() }),
})
/** A person's own preferences; null takes the workshop's. */
export const PreferencesRequest = z.strictObject({
  units: Units.nullable(),
  vocabulary: Vocabulary.nullable(),
})

// ---- people, clients ------------------------------------------------------------------------------------------

export const MembershipRequest = z.strictObject({
  role: Role,
  clientId: Id.nullable(),
  millId: Id.nullable(),
})
export const PersonRequest = z.strictObject({
  name: ShortText,
  email: Email,
  password: z.string().min(8).max(1000),
  memberships: z.array(MembershipRequest).min(1).max(20),
})
export const PersonChangeRequest = z.strictObject({
  version: z.int(),
  name: ShortText.optional(),
  password: z.string().min(8).max(1000).optional(),
  memberships: z.array(MembershipRequest).min(1).max(20).optional(),
  state: z.enum(['active', 'archived']).optional(),
})
export const PersonAnswer = z.strictObject({
  id: Id,
  name: z.string(),
  email: z.string(),
  state: z.enum(['active', 'archived']),
  memberships: z.array(MembershipAnswer),
  version: z.int(),
})
export const ClientRequest = z.strictObject({ name: ShortText })
export const ClientChangeRequest = z.strictObject({
  version: z.int(),
  name: ShortText.optional(),
  state: z.enum(['active', 'archived']).optional(),
})
export const ClientAnswer = z.strictObject({
  id: Id,
  name: z.string(),
  state: z.enum(['active', 'archived']),
  version: z.int(),
})

// ---- mills and saws, with their cards (numbered versions, never changed in place) ------------------------------

export const MillCardDocument = z.strictObject({
  maxWidth: PositiveMm,
  maxDepth: PositiveMm,
  wheelNose: LengthMm,
  wheelWidth: LengthMm,
  maxToothRatio: z.number().gt(0).max(100),
  sideClearance: z.strictObject({ angle: z.number().min(0).max(45), over: LengthMm }),
  leastWood: LengthMm,
  machiningAllowance: LengthMm,
  head: z.strictObject({
    cuttingDiameter: PositiveMm,
    hookAngle: z.number().min(0).max(45),
    knives: z.int().min(1).max(24),
    finishingKnives: z.int().min(1).max(24),
    rpm: z.number().gt(0).max(40_000),
    maxRpm: z.number().gt(0).max(40_000),
    feed: z.number().gt(0).max(1_000_000),
    feedBy: z.enum(['mechanical', 'manual']),
  }),
  /** Sizes that can be ordered, mm; with a price each or none at all. */
  lengths: z
    .array(z.strictObject({ length: PositiveMm, price: Money.nullable() }))
    .min(1)
    .max(50),
})
export const MillRequest = z.strictObject({
  name: ShortText,
  email: Email,
  card: MillCardDocument.nullable(),
})
export const MillChangeRequest = z.strictObject({
  version: z.int(),
  name: ShortText.optional(),
  email: Email.optional(),
  state: z.enum(['active', 'archived']).optional(),
})
export const MillCardRequest = z.strictObject({ document: MillCardDocument, operationId: OperationId })
export const MillCardAnswer = z.strictObject({ id: Id, no: z.int(), at: Instant, document: MillCardDocument })
export const MillAnswer = z.strictObject({
  id: Id,
  name: z.string(),
  email: z.string(),
  state: z.enum(['active', 'archived']),
  version: z.int(),
  card: MillCardAnswer.nullable(),
})
export const SawCardDocument = z.strictObject({
  name: ShortText,
  kerf: LengthMm,
  margin: LengthMm,
  endTrim: LengthMm,
  shortestSafe: LengthMm,
  smallestUsableOffcut: LengthMm,
})
export const SawCardRequest = z.strictObject({ document: SawCardDocument, operationId: OperationId })
export const SawCardAnswer = z.strictObject({ id: Id, no: z.int(), at: Instant, document: SawCardDocument })

// ---- settings --------------------------------------------------------------------------------------------------

export const SettingsDocument = z.strictObject({
  workshop: ShortText,
  units: Units,
  vocabulary: Vocabulary,
  currency: z.string().regex(/^[A-Z]{3}$/),
  allowance: LengthMm,
  /** The person and words that letters to mills are signed with. */
  signature: LongText,
})
export const SettingsRequest = z.strictObject({ version: z.int(), document: SettingsDocument })
export const SettingsAnswer = z.strictObject({ version: z.int(), document: SettingsDocument })

export type SessionView = z.infer<typeof SessionAnswer>
export type MembershipView = z.infer<typeof MembershipAnswer>
export type PersonView = z.infer<typeof PersonAnswer>
export type ClientView = z.infer<typeof ClientAnswer>
export type MillView = z.infer<typeof MillAnswer>
export type MillCard = z.infer<typeof MillCardDocument>
export type MillCardView = z.infer<typeof MillCardAnswer>
export type SawCard = z.infer<typeof SawCardDocument>
export type SawCardView = z.infer<typeof SawCardAnswer>
export type Settings = z.infer<typeof SettingsDocument>
