import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { compoundMitreOf, mitreAngleOf, tiltedMitreOf, unequalMitreOf } from '@shared/cutting'
import { Failure } from '@shared/failure'
import { expectWithin } from '../../helpers/expect-within'

describe('mitres', () => {
  it('of unequal rails follow the joint’s diagonal and add up to a right angle', () => {
    expectWithin(unequalMitreOf({ ownWidthMm: 40, otherWidthMm: 40 }), Math.PI / 4, { withinRad: 1e-15 })
    const own = unequalMitreOf({ ownWidthMm: 60, otherWidthMm: 30 })
    expectWithin(Math.tan(own), 0.5, { withinRatio: 1e-15 })
    expectWithin(own + unequalMitreOf({ ownWidthMm: 30, otherWidthMm: 60 }), Math.PI / 2, {
      withinRad: 1e-15,
    })
  })

  it('without tilt are π/n with an upright blade', () => {
    for (let sides = 3; sides <= 24; sides += 1) {
      expectWithin(tiltedMitreOf(sides, 0).mitreRad, mitreAngleOf(sides), { withinRad: 1e-15 })
      expectWithin(tiltedMitreOf(sides, 0).bevelRad, 0, { withinRad: 1e-15 })
    }
  })

  // tan bevel = sin mitre ÷ tan spring and cos bevel = sin(corner/2) ÷ cos mitre: the identities that the crown tables' source gives.
  it('keep the identities of sprung mouldings', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.05, max: 1.5, noNaN: true }),
        fc.double({ min: 0.05, max: 3.1, noNaN: true }),
        (springRad, cornerRad) => {
          const { mitreRad, bevelRad } = compoundMitreOf({ springRad, cornerRad })
          expectWithin(Math.tan(bevelRad), Math.sin(mitreRad) / Math.tan(springRad), { withinRatio: 1e-9 })
          expectWithin(Math.cos(bevelRad), Math.sin(cornerRad / 2) / Math.cos(mitreRad), {
            withinRatio: 1e-9,
          })
        },
      ),
    )
  })

  // The blade's plane is the plane that halves the corner: its normal, turned into the moulding's own axes, gives both angles.
  it('agree with turning the halving plane into the moulding lying on its back', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.05, max: 1.5, noNaN: true }),
        fc.double({ min: 0.1, max: 3.1, noNaN: true }),
        (springRad, cornerRad) => {
          const normal = { along: Math.sin(cornerRad / 2), out: Math.cos(cornerRad / 2) }
          const across = normal.out * Math.sin(springRad)
          const upward = normal.out * Math.cos(springRad)
          const { mitreRad, bevelRad } = compoundMitreOf({ springRad, cornerRad })
          expectWithin(mitreRad, Math.atan2(across, normal.along), { withinRad: 1e-12 })
          expectWithin(bevelRad, Math.asin(upward), { withinRad: 1e-12 })
        },
      ),
    )
  })

  it.each([
    ['two sides', () => mitreAngleOf(2)],
    ['half a side', () => mitreAngleOf(4.5)],
    ['a spring past upright', () => compoundMitreOf({ springRad: 1.6, cornerRad: 1 })],
    ['a corner of nothing', () => compoundMitreOf({ springRad: 1, cornerRad: 0 })],
    ['a width of 0', () => unequalMitreOf({ ownWidthMm: 0, otherWidthMm: 5 })],
  ])('refuse %s', (_name, make) => {
    expect(make).toThrow(Failure)
  })
})
