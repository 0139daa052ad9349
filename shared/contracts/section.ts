import { z } from 'zod'
import type { DraftSection, Section, SectionEdit } from '@shared/section'

/**
 * How a length is written: a bare number of millimetres between programs, or in a commission file perhaps inches and
 * fractions. Every schema below is made for one way of writing, and always gives millimetres.
 */
export type LengthSchema = z.ZodType<number>

/** Wide on purpose: whether a dimension makes sense is said by shared/section with the place and the mend, not by a bare range here. */
export const PlainLength: LengthSchema = z.number().min(-10_000).max(10_000)

const text500 = z.string().min(1).max(500)
const degrees = z.number().min(-360).max(360)
const count = z.int().min(1).max(1000)
const key = z.string().min(1).max(64)

export const basisSchemaOf = (length: LengthSchema) =>
  z.discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('measured'), plusMinus: length, photograph: text500.exactOptional() }),
    z.strictObject({ kind: z.literal('precedent'), citation: text500 }),
    z.strictObject({ kind: z.literal('judged'), note: text500 }),
  ])

/** The fourteen kinds of member; `extra` is added to each (a draft's key). */
function memberSchemaOf<Extra extends z.ZodRawShape>(length: LengthSchema, extra: Extra) {
  const basis = basisSchemaOf(length)
  const common = {
    width: length,
    rise: length,
    basis: z.strictObject({ width: basis.exactOptional(), rise: basis.exactOptional() }).exactOptional(),
    ...extra,
  }
  const arc = degrees.exactOptional()
  const pair = z.tuple([length, length])
  return z.discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('fillet'), ...common }),
    z.strictObject({ kind: z.literal('splay'), ...common }),
    z.strictObject({ kind: z.literal('cavetto'), ...common, arc }),
    z.strictObject({ kind: z.literal('ovolo'), ...common, arc }),
    z.strictObject({ kind: z.literal('thumb'), ...common, hollow: z.boolean().exactOptional() }),
    z.strictObject({ kind: z.literal('cyma-recta'), ...common, arc }),
    z.strictObject({ kind: z.literal('cyma-reversa'), ...common, arc }),
    z.strictObject({ kind: z.literal('scotia'), ...common }),
    z.strictObject({ kind: z.literal('torus'), ...common }),
    z.strictObject({ kind: z.literal('bead'), ...common }),
    z.strictObject({ kind: z.literal('reeds'), ...common, count, fillet: length.default(0) }),
    z.strictObject({ kind: z.literal('flutes'), ...common, count, fillet: length.default(0), depth: length }),
    z.strictObject({ kind: z.literal('quirk'), ...common, depth: length, shape: z.enum(['square', 'v']) }),
    z.strictObject({
      kind: z.literal('free'),
      ...common,
      curves: z
        .array(z.tuple([pair, pair, pair]))
        .min(1)
        .max(500),
      corners: z.array(z.int().min(1)).max(500).exactOptional(),
    }),
  ])
}

const sectionShapeOf = (length: LengthSchema) => ({
  sightEdgeHeight: length,
  rebate: z.strictObject({ width: length, depth: length }),
  backSplay: z.strictObject({ x: length, height: length }).default({ x: 0, height: 0 }),
  tolerance: length.default(0.2),
  basis: z.strictObject({ sightEdgeHeight: basisSchemaOf(length).exactOptional() }).exactOptional(),
})
const gessoSchemaOf = <Break extends z.ZodType>(length: LengthSchema, breakSchema: Break) =>
  z.union([
    length,
    z.array(z.strictObject({ from: breakSchema, to: breakSchema, thickness: length })).max(1000),
  ])

/** A section of a commission file: what is left out takes its default. */
export const sectionSchemaOf = (length: LengthSchema) =>
  z.strictObject({
    ...sectionShapeOf(length),
    gesso: gessoSchemaOf(length, z.int().min(0)).default(0),
    members: z.array(memberSchemaOf(length, {})).min(1).max(1000),
  })

/** A section whole, as an issue freezes it. */
export const SectionSchema = sectionSchemaOf(PlainLength) satisfies z.ZodType<Section>

export const DraftMemberSchema = memberSchemaOf(PlainLength, { key })
const draftGesso = gessoSchemaOf(PlainLength, key)

/** A section being drawn: members and stretches held by keys; it may still be bare. */
export const DraftSectionSchema = z.strictObject({
  ...sectionShapeOf(PlainLength),
  gesso: draftGesso.default(0),
  members: z.array(DraftMemberSchema).max(1000),
}) satisfies z.ZodType<DraftSection>

const shape = sectionShapeOf(PlainLength)
const setField = z.discriminatedUnion('field', [
  z.strictObject({ act: z.literal('set'), field: z.literal('sightEdgeHeight'), value: PlainLength }),
  z.strictObject({ act: z.literal('set'), field: z.literal('rebate'), value: shape.rebate }),
  z.strictObject({ act: z.literal('set'), field: z.literal('backSplay'), value: shape.backSplay.unwrap() }),
  z.strictObject({ act: z.literal('set'), field: z.literal('gesso'), value: draftGesso }),
  z.strictObject({ act: z.literal('set'), field: z.literal('tolerance'), value: PlainLength }),
  z.strictObject({ act: z.literal('set'), field: z.literal('basis'), value: shape.basis.unwrap() }),
])

/** One step of drawing. */
export const SectionEditSchema: z.ZodType<SectionEdit> = z.lazy(() =>
  z.discriminatedUnion('act', [
    setField,
    z.strictObject({ act: z.literal('put-in'), at: z.int().min(0), member: DraftMemberSchema }),
    z.strictObject({ act: z.literal('take-out'), key }),
    z.strictObject({ act: z.literal('move'), key, to: z.int().min(0) }),
    z.strictObject({ act: z.literal('change'), key, member: DraftMemberSchema }),
    z.strictObject({ act: z.literal('together'), edits: z.array(SectionEditSchema).max(1000) }),
    z.strictObject({ act: z.literal('replace-all'), section: DraftSectionSchema }),
  ]),
)
