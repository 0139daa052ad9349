import { CURVE_TO_ARC_MM } from '@shared/units'
import { arcsFromCurve, curvatureAt, endTangentOf, radiusOf, startTangentOf } from '@shared/geometry'
import type { Path, Point, Segment } from '@shared/geometry'

/** A stretch of a face with what lies over it, mm, and the member (from 0) it belongs to. */
export interface CoveredStretch {
  readonly path: Path
  readonly gessoMm: number
  readonly member: number
}

/** A segment of a face and the member it belongs to. */
export interface FacePiece {
  readonly segment: Segment
  readonly member: number
}

/** Inner corners are mitred as far as this many thicknesses of gesso from the corner; sharper ones are cut square, one thickness from it. */
const MITRE_LIMIT = 4
/** rad. A joint that turns less is smooth: far more than rounding, far less than can be drawn. */
const SMOOTH_RAD = 1e-6
/** mm. A piece shorter than this is a point. */
const POINT_MM = 1e-9

/** A segment of the face on its way inward. */
interface SourcePiece {
  readonly source: Segment
  readonly gessoMm: number
  readonly member: number
}

/**
 * Every segment of the face moved inward (to its right) by its gesso, and what joins neighbours at corners and steps. The chain still loops
 * where the wood is too narrow or turns too sharply for the gesso: withoutLoops cuts these off. An arc rounder than its gesso comes out
 * on the far side of its centre, so that its loop closes.
 */
export function offsetChain(stretches: readonly CoveredStretch[]): readonly FacePiece[] {
  const pieces = stretches.flatMap(sourcePieces)
  const chain: FacePiece[] = []
  let before: SourcePiece | undefined
  for (const piece of pieces) {
    if (before) joinCorner(chain, cornerBetween(before, piece))
    const moved = movedInward(piece)
    const last = chain.at(-1)
    if (moved && last) chain.push({ segment: { ...moved, start: last.segment.end }, member: piece.member })
    else if (moved) chain.push({ segment: moved, member: piece.member })
    before = piece
  }
  return chain
}

function sourcePieces({ path, gessoMm, member }: CoveredStretch): readonly SourcePiece[] {
  const exact = gessoMm === 0 ? path : path.flatMap((segment) => arcsFromCurve(segment, CURVE_TO_ARC_MM / 2))
  return exact.map((source) => ({ source, gessoMm, member }))
}

const insideOf = (point: Point, tangent: Point, byMm: number): Point => ({
  x: point.x + tangent.y * byMm,
  y: point.y - tangent.x * byMm,
})

/** Undefined where an arc is exactly as round as its gesso and nothing is left of it. */
function movedInward({ source, gessoMm }: SourcePiece): Segment | undefined {
  if (gessoMm === 0) return source
  const start = insideOf(source.start, startTangentOf(source), gessoMm)
  const end = insideOf(source.end, endTangentOf(source), gessoMm)
  if (source.kind !== 'arc') return { kind: 'line', start, end }
  const isSpent = source.bulge < 0 && Math.abs(radiusOf(source) - gessoMm) <= POINT_MM
  return isSpent ? undefined : { kind: 'arc', start, end, bulge: source.bulge }
}

/** A joint of the face at a point, from a piece under gesso a to one under gesso b. */
interface Corner {
  readonly a: SourcePiece
  readonly b: SourcePiece
  readonly tangentA: Point
  readonly tangentB: Point
  /** Where the moved pieces end and start. */
  readonly fromA: Point
  readonly toB: Point
  readonly turnRad: number
  /** Distance along either tangent from there to where the two meet: forward of a, and backward of b when negative. */
  readonly alongA: number
  readonly alongB: number
  /** Distance of that meeting from the corner of the face, mm. */
  readonly reachMm: number
}

