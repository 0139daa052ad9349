import { assertNever } from '@shared/failure'
import { arcFromBulge, cubicFrom, lineFrom, quarterEllipseFrom } from '@shared/geometry'
import type { Point, Segment } from '@shared/geometry'
import type { Flutes, Free, Member, Pair, Quirk, Reeds } from './document'

const DEGREES_PER_RADIAN = 180 / Math.PI
/** Bulge of a quarter circle: tan(90° / 4). */
const QUARTER = Math.SQRT2 - 1
/** Each arc of a cyma turns through 60° by the classical construction, less where it would dip or undercut. */
const CYMA_ARC_DEG = 60

/** The face runs with the wood on its right: a round (convex in the wood) turns right, a hollow left. */
const ROUND = -1
const HOLLOW = 1

/** Where a member that starts here ends: start + (width, rise), the very numbers that its neighbour starts from. */
export const memberEndOf = (member: Member, start: Point): Point => ({
  x: start.x + member.width,
  y: start.y + member.rise,
})

/**
 * The angle, degrees, that a cavetto or ovolo, or each arc of a cyma, subtends when none is given; undefined for the other kinds.
 * A cavetto or ovolo then meets one axis squarely and passes none; a cyma keeps within level and upright.
 */
export function defaultArcOf(member: Member): number | undefined {
  const rise = Math.abs(member.rise)
  switch (member.kind) {
    case 'cavetto':
    case 'ovolo':
      return 2 * degreesOf(Math.min(member.width, rise), Math.max(member.width, rise))
    case 'cyma-recta':
    case 'cyma-reversa': {
      const twiceChord = 2 * degreesOf(rise, member.width)
      return Math.min(CYMA_ARC_DEG, twiceChord, 180 - twiceChord)
    }
    default:
      return undefined
  }
}

const degreesOf = (opposite: number, adjacent: number): number =>
  Math.atan2(opposite, adjacent) * DEGREES_PER_RADIAN

/** The angle, degrees, that a member's arcs subtend: its own or the default of its kind. */
function arcDegreesOf(member: Member & { readonly arc?: number }): number {
  return member.arc ?? defaultArcOf(member) ?? 0
}

const bulgeOf = (degrees: number): number => Math.tan(degrees / DEGREES_PER_RADIAN / 4)

/**
 * The exact segments of a member laid from a start, in the sense of the face (sight edge outward). Neighbouring segments share the same
 * numbers; the last ends at memberEndOf. The member must be without faults.
 */
export function memberSegments(member: Member, start: Point): Segment[] {
  const end = memberEndOf(member, start)
  switch (member.kind) {
    case 'fillet':
    case 'splay':
      return [lineFrom(start, end)]
    case 'cavetto':
      return [arcFromBulge(start, end, HOLLOW * bulgeOf(arcDegreesOf(member)))]
    case 'ovolo':
      return [arcFromBulge(start, end, ROUND * bulgeOf(arcDegreesOf(member)))]
    case 'thumb': {
      const isHollow = member.hollow === true
      return [quarterEllipseFrom(start, end, member.rise > 0 === isHollow ? 'level' : 'upright')]
    }
    case 'cyma-recta':
      return cymaSegments(start, end, bulgeOf(arcDegreesOf(member)), member.rise > 0 ? ROUND : HOLLOW)
    case 'cyma-reversa':
      return cymaSegments(start, end, bulgeOf(arcDegreesOf(member)), member.rise > 0 ? HOLLOW : ROUND)
    case 'scotia':
      return quartersSegments(start, end, (member.width - member.rise) / 2, HOLLOW)
    case 'torus':
      return quartersSegments(start, end, (member.width + member.rise) / 2, ROUND)
    case 'bead':
      return [arcFromBulge(start, end, ROUND)]
    case 'reeds':
      return rowSegments(member, start, end, ROUND)
    case 'flutes':
      return rowSegments(member, start, end, fluteBulgeOf(member))
    case 'quirk':
      return quirkSegments(member, start, end)
    case 'free':
      return freeSegments(member, start, end)
    default:
      return assertNever(member)
  }
}

/** Two equal arcs that meet at the chord's midpoint; the first turns as `first`, the second the other way. */
function cymaSegments(start: Point, end: Point, bulge: number, first: number): Segment[] {
  const middle = { x: (start.x + end.x) / 2, y: (start.y + end.y) / 2 }
  return [arcFromBulge(start, middle, first * bulge), arcFromBulge(middle, end, -first * bulge)]
}

/** Two quarter circles, upright at the member's ends and level where they meet: a scotia's go down and up again, a torus's up and down. */
function quartersSegments(start: Point, end: Point, firstRadius: number, sense: number): Segment[] {
  const joint = { x: start.x + firstRadius, y: start.y - sense * firstRadius }
  return [arcFromBulge(start, joint, sense * QUARTER), arcFromBulge(joint, end, sense * QUARTER)]
}

/** Chord of each of the arcs of reeds or flutes, mm. */
export const rowChordOf = ({ width, count, fillet }: Reeds | Flutes): number =>
  (width - (count - 1) * fillet) / count

/** A chord's arc of sagitta h has bulge 2h / chord. */
const fluteBulgeOf = (flutes: Flutes): number => (2 * flutes.depth) / rowChordOf(flutes)

/** Arcs of one bulge side by side, with fillets between them where these have a width. */
function rowSegments(row: Reeds | Flutes, start: Point, end: Point, bulge: number): Segment[] {
  const chord = rowChordOf(row)
  const segments: Segment[] = []
  let from = start
  for (let i = 0; i < row.count; i += 1) {
    const isLast = i === row.count - 1
    const left = start.x + i * (chord + row.fillet)
    const to = isLast ? end : { x: left + chord, y: start.y }
    segments.push(arcFromBulge(from, to, bulge))
    from = to
    if (isLast || row.fillet === 0) continue
    const next = { x: left + chord + row.fillet, y: start.y }
    segments.push(lineFrom(from, next))
    from = next
  }
  return segments
}

function quirkSegments({ depth, shape }: Quirk, start: Point, end: Point): Segment[] {
  if (shape === 'v') {
    const root = { x: (start.x + end.x) / 2, y: start.y - depth }
    return [lineFrom(start, root), lineFrom(root, end)]
  }
  const left = { x: start.x, y: start.y - depth }
  const right = { x: end.x, y: start.y - depth }
  return [lineFrom(start, left), lineFrom(left, right), lineFrom(right, end)]
}

function freeSegments({ curves }: Free, start: Point, end: Point): Segment[] {
  const at = ([x, y]: Pair): Point => ({ x: start.x + x, y: start.y + y })
  let from = start
  return curves.map(([control1, control2, to], index) => {
    const next = index === curves.length - 1 ? end : at(to)
    const segment = cubicFrom(from, at(control1), at(control2), next)
    from = next
    return segment
  })
}
