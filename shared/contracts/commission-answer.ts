import { z } from 'zod'

/** What `compute` answers: one schema, used by the command line, its published form and the tests. Parts without input are absent. */

const number = z.number()
const point = z.tuple([number, number])
const sha256 = z.string().regex(/^[0-9a-f]{64}$/)

export const CheckAnswer = z.strictObject({
  code: z.enum([
    'undercut',
    'steep-wall',
    'wheel-nose',
    'wheel-width',
    'tooth',
    'head-width',
    'head-depth',
    'least-wood',
    'feather',
    'stack',
    'clamp',
    'speed',
  ]),
  severity: z.enum(['stop', 'warn', 'note']),
  value: number,
  limit: number,
  at: point,
  says: z.string(),
})

const SectionPart = z.strictObject({
  area: number,
  width: number,
  depth: number,
  girth: number,
  centroid: point,
  secondMoments: z.strictObject({ xx: number, yy: number, xy: number }),
  breaks: z.array(point),
  sha256,
})

const WoodPart = z.strictObject({
  area: number,
  width: number,
  depth: number,
  girth: number,
  centroid: point,
  lip: number,
  leastWood: z.strictObject({ thickness: number, at: point }),
  blank: z.strictObject({ width: number, thickness: number, tilt: number }),
  swallowed: z.array(z.strictObject({ member: z.int(), says: z.string() })),
  checks: z.array(CheckAnswer),
  sha256,
})

const KnifePart = z.strictObject({
  height: number,
  width: number,
  table: z.array(z.strictObject({ x: number, depth: number, face: number })),
  feedPerMark: number.optional(),
  marksPerInch: number.optional(),
  peripheralSpeed: number.optional(),
  cautions: z.array(z.string()),
})

const RailsPart = z.strictObject({
  rebateOpening: point,
  sight: point,
  outside: point,
  cover: point.optional(),
  list: z.array(
    z.strictObject({
      side: z.string(),
      count: z.int(),
      longPoint: number,
      rebate: number,
      sight: number,
      mitre: number,
    }),
  ),
  footage: number,
  volume: number,
  mass: number.optional(),
})

const PlanPart = z.strictObject({
  opened: z.array(
    z.strictObject({
      from: z.string(),
      source: z.enum(['rack', 'order']),
      length: number,
      cuts: z.array(z.strictObject({ id: z.string(), copy: z.int(), length: number, at: number })),
      offcut: number,
    }),
  ),
  count: z.int(),
  cost: z.string().nullable(),
  bound: z.union([number, z.string()]),
  proven: z.boolean(),
  toOrder: z.array(z.strictObject({ length: number, count: z.int() })),
  warnings: z.array(z.string()),
})

const TimberPart = z.strictObject({
  blank: z.strictObject({ thickness: number, width: number, nominal: z.string() }).optional(),
  boardFeet: number.optional(),
  emc: z.strictObject({ workshop: number.optional(), gallery: number.optional() }).optional(),
  movement: number.optional(),
  mitreGap: number.optional(),
  cautions: z.array(z.string()),
})

const PhotographPart = z.strictObject({
  id: z.string(),
  says: z.array(z.strictObject({ code: z.string(), text: z.string() })),
})

/** Out. */
export const CommissionAnswerSchema = z.strictObject({
  section: SectionPart.optional(),
  wood: WoodPart.optional(),
  knife: KnifePart.optional(),
  rails: RailsPart.optional(),
  /** With several pictures: the rails of each. */
  pictures: z.array(z.strictObject({ name: z.string(), rails: RailsPart })).optional(),
  plan: PlanPart.optional(),
  timber: TimberPart.optional(),
  finish: z
    .strictObject({
      zones: z.array(
        z.strictObject({
          girth: number,
          area: number.optional(),
          leaves: number.optional(),
          books: number.optional(),
        }),
      ),
    })
    .optional(),
  photographs: z.array(PhotographPart).optional(),
})

export type CommissionAnswerData = z.infer<typeof CommissionAnswerSchema>

/** The published JSON Schema (2020-12) of the answer. */
export function commissionAnswerJsonSchema(): object {
  return {
    ...z.toJSONSchema(CommissionAnswerSchema, { target: 'draft-2020-12' }),
    title: 'Listel answer, version 1',
  }
}
