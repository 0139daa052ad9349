import { randomUUID } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { QueryTypes } from 'sequelize'
import { database } from '@server/models/database'
import { StoredFile } from '@server/models/file'
import { MillCard } from '@server/models/workshop'
import { useApplication } from '../helpers/application'
import { aCommission, aMeasurement, aPicture } from '../helpers/factories/commissions'
import { aMill } from '../helpers/factories/people'

useApplication()

/** What each kind of column gives back in JavaScript; a kind that is not here has not been thought about. */
const TYPE_OF_KIND: Readonly<Record<string, string>> = {
  int: 'number',
  bigint: 'number',
  double: 'number',
  decimal: 'string',
  tinyint: 'number',
}

describe('numeric columns', () => {
  it('are of kinds whose JavaScript type is settled', async () => {
    const kinds = await database().query<{ kind: string }>(
      `SELECT DISTINCT data_type AS kind FROM information_schema.columns
       WHERE table_schema = DATABASE() AND numeric_precision IS NOT NULL`,
      { type: QueryTypes.SELECT },
    )
    for (const { kind } of kinds) expect(Object.keys(TYPE_OF_KIND)).toContain(kind)
  })

  it('come back as that type, whole', async () => {
    const [row] = await database().query<Record<string, unknown>>(
      'SELECT CAST(-7 AS INT) AS a, CAST(9007199254740991 AS INT) AS b, 0.1 + 0.2e0 AS c, CAST(18.5 AS DECIMAL(16,4)) AS d, COUNT(*) AS n FROM (SELECT 1) AS one',
      { type: QueryTypes.SELECT },
    )
    expect(row).toEqual({ a: -7, b: 9007199254740991, c: 0.30000000000000004, d: '18.5000', n: 1 })
  })

  it('hold the bytes of a file beyond 2³¹ as a number', async () => {
    const sha256 = randomUUID().replaceAll('-', '').repeat(2)
    await StoredFile.create({ sha256, bytes: 5_000_000_001, type: 'image/tiff', at: new Date() })
    const file = await StoredFile.findOne({ where: { sha256 }, rejectOnEmpty: true })
    expect(file.bytes).toBe(5_000_000_001)
  })
})

describe('documents', () => {
  it('keep every float to the last bit, and money as it was written', async () => {
    const picture = await aPicture(await aCommission())
    const width = [0.1 + 0.2, 1e-7, 914.0000000000001, 99_999.99999999999]
    const measurement = await aMeasurement(picture, { width })
    await measurement.reload()
    expect(measurement.document.width).toEqual(width)
    const mill = await aMill()
    const card = await MillCard.findOne({ where: { millId: mill.id }, rejectOnEmpty: true })
    expect(card.document.lengths[0]?.price).toBe('18.50')
  })

  it('keep instants to the millisecond and days as days', async () => {
    const commission = await aCommission({ due: '2026-02-28' })
    const createdAt = new Date('2026-10-25T01:30:00.123Z')
    await commission.update({ createdAt })
    await commission.reload()
    expect(commission.due).toBe('2026-02-28')
    expect(commission.createdAt.toISOString()).toBe('2026-10-25T01:30:00.123Z')
  })
})
