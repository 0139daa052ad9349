import { HEALTH_ROUTES } from './health'
import { PEOPLE_ROUTES } from './people'
import type { Route } from './route'
import { SESSION_ROUTES } from './session'
import { WORKSHOP_ROUTES } from './workshop'

/** Every route of the server, so that tests can walk them. */
export const ROUTES: readonly Route[] = [
  ...HEALTH_ROUTES,
  ...SESSION_ROUTES,
  ...PEOPLE_ROUTES,
  ...WORKSHOP_ROUTES,
]
