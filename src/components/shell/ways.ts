import type { RoleOfPerson } from '@shared/access'

export interface Way {
  readonly label: string
  /** Name of the route. */
  readonly to: string
}

const WAYS = {
  waiting: { label: 'Waiting', to: 'waiting' },
  commissions: { label: 'Commissions', to: 'commissions' },
  orders: { label: 'Knife orders', to: 'orders' },
  bench: { label: 'Bench', to: 'cut-lists' },
  rack: { label: 'Rack', to: 'rack' },
  post: { label: 'Post', to: 'post' },
  people: { label: 'People', to: 'people' },
  clients: { label: 'Clients', to: 'clients' },
  mills: { label: 'Mills', to: 'mills' },
  settings: { label: 'Settings', to: 'settings' },
} as const satisfies Record<string, Way>

type WayName = keyof typeof WAYS

/** What each role goes to in its daily work. */
const WAYS_OF = {
  manager: ['waiting', 'commissions', 'orders', 'rack', 'post', 'people', 'clients', 'mills', 'settings'],
  designer: ['waiting', 'commissions', 'orders', 'rack', 'mills'],
  curator: ['waiting', 'commissions'],
  mill: ['waiting', 'orders'],
  bench: ['waiting', 'bench', 'rack'],
} as const satisfies Record<RoleOfPerson, readonly WayName[]>

/** The ways of a person of several roles: each once, in the one order of all. */
export function waysOf(roles: readonly RoleOfPerson[]): readonly Way[] {
  const names = new Set<string>(roles.flatMap((role) => [...WAYS_OF[role]]))
  return Object.entries(WAYS).flatMap(([name, way]) => (names.has(name) ? [way] : []))
}
