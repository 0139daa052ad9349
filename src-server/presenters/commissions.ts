import type {
  CommissionLineView,
  CommissionView,
  MeasurementView,
  PhotographView,
  PictureView,
  TrailLineView,
} from '@shared/contracts'
import type { Standing } from '@shared/course'
import type { Commission, Measurement, Picture } from '../models/commission'
import type { StoredFile } from '../models/file'
import type { Photograph, Reading } from '../models/photograph'
import type { TrailEntry } from '../models/trail'

interface StandingCommission {
  readonly commission: Commission
  readonly standing: Standing
  readonly latestIssue: CommissionLineView['latestIssue'] | undefined
  readonly isStuck: boolean
}

interface PictureWithMeasurement {
  readonly picture: Picture
  readonly measurement: Measurement | null
}

interface PhotographWithReading {
  readonly photograph: Photograph
  readonly file: StoredFile
  readonly reading: Reading | null
}

export function presentCommissionLine(one: StandingCommission): CommissionLineView {
  const { commission, standing, latestIssue, isStuck } = one
  const { id, number, title, artist, accession, client, due, state } = commission
  if (client === undefined) throw new Error('a commission was read without its client')
  return {
    id,
    number,
    title,
    artist,
    accession,
    client: { id: client.id, name: client.name },
    due,
    state,
    stage: standing.stage,
    waitsFor: standing.waitsFor,
    waitsForRole: standing.role,
    stuck: isStuck,
    latestIssue: latestIssue ?? null,
  }
}

export function presentCommission(
  whole: StandingCommission & {
    readonly pictures: readonly PictureWithMeasurement[]
    readonly photographs: readonly PhotographWithReading[]
  },
): CommissionView {
  return {
    ...presentCommissionLine(whole),
    version: whole.commission.version,
    pictures: whole.pictures.map(presentPicture),
    photographs: whole.photographs.map(presentPhotograph),
  }
}

export function presentPicture({ picture, measurement }: PictureWithMeasurement): PictureView {
  const { id, position, name, copies, state, version } = picture
  return {
    id,
    position,
    name,
    copies,
    state,
    version,
    measurement: measurement === null ? null : presentMeasurement(measurement),
  }
}

export function presentMeasurement({ id, no, at, document }: Measurement): MeasurementView {
  return { id, no, at: at.toISOString(), document }
}

export function presentPhotograph({ photograph, file, reading }: PhotographWithReading): PhotographView {
  const { id, key, title, source, citation, state, version, width, height } = photograph
  return {
    id,
    key,
    title,
    source,
    citation,
    state,
    version,
    width,
    height,
    type: file.type,
    bytes: file.bytes,
    sha256: file.sha256,
    reading:
      reading === null
        ? null
        : { id: reading.id, no: reading.no, at: reading.at.toISOString(), document: reading.document },
  }
}

export function presentTrailLine({ seq, at, actorName, act, says, hash }: TrailEntry): TrailLineView {
  return { seq, at: at.toISOString(), by: actorName, act, says, hash }
}
