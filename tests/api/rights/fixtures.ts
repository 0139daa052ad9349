import { COMMISSION_FIXTURES } from './commission-fixtures'
import type { RightsFixture } from './fixture'
import { PEOPLE_FIXTURES } from './people-fixtures'

/** A fixture for every route that needs a right. */
export const RIGHTS_FIXTURES: readonly RightsFixture[] = [...PEOPLE_FIXTURES, ...COMMISSION_FIXTURES]

/** Doors open to whoever comes, each with the reason. */
export const PUBLIC_ROUTES: Readonly<Record<string, string>> = {
  'get /health': 'says only that the process runs',
  'get /ready': 'says only that the process can work',
  'post /session': 'signing in',
  'post /first-manager': 'needs the one-time token of an empty installation',
}
