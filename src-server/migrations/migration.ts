import { QueryTypes } from 'sequelize'
import type { QueryInterface } from 'sequelize'

/** One step of the schema, forth and back. Written in SQL: what it did stays what it did, whatever the models become. */
export interface Migration {
  readonly name: string
  up(queryInterface: QueryInterface): Promise<void>
  down(queryInterface: QueryInterface): Promise<void>
}

/** A migration that makes tables in the order given and drops them in the reverse order. */
export function tables(name: string, definitions: Readonly<Record<string, string>>): Migration {
  const run = async (queryInterface: QueryInterface, statements: readonly string[]) => {
    for (const sql of statements) await queryInterface.sequelize.query(sql, { type: QueryTypes.RAW })
  }
  const names = Object.keys(definitions)
  return {
    name,
    up: (queryInterface) =>
      run(
        queryInterface,
        names.map(
          (table) => `CREATE TABLE \`${table}\` (${definitions[table]}) ENGINE=InnoDB ROW_FORMAT=DYNAMIC`,
        ),
      ),
    down: (queryInterface) =>
      run(
        queryInterface,
        names.toReversed().map((table) => `DROP TABLE \`${table}\``),
      ),
  }
}

/** A key of ours (UUID). */
export const KEY = 'CHAR(36) CHARACTER SET ascii COLLATE ascii_bin'
/** SHA-256 in lower-case hexadecimal. */
export const DIGEST = 'CHAR(64) CHARACTER SET ascii COLLATE ascii_bin'
/** A word of a closed list. */
export const WORD = 'VARCHAR(32)'
/** UTC to the millisecond. */
export const INSTANT = 'DATETIME(3)'
