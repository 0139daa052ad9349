import { can } from '@shared/access'
import type { Actor } from '@shared/access'
import { invalid } from '@shared/contracts'
import type { OrderEventRequest, OutputOf } from '@shared/contracts'
import type { Fault } from '@shared/failure'
import { onceOnly } from './operation'
import { RIGHT_OF_EVENT, takeOrderStep } from './order-course'
import { recordDelivery } from './record-delivery'
import { requireOrder } from './require-order'
import { enterTrail } from './trail'
import { inTransaction } from './transaction'

type Request = OutputOf<typeof OrderEventRequest>

const NEEDS_REASON: readonly Request['event'][] = [
  'pass-over-quote',
  'pass-over-first-off',
  'refuse-first-off',
  'hold',
  'cancel',
]
const DELIVERIES: readonly Request['event'][] = ['deliver-part', 'deliver-rest']

/** Records a step of an order: by the mill itself, or by staff, who say in a note how they know when it is the mill's to say. */
export const recordOrderEvent = (actor: Actor, orderId: string, request: Request): Promise<string> =>
  inTransaction(async (tx) => {
    const { event, operationId, ...said } = request
    const right = RIGHT_OF_EVENT[event] ?? 'order.answer'
    const { order, commission } = await requireOrder(orderId, { actor, right, tx, lock: true })
    const isMill = actor.memberships.some(({ role, millId }) => role === 'mill' && millId === order.millId)
    const onBehalfOfMill = right === 'order.answer' && !isMill && can(actor, 'order.send')
    refuseFaults(faultsOf(request, onBehalfOfMill))
    return onceOnly(
      tx,
      { operationId, actor, request: { what: 'order-event', orderId, event, ...said } },
      async () => {
        await takeOrderStep(tx, order, {
          event,
          actor,
          onBehalfOfMill,
          note: said.note,
          price: said.price,
          promised: said.promised,
        })
        if (said.batch !== null) await recordDelivery(tx, { order, batch: said.batch, actor })
        await enterTrail(tx, {
          commissionId: commission.id,
          actor,
          act: `order-${event}`,
          says: `${order.number}: ${event.replaceAll('-', ' ')}${onBehalfOfMill ? ", on the mill's behalf" : ''}`,
          document: {
            orderId,
            event,
            note: said.note,
            price: said.price,
            promised: said.promised,
            state: order.state,
          },
        })
        return orderId
      },
    )
  })

function faultsOf({ event, note, price, batch }: Request, onBehalfOfMill: boolean): Fault[] {
  const faults: Fault[] = []
  const say = (path: string, code: string, says: string) => faults.push({ path, code, says })
  if (note === '' && NEEDS_REASON.includes(event)) say('/note', 'missing', 'is empty; say why.')
  else if (note === '' && onBehalfOfMill)
    say('/note', 'missing', "is empty; say how the mill's word reached you.")
  if (event === 'quote' && price === null)
    say('/price', 'missing', 'is missing; a quote names a price, such as 240.00.')
  if (event !== 'quote' && price !== null)
    say('/price', 'not-wanted', 'belongs to a quote alone; leave it out.')
  if (DELIVERIES.includes(event) && batch === null) {
    say(
      '/batch',
      'missing',
      'is missing; a delivery says its lengths and its true width and rebate as measured.',
    )
  }
  if (!DELIVERIES.includes(event) && batch !== null)
    say('/batch', 'not-wanted', 'belongs to a delivery alone; leave it out.')
  return faults
}

function refuseFaults(faults: readonly Fault[]): void {
  if (faults.length > 0) throw invalid(faults)
}
