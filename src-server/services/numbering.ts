import { QueryTypes } from 'sequelize'
import { database } from '../models/database'
import type { Tx } from './transaction'

/** The next number of a series, from 1, none left out and none given twice. Holds the series until the transaction ends. */
export async function nextNumber(tx: Tx, series: string): Promise<number> {
  await database().query(
    'INSERT INTO counter (series, value) VALUES (:series, 1) ON DUPLICATE KEY UPDATE value = value + 1',
    { replacements: { series }, type: QueryTypes.INSERT, transaction: tx },
  )
  const [row] = await database().query<{ value: number }>(
    'SELECT value FROM counter WHERE series = :series',
    { replacements: { series }, type: QueryTypes.SELECT, transaction: tx },
  )
  if (row === undefined) throw new Error(`the series ${series} has no counter`)
  return row.value
}

/** A number as people say it: C-0007. */
export const numberText = (prefix: string, value: number): string =>
  `${prefix}-${String(value).padStart(4, '0')}`
