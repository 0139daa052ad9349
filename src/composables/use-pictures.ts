import { toValue } from 'vue'
import type { MaybeRefOrGetter } from 'vue'
import type { Measurement } from '@shared/contracts'
import { addMeasurement, addPicture, changePicture, readMeasurements } from '@/api/pictures'
import { KEYS, keysTouchedBy } from './query-keys'
import { useAct } from './use-act'
import { useAsked } from './use-asked'

type IdSource = MaybeRefOrGetter<string>

/** All measurements of a picture, each a numbered version. */
export const useMeasurements = (pictureId: IdSource) =>
  useAsked(
    () => KEYS.measurements(toValue(pictureId)),
    (signal) => readMeasurements(toValue(pictureId), signal),
  )
export const useAddPicture = (commissionId: IdSource) =>
  useAct(
    (input: { readonly name: string; readonly copies: number }, operationId) =>
      addPicture(toValue(commissionId), { ...input, operationId }),
    { changes: () => keysTouchedBy(toValue(commissionId)) },
  )
export const useChangePicture = (commissionId: IdSource) =>
  useAct(
    ({ id, ...change }: { readonly id: string } & Parameters<typeof changePicture>[1]) =>
      changePicture(id, change),
    { changes: () => keysTouchedBy(toValue(commissionId)) },
  )
export const useAddMeasurement = (commissionId: IdSource) =>
  useAct(
    ({ pictureId, document }: { readonly pictureId: string; readonly document: Measurement }, operationId) =>
      addMeasurement(pictureId, { document, operationId }),
    {
      changes: (_, { pictureId }) => [...keysTouchedBy(toValue(commissionId)), KEYS.measurements(pictureId)],
    },
  )
