import { basisCountsOf } from '@shared/section'
import type { Section } from '@shared/section'

/** “Of 24 dimensions, 17 are measured on the photographs to ± 0.8 mm or better, 19 times in 20. 3 follow precedents. 4 are judged.” */
export function basisSentenceOf(
  section: Section,
  printSpread: (standardDeviationMm: number) => string,
): string {
  const { measured, precedent, judged, none } = basisCountsOf(section)
  const total = measured + precedent + judged + none
  const spread = greatestSpreadOf(section)
  const sure = spread === undefined ? '' : `, to ${printSpread(spread)} or better, 19 times in 20`
  const parts = [
    `Of ${total} ${total === 1 ? 'dimension' : 'dimensions'}, ${counted(measured, 'is', 'are')} measured on the photographs${sure}.`,
    precedent === 0 ? '' : `${counted(precedent, 'follows a precedent', 'follow precedents')}.`,
    judged === 0 ? '' : `${counted(judged, 'is', 'are')} judged.`,
    none === 0 ? '' : `${counted(none, 'has', 'have')} no basis yet.`,
  ]
  return parts.filter((part) => part !== '').join(' ')
}

const counted = (count: number, one: string, many: string) =>
  `${count === 0 ? 'none' : count} ${count === 1 ? one : many}`

/** The widest standard deviation of any measured dimension, mm. */
function greatestSpreadOf({ members, basis }: Section): number | undefined {
  const bases = [
    basis?.sightEdgeHeight,
    ...members.flatMap((member) => [member.basis?.width, member.basis?.rise]),
  ]
  const spreads = bases.flatMap((each) => (each?.kind === 'measured' ? [each.plusMinus] : []))
  return spreads.length === 0 ? undefined : Math.max(...spreads)
}
