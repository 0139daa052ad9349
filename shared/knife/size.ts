import { Failure } from '@shared/failure'
import type { Path } from '@shared/geometry'
import { faceDepthOf, faceExtentOf } from './face-curve'
import { faceHeightAt } from './face-depth'
import { USUAL_CLAMP_ROOM_MM, clampRoomLeftOf, findDepthRefusal } from './head'
import type { DepthRefused, KnifeHead } from './head'

/** How far a knife runs past each edge of the face, mm: common practice, ask the mill. */
export const USUAL_OVERRUN_MM = 5

export interface KnifeSizeOptions {
  /** Past each edge, mm; USUAL_OVERRUN_MM when absent. */
  readonly overrunMm?: number
  /** Heights of knife steel that the mill keeps, mm. */
  readonly stockHeightsMm?: readonly number[]
}

export interface KnifeSize {
  readonly kind: 'size'
  /** Greatest depth of the wood face below its highest point, mm. */
  readonly depthMm: number
  /** Height of the ground outline on the knife's face, tip line to innermost point, mm. */
  readonly heightMm: number
  /** Width with the overrun past both edges, mm. */
  readonly widthMm: number
  /** Knife face left inside the innermost point for clamping, mm. */
  readonly clampRoomMm: number
  /** Least stock height that holds the outline and the room to clamp, mm; null when none of those given does. */
  readonly stockHeightMm?: number | null
}

/** What knife a face takes in a head; refused where the head cannot cut it. */
export function knifeSizeOf(
  face: Path,
  head: KnifeHead,
  options: KnifeSizeOptions = {},
): KnifeSize | DepthRefused {
  const { overrunMm = USUAL_OVERRUN_MM, stockHeightsMm } = options
  refuseOverrun(overrunMm)
  const extent = faceExtentOf(face)
  const depthMm = faceDepthOf(extent)
  const refusal = findDepthRefusal(head, depthMm)
  if (refusal !== undefined) return refusal
  const heightMm = faceHeightAt(head, depthMm)
  return {
    kind: 'size',
    depthMm,
    heightMm,
    widthMm: extent.greatestX - extent.leastX + 2 * overrunMm,
    clampRoomMm: clampRoomLeftOf(head, depthMm) ?? 0,
    ...(stockHeightsMm && {
      stockHeightMm: stockHeightFor(heightMm + (head.clampRoomMm ?? USUAL_CLAMP_ROOM_MM), stockHeightsMm),
    }),
  }
}

function stockHeightFor(neededMm: number, stockHeightsMm: readonly number[]): number | null {
  const high = stockHeightsMm.filter((stockMm) => stockMm >= neededMm)
  return high.length === 0 ? null : Math.min(...high)
}

function refuseOverrun(overrunMm: number): void {
  if (Number.isFinite(overrunMm) && overrunMm >= 0) return
  const says = `The overrun is ${overrunMm} mm; it must be 0 mm or more.`
  throw new Failure('input-invalid', { says, faults: [{ path: '/overrun', code: 'out-of-range', says }] })
}
