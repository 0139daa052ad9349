import { Model } from 'sequelize'
import type {
  CreationOptional,
  InferAttributes,
  InferCreationAttributes,
  NonAttribute,
  Sequelize,
} from 'sequelize'
import type { Measurement as MeasurementDocument } from '@shared/contracts'
import { dayOrNone, document, editVersion, instant, key, line, ownKey, whole, word } from './columns'
import { Client } from './person'

export type OpenState = 'open' | 'archived'

export class Commission extends Model<InferAttributes<Commission>, InferCreationAttributes<Commission>> {
  declare id: CreationOptional<string>
  declare number: string
  declare clientId: string
  declare title: string
  declare artist: string
  declare accession: string
  /** As 2026-12-01. */
  declare due: string | null
  declare state: CreationOptional<OpenState>
  declare version: CreationOptional<number>
  declare createdById: string
  declare createdAt: Date
  declare client?: NonAttribute<Client>
}

export class Picture extends Model<InferAttributes<Picture>, InferCreationAttributes<Picture>> {
  declare id: CreationOptional<string>
  declare commissionId: string
  declare position: number
  declare name: string
  declare copies: number
  declare state: CreationOptional<OpenState>
  declare version: CreationOptional<number>
  declare createdAt: Date
}

/** Numbered for each picture, never changed in place. */
export class Measurement extends Model<InferAttributes<Measurement>, InferCreationAttributes<Measurement>> {
  declare id: CreationOptional<string>
  declare pictureId: string
  declare no: number
  declare document: MeasurementDocument
  declare byId: string
  declare at: Date
}

export function bindCommissions(sequelize: Sequelize): void {
  const state = { ...word(), defaultValue: 'open' }
  Commission.init(
    {
      id: ownKey(),
      number: line(32),
      clientId: key(),
      title: line(200),
      artist: line(200),
      accession: line(100),
      due: dayOrNone(),
      state,
      version: editVersion(),
      createdById: key(),
      createdAt: instant(),
    },
    { sequelize, tableName: 'commission', version: true },
  )
  Picture.init(
    {
      id: ownKey(),
      commissionId: key(),
      position: whole(),
      name: line(200),
      copies: whole(),
      state,
      version: editVersion(),
      createdAt: instant(),
    },
    { sequelize, tableName: 'picture', version: true },
  )
  Measurement.init(
    { id: ownKey(), pictureId: key(), no: whole(), document: document(), byId: key(), at: instant() },
    { sequelize, tableName: 'measurement' },
  )
  Commission.belongsTo(Client, { as: 'client', foreignKey: 'clientId', constraints: false })
}
