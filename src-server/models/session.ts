import { Model } from 'sequelize'
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize'
import { digest, instant, instantOrNone, key, keyOrNone, ownKey, whole, word } from './columns'

export class Session extends Model<InferAttributes<Session>, InferCreationAttributes<Session>> {
  declare id: CreationOptional<string>
  declare personId: string
  declare createdAt: Date
  declare seenAt: Date
  declare expiresAt: Date
  declare endedAt: CreationOptional<Date | null>
}

/** Tries of something that may be tried only so often; the subject (an address, an account) is kept as a digest. */
export class RateLimit extends Model<InferAttributes<RateLimit>, InferCreationAttributes<RateLimit>> {
  declare subjectSha256: string
  declare tries: number
  declare until: Date
}

/** A one-time address; only the digest of its token is kept. */
export class Link extends Model<InferAttributes<Link>, InferCreationAttributes<Link>> {
  declare id: CreationOptional<string>
  declare tokenSha256: string
  declare purpose: 'first-manager' | 'acknowledge-order'
  declare subjectId: string | null
  declare createdAt: Date
  declare expiresAt: Date
  declare usedAt: CreationOptional<Date | null>
  declare revokedAt: CreationOptional<Date | null>
}

export function bindSessions(sequelize: Sequelize): void {
  Session.init(
    {
      id: ownKey(),
      personId: key(),
      createdAt: instant(),
      seenAt: instant(),
      expiresAt: instant(),
      endedAt: instantOrNone(),
    },
    { sequelize, tableName: 'session' },
  )
  RateLimit.init(
    { subjectSha256: { ...digest(), primaryKey: true }, tries: whole(), until: instant() },
    { sequelize, tableName: 'rate_limit' },
  )
  Link.init(
    {
      id: ownKey(),
      tokenSha256: digest(),
      purpose: word(),
      subjectId: keyOrNone(),
      createdAt: instant(),
      expiresAt: instant(),
      usedAt: instantOrNone(),
      revokedAt: instantOrNone(),
    },
    { sequelize, tableName: 'link' },
  )
}
