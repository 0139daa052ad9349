import { Op, QueryTypes } from 'sequelize'
import { Failure } from '@shared/failure'
import { sha256Hex } from '@shared/section'
import { database } from '../models/database'
import { RateLimit } from '../models/session'
import { now } from './clock'

export interface Limit {
  /** What is tried, as `sign-in-address`. */
  readonly what: string
  readonly mostTries: number
  readonly windowMinutes: number
}

/**
 * Counts one try of a subject and refuses it (too-many-tries) past the limit. The count is a row, so that all
 * processes count together, and is written before the thing is tried, so that trying many at once does not help.
 */
export async function countTry({ what, mostTries, windowMinutes }: Limit, subject: string): Promise<void> {
  const at = now()
  const subjectSha256 = digestOf(what, subject)
  const [row] = await database().query<{ tries: number; until: Date }>(
    `INSERT INTO rate_limit (subject_sha256, tries, until) VALUES (:subjectSha256, 1, :until)
     ON DUPLICATE KEY UPDATE tries = IF(until <= :at, 1, tries + 1), until = IF(until <= :at, :until, until)
     RETURNING tries, until`,
    {
      replacements: { subjectSha256, at, until: new Date(at.getTime() + windowMinutes * 60_000) },
      type: QueryTypes.SELECT,
    },
  )
  if (row === undefined || row.tries <= mostTries) return
  const seconds = Math.max(1, Math.ceil((row.until.getTime() - at.getTime()) / 1000))
  throw new Failure('too-many-tries', {
    says: `Too many tries; wait ${Math.ceil(seconds / 60)} minute(s) and try again.`,
    retryAfter: seconds,
  })
}

/** Takes back one counted try: it was a good one. */
export async function forgiveTry({ what }: Limit, subject: string): Promise<void> {
  await RateLimit.decrement('tries', {
    where: { subjectSha256: digestOf(what, subject), tries: { [Op.gt]: 0 } },
  })
}

const digestOf = (what: string, subject: string): string => sha256Hex(`${what}\n${subject}`)
