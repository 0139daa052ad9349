import { Failure } from '@shared/failure'

const MM_PER_INCH = 25.4
/** One board foot: 144 cubic inches, mm³. */
export const BOARD_FOOT_MM3 = 144 * MM_PER_INCH ** 3

/** A thickness by which rough timber is sold, in quarters of an inch. */
export type NominalThickness = '4/4' | '5/4' | '6/4' | '8/4' | '10/4' | '12/4' | '16/4'

/** Nominal thicknesses, thin to thick; the rough thickness of n/4 is n quarters of an inch. */
export const NOMINAL_THICKNESSES: readonly NominalThickness[] = [
  '4/4',
  '5/4',
  '6/4',
  '8/4',
  '10/4',
  '12/4',
  '16/4',
]

/** Rough thickness of a nominal size, mm. */
export const nominalThicknessMmOf = (nominal: NominalThickness): number =>
  (Number.parseInt(nominal, 10) / 4) * MM_PER_INCH

/** Most boards that are glued one on another into a blank. */
const MOST_LAYERS = 10
/** Sizes that miss a nominal thickness by less than this are binary rounding, not wood, mm. */
const ROUNDING_MM = 1e-9

export interface BlankRequest {
  /** Width and thickness of the moulding as it lies to be run, mm. */
  readonly widthMm: number
  readonly thicknessMm: number
  /** What machining takes off a board in each direction in all, both faces or both edges together, mm. */
  readonly machiningAllowanceMm: number
  /** What the yard has; all nominal thicknesses when absent. */
  readonly available?: readonly NominalThickness[]
}

export interface Blank {
  /** Rough size that is needed, mm: finished + allowance; for a glued-up blank before its boards are planed for gluing. */
  readonly thicknessMm: number
  readonly widthMm: number
  readonly nominal: NominalThickness
  /** Boards one on another; 1 is a solid blank. */
  readonly layers: number
  /** As written on an order: '8/4', or '2 × 6/4 glued up'. */
  readonly label: string
}

/**
 * Rough blank of a moulding: the thinnest nominal thickness that holds finished + allowance, else the fewest and then
 * the thinnest boards glued up, each of which loses the allowance (its two faces are planed, whether for glue or outside).
 */
export function blankFor(request: BlankRequest): Blank {
  refuseSizes(request)
  const { widthMm, thicknessMm, machiningAllowanceMm, available = NOMINAL_THICKNESSES } = request
  const nominals = NOMINAL_THICKNESSES.filter((nominal) => available.includes(nominal))
  for (let layers = 1; layers <= MOST_LAYERS; layers += 1) {
    const needed = thicknessMm + layers * machiningAllowanceMm
    const nominal = nominals.find((each) => layers * nominalThicknessMmOf(each) >= needed - ROUNDING_MM)
    if (nominal === undefined) continue
    const label = layers === 1 ? nominal : `${layers} × ${nominal} glued up`
    return { thicknessMm: needed, widthMm: widthMm + machiningAllowanceMm, nominal, layers, label }
  }
  const says = `No blank of up to ${MOST_LAYERS} boards is ${thicknessMm} mm thick after machining; make the section thinner or the machining allowance less.`
  throw new Failure('input-invalid', { says, faults: [{ path: '/thickness', code: 'too-thick', says }] })
}

/**
 * Board feet of a length of blank, by the hardwood rules: nominal thickness × rough width × length ÷ 144 in³, every board
 * of a glued-up blank counted. Not rounded and without waste. No nominal size here is under 1 in, below which stock counts as 1 in.
 */
export function boardFeetOf(blank: Pick<Blank, 'nominal' | 'layers' | 'widthMm'>, lengthMm: number): number {
  return (roughSectionMm2(blank) * lengthMm) / BOARD_FOOT_MM3
}

/** Cubic metres of a length of blank, counted as boardFeetOf counts. */
export function cubicMetresOf(
  blank: Pick<Blank, 'nominal' | 'layers' | 'widthMm'>,
  lengthMm: number,
): number {
  return (roughSectionMm2(blank) * lengthMm) / 1e9
}

/** What to buy when a share of the amount (0.2 = 20 % more) goes to waste: amount × (1 + share), as for leaf and reserves. */
export function withWaste(amount: number, share: number): number {
  if (Number.isFinite(share) && share >= 0) return amount * (1 + share)
  const says = `The share of waste is ${share}; it must be 0 or more, such as 0.2 for 20 %.`
  throw new Failure('input-invalid', { says, faults: [{ path: '/waste', code: 'out-of-range', says }] })
}

const roughSectionMm2 = ({ nominal, layers, widthMm }: Pick<Blank, 'nominal' | 'layers' | 'widthMm'>) =>
  layers * nominalThicknessMmOf(nominal) * widthMm

function refuseSizes({ widthMm, thicknessMm, machiningAllowanceMm, available }: BlankRequest): void {
  const faults = [
    ...tooSmall('/width', widthMm, widthMm > 0, 'more than 0 mm'),
    ...tooSmall('/thickness', thicknessMm, thicknessMm > 0, 'more than 0 mm'),
    ...tooSmall('/machiningAllowance', machiningAllowanceMm, machiningAllowanceMm >= 0, '0 mm or more'),
    ...(available?.length === 0
      ? [{ path: '/available', code: 'empty', says: 'No nominal thickness is available; name at least one.' }]
      : []),
  ]
  if (faults.length > 0)
    throw new Failure('input-invalid', { says: faults.map(({ says }) => says).join(' '), faults })
}

const tooSmall = (path: string, value: number, isFine: boolean, wanted: string) =>
  isFine && Number.isFinite(value)
    ? []
    : [{ path, code: 'out-of-range', says: `${path.slice(1)} is ${value}; it must be ${wanted}.` }]
