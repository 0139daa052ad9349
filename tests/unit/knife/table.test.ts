import { describe, expect, it } from 'vitest'
import { arcFromSweep, extremaOf, lineFrom, pointAt, pointFrom } from '@shared/geometry'
import type { Path, Point } from '@shared/geometry'
import { knifeFaceDepth, knifeHeadFrom, knifeTable } from '@shared/knife'
import type { KnifeHead, KnifeRow } from '@shared/knife'
import { KNIFE_TABLE_MM } from '@shared/units'
import { EVERY_KIND_FACE } from '../../helpers/knife-faces'
import { expectWithin } from '../../helpers/expect-within'

const HEAD = knifeHeadFrom(140, 20)

function rowsOf(face: Path, head: KnifeHead): readonly KnifeRow[] {
  const table = knifeTable(face, head)
  if (table.kind === 'refused') throw new Error(table.says)
  return table.rows
}

const at = (rows: readonly KnifeRow[], index: number): KnifeRow => {
  const row = rows.at(index)
  if (row === undefined) throw new Error(`no row ${index}`)
  return row
}

/** Distance of a point from a chain of straight lines, mm. */
function offChain(point: Point, chain: readonly Point[]): number {
  return chain.slice(1).reduce((least, end, index) => {
    const start = chain[index] ?? end
    const [dx, dy] = [end.x - start.x, end.y - start.y]
    const along = ((point.x - start.x) * dx + (point.y - start.y) * dy) / (dx * dx + dy * dy || 1)
    const t = Math.min(1, Math.max(0, along))
    return Math.min(least, Math.hypot(point.x - start.x - t * dx, point.y - start.y - t * dy))
  }, Number.POSITIVE_INFINITY)
}

describe('knifeTable', () => {
  it('of a level fillet is its two ends', () => {
    expect(rowsOf([lineFrom(pointFrom(0, 20), pointFrom(5, 20))], HEAD)).toEqual([
      { x: 0, depth: 0, face: 0 },
      { x: 5, depth: 0, face: 0 },
    ])
  })

  it('has the deepest point on the tip line and the highest at the knife’s greatest height', () => {
    const rows = rowsOf(EVERY_KIND_FACE, HEAD)
    expect(at(rows, -1)).toEqual({ x: 66, depth: 31, face: 0 })
    const highest = rows.filter(({ depth }) => depth === 0)
    expect(highest.length).toBeGreaterThanOrEqual(2)
    const faces = rows.map(({ face }) => face)
    highest.forEach(({ face }) => expect(face).toBe(Math.max(...faces)))
  })

  it('has a row at every joint, once, in face order', () => {
    const rows = rowsOf(EVERY_KIND_FACE, HEAD)
    const joints = [pointFrom(0, 30), ...EVERY_KIND_FACE.map(({ end }) => end)]
    const places = joints.map((joint) =>
      rows.findIndex(({ x, depth }) => x === joint.x && depth === 46 - joint.y),
    )
    expect(places.every((place) => place >= 0)).toBe(true)
    expect([...places].sort((a, b) => a - b)).toEqual(places)
    expect(new Set(rows.map(({ x, depth }) => `${x} ${depth}`)).size).toBe(rows.length)
  })

  it('has a row where the free member turns', () => {
    const free = EVERY_KIND_FACE[5]
    if (free === undefined) throw new Error('the face has a free member')
    const turns = extremaOf(free, 'y')
    expect(turns.length).toBe(2)
    const rows = rowsOf(EVERY_KIND_FACE, HEAD)
    turns.forEach((t) => {
      const { x, y } = pointAt(free, t)
      expect(rows.some((row) => row.x === x && row.depth === 46 - y)).toBe(true)
    })
  })

  it('has a row at the crown of a half round', () => {
    const rows = rowsOf([arcFromSweep(pointFrom(0, 10), pointFrom(12, 10), -Math.PI)], HEAD)
    expectWithin(Math.min(...rows.map(({ depth, x }) => Math.hypot(depth, x - 6))), 0, { withinMm: 1e-12 })
  })

  it.each([
    ['hook 0°, 125 mm', knifeHeadFrom(125, 0)],
    ['hook 12°, 140 mm', knifeHeadFrom(140, 12)],
    ['hook 20°, 140 mm', HEAD],
    ['hook 30°, 180 mm', knifeHeadFrom(180, 30)],
  ])('leaves the outline by at most 0.05 mm between rows, on the wood and on the knife: %s', (_, head) => {
    const rows = rowsOf(EVERY_KIND_FACE, head)
    const wood = rows.map(({ x, depth }) => pointFrom(x, depth))
    const knife = rows.map(({ x, face }) => pointFrom(x, face))
    for (const segment of EVERY_KIND_FACE) {
      for (let step = 0; step <= 500; step += 1) {
        const { x, y } = pointAt(segment, step / 500)
        const depth = Math.min(31, Math.max(0, 46 - y))
        expect(offChain(pointFrom(x, depth), wood)).toBeLessThanOrEqual(KNIFE_TABLE_MM)
        const face = knifeFaceDepth(depth, { ...head, greatestDepthMm: 31 })
        if (face.kind === 'refused') throw new Error(face.says)
        expect(offChain(pointFrom(x, face.faceMm), knife)).toBeLessThanOrEqual(KNIFE_TABLE_MM)
      }
    }
  })

  // A quarter circle of radius 20: a chord over the angle a leaves it by 20·(1 − cos(a/2)); 0.05 allows a = 8.1°, so 11.1 steps at the
  // least. The sampled limit of 0.0475 asks for 12 and the hook's stretching for a few more.
  it('has no more rows than a bench needs', () => {
    const quarter = [arcFromSweep(pointFrom(0, 30), pointFrom(20, 10), -Math.PI / 2)]
    expect(rowsOf(quarter, knifeHeadFrom(140, 0)).length).toBe(13)
    expect(rowsOf(quarter, HEAD).length).toBeLessThanOrEqual(16)
  })

  it('refuses what the head cannot cut, with the depth that would do', () => {
    const table = knifeTable([lineFrom(pointFrom(0, 60), pointFrom(5, 10))], HEAD)
    expect(table.kind).toBe('refused')
  })

  it('refuses a face without members', () => {
    expect(() => knifeTable([], HEAD)).toThrow(/no members/)
  })
})
