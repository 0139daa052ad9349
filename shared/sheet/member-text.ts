import { assertNever } from '@shared/failure'
import { arcGeometryOf } from '@shared/geometry'
import type { Segment } from '@shared/geometry'
import type { Basis, Member, MemberKind } from '@shared/section'
import { wordOf } from '@shared/units'
import type { Vocabulary } from '@shared/units'
import type { LengthPrinter } from './printing'

/** A member's kind in the trade's words. */
export function kindText(kind: MemberKind, vocabulary: Vocabulary): string {
  switch (kind) {
    case 'cyma-recta':
      return 'cyma recta'
    case 'cyma-reversa':
      return 'cyma reversa'
    case 'splay':
      return wordOf(vocabulary, 'splay')
    case 'free':
      return 'free curve'
    default:
      return kind
  }
}

/** Why a dimension is what it is, with its ± at about 95 % (twice the standard deviation that a section holds). */
export function basisText(basis: Basis | undefined, printer: LengthPrinter): string {
  if (basis === undefined) return 'not given'
  switch (basis.kind) {
    case 'measured':
      return printer.plusMinus(basis.plusMinus)
    case 'precedent':
    case 'judged':
      return basis.kind
    default:
      return assertNever(basis)
  }
}

/** Two radii are one where they print alike and differ by no more than this, mm. */
const SAME_RADIUS_MM = 1e-6

/** The different radii of the arcs among these segments, mm, in order of the face. */
export function radiiOf(segments: readonly Segment[]): number[] {
  const radii: number[] = []
  for (const segment of segments) {
    if (segment.kind !== 'arc') continue
    const { radius } = arcGeometryOf(segment)
    if (!radii.some((known) => Math.abs(known - radius) <= SAME_RADIUS_MM)) radii.push(radius)
  }
  return radii
}

/**
 * What the knife's grinder must know of a member's curve: the radii of its wood, or the words for one that is no arc.
 * `wood` are the member's segments on the wood face (none where the gesso fills it), `gessoMm` what lies over it.
 */
export function curveText(
  member: Member,
  wood: readonly Segment[],
  gessoMm: number,
  printer: LengthPrinter,
): string {
  if (wood.length === 0) return 'filled by gesso'
  switch (member.kind) {
    case 'fillet':
    case 'splay':
      return '–'
    case 'cavetto':
    case 'ovolo':
    case 'cyma-recta':
    case 'cyma-reversa':
    case 'scotia':
    case 'torus':
    case 'bead':
      return radiiText(wood, printer)
    case 'reeds':
    case 'flutes':
      return `${member.count} × ${radiiText(wood, printer)}`
    case 'quirk':
      return `${member.shape === 'v' ? 'V' : 'square'}, deep ${printer.length(member.depth)}`
    case 'thumb':
      if (gessoMm !== 0) return 'ellipse less gesso'
      return `ellipse ${printer.length(member.width)} × ${printer.length(Math.abs(member.rise))}`
    case 'free':
      return 'see DXF'
    default:
      return assertNever(member)
  }
}

function radiiText(wood: readonly Segment[], printer: LengthPrinter): string {
  const texts = [...new Set(radiiOf(wood).map(printer.length))]
  return texts.length === 0 ? 'see DXF' : `R ${texts.join(' / ')}`
}
