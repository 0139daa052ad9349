import { wordOf } from '@shared/units'
import type { Vocabulary } from '@shared/units'
import type { Member, Section } from './document'
import { hasGesso, thickestGessoOf } from './gesso'
import { saidMm } from './saying'

export interface DescribeOptions {
  readonly vocabulary?: Vocabulary
}

/** A section in plain sentences for those who cannot see its drawing: from the sight edge outward, lengths in millimetres. */
export function describeSection(section: Section, { vocabulary = 'moulding' }: DescribeOptions = {}): string {
  const { members, sightEdgeHeight } = section
  const width = members.reduce((sum, member) => sum + member.width, 0)
  const rise = members.reduce((sum, member) => sum + member.rise, 0)
  const count = members.length === 1 ? 'one member' : `${members.length} members`
  const head = `A ${wordOf(vocabulary, 'moulding')} of ${count}, ${saidMm(width)} mm wide from sight edge to back edge.`
  const edges = `The sight edge is ${saidMm(sightEdgeHeight)} mm high, the back edge ${saidMm(sightEdgeHeight + rise)} mm.`
  const list = members.map((member, index) => `${index + 1}. ${memberText(member, vocabulary)}.`)
  return [head, edges, ...list, ...backTexts(section, vocabulary)].join('\n')
}

function memberText(member: Member, vocabulary: Vocabulary): string {
  const name = member.kind === 'splay' ? wordOf(vocabulary, 'splay') : member.kind.replace('-', ' ')
  const across = member.width > 0 ? `${saidMm(member.width)} mm wide` : 'upright'
  const climb = `${member.rise > 0 ? 'rising' : 'falling'} ${saidMm(Math.abs(member.rise))} mm`
  return `${name}${detailText(member)}, ${across}${member.rise === 0 ? '' : `, ${climb}`}`
}

function detailText(member: Member): string {
  switch (member.kind) {
    case 'thumb':
      return member.hollow === true ? ', hollow' : ''
    case 'reeds':
      return ` of ${member.count}`
    case 'flutes':
      return ` of ${member.count}, ${saidMm(member.depth)} mm deep`
    case 'quirk':
      return `, ${member.shape === 'v' ? 'V-shaped' : 'square'}, ${saidMm(member.depth)} mm deep`
    case 'free':
      return ' curve'
    default:
      return ''
  }
}

function backTexts(section: Section, vocabulary: Vocabulary): readonly string[] {
  const { rebate, backSplay } = section
  const word = wordOf(vocabulary, 'rebate')
  const texts: string[] = []
  if (rebate.width > 0 && rebate.depth > 0)
    texts.push(`The ${word} is ${saidMm(rebate.width)} mm wide and ${saidMm(rebate.depth)} mm deep.`)
  if (backSplay.x > 0 && backSplay.height > 0)
    texts.push(
      `The back edge leans in by ${saidMm(backSplay.x)} mm from ${saidMm(backSplay.height)} mm above the wall.`,
    )
  if (hasGesso(section)) texts.push(gessoText(section))
  return texts
}

function gessoText(section: Section): string {
  const thickness = `${saidMm(thickestGessoOf(section))} mm`
  return typeof section.gesso === 'number'
    ? `The face carries ${thickness} of gesso.`
    : `Parts of the face carry gesso, ${thickness} at the thickest.`
}
