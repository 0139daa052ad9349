import { mmFromNanometres, nanometresFrom, nanometresUp, printLength } from '@shared/units'
import type { LengthUnit } from '@shared/units'
import type { CutInstance, PlanOutcome } from './cut-instance'
import { solve } from './solve'
import type { StepCounter } from './step-counter'
import { stockModelFrom, takenBy } from './stock-model'
import type { StockModel } from './stock-model'

type NoPlan = Extract<PlanOutcome, { kind: 'no-plan' }>

/** The rail that is too long for every piece there is, and the length that it would need; undefined where there is none. */
export function railTooLong(instance: CutInstance, model: StockModel, unit: LengthUnit): NoPlan | undefined {
  const most = Math.max(Number.NEGATIVE_INFINITY, ...model.stocks.map(({ usable }) => usable))
  const longest = model.kinds.reduce((a, b) => (b.body > a.body ? b : a))
  if (longest.body <= most) return undefined
  const rail = instance.demand[longest.rails[0]!]!
  const neededLengthMm = lengthNeededFor(instance, rail)
  const pieces = [...instance.lengths.filter(({ count }) => count !== 0), ...instance.rack]
  const print = (mm: number) => printLength(mm, { unit })
  const there =
    pieces.length === 0
      ? 'there is no length to cut it from'
      : `the longest there is has ${print(Math.max(...pieces.map(({ length }) => length)))}`
  const says = `Rail ${rail.id} is ${print(rail.length)} long: with its end trims it needs a length of ${printUp(neededLengthMm, unit)}, and ${there}. Add a longer length or make the rail shorter.`
  return { kind: 'no-plan', reason: 'rail-too-long', says, neededLengthMm }
}

/** What is missing where each rail fits some piece but there are too few of them: how many more of the longest length would do. */
export function lengthsRunOut(
  {
    instance,
    unit,
    isProven,
  }: { readonly instance: CutInstance; readonly unit: LengthUnit; readonly isProven: boolean },
  counter: StepCounter,
): NoPlan {
  const longestRail = instance.demand.reduce((a, b) => (b.length > a.length ? b : a))
  const lengths = [...instance.lengths, ...instance.rack].map(({ length }) => length)
  const neededLengthMm = Math.max(lengthNeededFor(instance, longestRail), ...lengths)
  if (!isProven) {
    const says = `No plan was found within the steps allowed. Allow more, or add a length of ${printUp(neededLengthMm, unit)}.`
    return { kind: 'no-plan', reason: 'not-found', says, neededLengthMm }
  }
  const more = furtherLengths(instance, neededLengthMm, counter)
  const count = more === undefined ? 'Further lengths' : `${more} more`
  const says = `The lengths run out before every rail is cut. ${count} of ${printUp(neededLengthMm, unit)} would do.`
  return { kind: 'no-plan', reason: 'lengths-run-out', says, neededLengthMm }
}

/** Plans again with as many of one length as it takes, and nothing else costing anything. */
function furtherLengths(instance: CutInstance, length: number, counter: StepCounter): number | undefined {
  const lengths = [...instance.lengths.map((each) => ({ ...each, price: '0' })), { length, price: '1' }]
  const model = stockModelFrom({ ...instance, lengths })
  const solved = solve(model, { ...counter, steps: 0, hasEnded: false })
  if (solved.kind === 'unsolved') return undefined
  return solved.patterns.filter(
    ({ stock }) =>
      model.stocks[stock]!.members[0] === lengths.length - 1 && model.stocks[stock]!.source === 'order',
  ).length
}

function lengthNeededFor({ saw }: CutInstance, rail: CutInstance['demand'][number]): number {
  return mmFromNanometres(nanometresFrom(takenBy(rail, saw).body + 2 * nanometresUp(saw.endTrim)))
}

/** Printed so that a length of what is printed is long enough. */
const printUp = (mm: number, unit: LengthUnit) =>
  printLength(unit === 'mm' ? Math.ceil(mm * 100) / 100 : (Math.ceil((mm / 25.4) * 64) * 25.4) / 64, { unit })
