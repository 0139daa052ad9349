import { describe, expect, it } from 'vitest'
import { planCuts } from '@shared/cutting'
import type { CutInstance, CutPlan, DemandedRail, PlanOptions } from '@shared/cutting'
import type { Failure } from '@shared/failure'
import { checkPlan } from '../../helpers/check-plan'
import { expectWithin } from '../../helpers/expect-within'

const PLAIN_SAW = { kerf: 0, margin: 0, endTrim: 0, shortestSafe: 0, smallestUsableOffcut: 0 }
const SAW = { kerf: 3.2, margin: 2, endTrim: 75, shortestSafe: 200, smallestUsableOffcut: 400 }
const KERF_45 = 3.2 * Math.SQRT2

const rail = (id: string, length: number, more: Partial<DemandedRail> = {}): DemandedRail => ({
  id,
  length,
  count: 1,
  mitre: 45,
  ...more,
})

const instanceOf = (parts: Partial<CutInstance>): CutInstance => ({
  demand: [],
  lengths: [],
  rack: [],
  saw: PLAIN_SAW,
  ...parts,
})

/** The plan, looked over by the checker. */
function planned(instance: CutInstance, options: PlanOptions = {}): CutPlan {
  const outcome = planCuts(instance, options)
  if (outcome.kind === 'no-plan') throw new Error(outcome.says)
  checkPlan(instance, outcome.plan)
  return outcome.plan
}

const frame = (name: string, width: number, height: number, count = 1) =>
  [
    ['top', width],
    ['right', height],
    ['bottom', width],
    ['left', height],
  ].map(([side, length]) =>
    rail(`${name}-${side}`, Number(length), { frame: name, side: String(side), count }),
  )

describe('what a length takes', () => {
  // Two rails of 600 and one gap of 3.2 √2 + 2 between the trims: 150 + 1200 + 6.525483… mm. A hair less takes only one.
  it('is Σ long points, a kerf over the cosine and the margin between neighbours, and both trims', () => {
    const needed = 150 + 1200 + KERF_45 + 2
    const demand = [rail('a', 600, { count: 2 })]
    expect(planned(instanceOf({ demand, saw: SAW, lengths: [{ length: needed + 2e-6 }] })).count).toBe(1)
    expect(planned(instanceOf({ demand, saw: SAW, lengths: [{ length: needed - 2e-6 }] })).count).toBe(2)
  })

  it('lays the rails one behind the other and measures the offcut after the last kerf', () => {
    const demand = [rail('a', 600, { count: 2 })]
    const [piece] = planned(instanceOf({ demand, saw: SAW, lengths: [{ length: 2440 }] })).opened
    expect(piece?.cuts.map(({ id, copy, length }) => [id, copy, length])).toEqual([
      ['a', 1, 600],
      ['a', 2, 600],
    ])
    expectWithin(piece?.cuts[0]?.at ?? 0, 75, { withinMm: 0 })
    expectWithin(piece?.cuts[1]?.at ?? 0, 675 + KERF_45 + 2, { withinMm: 1e-6 })
    expectWithin(piece?.offcut ?? 0, 2440 - (1275 + KERF_45 + 2) - KERF_45, { withinMm: 2e-6 })
    expect(piece?.isOffcutUsable).toBe(true)
  })

  // The last rail ends with the piece: there is nothing to cut off and nothing left.
  it('leaves nothing where the rails end with the piece', () => {
    const demand = [rail('a', 500, { count: 2, mitre: 0 })]
    const saw = { ...PLAIN_SAW, kerf: 3 }
    const [piece] = planned(instanceOf({ demand, saw, lengths: [{ length: 1003 }] })).opened
    expect(piece?.offcut).toBe(0)
    expect(piece?.isOffcutUsable).toBe(false)
  })

  // Kerf 3: 3/cos 45° = 4.2426 and 3/cos 30° = 3.4641. Between the unlike rails lies the larger; in the order 45, 45, 30 that is
  // 2 × 4.2426, in the order 45, 30, 45 the same, in 30, 45, 45 too; but four rails 45, 30, 30, 45 would take one more of the larger.
  it('parts unlike neighbours by the larger kerf and puts them so that it is counted least', () => {
    const demand = [rail('a', 300, { count: 2 }), rail('b', 300, { count: 2, mitre: 30 })]
    const saw = { ...PLAIN_SAW, kerf: 3 }
    const needed = 1200 + 2 * 3 * Math.SQRT2 + 3 / Math.cos(Math.PI / 6)
    const [piece, ...others] = planned(
      instanceOf({ demand, saw, lengths: [{ length: needed + 4e-6 }] }),
    ).opened
    expect(others).toEqual([])
    expect(piece?.cuts.map(({ mitre }) => mitre)).toEqual([45, 45, 30, 30])
    expect(planned(instanceOf({ demand, saw, lengths: [{ length: needed - 4e-6 }] })).count).toBe(2)
  })

  // Square rough cuts: 600 + 2 for each rail and one kerf of 3.2 between: 1207.2 + 150.
  it('takes a square kerf and the margin for each rail when the lengths are rough-cut square', () => {
    const saw = { ...SAW, handling: 'square-rough' } as const
    const demand = [rail('a', 600, { count: 2 })]
    expect(planned(instanceOf({ demand, saw, lengths: [{ length: 1357.2 }] })).count).toBe(1)
    expect(planned(instanceOf({ demand, saw, lengths: [{ length: 1357.199 }] })).count).toBe(2)
  })

  // 11 31/32 in rails: 1/64 in is a whole number of nanometres, so eight of them fill 95 3/4 in to the last one.
  it('fills a length of inches exactly', () => {
    const demand = [rail('a', (11 + 31 / 32) * 25.4, { count: 8, mitre: 0 })]
    expect(planned(instanceOf({ demand, lengths: [{ length: 95.75 * 25.4 }] })).count).toBe(1)
  })

  it('trims a rack piece as the piece says', () => {
    const demand = [rail('a', 1000, { mitre: 0 })]
    const rack = [{ id: 'R-1', length: 1010, endTrim: [0, 10] as const }]
    const [piece] = planned(instanceOf({ demand, saw: SAW, rack })).opened
    expect(piece).toMatchObject({ from: 'R-1', source: 'rack', trims: [0, 10] })
    expect(piece?.cuts[0]?.at).toBe(0)
  })
})

