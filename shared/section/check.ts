import type { Vocabulary } from '@shared/units'
import type { Point } from '@shared/geometry'

/** The closed list; clamp and speed need the knife and its head, and are checked with these. */
export type CheckCode =
  | 'undercut'
  | 'steep-wall'
  | 'wheel-nose'
  | 'wheel-width'
  | 'tooth'
  | 'head-width'
  | 'head-depth'
  | 'least-wood'
  | 'feather'
  | 'stack'
  | 'clamp'
  | 'speed'

/** stop bars the knife order; ok is for the screen alone. */
export type CheckSeverity = 'stop' | 'warn' | 'note' | 'ok'

/** What was found, against what limit, where on the wood section (mm), in words, and what would cure it. Lengths mm, angles degrees. */
export interface Check {
  readonly code: CheckCode
  readonly severity: CheckSeverity
  readonly value: number
  readonly limit: number
  readonly at: readonly [number, number]
  readonly says: string
  readonly cure?: string
}

/** What a mill can do, from its card: lengths mm, the clearance's angle degrees from upright. */
export interface MillLimits {
  readonly maxWidth: number
  readonly maxDepth: number
  /** Radius of the grinding wheel's nose. */
  readonly wheelNose: number
  readonly wheelWidth: number
  /** Depth of a tooth of the knife to its width. */
  readonly maxToothRatio: number
  /** Walls nearer to upright than the angle burn where they are higher than `over`. */
  readonly sideClearance: { readonly angle: number; readonly over: number }
  readonly leastWood: number
}

/** Limits where the mill's card is silent: common practice, ask the mill. */
export const COMMON_PRACTICE_MILL: MillLimits = {
  maxWidth: 230,
  maxDepth: 45,
  wheelNose: 0.8,
  wheelWidth: 2.5,
  maxToothRatio: 2.5,
  sideClearance: { angle: 3, over: 3 },
  leastWood: 5,
}

/** Degrees. Edges sharper than this crumble in the machine: common practice, ask the mill. */
export const FEATHER_EDGE_DEG = 30

/** What must find room in the rebate, front to back, mm; a part that is absent is not checked. */
export interface RebateStack {
  readonly lining?: number | undefined
  readonly glazing?: number | undefined
  readonly airGap?: number | undefined
  readonly thickness?: number | undefined
  readonly backing?: number | undefined
  readonly fixings?: number | undefined
}

export interface CheckOptions {
  readonly mill?: { readonly [Limit in keyof MillLimits]?: MillLimits[Limit] | undefined }
  readonly head?: { readonly cuttingDiameter: number }
  readonly stack?: RebateStack
  readonly vocabulary?: Vocabulary
}

/** A limit and what to say of where it comes from. */
export interface Limit<Value> {
  readonly value: Value
  readonly source: string
}

export function limitOf<Key extends keyof MillLimits>(
  { mill }: CheckOptions,
  key: Key,
): Limit<MillLimits[Key]> {
  const own = mill?.[key]
  return own === undefined
    ? { value: COMMON_PRACTICE_MILL[key], source: ' (common practice, ask the mill)' }
    : { value: own as MillLimits[Key], source: '' }
}

export const placeOf = ({ x, y }: Point): readonly [number, number] => [x, y]
