import { expect } from 'vitest'
import type { CutInstance, CutPlan, DemandedRail, OpenedLength, PlannedCut } from '@shared/cutting'

/**
 * Whether a plan can be cut and says the truth, from the definitions alone: it shares nothing with the planner but the types. Lengths are
 * compared to 2 nm, since the planner works in whole nanometres and answers in doubles.
 */

const WITHIN_MM = 2e-6

/** Fails with every fault that the plan has. */
export function checkPlan(instance: CutInstance, plan: CutPlan): void {
  expect(planFaults(instance, plan)).toEqual([])
}

export function planFaults(instance: CutInstance, plan: CutPlan): string[] {
  return [
    ...railFaults(instance, plan),
    ...plan.opened.flatMap((piece) => pieceFaults(instance, piece)),
    ...availabilityFaults(instance, plan),
    ...figureFaults(instance, plan),
    ...orderFaults(instance, plan),
    ...warningFaults(instance, plan),
  ]
}

const unless = (isKept: boolean, says: string): string[] => (isKept ? [] : [says])

/** Every rail that is wanted is cut once, as it was asked for, and nothing else. */
function railFaults({ demand }: CutInstance, { opened }: CutPlan): string[] {
  const wanted = demand.flatMap(({ id, count }) =>
    Array.from({ length: count }, (_, copy) => `${id} ${copy + 1}`),
  )
  const cuts = opened.flatMap((piece) => piece.cuts)
  const names = cuts.map(({ id, copy }) => `${id} ${copy}`)
  const asked = new Map(demand.map((rail) => [rail.id, rail]))
  return [
    ...unless(
      [...names].sort().join() === [...wanted].sort().join(),
      `cut ${names.join()} for ${wanted.join()}`,
    ),
    ...cuts.flatMap((cut) =>
      unless(isAsAsked(cut, asked.get(cut.id)), `${cut.id} is not as it was asked for`),
    ),
  ]
}

const isAsAsked = (cut: PlannedCut, rail: DemandedRail | undefined) =>
  rail !== undefined &&
  cut.length === rail.length &&
  cut.mitre === rail.mitre &&
  cut.frame === rail.frame &&
  cut.side === rail.side

const kerfAt = (mitre: number, { saw }: CutInstance) =>
  saw.handling === 'square-rough' ? saw.kerf : saw.kerf / Math.cos((mitre * Math.PI) / 180)

/** What a rail takes of the piece, before any kerf. */
const takenBy = (cut: PlannedCut, { saw }: CutInstance) =>
  cut.length + (saw.handling === 'square-rough' ? saw.margin : 0)

/** Between two neighbours: the larger kerf, and where they are mitred on the length the margin. */
const gapBetween = (a: PlannedCut, b: PlannedCut, instance: CutInstance) =>
  Math.max(kerfAt(a.mitre, instance), kerfAt(b.mitre, instance)) +
  (instance.saw.handling === 'square-rough' ? 0 : instance.saw.margin)

function pieceFaults(instance: CutInstance, piece: OpenedLength): string[] {
  const { cuts, from, length, offcut } = piece
  const [first, last] = [cuts[0], cuts.at(-1)]
  if (first === undefined || last === undefined) return [`${from} is opened for nothing`]
  const [startTrim, endTrim] = trimsOf(instance, piece)
  const end = last.at + takenBy(last, instance)
  const left = Math.max(0, length - end - kerfAt(last.mitre, instance))
  return [
    ...unless(piece.trims.join() === `${startTrim},${endTrim}`, `${from}: trims ${piece.trims.join()}`),
    ...unless(first.at >= startTrim - WITHIN_MM, `${from}: the first rail lies in the start trim`),
    ...cuts.slice(1).flatMap((cut, index) => {
      const before = cuts[index]!
      const free = before.at + takenBy(before, instance) + gapBetween(before, cut, instance)
      return unless(cut.at >= free - WITHIN_MM, `${from}: ${cut.id} starts at ${cut.at}, before ${free}`)
    }),
    ...unless(end <= length - endTrim + WITHIN_MM, `${from}: the last rail ends at ${end}`),
    ...unless(Math.abs(offcut - left) <= WITHIN_MM, `${from}: offcut ${offcut}, not ${left}`),
    ...unless(
      piece.isOffcutUsable === (offcut > 0 && offcut >= instance.saw.smallestUsableOffcut),
      `${from}: its offcut of ${offcut} is wrongly called usable or not`,
    ),
  ]
}