function cornerBetween(a: SourcePiece, b: SourcePiece): Corner {
  const tangentA = endTangentOf(a.source)
  const tangentB = startTangentOf(b.source)
  const at = b.source.start
  const fromA = insideOf(at, tangentA, a.gessoMm)
  const toB = insideOf(at, tangentB, b.gessoMm)
  const sine = tangentA.x * tangentB.y - tangentA.y * tangentB.x
  const cosine = tangentA.x * tangentB.x + tangentA.y * tangentB.y
  const dx = toB.x - fromA.x
  const dy = toB.y - fromA.y
  const alongA = (dx * tangentB.y - dy * tangentB.x) / sine
  const alongB = (dx * tangentA.y - dy * tangentA.x) / sine
  const reachMm = Math.hypot(fromA.x + alongA * tangentA.x - at.x, fromA.y + alongA * tangentA.y - at.y)
  const turnRad = turnBetween(a.source, b.source, Math.atan2(sine, cosine))
  return { a, b, tangentA, tangentB, fromA, toB, turnRad, alongA, alongB, reachMm }
}

/** At a cusp the tangents are opposed and only curvature tells a cleft in the wood (a left turn) from a fin of it. */
function turnBetween(a: Segment, b: Segment, turnRad: number): number {
  if (Math.PI - Math.abs(turnRad) > SMOOTH_RAD) return turnRad
  return curvatureAt(a, 1) + curvatureAt(b, 0) > 0 ? -Math.PI : Math.PI
}

/** A step at a break belongs to the member under the thicker gesso. */
function joinCorner(chain: FacePiece[], corner: Corner): void {
  const { a, b, tangentA, tangentB, fromA, toB, turnRad, alongA, alongB, reachMm } = corner
  const isAlike = a.gessoMm === b.gessoMm
  const thickest = Math.max(a.gessoMm, b.gessoMm)
  if (thickest === 0 || (isAlike && Math.abs(turnRad) <= SMOOTH_RAD)) return
  const meets = Math.abs(turnRad) > SMOOTH_RAD && reachMm <= MITRE_LIMIT * thickest * (1 + 1e-9)
  if (meets && turnRad > 0 && alongA >= -POINT_MM && alongB <= POINT_MM) {
    goStraightOn(chain, a, along(fromA, tangentA, alongA))
    comeStraightTo(chain, b, toB)
  } else if (turnRad > 0 && isAlike) {
    const reach = thickest * Math.tan(turnRad / 4)
    goStraightOn(chain, a, along(fromA, tangentA, reach))
    goTo(chain, a, along(toB, tangentB, -reach))
    comeStraightTo(chain, b, toB)
  } else {
    const isCrossed = meets && turnRad < 0 && !isAlike
    if (isCrossed && alongA > POINT_MM) goStraightOn(chain, a, along(fromA, tangentA, alongA + thickest))
    if (isCrossed && alongB < -POINT_MM) {
      goTo(chain, b, along(toB, tangentB, alongB - thickest))
      comeStraightTo(chain, b, toB)
    } else goTo(chain, a.gessoMm > b.gessoMm ? a : b, toB)
  }
}

const along = (from: Point, tangent: Point, byMm: number): Point => ({
  x: from.x + tangent.x * byMm,
  y: from.y + tangent.y * byMm,
})

/** A new line on from where the chain ends. */
function goTo(chain: FacePiece[], { member }: SourcePiece, to: Point): void {
  const start = chain.at(-1)?.segment.end
  if (!start || Math.hypot(to.x - start.x, to.y - start.y) <= POINT_MM) return
  chain.push({ segment: { kind: 'line', start, end: to }, member })
}

/** Past the end of a piece along its tangent; a line is only made longer. */
function goStraightOn(chain: FacePiece[], piece: SourcePiece, to: Point): void {
  const last = chain.at(-1)
  if (last?.segment.kind !== 'line' || piece.source.kind !== 'line') return goTo(chain, piece, to)
  chain[chain.length - 1] = { ...last, segment: { ...last.segment, end: to } }
}

/** Up to the start of a piece along its tangent; a line is simply made to start where the chain ends. */
function comeStraightTo(chain: FacePiece[], piece: SourcePiece, to: Point): void {
  if (piece.source.kind !== 'line') goTo(chain, piece, to)
}
