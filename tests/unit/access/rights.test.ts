import { describe, expect, it } from 'vitest'
import { can, clientIdsOf, isOfWorkshop, millIdsOf, RIGHTS } from '@shared/access'
import type { Actor, Facts, Right, RoleOfPerson } from '@shared/access'

const actor = (role: RoleOfPerson, clientId: string | null = null, millId: string | null = null): Actor => ({
  personId: `person-${role}`,
  name: role,
  memberships: [{ role, clientId, millId }],
})
const ROLES: readonly RoleOfPerson[] = ['manager', 'designer', 'curator', 'mill', 'bench']
const own: Facts = { clientId: 'c1', millId: 'm1', putForwardById: 'somebody' }
const foreign: Facts = { clientId: 'c2', millId: 'm2', putForwardById: 'somebody' }

const holders = (right: Right, facts: Facts) =>
  ROLES.filter((role) => can(actor(role, 'c1', 'm1'), right, facts)).join(' ')

describe('who may, as the product rules say', () => {
  // Written from the rules in words, not from the table in the code: right, who on their own rows, who on others'.
  const rules: readonly (readonly [Right, string, string])[] = [
    ['draft.read', 'manager designer', 'manager designer'],
    ['draft.edit', 'manager designer', 'manager designer'],
    ['issue.put-forward', 'manager designer', 'manager designer'],
    ['issue.read', 'manager designer curator bench', 'manager designer bench'],
    ['remark.add', 'manager designer curator', 'manager designer'],
    ['issue.decide', 'curator', ''],
    ['order.send', 'manager designer', 'manager designer'],
    ['first-off.decide', 'manager designer', 'manager designer'],
    ['order.accept-price', 'manager', 'manager'],
    ['order.cancel', 'manager', 'manager'],
    ['cut-list.open-early', 'manager', 'manager'],
    ['order.read', 'manager designer mill', 'manager designer'],
    ['order.answer', 'manager designer mill', 'manager designer'],
    ['order.see-price', 'manager designer mill', 'manager designer'],
    ['cut-list.see-cost', 'manager designer', 'manager designer'],
    ['cut.record', 'manager designer bench', 'manager designer bench'],
    ['people.manage', 'manager', 'manager'],
    ['client.manage', 'manager', 'manager'],
    ['mill.manage', 'manager', 'manager'],
    ['settings.change', 'manager', 'manager'],
    ['post.read', 'manager', 'manager'],
  ]
  it.each(rules)('%s', (right, onOwn, onForeign) => {
    expect(holders(right, own)).toBe(onOwn)
    expect(holders(right, foreign)).toBe(onForeign)
  })

  it('never lets a curator approve what that very person put forward', () => {
    const curator = actor('curator', 'c1')
    expect(can(curator, 'issue.decide', { clientId: 'c1', putForwardById: 'somebody' })).toBe(true)
    expect(can(curator, 'issue.decide', { clientId: 'c1', putForwardById: curator.personId })).toBe(false)
  })

  it('adds up the rights of several memberships, each with its own client', () => {
    const both: Actor = {
      personId: 'p',
      name: 'both',
      memberships: [
        { role: 'curator', clientId: 'c1', millId: null },
        { role: 'curator', clientId: 'c3', millId: null },
      ],
    }
    expect(can(both, 'issue.read', { clientId: 'c3' })).toBe(true)
    expect(can(both, 'issue.read', { clientId: 'c2' })).toBe(false)
    expect(clientIdsOf(both)).toEqual(['c1', 'c3'])
  })
})

describe('fails closed', () => {
  it('gives nobody without a membership any right', () => {
    const nobody: Actor = { personId: 'n', name: 'nobody', memberships: [] }
    for (const right of RIGHTS) expect(can(nobody, right, own), right).toBe(false)
  })

  it('denies a right that hangs on a fact when the fact is not known', () => {
    expect(can(actor('curator', 'c1'), 'issue.read')).toBe(false)
    expect(can(actor('curator', null), 'issue.read', {})).toBe(false)
    expect(can(actor('mill', null, null), 'order.read', {})).toBe(false)
    expect(can(actor('curator', 'c1'), 'issue.decide', { clientId: 'c1' })).toBe(false)
  })

  it('counts curators and mills as outside the workshop', () => {
    expect(ROLES.filter((role) => isOfWorkshop(actor(role)))).toEqual(['manager', 'designer', 'bench'])
    expect(millIdsOf(actor('mill', null, 'm1'))).toEqual(['m1'])
    expect(millIdsOf(actor('manager', null, 'm1'))).toEqual([])
  })
})
