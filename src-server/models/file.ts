import { Model } from 'sequelize'
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize'
import { bytes, digest, instant, key, line, ownKey, word } from './columns'

/** A file of the store, named by its SHA-256, never changed. */
export class StoredFile extends Model<InferAttributes<StoredFile>, InferCreationAttributes<StoredFile>> {
  declare id: CreationOptional<string>
  declare sha256: string
  declare bytes: number
  declare type: string
  declare at: Date
}

/** A smaller copy of a file, made to be shown; it is itself a file of the store. */
export class FileCopy extends Model<InferAttributes<FileCopy>, InferCreationAttributes<FileCopy>> {
  declare id: CreationOptional<string>
  declare fileId: string
  declare kind: 'screen' | 'thumb'
  declare copyId: string
}

export function bindFiles(sequelize: Sequelize): void {
  StoredFile.init(
    { id: ownKey(), sha256: digest(), bytes: bytes(), type: line(100), at: instant() },
    { sequelize, tableName: 'file' },
  )
  FileCopy.init(
    { id: ownKey(), fileId: key(), kind: word(), copyId: key() },
    { sequelize, tableName: 'file_copy' },
  )
}
