import type { Actor } from '@shared/access'
import { SettingsDocument, requireValid } from '@shared/contracts'
import type { Settings } from '@shared/contracts'
import { Setting } from '../models/workshop'
import { requireRight } from './rights'
import { inTransaction } from './transaction'
import type { Tx } from './transaction'
import { requireVersion } from './versions'

const KEY = 'workshop'

/** What a workshop starts with until a manager says otherwise. */
const AT_FIRST: Settings = {
  workshop: 'Our workshop',
  units: 'mm',
  vocabulary: 'moulding',
  currency: 'EUR',
  allowance: 3,
  signature: 'The workshop',
}

export interface VersionedSettings {
  readonly version: number
  readonly document: Settings
}

export async function readSettings(tx?: Tx): Promise<VersionedSettings> {
  const row = await Setting.findByPk(KEY, tx === undefined ? {} : { transaction: tx })
  if (row === null) return { version: 0, document: AT_FIRST }
  return { version: row.version, document: requireValid(SettingsDocument, row.value) }
}

export const changeSettings = (actor: Actor, change: VersionedSettings): Promise<VersionedSettings> =>
  inTransaction(async (tx) => {
    requireRight(actor, 'settings.change', {})
    await keepSettings(tx, change)
    return readSettings(tx)
  })

/** Writes the settings; a first write expects version 0. */
export async function keepSettings(tx: Tx, { version, document }: VersionedSettings): Promise<void> {
  const row = await Setting.findByPk(KEY, { transaction: tx, lock: tx.LOCK.UPDATE })
  requireVersion(row?.version ?? 0, version)
  if (row === null) await Setting.create({ key: KEY, value: document, version: 1 }, { transaction: tx })
  else await row.update({ value: document }, { transaction: tx })
}
