/**
 * Who may do what, on plain facts, asked by the server (which decides) and the client (which only hides).
 * A right is granted by a membership; a row rule narrows it to the actor's own client or mill.
 */

export type RoleOfPerson = 'manager' | 'designer' | 'curator' | 'mill' | 'bench'

/** A person acting, or a named job of the system acting for the workshop. Never null. */
export interface Actor {
  readonly personId: string
  readonly name: string
  readonly memberships: readonly {
    readonly role: RoleOfPerson
    readonly clientId: string | null
    readonly millId: string | null
  }[]
}

/** What a row rule may look at; a fact that does not apply is left out, and a rule that needs it then says no. */
export interface Facts {
  /** The client whose commission it is. */
  readonly clientId?: string
  /** The mill that an order is addressed to. */
  readonly millId?: string
  /** Who put the issue forward. */
  readonly putForwardById?: string
}

type Rule = 'any' | 'own-client' | 'own-client-not-own-work' | 'own-mill'
type Grants = Partial<Record<RoleOfPerson, Rule>>

const manager: Grants = { manager: 'any' }
const staff: Grants = { manager: 'any', designer: 'any' }
const workshop: Grants = { manager: 'any', designer: 'any', bench: 'any' }
const everyone: Grants = { ...workshop, curator: 'any', mill: 'any' }
const readers: Grants = { ...workshop, curator: 'own-client' }

/** The one table of rights (product rules: who may read, draw, approve, order, open, cut, see prices). */
const GRANTS = {
  'session.own': everyone,
  'waiting.read': everyone,
  'settings.read': everyone,
  'settings.change': manager,
  'people.manage': manager,
  'client.read': staff,
  'client.manage': manager,
  'mill.read': staff,
  'mill.manage': manager,
  'saw.read': workshop,
  'saw.manage': manager,
  'post.read': manager,
  'post.send-again': manager,

  /** Lists are filtered to what each person may see. */
  'commission.list': { ...workshop, curator: 'any' },
  'commission.read': readers,
  'commission.manage': staff,
  'picture.manage': staff,
  'photograph.read': readers,
  'photograph.manage': staff,
  'draft.read': staff,
  'draft.edit': staff,
  'trail.read': staff,
  'file.export': staff,
  'file.import': staff,

  'issue.put-forward': staff,
  'issue.read': readers,
  'remark.add': { ...staff, curator: 'own-client' },
  'issue.decide': { curator: 'own-client-not-own-work' },

  'order.list': { ...staff, mill: 'any' },
  'order.read': { ...staff, mill: 'own-mill' },
  'order.send': staff,
  /** Acknowledge, quote, report, deliver: the mill, or staff on its behalf with a note. */
  'order.answer': { ...staff, mill: 'own-mill' },
  'order.accept-price': manager,
  'order.cancel': manager,
  'order.hold': staff,
  'order.pass-over': staff,
  'first-off.decide': staff,
  'order.close': staff,
  'order.see-price': { ...staff, mill: 'own-mill' },

  'rack.read': workshop,
  'rack.change': staff,
  'rails.read': workshop,
  'plan.make': staff,
  'cut-list.list': workshop,
  'cut-list.read': workshop,
  'cut-list.open': staff,
  /** Before the first-off is accepted only a manager opens a list, with a reason. */
  'cut-list.open-early': manager,
  'cut.record': workshop,
  'cut-list.see-cost': staff,
} satisfies Record<string, Grants>

export type Right = keyof typeof GRANTS

export const RIGHTS = Object.keys(GRANTS) as readonly Right[]

/** Whether the actor may, given what is known of the row. Fails closed: no membership, no fact, no right. */
export function can(actor: Actor, right: Right, facts: Facts = {}): boolean {
  const grants: Grants = GRANTS[right]
  return actor.memberships.some((membership) => {
    const rule = grants[membership.role]
    return rule !== undefined && ruleHolds(rule, actor, membership, facts)
  })
}

/** Whether any membership of the actor bears the right at all, for some row or other: what a door asks before it opens. */
export function isEverGranted(actor: Actor, right: Right): boolean {
  const grants: Grants = GRANTS[right]
  return actor.memberships.some(({ role }) => grants[role] !== undefined)
}

function ruleHolds(
  rule: Rule,
  actor: Actor,
  membership: Actor['memberships'][number],
  facts: Facts,
): boolean {
  switch (rule) {
    case 'any':
      return true
    case 'own-client':
      return facts.clientId !== undefined && membership.clientId === facts.clientId
    case 'own-client-not-own-work':
      return (
        facts.clientId !== undefined &&
        membership.clientId === facts.clientId &&
        facts.putForwardById !== undefined &&
        facts.putForwardById !== actor.personId
      )
    case 'own-mill':
      return facts.millId !== undefined && membership.millId === facts.millId
  }
}

/** The clients a person reaches as a curator, and the mills as a mill: what lists filter by. */
export function clientIdsOf(actor: Actor): readonly string[] {
  return actor.memberships.flatMap((membership) =>
    membership.role === 'curator' && membership.clientId !== null ? [membership.clientId] : [],
  )
}
export function millIdsOf(actor: Actor): readonly string[] {
  return actor.memberships.flatMap((membership) =>
    membership.role === 'mill' && membership.millId !== null ? [membership.millId] : [],
  )
}
/** Whether the person belongs to the workshop itself. */
export function isOfWorkshop(actor: Actor): boolean {
  return actor.memberships.some(({ role }) => role === 'manager' || role === 'designer' || role === 'bench')
}
