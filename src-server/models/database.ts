import { Sequelize } from 'sequelize'
import { MODEL_FAMILIES } from './families'

let opened: Sequelize | undefined

/** Opens the one database of this process and binds every model to it. Fails when it cannot be reached. */
export async function openDatabase(url: string): Promise<Sequelize> {
  const sequelize = bindDatabase(url)
  try {
    await sequelize.authenticate()
  } catch (error) {
    await closeDatabase()
    throw error
  }
  return sequelize
}

/** Binds the models without trying the connection: what `openDatabase` does first. */
export function bindDatabase(url: string): Sequelize {
  if (opened !== undefined) throw new Error('the database of this process is open already')
  const sequelize = connectionTo(url)
  for (const bind of MODEL_FAMILIES) bind(sequelize)
  opened = sequelize
  return sequelize
}

/** A connection pool of its own, no models bound. DECIMAL comes as text, counts as numbers, instants as UTC. */
export function connectionTo(url: string): Sequelize {
  const { hostname, port, username, password, pathname } = new URL(url)
  return new Sequelize({
    dialect: 'mariadb',
    host: hostname,
    port: Number(port === '' ? 3306 : port),
    username: decodeURIComponent(username),
    password: decodeURIComponent(password),
    database: decodeURIComponent(pathname.slice(1)),
    logging: false,
    timezone: '+00:00',
    // A dropped connection must answer at once, not after many tries: whoever asked is told, and may ask again.
    retry: { max: 1 },
    pool: { max: 10, min: 0, acquire: 10_000, idle: 10_000 },
    define: { freezeTableName: true, underscored: true, timestamps: false },
    dialectOptions: {
      connectTimeout: 5_000,
      supportBigNumbers: false,
      bigIntAsNumber: true,
      insertIdAsNumber: true,
      decimalAsNumber: false,
    },
  })
}

export function database(): Sequelize {
  if (opened === undefined) throw new Error('the database is not open')
  return opened
}

export async function closeDatabase(): Promise<void> {
  const closing = opened
  opened = undefined
  await closing?.close()
}
