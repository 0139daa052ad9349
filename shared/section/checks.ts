import type { Check, CheckOptions } from './check'
import type { Section } from './document'
import { wheelNoseChecks, toothCheck, wheelWidthCheck } from './knife-checks'
import { outlineWith } from './outline'
import { leastWoodCheck, stackChecks } from './rebate-checks'
import { featherCheck, headChecks, steepWallCheck, undercutCheck } from './run-checks'
import { woodFaceOf } from './wood-face'

/**
 * Whether a section without faults can be run: every check on its wood face with its number, its limit, where, and what would cure it, 'ok' among
 * them. Limits the mill's card does not give are common practice and say so. What needs the knife itself (clamp, speed) is checked with the knife.
 */
export function checksOf(section: Section, options: CheckOptions = {}): Check[] {
  const { path: face } = woodFaceOf(section)
  if (face.length === 0) return []
  const outline = outlineWith(section, face)
  return [
    undercutCheck(face),
    steepWallCheck(face, options),
    ...wheelNoseChecks(face, options),
    wheelWidthCheck(face, options),
    toothCheck(face, options),
    ...headChecks(face, outline, options),
    leastWoodCheck(section, face, options),
    featherCheck(outline, options),
    ...stackChecks(section, options),
  ]
}
