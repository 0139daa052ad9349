import { Failure } from '@shared/failure'
import { faceOffsetOf, findDepthRefusal } from './head'
import type { DepthRefused, KnifeHead } from './head'

/** A head and the greatest depth of the wood face below its highest point, which sets the tip line. */
export interface KnifeSetting extends KnifeHead {
  readonly greatestDepthMm: number
}

export interface FaceDepth {
  readonly kind: 'depth'
  /** Height on the knife's face from the tip line back, mm; 0 for the deepest point of the wood. */
  readonly faceMm: number
}

/**
 * Where on the knife's face the edge must stand that cuts a point depthMm below the wood face's highest point.
 * With e = R·sin γ and r = R − (D − d): s = √(R² − e²) − √(r² − e²), the geometry of the flat form tool, whose face passes
 * the axis at e (engineering handbooks; the construction in J. Rose, Mechanical Drawing Self-Taught, 1883, fig. 292).
 * A depth that the head cannot cut is refused with the greatest that would do.
 */
export function knifeFaceDepth(depthMm: number, setting: KnifeSetting): FaceDepth | DepthRefused {
  const { greatestDepthMm } = setting
  const refusal = findDepthRefusal(setting, greatestDepthMm)
  if (refusal !== undefined) return refusal
  if (!(depthMm >= 0 && depthMm <= greatestDepthMm)) {
    const says = `The depth is ${depthMm} mm; it must lie between 0 and the face’s greatest depth, ${greatestDepthMm} mm.`
    throw new Failure('input-invalid', { says, faults: [{ path: '/depth', code: 'out-of-range', says }] })
  }
  return { kind: 'depth', faceMm: faceHeightAt(setting, greatestDepthMm - depthMm) }
}

/**
 * s for a point riseMm = D − d above the deepest cut, mm, for a depth that findDepthRefusal has passed. The difference of
 * roots is written as (R − r)·(R + r) over their sum, which loses no digits for shallow cuts and gives D − d itself at γ = 0.
 */
export function faceHeightAt(head: KnifeHead, riseMm: number): number {
  const { cuttingRadiusMm, hookRad } = head
  const radiusMm = cuttingRadiusMm - riseMm
  const roots = cuttingRadiusMm * Math.cos(hookRad) + alongFaceAt(head, riseMm)
  return roots === 0 ? 0 : riseMm * ((cuttingRadiusMm + radiusMm) / roots)
}

/** √(r² − e²): along the knife's face from the foot of the perpendicular from the axis to the edge, mm, never below 0. */
export function alongFaceAt(head: KnifeHead, riseMm: number): number {
  const radiusMm = head.cuttingRadiusMm - riseMm
  const offsetMm = faceOffsetOf(head)
  return Math.sqrt(Math.max(0, radiusMm - offsetMm) * (radiusMm + offsetMm))
}

/** The inverse: how far above the deepest cut the wood is left by an edge that stands faceMm back from the tip line, mm. */
export function riseCutBy(head: KnifeHead, faceMm: number): number {
  const { cuttingRadiusMm, hookRad } = head
  const along = cuttingRadiusMm * Math.cos(hookRad) - faceMm
  const radiusMm = Math.hypot(along, faceOffsetOf(head))
  const tipAlong = cuttingRadiusMm * Math.cos(hookRad)
  return (faceMm * (tipAlong + along)) / (cuttingRadiusMm + radiusMm)
}
