import type { Actor } from '@shared/access'
import { CommissionRequest, invalid, readCommissionFile, requireValid } from '@shared/contracts'
import type {
  CommissionFile,
  CommissionFilePicture,
  ImportRequest,
  Measurement,
  OutputOf,
} from '@shared/contracts'
import { Failure } from '@shared/failure'
import type { Fault } from '@shared/failure'
import { draftFromSection, faultsOfSection, sectionSha256 } from '@shared/section'
import { Picture } from '../models/commission'
import { newKey } from '../models/key'
import { today } from './clock'
import { enterCommission } from './commissions'
import { onceOnly } from './operation'
import { enterMeasurement, enterPicture } from './pictures'
import { requireRight } from './rights'
import { enterTrail } from './trail'
import { inTransaction } from './transaction'
import type { Tx } from './transaction'

export interface ImportedCommission {
  readonly commissionId: string
  /** Hash of the section taken in; null: the file has none. */
  readonly sectionSha256: string | null
}

/** Parts of a commission file that a commission here keeps; the rest is for the command line to work out. */
const KEPT_PARTS = new Set([
  'listel',
  'units',
  'title',
  'artist',
  'accession',
  'due',
  'picture',
  'pictures',
  'frame',
  'section',
])

/** Makes a commission of a commission file. Every fault is told with its place in the request. */
export async function importCommission(
  actor: Actor,
  { operationId, clientId, file: given }: OutputOf<typeof ImportRequest>,
): Promise<ImportedCommission> {
  requireRight(actor, 'file.import', {})
  const file = requireFile(given)
  const about = aboutOf(file, clientId, operationId)
  const hash = file.section === undefined ? null : sectionSha256(file.section)
  const commissionId = await inTransaction((tx) =>
    onceOnly(tx, { operationId, actor, request: { what: 'import', clientId, file } }, () =>
      enterFile(tx, actor, file, about),
    ),
  )
  return { commissionId, sectionSha256: hash }
}

function requireFile(given: unknown): CommissionFile {
  const reading = readCommissionFile(given)
  if (reading.kind === 'refused') throw invalid(reading.faults.map(inFile('')))
  const { file } = reading
  const faults = [
    ...(file.section === undefined ? [] : faultsOfSection(file.section).map(inFile('/section'))),
    ...sidesFaults(file),
  ]
  if (faults.length > 0) throw invalid(faults)
  return file
}

const inFile =
  (place: string) =>
  (fault: Fault): Fault => ({ ...fault, path: `/file${place}${fault.path}` })

function sidesFaults({ frame }: CommissionFile): readonly Fault[] {
  if (frame === undefined || frame.sides === 4) return []
  return [
    {
      path: '/file/frame/sides',
      code: 'not-kept',
      says: `is ${frame.sides}; a commission keeps frames of four sides. The command line works out the others.`,
    },
  ]
}

type About = Omit<OutputOf<typeof CommissionRequest>, 'operationId'>

function aboutOf(file: CommissionFile, clientId: string, operationId: string): About {
  try {
    const { operationId: _used, ...about } = requireValid(CommissionRequest, {
      operationId,
      clientId,
      title: file.title ?? 'Untitled',
      artist: file.artist ?? '',
      accession: file.accession ?? '',
      due: file.due ?? null,
    })
    return about
  } catch (error) {
    if (!(error instanceof Failure) || error.details.faults === undefined) throw error
    throw invalid(error.details.faults.map(inFile('')))
  }
}

async function enterFile(tx: Tx, actor: Actor, file: CommissionFile, about: About): Promise<string> {
  const draft = file.section === undefined ? undefined : draftFromSection(file.section, newKey)
  const commissionId = await enterCommission(tx, actor, about, draft)
  for (const { name, copies, picture } of picturesIn(file)) {
    const id = await enterPicture(tx, actor, commissionId, { name, copies })
    const row = await Picture.findByPk(id, { transaction: tx, rejectOnEmpty: true })
    await enterMeasurement(tx, actor, row, measurementOf(picture, actor))
  }
  const leftOut = Object.keys(file).filter((part) => !KEPT_PARTS.has(part))
  await enterTrail(tx, {
    commissionId,
    actor,
    act: 'commission-imported',
    says: `Taken in from a commission file${leftOut.length > 0 ? `; not kept: ${leftOut.join(', ')}` : ''}`,
    document: { sectionSha256: file.section === undefined ? null : sectionSha256(file.section), leftOut },
  })
  return commissionId
}

interface PictureInFile {
  readonly name: string
  readonly copies: number
  readonly picture: CommissionFilePicture
}

function picturesIn({ picture, pictures, frame }: CommissionFile): readonly PictureInFile[] {
  const several = (pictures ?? []).map((one) => ({ name: one.name, copies: one.count, picture: one }))
  return picture === undefined
    ? several
    : [{ name: 'Picture', copies: frame?.count ?? 1, picture }, ...several]
}

/** The readings of the file; who took them and when, it does not say. */
function measurementOf(picture: CommissionFilePicture, actor: Actor): Measurement {
  const { width, height, diagonals, thickness, allowance, lining, stack } = picture
  if (width === undefined || height === undefined) throw new Error('a picture of four sides has no readings')
  return {
    width,
    height,
    diagonals,
    thickness: thickness ?? null,
    allowance,
    lining,
    stack: {
      glazing: stack?.glazing ?? null,
      airGap: stack?.airGap ?? null,
      backing: stack?.backing ?? null,
      fixings: stack?.fixings ?? null,
    },
    measuredBy: `${actor.name}, from a file`.slice(0, 200),
    measuredOn: today(),
    inFrame: false,
  }
}
