import { Failure } from '@shared/failure'
import { nanometresDown, nanometresUp } from '@shared/units'
import type { CutInstance, DemandedRail, OrderableLength, RackPiece, SawSettings } from './cut-instance'
import { decimalScaleOf, wholeFromDecimal } from './decimal'
import type { DecimalScale } from './decimal'

/**
 * The instance in whole nanometres. Rails that take the same length and the same gap are one kind. Rails of kinds k on one piece fit if
 * Σ body + Σ gap − least gap ≤ usable: each pair of neighbours is parted by the larger of their gaps, which adds up to least when the
 * rails stand in the order of their gaps, and then to every gap but the least.
 */
export interface RailKind {
  /** Long point, and with rough cutting the margin, nm. */
  readonly body: number
  /** To a neighbour of its own kind, nm. */
  readonly gap: number
  /** body + gap, nm. */
  readonly span: number
  /** Kerf along the back edge, nm: what the last cut on a piece takes. */
  readonly kerf: number
  readonly demand: number
  /** The demand's rails of this kind, by index. */
  readonly rails: readonly number[]
}

export interface Stock {
  readonly source: 'rack' | 'order'
  /** Indexes in the instance's rack or lengths; equal rack pieces are one stock. */
  readonly members: readonly number[]
  readonly length: number
  readonly startTrim: number
  /** Between the trims, nm. */
  readonly usable: number
  /** The first objective: price, or length, in whole units of their greatest common divisor. */
  readonly value: number
  /** First objective, pieces, and where nothing has a price pieces ordered, as one number: less is better. */
  readonly weight: number
  /** Pieces there are, never more than there are rails. */
  readonly limit: number
  /** There is enough for every rail to have its own. */
  readonly isUnlimited: boolean
}

/** What the first objective counts in. */
export type ObjectiveUnit =
  | { readonly kind: 'money'; readonly scale: DecimalScale; readonly step: number }
  | { readonly kind: 'length'; readonly step: number }
  | { readonly kind: 'pieces' }

export interface StockModel {
  /** Greatest span first. */
  readonly kinds: readonly RailKind[]
  /** Least usable first. */
  readonly stocks: readonly Stock[]
  readonly railCount: number
  readonly hasOneGap: boolean
  readonly unit: ObjectiveUnit
  /** Weights tell the number of pieces apart; false only where sums would be too large. */
  readonly countsPieces: boolean
}

/** Sums of weights stay far enough below 2⁵³ that bounds can be scaled up and stay exact. */
const GREATEST_SUM = 2 ** 48
const RAD_PER_DEGREE = Math.PI / 180

/** The instance's numbers must have been looked over before (refuseInstance). */
export function stockModelFrom(instance: CutInstance): StockModel {
  const kinds = kindsFrom(instance)
  const railCount = kinds.reduce((sum, { demand }) => sum + demand, 0)
  const pieces = [...rackStocks(instance), ...orderStocks(instance)]
  const { values, unit } = objectiveOf(instance, pieces)
  const { weights, countsPieces } = weightsOf(pieces, values, railCount, unit)
  const stocks = pieces.map((piece, index) => {
    const limit = Math.min(piece.available, railCount)
    return {
      ...piece,
      value: values[index]!,
      weight: weights[index]!,
      limit,
      isUnlimited: limit === railCount,
    }
  })
  return {
    kinds,
    stocks: stocks.filter(({ usable, limit }) => usable > 0 && limit > 0).sort(byUsable),
    railCount,
    hasOneGap: new Set(kinds.map(({ gap }) => gap)).size <= 1,
    unit,
    countsPieces,
  }
}

const byUsable = (a: Stock, b: Stock) => a.usable - b.usable || a.weight - b.weight

/** Body, gap and kerf of one rail on this saw, nm: lengths round up. */
export function takenBy({ length, mitre }: Pick<DemandedRail, 'length' | 'mitre'>, saw: SawSettings) {
  if (saw.handling === 'square-rough') {
    const gap = nanometresUp(saw.kerf)
    return { body: nanometresUp(length) + nanometresUp(saw.margin), gap, kerf: gap }
  }
  const kerfMm = saw.kerf / Math.cos(mitre * RAD_PER_DEGREE)
  return { body: nanometresUp(length), gap: nanometresUp(kerfMm + saw.margin), kerf: nanometresUp(kerfMm) }
}

