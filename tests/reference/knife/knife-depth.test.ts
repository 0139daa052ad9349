import { describe, expect, it } from 'vitest'
import { knifeFaceDepth, knifeHeadFrom } from '@shared/knife'
import type { KnifeHead } from '@shared/knife'
import { expectWithin } from '../../helpers/expect-within'
import data from '../data/knife-depth.json'

/** Height on the knife of the highest point of a face this deep, mm. */
function heightOf(head: KnifeHead, profileDepthMm: number): number {
  const depth = knifeFaceDepth(0, { ...head, greatestDepthMm: profileDepthMm })
  if (depth.kind === 'refused') throw new Error(depth.says)
  return depth.faceMm
}

describe(`knife depths (${data.status}): ${data.source}`, () => {
  it.each(data.rows)('$cuttingDiameterMm mm, $rakeDeg°, $profileDepthMm mm deep', (row) => {
    const head = knifeHeadFrom(row.cuttingDiameterMm, row.rakeDeg)
    expectWithin(heightOf(head, row.profileDepthMm), row.knifeDepthMm, { withinMm: 6e-7 })
  })
})

describe(`table for the bench (${data.printedTable.status})`, () => {
  it.each(data.printedTable.rows)('$cuttingDiameterMm mm, $rakeDeg°', (row) => {
    const head = knifeHeadFrom(row.cuttingDiameterMm, row.rakeDeg)
    data.printedTable.depthsMm.forEach((depthMm, index) =>
      expectWithin(heightOf(head, depthMm), row.knifeDepthsMm[index] ?? Number.NaN, { withinMm: 6e-5 }),
    )
  })
})

describe('limits of the relation', () => {
  it.each([0, 0.1, 1 / 3, 7.3, 19.99, 29.7])('without hook the knife is the section: %f mm', (depthMm) => {
    const depth = knifeFaceDepth(depthMm, { ...knifeHeadFrom(125, 0), greatestDepthMm: 29.7 })
    expect(depth).toEqual({ kind: 'depth', faceMm: 29.7 - depthMm })
  })

  it.each(data.straightMotion.rows)(
    `in straight motion (R → ∞) a knife leaning $leanDeg° is longer by $factor: ${data.straightMotion.source}`,
    ({ leanDeg, factor }) => {
      expectWithin(heightOf(knifeHeadFrom(2e9, leanDeg), 10) / 10, factor, { withinRatio: 1e-6 })
    },
  )

  it('in straight motion at 20°: 1.064178 (computed)', () => {
    expectWithin(heightOf(knifeHeadFrom(2e9, 20), 10) / 10, 1.064178, { withinRatio: 1e-6 })
  })

  // Circular form tool, r² = (√(R² − h²) − T)² + h² (relation from memory of the engineering handbooks, numbers computed).
  it.each([
    { radiusMm: 1.75, offsetMm: 0.25, depthMm: 1.75 - 1.257159, faceMm: 0.5 },
    { radiusMm: 60, offsetMm: 15, depthMm: 60 - 48.473972, faceMm: 12 },
  ])(
    'agrees with the circular form tool: R $radiusMm, h $offsetMm',
    ({ radiusMm, offsetMm, depthMm, faceMm }) => {
      const head = { cuttingRadiusMm: radiusMm, hookRad: Math.asin(offsetMm / radiusMm), clampRoomMm: 0 }
      expectWithin(heightOf(head, depthMm), faceMm, { withinMm: 1e-6 })
    },
  )

  // A second method: put the edge's point on the knife, turn it about the axis, and see how near the axis it leaves the wood.
  it.each(data.rows.filter(({ rakeDeg }) => rakeDeg > 0))(
    'a point turned about the axis leaves the wood at R − $profileDepthMm ($cuttingDiameterMm mm, $rakeDeg°)',
    ({ cuttingDiameterMm, rakeDeg, profileDepthMm }) => {
      const head = knifeHeadFrom(cuttingDiameterMm, rakeDeg)
      const faceMm = heightOf(head, profileDepthMm)
      const tip = {
        x: head.cuttingRadiusMm * Math.cos(head.hookRad),
        y: head.cuttingRadiusMm * Math.sin(head.hookRad),
      }
      const point = { x: tip.x - faceMm, y: tip.y }
      let reachMm = 0
      for (let step = 0; step < 20_000; step += 1) {
        const turn = (2 * Math.PI * step) / 20_000
        reachMm = Math.max(reachMm, point.x * Math.cos(turn) - point.y * Math.sin(turn))
      }
      expectWithin(reachMm, head.cuttingRadiusMm - profileDepthMm, { withinMm: 1e-5 })
    },
  )
})
