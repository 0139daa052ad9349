import type { RoleName } from '@shared/contracts'
import type { Commission } from '@server/models/commission'
import type { Mill } from '@server/models/person'
import { aCommission } from '../../helpers/factories/commissions'
import { aClient, aMill } from '../../helpers/factories/people'

/**
 * The world that the walk moves in: the curator who asks belongs to `ownClientId`, the mill's person to `ownMillId`.
 * Whatever hangs on the other two is foreign to them.
 */
export interface World {
  readonly ownClientId: string
  readonly foreignClientId: string
  readonly ownMillId: string
  readonly foreignMillId: string
}

export type Side = 'own' | 'foreign'

/** One request: where to, and with what. Made anew for each role, so that what one changed does not stand in another's way. */
export interface Target {
  readonly path: string
  readonly body?: object
  /** For a multipart route. */
  readonly file?: { readonly bytes: Buffer; readonly name: string }
}

/** `done`: 2xx. A number is the status of a refusal. */
export type Outcome = 'done' | 403 | 404

export type Outcomes = Readonly<Record<RoleName, Outcome>>

/**
 * What each role gets from a route, written down by hand from the product's rules and not worked out from the table
 * of rights, which it checks. `foreign` is absent where the route has no own and foreign thing.
 */
export interface RightsFixture {
  /** As in ROUTES: `get /commissions/:id`. */
  readonly route: string
  readonly own: Outcomes
  readonly foreign?: Outcomes
  /** The session is of no use afterwards. */
  readonly endsSession?: true
  target(world: World, side: Side): Promise<Target>
}

export const clientOn = (world: World, side: Side) =>
  side === 'own' ? world.ownClientId : world.foreignClientId
export const millOn = (world: World, side: Side) => (side === 'own' ? world.ownMillId : world.foreignMillId)

export const commissionOn = (world: World, side: Side): Promise<Commission> =>
  aCommission({ clientId: clientOn(world, side) })

export async function aWorld(): Promise<World> {
  const clients = [await aClient(), await aClient()]
  const mills: Mill[] = [await aMill(), await aMill()]
  return {
    ownClientId: clients[0]?.id ?? '',
    foreignClientId: clients[1]?.id ?? '',
    ownMillId: mills[0]?.id ?? '',
    foreignMillId: mills[1]?.id ?? '',
  }
}

/** Some rows of the rules, named. */
const of = (
  manager: Outcome,
  designer: Outcome,
  curator: Outcome,
  mill: Outcome,
  bench: Outcome,
): Outcomes => ({ manager, designer, curator, mill, bench })

export const OUTCOMES = {
  everyone: of('done', 'done', 'done', 'done', 'done'),
  /** Managers; to everybody else it is not there. */
  managersAlone: of('done', 404, 404, 404, 404),
  /** Managers change it, designers see it. */
  managersShownToDesigners: of('done', 403, 404, 404, 404),
  /** Managers change it, the workshop sees it. */
  managersShownToWorkshop: of('done', 403, 404, 404, 403),
  /** Managers change it, everybody sees it. */
  managersShownToAll: of('done', 403, 403, 403, 403),
  staff: of('done', 'done', 404, 404, 404),
  workshop: of('done', 'done', 404, 404, 'done'),
  /** Managers and designers do it; the client's curators and the bench may only look. */
  staffShownToReaders: of('done', 'done', 403, 404, 403),
  /** As above, of another client: to its curators it is not there. */
  staffShownToWorkshop: of('done', 'done', 404, 404, 403),
  readers: of('done', 'done', 'done', 404, 'done'),
  readersOfOtherClient: of('done', 'done', 404, 404, 'done'),
} as const satisfies Record<string, Outcomes>
