import { COMMISSION_FIXTURES } from './commission-fixtures'
import type { RightsFixture } from './fixture'
import { LENGTH_FIXTURES } from './length-fixtures'
import { ORDER_FIXTURES } from './order-fixtures'
import { PEOPLE_FIXTURES } from './people-fixtures'
import { REVIEW_FIXTURES } from './review-fixtures'

/** A fixture for every route that needs a right. */
export const RIGHTS_FIXTURES: readonly RightsFixture[] = [
  ...PEOPLE_FIXTURES,
  ...COMMISSION_FIXTURES,
  ...REVIEW_FIXTURES,
  ...ORDER_FIXTURES,
  ...LENGTH_FIXTURES,
]

/** Doors open to whoever comes, each with the reason. */
export const PUBLIC_ROUTES: Readonly<Record<string, string>> = {
  'get /health': 'says only that the process runs',
  'get /ready': 'says only that the process can work',
  'post /session': 'signing in',
  'post /first-manager': 'needs the one-time token of an empty installation',
  'get /links/:token': 'needs the secret that a letter carried; changes nothing',
  'post /links/:token/acknowledge': 'needs the secret that a letter carried, once',
}
