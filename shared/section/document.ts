/**
 * The section as people make it: members from the sight edge outward, never segments. Lengths mm, angles degrees
 * (the commission file's short names are kept here, since this is the very document that is hashed).
 */

/** Why a dimension is what it is. plusMinus is one standard deviation, mm. */
export type Basis =
  | { readonly kind: 'measured'; readonly plusMinus: number; readonly photograph?: string }
  | { readonly kind: 'precedent'; readonly citation: string }
  | { readonly kind: 'judged'; readonly note: string }

export interface MemberBasis {
  readonly width?: Basis
  readonly rise?: Basis
}

/** What every member has: a width along x (mm, ≥ 0), a rise along y (mm, signed) and why they are what they are. */
interface MemberCommon {
  readonly width: number
  readonly rise: number
  readonly basis?: MemberBasis
}

export type Fillet = MemberCommon & { readonly kind: 'fillet' }
export type Splay = MemberCommon & { readonly kind: 'splay' }
/** arc: the angle subtended, degrees; absent = the default of its kind. */
export type Cavetto = MemberCommon & { readonly kind: 'cavetto'; readonly arc?: number }
export type Ovolo = MemberCommon & { readonly kind: 'ovolo'; readonly arc?: number }
export type Thumb = MemberCommon & { readonly kind: 'thumb'; readonly hollow?: boolean }
/** arc: the angle each of the two arcs subtends, degrees. */
export type CymaRecta = MemberCommon & { readonly kind: 'cyma-recta'; readonly arc?: number }
export type CymaReversa = MemberCommon & { readonly kind: 'cyma-reversa'; readonly arc?: number }
export type Scotia = MemberCommon & { readonly kind: 'scotia' }
export type Torus = MemberCommon & { readonly kind: 'torus' }
export type Bead = MemberCommon & { readonly kind: 'bead' }
export type Reeds = MemberCommon & { readonly kind: 'reeds'; readonly count: number; readonly fillet: number }
export type Flutes = MemberCommon & {
  readonly kind: 'flutes'
  readonly count: number
  readonly fillet: number
  readonly depth: number
}
export type Quirk = MemberCommon & {
  readonly kind: 'quirk'
  readonly depth: number
  readonly shape: 'square' | 'v'
}
/** Cubics as control, control, end, relative to the member's start, mm; corners: joints (1 = end of the first cubic) meant to be arrises. */
export type Free = MemberCommon & {
  readonly kind: 'free'
  readonly curves: readonly FreeCurve[]
  readonly corners?: readonly number[]
}
export type Pair = readonly [number, number]
export type FreeCurve = readonly [Pair, Pair, Pair]

export type Member =
  | Fillet
  | Splay
  | Cavetto
  | Ovolo
  | Thumb
  | CymaRecta
  | CymaReversa
  | Scotia
  | Torus
  | Bead
  | Reeds
  | Flutes
  | Quirk
  | Free

export type MemberKind = Member['kind']

/** A thickness of gesso over a stretch of the face, from one break to another (numbers, from < to). */
export interface GessoStretch {
  readonly from: number
  readonly to: number
  readonly thickness: number
}

/** The section of the commission file: what an issue freezes. */
export interface Section {
  readonly sightEdgeHeight: number
  readonly rebate: { readonly width: number; readonly depth: number }
  readonly backSplay: { readonly x: number; readonly height: number }
  readonly gesso: number | readonly GessoStretch[]
  readonly tolerance: number
  readonly members: readonly Member[]
  readonly basis?: { readonly sightEdgeHeight?: Basis }
}

/** The break at the sight edge has this key; every other break has the key of the member that ends there. */
export const SIGHT_EDGE_KEY = 'sight-edge'

/** A member of a draft: with a stable key, which remarks, readings and zones hold on to when members move. */
export type DraftMember = Member & { readonly key: string }

/** As GessoStretch, but held by break keys. */
export interface DraftGessoStretch {
  readonly from: string
  readonly to: string
  readonly thickness: number
}

/** A section being drawn: as Section, members and stretches held by keys. */
export interface DraftSection extends Omit<Section, 'members' | 'gesso'> {
  readonly gesso: number | readonly DraftGessoStretch[]
  readonly members: readonly DraftMember[]
}
