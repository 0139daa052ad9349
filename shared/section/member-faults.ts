import { assertNever } from '@shared/failure'
import type { Fault } from '@shared/failure'
import type { Basis, Flutes, Member, Reeds, Section } from './document'
import { LEAST_MM } from './breach'
import type { Breach } from './breach'
import { freeBreaches } from './free-faults'
import { rowChordOf } from './member-segments'
import { saidMm } from './saying'

const GREATEST_COUNT = 1000

/** Every rule of its own kind that a member breaks; numbers are known to be finite. */
export function memberFaultsOf({ members }: Section): readonly Fault[] {
  return members.flatMap((member, index) =>
    [...sizeBreaches(member), ...kindBreaches(member), ...basisBreaches(member)].map(
      ({ field, code, says }) => ({
        path: `/members/${index}/${field}`,
        code,
        says: `Member ${index + 1} (${member.kind.replace('-', ' ')}): ${says}`,
      }),
    ),
  )
}

function sizeBreaches(member: Member): readonly Breach[] {
  const { width, rise } = member
  const breaches: Breach[] = []
  if (width < 0)
    breaches.push({
      field: 'width',
      code: 'width-negative',
      says: `the width is ${width} mm; it must be 0 or more.`,
    })
  for (const field of ['width', 'rise'] as const) {
    const size = Math.abs(member[field])
    if (size > 0 && size < LEAST_MM)
      breaches.push({
        field,
        code: 'too-small',
        says: `the ${field} is ${member[field]} mm; it must be 0 or at least ${LEAST_MM} mm.`,
      })
  }
  if (width === 0 && rise === 0)
    breaches.push({
      field: 'width',
      code: 'zero-length',
      says: 'both width and rise are 0; give it a size or take it out.',
    })
  return breaches
}

function kindBreaches(member: Member): readonly Breach[] {
  switch (member.kind) {
    case 'fillet':
      return member.width !== 0 && member.rise !== 0
        ? [
            {
              field: 'rise',
              code: 'fillet-leans',
              says: `a fillet is level or upright; the width is ${member.width} mm and the rise ${member.rise} mm: make one of them 0, or use a splay.`,
            },
          ]
        : []
    case 'splay':
      return chordBreaches(member, 'a splay leans')
    case 'thumb':
      return chordBreaches(member, 'a thumb rises or falls')
    case 'cavetto':
    case 'ovolo':
    case 'cyma-recta':
    case 'cyma-reversa':
      return [...chordBreaches(member, 'the curve rises or falls'), ...arcBreaches(member.arc)]
    case 'scotia':
    case 'torus':
      return Math.abs(member.rise) < member.width
        ? []
        : [
            {
              field: 'rise',
              code: 'rise-too-great',
              says: `the rise is ${member.rise} mm and the width ${member.width} mm; the rise, up or down, must be less than the width.`,
            },
          ]
    case 'bead':
      return levelBreaches(member)
    case 'reeds':
      return [...levelBreaches(member), ...rowBreaches(member)]
    case 'flutes':
      return [...levelBreaches(member), ...rowBreaches(member), ...fluteBreaches(member)]
    case 'quirk':
      return [...levelBreaches(member), ...depthBreaches(member.depth)]
    case 'free':
      return freeBreaches(member)
    default:
      return assertNever(member)
  }
}

/** The chord stands between level and upright: neither part is 0. */
function chordBreaches({ width, rise }: Member, what: string): readonly Breach[] {
  if (width === 0 && rise === 0) return []
  return (['width', 'rise'] as const)
    .filter((field) => (field === 'width' ? width : rise) === 0)
    .map((field) => ({
      field,
      code: 'chord-straight',
      says: `the ${field} is 0 mm; ${what}, so that it must not be 0.`,
    }))
}

function arcBreaches(arc: number | undefined): readonly Breach[] {
  if (arc === undefined || (arc > 0 && arc <= 180)) return []
  return [
    {
      field: 'arc',
      code: 'arc-out-of-range',
      says: `the arc is ${arc}°; it must be more than 0° and at most 180°.`,
    },
  ]
}

function levelBreaches({ width, rise }: Member): readonly Breach[] {
  const breaches: Breach[] = []
  if (rise !== 0)
    breaches.push({
      field: 'rise',
      code: 'rise-not-level',
      says: `the rise is ${rise} mm; it must be 0 for this kind.`,
    })
  if (width === 0 && rise !== 0)
    breaches.push({
      field: 'width',
      code: 'width-missing',
      says: 'the width is 0 mm; it must be more than 0.',
    })
  return breaches
}

function rowBreaches(row: Reeds | Flutes): readonly Breach[] {
  const { count, fillet, width } = row
  if (!Number.isInteger(count) || count < 1 || count > GREATEST_COUNT)
    return [
      {
        field: 'count',
        code: 'count-out-of-range',
        says: `there are ${count} of them; it must be a whole number from 1 to ${GREATEST_COUNT}.`,
      },
    ]
  if (fillet < 0 || (fillet > 0 && fillet < LEAST_MM))
    return [
      {
        field: 'fillet',
        code: 'fillet-out-of-range',
        says: `the fillets are ${fillet} mm; they must be 0 or more, and at least ${LEAST_MM} mm where there are any.`,
      },
    ]
  if (width > 0 && rowChordOf(row) < LEAST_MM)
    return [
      {
        field: 'fillet',
        code: 'fillets-too-wide',
        says: `${count - 1} fillets of ${fillet} mm leave nothing of the width of ${width} mm; they must take less than it.`,
      },
    ]
  return []
}

function fluteBreaches(flutes: Flutes): readonly Breach[] {
  const shallow = depthBreaches(flutes.depth)
  const half = rowChordOf(flutes) / 2
  if (shallow.length > 0 || !(half > 0) || flutes.depth <= half * (1 + 1e-12)) return shallow
  return [
    {
      field: 'depth',
      code: 'flute-too-deep',
      says: `the depth is ${flutes.depth} mm; a flute ${saidMm(2 * half)} mm wide is at most half as deep, ${saidMm(half)} mm.`,
    },
  ]
}

function depthBreaches(depth: number): readonly Breach[] {
  if (depth >= LEAST_MM) return []
  return [
    { field: 'depth', code: 'depth-missing', says: `the depth is ${depth} mm; it must be more than 0.` },
  ]
}

function basisBreaches({ basis }: Member): readonly Breach[] {
  return (['width', 'rise'] as const).flatMap((side) => {
    const says = basisFaultOf(basis?.[side])
    return says === undefined
      ? []
      : [
          {
            field: `basis/${side}/plusMinus`,
            code: 'plus-minus-negative',
            says: `the ${side}'s basis: ${says}`,
          },
        ]
  })
}

/** What is wrong with a basis, or undefined. */
export function basisFaultOf(basis: Basis | undefined): string | undefined {
  if (basis?.kind !== 'measured' || basis.plusMinus >= 0) return undefined
  return `the ± is ${basis.plusMinus} mm; it must be 0 or more.`
}
