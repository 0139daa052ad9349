import { Model } from 'sequelize'
import type {
  CreationOptional,
  InferAttributes,
  InferCreationAttributes,
  NonAttribute,
  Sequelize,
} from 'sequelize'
import type { RoleName, UnitsName, VocabularyName } from '@shared/contracts'
import { editVersion, instant, key, keyOrNone, line, ownKey, word, wordOrNone } from './columns'

export type RowState = 'active' | 'archived'

export class Person extends Model<InferAttributes<Person>, InferCreationAttributes<Person>> {
  declare id: CreationOptional<string>
  declare name: string
  /** Lower case; the one that signs in. */
  declare email: string
  declare passwordHash: string
  declare units: CreationOptional<UnitsName | null>
  declare vocabulary: CreationOptional<VocabularyName | null>
  declare state: CreationOptional<RowState>
  declare version: CreationOptional<number>
  declare createdAt: Date
  declare memberships?: NonAttribute<Membership[]>
}

/** What a person is to the workshop; a curator names a client, a mill's person a mill. */
export class Membership extends Model<InferAttributes<Membership>, InferCreationAttributes<Membership>> {
  declare id: CreationOptional<string>
  declare personId: string
  declare role: RoleName
  declare clientId: string | null
  declare millId: string | null
  declare state: CreationOptional<RowState>
  declare createdAt: Date
  declare client?: NonAttribute<Client | null>
  declare mill?: NonAttribute<Mill | null>
}

export class Client extends Model<InferAttributes<Client>, InferCreationAttributes<Client>> {
  declare id: CreationOptional<string>
  declare name: string
  declare state: CreationOptional<RowState>
  declare version: CreationOptional<number>
  declare createdAt: Date
}

export class Mill extends Model<InferAttributes<Mill>, InferCreationAttributes<Mill>> {
  declare id: CreationOptional<string>
  declare name: string
  declare email: string
  declare state: CreationOptional<RowState>
  declare version: CreationOptional<number>
  declare createdAt: Date
}

export function bindPeople(sequelize: Sequelize): void {
  const state = { ...word(), defaultValue: 'active' }
  Person.init(
    {
      id: ownKey(),
      name: line(200),
      email: line(254),
      passwordHash: line(255),
      units: wordOrNone(),
      vocabulary: wordOrNone(),
      state,
      version: editVersion(),
      createdAt: instant(),
    },
    { sequelize, tableName: 'person', version: true },
  )
  Client.init(
    { id: ownKey(), name: line(200), state, version: editVersion(), createdAt: instant() },
    { sequelize, tableName: 'client', version: true },
  )
  Mill.init(
    { id: ownKey(), name: line(200), email: line(254), state, version: editVersion(), createdAt: instant() },
    { sequelize, tableName: 'mill', version: true },
  )
  Membership.init(
    {
      id: ownKey(),
      personId: key(),
      role: word(),
      clientId: keyOrNone(),
      millId: keyOrNone(),
      state,
      createdAt: instant(),
    },
    { sequelize, tableName: 'membership' },
  )
  Person.hasMany(Membership, { as: 'memberships', foreignKey: 'personId', constraints: false })
  Membership.belongsTo(Client, { as: 'client', foreignKey: 'clientId', constraints: false })
  Membership.belongsTo(Mill, { as: 'mill', foreignKey: 'millId', constraints: false })
}
