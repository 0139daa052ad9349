import { people } from './20261201-1000-people'
import { workshop } from './20261201-1010-workshop'
import { commissions } from './20261201-1020-commissions'
import { drafts } from './20261201-1030-drafts'
import { trail } from './20261201-1040-trail'
import { review } from './20261201-1050-review'
import { orders } from './20261201-1060-orders'
import { letters } from './20261201-1070-letters'
import { rack } from './20261201-1080-rack'
import { cutLists } from './20261201-1090-cut-lists'
import type { Migration } from './migration'

/** Every migration, in order. A list and not a folder, so that it survives being bundled. */
export const MIGRATIONS: readonly Migration[] = [
  people,
  workshop,
  commissions,
  drafts,
  trail,
  review,
  orders,
  letters,
  rack,
  cutLists,
]
