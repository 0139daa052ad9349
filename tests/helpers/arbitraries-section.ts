import fc from 'fast-check'
import { faultsOfSection, withDefaults } from '@shared/section'
import type { Free, Member, Section } from '@shared/section'

/** Sizes on a grid of a hundredth of a millimetre, so that counterexamples can be read. */
const anySize = (least: number, greatest: number): fc.Arbitrary<number> =>
  fc.integer({ min: least * 100, max: greatest * 100 }).map((hundredths) => hundredths / 100)

const anyRise = (greatest: number): fc.Arbitrary<number> =>
  fc.tuple(anySize(0.5, greatest), fc.boolean()).map(([rise, isUp]) => (isUp ? rise : -rise))

const level = <Kind extends string>(kind: Kind) => ({ kind: fc.constant(kind), rise: fc.constant(0) })
const climbing = <Kind extends string>(kind: Kind) => ({
  kind: fc.constant(kind),
  width: anySize(1, 14),
  rise: anyRise(6),
})

/** Two quarter circles whose rise is less than their width. */
const swinging = <Kind extends 'scotia' | 'torus'>(kind: Kind) =>
  fc.tuple(anySize(2, 12), fc.integer({ min: -8, max: 8 })).map(([width, tenths]) => {
    return { kind, width, rise: Math.round(width * tenths * 10) / 100 }
  })

/** A free member of two cubics that run smoothly on at their joint, where both are level. */
const anyFree = (): fc.Arbitrary<Free> =>
  fc.tuple(anySize(4, 16), anyRise(5)).map(([width, rise]) => {
    const half = width / 2
    return {
      kind: 'free',
      width,
      rise,
      curves: [
        [
          [half / 3, rise / 4],
          [half * 0.7, rise / 2],
          [half, rise / 2],
        ],
        [
          [half * 1.3, rise / 2],
          [width * 0.9, rise * 0.8],
          [width, rise],
        ],
      ],
    }
  })

/** A sound member of any of the fourteen kinds. */
export const anyMember = (): fc.Arbitrary<Member> =>
  fc.oneof<fc.Arbitrary<Member>[]>(
    anySize(0.5, 12).map((width) => ({ kind: 'fillet', width, rise: 0 })),
    anyRise(6).map((rise) => ({ kind: 'fillet', width: 0, rise })),
    fc.record(climbing('splay')),
    fc.record(climbing('cavetto')),
    fc.record(climbing('ovolo')),
    fc.record({ ...climbing('thumb'), hollow: fc.boolean() }),
    fc.record(climbing('cyma-recta')),
    fc.record(climbing('cyma-reversa')),
    swinging('scotia'),
    swinging('torus'),
    fc.record({ ...level('bead'), width: anySize(1, 8) }),
    fc.record({
      ...level('reeds'),
      width: anySize(6, 16),
      count: fc.integer({ min: 1, max: 4 }),
      fillet: fc.constantFrom(0, 0.5),
    }),
    fc.record({
      ...level('flutes'),
      width: anySize(8, 16),
      count: fc.integer({ min: 1, max: 3 }),
      fillet: fc.constantFrom(0, 0.5),
      depth: fc.constantFrom(0.4, 1),
    }),
    fc.record({
      ...level('quirk'),
      width: anySize(1, 4),
      depth: anySize(0.5, 4),
      shape: fc.constantFrom('square', 'v'),
    }),
    anyFree(),
  )

/** A sound section of up to twelve members, its face drawn and found whole; without gesso unless given. */
export const anySection = (gesso: fc.Arbitrary<number> = fc.constant(0)): fc.Arbitrary<Section> =>
  fc
    .record({
      sightEdgeHeight: anySize(50, 70),
      rebate: fc.record({ width: anySize(3, 8), depth: anySize(5, 20) }),
      // a wide fillet first, so that the rebate fits under any face
      members: fc.array(anyMember(), { minLength: 1, maxLength: 11 }),
      backSplay: fc.constantFrom({ x: 0, height: 0 }, { x: 2, height: 6 }),
      gesso,
    })
    .map(({ members, ...rest }) =>
      withDefaults({ ...rest, members: [{ kind: 'fillet', width: 12, rise: 0 }, ...members] }),
    )
    .filter((section) => faultsOfSection(section).length === 0)

/** Any section at all: sizes that make no sense, not-a-number and infinity among them. */
export const anyWildSection = (): fc.Arbitrary<Section> => {
  const wild = fc.oneof(
    fc.double(),
    fc.constantFrom(0, -0, NaN, Infinity, -Infinity, 1e308, 5e-324, 1e-9, 10_000, -10_000),
    fc.double({ min: -20, max: 40, noNaN: true }),
  )
  const tame = fc.double({ min: -20, max: 40, noNaN: true })
  return fc.boolean().chain((isTame) => {
    const size = isTame ? tame : wild
    const member = fc.oneof(
      fc.record({
        kind: fc.constantFrom('fillet', 'splay', 'scotia', 'torus', 'bead', 'thumb'),
        width: size,
        rise: size,
      }),
      fc.record({
        kind: fc.constantFrom('cavetto', 'ovolo', 'cyma-recta', 'cyma-reversa'),
        width: size,
        rise: size,
        arc: size,
      }),
      fc.record({
        kind: fc.constantFrom('reeds', 'flutes'),
        width: size,
        rise: fc.constant(0),
        count: fc.oneof(size, fc.integer({ min: 1, max: 5 })),
        fillet: size,
        depth: size,
      }),
      fc.record({
        kind: fc.constant('free'),
        width: size,
        rise: size,
        curves: fc.array(fc.tuple(fc.tuple(size, size), fc.tuple(size, size), fc.tuple(size, size)), {
          maxLength: 2,
        }),
      }),
    ) as fc.Arbitrary<Member>
    return fc.record({
      sightEdgeHeight: size,
      rebate: fc.record({ width: size, depth: size }),
      backSplay: fc.record({ x: size, height: size }),
      gesso: size,
      tolerance: size,
      members: fc.array(member, { maxLength: 4 }),
    })
  })
}
