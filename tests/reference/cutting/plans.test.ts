import { readFileSync, readdirSync } from 'node:fs'
import { afterAll, describe, expect, it } from 'vitest'
import { planCuts } from '@shared/cutting'
import type { CutInstance } from '@shared/cutting'
import { checkPlan } from '../../helpers/check-plan'

interface Published {
  readonly name: string
  readonly capacity: number
  readonly optimum: number
  /** [length, how many]. */
  readonly items: readonly (readonly [number, number])[]
}

const folder = (name: string) => new URL(`../data/cutting/${name}/`, import.meta.url)
const readAll = (name: string): Published[] =>
  readdirSync(folder(name)).map((file) => JSON.parse(readFileSync(new URL(file, folder(name)), 'utf8')))

/** Lengths without kerf or trim, as the published instances have them. */
const instanceFrom = ({ capacity, items }: Published): CutInstance => ({
  demand: items.map(([length, count], index) => ({ id: `item ${index + 1}`, length, count, mitre: 0 })),
  lengths: [{ length: capacity }],
  rack: [],
  saw: { kerf: 0, margin: 0, endTrim: 0, shortestSafe: 0, smallestUsableOffcut: 0 },
})

const table: string[] = []

function expectNear(published: Published, gapAtMost: number): void {
  const instance = instanceFrom(published)
  const outcome = planCuts(instance)
  if (outcome.kind === 'no-plan') throw new Error(outcome.says)
  const { plan } = outcome
  checkPlan(instance, plan)
  const { name, optimum } = published
  const bound = Number(plan.bound)
  table.push(
    `${name.padEnd(24)} bound ${bound}  optimum ${optimum}  plan ${plan.count}  gap ${plan.count - optimum}  proven ${plan.proven}  steps ${plan.steps}`,
  )
  expect(bound).toBeLessThanOrEqual(optimum)
  expect(plan.count).toBeGreaterThanOrEqual(optimum)
  expect(plan.count - optimum).toBeLessThanOrEqual(gapAtMost)
  expect(plan.proven).toBe(plan.count === bound)
}

describe('published cutting-stock instances', () => {
  afterAll(() => {
    process.stdout.write(`\nPlans beside published optima:\n${table.join('\n')}\n`)
  })

  // OR-Library binpack1 (J. E. Beasley), data of E. Falkenauer, Journal of Heuristics 2 (1996): 120 lengths of 20 to 100 from 150, on
  // 14 of which the usual rule, longest first, opens one too many.
  it.each(readAll('u120').map((published) => [published.name, published] as const))(
    '%s is met',
    (_name, published) => expectNear(published, 0),
    20_000,
  )

  // The paper rolls of the encyclopaedia's article on cutting stock, the four widths of Gilmore and Gomory (1961), a textbook's five.
  it.each(readAll('classic').map((published) => [published.name, published] as const))(
    '%s is met',
    (_name, published) => expectNear(published, 0),
    20_000,
  )

  // Triplets: every length is filled by just three, so the optimum is a third of them; made here by parting each length in three.
  it.each([3, 5, 8])('triplets for %i lengths', (lengths) => {
    const capacity = 1000
    const items = Array.from({ length: lengths }, (_, index) => {
      const [a, b] = [380 + ((index * 37) % 90), 260 + ((index * 53) % 60)]
      return [a, b, capacity - a - b] as const
    })
    const published = {
      name: `triplets-${lengths}`,
      capacity,
      optimum: lengths,
      items: items.flat().map((length) => [length, 1] as const),
    }
    expectNear(published, 0)
  })
})
