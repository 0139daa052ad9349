import { curvatureAt, pointAt } from '@shared/geometry'
import type { Path, Point, Segment } from '@shared/geometry'
import { limitOf, placeOf } from './check'
import type { Check, CheckOptions } from './check'
import { raisedPartsOf, sunkPartsOf } from './face-levels'
import type { Relief } from './face-levels'
import { turnAt } from './face-turns'
import { saidMm } from './saying'

/** rad. A corner that turns by less is no arris: half a degree. */
const ARRIS_RAD = Math.PI / 360

/**
 * A round of the wood is a recess of the knife, which the wheel's nose must enter. Outer arrises have no radius at all: they come out as round as
 * the nose, unless the mill finishes them otherwise, which is worth a note.
 */
export function wheelNoseChecks(face: Path, options: CheckOptions): readonly Check[] {
  const { value: limit, source } = limitOf(options, 'wheelNose')
  return [roundCheck(face, limit, source), ...arrisNotes(face, limit, source)]
}

function roundCheck(face: Path, limit: number, source: string): Check {
  const sharpest = sharpestRoundOf(face)
  if (!sharpest) {
    const at = placeOf(face[0]?.start ?? { x: 0, y: 0 })
    const says = `The wood has no rounds for the wheel's nose of ${limit} mm radius to enter${source}.`
    return { code: 'wheel-nose', severity: 'ok', value: limit, limit, at, says }
  }
  const { radiusMm: value, at } = sharpest
  const place = { code: 'wheel-nose', value, limit, at: placeOf(at) } as const
  const says = `The sharpest round of the wood has a radius of ${saidMm(value)} mm; the wheel's nose has ${limit} mm${source}.`
  if (value >= limit) return { ...place, severity: 'ok', says }
  return {
    ...place,
    severity: 'warn',
    says,
    cure: 'Make the round fuller, or have the knife ground with a finer wheel.',
  }
}

interface Round {
  readonly radiusMm: number
  readonly at: Point
}

function sharpestRoundOf(face: Path): Round | undefined {
  let sharpest: Round | undefined
  for (const segment of face) {
    for (const t of stationsOf(segment)) {
      const curvature = curvatureAt(segment, t)
      if (!(curvature < 0)) continue
      const radiusMm = -1 / curvature
      if (radiusMm < (sharpest?.radiusMm ?? Infinity)) sharpest = { radiusMm, at: pointAt(segment, t) }
    }
  }
  return sharpest
}

/** Steps in which the curvature of a cubic is looked at: a guide for the grinder, no measure. */
const CURVATURE_STEPS = 64

/** Where the curvature of a segment may be greatest: an arc's is the same all along, a quarter ellipse's greatest at one of its ends. */
function stationsOf(segment: Segment): readonly number[] {
  if (segment.kind === 'line') return []
  if (segment.kind === 'arc') return [0.5]
  if (segment.kind === 'ellipse') return [0, 1]
  return Array.from({ length: CURVATURE_STEPS + 1 }, (_, i) => i / CURVATURE_STEPS)
}

function arrisNotes(face: Path, limit: number, source: string): readonly Check[] {
  const arrises = face
    .slice(1)
    .filter((segment, index) => turnAt(face[index] as Segment, segment) < -ARRIS_RAD)
  const first = arrises[0]
  if (!first) return []
  const count = arrises.length === 1 ? 'One outer arris comes' : `${arrises.length} outer arrises come`
  return [
    {
      code: 'wheel-nose',
      severity: 'note',
      value: 0,
      limit,
      at: placeOf(first.start),
      says: `${count} out as round as the wheel's nose, ${limit} mm radius${source}.`,
      cure: 'Ask the mill to grind the corners sharp, or sharpen them by hand.',
    },
  ]
}

/** A narrow raised member is a slot of the knife, which the wheel's width must enter. */
export function wheelWidthCheck(face: Path, options: CheckOptions): Check {
  const { value: limit, source } = limitOf(options, 'wheelWidth')
  const narrowest = leastBy(raisedPartsOf(face), ({ widthMm }) => widthMm)
  const at = placeOf(narrowest?.at ?? face[0]?.start ?? { x: 0, y: 0 })
  if (!narrowest) {
    const says = `Nothing stands up between its neighbours for the wheel, ${limit} mm wide, to enter${source}.`
    return { code: 'wheel-width', severity: 'ok', value: limit, limit, at, says }
  }
  const place = { code: 'wheel-width', value: narrowest.widthMm, limit, at } as const
  const says = `The narrowest raised part is ${saidMm(narrowest.widthMm)} mm wide; the grinding wheel is ${limit} mm${source}.`
  if (narrowest.widthMm >= limit) return { ...place, severity: 'ok', says }
  return {
    ...place,
    severity: 'warn',
    says,
    cure: 'Make the member wider, or have the knife ground with a thinner wheel.',
  }
}

/** A quirk is a tooth of the knife: too deep for its width it burns or breaks. Value and limit are depth to width. */
export function toothCheck(face: Path, options: CheckOptions): Check {
  const { value: limit, source } = limitOf(options, 'maxToothRatio')
  const ratioOf = ({ heightMm, widthMm }: Relief): number => heightMm / widthMm
  const slimmest = leastBy(sunkPartsOf(face), (sunk) => -ratioOf(sunk))
  const at = placeOf(slimmest?.at ?? face[0]?.start ?? { x: 0, y: 0 })
  if (!slimmest) {
    const says = `No part of the face lies sunk between its neighbours${source}.`
    return { code: 'tooth', severity: 'ok', value: 0, limit, at, says }
  }
  const value = ratioOf(slimmest)
  const place = { code: 'tooth', value, limit, at } as const
  const says = `The slimmest sunk part is ${saidMm(slimmest.heightMm)} mm deep and ${saidMm(slimmest.widthMm)} mm wide, ${value.toFixed(2)} to 1; a tooth of the knife stands ${limit} to 1${source}.`
  if (value <= limit) return { ...place, severity: 'ok', says }
  return {
    ...place,
    severity: 'warn',
    says,
    cure: 'Make it wider or shallower, or cut it with a saw after running.',
  }
}

function leastBy<Item>(items: readonly Item[], measure: (item: Item) => number): Item | undefined {
  let least: Item | undefined
  for (const item of items) if (!least || measure(item) < measure(least)) least = item
  return least
}
