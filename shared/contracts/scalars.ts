import { z } from 'zod'

/** A key of ours: a UUID (version 7 when made by us). */
export const Id = z.uuid()
/** Made by whoever asks, so that a repeat of the same request returns the first answer. */
export const OperationId = z.uuid()
export const Sha256 = z.string().regex(/^[0-9a-f]{64}$/, 'must be 64 lower-case hexadecimal digits')
/** UTC, as 2026-12-01T09:30:00.000Z */
export const Instant = z.iso.datetime()
/** A day, as 2026-12-01 */
export const Day = z.iso.date()
/** A length, mm. */
export const Millimetres = z.number().min(-100_000).max(100_000)
/** A length that cannot be negative, mm. */
export const LengthMm = z.number().min(0).max(100_000)
/** A length greater than nothing, mm. */
export const PositiveMm = z.number().gt(0).max(100_000)
/** Money as a decimal string with at most four places: never a float. */
export const Money = z.string().regex(/^\d{1,12}(\.\d{1,4})?$/, 'must be an amount such as 18.50')
export const ShortText = z.string().trim().min(1).max(200)
export const LongText = z.string().trim().min(1).max(5000)
export const Email = z.email().max(254)

export const Role = z.enum(['manager', 'designer', 'curator', 'mill', 'bench'])
export const Units = z.enum(['mm', 'in'])
export const Vocabulary = z.enum(['moulding', 'molding'])

/** A measured place of a drawing, mm from the sight edge and above the wall. */
export const Place = z.strictObject({ x: Millimetres, y: Millimetres })

export const Done = z.strictObject({ done: z.literal(true) })

export type IdOf = z.infer<typeof Id>
export type RoleName = z.infer<typeof Role>
export type UnitsName = z.infer<typeof Units>
export type VocabularyName = z.infer<typeof Vocabulary>
