import { Model } from 'sequelize'
import type {
  CreationOptional,
  InferAttributes,
  InferCreationAttributes,
  NonAttribute,
  Sequelize,
} from 'sequelize'
import type { Reading as ReadingDocument } from '@shared/contracts'
import type { OpenState } from './commission'
import { document, documentOrNone, editVersion, instant, key, line, ownKey, whole, word } from './columns'
import { StoredFile } from './file'

export class Photograph extends Model<InferAttributes<Photograph>, InferCreationAttributes<Photograph>> {
  declare id: CreationOptional<string>
  declare commissionId: string
  /** p1, p2 …: the name in the commission file. */
  declare key: string
  declare fileId: string
  declare title: string
  declare source: string
  declare citation: string
  /** Pixels of the upright original. */
  declare width: number
  declare height: number
  declare state: CreationOptional<OpenState>
  declare version: CreationOptional<number>
  declare byId: string
  declare createdAt: Date
  declare file?: NonAttribute<StoredFile>
}

/** What was read off a photograph: numbered, never changed in place. */
export class Reading extends Model<InferAttributes<Reading>, InferCreationAttributes<Reading>> {
  declare id: CreationOptional<string>
  declare photographId: string
  declare no: number
  declare document: ReadingDocument
  declare solved: CreationOptional<unknown>
  declare byId: string
  declare at: Date
}

export function bindPhotographs(sequelize: Sequelize): void {
  Photograph.init(
    {
      id: ownKey(),
      commissionId: key(),
      key: line(32),
      fileId: key(),
      title: line(200),
      source: line(500),
      citation: line(500),
      width: whole(),
      height: whole(),
      state: { ...word(), defaultValue: 'open' },
      version: editVersion(),
      byId: key(),
      createdAt: instant(),
    },
    { sequelize, tableName: 'photograph', version: true },
  )
  Reading.init(
    {
      id: ownKey(),
      photographId: key(),
      no: whole(),
      document: document(),
      solved: documentOrNone(),
      byId: key(),
      at: instant(),
    },
    { sequelize, tableName: 'reading' },
  )
  Photograph.belongsTo(StoredFile, { as: 'file', foreignKey: 'fileId', constraints: false })
}
