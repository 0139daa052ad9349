import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { planCuts } from '@shared/cutting'
import type { CutInstance, CutPlan } from '@shared/cutting'
import { anyDaysWork, anySmallInstance } from '../../helpers/arbitraries-cutting'
import { checkPlan } from '../../helpers/check-plan'

function planOf(instance: CutInstance): CutPlan | undefined {
  const outcome = planCuts(instance)
  if (outcome.kind === 'no-plan') return undefined
  checkPlan(instance, outcome.plan)
  return outcome.plan
}

/** Every length so many times as long. */
const scaled = ({ demand, lengths, rack, saw }: CutInstance, by: number): CutInstance => ({
  demand: demand.map((rail) => ({ ...rail, length: rail.length * by })),
  lengths: lengths.map((each) => ({ ...each, length: each.length * by })),
  rack: rack.map(({ id, length, endTrim }) => ({
    id,
    length: length * by,
    ...(endTrim === undefined ? {} : { endTrim: [endTrim[0] * by, endTrim[1] * by] as const }),
  })),
  saw: {
    ...saw,
    kerf: saw.kerf * by,
    margin: saw.margin * by,
    endTrim: saw.endTrim * by,
    smallestUsableOffcut: saw.smallestUsableOffcut * by,
    shortestSafe: saw.shortestSafe * by,
  },
})

const measureOf = (plan: CutPlan | undefined) => [plan?.cost, plan?.count, plan?.proven]

describe('plans', () => {
  it('of a day’s work pass the checker, never beat their bound and are proven', () => {
    fc.assert(
      fc.property(anyDaysWork(), (instance) => {
        expect(planOf(instance)?.proven ?? true).toBe(true)
      }),
      { numRuns: 25 },
    )
  }, 60_000)

  it('open as many pieces when every length is three times as long', () => {
    fc.assert(
      fc.property(anySmallInstance(), (instance) => {
        expect(measureOf(planOf(scaled(instance, 3)))).toEqual(measureOf(planOf(instance)))
      }),
    )
  }, 30_000)

  it('cost no more with one more length to choose from, and no less with one more rail', () => {
    const costOf = (instance: CutInstance) => {
      const plan = planOf(instance)
      return plan === undefined
        ? Number.POSITIVE_INFINITY
        : Number(plan.cost ?? plan.opened.reduce((sum, { length }) => sum + length, 0))
    }
    fc.assert(
      fc.property(anySmallInstance(), (instance) => {
        const { demand, lengths } = instance
        const isPriced = lengths.some(({ price }) => price !== undefined)
        const further = { length: 777, ...(isPriced ? { price: '7.77' } : {}) }
        const cost = costOf(instance)
        expect(costOf({ ...instance, lengths: [...lengths, further] })).toBeLessThanOrEqual(cost)
        expect(costOf({ ...instance, demand: demand.slice(1) })).toBeLessThanOrEqual(cost)
      }),
    )
  }, 30_000)

  it('do not depend on the order in which things are given', () => {
    fc.assert(
      fc.property(anySmallInstance(), (instance) => {
        const turned = {
          ...instance,
          demand: [...instance.demand].reverse(),
          lengths: [...instance.lengths].reverse(),
          rack: [...instance.rack].reverse(),
        }
        expect(measureOf(planOf(turned))).toEqual(measureOf(planOf(instance)))
      }),
    )
  }, 30_000)
})
