import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { Failure } from '@shared/failure'
import { mitreGapOf, movementOf } from '@shared/timber'
import type { MovementRequest } from '@shared/timber'
import { expectWithin } from '../../helpers/expect-within'

const BASSWOOD: MovementRequest = {
  species: 'basswood',
  cut: 'flat',
  widthMm: 100,
  fromPercent: 8,
  toPercent: 10,
}

describe('movementOf', () => {
  // Basswood: tangential 0.00330, radial 0.00230; 100 mm, 8 to 10 %: 0.66 mm flat-sawn, 0.46 mm quarter-sawn.
  it('swells as moisture rises, by the figure that lies along the width', () => {
    expectWithin(movementOf(BASSWOOD).changeMm, 0.66, { withinMm: 1e-12 })
    expectWithin(movementOf({ ...BASSWOOD, cut: 'quarter' }).changeMm, 0.46, { withinMm: 1e-12 })
  })

  it('turns the figures round for the thickness', () => {
    expectWithin(movementOf({ ...BASSWOOD, direction: 'thickness' }).changeMm, 0.46, { withinMm: 1e-12 })
    const quarter = movementOf({ ...BASSWOOD, cut: 'quarter', direction: 'thickness' })
    expectWithin(quarter.changeMm, 0.66, { withinMm: 1e-12 })
  })

  it('shrinks as moisture falls', () => {
    expectWithin(movementOf({ ...BASSWOOD, fromPercent: 10, toPercent: 8 }).changeMm, -0.66, {
      withinMm: 1e-12,
    })
  })

  it('takes the coefficient up to 6 and 14 % and the straight line beyond', () => {
    expect(movementOf({ ...BASSWOOD, fromPercent: 6, toPercent: 14 }).method).toBe('coefficient')
    expect(movementOf({ ...BASSWOOD, fromPercent: 5.9 }).method).toBe('shrinkage')
    expect(movementOf({ ...BASSWOOD, toPercent: 14.1 }).method).toBe('shrinkage')
  })

  // From 30 % to 0: 100 · (−30) / (3000/9.3 − 30 + 30) = −9.3: the whole tangential shrinkage of Table 4-3.
  it('loses the whole shrinkage from 30 % to ovendry', () => {
    expectWithin(movementOf({ ...BASSWOOD, fromPercent: 30, toPercent: 0 }).changeMm, -9.3, {
      withinMm: 1e-12,
    })
  })

  it('comes back to the width it started from by the straight line', () => {
    const percent = fc.double({ min: 0, max: 30, noNaN: true })
    fc.assert(
      fc.property(percent, percent, (fromPercent, toPercent) => {
        const away = movementOf({ ...BASSWOOD, fromPercent, toPercent })
        if (away.method === 'coefficient') return
        const back = movementOf({
          ...BASSWOOD,
          widthMm: 100 + away.changeMm,
          fromPercent: toPercent,
          toPercent: fromPercent,
        })
        expectWithin(back.changeMm, -away.changeMm, { withinMm: 1e-9 })
      }),
    )
  })

  it('tells how sure the figure is', () => {
    expect(movementOf(BASSWOOD).status).toBe('published')
    expect(movementOf({ ...BASSWOOD, species: 'yellow-poplar' }).status).toBe('second-party')
    expect(movementOf({ ...BASSWOOD, species: 'mahogany' }).status).toBe('from memory')
  })

  it.each([-0.1, 30.1, Number.NaN, Number.POSITIVE_INFINITY])('refuses a moisture of %f %%', (percent) => {
    expect(() => movementOf({ ...BASSWOOD, toPercent: percent })).toThrow(/between 0 and 30 %/)
    expect(() => movementOf({ ...BASSWOOD, fromPercent: percent })).toThrow(Failure)
  })
})

describe('mitreGapOf', () => {
  it('opens at the back edge by √2 of the swelling of a rectangle’s rails, at the sight edge when they shrink', () => {
    expectWithin(mitreGapOf(0.5), Math.SQRT2 * 0.5, { withinMm: 1e-12 })
    expectWithin(mitreGapOf(-0.5), -Math.SQRT2 * 0.5, { withinMm: 1e-12 })
  })
})
