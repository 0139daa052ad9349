import { Model } from 'sequelize'
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize'
import type { DraftSection, SectionEdit } from '@shared/section'
import { document, instant, key, line, ownKey, whole, word } from './columns'

/** The section being drawn; `version` counts the saves, and every save names the one it was made from. */
export class Draft extends Model<InferAttributes<Draft>, InferCreationAttributes<Draft>> {
  declare id: CreationOptional<string>
  declare commissionId: string
  declare document: DraftSection
  declare version: number
}

/** One step of drawing. `superseded`: it was undone and another step taken instead; it is kept, but cannot be redone. */
export class DraftEdit extends Model<InferAttributes<DraftEdit>, InferCreationAttributes<DraftEdit>> {
  declare id: CreationOptional<string>
  declare draftId: string
  declare seq: number
  declare name: string
  declare edit: SectionEdit
  declare inverse: SectionEdit
  declare state: 'done' | 'undone' | 'superseded'
  declare authorId: string
  declare authorName: string
  declare operationId: string
  declare at: Date
}

export function bindDrafts(sequelize: Sequelize): void {
  Draft.init(
    { id: ownKey(), commissionId: key(), document: document(), version: whole() },
    { sequelize, tableName: 'draft' },
  )
  DraftEdit.init(
    {
      id: ownKey(),
      draftId: key(),
      seq: whole(),
      name: line(200),
      edit: document(),
      inverse: document(),
      state: word(),
      authorId: key(),
      authorName: line(200),
      operationId: key(),
      at: instant(),
    },
    { sequelize, tableName: 'draft_edit' },
  )
}
