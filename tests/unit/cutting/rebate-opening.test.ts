import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { coverOf, polygonCoverOf, polygonOpeningOf, rebateOpeningOf } from '@shared/cutting'
import { Failure } from '@shared/failure'
import { expectWithin } from '../../helpers/expect-within'

const PICTURE = { width: [914, 914.5], height: [610], allowance: 3, lining: 0.5 }

describe('rebateOpeningOf', () => {
  // Greatest readings + 3 + 2 × 0.5.
  it('takes the greatest readings where there are no two diagonals', () => {
    const expected = { opening: { kind: 'rectangle', widthMm: 918.5, heightMm: 614 }, skewRad: 0 }
    expect(rebateOpeningOf(PICTURE)).toEqual(expected)
    expect(rebateOpeningOf({ ...PICTURE, diagonals: [1099] })).toEqual(expected)
    expect(rebateOpeningOf({ ...PICTURE, diagonals: [1099, 1099] })).toEqual(expected)
  })

  // sin δ = (1099² − 1098.2²) ÷ (4 × 914.25 × 610) = 1757.76 ÷ 2 230 770 = 0.000787961: 0.480656 mm over the height of 610,
  // 0.720590 mm over the width. (914.5 + 0.4807) × 610 is the smaller.
  it('adds the lean of the picture one way or the other, whichever is less', () => {
    const { opening, skewRad } = rebateOpeningOf({ ...PICTURE, diagonals: [1099, 1098.2] })
    expectWithin(skewRad, Math.asin(1757.76 / 2_230_770), { withinRad: 1e-12 })
    expectWithin(opening.widthMm, 914.5 + 610 * (1757.76 / 2_230_770) + 4, { withinMm: 1e-9 })
    expectWithin(opening.heightMm, 614, { withinMm: 0 })
    expect(rebateOpeningOf({ ...PICTURE, diagonals: [1098.2, 1099] }).opening).toEqual(opening)
  })

  // A parallelogram of sides w and h that leans by δ: its diagonals follow from its corners, its least boxes from w + h·sin δ.
  it('holds every leaning parallelogram, one pair of its sides along the opening', () => {
    const side = () => fc.double({ min: 100, max: 2000, noNaN: true })
    fc.assert(
      fc.property(side(), side(), fc.double({ min: -0.1, max: 0.1, noNaN: true }), (w, h, lean) => {
        const corner = [h * Math.sin(lean), h * Math.cos(lean)] as const
        const diagonals = [Math.hypot(w + corner[0], corner[1]), Math.hypot(w - corner[0], corner[1])]
        const { opening, skewRad } = rebateOpeningOf({
          width: [w],
          height: [h],
          diagonals,
          allowance: 0,
          lining: 0,
        })
        expectWithin(skewRad, Math.abs(lean), { withinRad: 1e-9 })
        const along = [w + Math.abs(corner[0]), corner[1]] as const
        const across = [w * Math.cos(lean), h + w * Math.abs(Math.sin(lean))] as const
        const holds = [along, across].some(
          ([boxW, boxH]) => opening.widthMm >= boxW - 1e-6 && opening.heightMm >= boxH - 1e-6,
        )
        expect(holds).toBe(true)
      }),
    )
  })

  it.each([
    ['no width', { ...PICTURE, width: [] }],
    ['a height of 0', { ...PICTURE, height: [610, 0] }],
    ['a negative allowance', { ...PICTURE, allowance: -1 }],
    ['a lining that is no number', { ...PICTURE, lining: Number.NaN }],
    ['diagonals that no such picture has', { ...PICTURE, diagonals: [1900, 100] }],
    ['three diagonals', { ...PICTURE, diagonals: [1099, 1099, 1099] }],
  ])('refuses %s', (_name, picture) => {
    expect(() => rebateOpeningOf(picture)).toThrow(Failure)
  })

  it('names every reading that is wrong', () => {
    const faultsOf = () => {
      try {
        return rebateOpeningOf({ ...PICTURE, width: [914, -1], allowance: -2 })
      } catch (error) {
        return (error as Failure).details.faults?.map(({ path }) => path)
      }
    }
    expect(faultsOf()).toEqual(['/width/1', '/allowance'])
  })
})

describe('coverOf', () => {
  // The least picture is 914 × 610 in a clear space of 917.5 × 613: pushed to one side 3.5 and 3 mm open up at the other.
  // Of the lip's 8 mm the lining takes 0.5.
  it('pushes the smallest picture fully to one side', () => {
    const cover = coverOf(PICTURE, 8)
    expectWithin(cover.leftRightMm, 8 - 0.5 - 3.5, { withinMm: 1e-12 })
    expectWithin(cover.topBottomMm, 8 - 0.5 - 3, { withinMm: 1e-12 })
  })

  it('goes below nothing where the picture’s edge would show', () => {
    expect(coverOf({ ...PICTURE, width: [900, 914.5] }, 8).leftRightMm).toBeLessThan(0)
  })
})

describe('a regular picture that is not four-sided', () => {
  const HEXAGON = { acrossFlats: [300, 301], allowance: 2, lining: 1 }

  it('has an opening by its greatest reading', () => {
    expect(polygonOpeningOf(HEXAGON)).toEqual({ kind: 'polygon', acrossFlatsMm: 305 })
  })

  // Clear space 303 across the flats, least picture 300: it moves 1.5 either way, to a flat; in a triangle 1.5 away from the corner
  // side and 1.5/cos 60° = 3 toward the corner.
  it('is covered least where it has been pushed away', () => {
    expectWithin(polygonCoverOf(HEXAGON, 6, 10), 10 - 1 - 3, { withinMm: 1e-12 })
    expectWithin(polygonCoverOf(HEXAGON, 3, 10), 10 - 1 - 4.5, { withinMm: 1e-12 })
  })
})
