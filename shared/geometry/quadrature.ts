/** Nodes on −1…1 and weights of Gauss–Legendre quadrature: exact for polynomials up to degree 2n − 1. */
export interface GaussRule {
  readonly nodes: readonly number[]
  readonly weights: readonly number[]
}

/** The n-point rule, worked out by Newton's method on the Legendre polynomial (its three-term recurrence; weights 2/((1 − x²) P′²)). */
export function gaussRuleFrom(n: number): GaussRule {
  const nodes: number[] = []
  const weights: number[] = []
  for (let i = 1; i <= n; i += 1) {
    let x = Math.cos((Math.PI * (i - 0.25)) / (n + 0.5))
    let slope = 1
    for (let step = 0; step < 20; step += 1) {
      const legendre = legendreAt(n, x)
      slope = legendre.slope
      const change = legendre.value / slope
      x -= change
      if (Math.abs(change) < 1e-16) break
    }
    nodes.push(x)
    weights.push(2 / ((1 - x * x) * slope * slope))
  }
  return { nodes, weights }
}

function legendreAt(n: number, x: number): { readonly value: number; readonly slope: number } {
  let before = 1
  let value = x
  for (let k = 2; k <= n; k += 1) {
    const next = ((2 * k - 1) * x * value - (k - 1) * before) / k
    before = value
    value = next
  }
  return { value, slope: (n * (before - x * value)) / (1 - x * x) }
}

const RULE = gaussRuleFrom(10)
const DEEPEST = 48
/**
 * A panel and its halves must agree to this part of the accuracy. At the end of a very thin ellipse each further halving still finds as much as
 * the one before, down to the ellipse's thinness: so what one halving shows is allowed for as often as there can be halvings.
 */
const CAUTION = 1 / 64
/** Two panels that agree to this part of their own size agree as far as doubles can tell. */
const ROUNDING = 4e-16

function panel(integrand: (t: number) => number, from: number, to: number): number {
  const half = (to - from) / 2
  const middle = (from + to) / 2
  let sum = 0
  for (let i = 0; i < RULE.nodes.length; i += 1) {
    sum += (RULE.weights[i] ?? 0) * integrand(middle + half * (RULE.nodes[i] ?? 0))
  }
  return sum * half
}

/**
 * Integral from 0 to 1 to within an absolute accuracy: a panel is halved until it agrees with its halves to its share of the accuracy. The
 * halves, far better than the difference shows, are what counts, so that cusps and near-cusps are met by going on halving there only.
 */
export function integralOf(integrand: (t: number) => number, accuracy: number): number {
  return refined(integrand, { from: 0, to: 1, whole: panel(integrand, 0, 1) }, accuracy * CAUTION, DEEPEST)
}

interface Panel {
  readonly from: number
  readonly to: number
  readonly whole: number
}

function refined(
  integrand: (t: number) => number,
  { from, to, whole }: Panel,
  accuracy: number,
  depth: number,
): number {
  const middle = (from + to) / 2
  const left = panel(integrand, from, middle)
  const right = panel(integrand, middle, to)
  const sum = left + right
  if (depth === 0 || Math.abs(sum - whole) <= Math.max(accuracy, ROUNDING * Math.abs(sum))) return sum
  return (
    refined(integrand, { from, to: middle, whole: left }, accuracy / 2, depth - 1) +
    refined(integrand, { from: middle, to, whole: right }, accuracy / 2, depth - 1)
  )
}
