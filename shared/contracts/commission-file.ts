import { z } from 'zod'
import type { Fault } from '@shared/failure'
import { parseLength } from '@shared/units'
import { faultsOf } from './faults'
import { sectionSchemaOf } from './section'
import type { LengthSchema } from './section'

/**
 * The commission file, written once: the validators the API uses, and the published JSON Schema.
 * Lengths are millimetres, or with "units": "in" numbers of inches or texts such as "36 1/4"; the result is always mm.
 */

/** Largest file taken, bytes. */
export const COMMISSION_FILE_BYTES = 8 * 1024 * 1024
const MM_PER_INCH = 25.4
const MOST_MM = 1_000_000

const text = z.string().max(500)
const money = z.string().regex(/^\d{1,12}(\.\d{1,4})?$/, 'it must be a decimal text such as "18.50"')
const list = <T extends z.ZodType>(of: T) => z.array(of).max(10_000)
const ratio = z.number().min(0).max(100)
const pixel = z.number().min(-1_000_000).max(1_000_000)
const imagePoint = z.tuple([pixel, pixel])

const inMillimetres: LengthSchema = z.number().min(-MOST_MM).max(MOST_MM)
/** A number of inches, or a text as a person writes it; gives mm. */
const inInches: LengthSchema = z
  .union([z.number().min(-MOST_MM).max(MOST_MM), z.string().max(100)])
  .transform((value, context) => {
    if (typeof value === 'number') return value * MM_PER_INCH
    const parsed = parseLength(value, 'in')
    if (parsed.kind === 'length') return parsed.mm
    context.addIssue({ code: 'custom', message: parsed.says, input: value })
    return z.NEVER
  })

/** As `length`, refusing what is below nothing (or nothing itself). */
const atLeast = (length: LengthSchema, least: number, says: string): LengthSchema =>
  length.refine((mm) => mm >= least, { error: says })
const notNegative = (length: LengthSchema) => atLeast(length, 0, 'it must not be negative')
const positive = (length: LengthSchema): LengthSchema =>
  length.refine((mm) => mm > 0, { error: 'it must be more than 0' })

function pictureShapeOf(length: LengthSchema) {
  const size = positive(length)
  const readings = z.union([size.transform((mm) => [mm]), list(size).min(1)])
  const part = notNegative(length).exactOptional()
  return {
    width: readings.exactOptional(),
    height: readings.exactOptional(),
    acrossFlats: readings.exactOptional(),
    diagonals: z.array(size).max(2).default([]),
    thickness: part,
    allowance: notNegative(length).default(0),
    lining: notNegative(length).default(0),
    stack: z.strictObject({ glazing: part, airGap: part, backing: part, fixings: part }).exactOptional(),
  }
}

function workshopShapeOf(length: LengthSchema) {
  const size = positive(length)
  const amount = notNegative(length)
  return {
    head: z
      .strictObject({
        cuttingDiameter: size,
        hookAngle: z.number().min(0).max(60),
        knives: z.int().min(1).max(24).exactOptional(),
        finishingKnives: z.int().min(1).max(24).default(1),
        rpm: z.number().gt(0).max(100_000).exactOptional(),
        maxRpm: z.number().gt(0).max(100_000).exactOptional(),
        feed: z.number().gt(0).max(10_000_000).exactOptional(),
        feedBy: z.enum(['mechanical', 'manual']).exactOptional(),
      })
      .exactOptional(),
    mill: z
      .strictObject({
        maxWidth: size.exactOptional(),
        maxDepth: size.exactOptional(),
        wheelNose: amount.exactOptional(),
        wheelWidth: amount.exactOptional(),
        maxToothRatio: z.number().gt(0).max(1000).exactOptional(),
        sideClearance: z.strictObject({ angle: z.number().min(0).max(89), over: amount }).exactOptional(),
        leastWood: amount.exactOptional(),
        machiningAllowance: amount.exactOptional(),
      })
      .exactOptional(),
    saw: z
      .strictObject({
        kerf: amount.default(0),
        margin: amount.default(0),
        endTrim: amount.default(0),
        shortestSafe: amount.default(0),
        smallestUsableOffcut: amount.default(0),
      })
      .exactOptional(),
    lengths: list(
      z.strictObject({
        length: size,
        price: money.exactOptional(),
        count: z.int().min(0).max(1_000_000).exactOptional(),
      }),
    ).exactOptional(),
    rack: list(
      z.strictObject({ id: text.min(1), length: size, endTrim: z.tuple([amount, amount]).exactOptional() }),
    ).exactOptional(),
    demand: list(
      z.strictObject({
        id: text.min(1),
        length: size,
        count: z.int().min(1).max(10_000).default(1),
        mitre: z.number().min(0).lt(90).default(0),
        frame: text.exactOptional(),
        side: text.exactOptional(),
      }),
    ).exactOptional(),
    order: z
      .strictObject({
        setupPieces: z.int().min(0).max(10_000).default(0),
        firstOff: amount.default(0),
        reserve: ratio.default(0),
      })
      .exactOptional(),
  }
}

