import type { Section } from '@shared/section'
import { onDay } from '../days'
import { addMeasuredPicture, drawSection, takeOn } from '../drawing-acts'
import type { DemoPicture } from '../drawing-acts'
import { showPhotograph } from '../photographs'
import type { DemoPhotograph } from '../photographs'
import { decide, putForwardNow } from '../review-acts'
import type { Story } from '../story'

/** A commission that went straight through review. Days are counted back from today. */
export interface Approved {
  readonly about: Parameters<typeof takeOn>[1]
  readonly picture: DemoPicture
  readonly photograph?: DemoPhotograph
  readonly section: Section
  readonly designer: 'tobias' | 'ines'
  readonly curator: 'hanna' | 'piers'
  readonly days: Readonly<Record<'taken' | 'measured' | 'drawn' | 'putForward' | 'approved', number>>
  readonly note: string
  readonly statement: string
}

/** From the first letter to the approval; gives the approved issue's key. */
export async function approved({ people }: Story, told: Approved): Promise<string> {
  const { about, picture, photograph, section, days, note, statement } = told
  const designer = people[told.designer]
  const commissionId = await onDay(days.taken, 9, () => takeOn(people.maren, about))
  await onDay(days.measured, 10.5, () => addMeasuredPicture(designer, commissionId, picture))
  if (photograph !== undefined)
    await onDay(days.measured, 16, () => showPhotograph(designer, commissionId, photograph))
  await onDay(days.drawn, 13, () => drawSection(designer, commissionId, section))
  const issueId = await onDay(days.putForward, 15, () => putForwardNow(designer, commissionId, note))
  await onDay(days.approved, 11, () => decide(people[told.curator], issueId, 'approve', statement))
  return issueId
}
