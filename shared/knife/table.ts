import { pointAt } from '@shared/geometry'
import type { Path, Point, Segment } from '@shared/geometry'
import { KNIFE_TABLE_MM } from '@shared/units'
import { findDepthRefusal } from './head'
import type { DepthRefused, KnifeHead } from './head'
import { faceDepthOf, faceExtentOf, turnsOf } from './face-curve'
import type { FaceExtent } from './face-curve'
import { faceHeightAt } from './face-depth'

/** One place of the knife table, mm. */
export interface KnifeRow {
  readonly x: number
  /** Depth below the wood face's highest point. */
  readonly depth: number
  /** Height on the knife's face from the tip line back. */
  readonly face: number
}

export type KnifeTable = { readonly kind: 'table'; readonly rows: readonly KnifeRow[] } | DepthRefused

/**
 * The knife as a table in face order, from the sight edge outward: a row at every joint of the face (hence at every break),
 * at every place where it turns in x or y, and as many between as keep straight lines within KNIFE_TABLE_MM.
 */
export function knifeTable(face: Path, head: KnifeHead): KnifeTable {
  const extent = faceExtentOf(face)
  const refusal = findDepthRefusal(head, faceDepthOf(extent))
  if (refusal !== undefined) return refusal
  const rowOf = (point: Point) => rowAt(point, extent, head)
  const rows = face.flatMap((segment, index) => {
    const points = parametersOf(segment, rowOf).map((t) => pointAt(segment, t))
    return (index === 0 ? points : points.slice(1)).map(rowOf)
  })
  return { kind: 'table', rows }
}

function rowAt(point: Point, extent: FaceExtent, head: KnifeHead): KnifeRow {
  return {
    x: point.x,
    depth: extent.greatestY - point.y,
    face: faceHeightAt(head, point.y - extent.leastY),
  }
}

/** Parameters of a segment's rows: its ends, its turns, and equal steps between. */
function parametersOf(segment: Segment, rowOf: (point: Point) => KnifeRow): number[] {
  const turns = turnsOf(segment)
  const parameters = [0]
  turns.slice(1).forEach((to, index) => {
    const from = turns[index] ?? 0
    const steps = stepsWithin((t) => rowOf(pointAt(segment, t)), from, to)
    for (let step = 1; step < steps; step += 1) parameters.push(from + ((to - from) * step) / steps)
    parameters.push(to)
  })
  return parameters
}

/** The sampled deviation is held this far below what is promised, since samples can miss the very peak. */
const SAMPLING_SHARE = 0.95
const SAMPLES = 16
const MOST_STEPS = 100_000

/** Least number of equal steps whose chords keep within the accuracy, both as depth and as height on the knife. */
function stepsWithin(rowAtParameter: (t: number) => KnifeRow, from: number, to: number): number {
  const allowed = KNIFE_TABLE_MM * SAMPLING_SHARE
  let steps = 1
  while (steps < MOST_STEPS) {
    let worst = 0
    for (let step = 0; step < steps; step += 1) {
      const width = (to - from) / steps
      worst = Math.max(worst, deviationOf(rowAtParameter, from + width * step, width))
    }
    if (worst <= allowed) return steps
    // A chord's deviation falls with the square of its length; aim a little short, so as not to overshoot the least.
    steps = Math.max(steps + 1, Math.floor(steps * Math.sqrt(worst / allowed) * 0.9))
  }
  return steps
}

function deviationOf(rowAtParameter: (t: number) => KnifeRow, from: number, width: number): number {
  const start = rowAtParameter(from)
  const end = rowAtParameter(from + width)
  let worst = 0
  for (let sample = 1; sample < SAMPLES; sample += 1) {
    const row = rowAtParameter(from + (width * sample) / SAMPLES)
    worst = Math.max(
      worst,
      offLine(row.x, row.depth, start.x, start.depth, end.x, end.depth),
      offLine(row.x, row.face, start.x, start.face, end.x, end.face),
    )
  }
  return worst
}

/** Distance of (x, y) from the straight line through two points, mm; from the first where they coincide. */
function offLine(x: number, y: number, x0: number, y0: number, x1: number, y1: number): number {
  const length = Math.hypot(x1 - x0, y1 - y0)
  if (length === 0) return Math.hypot(x - x0, y - y0)
  return Math.abs((x1 - x0) * (y - y0) - (y1 - y0) * (x - x0)) / length
}
