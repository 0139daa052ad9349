/** Names of everything that is asked of the server; what changes a thing makes these stale by their beginnings. */
export const KEYS = {
  waiting: ['waiting'],
  people: ['people'],
  clients: ['clients'],
  mills: ['mills'],
  mill: (id: string) => ['mills', 'one', id],
  millCards: (id: string) => ['mills', 'one', id, 'cards'],
  saws: ['saws'],
  settings: ['settings'],
  commissions: ['commissions'],
  commission: (id: string) => ['commission', id],
  trail: (id: string) => ['commission', id, 'trail'],
  draft: (id: string) => ['commission', id, 'draft'],
  issuesOf: (id: string) => ['commission', id, 'issues'],
  ordersOf: (id: string) => ['commission', id, 'orders'],
  rails: (id: string) => ['commission', id, 'rails'],
  measurements: (pictureId: string) => ['measurements', pictureId],
  issue: (id: string) => ['issue', id],
  difference: (id: string) => ['issue', id, 'difference'],
  orders: ['orders'],
  order: (id: string) => ['order', id],
  link: (token: string) => ['link', token],
  rack: ['rack'],
  cutLists: ['cut-lists'],
  cutList: (id: string) => ['cut-list', id],
  letters: ['letters'],
  letter: (id: string) => ['letters', 'one', id],
} as const

export type Key = readonly unknown[]

/** What any step of a commission may move: the commission whole, the lists it stands in, and what waits for people. */
export const keysTouchedBy = (commissionId: string): readonly Key[] => [
  KEYS.commission(commissionId),
  KEYS.commissions,
  KEYS.waiting,
]
