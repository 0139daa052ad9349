import type { Actor } from '@shared/access'
import type { ClientChangeRequest, ClientRequest, OutputOf } from '@shared/contracts'
import { Client } from '../models/person'
import { now } from './clock'
import { notFound, requireRight } from './rights'
import { inTransaction } from './transaction'
import { requireVersion } from './versions'

export async function listClients(actor: Actor, state: 'active' | 'archived' | 'all'): Promise<Client[]> {
  requireRight(actor, 'client.read', {})
  return Client.findAll({
    where: state === 'all' ? {} : { state },
    order: [
      ['name', 'ASC'],
      ['id', 'ASC'],
    ],
  })
}

export async function takeOnClient(actor: Actor, { name }: OutputOf<typeof ClientRequest>): Promise<Client> {
  requireRight(actor, 'client.manage', {})
  return Client.create({ name, createdAt: now() })
}

export const changeClient = (
  actor: Actor,
  id: string,
  { version, name, state }: OutputOf<typeof ClientChangeRequest>,
): Promise<Client> =>
  inTransaction(async (tx) => {
    requireRight(actor, 'client.manage', {})
    const client = await Client.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE })
    if (client === null) throw notFound()
    requireVersion(client.version, version)
    if (name !== undefined) client.name = name
    if (state !== undefined) client.state = state
    return client.save({ transaction: tx })
  })
