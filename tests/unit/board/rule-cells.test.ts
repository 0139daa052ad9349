import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { LEAST_CELL, ruleCells } from '@/board/rule-cells'

const stretch = (key: string, from: number, to: number) => ({ key, from, to })

describe('the member rule', () => {
  it('lies true under members that are wide enough', () => {
    const cells = ruleCells([stretch('a', 100, 150), stretch('b', 150, 220)], 'b')
    expect(cells.map(({ left, width, isMoved }) => [left, width, isMoved])).toEqual([
      [100, 50, false],
      [150, 70, false],
    ])
  })

  it('gives a narrow or upright member the least cell; a wide neighbour makes room and those beyond lie true', () => {
    const cells = ruleCells(
      [stretch('a', 100, 150), stretch('b', 150, 150), stretch('c', 150, 250), stretch('d', 250, 300)],
      'a',
    )
    expect(cells.map(({ left, width }) => [left, width])).toEqual([
      [100, 50],
      [150, 24],
      [174, 76],
      [250, 50],
    ])
    expect(cells.map(({ isMoved }) => isMoved)).toEqual([false, true, true, false])
  })

  it('keeps the anchor in its place and pushes the others away from it, to both sides', () => {
    const upright = ['a', 'b', 'c'].map((key) => stretch(key, 100, 100))
    const cells = ruleCells(upright, 'b')
    expect(cells.map(({ left }) => left)).toEqual([64, 88, 112])
  })

  it('never lets cells overlap, run backward or grow too narrow', () => {
    const widths = fc.array(fc.double({ min: 0, max: 90, noNaN: true }), { minLength: 1, maxLength: 40 })
    fc.assert(
      fc.property(widths, fc.nat(39), (list, anchor) => {
        let from = 0
        const stretches = list.map((width, index) => {
          const made = stretch(`k${index}`, from, from + width)
          from += width
          return made
        })
        const cells = ruleCells(stretches, `k${anchor}`)
        expect(cells.map(({ key }) => key)).toEqual(stretches.map(({ key }) => key))
        for (const [index, cell] of cells.entries()) {
          expect(cell.width).toBeGreaterThanOrEqual(LEAST_CELL - 1e-9)
          const next = cells[index + 1]
          if (next) expect(next.left).toBeGreaterThanOrEqual(cell.left + cell.width - 1e-9)
        }
      }),
    )
  })
})
