import type { LineSegment, Point } from '@shared/geometry'
import type { Section } from './document'
import { faceOf } from './face'
import type { Face } from './face'
import { gessoOver, hasGesso, thickestGessoOf } from './gesso'
import { withoutLoops } from './wood-loops'
import { offsetChain } from './wood-offset'
import type { CoveredStretch, FacePiece } from './wood-offset'

/** A member of which the gesso leaves nothing in the wood; member counts from 0. */
export interface SwallowedMember {
  readonly member: number
  readonly says: string
}

/** The face that the knife must cut; breaks of swallowed members fall together. */
export interface WoodFace extends Face {
  readonly swallowed: readonly SwallowedMember[]
}

/**
 * The wood face: the finished face moved inward by its gesso, from the same sight-edge line to the same back-edge line. Offsets of lines and
 * arcs are exact, ellipses and cubics under gesso are arcs within 10⁻³ mm. Without gesso it is the finished face itself.
 */
export function woodFaceOf(section: Section): WoodFace {
  return woodFaceUnder(section, faceOf(section))
}

/** The wood face under a finished face that is already at hand. */
export function woodFaceUnder(section: Section, face: Face): WoodFace {
  if (!hasGesso(section) || face.path.length === 0) return { ...face, swallowed: [] }
  const count = section.members.length
  const pieces = withoutLoops(offsetChain([...stretchesOf(section, face)]))
  const own = endedOnEdges(
    pieces.filter(({ member }) => member >= 0 && member < count),
    face,
  )
  const memberOf = own.map(({ member }) => member)
  return {
    path: own.map(({ segment }) => segment),
    memberOf,
    breaks: breaksOf(own, face),
    swallowed: swallowedOf(section, memberOf),
  }
}

/** The sight edge and the back edge stand before and after the face as bare members −1 and n, so that the offset ends on them by the rule of every corner. */
function stretchesOf(section: Section, { path, memberOf, breaks }: Face): readonly CoveredStretch[] {
  const first = breaks[0] as Point
  const last = breaks.at(-1) as Point
  const below = -1 - 10 * thickestGessoOf(section)
  const edge = (start: Point, end: Point): LineSegment => ({ kind: 'line', start, end })
  const sightEdge = { path: [edge({ x: first.x, y: below }, first)], gessoMm: 0, member: -1 }
  const backEdge = {
    path: [edge(last, { x: last.x, y: below })],
    gessoMm: 0,
    member: section.members.length,
  }
  const covered = path.map((segment, index) => {
    const member = memberOf[index] as number
    return { path: [segment], gessoMm: gessoOver(section, member), member }
  })
  return [sightEdge, ...covered, backEdge]
}

/** The ends brought onto the very x of the edges. */
function endedOnEdges(pieces: readonly FacePiece[], { breaks }: Face): readonly FacePiece[] {
  const firstX = (breaks[0] as Point).x
  const lastX = (breaks.at(-1) as Point).x
  return pieces.map(({ segment, member }, index) => {
    const start = index === 0 ? { x: firstX, y: segment.start.y } : segment.start
    const end = index === pieces.length - 1 ? { x: lastX, y: segment.end.y } : segment.end
    return { segment: { ...segment, start, end }, member }
  })
}

/** Break k is where the first piece of member k or of a later one starts. */
function breaksOf(pieces: readonly FacePiece[], face: Face): readonly Point[] {
  const end = pieces.at(-1)?.segment.end ?? (face.breaks[0] as Point)
  let next = 0
  return face.breaks.map((_, number) => {
    while (next < pieces.length && (pieces[next] as FacePiece).member < number) next += 1
    return pieces[next]?.segment.start ?? end
  })
}

function swallowedOf({ members }: Section, memberOf: readonly number[]): readonly SwallowedMember[] {
  const left = new Set(memberOf)
  return members.flatMap(({ kind }, member) => {
    if (left.has(member)) return []
    const says = `Member ${member + 1} (${kind.replace('-', ' ')}) is no wider than its gesso is thick: nothing of it is left in the wood.`
    return [{ member, says }]
  })
}
