import {
  coverOf,
  polygonCoverOf,
  polygonOpeningOf,
  railsOf,
  rebateOpeningOf,
  volumeOf,
} from '@shared/cutting'
import type { Rail, RailsRequest, RebateOpening } from '@shared/cutting'
import { Failure } from '@shared/failure'
import type { SectionMeasures } from '@shared/section'

/** A picture as measured: width and height, or across the flats for another number of sides. mm. */
export interface MeasuredPicture {
  readonly width?: readonly number[] | undefined
  readonly height?: readonly number[] | undefined
  readonly acrossFlats?: readonly number[] | undefined
  readonly diagonals?: readonly number[] | undefined
  readonly allowance: number
  readonly lining: number
}

export interface FrameRequest {
  readonly picture: MeasuredPicture
  readonly sides: number
  readonly count: number
  /** mm, of the section as drawn. */
  readonly rebateWidthMm: number
  readonly measures: SectionMeasures
  /** Moulding as delivered, where it was measured: the long points follow it. */
  readonly batch?: { readonly trueWidthMm: number; readonly trueRebateMm: number }
}

export interface FrameRails {
  readonly request: RailsRequest
  /** Width and height; both across the flats for a polygon. mm */
  readonly openingMm: readonly [number, number]
  readonly sightMm: readonly [number, number]
  readonly outsideMm: readonly [number, number]
  /** Least cover at left or right, and at top or bottom. */
  readonly coverMm: readonly [number, number]
  readonly skewRad: number
  readonly rails: readonly Rail[]
  readonly footageMm: number
  readonly volumeMm3: number
}

/**
 * Opening, sight, outside, cover and rails of a measured picture in a section. Rebate and long points are the wood's,
 * sight and outside the finished face's. Throws input-invalid naming what cannot be.
 */
export function frameRailsOf(frame: FrameRequest): FrameRails {
  const { measures, rebateWidthMm, batch, sides, count } = frame
  const { opening, skewRad, coverMm } = openingOf(frame)
  const request: RailsRequest = {
    sides,
    opening,
    count,
    rebateWidthFinishedMm: rebateWidthMm,
    greatestXFinishedMm: measures.section.greatestXMm,
    rebateWidthWoodMm: batch?.trueRebateMm ?? rebateWidthMm,
    greatestXWoodMm: batch?.trueWidthMm ?? measures.wood.greatestXMm,
  }
  const { list, sightMm, outsideMm, footageMm } = railsOf(request)
  const { areaMm2, centroid } = measures.wood
  return {
    request,
    openingMm:
      opening.kind === 'rectangle'
        ? [opening.widthMm, opening.heightMm]
        : [opening.acrossFlatsMm, opening.acrossFlatsMm],
    sightMm,
    outsideMm,
    coverMm,
    skewRad,
    rails: list,
    footageMm,
    volumeMm3: volumeOf(
      { ...request, rebateWidthWoodMm: rebateWidthMm },
      { areaMm2, centroidXMm: centroid.x },
    ),
  }
}

interface Opened {
  readonly opening: RebateOpening
  readonly skewRad: number
  readonly coverMm: readonly [number, number]
}

function openingOf({ picture, sides, rebateWidthMm }: FrameRequest): Opened {
  const { width, height, acrossFlats, diagonals = [], allowance, lining } = picture
  if (sides === 4) {
    if (width === undefined || height === undefined) throw missing('/picture', 'width and height')
    const readings = { width, height, diagonals, allowance, lining }
    const { opening, skewRad } = rebateOpeningOf(readings)
    const { leftRightMm, topBottomMm } = coverOf(readings, rebateWidthMm)
    return { opening, skewRad, coverMm: [leftRightMm, topBottomMm] }
  }
  if (acrossFlats === undefined) throw missing('/picture/acrossFlats', 'readings across the flats')
  const readings = { acrossFlats, allowance, lining }
  const cover = polygonCoverOf(readings, sides, rebateWidthMm)
  return { opening: polygonOpeningOf(readings), skewRad: 0, coverMm: [cover, cover] }
}

function missing(path: string, what: string): Failure {
  const says = `is missing; a frame of this number of sides needs ${what}.`
  return new Failure('input-invalid', { says, faults: [{ path, code: 'missing', says }] })
}
