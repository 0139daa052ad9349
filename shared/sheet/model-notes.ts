import { wordOf } from '@shared/units'
import type { SheetInput } from './sheet-input'
import { statusText } from './title-block'

/** The lines that go with the geometry into a DXF, where no title block does. */
export function modelNotes(input: SheetInput): string[] {
  const { state, vocabulary, section } = input
  const issue = state.kind === 'issue' ? `issue ${state.letter}, ${statusText(input)}` : statusText(input)
  return [
    `${input.commissionNumber}  ${input.title.slice(0, 120)}`,
    issue,
    ...(state.kind === 'issue' ? [`SHA-256 ${state.sha256}`] : []),
    'Millimetres, 1:1. Origin: the line of the sight edge at the wall plane.',
    section.gesso === 0
      ? `WOOD and REBATE together are the outline.`
      : 'WOOD and REBATE together are the outline to be cut; FINISHED_FACE is the face after gesso.',
    'Not corrected for the hook of the knife.',
    `Run no ${wordOf(vocabulary, 'timber')} before the ${wordOf(vocabulary, 'first-off')} is accepted in writing.`,
  ]
}
