import { Failure } from '@shared/failure'
import type { Fault } from '@shared/failure'
import { faultUnless, isAmount, isSize, refuseFaults } from './refusal'

/** A four-sided picture as measured, mm: readings each way, one or more; both diagonals or none that count. */
export interface PictureReadings {
  readonly width: readonly number[]
  readonly height: readonly number[]
  readonly diagonals?: readonly number[]
  /** Total clearance in each direction, mm. */
  readonly allowance: number
  /** Thickness of the rebate's lining, on each side, mm. */
  readonly lining: number
}

/** A regular picture of another number of sides: readings across the flats, mm, that is twice the apothem, for odd numbers of sides too. */
export interface PolygonReadings {
  readonly acrossFlats: readonly number[]
  readonly allowance: number
  readonly lining: number
}

/** What lies between the rebate's walls, mm. */
export type RebateOpening =
  | { readonly kind: 'rectangle'; readonly widthMm: number; readonly heightMm: number }
  | { readonly kind: 'polygon'; readonly acrossFlatsMm: number }

export interface MeasuredOpening {
  readonly opening: Extract<RebateOpening, { kind: 'rectangle' }>
  /** How far the picture's corners are from square, radians, never negative; 0 without two diagonals. */
  readonly skewRad: number
}

/** Least cover of the picture by the frame's lip, mm; negative where the picture's edge would show. */
export interface Cover {
  /** At the left or the right side. */
  readonly leftRightMm: number
  /** At the top or the bottom. */
  readonly topBottomMm: number
}

/**
 * Least rectangle that takes the picture as measured, plus allowance and twice the lining. With both diagonals of a leaning
 * picture sin δ = (d1² − d2²) ÷ 4wh on the mean readings (a parallelogram's), and with the greatest readings W and H the smaller in area of
 * (W + H·sin δ) × H and W × (H + W·sin δ); with none or one, W × H.
 */
export function rebateOpeningOf(picture: PictureReadings): MeasuredOpening {
  const { width, height, diagonals = [], allowance, lining } = picture
  refuseFaults([
    ...readingFaults('/width', width),
    ...readingFaults('/height', height),
    ...diagonals.flatMap((mm, index) => faultUnless(isSize(mm), `/diagonals/${index}`, mm, 'more than 0 mm')),
    ...faultUnless(
      diagonals.length <= 2,
      '/diagonals',
      `a list of ${diagonals.length}`,
      'two readings or fewer',
    ),
    ...clearanceFaults({ allowance, lining }),
  ])
  const [greatestWidth, greatestHeight] = [Math.max(...width), Math.max(...height)]
  const sine = sineOfSkew(picture)
  const wider = [greatestWidth + greatestHeight * sine, greatestHeight] as const
  const higher = [greatestWidth, greatestHeight + greatestWidth * sine] as const
  const [w, h] = wider[0] * wider[1] <= higher[0] * higher[1] ? wider : higher
  const clearance = allowance + 2 * lining
  return {
    opening: { kind: 'rectangle', widthMm: w + clearance, heightMm: h + clearance },
    skewRad: Math.asin(sine),
  }
}

/** Opening of a regular frame that is not four-sided: greatest reading across the flats + allowance + twice the lining. */
export function polygonOpeningOf(picture: PolygonReadings): Extract<RebateOpening, { kind: 'polygon' }> {
  const { acrossFlats, allowance, lining } = picture
  refuseFaults([...readingFaults('/acrossFlats', acrossFlats), ...clearanceFaults({ allowance, lining })])
  return { kind: 'polygon', acrossFlatsMm: Math.max(...acrossFlats) + allowance + 2 * lining }
}

/**
 * Least cover at each side of a four-sided picture: the smallest picture, by its least readings, pushed fully to the other side.
 * `rebateWidthMm` is the finished face's, from the sight edge to the rebate's wall.
 */
export function coverOf(picture: PictureReadings, rebateWidthMm: number): Cover {
  const { opening } = rebateOpeningOf(picture)
  const leastCover = (openingMm: number, readings: readonly number[]) =>
    rebateWidthMm - picture.lining - playIn(openingMm, readings, picture.lining)
  return {
    leftRightMm: leastCover(opening.widthMm, picture.width),
    topBottomMm: leastCover(opening.heightMm, picture.height),
  }
}

/**
 * Least cover at any side of a regular picture of `sides` sides, mm. Pushed straight away from one side it goes half the play past the
 * middle where a flat lies opposite, and further, by 1/cos(π/n), where a corner does (odd numbers of sides).
 */
export function polygonCoverOf(picture: PolygonReadings, sides: number, rebateWidthMm: number): number {
  const { acrossFlatsMm } = polygonOpeningOf(picture)
  const half = playIn(acrossFlatsMm, picture.acrossFlats, picture.lining) / 2
  const pushed = sides % 2 === 0 ? half : half / Math.cos(Math.PI / sides)
  return rebateWidthMm - picture.lining - half - pushed
}

/** How far the smallest picture can move between the linings in one direction, mm. */
const playIn = (openingMm: number, readings: readonly number[], lining: number) =>
  openingMm - 2 * lining - Math.min(...readings)

function sineOfSkew({ width, height, diagonals = [] }: PictureReadings): number {
  const [first, second] = diagonals
  if (first === undefined || second === undefined) return 0
  const sine = Math.abs(first ** 2 - second ** 2) / (4 * meanOf(width) * meanOf(height))
  if (sine < 1) return sine
  const says = `The diagonals are ${first} and ${second} mm; no picture with these sides has diagonals so unlike. Measure them again.`
  throw new Failure('input-invalid', {
    says,
    faults: [{ path: '/diagonals', code: 'impossible', says }],
  })
}

const meanOf = (readings: readonly number[]) => readings.reduce((sum, mm) => sum + mm, 0) / readings.length

const readingFaults = (path: string, readings: readonly number[]): Fault[] =>
  readings.length === 0
    ? faultUnless(false, path, 'an empty list', 'one reading or more')
    : readings.flatMap((mm, index) => faultUnless(isSize(mm), `${path}/${index}`, mm, 'more than 0 mm'))

const clearanceFaults = ({ allowance, lining }: { readonly allowance: number; readonly lining: number }) => [
  ...faultUnless(isAmount(allowance), '/allowance', allowance, '0 mm or more'),
  ...faultUnless(isAmount(lining), '/lining', lining, '0 mm or more'),
]
