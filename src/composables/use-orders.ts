import { toValue } from 'vue'
import type { MaybeRefOrGetter } from 'vue'
import { readOrder, readOrders, readOrdersOf, recordOrderEvent } from '@/api/orders'
import { KEYS, keysTouchedBy } from './query-keys'
import { useAct } from './use-act'
import { useAsked } from './use-asked'
import type { AskedOptions } from './use-asked'

export { orderSheetAddress } from '@/api/orders'

type IdSource = MaybeRefOrGetter<string>

/** A letter goes out by itself: an order is looked at again while it is open on the screen. */
const LOOK_AGAIN_MS = 5_000

export const useOrders = (options: AskedOptions = {}) => useAsked(KEYS.orders, readOrders, options)
export const useOrdersOf = (commissionId: IdSource) =>
  useAsked(
    () => KEYS.ordersOf(toValue(commissionId)),
    (signal) => readOrdersOf(toValue(commissionId), signal),
  )
export const useOrder = (id: MaybeRefOrGetter<string | null>) =>
  useAsked(
    () => KEYS.order(toValue(id) ?? ''),
    (signal) => readOrder(toValue(id) ?? '', signal),
    { when: () => toValue(id) !== null, everyMs: LOOK_AGAIN_MS },
  )
export const useRecordOrderEvent = (id: IdSource) =>
  useAct(
    (input: Omit<Parameters<typeof recordOrderEvent>[1], 'operationId'>, operationId) =>
      recordOrderEvent(toValue(id), { ...input, operationId }),
    {
      changes: ({ commission }) => [
        ...keysTouchedBy(commission.id),
        KEYS.order(toValue(id)),
        KEYS.orders,
        KEYS.rack,
        KEYS.cutLists,
      ],
    },
  )