describe('what a plan is chosen for', () => {
  // One 3660 at 26.00 takes all four; two 2440 would cost 37.00.
  it('takes the least cost and adds it exactly', () => {
    const lengths = [
      { length: 2440, price: '18.50' },
      { length: 3660, price: '26.00' },
    ]
    const plan = planned(instanceOf({ demand: [rail('a', 850, { count: 4 })], saw: SAW, lengths }))
    expect(plan).toMatchObject({ count: 1, cost: '26.00', bound: '26.00', proven: true })
    expect(plan.toOrder).toEqual([{ length: 3660, count: 1 }])
  })

  // Ten times 0.10 is 1.00, which binary fractions do not give.
  it('adds money as decimals', () => {
    const lengths = [{ length: 1000, price: '0.1' }]
    const plan = planned(instanceOf({ demand: [rail('a', 900, { count: 10 })], lengths }))
    expect([plan.cost, plan.bound]).toEqual(['1.0', '1.0'])
  })

  it('takes what lies on the rack before it buys', () => {
    const rack = [{ id: 'R-104', length: 1830 }]
    const lengths = [{ length: 2440, price: '18.50' }]
    const demand = [rail('a', 700, { count: 2 }), rail('b', 1100)]
    const plan = planned(instanceOf({ demand, saw: SAW, lengths, rack }))
    expect(plan.cost).toBe('18.50')
    expect(plan.opened.map(({ from }) => from).sort()).toEqual(['2440', 'R-104'])
  })

  // Without prices 1000 + 1000 ties with 2000: the single piece wins; 2000 of the rack wins over 2000 ordered.
  it('opens the least length, then the fewest pieces, then those of the rack', () => {
    const demand = [rail('a', 900, { count: 2, mitre: 0 })]
    const lengths = [{ length: 1000 }, { length: 2000 }]
    expect(planned(instanceOf({ demand, lengths })).opened.map(({ from }) => from)).toEqual(['2000'])
    const rack = [{ id: 'R-1', length: 2000 }]
    const plan = planned(instanceOf({ demand, lengths, rack }))
    expect(plan.opened.map(({ from }) => from)).toEqual(['R-1'])
    expect(plan).toMatchObject({ bound: 2000, cost: null, toOrder: [] })
  })

  it('gives its bound in pieces where one length can be ordered and nothing lies on the rack', () => {
    const plan = planned(instanceOf({ demand: [rail('a', 900, { count: 5 })], lengths: [{ length: 2000 }] }))
    expect(plan).toMatchObject({ count: 3, bound: 3, proven: true })
  })

  // 700 + 200 and 500 + 400 fill two lengths; 700 + 400 + 200 are too long: with 300 left on each or 700 + 200, 500 + 400: 100 and 100,
  // or 700 and 500 + 400: only the first way takes two. Three lengths are not opened for a longer offcut.
  it('leaves the longest offcut only among plans that are as good', () => {
    const demand = [700, 500, 200].map((length, index) => rail(`r${index}`, length, { mitre: 0 }))
    const plan = planned(instanceOf({ demand, lengths: [{ length: 1000 }] }))
    expect(plan.count).toBe(2)
    expect(Math.max(...plan.opened.map(({ offcut }) => offcut))).toBe(500)
  })

  it('keeps within the number that can be ordered', () => {
    const lengths = [
      { length: 1000, price: '1', count: 1 },
      { length: 1000.5, price: '2' },
    ]
    const plan = planned(instanceOf({ demand: [rail('a', 900, { count: 3 })], lengths }))
    expect(plan.cost).toBe('5')
  })

  it('cuts equal rails one after the other and keeps the stop from length to length', () => {
    const demand = [rail('a', 600, { count: 4 }), rail('b', 400, { count: 4 })]
    const { opened } = planned(instanceOf({ demand, saw: PLAIN_SAW, lengths: [{ length: 1000 }] }))
    const sequence = opened.flatMap(({ cuts }) => cuts.map(({ length }) => length))
    const changes = sequence.filter((length, index) => index > 0 && length !== sequence[index - 1]).length
    expect([opened.length, changes]).toEqual([4, 4])
  })

  it('keeps the rails of a frame together where rails are equal', () => {
    const demand = [...frame('F1', 500, 400), ...frame('F2', 500, 400), ...frame('F3', 500, 400)]
    const { opened } = planned(instanceOf({ demand, lengths: [{ length: 1800 }] }))
    expect(opened.map(({ cuts }) => new Set(cuts.map((cut) => cut.frame)).size)).toEqual([1, 1, 1])
  })
})

