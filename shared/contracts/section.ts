import { z } from 'zod'
import type { DraftSection, Section, SectionEdit } from '@shared/section'

const text500 = z.string().min(1).max(500)
/** Wide on purpose: whether a dimension makes sense is said by shared/section with the place and the mend, not by a bare range here. */
const mm = z.number().min(-10_000).max(10_000)
const degrees = z.number().min(-360).max(360)
const count = z.int().min(1).max(1000)

export const BasisSchema = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('measured'),
    plusMinus: z.number().min(0).max(10_000),
    photograph: text500.exactOptional(),
  }),
  z.strictObject({ kind: z.literal('precedent'), citation: text500 }),
  z.strictObject({ kind: z.literal('judged'), note: text500 }),
])

const common = {
  width: mm,
  rise: mm,
  basis: z
    .strictObject({ width: BasisSchema.exactOptional(), rise: BasisSchema.exactOptional() })
    .exactOptional(),
}
const pair = z.tuple([mm, mm])
const withKey = { key: z.string().min(1).max(64) }

const shapes = {
  fillet: { kind: z.literal('fillet'), ...common },
  splay: { kind: z.literal('splay'), ...common },
  cavetto: { kind: z.literal('cavetto'), ...common, arc: degrees.exactOptional() },
  ovolo: { kind: z.literal('ovolo'), ...common, arc: degrees.exactOptional() },
  thumb: { kind: z.literal('thumb'), ...common, hollow: z.boolean().exactOptional() },
  cymaRecta: { kind: z.literal('cyma-recta'), ...common, arc: degrees.exactOptional() },
  cymaReversa: { kind: z.literal('cyma-reversa'), ...common, arc: degrees.exactOptional() },
  scotia: { kind: z.literal('scotia'), ...common },
  torus: { kind: z.literal('torus'), ...common },
  bead: { kind: z.literal('bead'), ...common },
  reeds: { kind: z.literal('reeds'), ...common, count, fillet: mm },
  flutes: { kind: z.literal('flutes'), ...common, count, fillet: mm, depth: mm },
  quirk: { kind: z.literal('quirk'), ...common, depth: mm, shape: z.enum(['square', 'v']) },
  free: {
    kind: z.literal('free'),
    ...common,
    curves: z
      .array(z.tuple([pair, pair, pair]))
      .min(1)
      .max(500),
    corners: z.array(z.int().min(1)).max(500).exactOptional(),
  },
}

export const MemberSchema = z.discriminatedUnion('kind', [
  z.strictObject(shapes.fillet),
  z.strictObject(shapes.splay),
  z.strictObject(shapes.cavetto),
  z.strictObject(shapes.ovolo),
  z.strictObject(shapes.thumb),
  z.strictObject(shapes.cymaRecta),
  z.strictObject(shapes.cymaReversa),
  z.strictObject(shapes.scotia),
  z.strictObject(shapes.torus),
  z.strictObject(shapes.bead),
  z.strictObject(shapes.reeds),
  z.strictObject(shapes.flutes),
  z.strictObject(shapes.quirk),
  z.strictObject(shapes.free),
])

export const DraftMemberSchema = z.discriminatedUnion('kind', [
  z.strictObject({ ...shapes.fillet, ...withKey }),
  z.strictObject({ ...shapes.splay, ...withKey }),
  z.strictObject({ ...shapes.cavetto, ...withKey }),
  z.strictObject({ ...shapes.ovolo, ...withKey }),
  z.strictObject({ ...shapes.thumb, ...withKey }),
  z.strictObject({ ...shapes.cymaRecta, ...withKey }),
  z.strictObject({ ...shapes.cymaReversa, ...withKey }),
  z.strictObject({ ...shapes.scotia, ...withKey }),
  z.strictObject({ ...shapes.torus, ...withKey }),
  z.strictObject({ ...shapes.bead, ...withKey }),
  z.strictObject({ ...shapes.reeds, ...withKey }),
  z.strictObject({ ...shapes.flutes, ...withKey }),
  z.strictObject({ ...shapes.quirk, ...withKey }),
  z.strictObject({ ...shapes.free, ...withKey }),
])

const frameOfSection = {
  sightEdgeHeight: mm,
  rebate: z.strictObject({ width: mm, depth: mm }),
  backSplay: z.strictObject({ x: mm, height: mm }),
  tolerance: z.number().min(0).max(100),
  basis: z.strictObject({ sightEdgeHeight: BasisSchema.exactOptional() }).exactOptional(),
}
const gessoStretches = z
  .array(z.strictObject({ from: z.int().min(0), to: z.int().min(0), thickness: mm }))
  .max(1000)
const draftGessoStretches = z
  .array(z.strictObject({ from: z.string().min(1).max(64), to: z.string().min(1).max(64), thickness: mm }))
  .max(1000)

/** A section whole, as an issue freezes it (defaults filled in). */
export const SectionSchema = z.strictObject({
  ...frameOfSection,
  gesso: z.union([mm, gessoStretches]),
  members: z.array(MemberSchema).max(1000),
}) satisfies z.ZodType<Section>

/** A section being drawn: members and stretches held by keys. */
export const DraftSectionSchema = z.strictObject({
  ...frameOfSection,
  gesso: z.union([mm, draftGessoStretches]),
  members: z.array(DraftMemberSchema).max(1000),
}) satisfies z.ZodType<DraftSection>

const setField = z.discriminatedUnion('field', [
  z.strictObject({ act: z.literal('set'), field: z.literal('sightEdgeHeight'), value: mm }),
  z.strictObject({ act: z.literal('set'), field: z.literal('rebate'), value: frameOfSection.rebate }),
  z.strictObject({ act: z.literal('set'), field: z.literal('backSplay'), value: frameOfSection.backSplay }),
  z.strictObject({
    act: z.literal('set'),
    field: z.literal('gesso'),
    value: z.union([mm, draftGessoStretches]),
  }),
  z.strictObject({ act: z.literal('set'), field: z.literal('tolerance'), value: frameOfSection.tolerance }),
  z.strictObject({
    act: z.literal('set'),
    field: z.literal('basis'),
    value: z.strictObject({ sightEdgeHeight: BasisSchema.exactOptional() }),
  }),
])

/** One step of drawing. */
export const SectionEditSchema: z.ZodType<SectionEdit> = z.lazy(() =>
  z.union([
    setField,
    z.strictObject({ act: z.literal('put-in'), at: z.int().min(0), member: DraftMemberSchema }),
    z.strictObject({ act: z.literal('take-out'), key: withKey.key }),
    z.strictObject({ act: z.literal('move'), key: withKey.key, to: z.int().min(0) }),
    z.strictObject({ act: z.literal('change'), key: withKey.key, member: DraftMemberSchema }),
    z.strictObject({ act: z.literal('together'), edits: z.array(SectionEditSchema).max(1000) }),
    z.strictObject({ act: z.literal('replace-all'), section: DraftSectionSchema }),
  ]),
)
