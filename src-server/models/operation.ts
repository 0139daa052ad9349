import { Model } from 'sequelize'
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize'
import {
  digest,
  document,
  documentOrNone,
  instant,
  instantOrNone,
  key,
  keyOrNone,
  longTextOrNone,
  ownKey,
  whole,
  word,
} from './columns'

/** A write that was asked for under a key made by whoever asked: asked again, it is not done again. */
export class Operation extends Model<InferAttributes<Operation>, InferCreationAttributes<Operation>> {
  declare operationId: string
  declare actorId: string
  declare requestSha256: string
  /** What the first gave. */
  declare answer: unknown
  declare at: Date
}

/** Work to be done by whichever process claims it first. */
export class Job extends Model<InferAttributes<Job>, InferCreationAttributes<Job>> {
  declare id: CreationOptional<string>
  declare kind: string
  declare document: unknown
  declare state: CreationOptional<'queued' | 'done' | 'failed'>
  declare progress: CreationOptional<number>
  declare says: CreationOptional<string | null>
  declare due: Date
  declare claimedBy: CreationOptional<string | null>
  declare claimedUntil: CreationOptional<Date | null>
  declare tries: CreationOptional<number>
  declare createdAt: Date
}

export function bindOperations(sequelize: Sequelize): void {
  Operation.init(
    {
      operationId: { ...key(), primaryKey: true },
      actorId: key(),
      requestSha256: digest(),
      answer: documentOrNone(),
      at: instant(),
    },
    { sequelize, tableName: 'operation' },
  )
  Job.init(
    {
      id: ownKey(),
      kind: word(),
      document: document(),
      state: { ...word(), defaultValue: 'queued' },
      progress: { ...whole(), defaultValue: 0 },
      says: longTextOrNone(),
      due: instant(),
      claimedBy: keyOrNone(),
      claimedUntil: instantOrNone(),
      tries: { ...whole(), defaultValue: 0 },
      createdAt: instant(),
    },
    { sequelize, tableName: 'job' },
  )
}
