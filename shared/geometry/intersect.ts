import { MEETING_MM } from '@shared/units'
import { pointAt } from './evaluate'
import { arcArcPlaces, lineArcPlaces, lineLinePlaces } from './meet-closed'
import { meetingCandidates, refinedPair, type ParameterPair } from './meet-search'
import { nearestOnSegment } from './nearest'
import { distance } from './point'
import type { Point, Segment } from './segment'

/** A place where two segments meet. */
export interface Meeting {
  readonly tA: number
  readonly tB: number
  readonly point: Point
}

/** A common stretch shorter than this is one touch: the curves only linger within MEETING_MM of each other. */
const TOUCH_MM = 1e-3

/** Flatter arcs (|bulge|) are searched like curves: their centres are too far off for closed forms. */
const FLAT_BULGE = 1e-4

/**
 * All places where two segments meet, touching and meeting end to end among them, in order along a. Points within MEETING_MM of one another
 * count as one. Where they overlap, the two ends of each common stretch are given.
 */
export function intersectionsOf(a: Segment, b: Segment): readonly Meeting[] {
  const ends = endMeetings(a, b)
  const isOverlap = ends.some((end, i) => {
    const before = ends[i - 1]
    return before && distance(before.point, end.point) > TOUCH_MM && isCommon(a, b, before, end)
  })
  const found = isOverlap ? [] : innerMeetings(a, b)
  return withoutRepeats(a, b, [...ends, ...found])
}

/** Ends of either that lie on the other, in order along a. */
function endMeetings(a: Segment, b: Segment): readonly Meeting[] {
  const meetings: Meeting[] = []
  for (const tA of [0, 1]) {
    const near = nearestOnSegment(b, pointAt(a, tA))
    if (near.distance <= MEETING_MM)
      meetings.push({ tA, tB: endOr(b, near.t, near.point), point: pointAt(a, tA) })
  }
  for (const tB of [0, 1]) {
    const near = nearestOnSegment(a, pointAt(b, tB))
    if (near.distance <= MEETING_MM)
      meetings.push({ tA: endOr(a, near.t, near.point), tB, point: pointAt(b, tB) })
  }
  return mergedInOrder(meetings)
}

/** A parameter brought onto the end of its segment when the point is that end. */
function endOr(segment: Segment, t: number, point: Point): number {
  if (distance(point, segment.start) <= MEETING_MM) return 0
  return distance(point, segment.end) <= MEETING_MM ? 1 : t
}

function mergedInOrder(meetings: readonly Meeting[]): readonly Meeting[] {
  const sorted = [...meetings].sort((m, n) => m.tA - n.tA || m.tB - n.tB)
  const kept: Meeting[] = []
  for (const meeting of sorted) {
    const before = kept.at(-1)
    if (before && distance(before.point, meeting.point) <= MEETING_MM && isSameCourse(before, meeting))
      continue
    kept.push(meeting)
  }
  return kept
}

/** The same point can be passed twice by one segment (the two ends of a closed one): then the parameters lie far apart. */
const isSameCourse = (m: Meeting, n: Meeting): boolean =>
  Math.abs(m.tA - n.tA) < 0.5 && Math.abs(m.tB - n.tB) < 0.5

/** Whether the whole stretch of a between two meetings lies on b: seen at three places between. */
function isCommon(a: Segment, b: Segment, m: Meeting, n: Meeting): boolean {
  return [0.25, 0.5, 0.8].every((part) => {
    const point = pointAt(a, m.tA + part * (n.tA - m.tA))
    return nearestOnSegment(b, point).distance <= MEETING_MM
  })
}

function innerMeetings(a: Segment, b: Segment): readonly Meeting[] {
  const meetings: Meeting[] = []
  for (const pair of candidatesOf(a, b)) {
    const pointA = pointAt(a, pair.tA)
    const pointB = pointAt(b, pair.tB)
    if (distance(pointA, pointB) > MEETING_MM) continue
    meetings.push({ tA: endOr(a, pair.tA, pointA), tB: endOr(b, pair.tB, pointB), point: pointA })
  }
  return meetings
}

const hasCentre = (segment: Segment): boolean =>
  segment.kind === 'arc' && Math.abs(segment.bulge) >= FLAT_BULGE

function candidatesOf(a: Segment, b: Segment): readonly ParameterPair[] {
  if (a.kind === 'line' && b.kind === 'line') return pairsAt(a, b, lineLinePlaces(a, b))
  if (a.kind === 'line' && b.kind === 'arc' && hasCentre(b)) return pairsAt(a, b, lineArcPlaces(a, b))
  if (a.kind === 'arc' && b.kind === 'line' && hasCentre(a)) return pairsAt(a, b, lineArcPlaces(b, a))
  if (a.kind === 'arc' && b.kind === 'arc' && hasCentre(a) && hasCentre(b))
    return pairsAt(a, b, arcArcPlaces(a, b))
  return meetingCandidates(a, b, MEETING_MM)
}

function pairsAt(a: Segment, b: Segment, places: readonly Point[]): readonly ParameterPair[] {
  return places.map((place) =>
    refinedPair(a, b, { tA: nearestOnSegment(a, place).t, tB: nearestOnSegment(b, place).t }),
  )
}

/** Repeats dropped; of a stretch on which the two stay within MEETING_MM (an overlap, or the neighbourhood of a touch) only what bounds it. */
function withoutRepeats(a: Segment, b: Segment, meetings: readonly Meeting[]): readonly Meeting[] {
  const runs: Meeting[][] = []
  for (const meeting of mergedInOrder(meetings)) {
    const run = runs.at(-1)
    const last = run?.at(-1)
    if (run && last && isSameCourse(last, meeting) && isCommon(a, b, last, meeting)) run.push(meeting)
    else runs.push([meeting])
  }
  return runs.flatMap(boundsOfRun)
}

function boundsOfRun(run: readonly Meeting[]): readonly Meeting[] {
  const first = run[0]
  const last = run.at(-1)
  if (!first || !last || first === last) return run
  if (distance(first.point, last.point) > TOUCH_MM) return [first, last]
  return [run.find(isAtAnEnd) ?? run[Math.floor(run.length / 2)] ?? first]
}

const isAtAnEnd = ({ tA, tB }: Meeting): boolean => tA === 0 || tA === 1 || tB === 0 || tB === 1
