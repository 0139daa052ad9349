import { describe, expect, it } from 'vitest'
import { standingOf } from '@shared/course'
import type { CommissionFacts } from '@shared/course'

const bare: CommissionFacts = {
  pictures: 0,
  measuredPictures: 0,
  photographs: 0,
  draftMembers: 0,
  issue: 'none',
  draftMovedOn: false,
  order: 'none',
  rackHasShape: false,
  cutList: 'none',
}
const measured = { pictures: 1, measuredPictures: 1 }
const approved = { ...measured, draftMembers: 8, issue: 'approved' } as const

describe('where a commission stands', () => {
  const cases: readonly (readonly [string, Partial<CommissionFacts>, string, string | null])[] = [
    ['nothing yet', {}, 'picture', 'designer'],
    ['a picture without readings', { pictures: 2, measuredPictures: 1 }, 'picture', 'designer'],
    ['measured, no evidence', measured, 'evidence', 'designer'],
    ['a photograph is there', { ...measured, photographs: 1 }, 'section', 'designer'],
    ['drawn without a photograph', { ...measured, draftMembers: 3 }, 'section', 'designer'],
    ['put forward', { ...measured, issue: 'put-forward' }, 'review', 'curator'],
    ['returned', { ...measured, issue: 'returned' }, 'review', 'designer'],
    ['withdrawn', { ...measured, issue: 'withdrawn' }, 'review', 'designer'],
    ['approved, nothing ordered', approved, 'knife', 'designer'],
    ['approved, the shape is on the rack', { ...approved, rackHasShape: true }, 'lengths', 'designer'],
    ['ordered', { ...approved, order: 'awaits-mill' }, 'knife', 'mill'],
    ['quoted', { ...approved, order: 'awaits-manager' }, 'knife', 'manager'],
    ['first-off reported', { ...approved, order: 'awaits-first-off-decision' }, 'knife', 'designer'],
    ['held', { ...approved, order: 'held' }, 'knife', 'designer'],
    ['cancelled, nothing on the rack', { ...approved, order: 'cancelled' }, 'knife', 'designer'],
    ['first-off accepted', { ...approved, order: 'first-off-settled' }, 'lengths', 'designer'],
    ['planned', { ...approved, order: 'first-off-settled', cutList: 'closed' }, 'lengths', 'designer'],
    ['open to the bench', { ...approved, order: 'first-off-settled', cutList: 'open' }, 'bench', 'bench'],
    ['all cut', { ...approved, order: 'first-off-settled', cutList: 'done' }, 'finish', null],
  ]
  it.each(cases)('%s', (_name, facts, stage, role) => {
    const standing = standingOf({ ...bare, ...facts })
    expect([standing.stage, standing.role]).toEqual([stage, role])
    expect(standing.waitsFor.length).toBeGreaterThan(10)
  })
})
