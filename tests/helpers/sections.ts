import { withDefaults } from '@shared/section'
import type { PartialSection, Section } from '@shared/section'

/** A section of a plain block with a rebate, and of it what a test says. */
export function sectionWith(parts: Partial<PartialSection>): Section {
  return withDefaults({
    sightEdgeHeight: 30,
    rebate: { width: 6, depth: 12 },
    members: [{ kind: 'fillet', width: 40, rise: 0 }],
    ...parts,
  })
}
