import { Failure } from '@shared/failure'
import { mitreAngleOf, tiltedMitreOf } from './mitre'
import type { RebateOpening } from './rebate-opening'
import { faultUnless, isAmount, isSize, refuseFaults } from './refusal'

/** Rails of a four-sided frame: `top` … `left`; of any other number of sides "1" … "n", clockwise from the top. */
export type RailSide = string

const RECTANGLE_SIDES = ['top', 'right', 'bottom', 'left'] as const
const DEGREES_PER_RAD = 180 / Math.PI

/** One frame's measures. x runs outward from the sight edge; the finished face is what shows, the wood face what the saw cuts. */
export interface RailsRequest {
  readonly sides: number
  readonly opening: RebateOpening
  readonly rebateWidthFinishedMm: number
  readonly rebateWidthWoodMm: number
  /** Greatest x of either face, mm: where the outside and the long points lie. */
  readonly greatestXFinishedMm: number
  readonly greatestXWoodMm: number
  /** Frames alike. */
  readonly count: number
  /** Angle between the section's back and the plane of the frame; absent: it lies flat. */
  readonly tiltRad?: number
}

export interface Rail {
  readonly side: RailSide
  readonly count: number
  /** Along the back edge of the wood, mm. */
  readonly longPointMm: number
  /** Between the rebate's walls, mm. */
  readonly rebateMm: number
  /** Along the sight edge of the finished face, mm. */
  readonly sightMm: number
  /** From square, degrees; of a tilted section as it is cut on its back. */
  readonly mitreDeg: number
  /** Of the blade from upright, degrees; 0 for a section that lies flat. */
  readonly bevelDeg: number
}

export interface Rails {
  /** Width and height, mm; both the distance across the flats for a polygon. */
  readonly sightMm: readonly [number, number]
  readonly outsideMm: readonly [number, number]
  readonly list: readonly Rail[]
  /** Σ count × long point, mm, without kerfs. */
  readonly footageMm: number
}

/** Rails, sight size and outside size of a frame: sight = opening − 2 × rebate width, outside = sight + 2 × greatest x. */
export function railsOf(request: RailsRequest): Rails {
  refuseRequest(request)
  const { opening, sides, count, tiltRad = 0 } = request
  const cut = sawAnglesOf(sides, tiltRad)
  const sightMm = sizesAt(opening, request.rebateWidthFinishedMm, 0)
  const outsideMm = sizesAt(opening, request.rebateWidthFinishedMm, request.greatestXFinishedMm)
  const longPoints = railLengthsAt(opening, sides, request.rebateWidthWoodMm, request.greatestXWoodMm)
  const rebates = railLengthsAt(opening, sides, 0, 0)
  const sights = railLengthsAt(opening, sides, request.rebateWidthFinishedMm, 0)
  const list = sideNamesOf(sides).map((side, index) => ({
    side,
    count,
    longPointMm: longPoints[index] ?? 0,
    rebateMm: rebates[index] ?? 0,
    sightMm: sights[index] ?? 0,
    ...cut,
  }))
  refuseClosedSight(list)
  return { sightMm, outsideMm, list, footageMm: footageOf(list) }
}

/** Σ count × long point, mm: the moulding that a frame takes, without kerfs. */
export const footageOf = (rails: readonly Pick<Rail, 'count' | 'longPointMm'>[]): number =>
  rails.reduce((sum, { count, longPointMm }) => sum + count * longPointMm, 0)

/**
 * Σ of all rails' lengths at a distance x outward from the sight edge, mm. `rebateWidthMm` is that of the face that x is measured on.
 * At a stretch's own arc-length centroid, girth × this is its area; at the section's centroid, area × this is the volume.
 */
export function totalRailLengthAt(
  { opening, sides, count }: Pick<RailsRequest, 'opening' | 'sides' | 'count'>,
  rebateWidthMm: number,
  xMm: number,
): number {
  const lengths = railLengthsAt(opening, sides, rebateWidthMm, xMm)
  return count * lengths.reduce((sum, length) => sum + length, 0)
}

/**
 * Wood in all frames, mm³, mitres included: the section's area × Σ rail length at its centroid. Exact, since a rail's length is
 * linear in x: the integral of length over the section is its value at the centroid.
 */
