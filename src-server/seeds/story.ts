import type { DemoActors } from './people'
import type { DemoWorkshop } from './workshop'

/** Who and what the demo's commissions are told with. */
export interface Story extends DemoWorkshop {
  readonly people: DemoActors
}
