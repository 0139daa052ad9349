import { RackPieceAnswer } from '@shared/contracts'
import type { OutputOf, RackMovementRequest, RackPieceRequest } from '@shared/contracts'
import { ask, send } from './request'

export const readRack = (signal?: AbortSignal) => ask(RackPieceAnswer.array(), ['rack'], { signal })
export const addRackPieces = (body: OutputOf<typeof RackPieceRequest>) =>
  send(RackPieceAnswer.array(), 'POST', ['rack'], { body })
export const moveRackPiece = (body: OutputOf<typeof RackMovementRequest>) =>
  send(RackPieceAnswer, 'POST', ['rack', 'movements'], { body })
