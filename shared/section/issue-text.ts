import { assertNever } from '@shared/failure'
import { canonicalText } from './canonical'
import { withDefaults } from './defaults'
import { sha256Hex } from './digest'
import type { Basis, Member, MemberBasis, Section } from './document'

/** Version of the commission file whose section an issue freezes. */
const LISTEL_VERSION = 1

/**
 * The text that an issue freezes and its hash is taken of: RFC 8785 canonical JSON of {listel, section}, millimetres, defaults filled in.
 * What says nothing is left out (an empty basis, hollow: false, no corners, an empty list of gesso), and so is anything that is no part of
 * a section, such as a draft's keys: equal sections have equal texts.
 */
export const issueTextOf = (section: Section): string =>
  canonicalText({ listel: LISTEL_VERSION, section: plainSectionOf(section) })

/** SHA-256 of the issue's text: printed on every sheet, stored with the approval. */
export const sectionSha256 = (section: Section): string => sha256Hex(issueTextOf(section))

/** A section with the fields of the commission file alone, in their shortest form. */
export function plainSectionOf(given: Section): Section {
  const section = withDefaults(given)
  const { sightEdgeHeight, rebate, backSplay, gesso, tolerance, basis } = section
  return {
    sightEdgeHeight,
    rebate: { width: rebate.width, depth: rebate.depth },
    backSplay: { x: backSplay.x, height: backSplay.height },
    gesso: plainGessoOf(gesso),
    tolerance,
    members: section.members.map(plainMemberOf),
    ...(basis?.sightEdgeHeight && { basis: { sightEdgeHeight: plainBasisOf(basis.sightEdgeHeight) } }),
  }
}

function plainGessoOf(gesso: Section['gesso']): Section['gesso'] {
  if (typeof gesso === 'number') return gesso
  if (gesso.length === 0) return 0
  return gesso.map(({ from, to, thickness }) => ({ from, to, thickness }))
}

function plainMemberOf(member: Member): Member {
  const basis = plainMemberBasisOf(member.basis)
  const common = { width: member.width, rise: member.rise, ...(basis && { basis }) }
  switch (member.kind) {
    case 'cavetto':
    case 'ovolo':
    case 'cyma-recta':
    case 'cyma-reversa':
      return { kind: member.kind, ...common, ...(member.arc !== undefined && { arc: member.arc }) }
    case 'thumb':
      return { kind: member.kind, ...common, ...(member.hollow === true && { hollow: true }) }
    case 'reeds':
      return { kind: member.kind, ...common, count: member.count, fillet: member.fillet }
    case 'flutes':
      return { kind: member.kind, ...common, count: member.count, fillet: member.fillet, depth: member.depth }
    case 'quirk':
      return { kind: member.kind, ...common, depth: member.depth, shape: member.shape }
    case 'free': {
      const { curves, corners = [] } = member
      return { kind: member.kind, ...common, curves, ...(corners.length > 0 && { corners }) }
    }
    default:
      return { kind: member.kind, ...common }
  }
}

function plainMemberBasisOf(basis: MemberBasis | undefined): MemberBasis | undefined {
  if (basis?.width === undefined && basis?.rise === undefined) return undefined
  return {
    ...(basis.width && { width: plainBasisOf(basis.width) }),
    ...(basis.rise && { rise: plainBasisOf(basis.rise) }),
  }
}

function plainBasisOf(basis: Basis): Basis {
  switch (basis.kind) {
    case 'measured': {
      const { kind, plusMinus, photograph } = basis
      return { kind, plusMinus, ...(photograph !== undefined && { photograph }) }
    }
    case 'precedent':
      return { kind: basis.kind, citation: basis.citation }
    case 'judged':
      return { kind: basis.kind, note: basis.note }
    default:
      return assertNever(basis)
  }
}
