import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  arcFromSweep,
  arcGeometryOf,
  boundsOf,
  nearestOnPath,
  cubicFrom,
  lineFrom,
  pointAt,
  pointFrom,
  tangentAt,
} from '@shared/geometry'
import type { Path, Point } from '@shared/geometry'
import { findDepthRefusal, correctedOutline, knifeFaceDepth, knifeHeadFrom } from '@shared/knife'
import type { ArcOrLine, KnifeHead } from '@shared/knife'
import { KNIFE_OUTLINE_MM } from '@shared/units'
import { EVERY_KIND_FACE } from '../../helpers/knife-faces'
import { expectWithin } from '../../helpers/expect-within'

function pathOf(face: Path, head: KnifeHead): readonly ArcOrLine[] {
  const outline = correctedOutline(face, head)
  if (outline.kind === 'refused') throw new Error(outline.says)
  return outline.path
}

/** The true edge, point by point, by the formula alone. */
function trueEdge(face: Path, head: KnifeHead, perSegment: number): Point[] {
  const ys = face.flatMap((segment) =>
    Array.from({ length: perSegment + 1 }, (_, step) => pointAt(segment, step / perSegment)),
  )
  const [least, greatest] = [Math.min(...ys.map(({ y }) => y)), Math.max(...ys.map(({ y }) => y))]
  return ys.map(({ x, y }) => {
    const depth = knifeFaceDepth(greatest - y, { ...head, greatestDepthMm: greatest - least })
    if (depth.kind === 'refused') throw new Error(depth.says)
    return pointFrom(-x, depth.faceMm)
  })
}

/** Distance of a point from the nearest of many, mm. */
function leastDistance(point: Point, others: readonly Point[]): number {
  let least = Number.POSITIVE_INFINITY
  for (const { x, y } of others) least = Math.min(least, (x - point.x) ** 2 + (y - point.y) ** 2)
  return Math.sqrt(least)
}

