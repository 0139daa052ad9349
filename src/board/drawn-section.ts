import { Failure } from '@shared/failure'
import type { Fault } from '@shared/failure'
import { lineFrom } from '@shared/geometry'
import type { Path, Point, Segment } from '@shared/geometry'
import { faultsOfSection, memberEndOf, memberSegments, sectionFromDraft, woodFaceOf } from '@shared/section'
import type { Basis, DraftMember, DraftSection } from '@shared/section'

export type BasisKind = Basis['kind'] | 'none'

/** A member as it is drawn. */
export interface DrawnMember {
  readonly member: DraftMember
  readonly start: Point
  readonly end: Point
  readonly path: Path
  readonly basis: BasisKind
  /** Whether its own rules are broken, so that only its chord can be drawn. */
  readonly isBroken: boolean
}

/** A section as far as it can be drawn, which is always: what is broken is a straight line, and is told. */
export interface DrawnSection {
  readonly draft: DraftSection
  readonly members: readonly DrawnMember[]
  /** Breaks 0…n, mm. */
  readonly breaks: readonly Point[]
  /** The wood face under the gesso; undefined where it is the finished face or cannot be worked out. */
  readonly woodFace: Path | undefined
  readonly faults: readonly Fault[]
}

export function drawnSection(draft: DraftSection): DrawnSection {
  const faults = faultsOfSection(sectionFromDraft(draft))
  const breaks: Point[] = [{ x: 0, y: finite(draft.sightEdgeHeight) }]
  const members = draft.members.map((member): DrawnMember => {
    const start = breaks.at(-1) as Point
    const end = memberEndOf(member, start)
    breaks.push(end)
    const path = segmentsOf(member, start)
    return {
      member,
      start,
      end,
      path: path ?? [lineFrom(start, end)],
      basis: basisKindOf(member),
      isBroken: path === undefined,
    }
  })
  return { draft, members, breaks, woodFace: faults.length === 0 ? woodFaceUnder(draft) : undefined, faults }
}

const finite = (value: number): number => (Number.isFinite(value) ? value : 0)

function segmentsOf(member: DraftMember, start: Point): readonly Segment[] | undefined {
  try {
    const segments = memberSegments(member, start)
    return segments.every(({ end }) => Number.isFinite(end.x) && Number.isFinite(end.y))
      ? segments
      : undefined
  } catch (error) {
    if (error instanceof Failure) return undefined
    throw error
  }
}

/** The least sure of a member's two bases decides how its line is drawn: none, then judged, precedent, measured. */
export function basisKindOf({ width, rise, basis }: DraftMember): BasisKind {
  const kinds = [
    ...(width === 0 ? [] : [basis?.width?.kind ?? 'none']),
    ...(rise === 0 ? [] : [basis?.rise?.kind ?? 'none']),
  ] as const
  return (['none', 'judged', 'precedent'] as const).find((kind) => kinds.includes(kind)) ?? 'measured'
}

function woodFaceUnder(draft: DraftSection): Path | undefined {
  const { gesso } = draft
  const isBare = typeof gesso === 'number' ? gesso === 0 : gesso.length === 0
  return isBare ? undefined : woodFaceOf(sectionFromDraft(draft)).path
}
