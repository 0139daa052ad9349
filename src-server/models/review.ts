import { Model } from 'sequelize'
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize'
import type { Evidence } from '@shared/contracts'
import type { IssueStateName } from '@shared/course'
import {
  digest,
  document,
  editVersion,
  instant,
  key,
  lengthMm,
  line,
  longText,
  ownKey,
  whole,
  word,
} from './columns'

/** A frozen state of the section. Only `state` ever changes, by the course in shared/course. */
export class Issue extends Model<InferAttributes<Issue>, InferCreationAttributes<Issue>> {
  declare id: CreationOptional<string>
  declare commissionId: string
  /** From 0; the letter follows from it. */
  declare no: number
  declare letter: string
  declare state: IssueStateName
  declare note: string
  /** RFC 8785 canonical JSON of {listel, section}: the very text that the hash is of. */
  declare canonicalText: string
  declare sha256: string
  declare shapeSha256: string
  declare evidence: Evidence
  declare evidenceSha256: string
  declare putForwardById: string
  declare putForwardByName: string
  declare at: Date
}

export class Remark extends Model<InferAttributes<Remark>, InferCreationAttributes<Remark>> {
  declare id: CreationOptional<string>
  declare issueId: string
  declare no: number
  declare x: number
  declare y: number
  declare state: CreationOptional<'open' | 'answered' | 'settled'>
  declare version: CreationOptional<number>
}

export class RemarkEntry extends Model<InferAttributes<RemarkEntry>, InferCreationAttributes<RemarkEntry>> {
  declare id: CreationOptional<string>
  declare remarkId: string
  declare authorId: string
  declare authorName: string
  declare text: string
  declare at: Date
}

/** An approval, a return or a withdrawal, with the name that was typed and the hash that was seen. */
export class Decision extends Model<InferAttributes<Decision>, InferCreationAttributes<Decision>> {
  declare id: CreationOptional<string>
  declare issueId: string
  declare kind: 'approve' | 'return' | 'withdraw'
  declare personId: string
  declare personName: string
  declare typedName: string
  declare statement: string
  declare sha256: string
  declare at: Date
}

export function bindReview(sequelize: Sequelize): void {
  Issue.init(
    {
      id: ownKey(),
      commissionId: key(),
      no: whole(),
      letter: line(8),
      state: word(),
      note: line(5000),
      canonicalText: longText(),
      sha256: digest(),
      shapeSha256: digest(),
      evidence: document(),
      evidenceSha256: digest(),
      putForwardById: key(),
      putForwardByName: line(200),
      at: instant(),
    },
    { sequelize, tableName: 'issue' },
  )
  Remark.init(
    {
      id: ownKey(),
      issueId: key(),
      no: whole(),
      x: lengthMm(),
      y: lengthMm(),
      state: { ...word(), defaultValue: 'open' },
      version: editVersion(),
    },
    { sequelize, tableName: 'remark', version: true },
  )
  RemarkEntry.init(
    {
      id: ownKey(),
      remarkId: key(),
      authorId: key(),
      authorName: line(200),
      text: line(5000),
      at: instant(),
    },
    { sequelize, tableName: 'remark_entry' },
  )
  Decision.init(
    {
      id: ownKey(),
      issueId: key(),
      kind: word(),
      personId: key(),
      personName: line(200),
      typedName: line(200),
      statement: line(5000),
      sha256: digest(),
      at: instant(),
    },
    { sequelize, tableName: 'decision' },
  )
}
