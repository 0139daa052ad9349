import { createHash, randomBytes } from 'node:crypto'
import { rmSync } from 'node:fs'
import { readRecord, writeRecord } from './data-folder.mjs'

/** What `--reset` throws away. Ports, the installation's secret and the logs stay. */
const WIPED = [
  'mariadb',
  'mariadb.new',
  'mariadb.run',
  'files',
  'uploads',
  'caught-mail',
  'demo-sign-ins.json',
]

/**
 * What an installation remembers from start to start: ports, random secrets, and what each database holds:
 * 'demo', 'empty' (started with LISTEL_DEMO=no), or 'half' while the demo is being filled in.
 */
export function openInstallation(data) {
  const file = data.at('installation.json')
  const record = { contents: {}, ...readRecord(file) }
  const keep = (facts) => {
    Object.assign(record, facts)
    writeRecord(file, record)
  }
  return {
    record,
    keep,
    /** A random secret made once; only characters that need no quoting in SQL or in an address. */
    secret(name) {
      if (record[name] === undefined) keep({ [name]: randomBytes(32).toString('base64url') })
      return record[name]
    },
    contentsOf: (key) => record.contents[key],
    keepContents: (key, contents) => keep({ contents: { ...record.contents, [key]: contents } }),
    wipe() {
      for (const name of WIPED) rmSync(data.at(name), { recursive: true, force: true })
      keep({ contents: { ...record.contents, own: undefined } })
    },
  }
}

/** Names a database without its password. */
export function keyOfDatabase(url) {
  if (url === undefined) return 'own'
  const { hostname, port, pathname } = new URL(url)
  return createHash('sha256').update(`${hostname}:${port}${pathname}`).digest('hex').slice(0, 16)
}
