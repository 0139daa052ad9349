import { HEALTH_ROUTES } from './health'
import type { Route } from './route'

/** Every route of the server, so that tests can walk them. */
export const ROUTES: readonly Route[] = [...HEALTH_ROUTES]
