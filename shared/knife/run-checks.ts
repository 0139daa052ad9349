import type { Path } from '@shared/geometry'
import { faceDepthOf, faceExtentOf } from './face-curve'
import { findDepthRefusal, greatestDepthOf } from './head'
import type { KnifeHead } from './head'
import { peripheralSpeedOf } from './running'
import type { HeadRunning } from './running'

/** A check of the knife in its head, of the closed list of checks: its number, its limit, and what to do. */
export interface KnifeCheck {
  readonly code: 'clamp' | 'speed'
  readonly severity: 'stop' | 'warn' | 'note' | 'ok'
  readonly value: number
  readonly limit: number
  readonly says: string
}

/** Peripheral speeds usual for hand feed on a spindle, m/s, to limit kickback: a maker's manual of 2019; ask the mill. */
export const HAND_FEED_SPEEDS_M_PER_S = { least: 40, greatest: 70 } as const

/** Whether the head can cut a wood face with room left to clamp the knife: value and limit are depths, mm. */
export function clampCheckOf(face: Path, head: KnifeHead): KnifeCheck {
  const depthMm = faceDepthOf(faceExtentOf(face))
  const limit = greatestDepthOf(head)
  const refusal = findDepthRefusal(head, depthMm)
  return refusal === undefined
    ? {
        code: 'clamp',
        severity: 'ok',
        value: depthMm,
        limit,
        says: 'The knife reaches the whole face with room left to clamp it.',
      }
    : { code: 'clamp', severity: 'stop', value: depthMm, limit, says: refusal.says }
}

/** Checks of the speed; none where none is given. Value and limit are rpm against the head's mark, m/s for hand feed. */
export function speedChecksOf(running: HeadRunning): KnifeCheck[] {
  const { rpm } = running
  if (rpm === undefined) return []
  return [markedSpeedCheck(rpm, running.maxRpm), ...handFeedChecks(rpm, running)]
}

function markedSpeedCheck(rpm: number, maxRpm: number | undefined): KnifeCheck {
  const code = 'speed'
  if (maxRpm === undefined) {
    const says =
      'The greatest speed marked on the head is not given; read it off the head and enter it before anything is run.'
    return { code, severity: 'warn', value: rpm, limit: rpm, says }
  }
  if (rpm > maxRpm) {
    const says = `The speed is ${rpm} rpm, more than the ${maxRpm} rpm marked on the head; the marked speed is never exceeded.`
    return { code, severity: 'stop', value: rpm, limit: maxRpm, says }
  }
  return {
    code,
    severity: 'ok',
    value: rpm,
    limit: maxRpm,
    says: 'The speed is within the one marked on the head.',
  }
}

function handFeedChecks(rpm: number, { cuttingDiameterMm, feedBy }: HeadRunning): KnifeCheck[] {
  if (feedBy !== 'manual') return []
  const { least, greatest } = HAND_FEED_SPEEDS_M_PER_S
  const speed = peripheralSpeedOf(cuttingDiameterMm, rpm)
  if (speed >= least && speed <= greatest) return []
  const limit = speed < least ? least : greatest
  const says = `The peripheral speed is ${speed.toFixed(1)} m/s; for hand feed ${least} to ${greatest} m/s is usual, to limit kickback. Common practice, ask the mill.`
  return [{ code: 'speed', severity: 'warn', value: speed, limit, says }]
}
