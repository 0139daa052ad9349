import { afterEach, describe, expect, it } from 'vitest'
import { QueryTypes } from 'sequelize'
import type { Sequelize } from 'sequelize'
import { migratorOf } from '@server/migrations/migrator'
import { closeDatabase, connectionTo, openDatabase } from '@server/models/database'
import { emptyDatabase } from '../helpers/database'

/** A column as the database describes it. */
interface Column {
  readonly place: string
  readonly type: string
  readonly nullable: string
}

const open: { close(): Promise<void> }[] = []
afterEach(async () => {
  await closeDatabase()
  for (const opened of open.splice(0).reverse()) await opened.close()
})

async function aDatabase(): Promise<string> {
  const { url, drop } = await emptyDatabase()
  open.push({ close: drop })
  return url
}

async function columnsOf(sequelize: Sequelize): Promise<readonly Column[]> {
  return sequelize.query<Column>(
    `SELECT CONCAT(table_name, '.', column_name) AS place, column_type AS type, is_nullable AS nullable
     FROM information_schema.columns WHERE table_schema = DATABASE() AND table_name <> 'migration'
     ORDER BY table_name, column_name`,
    { type: QueryTypes.SELECT },
  )
}

/** Everything that makes up the tables, as the database itself would write it. */
async function definitionsOf(sequelize: Sequelize): Promise<Readonly<Record<string, string>>> {
  const tables = await sequelize.query<{ name: string }>(
    `SELECT table_name AS name FROM information_schema.tables
     WHERE table_schema = DATABASE() AND table_name <> 'migration' ORDER BY table_name`,
    { type: QueryTypes.SELECT },
  )
  const definitions: Record<string, string> = {}
  for (const { name } of tables) {
    const [row] = await sequelize.query<Record<string, string>>(`SHOW CREATE TABLE \`${name}\``, {
      type: QueryTypes.SELECT,
    })
    definitions[name] = row?.['Create Table'] ?? ''
  }
  return definitions
}

describe('the migrations', () => {
  it('go up, all the way down to nothing, and up again to the same tables', async () => {
    const sequelize = await openDatabase(await aDatabase())
    const migrator = migratorOf(sequelize)
    await migrator.up()
    const first = await definitionsOf(sequelize)
    expect(Object.keys(first).length).toBeGreaterThan(15)
    await migrator.down({ to: 0 })
    expect(await definitionsOf(sequelize)).toEqual({})
    await migrator.up()
    expect(await definitionsOf(sequelize)).toEqual(first)
  })

  it('make the very columns that the models expect', async () => {
    const migrated = await openDatabase(await aDatabase())
    await migratorOf(migrated).up()
    const fromMigrations = await columnsOf(migrated)
    await closeDatabase()
    const fromModels = await openDatabase(await aDatabase())
    await fromModels.sync()
    expect(fromMigrations).toEqual(await columnsOf(fromModels))
  })

  it('have names in the order in which they run', async () => {
    const sequelize = connectionTo(await aDatabase())
    open.push(sequelize)
    const names = (await migratorOf(sequelize).pending()).map(({ name }) => name)
    expect(names).toEqual([...names].sort())
    expect(new Set(names).size).toBe(names.length)
    for (const name of names) expect(name).toMatch(/^\d{8}-\d{4}-[a-z-]+$/)
  })

  it('keep every table in InnoDB and every text in the one character set', async () => {
    const sequelize = await openDatabase(await aDatabase())
    await migratorOf(sequelize).up()
    const strange = await sequelize.query(
      `SELECT table_name, column_name, collation_name FROM information_schema.columns
       WHERE table_schema = DATABASE() AND table_name <> 'migration' AND collation_name IS NOT NULL
       AND collation_name NOT IN ('utf8mb4_unicode_520_ci', 'utf8mb4_bin', 'ascii_bin')`,
      { type: QueryTypes.SELECT },
    )
    expect(strange).toEqual([])
  })
})
