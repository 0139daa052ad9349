import { Failure } from '@shared/failure'
import { boundsOf, extremaOf, pointAt, tangentAt } from '@shared/geometry'
import type { Path, Point, Segment } from '@shared/geometry'
import { alongFaceAt, faceHeightAt } from './face-depth'
import type { KnifeHead } from './head'

/** How far a face reaches, mm; from the curves' true extrema. */
export interface FaceExtent {
  readonly leastX: number
  readonly greatestX: number
  readonly leastY: number
  readonly greatestY: number
}

/** A smooth curve over t from 0 to 1; tangents are unit vectors along growing t. */
export interface SmoothCurve {
  readonly pointAt: (t: number) => Point
  readonly tangentAt: (t: number) => Point
}

/** Parameters that cut a segment where it turns in x or in y, from 0 to 1 with both ends. */
export function turnsOf(segment: Segment): number[] {
  const inner = [...extremaOf(segment, 'x'), ...extremaOf(segment, 'y')].filter(
    (t) => t > END_PARAMETER && t < 1 - END_PARAMETER,
  )
  inner.sort((a, b) => a - b)
  const apart = inner.filter((t, index) => index === 0 || t - (inner[index - 1] ?? 0) > END_PARAMETER)
  return [0, ...apart, 1]
}

/** A turn nearer than this to an end, as a share of the segment, is that end. */
const END_PARAMETER = 1e-9

/** Extent of a face; an empty one is Failure 'input-invalid'. */
export function faceExtentOf(face: Path): FaceExtent {
  if (face.length === 0) {
    const says = 'The face has no members; put in at least one before asking for its knife.'
    throw new Failure('input-invalid', { says, faults: [{ path: '/members', code: 'empty', says }] })
  }
  const { min, max } = boundsOf(face)
  return { leastX: min.x, greatestX: max.x, leastY: min.y, greatestY: max.y }
}

/** Greatest depth of a face below its highest point, mm: the D of the knife. */
export const faceDepthOf = ({ leastY, greatestY }: FaceExtent): number => greatestY - leastY

/**
 * The knife's edge that cuts a segment, as seen on the knife's face: X = −x (the mirror of the section), Y = s, the height
 * back from the tip line. For a face whose depth findDepthRefusal has passed.
 */
export function knifeCurveOf(segment: Segment, extent: FaceExtent, head: KnifeHead): SmoothCurve {
  const riseOf = ({ y }: Point) => y - extent.leastY
  return {
    pointAt: (t) => {
      const point = pointAt(segment, t)
      return { x: mirroredX(point.x), y: faceHeightAt(head, riseOf(point)) }
    },
    tangentAt: (t) => {
      const along = tangentAt(segment, t)
      const riseMm = riseOf(pointAt(segment, t))
      // ds/dy = r/√(r² − e²), multiplied through so that a root near 0 does not divide.
      const x = -along.x * alongFaceAt(head, riseMm)
      const y = along.y * (head.cuttingRadiusMm - riseMm)
      const length = Math.hypot(x, y)
      return length === 0 ? { x: -along.x, y: along.y } : { x: x / length, y: y / length }
    },
  }
}

/** −x without making a −0 of 0. */
export const mirroredX = (x: number): number => 0 - x
