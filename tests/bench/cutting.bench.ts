import { planCuts } from '@shared/cutting'
import type { CutInstance } from '@shared/cutting'
import type { BenchRow } from './section.bench'

const REPEATS = 30
const WARM_UP = 10

const SAW = { kerf: 3.2, margin: 2, endTrim: 75, shortestSafe: 200, smallestUsableOffcut: 400 }
const LENGTHS = [
  { length: 2440, price: '18.50' },
  { length: 3660, price: '26.00' },
]

/** So many frames of four rails, of sizes that are the same each time. */
function frames(count: number): CutInstance {
  const demand = Array.from({ length: count }, (_, index) => {
    const [width, height] = [420 + ((index * 317) % 760), 380 + ((index * 211) % 640)]
    return (['top', 'right', 'bottom', 'left'] as const).map((side, place) => ({
      id: `F${index}-${side}`,
      length: place % 2 === 0 ? width : height,
      count: 1,
      mitre: 45,
      frame: `F${index}`,
      side,
    }))
  })
  return { demand: demand.flat(), lengths: LENGTHS, rack: [], saw: SAW }
}

function medianMsOf(work: () => unknown): number {
  for (let i = 0; i < WARM_UP; i += 1) work()
  const times = Array.from({ length: REPEATS }, () => {
    const start = performance.now()
    work()
    return performance.now() - start
  })
  return times.sort((a, b) => a - b)[REPEATS >> 1] ?? 0
}

/** Time of a plan, and its cost beside the bound proved in the same run. */
export async function run(): Promise<BenchRow[]> {
  return [4, 6, 12].flatMap((count): BenchRow[] => {
    const instance = frames(count)
    const outcome = planCuts(instance)
    if (outcome.kind === 'no-plan') throw new Error(outcome.says)
    const [cost, bound] = [Number(outcome.plan.cost), Number(outcome.plan.bound)]
    return [
      { name: `plan of ${count} frames`, value: medianMsOf(() => planCuts(instance)), unit: 'ms' },
      {
        name: `cost of ${count} frames beside its bound`,
        value: cost,
        unit: '',
        peer: bound,
        ratio: cost / bound,
      },
    ]
  })
}
