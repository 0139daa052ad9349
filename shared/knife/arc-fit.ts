import type { ArcSegment, LineSegment, Point, Segment } from '@shared/geometry'
import type { SmoothCurve } from './face-curve'

/** Fitted segments are lines or arcs. */
export type ArcOrLine = ArcSegment | LineSegment

/** The sampled deviation is held this far below what is promised, since samples can miss the very peak. */
const SAMPLING_SHARE = 0.9
const SAMPLES = 24
/** An arc that rises from its chord by less than this share of the accuracy is written as a line. */
const LINE_SHARE = 0.01
/** Halvings after which a stretch is too short to matter. */
const MOST_HALVINGS = 40

/**
 * A smooth curve over [from, to] as lines and circular arcs within accuracyMm of it. Arcs come in pairs that share the
 * curve's end points and tangents and each other's tangent at their joint, so the fit is as smooth as the curve.
 */
export function arcsWithin(curve: SmoothCurve, from: number, to: number, accuracyMm: number): ArcOrLine[] {
  return fitted(curve, [from, to], accuracyMm, MOST_HALVINGS)
}

function fitted(
  curve: SmoothCurve,
  [from, to]: readonly [number, number],
  accuracyMm: number,
  halvings: number,
): ArcOrLine[] {
  const start = curve.pointAt(from)
  const end = curve.pointAt(to)
  const samples = Array.from({ length: SAMPLES - 1 }, (_, index) =>
    curve.pointAt(from + ((to - from) * (index + 1)) / SAMPLES),
  )
  const line: LineSegment = { kind: 'line', start, end }
  if (halvings === 0 || greatestOff(samples, line) <= accuracyMm * LINE_SHARE) return [line]
  const pair = findArcPair(start, curve.tangentAt(from), end, curve.tangentAt(to))
  if (pair !== undefined && pairOff(samples, pair) <= accuracyMm * SAMPLING_SHARE) {
    return [pair.first, pair.second].map((arc) => lineIfFlat(arc, accuracyMm * LINE_SHARE))
  }
  const middle = (from + to) / 2
  return [
    ...fitted(curve, [from, middle], accuracyMm, halvings - 1),
    ...fitted(curve, [middle, to], accuracyMm, halvings - 1),
  ]
}

interface ArcPair {
  readonly first: ArcSegment
  readonly second: ArcSegment
  /** Direction at the joint. */
  readonly along: Point
}

/**
 * Two arcs from start to end with these unit tangents and a common one at their joint, the tangent lengths at both ends
 * equal (d): |v|² − 2d·v·(t0 + t1) + d²·|t0 + t1|² = 4d², v from start to end. undefined where no d > 0 solves it.
 */
function findArcPair(start: Point, startAlong: Point, end: Point, endAlong: Point): ArcPair | undefined {
  const v = { x: end.x - start.x, y: end.y - start.y }
  const a = 2 * (1 - dot(startAlong, endAlong))
  const b = 2 * (dot(v, startAlong) + dot(v, endAlong))
  const c = dot(v, v)
  const root = Math.sqrt(b * b + 4 * a * c)
  const d = b > 0 ? (2 * c) / (b + root) : (root - b) / (2 * a)
  if (!(d > 0 && Number.isFinite(d))) return undefined
  const from = { x: start.x + d * startAlong.x, y: start.y + d * startAlong.y }
  const to = { x: end.x - d * endAlong.x, y: end.y - d * endAlong.y }
  const joint = { x: (from.x + to.x) / 2, y: (from.y + to.y) / 2 }
  const first = { x: joint.x - start.x, y: joint.y - start.y }
  const second = { x: end.x - joint.x, y: end.y - joint.y }
  return {
    first: { kind: 'arc', start, end: joint, bulge: Math.tan(angleBetween(startAlong, first) / 2) },
    second: { kind: 'arc', start: joint, end, bulge: Math.tan(angleBetween(second, endAlong) / 2) },
    along: { x: to.x - from.x, y: to.y - from.y },
  }
}