function trimsOf({ rack, saw }: CutInstance, { source, from }: OpenedLength): readonly [number, number] {
  const own = source === 'rack' ? rack.find(({ id }) => id === from)?.endTrim : undefined
  return own ?? [saw.endTrim, saw.endTrim]
}

/** Rack pieces are those of the rack and each is cut once; ordered lengths are sold, and no more of each than there are. */
function availabilityFaults({ rack, lengths }: CutInstance, { opened }: CutPlan): string[] {
  const ofRack = opened.filter(({ source }) => source === 'rack')
  const ordered = opened.filter(({ source }) => source === 'order')
  return [
    ...unless(new Set(ofRack.map(({ from }) => from)).size === ofRack.length, 'a rack piece is cut twice'),
    ...ofRack.flatMap(({ from, length }) =>
      unless(
        rack.some((piece) => piece.id === from && piece.length === length),
        `${from} is not on the rack`,
      ),
    ),
    ...ordered.flatMap(({ from, length }) =>
      unless(
        from === String(length) && lengths.some((sold) => sold.length === length),
        `${from} is not sold`,
      ),
    ),
    ...lengths.flatMap(({ length }) => {
      const taken = ordered.filter((piece) => piece.length === length).length
      return unless(taken <= mostOf(length, lengths), `${taken} of ${length} are opened`)
    }),
  ]
}

const mostOf = (length: number, lengths: CutInstance['lengths']) =>
  lengths
    .filter((sold) => sold.length === length)
    .reduce((sum, { count }) => sum + (count ?? Number.POSITIVE_INFINITY), 0)

/** A decimal text in ten-thousandths, exactly. */
function moneyOf(text: string): bigint {
  const [units = '0', places = ''] = text.split('.')
  return BigInt(units + places.padEnd(4, '0'))
}

function figureFaults(instance: CutInstance, plan: CutPlan): string[] {
  const { lengths, rack } = instance
  const faults = unless(plan.count === plan.opened.length, `count ${plan.count} of ${plan.opened.length}`)
  if (lengths.some(({ price }) => price !== undefined)) return [...faults, ...costFaults(instance, plan)]
  const isOneLength = lengths.length === 1 && rack.length === 0
  const value = isOneLength ? plan.count : plan.opened.reduce((sum, { length }) => sum + length, 0)
  const bound = Number(plan.bound)
  return [
    ...faults,
    ...unless(plan.cost === null && typeof plan.bound === 'number', 'a cost without prices'),
    ...unless(bound <= value + WITHIN_MM * plan.count, `the bound ${bound} lies above ${value}`),
    ...unless(
      !plan.proven || Math.abs(bound - value) <= WITHIN_MM * plan.count,
      'proven, but the bound is not met',
    ),
  ]
}

function costFaults({ lengths }: CutInstance, plan: CutPlan): string[] {
  if (plan.cost === null || typeof plan.bound !== 'string') return ['no cost in spite of prices']
  const ordered = plan.opened.filter(({ source }) => source === 'order')
  const sizes = new Set(ordered.map(({ length }) => length))
  const cost = [...sizes].reduce((sum, size) => {
    const offers = lengths
      .filter(({ length }) => length === size)
      .sort((a, b) => Number(a.price) - Number(b.price))
    return sum + cheapestOf(offers, ordered.filter(({ length }) => length === size).length)
  }, 0n)
  return [
    ...unless(moneyOf(plan.cost) === cost, `the cost is ${cost} ten-thousandths, not ${plan.cost}`),
    ...unless(moneyOf(plan.bound) <= cost, `the bound ${plan.bound} lies above the cost`),
    ...unless(!plan.proven || moneyOf(plan.bound) === cost, 'proven, but the bound is not met'),
  ]
}

