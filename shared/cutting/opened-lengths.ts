import { mmFromNanometres, nanometresFrom, nanometresUp } from '@shared/units'
import type { CutInstance, DemandedRail, OpenedLength, PlannedCut } from './cut-instance'
import type { OrderedPiece } from './cutting-order'
import { offcutOf } from './offcut-choice'
import type { Stock, StockModel } from './stock-model'

const mmOf = (nanometres: number) => mmFromNanometres(nanometresFrom(nanometres))

/** A rail that is still to be given its place: which of the demand, and which of its copies. */
interface Waiting {
  readonly rail: DemandedRail
  readonly copy: number
}

/**
 * Gives every cut its rail and its place. Equal rails are interchangeable, so each piece first takes those of frames that are on it
 * already, then of frames already begun: a frame comes from few lengths and opposite rails lie together where the plan allows it.
 */
export function openedLengthsOf(
  instance: CutInstance,
  model: StockModel,
  pieces: readonly OrderedPiece[],
): OpenedLength[] {
  const waiting = model.kinds.map(({ rails }) => rails.flatMap((index) => copiesOf(instance.demand[index]!)))
  const begun = new Set<string>()
  const opened = model.stocks.map(() => 0)
  return pieces.map(({ stock, kinds }) => {
    const here = new Set<string>()
    const rails = kinds.map((kind) => takeNext(waiting[kind]!, here, begun))
    const nth = opened[stock]!
    opened[stock] = nth + 1
    return openedLength(instance, model, { stock, kinds }, { rails, nth })
  })
}

const copiesOf = (rail: DemandedRail): Waiting[] =>
  Array.from({ length: rail.count }, (_, index) => ({ rail, copy: index + 1 }))

/** Rails of one frame: the same frame and the same copy of it. Rails without a frame belong to none. */
const frameOf = ({ rail, copy }: Waiting) => (rail.frame === undefined ? undefined : `${copy}/${rail.frame}`)

function takeNext(waiting: Waiting[], here: Set<string>, begun: Set<string>): Waiting {
  const isIn = (frames: Set<string>) => (one: Waiting) => frames.has(frameOf(one) ?? '')
  const index = Math.max(
    0,
    [here, begun].map((frames) => waiting.findIndex(isIn(frames))).find((at) => at >= 0) ?? 0,
  )
  const [next] = waiting.splice(index, 1)
  if (next === undefined) throw new TypeError('a plan cuts more rails of a kind than are wanted')
  const frame = frameOf(next)
  if (frame !== undefined) {
    here.add(frame)
    begun.add(frame)
  }
  return next
}

function openedLength(
  instance: CutInstance,
  model: StockModel,
  { stock: index, kinds }: OrderedPiece,
  { rails, nth }: { readonly rails: readonly Waiting[]; readonly nth: number },
): OpenedLength {
  const stock = model.stocks[index]!
  const offcut = offcutOf(model, {
    stock: index,
    counts: model.kinds.map((_, kind) => kinds.filter((one) => one === kind).length),
  })
  const isUsable = offcut > 0 && offcut >= nanometresUp(instance.saw.smallestUsableOffcut)
  return {
    ...identityOf(instance, stock, nth),
    cuts: cutsOf(model, stock, kinds, rails),
    offcut: mmOf(offcut),
    isOffcutUsable: isUsable,
  }
}

function identityOf(
  { lengths, rack, saw }: CutInstance,
  { source, members }: Stock,
  nth: number,
): Pick<OpenedLength, 'from' | 'source' | 'length' | 'trims'> {
  if (source === 'order') {
    const { length } = lengths[members[0]!]!
    return { from: String(length), source, length, trims: [saw.endTrim, saw.endTrim] }
  }
  const { id, length, endTrim } = rack[members[nth]!]!
  return { from: id, source, length, trims: endTrim ?? [saw.endTrim, saw.endTrim] }
}

function cutsOf(
  model: StockModel,
  { startTrim }: Stock,
  kinds: readonly number[],
  rails: readonly Waiting[],
): PlannedCut[] {
  let at = startTrim
  return kinds.map((index, place) => {
    const { rail, copy } = rails[place]!
    const { id, length, mitre, frame, side } = rail
    const kind = model.kinds[index]!
    const next = kinds[place + 1]
    const cut = {
      id,
      copy,
      length,
      mitre,
      ...(frame === undefined ? {} : { frame }),
      ...(side === undefined ? {} : { side }),
      at: mmOf(at),
    }
    at += kind.body + (next === undefined ? 0 : Math.max(kind.gap, model.kinds[next]!.gap))
    return cut
  })
}
