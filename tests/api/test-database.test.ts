import { createConnection } from 'mariadb'
import { afterEach, describe, expect, it } from 'vitest'
import { emptyDatabase, testDatabaseUrl } from '../helpers/database'

const dropLater: (() => Promise<void>)[] = []
afterEach(async () => {
  for (const drop of dropLater.splice(0)) await drop()
})

async function ask(url: string, sql: string): Promise<unknown> {
  const { hostname, port, username, password, pathname } = new URL(url)
  const connection = await createConnection({
    host: hostname,
    port: Number(port),
    user: username,
    password,
    database: pathname.slice(1),
  })
  try {
    return await connection.query({ sql, rowsAsArray: true })
  } finally {
    await connection.end()
  }
}

describe('the database of a test', () => {
  it('is one per worker and stays the same when asked for again', async () => {
    const url = await testDatabaseUrl()
    expect(await testDatabaseUrl()).toBe(url)
    expect(await ask(url, 'SELECT DATABASE()')).toEqual([[`listel_test_${process.env.VITEST_POOL_ID}`]])
  })

  it('is empty and its own when a test asks for the whole of one', async () => {
    const [one, other] = [await emptyDatabase(), await emptyDatabase()]
    dropLater.push(one.drop, other.drop)
    expect(one.url).not.toBe(other.url)
    await ask(one.url, 'CREATE TABLE piece (length_mm DOUBLE)')
    expect(await ask(other.url, 'SHOW TABLES')).toEqual([])
    await one.drop()
    await expect(ask(one.url, 'SELECT 1')).rejects.toThrow(/Unknown database/)
  })

  it('keeps any letter and tells the time in UTC', async () => {
    const url = await testDatabaseUrl()
    const variables = 'SELECT @@character_set_database, @@collation_database, @@time_zone'
    expect(await ask(url, variables)).toEqual([['utf8mb4', 'utf8mb4_unicode_520_ci', '+00:00']])
  })
})
