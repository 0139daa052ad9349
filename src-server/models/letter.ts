import { Model } from 'sequelize'
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize'
import { instant, instantOrNone, key, keyOrNone, line, longText, ownKey, whole, word } from './columns'

/** An e-mail: a row written in the transaction that causes it, sent afterwards by a worker. */
export class Letter extends Model<InferAttributes<Letter>, InferCreationAttributes<Letter>> {
  declare id: CreationOptional<string>
  /** Fixed when it is queued, so that a letter sent twice is known for the same. */
  declare messageId: string
  declare kind: string
  declare aboutType: 'order' | 'issue'
  declare aboutId: string
  declare commissionId: string
  declare toAddress: string
  declare subject: string
  declare text: string
  declare html: string
  /** The whole message as it goes out, byte for byte. */
  declare rawFileId: string
  declare state: 'queued' | 'sending' | 'sent' | 'failed'
  declare dueAt: Date
  declare claimedBy: CreationOptional<string | null>
  declare claimedUntil: CreationOptional<Date | null>
  declare tries: CreationOptional<number>
  declare queuedAt: Date
  declare sentAt: CreationOptional<Date | null>
}

/** One try to send a letter and what came of it. */
export class LetterTry extends Model<InferAttributes<LetterTry>, InferCreationAttributes<LetterTry>> {
  declare id: CreationOptional<string>
  declare letterId: string
  declare no: number
  declare at: Date
  declare outcome: string
}

export function bindLetters(sequelize: Sequelize): void {
  Letter.init(
    {
      id: ownKey(),
      messageId: line(200),
      kind: word(),
      aboutType: word(),
      aboutId: key(),
      commissionId: key(),
      toAddress: line(254),
      subject: line(300),
      text: longText(),
      html: longText(),
      rawFileId: key(),
      state: word(),
      dueAt: instant(),
      claimedBy: keyOrNone(),
      claimedUntil: instantOrNone(),
      tries: { ...whole(), defaultValue: 0 },
      queuedAt: instant(),
      sentAt: instantOrNone(),
    },
    { sequelize, tableName: 'letter' },
  )
  LetterTry.init(
    { id: ownKey(), letterId: key(), no: whole(), at: instant(), outcome: line(1000) },
    { sequelize, tableName: 'letter_try' },
  )
}
