import type { CommissionAnswerData, CommissionFile } from '@shared/contracts'
import { faultsOfSection, measuresOf } from '@shared/section'
import type { Section } from '@shared/section'
import { Failure } from '@shared/failure'
import { finishAnswerOf } from './finish-answer'
import { knifeAnswerOf } from './knife-answer'
import { planAnswerOf } from './plan-answer'
import { railedPicturesOf, railsAnswerOf } from './rails-answer'
import { sectionAnswerOf, woodAnswerOf } from './section-answer'
import { timberAnswerOf } from './timber-answer'

/**
 * Everything that can be computed from a commission file; parts without input are absent. Throws input-invalid with
 * every fault of the section, or the first that a later part finds, each with its JSON pointer in the file.
 */
export function answerOf(file: CommissionFile): CommissionAnswerData {
  const section = soundSectionOf(file)
  const measures = section && measuresOf(section)
  const railed = section && measures ? railedPicturesOf(file, section, measures) : []
  const frames = railed.map(({ frame }) => frame)
  const [only] = railed
  const plan = planAnswerOf(file, railed)
  return {
    ...(section &&
      measures && {
        section: sectionAnswerOf(section, measures),
        wood: woodAnswerOf(file, section, measures),
      }),
    ...(section && file.head && withKnife(section, file.head)),
    ...(file.picture && only && { rails: railsAnswerOf(file, only.frame) }),
    ...(file.pictures &&
      measures && {
        pictures: railed.map(({ name = '', frame }) => ({ name, rails: railsAnswerOf(file, frame) })),
      }),
    ...(plan && { plan }),
    ...(file.timber && { timber: timberAnswerOf(file, file.timber, { measures, frames }) }),
    ...(file.finish && section && { finish: finishAnswerOf(file.finish.zones, section, frames) }),
    ...(file.photographs && { photographs: file.photographs.map(photographAnswer) }),
  }
}

/** The file's section, once it is known to be drawable; undefined where the file has none. */
export function soundSectionOf({ section }: CommissionFile): Section | undefined {
  if (section === undefined) return undefined
  const faults = faultsOfSection(section).map((fault) => ({ ...fault, path: `/section${fault.path}` }))
  if (faults.length === 0) return section
  throw new Failure('input-invalid', {
    says: faults.map(({ path, says }) => `${path} ${says}`).join('\n'),
    faults,
  })
}

function withKnife(section: Section, head: NonNullable<CommissionFile['head']>) {
  const knife = knifeAnswerOf(section, head)
  return knife === undefined ? {} : { knife }
}

/** Marks are read and kept, but no section is worked out from them yet: that is said, and nothing is invented. */
const photographAnswer = ({ id }: { readonly id: string }) => ({
  id,
  says: [
    {
      code: 'not-solved',
      text: 'The marks on this photograph are not solved into breaks yet; widths and heights must be given as members.',
    },
  ],
})