function finishShapeOf(length: LengthSchema) {
  const climate = z.strictObject({
    temperature: z.number().min(-50).max(150),
    humidity: z.number().min(0).max(100),
  })
  return {
    timber: z
      .strictObject({
        species: text.min(1),
        cut: z.enum(['flat', 'quarter']).default('flat'),
        workshop: climate.exactOptional(),
        gallery: climate.exactOptional(),
      })
      .exactOptional(),
    finish: z
      .strictObject({
        zones: list(
          z.strictObject({
            from: z.int().min(0),
            to: z.int().min(0),
            leaf: positive(length).exactOptional(),
            lap: notNegative(length).default(0),
            waste: ratio.default(0),
          }),
        ),
      })
      .exactOptional(),
  }
}

function evidenceShapeOf(length: LengthSchema) {
  const side = z.enum(['top', 'right', 'bottom', 'left'])
  const corner = z.enum(['top-left', 'top-right', 'bottom-right', 'bottom-left'])
  const about = positive(length)
  const size = z.union([about, z.strictObject({ value: about, plusMinus: notNegative(length) })])
  const extent = z.strictObject({ width: about, height: about })
  const breakNumber = z.int().min(0).max(1000)
  return {
    photographs: list(
      z.strictObject({
        id: text.min(1),
        width: z.int().min(1).max(1_000_000),
        height: z.int().min(1).max(1_000_000),
        pickError: z.number().gt(0).max(1000).default(1),
        focalLength: z
          .union([
            z.null(),
            z.number().gt(0),
            z.strictObject({ value: z.number().gt(0), plusMinus: z.number().min(0) }),
          ])
          .default(null),
        principalPoint: z
          .union([z.null(), imagePoint, z.strictObject({ value: imagePoint, plusMinus: z.number().min(0) })])
          .default(null),
        cropped: z.boolean().default(false),
        reversed: z.boolean().default(false),
        distortion: z.number().min(-10).max(10).exactOptional(),
        reference: z.strictObject({
          width: size.exactOptional(),
          height: size.exactOptional(),
          y: length.exactOptional(),
          corners: z
            .array(z.union([imagePoint, z.null()]))
            .length(4)
            .exactOptional(),
          edges: list(z.strictObject({ side, at: list(imagePoint) })).exactOptional(),
          points: list(z.strictObject({ on: z.tuple([length, length]), at: imagePoint })).exactOptional(),
          picture: extent.exactOptional(),
        }),
        marks: list(
          z.union([
            z.strictObject({ break: breakNumber, rail: side, at: imagePoint }),
            z.strictObject({ break: breakNumber, mitre: corner, at: imagePoint }),
          ]),
        ).default([]),
      }),
    ).exactOptional(),
    knowns: list(
      z.strictObject({
        break: breakNumber,
        x: length.exactOptional(),
        y: length.exactOptional(),
        plusMinus: notNegative(length),
      }),
    ).exactOptional(),
  }
}

function fileSchemaOf(units: 'mm' | 'in', length: LengthSchema) {
  return z.strictObject({
    listel: z.literal(1),
    units: units === 'in' ? z.literal('in') : z.literal('mm').default('mm'),
    title: text.exactOptional(),
    artist: text.exactOptional(),
    accession: text.exactOptional(),
    due: z.iso.date().exactOptional(),
    currency: z
      .string()
      .regex(/^[A-Z]{3}$/, 'it must be three capitals such as "EUR"')
      .exactOptional(),
    picture: z.strictObject(pictureShapeOf(length)).exactOptional(),
    /** Several pictures of one commission, each with its own measurement and number of frames; instead of `picture`. */
    pictures: list(
      z.strictObject({
        name: text.min(1),
        count: z.int().min(1).max(10_000).default(1),
        ...pictureShapeOf(length),
      }),
    ).exactOptional(),
    section: sectionSchemaOf(length).exactOptional(),
    frame: z
      .strictObject({
        sides: z.int().min(3).max(360).default(4),
        count: z.int().min(1).max(10_000).default(1),
      })
      .exactOptional(),
    ...workshopShapeOf(length),
    ...finishShapeOf(length),
    ...evidenceShapeOf(length),
  })
}

const MillimetreFile = fileSchemaOf('mm', inMillimetres)
const InchFile = fileSchemaOf('in', inInches)

/** A commission file as read: mm, defaults filled in. */
export type CommissionFile = z.infer<typeof MillimetreFile>
export type CommissionFilePicture = NonNullable<CommissionFile['picture']>

