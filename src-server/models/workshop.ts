import { Model } from 'sequelize'
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize'
import type { MillCard as MillCardDocument, SawCard as SawCardDocument } from '@shared/contracts'
import { document, editVersion, instant, key, line, ownKey, whole } from './columns'

/** What a mill's machines can do: numbered, never changed in place. */
export class MillCard extends Model<InferAttributes<MillCard>, InferCreationAttributes<MillCard>> {
  declare id: CreationOptional<string>
  declare millId: string
  declare no: number
  declare document: MillCardDocument
  declare byId: string
  declare at: Date
}

/** A saw's settings: numbered for each saw's name, never changed in place. */
export class SawCard extends Model<InferAttributes<SawCard>, InferCreationAttributes<SawCard>> {
  declare id: CreationOptional<string>
  declare name: string
  declare no: number
  declare document: SawCardDocument
  declare byId: string
  declare at: Date
}

export class Setting extends Model<InferAttributes<Setting>, InferCreationAttributes<Setting>> {
  declare key: string
  declare value: unknown
  declare version: CreationOptional<number>
}

/** The last number given out of a series (commissions, orders, rack codes). */
export class Counter extends Model<InferAttributes<Counter>, InferCreationAttributes<Counter>> {
  declare series: string
  declare value: number
}

export function bindWorkshop(sequelize: Sequelize): void {
  MillCard.init(
    { id: ownKey(), millId: key(), no: whole(), document: document(), byId: key(), at: instant() },
    { sequelize, tableName: 'mill_card' },
  )
  SawCard.init(
    { id: ownKey(), name: line(200), no: whole(), document: document(), byId: key(), at: instant() },
    { sequelize, tableName: 'saw_card' },
  )
  Setting.init(
    { key: { ...line(64), primaryKey: true }, value: document(), version: editVersion() },
    { sequelize, tableName: 'setting', version: true },
  )
  Counter.init(
    { series: { ...line(64), primaryKey: true }, value: whole() },
    { sequelize, tableName: 'counter' },
  )
}
