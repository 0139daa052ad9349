import { TURN_BACK_MM, wordOf } from '@shared/units'
import { boundsOf } from '@shared/geometry'
import type { Outline, Path, Point } from '@shared/geometry'
import { FEATHER_EDGE_DEG, limitOf, placeOf } from './check'
import type { Check, CheckOptions } from './check'
import { directionRangeOf, overhangOf, turnAt } from './face-turns'
import { saidDegrees, saidMm } from './saying'
import { findSteepestWall } from './steep-walls'

const DEGREES = 180 / Math.PI

/** The face must not turn back under itself for a head coming straight down; if it does, which tilts of the section would clear it. */
export function undercutCheck(face: Path): Check {
  const { overhangMm, at } = overhangOf(face)
  const place = { code: 'undercut', value: overhangMm, limit: 0, at: placeOf(at) } as const
  if (overhangMm <= TURN_BACK_MM)
    return {
      ...place,
      severity: 'ok',
      value: 0,
      says: 'A head coming straight down reaches all of the face.',
    }
  const says = `The face turns back under itself by ${saidMm(overhangMm)} mm: a head coming straight down cannot reach it.`
  return { ...place, severity: 'stop', says, cure: tiltCure(face) }
}

/** A tilt τ brings every direction θ to θ + τ, which must lie within ±90°. */
function tiltCure(face: Path): string {
  const { least, greatest } = directionRangeOf(face)
  const from = -90 - least * DEGREES
  const to = 90 - greatest * DEGREES
  if (from > to + 1e-9)
    return 'No tilt of the section clears it; it needs a second pass, or another member there.'
  const [low, high] = [Math.abs(from), Math.abs(to)].sort((a, b) => a - b) as [number, number]
  const range = high - low < 0.05 ? `${saidDegrees(low)}°` : `${saidDegrees(low)}° to ${saidDegrees(high)}°`
  const side = to <= 0 ? 'toward the back edge' : 'toward the sight edge'
  return `Run the section tilted: ${range} ${side} would clear it.`
}

/** A wall nearer to upright than the mill's side clearance rubs the knife's side where it is high. */
export function steepWallCheck(face: Path, options: CheckOptions): Check {
  const { value: clearance, source } = limitOf(options, 'sideClearance')
  const wall = findSteepestWall(face, clearance.angle / DEGREES)
  const value = wall?.heightMm ?? 0
  const at = placeOf(wall?.at ?? face[0]?.start ?? { x: 0, y: 0 })
  const place = { code: 'steep-wall', value, limit: clearance.over, at } as const
  if (value <= clearance.over)
    return {
      ...place,
      severity: 'ok',
      says: `No wall within ${clearance.angle}° of upright is higher than ${clearance.over} mm${source}.`,
    }
  return {
    ...place,
    severity: 'warn',
    says: `A wall within ${clearance.angle}° of upright is ${saidMm(value)} mm high; over ${clearance.over} mm the knife's side rubs and burns${source}.`,
    cure: `Lean the wall by ${clearance.angle}° or more, or make it lower.`,
  }
}

/** The section must go under the head, and the cut must not be deeper than head and mill allow. */
export function headChecks(face: Path, outline: Outline, options: CheckOptions): readonly Check[] {
  const { min, max } = boundsOf(outline)
  const faceBounds = boundsOf(face)
  return [
    widthCheck(max.x - min.x, { x: max.x, y: 0 }, options),
    depthCheck(faceBounds.max.y - faceBounds.min.y, { x: (min.x + max.x) / 2, y: faceBounds.min.y }, options),
  ]
}

function widthCheck(value: number, at: Point, options: CheckOptions): Check {
  const { value: limit, source } = limitOf(options, 'maxWidth')
  const place = { code: 'head-width', value, limit, at: placeOf(at) } as const
  const isWithin = value <= limit
  const says = `The wood is ${saidMm(value)} mm wide; the head takes ${limit} mm${source}.`
  if (isWithin) return { ...place, severity: 'ok', says }
  return { ...place, severity: 'stop', says, cure: 'Make the section in two parts, or ask another mill.' }
}

function depthCheck(value: number, at: Point, options: CheckOptions): Check {
  const { value: mill, source } = limitOf(options, 'maxDepth')
  const radius = options.head ? options.head.cuttingDiameter / 2 : Infinity
  const limit = Math.min(mill, radius)
  const whose = radius < mill ? ' (the cutting radius)' : source
  const place = { code: 'head-depth', value, limit, at: placeOf(at) } as const
  const says = `The cut is ${saidMm(value)} mm deep from the highest to the lowest of the face; ${saidMm(limit)} mm can be cut${whose}.`
  if (value <= limit) return { ...place, severity: 'ok', says }
  return { ...place, severity: 'stop', says, cure: 'Lower what stands highest, or run it in two passes.' }
}

/** Outer corners sharper than a feather edge crumble. */
export function featherCheck(outline: Outline, { vocabulary = 'moulding' }: CheckOptions): Check {
  const limit = FEATHER_EDGE_DEG
  let value = 180
  let at: Point = outline[0]?.start ?? { x: 0, y: 0 }
  for (const [index, segment] of outline.entries()) {
    const next = outline[(index + 1) % outline.length] ?? segment
    const turn = turnAt(segment, next)
    const angle = 180 + Math.min(0, turn) * DEGREES
    if (angle < value) {
      value = angle
      at = segment.end
    }
  }
  const place = { code: 'feather', value, limit, at: placeOf(at) } as const
  const says = `The sharpest edge of the wood has ${saidDegrees(value)}°; under ${limit}° it crumbles (common practice, ask the mill).`
  if (value >= limit) return { ...place, severity: 'ok', says }
  const word = wordOf(vocabulary, 'moulding')
  return {
    ...place,
    severity: 'warn',
    says,
    cure: `Blunt the edge with a fillet, or carve it on the ${word} afterwards.`,
  }
}
