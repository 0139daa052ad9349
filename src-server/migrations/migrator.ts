import type { Sequelize } from 'sequelize'
import { SequelizeStorage, Umzug } from 'umzug'
import { MIGRATIONS } from './index'

/** Runs migrations on a database and remembers there which have run. */
export function migratorOf(sequelize: Sequelize) {
  const queryInterface = sequelize.getQueryInterface()
  return new Umzug({
    migrations: MIGRATIONS.map((migration) => ({
      name: migration.name,
      up: () => migration.up(queryInterface),
      down: () => migration.down(queryInterface),
    })),
    storage: new SequelizeStorage({ sequelize, tableName: 'migration' }),
    logger: undefined,
  })
}
