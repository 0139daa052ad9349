import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { planCuts } from '@shared/cutting'
import type { CutInstance, CutPlan } from '@shared/cutting'
import { anySmallInstance } from '../../helpers/arbitraries-cutting'
import { bruteBestOf } from '../../helpers/brute-plan'
import { checkPlan } from '../../helpers/check-plan'
import { expectWithin } from '../../helpers/expect-within'

const valueOf = ({ cost, opened }: CutPlan) =>
  cost === null ? opened.reduce((sum, { length }) => sum + length, 0) : Math.round(Number(cost) * 100)

const longestUsableOffcut = ({ opened }: CutPlan) =>
  Math.max(0, ...opened.filter(({ isOffcutUsable }) => isOffcutUsable).map(({ offcut }) => offcut))

function expectBest(instance: CutInstance): void {
  const outcome = planCuts(instance)
  const best = bruteBestOf(instance)
  if (best === undefined) {
    expect(outcome.kind).toBe('no-plan')
    return
  }
  if (outcome.kind === 'no-plan') throw new Error(`no plan, but one of ${best.pieces} pieces exists`)
  const { plan } = outcome
  checkPlan(instance, plan)
  expect(plan.proven).toBe(true)
  const isPriced = plan.cost !== null
  const ordered = plan.opened.filter(({ source }) => source === 'order').length
  expect([valueOf(plan), plan.count, isPriced ? '' : ordered]).toEqual([
    best.value,
    best.pieces,
    isPriced ? '' : best.piecesOrdered,
  ])
  expectWithin(longestUsableOffcut(plan), best.longestOffcut, { withinMm: 1e-4 })
}

describe('planCuts against trying everything', () => {
  it('finds the best cost or length, the fewest pieces and the longest offcut, and proves the first two', () => {
    fc.assert(fc.property(anySmallInstance(), expectBest), { numRuns: 150 })
  }, 30_000)
})