describe('correctedOutline', () => {
  it.each([
    ['hook 12°, 125 mm', knifeHeadFrom(125, 12)],
    ['hook 20°, 140 mm', knifeHeadFrom(140, 20)],
    ['hook 30°, 180 mm', knifeHeadFrom(180, 30)],
    ['hook 0°, 125 mm', knifeHeadFrom(125, 0)],
  ])('keeps within 0.01 mm of the true edge, both ways: %s', (_, head) => {
    const fitted = pathOf(EVERY_KIND_FACE, head)
    const edge = trueEdge(EVERY_KIND_FACE, head, 2000)
    const fromEdge = edge.filter((_unused, index) => index % 10 === 0)
    const fromFit = fitted.flatMap((piece) =>
      Array.from({ length: 21 }, (_unused, step) => pointAt(piece, step / 20)),
    )
    // Points of the edge are 0.015 mm apart or less; half of that, square to 0.01 mm, makes the measured distance 0.0025 mm longer.
    fromFit.forEach((point) =>
      expect(leastDistance(point, edge)).toBeLessThanOrEqual(KNIFE_OUTLINE_MM + 0.0025),
    )
    const worst = Math.max(...fromEdge.map((point) => nearestOnPath(fitted, point).distance))
    expect(worst).toBeLessThanOrEqual(KNIFE_OUTLINE_MM)
  })

  it('is lines and arcs that share their ends, from the sight edge to the back edge', () => {
    const fitted = pathOf(EVERY_KIND_FACE, knifeHeadFrom(140, 20))
    fitted.slice(1).forEach((piece, index) => expect(piece.start).toEqual(fitted[index]?.end))
    expect(fitted.every(({ kind }) => kind === 'line' || kind === 'arc')).toBe(true)
    expect(fitted[0]?.start.x).toBe(0)
    expect(fitted.at(-1)?.end).toEqual(pointFrom(-66, 0))
    expect(fitted.length).toBeLessThan(60)
  })

  it('is as smooth as the face within a curve', () => {
    const face = [cubicFrom(pointFrom(0, 30), pointFrom(5, 30), pointFrom(10, 10), pointFrom(20, 10))]
    const fitted = pathOf(face, knifeHeadFrom(125, 20))
    expect(fitted.length).toBeGreaterThan(3)
    fitted.slice(1).forEach((piece, index) => {
      const before = fitted[index]
      if (before === undefined) throw new Error('pieces follow one another')
      const [a, b] = [tangentAt(before, 1), tangentAt(piece, 0)]
      expectWithin(Math.atan2(a.x * b.y - a.y * b.x, a.x * b.x + a.y * b.y), 0, { withinRad: 1e-9 })
    })
  })

  it('is the mirror of the face itself where there is no hook', () => {
    const face = [
      lineFrom(pointFrom(0, 12), pointFrom(3, 12)),
      arcFromSweep(pointFrom(3, 12), pointFrom(13, 2), Math.PI / 2),
    ]
    const fitted = pathOf(face, knifeHeadFrom(125, 0))
    expect(fitted).toEqual([
      { kind: 'line', start: pointFrom(0, 10), end: pointFrom(-3, 10) },
      { kind: 'arc', start: pointFrom(-3, 10), end: pointFrom(-13, 0), bulge: -Math.tan(Math.PI / 8) },
    ])
  })

  // A hollow of the wood is a projection of the knife: the wood's hollow quarter circle about (13, 12) has its knife's centre at X −13.
  it('turns a hollow of the wood into a projection of the knife', () => {
    const hollow = arcFromSweep(pointFrom(3, 12), pointFrom(13, 2), Math.PI / 2)
    const piece = pathOf([hollow], knifeHeadFrom(125, 0))[0]
    if (piece?.kind !== 'arc') throw new Error('an arc stays an arc')
    const { centre } = arcGeometryOf(piece)
    expectWithin(centre.x, -13, { withinMm: 1e-9 })
    expectWithin(centre.y, 10, { withinMm: 1e-9 })
  })

  it('keeps upright and level lines as lines under any hook', () => {
    const face = [lineFrom(pointFrom(0, 30), pointFrom(4, 30)), lineFrom(pointFrom(4, 30), pointFrom(4, 12))]
    expect(pathOf(face, knifeHeadFrom(125, 25)).map(({ kind }) => kind)).toEqual(['line', 'line'])
  })

  it('bends a slope that the hook bends by more than the accuracy', () => {
    const slope = [lineFrom(pointFrom(0, 35), pointFrom(20, 5))]
    expect(pathOf(slope, knifeHeadFrom(125, 25)).some(({ kind }) => kind === 'arc')).toBe(true)
  })

  it('says on itself that it is no template, and refuses what the head cannot cut', () => {
    const outline = correctedOutline(EVERY_KIND_FACE, knifeHeadFrom(140, 20))
    expect(outline.kind === 'corrected' && outline.note).toBe(
      'already corrected for the hook; not a template',
    )
    expect(correctedOutline(EVERY_KIND_FACE, knifeHeadFrom(80, 20)).kind).toBe('refused')
  })

  it('keeps within 0.01 mm of the edge of any free curve in any head that can cut it', () => {
    const size = fc.double({ min: 0, max: 30, noNaN: true })
    const face = fc
      .tuple(size, size, size, size, size, size, fc.double({ min: 1, max: 40, noNaN: true }))
      .map(([y0, x1, y1, x2, y2, y3, width]) =>
        cubicFrom(pointFrom(0, y0), pointFrom(x1, y1), pointFrom(x2, y2), pointFrom(width, y3)),
      )
    const hookDeg = fc.double({ min: 0, max: 30, noNaN: true })
    fc.assert(
      fc.property(face, hookDeg, fc.double({ min: 120, max: 220, noNaN: true }), (curve, hook, diameter) => {
        const head = knifeHeadFrom(diameter, hook)
        const { min, max } = boundsOf(curve)
        fc.pre(findDepthRefusal(head, max.y - min.y) === undefined)
        const fitted = pathOf([curve], head)
        for (let step = 0; step <= 60; step += 1) {
          const { x, y } = pointAt(curve, step / 60)
          const depthMm = Math.min(max.y - min.y, Math.max(0, max.y - y))
          const depth = knifeFaceDepth(depthMm, { ...head, greatestDepthMm: max.y - min.y })
          if (depth.kind === 'refused') throw new Error(depth.says)
          const { distance } = nearestOnPath(fitted, pointFrom(-x, depth.faceMm))
          expect(distance).toBeLessThanOrEqual(KNIFE_OUTLINE_MM)
        }
      }),
    )
  })
})
