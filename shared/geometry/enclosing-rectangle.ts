import { assertNever, Failure } from '@shared/failure'
import { sweepOf } from './arc'
import { pointAt } from './evaluate'
import { flattened } from './flatten'
import { convexHullOf } from './hull'
import { cross, magnitudeOf, minus, wrappedTurn } from './point'
import { quadraticRootsOf } from './roots'
import type { ArcSegment, CubicSegment, EllipseSegment, Path, Point, Segment } from './segment'

/** How far a path reaches along a direction, mm from the origin. */
export interface Extent {
  readonly least: number
  readonly greatest: number
}

/** Least and greatest of x cos + y sin over a path, by the true extrema of its curves. */
export function extentAlong(path: Path, angleRad: number): Extent {
  const c = Math.cos(angleRad)
  const s = Math.sin(angleRad)
  let least = Infinity
  let greatest = -Infinity
  const include = (value: number): void => {
    if (value < least) least = value
    if (value > greatest) greatest = value
  }
  for (const segment of path) {
    include(segment.start.x * c + segment.start.y * s)
    include(segment.end.x * c + segment.end.y * s)
    for (const t of turnsAlong(segment, angleRad, { c, s })) {
      const { x, y } = pointAt(segment, t)
      include(x * c + y * s)
    }
  }
  return { least, greatest }
}

/** Parameters within a segment at which it stands square to a direction. */
function turnsAlong(
  segment: Segment,
  angleRad: number,
  direction: { readonly c: number; readonly s: number },
): readonly number[] {
  switch (segment.kind) {
    case 'line':
      return []
    case 'arc':
      return arcTurns(segment, angleRad)
    case 'ellipse':
      return ellipseTurns(segment, angleRad)
    case 'cubic':
      return cubicTurns(segment, direction)
    default:
      return assertNever(segment)
  }
}

/** The tangent turns evenly from the chord's direction less half the sweep; it stands square to a direction a quarter turn from it. */
function arcTurns(arc: ArcSegment, angleRad: number): readonly number[] {
  const sweep = sweepOf(arc)
  if (sweep === 0) return []
  const chordRad = Math.atan2(arc.end.y - arc.start.y, arc.end.x - arc.start.x)
  return fractionsOf(angleRad + Math.PI / 2, chordRad - sweep / 2, sweep)
}

function ellipseTurns(
  { semiX, semiY, rotationRad, startRad, sweepRad }: EllipseSegment,
  angleRad: number,
): readonly number[] {
  const own = angleRad - rotationRad
  return fractionsOf(Math.atan2(semiY * Math.sin(own), semiX * Math.cos(own)), startRad, sweepRad)
}

/** Fractions within 0…1 of a sweep at which it passes an angle or its opposite. */
function fractionsOf(angleRad: number, startRad: number, sweepRad: number): readonly number[] {
  if (sweepRad === 0) return []
  const sense = Math.sign(sweepRad)
  const first = wrappedTurn(sense * (angleRad - startRad)) / Math.abs(sweepRad)
  const second = wrappedTurn(sense * (angleRad + Math.PI - startRad)) / Math.abs(sweepRad)
  return [first, second].filter((t) => t > 0 && t < 1)
}

function cubicTurns(
  { start, control1, control2, end }: CubicSegment,
  { c, s }: { readonly c: number; readonly s: number },
): readonly number[] {
  const d0 = (control1.x - start.x) * c + (control1.y - start.y) * s
  const d1 = (control2.x - control1.x) * c + (control2.y - control1.y) * s
  const d2 = (end.x - control2.x) * c + (end.y - control2.y) * s
  return quadraticRootsOf(d0 - 2 * d1 + d2, 2 * (d1 - d0), d0).filter((t) => t > 0 && t < 1)
}

/** A rectangle round a path: its width lies along angleRad (counter-clockwise from x), its height square to it. */
export interface EnclosingRectangle {
  readonly widthMm: number
  readonly heightMm: number
  readonly angleRad: number
}

/** The least rectangle round a path whose width lies in a given direction. */
export function enclosingRectangleAt(path: Path, angleRad: number): EnclosingRectangle {
  const along = extentAlong(path, angleRad)
  const across = extentAlong(path, angleRad + Math.PI / 2)
  return { widthMm: along.greatest - along.least, heightMm: across.greatest - across.least, angleRad }
}

