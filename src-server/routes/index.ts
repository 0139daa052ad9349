import { COMMISSION_FILE_ROUTES } from './commission-files'
import { COMMISSION_ROUTES } from './commissions'
import { DRAFT_ROUTES } from './drafts'
import { HEALTH_ROUTES } from './health'
import { ISSUE_ROUTES } from './issues'
import { LENGTH_ROUTES } from './lengths'
import { ORDER_ROUTES } from './orders'
import { PEOPLE_ROUTES } from './people'
import { POST_ROUTES } from './post'
import { PHOTOGRAPH_ROUTES } from './photographs'
import type { Route } from './route'
import { SESSION_ROUTES } from './session'
import { WAITING_ROUTES } from './waiting'
import { WORKSHOP_ROUTES } from './workshop'

/** Every route of the server, so that tests can walk them. */
export const ROUTES: readonly Route[] = [
  ...HEALTH_ROUTES,
  ...SESSION_ROUTES,
  ...PEOPLE_ROUTES,
  ...WORKSHOP_ROUTES,
  ...COMMISSION_ROUTES,
  ...COMMISSION_FILE_ROUTES,
  ...PHOTOGRAPH_ROUTES,
  ...DRAFT_ROUTES,
  ...ISSUE_ROUTES,
  ...ORDER_ROUTES,
  ...LENGTH_ROUTES,
  ...POST_ROUTES,
  ...WAITING_ROUTES,
]
