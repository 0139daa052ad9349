import { describe, expect, it } from 'vitest'
import { GRID_MM, onGrid, snapped } from '@/board/snapping'

const options = { gridMm: 0.5, breaks: [], reachMm: 1 }

describe('snapping', () => {
  it('goes to the nearest place of the grid, each axis by itself', () => {
    expect(snapped({ x: 12.26, y: -3.24 }, options)).toEqual({
      point: { x: 12.5, y: -3 },
      x: 'grid',
      y: 'grid',
    })
  })

  it('falls in with another break within reach, even off the grid', () => {
    const breaks = [
      { x: 20.3, y: 40 },
      { x: 21.1, y: 7.77 },
    ]
    const found = snapped({ x: 20.6, y: 7.4 }, { ...options, breaks })
    expect(found).toEqual({ point: { x: 20.3, y: 7.77 }, x: 'break', y: 'break' })
  })

  it('takes the nearer of two breaks, and none beyond reach', () => {
    const breaks = [
      { x: 10, y: 0 },
      { x: 10.9, y: 0 },
    ]
    expect(snapped({ x: 10.6, y: 5 }, { ...options, breaks }).point.x).toBe(10.9)
    expect(snapped({ x: 12.1, y: 5 }, { ...options, breaks }).x).toBe('grid')
  })

  it('leaves a free hand alone', () => {
    const point = { x: 1.2345, y: 6.789 }
    expect(snapped(point, { ...options, isFree: true })).toEqual({ point, x: 'free', y: 'free' })
  })

  it('goes by half a millimetre, or by a thirty-second of an inch', () => {
    expect(GRID_MM.mm).toBe(0.5)
    expect(GRID_MM.in * 32).toBe(25.4)
    expect(onGrid(25.5, GRID_MM.in)).toBe(25.4)
  })

  it('gives the decimal that people read, and never a negative nought', () => {
    expect(onGrid(0.29, 0.1)).toBe(0.3)
    expect(Object.is(onGrid(-0.2, 0.5), 0)).toBe(true)
  })
})