describe('what is ordered', () => {
  const demand = [rail('a', 900, { count: 4, mitre: 0 })]

  // Two lengths of 2000 carry two rails each and leave 200: too little for 300. Three pieces of 300 (two for setting up, the first-off) take
  // one length more; a tenth of three is one more.
  it('adds set-up pieces and the first-off, then the reserve of the commonest size', () => {
    const order = { setupPieces: 2, firstOff: 300, reserve: 0.1 }
    const plan = planned(instanceOf({ demand, lengths: [{ length: 2000 }], order }))
    expect(plan.count).toBe(2)
    expect(plan.toOrder).toEqual([{ length: 2000, count: 4 }])
  })

  it('cuts them from what the lengths have left where it is enough', () => {
    const order = { setupPieces: 1, firstOff: 200, reserve: 0 }
    const plan = planned(instanceOf({ demand, lengths: [{ length: 2000 }], order }))
    expect(plan.toOrder).toEqual([{ length: 2000, count: 2 }])
  })

  // Three tenths of ten lengths are three: 0.3 × 10 is 3 in doubles too, 0.1 × 3 is not 0.3.
  it('does not order one more for binary rounding', () => {
    const order = { setupPieces: 0, firstOff: 0, reserve: 0.07 }
    const many = [rail('a', 900, { count: 100 })]
    const plan = planned(instanceOf({ demand: many, lengths: [{ length: 1000 }], order }))
    expect(plan.toOrder).toEqual([{ length: 1000, count: 107 }])
  })

  it('orders nothing where the rack is enough', () => {
    const order = { setupPieces: 2, firstOff: 300, reserve: 0.5 }
    const rack = [{ id: 'R-1', length: 5000 }]
    const plan = planned(instanceOf({ demand, lengths: [{ length: 2000, price: '9' }], rack, order }))
    expect(plan).toMatchObject({ cost: '0', toOrder: [] })
  })

  it('says when set-up pieces or the reserve cannot be had', () => {
    const order = { setupPieces: 5, firstOff: 1500, reserve: 1 }
    const plan = planned(instanceOf({ demand, lengths: [{ length: 2000, count: 3 }], order }))
    expect(plan.toOrder).toEqual([{ length: 2000, count: 3 }])
    expect(plan.warnings.map((text) => text.split(' ').slice(0, 6).join(' '))).toEqual([
      '6 of the set-up pieces and',
      'The reserve is 1 short: no',
    ])
  })
})