function kindsFrom({ demand, saw }: CutInstance): RailKind[] {
  const kinds = new Map<string, RailKind>()
  demand.forEach((rail, index) => {
    const { body, gap, kerf } = takenBy(rail, saw)
    const key = `${body}/${gap}`
    const same = kinds.get(key)
    const rails = [...(same?.rails ?? []), index]
    kinds.set(key, { body, gap, kerf, span: body + gap, demand: (same?.demand ?? 0) + rail.count, rails })
  })
  return [...kinds.values()].sort((a, b) => b.span - a.span || b.gap - a.gap)
}

type Piece = Pick<Stock, 'source' | 'members' | 'length' | 'startTrim' | 'usable'> & {
  readonly available: number
  readonly lengthMm: number
}

function rackStocks({ rack, saw }: CutInstance): Piece[] {
  const pieces = new Map<string, Piece>()
  rack.forEach((piece, index) => {
    const measured = measuredPiece(piece, piece.endTrim ?? [saw.endTrim, saw.endTrim])
    const key = `${measured.length}/${measured.startTrim}/${measured.usable}`
    const members = [...(pieces.get(key)?.members ?? []), index]
    pieces.set(key, { ...measured, source: 'rack', members, available: members.length })
  })
  return [...pieces.values()]
}

const orderStocks = ({ lengths, saw }: CutInstance): Piece[] =>
  lengths.map((piece, index) => ({
    ...measuredPiece(piece, [saw.endTrim, saw.endTrim]),
    source: 'order',
    members: [index],
    available: piece.count ?? Number.POSITIVE_INFINITY,
  }))

function measuredPiece({ length }: RackPiece | OrderableLength, [start, end]: readonly [number, number]) {
  const whole = nanometresDown(length)
  const startTrim = nanometresUp(start)
  return { length: whole, lengthMm: length, startTrim, usable: whole - startTrim - nanometresUp(end) }
}

function objectiveOf(
  { lengths }: CutInstance,
  pieces: readonly Piece[],
): { readonly values: readonly number[]; readonly unit: ObjectiveUnit } {
  const prices = lengths.flatMap(({ price }) => (price === undefined ? [] : [price]))
  const isPriced = prices.length > 0
  const scale = decimalScaleOf(prices)
  const amounts = pieces.map(({ source, members, length }) => {
    if (!isPriced) return length
    return source === 'rack' ? 0 : wholeFromDecimal(lengths[members[0]!]?.price ?? '0', scale)
  })
  const step = Math.max(1, amounts.reduce(greatestCommonDivisor, 0))
  const values = amounts.map((amount) => amount / step)
  if (isPriced) return { values, unit: { kind: 'money', scale, step } }
  return {
    values,
    unit:
      pieces.length === 1 && pieces[0]?.source === 'order' ? { kind: 'pieces' } : { kind: 'length', step },
  }
}

/**
 * Weights compare like (value, pieces, pieces ordered) as long as no plan opens more pieces than there are rails, as none need. The later
 * places are given up, last first, where the sums would pass a safe integer; where even the first would, the numbers are refused.
 */
function weightsOf(
  pieces: readonly Piece[],
  values: readonly number[],
  railCount: number,
  unit: ObjectiveUnit,
): { readonly weights: readonly number[]; readonly countsPieces: boolean } {
  const places = railCount + 1
  const counted = values.map((value) => value * places + 1)
  const isRackFirst = unit.kind === 'length' && pieces.some(({ source }) => source === 'rack')
  const rackFirst = counted.map(
    (weight, index) => weight * places + (pieces[index]?.source === 'order' ? 1 : 0),
  )
  if (isRackFirst && isSafeSum(rackFirst, railCount))
    return { weights: lowered(rackFirst), countsPieces: true }
  if (isSafeSum(counted, railCount)) return { weights: lowered(counted), countsPieces: true }
  if (isSafeSum(values, railCount)) return { weights: lowered(values), countsPieces: false }
  throw new Failure('input-invalid', {
    says: 'The prices or lengths are too large to be added exactly; plan fewer rails at a time.',
  })
}

const isSafeSum = (weights: readonly number[], railCount: number) =>
  Math.max(0, ...weights) * railCount <= GREATEST_SUM

function lowered(weights: readonly number[]): number[] {
  const step = Math.max(1, weights.reduce(greatestCommonDivisor, 0))
  return weights.map((weight) => weight / step)
}

function greatestCommonDivisor(a: number, b: number): number {
  return b === 0 ? a : greatestCommonDivisor(b, a % b)
}
