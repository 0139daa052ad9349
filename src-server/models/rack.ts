import { Model } from 'sequelize'
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize'
import { digest, instant, key, keyOrNone, lengthMm, lengthMmOrNone, line, ownKey, word } from './columns'

/** Moulding that came together: of one shape, one timber, measured once. */
export class Batch extends Model<InferAttributes<Batch>, InferCreationAttributes<Batch>> {
  declare id: CreationOptional<string>
  /** Null: moulding that was in the workshop already. */
  declare orderId: string | null
  declare issueId: string
  declare shapeSha256: string
  declare species: string
  declare finish: string
  /** As measured on delivery; null: taken as drawn. */
  declare trueWidthMm: number | null
  declare trueRebateMm: number | null
  declare at: Date
}

/** One length or offcut on the rack. */
export class RackPiece extends Model<InferAttributes<RackPiece>, InferCreationAttributes<RackPiece>> {
  declare id: CreationOptional<string>
  declare code: string
  declare batchId: string
  declare lengthMm: number
  /** What must come off each end before anything of it is used: start and end. */
  declare trimStartMm: number
  declare trimEndMm: number
  declare state: 'on-rack' | 'reserved' | 'used' | 'scrapped'
  declare parentId: string | null
  /** The cut list that counts on it. */
  declare reservedById: string | null
  declare at: Date
}

/** What happened to a piece: nothing on the rack is ever simply gone. */
export class RackMovement extends Model<
  InferAttributes<RackMovement>,
  InferCreationAttributes<RackMovement>
> {
  declare id: CreationOptional<string>
  declare pieceId: string
  declare act: 'racked' | 'reserved' | 'released' | 'used' | 'scrapped' | 'corrected'
  declare lengthMm: number | null
  declare reason: string
  declare personId: string
  declare at: Date
}

export function bindRack(sequelize: Sequelize): void {
  Batch.init(
    {
      id: ownKey(),
      orderId: keyOrNone(),
      issueId: key(),
      shapeSha256: digest(),
      species: line(200),
      finish: line(200),
      trueWidthMm: lengthMmOrNone(),
      trueRebateMm: lengthMmOrNone(),
      at: instant(),
    },
    { sequelize, tableName: 'batch' },
  )
  RackPiece.init(
    {
      id: ownKey(),
      code: line(32),
      batchId: key(),
      lengthMm: lengthMm(),
      trimStartMm: lengthMm(),
      trimEndMm: lengthMm(),
      state: word(),
      parentId: keyOrNone(),
      reservedById: keyOrNone(),
      at: instant(),
    },
    { sequelize, tableName: 'rack_piece' },
  )
  RackMovement.init(
    {
      id: ownKey(),
      pieceId: key(),
      act: word(),
      lengthMm: lengthMmOrNone(),
      reason: line(5000),
      personId: key(),
      at: instant(),
    },
    { sequelize, tableName: 'rack_movement' },
  )
}
