import { Failure } from '@shared/failure'
import type { Fault } from '@shared/failure'
import { boundsOf, selfCrossingsOf } from '@shared/geometry'
import type { Outline, Segment } from '@shared/geometry'
import type { Section } from './document'
import { faceOf } from './face'
import type { Face } from './face'
import { hasGesso } from './gesso'
import { memberFaultsOf } from './member-faults'
import { outlineWith } from './outline'
import { frameFaultsOf, numberFaultsOf } from './section-faults'
import { saidMm } from './saying'
import { woodFaceUnder } from './wood-face'

/**
 * Every rule that a section breaks; paths are JSON pointers within the section. What needs the drawn face (that it stays above the wall and
 * crosses neither itself nor the rebate) is only looked at once the dimensions themselves are sound.
 */
export function faultsOfSection(section: Section): Fault[] {
  const wild = numberFaultsOf(section)
  if (wild.length > 0) return [...wild]
  const plain = [...frameFaultsOf(section), ...memberFaultsOf(section)]
  return plain.length > 0 ? plain : shapeFaultsOf(section)
}

/** The section itself where it is sound, else Failure 'input-invalid' with every fault. */
export function requireSoundSection(section: Section): Section {
  const faults = faultsOfSection(section)
  if (faults.length === 0) return section
  throw new Failure('input-invalid', { says: faults.map(({ says }) => says).join(' '), faults })
}

function shapeFaultsOf(section: Section): Fault[] {
  const face = faceOf(section)
  const outline = outlineWith(section, face.path)
  const faults = [...belowWallFaults(face), ...crossingFaults(section, face, outline)]
  if (faults.length > 0 || !hasGesso(section)) return faults
  return gessoShapeFaults(section, face)
}

function belowWallFaults({ path, memberOf }: Face): readonly Fault[] {
  const low = new Map<number, number>()
  for (const [index, segment] of path.entries()) {
    const { y } = boundsOf(segment).min
    const member = memberOf[index] ?? 0
    if (y <= 0) low.set(member, Math.min(y, low.get(member) ?? 0))
  }
  return [...low].map(([member, y]) => ({
    path: `/members/${member}`,
    code: 'face-below-wall',
    says: `Member ${member + 1} comes down to ${saidMm(y)} mm; the face must stay above the wall plane, 0 mm.`,
  }))
}

type Side = 'face' | 'rebate' | 'sight edge' | 'back' | 'back edge'

function crossingFaults(section: Section, { path, memberOf }: Face, outline: Outline): readonly Fault[] {
  const sideOf = (index: number): Side => (index < path.length ? 'face' : sideOfLine(section, outline[index]))
  const nameOf = (index: number): string =>
    index < path.length ? `member ${(memberOf[index] ?? 0) + 1}` : `the ${sideOf(index)}`
  const found = new Map<string, Fault>()
  for (const { segmentA, segmentB, point } of selfCrossingsOf(outline)) {
    const others = [sideOf(segmentA), sideOf(segmentB)].filter((side) => side !== 'face')
    const what = others[0] === undefined ? 'itself' : others[0].replace(' ', '-')
    const member = memberOf[segmentA]
    const at = member === undefined ? '/backSplay' : `/members/${member}`
    const place = `(${saidMm(point.x)}, ${saidMm(point.y)})`
    const says = `${sentence(nameOf(segmentA))} meets ${nameOf(segmentB)} at ${place}; the outline must not touch or cross itself.`
    const kind = `face-crosses-${what}`
    if (!found.has(`${at} ${kind}`)) found.set(`${at} ${kind}`, { path: at, code: kind, says })
  }
  return [...found.values()]
}

const sentence = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1)

function sideOfLine({ rebate }: Section, line: Segment | undefined): Side {
  if (!line) return 'back'
  const { start, end } = line
  const isWithinRebate = [start, end].every(({ x, y }) => x <= rebate.width && y <= rebate.depth)
  if (isWithinRebate && rebate.width > 0 && rebate.depth > 0) return 'rebate'
  if (start.x === 0 && end.x === 0) return 'sight edge'
  return start.y === 0 && end.y === 0 ? 'back' : 'back edge'
}

function gessoShapeFaults(section: Section, face: Face): Fault[] {
  const wood = woodFaceUnder(section, face)
  const start = wood.breaks[0]
  const end = wood.breaks.at(-1)
  const says =
    'The gesso is thicker than the wood has room for: it would reach the rebate, the wall or the far side of the face. Make it thinner.'
  const tooThick: Fault = { path: '/gesso', code: 'gesso-too-thick', says }
  if (wood.path.length === 0 || !start || !end) return [tooThick]
  const { rebate, backSplay } = section
  const lip = rebate.width > 0 ? start.y - rebate.depth : start.y
  if (lip <= 0 || end.y <= 0 || (backSplay.x > 0 && end.y < backSplay.height)) return [tooThick]
  if (boundsOf(wood.path).min.y <= 0) return [tooThick]
  return selfCrossingsOf(outlineWith(section, wood.path)).length > 0 ? [tooThick] : []
}
