import type { Point } from './segment'

/** Corners of the convex hull, counter-clockwise, from the lowest of the leftmost; points within its sides are left out. */
export function convexHullOf(points: readonly Point[]): readonly Point[] {
  const sorted = [...points].sort((p, q) => p.x - q.x || p.y - q.y)
  const distinct = sorted.filter((p, i) => i === 0 || p.x !== sorted[i - 1]?.x || p.y !== sorted[i - 1]?.y)
  if (distinct.length < 3) return distinct
  const lower = chainOf(distinct)
  const upper = chainOf(distinct.reverse())
  return [...lower.slice(0, -1), ...upper.slice(0, -1)]
}

/** The side of the hull to the right of a sweep: every corner on it turns left. */
function chainOf(points: readonly Point[]): readonly Point[] {
  const chain: Point[] = []
  for (const point of points) {
    while (chain.length >= 2 && !turnsLeft(chain, point)) chain.pop()
    chain.push(point)
  }
  return chain
}

function turnsLeft(chain: readonly Point[], c: Point): boolean {
  const a = chain.at(-2) ?? c
  const b = chain.at(-1) ?? c
  return (b.x - a.x) * (c.y - a.y) - (b.y - a.y) * (c.x - a.x) > 0
}
