import { runningFiguresOf } from './running'
import type { HeadRunning } from './running'

/** The cautions that go with every knife, on screen, sheet and letter. */
export const KNIFE_CAUTIONS: readonly string[] = [
  'Knives are balanced, clamped and set by a competent person.',
  'The greatest speed marked on the head is never exceeded.',
  'The maker’s data for head, knives and machine, local rules and the mill’s own practice come before anything said here.',
  'The section at 1:1 is the master; the corrected outline is for a grinder who does not allow for the hook.',
]

const HAND_FEED_CAUTION =
  'For hand feed only tools marked for it are used, with the knife’s projection limited as their maker says.'

/** Marks per inch under which even plain work looks rough: a trade magazine's figures, 16 to 20 plain, 20 and more usual. */
export const FEWEST_MARKS_PER_INCH = 16

/** Cautions of this head as it is run: the standing ones, then those that its figures call for. */
export function knifeCautionsOf(running: HeadRunning): string[] {
  const { marksPerInch, feedPerMarkMm, waveHeightMm } = runningFiguresOf(running)
  const cautions = [...KNIFE_CAUTIONS]
  if (running.feedBy === 'manual') cautions.push(HAND_FEED_CAUTION)
  if (marksPerInch !== undefined && marksPerInch < FEWEST_MARKS_PER_INCH) {
    cautions.push(
      `There are ${marksPerInch.toFixed(1)} knife marks to the inch; 20 and more are usual for a face that is to be finished. Slow the feed, or joint the knives.`,
    )
  }
  if (feedPerMarkMm !== undefined && waveHeightMm === undefined) {
    cautions.push(
      'The feed per mark is larger than the cutting circle: no face is left. Check feed and speed.',
    )
  }
  return cautions
}
