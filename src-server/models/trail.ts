import { Model } from 'sequelize'
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize'
import { digest, digestOrNone, document, instant, key, line, longText, ownKey, whole } from './columns'

/** One act on a commission. Each entry's hash takes in the one before, so that none can be changed or left out unseen. */
export class TrailEntry extends Model<InferAttributes<TrailEntry>, InferCreationAttributes<TrailEntry>> {
  declare id: CreationOptional<string>
  declare commissionId: string
  declare seq: number
  declare at: Date
  declare actorId: string
  /** The name at the time. */
  declare actorName: string
  declare act: string
  declare says: string
  declare document: unknown
  declare prevHash: string | null
  declare hash: string
}

export function bindTrail(sequelize: Sequelize): void {
  TrailEntry.init(
    {
      id: ownKey(),
      commissionId: key(),
      seq: whole(),
      at: instant(),
      actorId: key(),
      actorName: line(200),
      act: line(64),
      says: longText(),
      document: document(),
      prevHash: digestOrNone(),
      hash: digest(),
    },
    { sequelize, tableName: 'trail' },
  )
}
