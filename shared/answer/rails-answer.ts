import type { CommissionAnswerData, CommissionFile, CommissionFilePicture } from '@shared/contracts'
import { Failure } from '@shared/failure'
import type { Section, SectionMeasures } from '@shared/section'
import { massOf } from '@shared/timber'
import { frameRailsOf } from './frame-rails'
import type { FrameRails } from './frame-rails'
import { workshopMoistureOf } from './timber-answer'

export interface RailedPicture {
  /** JSON pointer of the picture in the file. */
  readonly path: string
  readonly name: string | undefined
  readonly frame: FrameRails
}

/** The rails of every picture of the file, one or several. A fault is told with its place in the file. */
export function railedPicturesOf(
  file: CommissionFile,
  section: Section,
  measures: SectionMeasures,
): RailedPicture[] {
  const { sides = 4, count = 1 } = file.frame ?? {}
  const single: readonly PicturePlace[] =
    file.picture === undefined ? [] : [{ path: '/picture', name: undefined, picture: file.picture, count }]
  const several = (file.pictures ?? []).map((picture, index) => ({
    path: `/pictures/${index}`,
    name: picture.name,
    picture,
    count: picture.count,
  }))
  return [...single, ...several].map(({ path, name, picture, count: frames }) => ({
    path,
    name,
    frame: placed(path, () =>
      frameRailsOf({ picture, sides, count: frames, rebateWidthMm: section.rebate.width, measures }),
    ),
  }))
}

interface PicturePlace {
  readonly path: string
  readonly name: string | undefined
  readonly picture: CommissionFilePicture
  readonly count: number
}

/** Runs the work; faults in it are told with the place in the file before their own. */
export function placed<T>(path: string, work: () => T): T {
  try {
    return work()
  } catch (error) {
    if (!(error instanceof Failure) || error.code !== 'input-invalid') throw error
    const { faults = [{ path: '', code: 'invalid', says: error.message }] } = error.details
    throw new Failure(
      'input-invalid',
      { ...error.details, faults: faults.map((fault) => ({ ...fault, path: path + fault.path })) },
      { cause: error },
    )
  }
}

export function railsAnswerOf(
  file: CommissionFile,
  frame: FrameRails,
): NonNullable<CommissionAnswerData['rails']> {
  const { openingMm, sightMm, outsideMm, coverMm, rails, footageMm, volumeMm3 } = frame
  const { timber } = file
  return {
    rebateOpening: [...openingMm],
    sight: [...sightMm],
    outside: [...outsideMm],
    cover: [...coverMm],
    list: rails.map(({ side, count, longPointMm, rebateMm, sightMm: sight, mitreDeg }) => ({
      side,
      count,
      longPoint: longPointMm,
      rebate: rebateMm,
      sight,
      mitre: mitreDeg,
    })),
    footage: footageMm,
    volume: volumeMm3,
    ...(timber !== undefined && {
      mass: placed('/timber', () => massOf(volumeMm3, timber.species, workshopMoistureOf(timber))),
    }),
  }
}