export type FileReading =
  | { readonly kind: 'read'; readonly file: CommissionFile }
  | { readonly kind: 'refused'; readonly faults: readonly Fault[] }

/** Reads a commission file that has been parsed from JSON. All faults are told, each with its JSON pointer. */
export function readCommissionFile(input: unknown): FileReading {
  const inches = typeof input === 'object' && input !== null && 'units' in input && input.units === 'in'
  const result = (inches ? InchFile : MillimetreFile).safeParse(input)
  if (!result.success) return { kind: 'refused', faults: faultsOf(result.error, input) }
  const file: CommissionFile = { ...result.data, units: 'mm' }
  const faults = faultsAcross(file)
  return faults.length > 0 ? { kind: 'refused', faults } : { kind: 'read', file }
}

/** Reads the text of a commission file: its size, its JSON, then its contents. */
export function readCommissionText(text: string, bytes: number): FileReading {
  if (bytes > COMMISSION_FILE_BYTES) {
    return refused(
      'too-large',
      `The file is ${bytes} bytes; a commission file has at most ${COMMISSION_FILE_BYTES}.`,
    )
  }
  try {
    return readCommissionFile(JSON.parse(text))
  } catch (error) {
    if (!(error instanceof SyntaxError || error instanceof RangeError)) throw error
    return refused('not-json', `The file is not JSON: ${error.message}`)
  }
}

const refused = (code: string, says: string): FileReading => ({
  kind: 'refused',
  faults: [{ path: '', code, says }],
})

/** Rules that join several fields. */
function faultsAcross(file: CommissionFile): Fault[] {
  const faults: Fault[] = []
  const say = (path: string, code: string, says: string) => faults.push({ path, code, says })
  if (file.picture && file.pictures)
    say('/pictures', 'both-given', 'Give either "picture" or "pictures", not both.')
  const polygon = (file.frame?.sides ?? 4) !== 4
  const pictures: readonly (readonly [string, CommissionFilePicture])[] = [
    ...(file.picture ? [['/picture', file.picture] as const] : []),
    ...(file.pictures ?? []).map((picture, index) => [`/pictures/${index}`, picture] as const),
  ]
  for (const [path, picture] of pictures) faults.push(...pictureFaults(path, picture, polygon))
  const priced = (file.lengths ?? []).filter(({ price }) => price !== undefined).length
  if (priced > 0 && priced < (file.lengths ?? []).length) {
    say(
      '/lengths',
      'some-priced',
      'If any length has a price all must have one; give each its price or none.',
    )
  }
  if (priced > 0 && file.currency === undefined) {
    say(
      '/currency',
      'missing',
      'is missing; it must be given with any price, as three capitals such as "EUR".',
    )
  }
  faults.push(
    ...repeated('/rack', file.rack),
    ...repeated('/demand', file.demand),
    ...repeated('/photographs', file.photographs),
  )
  return faults
}

function pictureFaults(path: string, picture: CommissionFilePicture, polygon: boolean): Fault[] {
  const wanted = polygon ? (['acrossFlats'] as const) : (['width', 'height'] as const)
  const unwanted = polygon ? (['width', 'height'] as const) : (['acrossFlats'] as const)
  return [
    ...wanted
      .filter((name) => picture[name] === undefined)
      .map((name) => ({
        path: `${path}/${name}`,
        code: 'missing',
        says: `is missing; a frame of ${polygon ? 'this number of' : 'four'} sides needs it.`,
      })),
    ...unwanted
      .filter((name) => picture[name] !== undefined)
      .map((name) => ({
        path: `${path}/${name}`,
        code: 'not-wanted',
        says: `has no meaning for ${polygon ? 'this number of' : 'four'} sides; take it out.`,
      })),
  ]
}

function repeated(path: string, rows: readonly { readonly id: string }[] | undefined): Fault[] {
  const seen = new Set<string>()
  return (rows ?? []).flatMap(({ id }, index) => {
    if (!seen.has(id)) {
      seen.add(id)
      return []
    }
    return [
      {
        path: `${path}/${index}/id`,
        code: 'repeated',
        says: `is "${id}", which stands above already; each must be its own.`,
      },
    ]
  })
}

/** The published JSON Schema (2020-12) of the file: both ways of writing lengths. */
export function commissionFileJsonSchema(): object {
  const schemaOf = (schema: z.ZodType) => z.toJSONSchema(schema, { io: 'input', target: 'draft-2020-12' })
  return {
    $schema: 'https://json-schema.org/draft/2020-12/schema',
    title: 'Listel commission file, version 1',
    oneOf: [schemaOf(MillimetreFile), schemaOf(InchFile)],
  }
}
