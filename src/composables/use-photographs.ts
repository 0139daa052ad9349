import { toValue } from 'vue'
import type { MaybeRefOrGetter } from 'vue'
import type { Reading } from '@shared/contracts'
import { addPhotograph, addReading, changePhotograph } from '@/api/photographs'
import { keysTouchedBy } from './query-keys'
import { useAct } from './use-act'

export { originalAddress, photographAddress } from '@/api/photographs'

type IdSource = MaybeRefOrGetter<string>
type NewPhotograph = { readonly file: File } & Omit<Parameters<typeof addPhotograph>[2], 'operationId'>

export const useAddPhotograph = (commissionId: IdSource) =>
  useAct(
    ({ file, ...about }: NewPhotograph, operationId) =>
      addPhotograph(toValue(commissionId), file, { ...about, operationId }),
    { changes: () => keysTouchedBy(toValue(commissionId)) },
  )
export const useChangePhotograph = (commissionId: IdSource) =>
  useAct(
    ({ id, ...change }: { readonly id: string } & Parameters<typeof changePhotograph>[1]) =>
      changePhotograph(id, change),
    { changes: () => keysTouchedBy(toValue(commissionId)) },
  )
export const useAddReading = (commissionId: IdSource) =>
  useAct(
    (
      { photographId, document }: { readonly photographId: string; readonly document: Reading },
      operationId,
    ) => addReading(photographId, { document, operationId }),
    { changes: () => keysTouchedBy(toValue(commissionId)) },
  )
