import type { ReadPoint } from './read-pdf'

export interface ReadBounds {
  readonly min: ReadPoint
  readonly max: ReadPoint
}

export function boundsOfPoints(points: readonly ReadPoint[]): ReadBounds {
  const xs = points.map(({ x }) => x)
  const ys = points.map(({ y }) => y)
  return {
    min: { x: Math.min(...xs), y: Math.min(...ys) },
    max: { x: Math.max(...xs), y: Math.max(...ys) },
  }
}

/** Area of the polygon through the points, mm²; positive when they run counter-clockwise. */
export function polygonArea(points: readonly ReadPoint[]): number {
  return points.reduce((sum, point, index) => {
    const next = points[(index + 1) % points.length] ?? point
    return sum + (point.x * next.y - next.x * point.y) / 2
  }, 0)
}

/** The greatest distance of any of the points from the chain of straight lines through the others, mm. */
export function greatestDeparture(points: readonly ReadPoint[], chain: readonly ReadPoint[]): number {
  return Math.max(
    ...points.map((point) =>
      Math.min(...chain.slice(1).map((to, index) => toLine(point, chain[index] ?? to, to))),
    ),
  )
}

function toLine(point: ReadPoint, from: ReadPoint, to: ReadPoint): number {
  const x = to.x - from.x
  const y = to.y - from.y
  const square = x * x + y * y
  const share = square === 0 ? 0 : ((point.x - from.x) * x + (point.y - from.y) * y) / square
  const kept = Math.min(1, Math.max(0, share))
  return Math.hypot(point.x - from.x - kept * x, point.y - from.y - kept * y)
}

/** Stretches that follow one another, as one chain; each must start where the one before ended. */
export function joinedChain(stretches: readonly (readonly ReadPoint[])[], withinMm: number): ReadPoint[] {
  const chain: ReadPoint[] = []
  for (const stretch of stretches) {
    const last = chain.at(-1)
    const first = stretch[0]
    if (last !== undefined && first !== undefined) {
      const gap = Math.hypot(last.x - first.x, last.y - first.y)
      if (gap > withinMm) throw new Error(`a gap of ${gap} mm between stretches`)
    }
    chain.push(...stretch)
  }
  return chain
}