describe('what cannot be planned', () => {
  it('names the length that a rail would need', () => {
    const outcome = planCuts(
      instanceOf({ demand: [rail('big', 4000)], saw: SAW, lengths: [{ length: 3660 }] }),
    )
    expect(outcome).toMatchObject({ kind: 'no-plan', reason: 'rail-too-long', neededLengthMm: 4150 })
    expect(outcome.kind === 'no-plan' && outcome.says).toContain('4150.00 mm')
  })

  it('prints the length needed in inches where asked, rounded up', () => {
    const outcome = planCuts(instanceOf({ demand: [rail('big', 1001)], lengths: [{ length: 1000 }] }), {
      unit: 'in',
    })
    expect(outcome.kind === 'no-plan' && outcome.says).toContain('a length of 39 27/64"')
  })

  it('says so where there is nothing to cut from', () => {
    const outcome = planCuts(instanceOf({ demand: [rail('a', 100)] }))
    expect(outcome).toMatchObject({ kind: 'no-plan', reason: 'rail-too-long', neededLengthMm: 100 })
  })

  it('counts the lengths that are missing', () => {
    const outcome = planCuts(
      instanceOf({ demand: [rail('a', 600, { count: 5 })], lengths: [{ length: 1000, count: 2 }] }),
    )
    expect(outcome).toMatchObject({ kind: 'no-plan', reason: 'lengths-run-out', neededLengthMm: 1000 })
    expect(outcome.kind === 'no-plan' && outcome.says).toContain('3 more of 1000.00 mm would do')
  })

  it('plans nothing for nothing', () => {
    expect(planned(instanceOf({ lengths: [{ length: 1000, price: '5.00' }] }))).toMatchObject({
      opened: [],
      cost: '0.00',
      bound: '0.00',
      proven: true,
    })
  })

  it('warns of rails that are too short to hold', () => {
    const { warnings } = planned(
      instanceOf({ demand: [rail('a', 150), rail('b', 250)], saw: SAW, lengths: [{ length: 2440 }] }),
    )
    expect(warnings).toHaveLength(1)
    expect(warnings[0]).toContain('Rail a is 150.00 mm long')
  })

  it.each<[string, Partial<CutInstance>, string]>([
    ['a rail of no length', { demand: [rail('a', 0)] }, '/demand/0/length'],
    ['a rail without end', { demand: [rail('a', Number.POSITIVE_INFINITY)] }, '/demand/0/length'],
    ['half a rail', { demand: [rail('a', 5, { count: 0.5 })] }, '/demand/0/count'],
    ['a mitre of 90°', { demand: [rail('a', 5, { mitre: 90 })] }, '/demand/0/mitre'],
    ['two rails of one id', { demand: [rail('a', 5), rail('a', 6)] }, '/demand/1/id'],
    ['a price in words', { lengths: [{ length: 5, price: 'ten' }] }, '/lengths/0/price'],
    ['a price here and none there', { lengths: [{ length: 5, price: '1' }, { length: 6 }] }, '/lengths'],
    ['less than no lengths', { lengths: [{ length: 5, count: -1 }] }, '/lengths/0/count'],
    ['a rack piece that is not a number', { rack: [{ id: 'R', length: Number.NaN }] }, '/rack/0/length'],
    ['a negative trim', { rack: [{ id: 'R', length: 5, endTrim: [0, -1] }] }, '/rack/0/endTrim/1'],
    ['a negative kerf', { saw: { ...PLAIN_SAW, kerf: -3 } }, '/saw/kerf'],
    ['a negative reserve', { order: { setupPieces: 0, firstOff: 0, reserve: -1 } }, '/order/reserve'],
    ['a million rails', { demand: [rail('a', 5, { count: 1_000_000 })] }, '/demand'],
  ])('refuses %s', (_name, parts, path) => {
    const faults = () => {
      try {
        return planCuts(instanceOf(parts)).kind
      } catch (error) {
        return (error as Failure).details.faults?.map((fault) => fault.path)
      }
    }
    expect(faults()).toEqual([path])
  })
})

describe('long work', { timeout: 30_000 }, () => {
  const demand = Array.from({ length: 24 }, (_, index) =>
    rail(`r${index}`, 311.3 + 37.7 * ((index * 11) % 24)),
  )
  const lengths = [
    { length: 2440, price: '18.50' },
    { length: 3050, price: '22.10' },
    { length: 3660, price: '26.00' },
  ]
  const instance = instanceOf({ demand, saw: SAW, lengths })

  it('gives a true plan and a true bound when the steps run out', () => {
    const plan = planned(instance, { stepLimit: 1 })
    expect(plan.steps).toBeLessThan(100)
    expect(Number(plan.bound)).toBeLessThanOrEqual(Number(planned(instance).cost))
  })

  it('stops when asked, with the best plan so far', () => {
    let asked = 0
    const plan = planned(instance, { isStopped: () => (asked += 1) > 0 })
    expect(asked).toBeGreaterThan(0)
    expect(Number(plan.bound)).toBeLessThanOrEqual(Number(plan.cost))
  })

  it('says how far it is', () => {
    const seen: number[] = []
    planned(instance, { onProgress: ({ steps }) => seen.push(steps) })
    expect(seen.length).toBeGreaterThan(0)
    expect([...seen].sort((a, b) => a - b)).toEqual(seen)
  })

  it('gives the same plan for the same instance', () => {
    expect(planCuts(instance)).toEqual(planCuts(instance))
  })
})