/** So many of one size from the cheapest offers of it. */
function cheapestOf(offers: CutInstance['lengths'], count: number): bigint {
  let left = count
  return offers.reduce((sum, { price = '0', count: most = left }) => {
    const taken = Math.min(left, most)
    left -= taken
    return sum + BigInt(taken) * moneyOf(price)
  }, 0n)
}

/** The plan's lengths, further ones that take what set-up pieces and first-off find no room for, and the reserve. */
function orderFaults(instance: CutInstance, { opened, toOrder, warnings }: CutPlan): string[] {
  const ordered = opened.filter(({ source }) => source === 'order')
  const total = toOrder.reduce((sum, { count }) => sum + count, 0)
  const sizes = toOrder.map(({ length }) => length)
  const faults = [
    ...unless(new Set(sizes).size === sizes.length, 'a size is listed twice'),
    ...toOrder.flatMap(({ length, count }) =>
      unless(count >= 1 && count <= mostOf(length, instance.lengths), `${count} of ${length} to order`),
    ),
    ...ordered.flatMap(({ length }) => {
      const planned = ordered.filter((piece) => piece.length === length).length
      const got = toOrder.find((each) => each.length === length)?.count ?? 0
      return unless(got >= planned, `${got} of ${length} to order for ${planned} planned`)
    }),
  ]
  if (ordered.length === 0)
    return [...faults, ...unless(total === 0, 'lengths are ordered though none is opened')]
  const areShort = warnings.some((text) => text.includes('set-up pieces') || text.includes('reserve'))
  return areShort ? faults : [...faults, ...extraFaults(instance, ordered, total)]
}

function extraFaults(instance: CutInstance, ordered: readonly OpenedLength[], total: number): string[] {
  const { setupPieces = 0, firstOff = 0, reserve = 0 } = instance.order ?? {}
  const wanted = firstOff > 0 ? setupPieces + 1 : 0
  const onOffcuts = ordered.reduce((sum, piece) => sum + squarePiecesBehind(instance, piece, firstOff), 0)
  const missing = Math.max(0, wanted - (firstOff > 0 ? onOffcuts : 0))
  const perLength = (length: number) => squarePiecesOn(instance, length - 2 * instance.saw.endTrim, firstOff)
  const [most, least] = [Math.max, Math.min].map((pick) =>
    pick(...instance.lengths.map(({ length }) => perLength(length)).filter((count) => count > 0)),
  )
  const fewest = missing === 0 ? 0 : Math.ceil(missing / (most ?? 1))
  const greatest = missing === 0 ? 0 : Math.ceil(missing / (least ?? 1))
  const withReserve = (lengths: number) => lengths + Math.ceil(reserve * lengths - 1e-9)
  return unless(
    total >= withReserve(ordered.length + fewest) && total <= withReserve(ordered.length + greatest),
    `${total} to order for ${ordered.length} opened, ${missing} further pieces and a reserve of ${reserve}`,
  )
}

/** Square pieces that fit behind the last rail. */
function squarePiecesBehind(instance: CutInstance, piece: OpenedLength, firstOff: number): number {
  const last = piece.cuts.at(-1)!
  const { saw } = instance
  const gap = kerfAt(last.mitre, instance) + (saw.handling === 'square-rough' ? 0 : saw.margin)
  const room = piece.length - trimsOf(instance, piece)[1] - last.at - takenBy(last, instance) - gap
  return squarePiecesOn(instance, room, firstOff)
}

function squarePiecesOn({ saw }: CutInstance, room: number, firstOff: number): number {
  const body = firstOff + (saw.handling === 'square-rough' ? saw.margin : 0)
  const gap = saw.kerf + (saw.handling === 'square-rough' ? 0 : saw.margin)
  return Math.max(0, Math.floor((room + gap + WITHIN_MM) / (body + gap)))
}

const warningFaults = ({ demand, saw }: CutInstance, { warnings }: CutPlan): string[] =>
  demand.flatMap(({ id, length }) => {
    const isWarned = warnings.some((text) => text.startsWith(`Rail ${id} is `))
    return unless(isWarned === length < saw.shortestSafe, `${id} of ${length} mm: warned ${isWarned}`)
  })
