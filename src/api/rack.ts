import { Done, RackAnswer } from '@shared/contracts'
import type { OutputOf, RackMovementRequest, RackPieceRequest } from '@shared/contracts'
import { ask, send } from './request'

export const readRack = (signal?: AbortSignal) => ask(RackAnswer, ['rack'], { signal })
export const addRackPieces = (body: OutputOf<typeof RackPieceRequest>) =>
  send(Done, 'POST', ['rack'], { body })
export const moveRackPiece = (body: OutputOf<typeof RackMovementRequest>) =>
  send(Done, 'POST', ['rack', 'movements'], { body })
