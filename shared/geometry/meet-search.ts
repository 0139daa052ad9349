import { bendOf, derivativeAt, pointAt } from './evaluate'
import { cross, distance, distanceSquared, magnitudeOf, minus } from './point'
import type { Point, Segment } from './segment'

/** A stretch of a segment: its ends and how far it may leave its chord. */
interface Stretch {
  readonly from: number
  readonly to: number
  readonly start: Point
  readonly end: Point
  readonly sag: number
}

export interface ParameterPair {
  readonly tA: number
  readonly tB: number
}

/** A stretch whose sag is under this part of its chord is straight enough for Newton's method. */
const STRAIGHT = 0.02
/** Stretches that run nearly alike (sine of the angle) may meet twice: they are halved on, down to the least size. */
const ALIKE_SINE = 0.1
const LEAST_MM = 1e-5
/** Halvings allowed on one pair; beyond it (curves that all but coincide) near-parallel stretches are no longer halved. */
const MOST_PAIRS = 20000

/**
 * Parameters at which two segments may meet, refined by Newton's method: pairs of stretches whose boxes lie apart are dropped, others halved. Not all
 * of the pairs need be true meetings, and one meeting may come several times.
 */
export function meetingCandidates(a: Segment, b: Segment, reachMm: number): readonly ParameterPair[] {
  const search = { a, b, bendA: bendOf(a), bendB: bendOf(b), reachMm }
  const candidates: ParameterPair[] = []
  const pending: [Stretch, Stretch][] = [[stretchOf(a, 0, 1, search.bendA), stretchOf(b, 0, 1, search.bendB)]]
  for (let visited = 0; ; visited += 1) {
    const pair = pending.pop()
    if (!pair) return candidates
    const [p, q] = pair
    if (isApart(p, q, reachMm)) continue
    if (isSettled(p, q, visited > MOST_PAIRS)) {
      candidates.push(refinedPair(a, b, meetingOfChords(p, q)))
      continue
    }
    const halvesA = sizeOf(p) >= sizeOf(q)
    if (halvesA) for (const half of halvesOf(a, p, search.bendA)) pending.push([half, q])
    else for (const half of halvesOf(b, q, search.bendB)) pending.push([p, half])
  }
}

function stretchOf(segment: Segment, from: number, to: number, bend: number): Stretch {
  return {
    from,
    to,
    start: pointAt(segment, from),
    end: pointAt(segment, to),
    sag: (bend * (to - from) ** 2) / 8,
  }
}

const sizeOf = ({ start, end, sag }: Stretch): number => distance(start, end) + sag

function halvesOf(segment: Segment, { from, to }: Stretch, bend: number): readonly [Stretch, Stretch] {
  const middle = (from + to) / 2
  return [stretchOf(segment, from, middle, bend), stretchOf(segment, middle, to, bend)]
}

function isApart(p: Stretch, q: Stretch, reachMm: number): boolean {
  const reach = p.sag + q.sag + reachMm
  return (
    Math.min(p.start.x, p.end.x) > Math.max(q.start.x, q.end.x) + reach ||
    Math.min(q.start.x, q.end.x) > Math.max(p.start.x, p.end.x) + reach ||
    Math.min(p.start.y, p.end.y) > Math.max(q.start.y, q.end.y) + reach ||
    Math.min(q.start.y, q.end.y) > Math.max(p.start.y, p.end.y) + reach ||
    isBeside(p, q, reach) ||
    isBeside(q, p, reach)
  )
}

/** Whether q lies wholly to one side of p's chord: what boxes do not see of slanted stretches that run alike. */
function isBeside(p: Stretch, q: Stretch, reach: number): boolean {
  const ux = p.end.x - p.start.x
  const uy = p.end.y - p.start.y
  const size = Math.hypot(ux, uy) * reach
  const first = ux * (q.start.y - p.start.y) - uy * (q.start.x - p.start.x)
  const second = ux * (q.end.y - p.start.y) - uy * (q.end.x - p.start.x)
  return (first > size && second > size) || (first < -size && second < -size)
}

function isSettled(p: Stretch, q: Stretch, isSpent: boolean): boolean {
  const chordP = distance(p.start, p.end)
  const chordQ = distance(q.start, q.end)
  if (chordP + p.sag < LEAST_MM && chordQ + q.sag < LEAST_MM) return true
  if (p.sag > STRAIGHT * chordP || q.sag > STRAIGHT * chordQ) return false
  const sine = Math.abs(cross(minus(p.end, p.start), minus(q.end, q.start))) / (chordP * chordQ)
  return isSpent || sine > ALIKE_SINE
}

/** Where the chords of two stretches cross, as parameters kept to the stretches; the middles where they run alike. */
function meetingOfChords(p: Stretch, q: Stretch): ParameterPair {
  const u = minus(p.end, p.start)
  const v = minus(q.end, q.start)
  const z = cross(u, v)
  const between = minus(q.start, p.start)
  const s = z === 0 ? 0.5 : clamped(cross(between, v) / z)
  const t = z === 0 ? 0.5 : clamped(cross(between, u) / z)
  return { tA: p.from + s * (p.to - p.from), tB: q.from + t * (q.to - q.from) }
}

const clamped = (t: number): number => Math.min(1, Math.max(0, t))

/** Newton's method on A(tA) = B(tB), kept to 0…1; it stops when it no longer brings the points together. Touching curves converge slowly, by halves. */
export function refinedPair(a: Segment, b: Segment, from: ParameterPair): ParameterPair {
  let best = from
  let least = gapSquared(a, b, best)
  for (let step = 0; step < 60 && least > 0; step += 1) {
    const next = newtonStep(a, b, best)
    if (!next) break
    const gap = gapSquared(a, b, next)
    if (!(gap < least)) break
    best = next
    least = gap
  }
  return best
}

const gapSquared = (a: Segment, b: Segment, { tA, tB }: ParameterPair): number =>
  distanceSquared(pointAt(a, tA), pointAt(b, tB))

function newtonStep(a: Segment, b: Segment, { tA, tB }: ParameterPair): ParameterPair | undefined {
  const gap = minus(pointAt(b, tB), pointAt(a, tA))
  const u = derivativeAt(a, tA)
  const v = derivativeAt(b, tB)
  const z = cross(u, v)
  if (Math.abs(z) <= 1e-15 * magnitudeOf(u) * magnitudeOf(v)) return undefined
  return { tA: clamped(tA + cross(gap, v) / z), tB: clamped(tB + cross(gap, u) / z) }
}
