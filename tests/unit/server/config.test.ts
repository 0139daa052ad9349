import { describe, expect, it } from 'vitest'
import { ConfigFault, readConfig, readDatabaseUrl } from '@server/config'

const GOOD = {
  LISTEL_DATABASE_URL: 'mariadb://listel:pw@127.0.0.1:3307/listel',
  LISTEL_SMTP_URL: 'smtp://127.0.0.1:2525',
  LISTEL_SECRET: 'x'.repeat(32),
  LISTEL_DATA: '/srv/listel',
}

function faultOf(env: Record<string, string | undefined>): string {
  try {
    readConfig(env)
  } catch (error) {
    if (error instanceof ConfigFault) return error.message
    throw error
  }
  return ''
}

describe('the configuration', () => {
  it('is read with its defaults', () => {
    expect(readConfig(GOOD)).toMatchObject({
      databaseUrl: GOOD.LISTEL_DATABASE_URL,
      host: '127.0.0.1',
      port: 4700,
      publicUrl: 'http://127.0.0.1:4700',
      clientDir: undefined,
      caughtMailDir: undefined,
      logLevel: 'info',
    })
  })

  it('names every fault at once', () => {
    const says = faultOf({})
    for (const name of Object.keys(GOOD)) expect(says).toContain(name)
  })

  it.each([
    ['LISTEL_DATABASE_URL', 'postgres://127.0.0.1/listel'],
    ['LISTEL_SMTP_URL', 'http://127.0.0.1'],
    ['LISTEL_SECRET', 'short'],
    ['LISTEL_DATA', 'relative/folder'],
    ['LISTEL_PORT', '0'],
    ['LISTEL_PORT', 'http'],
    ['LISTEL_PUBLIC_URL', 'listel.example'],
  ])('refuses %s = %s', (name, value) => {
    expect(faultOf({ ...GOOD, [name]: value })).toContain(name)
  })

  it('never shows a secret in a fault', () => {
    expect(faultOf({ ...GOOD, LISTEL_SECRET: 'open sesame' })).not.toContain('sesame')
  })

  it.each([
    [{ LISTEL_HOST: '0.0.0.0', LISTEL_PORT: '81' }, 'http://127.0.0.1:81'],
    [{ LISTEL_HOST: '::1' }, 'http://[::1]:4700'],
    [{ LISTEL_PUBLIC_URL: 'https://frames.example/' }, 'https://frames.example'],
  ])('sends people where they can get: %j', (env, url) => {
    expect(readConfig({ ...GOOD, ...env }).publicUrl).toBe(url)
  })

  it('needs only the database for migrations', () => {
    expect(readDatabaseUrl({ LISTEL_DATABASE_URL: GOOD.LISTEL_DATABASE_URL })).toBe(GOOD.LISTEL_DATABASE_URL)
    expect(() => readDatabaseUrl({})).toThrow(/LISTEL_DATABASE_URL/)
  })
})
