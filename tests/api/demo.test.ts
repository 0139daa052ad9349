import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { CommissionLineView } from '@shared/contracts'
import { checksOf, faultsOfSection, sectionFromDraft } from '@shared/section'
import type { DraftSection } from '@shared/section'
import { filledDemo, signedInAs } from '../helpers/demo'
import type { FilledDemo } from '../helpers/demo'

/** The fill is some two thousand statements, one after the other: seconds on a quiet machine, minutes on a loaded one. */
const FILL_MS = 240_000

let demo: FilledDemo
beforeAll(async () => {
  demo = await filledDemo()
}, FILL_MS)
afterAll(() => demo.stop())

const EVERYBODY = [
  'Maren Ashgrove',
  'Tobias Lunn',
  'Ines Corder',
  'Dr Hanna Weft',
  'Piers Nolloth',
  'Jon Brackley',
  'Sam Reddick',
]

async function commissionsOf(name: string): Promise<readonly CommissionLineView[]> {
  const http = await signedInAs(demo, name)
  const answer = await http.get('/commissions')
  expect(answer.status).toBe(200)
  return answer.body as readonly CommissionLineView[]
}

/** Where each commission stands, as the list says it. */
const STANDINGS = [
  ['Low water: three studies and the canvas', 'bench', 'bench', 'A', 'approved', false],
  ['The pilot’s daughter', 'knife', 'designer', 'A', 'approved', true],
  ['Pebbles, an arrangement in grey', 'knife', 'designer', 'A', 'approved', false],
  ['Winter orchard', 'knife', 'mill', 'A', 'approved', false],
  ['Portrait of a shipwright', 'review', 'curator', 'B', 'put-forward', false],
  ['Lamplight, the back kitchen', 'knife', 'manager', 'A', 'approved', false],
  ['Black Hill above the tarn', 'review', 'designer', 'A', 'returned', false],
  ['Three ridges, evening', 'review', 'curator', 'A', 'put-forward', false],
  ['Upland with two valleys', 'section', 'designer', undefined, undefined, false],
  ['Girl with a linnet', 'evidence', 'designer', undefined, undefined, false],
]

describe('the demo workshop', () => {
  it('has every commission where it should stand', async () => {
    const lines = await commissionsOf('Maren Ashgrove')
    const standings = lines.map(({ title, stage, waitsForRole, latestIssue, stuck }) => [
      title,
      stage,
      waitsForRole,
      latestIssue?.letter,
      latestIssue?.state,
      stuck,
    ])
    expect(standings.reverse()).toEqual(STANDINGS)
  })

  it.each(EVERYBODY)('has something waiting for %s', async (name) => {
    const http = await signedInAs(demo, name)
    const { body } = await http.get('/waiting')
    expect(body).not.toHaveLength(0)
  })

  it('draws only sections without faults, that common machines can run', async () => {
    const http = await signedInAs(demo, 'Maren Ashgrove')
    for (const { id, title } of await commissionsOf('Maren Ashgrove')) {
      const { body } = await http.get(`/commissions/${id}/draft`)
      const section = sectionFromDraft(body.document as DraftSection)
      if (section.members.length === 0) continue
      expect(faultsOfSection(section), title).toEqual([])
      const stops = checksOf(section).filter(({ severity }) => severity === 'stop')
      expect(stops, title).toEqual([])
    }
  })

  it('is refused in a database that holds people, and changes nothing there', async () => {
    const before = await commissionsOf('Maren Ashgrove')
    await expect(demo.fillAgain()).rejects.toThrow('holds people already')
    expect(await commissionsOf('Maren Ashgrove')).toEqual(before)
  })
})
