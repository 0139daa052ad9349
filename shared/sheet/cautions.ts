import { KNIFE_CAUTIONS } from '@shared/knife'
import { wordOf } from '@shared/units'
import type { SheetInput } from './sheet-input'

/** What every sheet says, whoever reads it, in the workshop's words. */
export function standingCautions({ vocabulary, section }: SheetInput, scaleText: string): string[] {
  const timber = wordOf(vocabulary, 'timber')
  const firstOff = wordOf(vocabulary, 'first-off')
  return [
    scaleText === '1:1'
      ? 'Do not scale: work to the figures. The section is drawn at 1:1; prove the print by the bar.'
      : `Do not scale: work to the figures. The section is drawn at ${scaleText}; the DXF holds it at 1:1.`,
    `Run no ${timber} before the ${firstOff} is accepted in writing.`,
    section.gesso === 0
      ? 'The face is bare wood: what is drawn wide is what is cut.'
      : 'Cut the wood face, drawn wide. The narrow line beside it is the finished face after gesso and leaf.',
    'Nothing here is corrected for the hook of the knife.',
    ...KNIFE_CAUTIONS,
  ]
}
