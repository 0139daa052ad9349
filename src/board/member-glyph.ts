import { boundsOf, lineFrom } from '@shared/geometry'
import type { Path, Point } from '@shared/geometry'
import { memberEndOf, memberSegments } from '@shared/section'
import type { Member, MemberKind } from '@shared/section'
import { svgPathOf } from './curve-drawing'
import { newMemberOf } from './new-member'

/** A small drawing of a kind: its face, and the wood under it, as the `d` of SVG paths within a view box. */
export interface MemberGlyph {
  readonly face: string
  readonly wood: string
  readonly viewBox: string
}

/** Of the drawing, units of the view box. */
const WIDTH = 34
const HEIGHT = 22
const MOST_WIDE = 28
const LEAST_WOOD = 4

const fillet = (width: number): Member => ({ kind: 'fillet', width, rise: 0 })

/** The kind by itself where that tells it, else with what it stands between. */
function membersFor(kind: MemberKind): readonly Member[] {
  switch (kind) {
    case 'scotia':
      return [{ kind, width: 16, rise: 5 }]
    case 'torus':
      return [{ kind, width: 14, rise: 4 }]
    case 'bead':
      return [fillet(4), { kind, width: 10, rise: 0 }, fillet(4)]
    case 'quirk':
      return [fillet(7), { kind, width: 4, rise: 0, depth: 7, shape: 'square' }, fillet(7)]
    case 'flutes':
      return [{ kind, width: 22, rise: 0, count: 3, fillet: 1, depth: 3 }]
    case 'splay':
      return [{ kind, width: 18, rise: 9 }]
    case 'fillet':
      return [fillet(18)]
    default:
      return [newMemberOf(kind, 12)]
  }
}

/** Drawn from the very segments that the section is made of. */
export function memberGlyphOf(kind: MemberKind): MemberGlyph {
  const path: Path[number][] = []
  let at: Point = { x: 0, y: 0 }
  for (const member of membersFor(kind)) {
    path.push(...memberSegments(member, at))
    at = memberEndOf(member, at)
  }
  const { min, max } = boundsOf(path)
  const base = min.y - LEAST_WOOD
  const wood = [
    ...path,
    lineFrom(at, { x: at.x, y: base }),
    lineFrom({ x: at.x, y: base }, { x: 0, y: base }),
    lineFrom({ x: 0, y: base }, { x: 0, y: 0 }),
  ]
  const scale = Math.min(MOST_WIDE / (max.x - min.x), (HEIGHT - 3) / (max.y - base))
  const left = -(WIDTH - (max.x - min.x) * scale) / 2 + min.x * scale
  const top = -base * scale - HEIGHT + 1
  return {
    face: svgPathOf(path, scale),
    wood: `${svgPathOf(wood, scale)}Z`,
    viewBox: [left, top, WIDTH, HEIGHT].map((value) => value.toFixed(2)).join(' '),
  }
}
