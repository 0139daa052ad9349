import { randomBytes } from 'node:crypto'
import { createConnection } from 'mariadb'

/**
 * Databases for tests, made on the server that `npm test` runs for the occasion.
 * LISTEL_TEST_DATABASE_URL is the address of an account that may make and drop databases.
 */
function adminUrl(): URL {
  const given = process.env.LISTEL_TEST_DATABASE_URL
  if (given === undefined || given === '') {
    throw new Error(
      'LISTEL_TEST_DATABASE_URL is not set: run these tests by "npm run test:api" or "npm test"',
    )
  }
  return new URL(given)
}

async function runSql(sql: string): Promise<void> {
  const { hostname, port, username, password } = adminUrl()
  const connection = await createConnection({
    host: hostname,
    port: Number(port),
    user: decodeURIComponent(username),
    password: decodeURIComponent(password),
  })
  try {
    await connection.query(sql)
  } finally {
    await connection.end()
  }
}

/** Address of a database on the test server; it need not exist yet. */
function urlOf(name: string): string {
  const url = adminUrl()
  url.pathname = `/${name}`
  return url.href
}

const createdHere = new Map<string, Promise<void>>()

/**
 * Address of the database of this test worker, made when first asked for. Test files that share a worker share
 * the database, one after the other: each builds its own rows and expects others'.
 */
export async function testDatabaseUrl(): Promise<string> {
  const worker = process.env.VITEST_POOL_ID ?? '1'
  const name = `listel_test_${worker.replace(/\D/g, '')}`
  const created = createdHere.get(name) ?? createDatabase(name)
  createdHere.set(name, created)
  await created
  return urlOf(name)
}

/** Address of a new, empty database for one test that needs the whole of it; `drop` removes it again. */
export async function emptyDatabase(): Promise<{ readonly url: string; drop(): Promise<void> }> {
  const name = `listel_test_own_${randomBytes(8).toString('hex')}`
  await createDatabase(name)
  return { url: urlOf(name), drop: () => runSql(`DROP DATABASE IF EXISTS \`${name}\``) }
}

function createDatabase(name: string): Promise<void> {
  return runSql(
    `CREATE DATABASE IF NOT EXISTS \`${name}\` CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_520_ci`,
  )
}
