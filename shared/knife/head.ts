import { Failure } from '@shared/failure'
import type { Fault } from '@shared/failure'

/** Room on the knife's face inside the outline that is left for clamping, mm: common practice, ask the mill. */
export const USUAL_CLAMP_ROOM_MM = 10

/** A head, as far as it shapes the knife. */
export interface KnifeHead {
  /** Radius of the cutting circle at the deepest cut, mm. */
  readonly cuttingRadiusMm: number
  /** Hook angle at the cutting circle: between the knife's face and the radius through its tip. */
  readonly hookRad: number
  /** Knife face left inside the outline's innermost point for clamping, mm; USUAL_CLAMP_ROOM_MM when absent. */
  readonly clampRoomMm?: number
}

/** A section that is too deep for the head, and the depth that would do. */
export interface DepthRefused {
  readonly kind: 'refused'
  /** Greatest depth of the face that the head can cut with room left to clamp, mm. */
  readonly greatestDepthMm: number
  readonly says: string
}

/** A head from what shops speak of: the cutting circle's diameter, mm, and the hook angle, degrees. */
export function knifeHeadFrom(
  cuttingDiameterMm: number,
  hookAngleDeg: number,
  clampRoomMm: number = USUAL_CLAMP_ROOM_MM,
): KnifeHead {
  return { cuttingRadiusMm: cuttingDiameterMm / 2, hookRad: (hookAngleDeg * Math.PI) / 180, clampRoomMm }
}

/** How far the knife's face passes from the head's axis, mm: e = R·sin γ. */
export const faceOffsetOf = ({ cuttingRadiusMm, hookRad }: KnifeHead): number =>
  cuttingRadiusMm * Math.sin(hookRad)

/**
 * Knife face from the innermost cutting point, at radius R − D, to the foot of the perpendicular from the axis, mm:
 * √((R − D)² − e²); undefined when the face does not reach in so far.
 */
export function clampRoomLeftOf(head: KnifeHead, greatestDepthMm: number): number | undefined {
  const innerMm = head.cuttingRadiusMm - greatestDepthMm
  const offsetMm = faceOffsetOf(head)
  return innerMm < offsetMm ? undefined : Math.sqrt((innerMm - offsetMm) * (innerMm + offsetMm))
}

/** Greatest depth of a face that the head cuts with its room to clamp, mm: R − √(e² + room²), 0 when there is none. */
export function greatestDepthOf(head: KnifeHead): number {
  const { cuttingRadiusMm, clampRoomMm = USUAL_CLAMP_ROOM_MM } = head
  return Math.max(0, cuttingRadiusMm - Math.hypot(faceOffsetOf(head), clampRoomMm))
}

/** The refusal of a depth that leaves no knife face, or no room on it to clamp; undefined when the head can cut it. */
export function findDepthRefusal(head: KnifeHead, depthMm: number): DepthRefused | undefined {
  refuseHead(head, depthMm)
  const { clampRoomMm = USUAL_CLAMP_ROOM_MM } = head
  const left = clampRoomLeftOf(head, depthMm)
  if (left !== undefined && left >= clampRoomMm) return undefined
  const greatestDepthMm = greatestDepthOf(head)
  const why =
    left === undefined
      ? 'the knife’s face does not reach in so far'
      : `only ${left.toFixed(1)} mm of knife is left to clamp and ${clampRoomMm} mm are wanted`
  const cure =
    greatestDepthMm > 0
      ? `Make the face at most ${greatestDepthMm.toFixed(2)} mm deep, or use a head with a larger cutting circle or a smaller hook angle.`
      : 'Use a head with a larger cutting circle or a smaller hook angle.'
  const says = `The face is ${depthMm.toFixed(2)} mm deep, more than this head can cut: ${why}. ${cure}`
  return { kind: 'refused', greatestDepthMm, says }
}

function refuseHead({ cuttingRadiusMm, hookRad, clampRoomMm = 0 }: KnifeHead, depthMm: number): void {
  const faults = [
    ...faultUnless(cuttingRadiusMm > 0, '/cuttingDiameter', 'The cutting circle must be larger than 0 mm.'),
    ...faultUnless(
      hookRad >= 0 && hookRad < Math.PI / 2,
      '/hookAngle',
      'The hook angle must be from 0° to less than 90°.',
    ),
    ...faultUnless(clampRoomMm >= 0, '/clampRoom', 'The room to clamp must be 0 mm or more.'),
    ...faultUnless(depthMm >= 0, '/depth', 'The greatest depth of the face must be 0 mm or more.'),
  ]
  const isFinite = [cuttingRadiusMm, hookRad, clampRoomMm, depthMm].every(Number.isFinite)
  faults.push(
    ...faultUnless(isFinite, '', 'The head’s sizes and the depth of the face must be finite numbers.'),
  )
  if (faults.length === 0) return
  throw new Failure('input-invalid', { says: faults.map(({ says }) => says).join(' '), faults })
}

const faultUnless = (isFine: boolean, path: string, says: string): Fault[] =>
  isFine ? [] : [{ path, code: 'out-of-range', says }]
