import type { Fault } from '@shared/failure'
import type { Basis, Section } from './document'

/** How many of a section's dimensions rest on what. */
export interface BasisCounts {
  readonly measured: number
  readonly precedent: number
  readonly judged: number
  readonly none: number
}

/** A dimension that needs a basis: every width and rise that is not 0, and the sight edge's height. */
interface BasedDimension {
  /** JSON pointer of its basis, relative to the section. */
  readonly path: string
  readonly name: string
  readonly basis: Basis | undefined
}

function basedDimensionsOf({ members, basis }: Section): readonly BasedDimension[] {
  const ofMembers = members.flatMap((member, index) =>
    (['width', 'rise'] as const)
      .filter((side) => member[side] !== 0)
      .map((side) => ({
        path: `/members/${index}/basis/${side}`,
        name: `the ${side} of member ${index + 1} (${member.kind.replace('-', ' ')})`,
        basis: member.basis?.[side],
      })),
  )
  const sightEdge = {
    path: '/basis/sightEdgeHeight',
    name: 'the height of the sight edge',
    basis: basis?.sightEdgeHeight,
  }
  return [sightEdge, ...ofMembers]
}

/** What is still missing before the section can be put forward: one fault for each dimension without a basis. */
export function missingBasisOf(section: Section): readonly Fault[] {
  return basedDimensionsOf(section)
    .filter(({ basis }) => basis === undefined)
    .map(({ path, name }) => ({
      path,
      code: 'basis-missing',
      says: `Say why ${name} is what it is: measured, a precedent, or judged.`,
    }))
}

/** Counts over all dimensions that need a basis. */
export function basisCountsOf(section: Section): BasisCounts {
  const counts = { measured: 0, precedent: 0, judged: 0, none: 0 }
  for (const { basis } of basedDimensionsOf(section)) counts[basis?.kind ?? 'none'] += 1
  return counts
}
