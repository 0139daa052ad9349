import { COMMON_PRACTICE_MILL } from '@shared/section'
import type { MillCard } from '@shared/contracts'

/** A card while it is being typed: a number not entered yet is null. Lengths mm, angles degrees, feed mm a minute. */
export interface EnteredCard {
  maxWidth: number | null
  maxDepth: number | null
  wheelNose: number | null
  wheelWidth: number | null
  maxToothRatio: number | null
  clearanceAngle: number | null
  clearanceOver: number | null
  leastWood: number | null
  machiningAllowance: number | null
  cuttingDiameter: number | null
  hookAngle: number | null
  knives: number | null
  finishingKnives: number | null
  rpm: number | null
  maxRpm: number | null
  feed: number | null
  feedBy: 'mechanical' | 'manual'
  lengths: { length: number | null; price: string }[]
}

/** A new card begins with common practice where there is one; the head and the lengths are the mill's own to tell. */
export function enteredCardFrom(card: MillCard | undefined): EnteredCard {
  const limits = card ?? COMMON_PRACTICE_MILL
  const head = card?.head
  return {
    maxWidth: limits.maxWidth,
    maxDepth: limits.maxDepth,
    wheelNose: limits.wheelNose,
    wheelWidth: limits.wheelWidth,
    maxToothRatio: limits.maxToothRatio,
    clearanceAngle: limits.sideClearance.angle,
    clearanceOver: limits.sideClearance.over,
    leastWood: limits.leastWood,
    machiningAllowance: card?.machiningAllowance ?? null,
    cuttingDiameter: head?.cuttingDiameter ?? null,
    hookAngle: head?.hookAngle ?? null,
    knives: head?.knives ?? null,
    finishingKnives: head?.finishingKnives ?? 1,
    rpm: head?.rpm ?? null,
    maxRpm: head?.maxRpm ?? null,
    feed: head?.feed ?? null,
    feedBy: head?.feedBy ?? 'mechanical',
    lengths: card?.lengths.map(({ length, price }) => ({ length, price: price ?? '' })) ?? [
      { length: null, price: '' },
    ],
  }
}

/** The card as it is sent; undefined while a number is missing. */
export function cardFrom(entered: EnteredCard): MillCard | undefined {
  const { feedBy, lengths, ...numbers } = entered
  const isWhole = (given: typeof numbers): given is { [Name in keyof typeof numbers]: number } =>
    Object.values(given).every((value) => value !== null)
  if (!isWhole(numbers)) return undefined
  const sizes = lengths.flatMap(({ length, price }) =>
    length === null ? [] : [{ length, price: price.trim() === '' ? null : price.trim() }],
  )
  if (sizes.length === 0 || sizes.length < lengths.length) return undefined
  return {
    maxWidth: numbers.maxWidth,
    maxDepth: numbers.maxDepth,
    wheelNose: numbers.wheelNose,
    wheelWidth: numbers.wheelWidth,
    maxToothRatio: numbers.maxToothRatio,
    sideClearance: { angle: numbers.clearanceAngle, over: numbers.clearanceOver },
    leastWood: numbers.leastWood,
    machiningAllowance: numbers.machiningAllowance,
    head: {
      cuttingDiameter: numbers.cuttingDiameter,
      hookAngle: numbers.hookAngle,
      knives: numbers.knives,
      finishingKnives: numbers.finishingKnives,
      rpm: numbers.rpm,
      maxRpm: numbers.maxRpm,
      feed: numbers.feed,
      feedBy,
    },
    lengths: sizes,
  }
}