/** Greatest distance of the samples from the pair, each from the arc on its side of the joint, mm. */
function pairOff(samples: readonly Point[], { first, second, along }: ArcPair): number {
  const joint = first.end
  const isBefore = (point: Point) => (point.x - joint.x) * along.x + (point.y - joint.y) * along.y < 0
  return Math.max(
    greatestOff(
      samples.filter((sample) => isBefore(sample)),
      first,
    ),
    greatestOff(
      samples.filter((sample) => !isBefore(sample)),
      second,
    ),
  )
}

function greatestOff(samples: readonly Point[], piece: ArcOrLine): number {
  return samples.reduce((worst, sample) => Math.max(worst, offPiece(sample, piece)), 0)
}

/**
 * Distance of a point from an arc or a line, mm: from its circle or carrier where the foot lies on the piece itself, else from
 * its nearer end (a curve that doubles back may pass close to a circle far beyond the arc). With the chord's half length h, u along it and w to its
 * left from its middle, the circle of bulge b is b·(u² + w² − h²) − h·w·(1 − b²) = 0. Everything is kept multiplied by b, so
 * that flat arcs, whose centres run away, come out as exactly as round ones.
 */
function offPiece(point: Point, piece: ArcOrLine): number {
  const { start, end } = piece
  const chord = { x: end.x - start.x, y: end.y - start.y }
  const length = Math.hypot(chord.x, chord.y)
  if (length === 0) return Math.hypot(point.x - start.x, point.y - start.y)
  const fromMiddle = { x: point.x - (start.x + end.x) / 2, y: point.y - (start.y + end.y) / 2 }
  const u = dot(fromMiddle, chord) / length
  const w = (chord.x * fromMiddle.y - chord.y * fromMiddle.x) / length
  const h = length / 2
  if (piece.kind === 'line') return Math.hypot(Math.max(0, Math.abs(u) - h), w)
  const b = piece.bulge
  if (!isBesideArc({ x: u, y: w }, b, h)) return Math.hypot(Math.abs(u) - h, w)
  const power = b * (u * u + w * w - h * h) - h * w * (1 - b * b)
  // power = b·(ρ² − R²), ρ from the centre, and |b|·R = h·(1 + b²)/2: hence |ρ − R| = |power| / (|b|·ρ + |b|·R).
  const reach = (h * (1 + b * b)) / 2
  const toCentre = Math.hypot(b * u, b * w - (h * (1 - b * b)) / 2)
  return Math.abs(power) / (toCentre + reach)
}

/**
 * Whether a point, in the axes of the arc's chord from its middle, lies in the wedge that the arc spans from its centre. The
 * vectors from the centre are kept multiplied by b, so that a flat arc's far centre does no harm.
 */
function isBesideArc(point: Point, b: number, h: number): boolean {
  const centre = (h * (1 - b * b)) / 2
  const to = { x: b * point.x, y: b * point.y - centre }
  const afterStart = Math.sign(b) * (-b * h * to.y + centre * to.x)
  const beforeEnd = Math.sign(b) * (-centre * to.x - b * h * to.y)
  return Math.abs(b) < 1 ? afterStart >= 0 && beforeEnd >= 0 : afterStart >= 0 || beforeEnd >= 0
}

/** A flat arc as a line: within flatMm of its chord. */
function lineIfFlat(arc: ArcSegment, flatMm: number): ArcOrLine {
  const chordMm = Math.hypot(arc.end.x - arc.start.x, arc.end.y - arc.start.y)
  const riseMm = (Math.abs(arc.bulge) * chordMm) / 2
  return riseMm <= flatMm ? { kind: 'line', start: arc.start, end: arc.end } : arc
}

/** Signed angle from one direction to another, left positive, radians. */
const angleBetween = (from: Point, to: Point) => Math.atan2(from.x * to.y - from.y * to.x, dot(from, to))

const dot = (a: Point, b: Point) => a.x * b.x + a.y * b.y

/** Whether a segment is already what a drawing of arcs and lines takes. */
export const isArcOrLine = (segment: Segment): segment is ArcOrLine =>
  segment.kind === 'arc' || segment.kind === 'line'
