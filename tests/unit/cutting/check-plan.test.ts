import { describe, expect, it } from 'vitest'
import { planCuts } from '@shared/cutting'
import type { CutInstance, CutPlan, OpenedLength } from '@shared/cutting'
import { planFaults } from '../../helpers/check-plan'

const INSTANCE: CutInstance = {
  demand: [
    { id: 'a', length: 600, count: 3, mitre: 45, frame: 'F1', side: 'top' },
    { id: 'b', length: 150, count: 1, mitre: 45 },
  ],
  lengths: [{ length: 1500, price: '10.00' }],
  rack: [{ id: 'R-1', length: 700, endTrim: [10, 10] }],
  saw: { kerf: 3, margin: 1, endTrim: 20, shortestSafe: 200, smallestUsableOffcut: 100 },
  order: { setupPieces: 1, firstOff: 900, reserve: 0.5 },
}

function planOf(instance: CutInstance): CutPlan {
  const outcome = planCuts(instance)
  if (outcome.kind === 'no-plan') throw new Error(outcome.says)
  return outcome.plan
}

const PLAN = planOf(INSTANCE)

const withPiece = (index: number, change: (piece: OpenedLength) => Partial<OpenedLength>): CutPlan => ({
  ...PLAN,
  opened: PLAN.opened.map((piece, place) => (place === index ? { ...piece, ...change(piece) } : piece)),
})

describe('the checker of plans', () => {
  it('finds nothing wrong with a true plan', () => {
    expect(planFaults(INSTANCE, PLAN)).toEqual([])
  })

  it.each<[string, CutPlan]>([
    ['a rail left out', withPiece(0, ({ cuts }) => ({ cuts: cuts.slice(1) }))],
    ['a rail cut twice', withPiece(0, ({ cuts }) => ({ cuts: [...cuts, ...cuts.slice(0, 1)] }))],
    [
      'a rail that is shorter',
      withPiece(0, ({ cuts }) => ({ cuts: cuts.map((cut) => ({ ...cut, length: cut.length - 1 })) })),
    ],
    [
      'rails too near each other',
      {
        ...PLAN,
        opened: PLAN.opened.map((piece) => ({
          ...piece,
          cuts: piece.cuts.map((cut, place) => ({ ...cut, at: cut.at - place * 0.01 })),
        })),
      },
    ],
    [
      'a rail in the trim',
      withPiece(0, ({ cuts }) => ({ cuts: cuts.map((cut) => ({ ...cut, at: cut.at - 15 })) })),
    ],
    [
      'a rail over the end',
      withPiece(0, ({ cuts }) => ({ cuts: cuts.map((cut) => ({ ...cut, at: cut.at + 900 })) })),
    ],
    ['a wrong offcut', withPiece(0, ({ offcut }) => ({ offcut: offcut + 0.01 }))],
    [
      'an offcut called usable that is not',
      withPiece(0, ({ isOffcutUsable }) => ({ isOffcutUsable: !isOffcutUsable })),
    ],
    ['a length that is not sold', withPiece(0, () => ({ from: '1501', length: 1501, source: 'order' }))],
    ['an unknown rack piece', withPiece(0, () => ({ from: 'R-2', source: 'rack' }))],
    ['a wrong count', { ...PLAN, count: PLAN.count + 1 }],
    ['a wrong cost', { ...PLAN, cost: '9.99' }],
    ['a bound above the cost', { ...PLAN, bound: '20.00', proven: false }],
    ['a proof without its bound', { ...PLAN, bound: '5.00', proven: true }],
    ['too few to order', { ...PLAN, toOrder: [{ length: 1500, count: 1 }] }],
    ['too many to order', { ...PLAN, toOrder: [{ length: 1500, count: 9 }] }],
    ['a missing warning', { ...PLAN, warnings: [] }],
    ['a piece opened for nothing', { ...PLAN, opened: [...PLAN.opened, { ...PLAN.opened[0]!, cuts: [] }] }],
  ])('finds %s', (_name, plan) => {
    expect(planFaults(INSTANCE, plan)).not.toEqual([])
  })
})
