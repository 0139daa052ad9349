import { Failure } from '@shared/failure'
import type { Fault } from '@shared/failure'

/** Leaves in a book: common practice, single suppliers may pack otherwise. */
export const LEAVES_PER_BOOK = 25

/** A count that lies above a whole number by less than this part is binary rounding, not another leaf. */
const ROUNDING = 1e-9

export interface GildedStretch {
  /** Arc length of the stretch across the finished face, mm. */
  readonly girthMm: number
  /** Sum of all rails' lengths at the stretch's own arc-length centroid, mm, so that girth × length is its area exactly. */
  readonly totalRailLengthMm: number
}

export interface Leaf {
  /** Side of the square leaf, mm. */
  readonly leafMm: number
  /** How far each leaf lies over the one before, mm. */
  readonly lapMm: number
  /** Double laying and faulting, as a share added: 0.15 = 15 % more leaves. */
  readonly waste: number
}

export interface LeafPlan {
  readonly rows: number
  readonly leaves: number
  readonly books: number
}

/** Area of a gilded stretch, mm²: girth × total rail length at its centroid (Pappus, mitred corners included). */
export function gildedAreaOf({ girthMm, totalRailLengthMm }: GildedStretch): number {
  return girthMm * totalRailLengthMm
}

/**
 * Leaves for a stretch: rows across it (girth ÷ (leaf − lap), rounded up) × rail length ÷ (leaf − lap), the waste added,
 * rounded up to whole leaves and whole books of 25. A lap as wide as the leaf is Failure 'input-invalid'.
 */
export function leafPlanFor(stretch: GildedStretch, leaf: Leaf): LeafPlan {
  refuseFaults([...stretchFaults(stretch), ...leafFaults(leaf)])
  const stepMm = leaf.leafMm - leaf.lapMm
  const rows = wholeUp(stretch.girthMm / stepMm)
  const leaves = wholeUp(((rows * stretch.totalRailLengthMm) / stepMm) * (1 + leaf.waste))
  return { rows, leaves, books: Math.ceil(leaves / LEAVES_PER_BOOK) }
}

/** The least whole number not below a count, forgiving the last digits of a binary quotient. */
const wholeUp = (count: number) => Math.max(0, Math.ceil(count - ROUNDING * Math.max(1, count)))

const stretchFaults = ({ girthMm, totalRailLengthMm }: GildedStretch): Fault[] => [
  ...faultUnless(isLength(girthMm), '/girth', `The girth is ${girthMm} mm; it must be 0 mm or more.`),
  ...faultUnless(
    isLength(totalRailLengthMm),
    '/railLength',
    `The rail length is ${totalRailLengthMm} mm; it must be 0 mm or more.`,
  ),
]

const leafFaults = ({ leafMm, lapMm, waste }: Leaf): Fault[] => [
  ...faultUnless(
    isLength(leafMm) && leafMm > 0,
    '/leaf',
    `The leaf is ${leafMm} mm; it must be more than 0 mm.`,
  ),
  ...faultUnless(
    isLength(lapMm) && lapMm < leafMm,
    '/lap',
    `The lap is ${lapMm} mm; it must be 0 mm or more and less than the leaf, ${leafMm} mm.`,
  ),
  ...faultUnless(
    isLength(waste),
    '/waste',
    `The waste is ${waste}; it must be 0 or more, such as 0.15 for 15 %.`,
  ),
]

const isLength = (value: number) => Number.isFinite(value) && value >= 0

const faultUnless = (isFine: boolean, path: string, says: string): Fault[] =>
  isFine ? [] : [{ path, code: 'out-of-range', says }]

function refuseFaults(faults: readonly Fault[]): void {
  if (faults.length === 0) return
  throw new Failure('input-invalid', { says: faults.map(({ says }) => says).join(' '), faults })
}
