import { addRackPieces, moveRackPiece, readRack } from '@/api/rack'
import { KEYS } from './query-keys'
import { useAct } from './use-act'
import { useAsked } from './use-asked'

export const useRack = () => useAsked(KEYS.rack, readRack)
export const useAddRackPieces = () =>
  useAct(
    (input: Omit<Parameters<typeof addRackPieces>[0], 'operationId'>, operationId) =>
      addRackPieces({ ...input, operationId }),
    { changes: () => [KEYS.rack, KEYS.cutLists, ['cut-list'], ['commission']] },
  )
export const useMoveRackPiece = () =>
  useAct(
    (input: Omit<Parameters<typeof moveRackPiece>[0], 'operationId'>, operationId) =>
      moveRackPiece({ ...input, operationId }),
    { changes: () => [KEYS.rack, KEYS.cutLists, ['cut-list'], ['commission']] },
  )