const areaOf = ({ widthMm, heightMm }: EnclosingRectangle): number => widthMm * heightMm

/** Coarse chords only find the neighbourhood of each least rectangle; the true curves decide within it. */
const SCOUT_CHORD_MM = 0.02
/** Of rectangles alike to this part, the one least tilted is taken. */
const ALIKE = 1e-12

/**
 * The rectangle of least area round a path, −45° < angleRad ≤ 45°. Rotating calipers on the hull of a coarse polygon give the angles between which
 * the area has one least value; there it is narrowed down on the true curves, its sides to within 10⁻⁶ mm. Of several as small the least tilted.
 */
export function smallestEnclosingRectangleOf(path: Path): EnclosingRectangle {
  const hull = convexHullOf(flattened(path, SCOUT_CHORD_MM))
  if (hull.length < 2)
    throw new Failure('input-invalid', { says: 'a path of no extent has no enclosing rectangle' })
  const outer = path.filter((segment) => reachesHull(segment, hull))
  const angles = sideAnglesOf(hull)
  const scouted = angles.map((angle) => enclosingRectangleAt(outer, angle))
  const least = Math.min(...scouted.map(areaOf))
  const upright = enclosingRectangleAt(path, 0)
  return angles
    .filter((_, i) => mayBeat(scouted[i], least))
    .flatMap((angle) => {
      const place = angles.indexOf(angle)
      const before = angles[place - 1] ?? angle - 0.05
      const after = angles[place + 1] ?? angle + 0.05
      return [angle, narrowed(outer, before, angle), narrowed(outer, angle, after)]
    })
    .map((angle) => enclosingRectangleAt(path, angle))
    .reduce(better, upright)
}

function better(a: EnclosingRectangle, b: EnclosingRectangle): EnclosingRectangle {
  const areaA = areaOf(a)
  const areaB = areaOf(b)
  if (Math.abs(areaA - areaB) <= ALIKE * areaA) return Math.abs(b.angleRad) < Math.abs(a.angleRad) ? b : a
  return areaB < areaA ? b : a
}

/**
 * Between two sides of the hull its own rectangle is least at one of them, and the true one is never smaller: so the true area near a side can
 * fall below what it is there by no more than the chords are wrong on the four sides of the rectangle.
 */
const mayBeat = (scouted: EnclosingRectangle | undefined, least: number): boolean =>
  scouted !== undefined &&
  areaOf(scouted) - 2 * SCOUT_CHORD_MM * (scouted.widthMm + scouted.heightMm) <= least

/** Whether a segment comes near enough to the coarse hull to lie on the true one: only such segments bound a rectangle. */
function reachesHull(segment: Segment, hull: readonly Point[]): boolean {
  return flattened([segment], SCOUT_CHORD_MM).some((point) =>
    hull.some((corner, i) => {
      const next = hull[(i + 1) % hull.length] ?? corner
      const along = minus(next, corner)
      return cross(along, minus(point, corner)) <= 2 * SCOUT_CHORD_MM * magnitudeOf(along)
    }),
  )
}

/** Directions of the hull's sides brought to −45° < angle ≤ 45°, in order. */
function sideAnglesOf(hull: readonly Point[]): readonly number[] {
  const quarter = Math.PI / 2
  const angles = hull.map((corner, i) => {
    const next = hull[(i + 1) % hull.length] ?? corner
    const angle = Math.atan2(next.y - corner.y, next.x - corner.x)
    return angle - quarter * Math.ceil(angle / quarter - 0.5)
  })
  return [...new Set(angles)].sort((a, b) => a - b)
}

const GOLDEN = (Math.sqrt(5) - 1) / 2

/** Angle of least area between two, by golden section down to a hair: the area may have a corner there or be smooth. */
function narrowed(path: Path, from: number, to: number): number {
  const area = (angle: number): number => areaOf(enclosingRectangleAt(path, angle))
  let a = from
  let b = to
  let p = b - GOLDEN * (b - a)
  let q = a + GOLDEN * (b - a)
  let atP = area(p)
  let atQ = area(q)
  while (b - a > 1e-10) {
    if (atP <= atQ) {
      ;[b, q, atQ] = [q, p, atP]
      p = b - GOLDEN * (b - a)
      atP = area(p)
    } else {
      ;[a, p, atP] = [p, q, atQ]
      q = a + GOLDEN * (b - a)
      atQ = area(q)
    }
  }
  return (a + b) / 2
}
