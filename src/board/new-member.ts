import type { Free, Member, MemberKind } from '@shared/section'

/** The fourteen kinds, in the order in which they are offered. */
export const MEMBER_KINDS = [
  'fillet',
  'splay',
  'cavetto',
  'ovolo',
  'thumb',
  'cyma-recta',
  'cyma-reversa',
  'scotia',
  'torus',
  'bead',
  'reeds',
  'flutes',
  'quirk',
  'free',
] as const satisfies readonly MemberKind[]

/**
 * A member of each kind to begin with, in sound proportions, `size` mm wide (a fillet half of it, a quirk a third). It rises, unless it is to
 * fall or its kind is level.
 */
export function newMemberOf(kind: MemberKind, size: number, sense: 1 | -1 = 1): Member {
  const rise = sense * size
  switch (kind) {
    case 'fillet':
      return { kind, width: size / 2, rise: 0 }
    case 'splay':
      return { kind, width: size, rise: rise / 2 }
    case 'cavetto':
    case 'ovolo':
      return { kind, width: size, rise }
    case 'thumb':
      return { kind, width: size, rise: rise / 2 }
    case 'cyma-recta':
    case 'cyma-reversa':
      return { kind, width: size * 1.5, rise }
    case 'scotia':
    case 'torus':
    case 'bead':
      return { kind, width: size, rise: 0 }
    case 'reeds':
      return { kind, width: size * 1.5, rise: 0, count: 3, fillet: 0 }
    case 'flutes':
      return { kind, width: size * 1.5, rise: 0, count: 3, fillet: size / 16, depth: size / 8 }
    case 'quirk':
      return { kind, width: size / 4, rise: 0, depth: size / 4, shape: 'square' }
    case 'free':
      return freeMember(size * 1.5, rise)
  }
}

/** One easy wave from end to end, level at both. */
function freeMember(width: number, rise: number): Free {
  return {
    kind: 'free',
    width,
    rise,
    curves: [
      [
        [width * 0.45, 0],
        [width * 0.55, rise],
        [width, rise],
      ],
    ],
  }
}

/** The same place under another kind: ends and basis are kept as far as the kind can have them, everything else begins anew. */
export function asKind(member: Member, kind: MemberKind): Member {
  const { width, rise, basis } = member
  const fresh = newMemberOf(kind, Math.max(width, Math.abs(rise), 1))
  const ends = endsFor(kind, width, rise)
  const based = basis === undefined ? {} : { basis }
  if (fresh.kind === 'free') return { ...freeMember(ends.width, ends.rise), ...based }
  const grown = { ...fresh, ...ends, ...based }
  if (grown.kind === 'flutes') return { ...grown, fillet: 0, depth: ends.width / grown.count / 6 }
  return grown.kind === 'quirk' ? { ...grown, depth: ends.width } : grown
}

function endsFor(
  kind: MemberKind,
  width: number,
  rise: number,
): { readonly width: number; readonly rise: number } {
  switch (kind) {
    case 'fillet':
      return width >= Math.abs(rise) ? { width, rise: 0 } : { width: 0, rise }
    case 'bead':
    case 'reeds':
    case 'flutes':
    case 'quirk':
      return { width: width === 0 ? Math.abs(rise) : width, rise: 0 }
    case 'scotia':
    case 'torus':
      return Math.abs(rise) < width
        ? { width, rise }
        : { width: width === 0 ? Math.abs(rise) : width, rise: 0 }
    default:
      return slanted(width, rise)
  }
}

/** Both parts of a slanting member have a length. */
function slanted(width: number, rise: number): { readonly width: number; readonly rise: number } {
  const length = Math.max(width, Math.abs(rise), 1)
  return { width: width === 0 ? length / 2 : width, rise: rise === 0 ? length / 2 : rise }
}
