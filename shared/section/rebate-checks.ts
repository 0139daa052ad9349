import { wordOf } from '@shared/units'
import type { Path } from '@shared/geometry'
import { limitOf, placeOf } from './check'
import type { Check, CheckOptions, RebateStack } from './check'
import type { Section } from './document'
import { leastWoodOf } from './least-wood'
import { saidDegrees, saidMm } from './saying'

/** Degrees. A face that rises by less runs level. */
const LEVEL_DEG = 0.05

/** The wood left between rebate and face. */
export function leastWoodCheck(section: Section, face: Path, options: CheckOptions): Check {
  const { value: limit, source } = limitOf(options, 'leastWood')
  const word = wordOf(options.vocabulary ?? 'moulding', 'rebate')
  const { thicknessMm: value, at, featherAngleDeg } = leastWoodOf(section, face)
  const place = { code: 'least-wood', value, limit, at: placeOf(at) } as const
  const edge =
    featherAngleDeg !== undefined && featherAngleDeg > LEVEL_DEG
      ? `, at the sight edge, where the face rises at ${saidDegrees(featherAngleDeg)}°`
      : ''
  const says = `The least wood at the ${word} is ${saidMm(value)} mm${edge}; it should be ${limit} mm${source}.`
  if (value >= limit) return { ...place, severity: 'ok', says }
  const cure = `Make the ${word} shallower or narrower, or raise the sight edge by ${saidMm(limit - value)} mm.`
  return { ...place, severity: 'warn', says, cure }
}

const PARTS = ['lining', 'glazing', 'airGap', 'thickness', 'backing', 'fixings'] as const

/** Whether the picture's stack finds room in the rebate; nothing where no part of it is known. Value is the room it takes, limit the rebate's depth. */
export function stackChecks(section: Section, options: CheckOptions): readonly Check[] {
  const { stack } = options
  if (!stack || PARTS.every((part) => stack[part] === undefined)) return []
  const word = wordOf(options.vocabulary ?? 'moulding', 'rebate')
  return [...glazingChecks(section, stack), roomCheck(section, stack, word)]
}

const sizeOf = (stack: RebateStack, parts: readonly (keyof RebateStack)[]): number =>
  parts.reduce((sum, part) => sum + (stack[part] ?? 0), 0)

/** Glazing without an air gap lies on the picture. */
function glazingChecks(
  { rebate }: Section,
  { glazing = 0, airGap, thickness = 0 }: RebateStack,
): readonly Check[] {
  if (glazing === 0 || airGap !== 0 || thickness === 0) return []
  return [
    {
      code: 'stack',
      severity: 'stop',
      value: 0,
      limit: 0,
      at: [rebate.width / 2, rebate.depth],
      says: 'The glazing would touch the picture: there is no air gap between them.',
      cure: 'Put a spacer between glazing and picture.',
    },
  ]
}

/**
 * What stands out of the rebate behind can be built up round. Where more stands out than backing and fixings, the picture itself does, and pressing it
 * home would bring it against the glazing (or, unglazed, leave it unheld): that is a stop.
 */
function roomCheck({ rebate }: Section, stack: RebateStack, word: string): Check {
  const value = sizeOf(stack, PARTS)
  const limit = rebate.depth
  const place = { code: 'stack', value, limit, at: [rebate.width / 2, 0] } as const
  const shortage = value - limit
  const says = `The picture's stack is ${saidMm(value)} mm deep and the ${word} ${saidMm(limit)} mm.`
  if (shortage <= 0) return { ...place, severity: 'ok', says }
  const cure = `Build up the back by ${saidMm(shortage)} mm, or make the ${word} deeper by as much.`
  const isPictureOut = shortage > sizeOf(stack, ['backing', 'fixings'])
  if (!isPictureOut) return { ...place, severity: 'warn', says, cure }
  const why =
    (stack.glazing ?? 0) > 0
      ? 'the picture itself stands out of it, and the glazing would touch it when it is pressed home'
      : 'the picture itself stands out of it'
  return { ...place, severity: 'stop', says: `${says.slice(0, -1)}: ${why}.`, cure }
}
