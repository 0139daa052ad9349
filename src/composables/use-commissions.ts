import { toValue } from 'vue'
import type { MaybeRefOrGetter } from 'vue'
import {
  addCommission,
  changeCommission,
  importCommission,
  readCommission,
  readCommissions,
  readTrail,
} from '@/api/commissions'
import type { CommissionQuery } from '@/api/commissions'
import { KEYS, keysTouchedBy } from './query-keys'
import { useAct } from './use-act'
import { useAsked } from './use-asked'
import type { AskedOptions } from './use-asked'

export { commissionFileAddress } from '@/api/commissions'
export type { CommissionQuery } from '@/api/commissions'

type IdSource = MaybeRefOrGetter<string>
type Without<Fn extends (...given: never[]) => unknown, At extends number> = Omit<
  Parameters<Fn>[At],
  'operationId'
>

export const useCommissions = (query: MaybeRefOrGetter<CommissionQuery>, options: AskedOptions = {}) =>
  useAsked(
    () => [...KEYS.commissions, toValue(query)],
    (signal) => readCommissions(toValue(query), signal),
    options,
  )
export const useCommission = (id: IdSource) =>
  useAsked(
    () => KEYS.commission(toValue(id)),
    (signal) => readCommission(toValue(id), signal),
  )
export const useTrail = (id: IdSource) =>
  useAsked(
    () => KEYS.trail(toValue(id)),
    (signal) => readTrail(toValue(id), signal),
  )

export const useAddCommission = () =>
  useAct((input: Without<typeof addCommission, 0>, operationId) => addCommission({ ...input, operationId }), {
    changes: ({ id }) => keysTouchedBy(id),
  })
export const useChangeCommission = (id: IdSource) =>
  useAct((input: Parameters<typeof changeCommission>[1]) => changeCommission(toValue(id), input), {
    changes: () => keysTouchedBy(toValue(id)),
  })
export const useImportCommission = () =>
  useAct(
    (input: Without<typeof importCommission, 0>, operationId) => importCommission({ ...input, operationId }),
    { changes: ({ commissionId }) => keysTouchedBy(commissionId) },
  )
