import { assertNever } from '@shared/failure'
import { mmFromNanometres, nanometresFrom, nanometresUp, printLength } from '@shared/units'
import type { LengthUnit } from '@shared/units'
import type { CutInstance, CutPlan, PlanOptions, PlanOutcome } from './cut-instance'
import { cuttingOrderOf } from './cutting-order'
import { decimalFromWhole } from './decimal'
import { refuseInstance } from './instance-faults'
import { lengthsRunOut, railTooLong } from './no-plan'
import { withLongestOffcut } from './offcut-choice'
import { openedLengthsOf } from './opened-lengths'
import { valueOf } from './pattern'
import { solve } from './solve'
import type { Solved } from './solve'
import { stepCounterFrom } from './step-counter'
import type { StepCounter } from './step-counter'
import { stockModelFrom } from './stock-model'
import type { StockModel } from './stock-model'
import { toOrderOf } from './to-order'

/** Plans of more rails are left as they are found: a longer offcut is only sought in what a workshop cuts in a day. */
const OFFCUT_SOUGHT = 24

/**
 * Which rail comes from which length. Least cost (without prices the least length opened), then the fewest pieces, without prices then
 * pieces of the rack first; among such plans the longest usable offcut and few changes of the stop are sought, without proof. The same input gives
 * the same plan. Failure 'input-invalid' for numbers that cannot be planned with.
 */
export function planCuts(instance: CutInstance, options: PlanOptions = {}): PlanOutcome {
  refuseInstance(instance)
  const unit = options.unit ?? 'mm'
  const model = stockModelFrom(instance)
  if (model.railCount === 0) return { kind: 'planned', plan: emptyPlan(model) }
  const tooLong = railTooLong(instance, model, unit)
  if (tooLong !== undefined) return tooLong
  const counter = stepCounterFrom(options)
  const solved = solve(model, counter)
  if (solved.kind === 'unsolved') return lengthsRunOut({ instance, unit, isProven: solved.isProven }, counter)
  return { kind: 'planned', plan: planFrom({ instance, model, solved, counter, unit }) }
}

interface PlanParts {
  readonly instance: CutInstance
  readonly model: StockModel
  readonly solved: Extract<Solved, { kind: 'solved' }>
  readonly counter: StepCounter
  readonly unit: LengthUnit
}

function planFrom({ instance, model, solved, counter, unit }: PlanParts): CutPlan {
  const smallestUsable = nanometresUp(instance.saw.smallestUsableOffcut)
  const patterns =
    model.railCount <= OFFCUT_SOUGHT && model.countsPieces
      ? withLongestOffcut(solved.search, solved, smallestUsable)
      : solved.patterns
  const { toOrder, warnings } = toOrderOf({ instance, model, patterns, counter, unit })
  return {
    opened: openedLengthsOf(instance, model, cuttingOrderOf(model, patterns)),
    count: patterns.length,
    cost: costOf(model, valueOf(model, patterns)),
    bound: boundOf(model, solved.valueBound),
    proven: solved.isProven,
    toOrder,
    warnings: [...unsafeRails(instance, unit), ...warnings],
    steps: counter.steps,
  }
}

const emptyPlan = (model: StockModel): CutPlan => ({
  opened: [],
  count: 0,
  cost: costOf(model, 0),
  bound: boundOf(model, 0),
  proven: true,
  toOrder: [],
  warnings: [],
  steps: 0,
})

const costOf = ({ unit }: StockModel, value: number): string | null =>
  unit.kind === 'money' ? decimalFromWhole(value * unit.step, unit.scale) : null

function boundOf({ unit }: StockModel, value: number): number | string {
  switch (unit.kind) {
    case 'money':
      return decimalFromWhole(value * unit.step, unit.scale)
    case 'length':
      return mmFromNanometres(nanometresFrom(value * unit.step))
    case 'pieces':
      return value
    default:
      return assertNever(unit)
  }
}

const unsafeRails = ({ demand, saw }: CutInstance, unit: LengthUnit): string[] =>
  demand
    .filter(({ length }) => length < saw.shortestSafe)
    .map(({ id, length }) => {
      const [is, least] = [printLength(length, { unit }), printLength(saw.shortestSafe, { unit })]
      return `Rail ${id} is ${is} long, shorter than the ${least} that this saw holds safely: cut it from a longer piece with a jig, or by hand.`
    })