export const volumeOf = (
  request: Pick<RailsRequest, 'opening' | 'sides' | 'count' | 'rebateWidthWoodMm'>,
  { areaMm2, centroidXMm }: { readonly areaMm2: number; readonly centroidXMm: number },
): number => areaMm2 * totalRailLengthAt(request, request.rebateWidthWoodMm, centroidXMm)

/** Degrees. A flat section's mitre is 180°/n to the last digit, which a detour by radians would lose. */
function sawAnglesOf(sides: number, tiltRad: number): Pick<Rail, 'mitreDeg' | 'bevelDeg'> {
  if (tiltRad === 0) return { mitreDeg: 180 / sides, bevelDeg: 0 }
  const { mitreRad, bevelRad } = tiltedMitreOf(sides, tiltRad)
  return { mitreDeg: mitreRad * DEGREES_PER_RAD, bevelDeg: bevelRad * DEGREES_PER_RAD }
}

/** Lengths of the rails of one frame at a distance x from the sight edge: opening's side + 2 (x − rebate width) · tan(π/n). */
function railLengthsAt(opening: RebateOpening, sides: number, rebateWidthMm: number, xMm: number): number[] {
  const [across, up] = sizesAt(opening, rebateWidthMm, xMm)
  if (opening.kind === 'rectangle') return [across, up, across, up]
  const perFlat = Math.tan(mitreAngleOf(sides))
  return Array.from({ length: sides }, () => across * perFlat)
}

function sizesAt(opening: RebateOpening, rebateWidthMm: number, xMm: number): readonly [number, number] {
  const grown = 2 * (xMm - rebateWidthMm)
  return opening.kind === 'rectangle'
    ? [opening.widthMm + grown, opening.heightMm + grown]
    : [opening.acrossFlatsMm + grown, opening.acrossFlatsMm + grown]
}

const sideNamesOf = (sides: number): readonly RailSide[] =>
  sides === 4 ? RECTANGLE_SIDES : Array.from({ length: sides }, (_, index) => String(index + 1))

function refuseRequest(request: RailsRequest): void {
  const { sides, opening, count, tiltRad = 0 } = request
  const isFour = opening.kind === 'rectangle'
  const sizes = isFour ? [opening.widthMm, opening.heightMm] : [opening.acrossFlatsMm]
  refuseFaults([
    ...faultUnless(Number.isInteger(sides) && sides >= 3, '/sides', sides, 'a whole number, 3 or more'),
    ...faultUnless(
      isFour === (sides === 4),
      '/opening',
      opening.kind,
      'a rectangle for four sides, else a polygon',
    ),
    ...sizes.flatMap((mm) => faultUnless(isSize(mm), '/opening', mm, 'more than 0 mm')),
    ...faultUnless(Number.isInteger(count) && count >= 1, '/count', count, 'a whole number, 1 or more'),
    ...faultUnless(
      tiltRad >= 0 && tiltRad < Math.PI / 2,
      '/tilt',
      tiltRad,
      '0 or more and less than a right angle',
    ),
    ...widthFaults('Finished', request.rebateWidthFinishedMm, request.greatestXFinishedMm),
    ...widthFaults('Wood', request.rebateWidthWoodMm, request.greatestXWoodMm),
  ])
}

const widthFaults = (face: 'Finished' | 'Wood', rebateWidthMm: number, greatestXMm: number) => [
  ...faultUnless(isAmount(rebateWidthMm), `/rebateWidth${face}`, rebateWidthMm, '0 mm or more'),
  ...faultUnless(
    Number.isFinite(greatestXMm) && greatestXMm >= rebateWidthMm,
    `/greatestX${face}`,
    greatestXMm,
    `at least the rebate's width, ${rebateWidthMm} mm`,
  ),
]

function refuseClosedSight(list: readonly Rail[]): void {
  const closed = list.find(({ sightMm }) => sightMm <= 0)
  if (closed === undefined) return
  const says = `The sight of the ${closed.side} rail would be ${closed.sightMm} mm; make the rebate narrower than half the picture.`
  throw new Failure('input-invalid', { says, faults: [{ path: '/rebateWidth', code: 'sight-closed', says }] })
}
