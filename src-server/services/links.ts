import { createHash, randomBytes } from 'node:crypto'
import { Link } from '../models/session'
import { now } from './clock'
import type { Tx } from './transaction'

export interface NewLink {
  readonly purpose: Link['purpose']
  readonly subjectId: string | null
  readonly days: number
}

/** Makes a link's secret, 256 bits of chance; the table keeps only its digest, so it can be told this once. */
export async function makeLink(tx: Tx, { purpose, subjectId, days }: NewLink): Promise<string> {
  const token = randomBytes(32).toString('base64url')
  const at = now()
  await Link.create(
    {
      tokenSha256: digestOf(token),
      purpose,
      subjectId,
      createdAt: at,
      expiresAt: new Date(at.getTime() + days * 86_400_000),
    },
    { transaction: tx },
  )
  return token
}

/** The link of a token, spent or not; null: no such token was ever given out. */
export function findLink(token: string, tx?: Tx): Promise<Link | null> {
  const where = { tokenSha256: digestOf(token) }
  return tx === undefined
    ? Link.findOne({ where })
    : Link.findOne({ where, transaction: tx, lock: tx.LOCK.UPDATE })
}

/** Whether it can still be used: neither used, revoked nor past its day. */
export const isLinkLive = (link: Link): boolean =>
  link.usedAt === null && link.revokedAt === null && link.expiresAt.getTime() > now().getTime()

const digestOf = (token: string): string => createHash('sha256').update(token).digest('hex')
