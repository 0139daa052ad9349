/** Real roots of a quadratic a t² + b t + c in increasing order, without cancellation; none where all coefficients are 0. */
export function quadraticRootsOf(a: number, b: number, c: number): readonly number[] {
  if (a === 0) return b === 0 ? [] : [-c / b]
  const discriminant = b * b - 4 * a * c
  if (discriminant < 0) return []
  const q = -(b + (b < 0 ? -1 : 1) * Math.sqrt(discriminant)) / 2
  if (q === 0) return [0]
  const first = q / a
  const second = c / q
  return first < second ? [first, second] : [second, first]
}

/** Product of two polynomials in Bernstein form, in Bernstein form. */
export function bernsteinProductOf(a: readonly number[], b: readonly number[]): readonly number[] {
  const m = a.length - 1
  const n = b.length - 1
  return Array.from({ length: m + n + 1 }, (_, k) => {
    let sum = 0
    for (let i = Math.max(0, k - n); i <= Math.min(m, k); i += 1) {
      sum += binomial(m, i) * binomial(n, k - i) * (a[i] ?? 0) * (b[k - i] ?? 0)
    }
    return sum / binomial(m + n, k)
  })
}

function binomial(n: number, k: number): number {
  let value = 1
  for (let i = 1; i <= k; i += 1) value = (value * (n - k + i)) / i
  return value
}

/** Narrower than this (of 0…1) a stretch with several sign changes is one multiple root. */
const NARROWEST = 1e-13

/**
 * Roots within 0 < t < 1 of a polynomial in Bernstein form, in increasing order. By Descartes' rule of signs a stretch has no more roots than
 * its coefficients change sign: stretches are halved until they have one change or none, so no simple root is missed.
 */
export function bernsteinRootsOf(coefficients: readonly number[]): readonly number[] {
  const roots: number[] = []
  collectRoots(coefficients, 0, 1, roots)
  return roots
}

function collectRoots(coefficients: readonly number[], from: number, to: number, roots: number[]): void {
  const changes = signChangesOf(coefficients)
  if (changes === 0) return
  const middle = (from + to) / 2
  if (to - from < NARROWEST) {
    roots.push(middle)
    return
  }
  const first = coefficients[0] ?? 0
  const last = coefficients.at(-1) ?? 0
  if (changes === 1 && first * last < 0) {
    roots.push(from + (to - from) * singleRootOf(coefficients))
    return
  }
  const [left, right] = halvesOf(coefficients, 0.5)
  collectRoots(left, from, middle, roots)
  if (right[0] === 0 && roots.at(-1) !== middle) roots.push(middle)
  collectRoots(right, middle, to, roots)
}

function signChangesOf(coefficients: readonly number[]): number {
  let changes = 0
  let sign = 0
  for (const value of coefficients) {
    if (value === 0) continue
    if (sign !== 0 && Math.sign(value) !== sign) changes += 1
    sign = Math.sign(value)
  }
  return changes
}

function halvesOf(
  coefficients: readonly number[],
  t: number,
): readonly [readonly number[], readonly number[]] {
  const left: number[] = []
  const right: number[] = []
  let row = coefficients
  while (row.length > 0) {
    left.push(row[0] ?? 0)
    right.unshift(row.at(-1) ?? 0)
    row = row.slice(1).map((value, i) => (row[i] ?? 0) * (1 - t) + value * t)
  }
  return [left, right]
}

const valueAt = (coefficients: readonly number[], t: number): number => {
  const row = [...coefficients]
  for (let size = row.length - 1; size > 0; size -= 1) {
    for (let i = 0; i < size; i += 1) row[i] = (row[i] ?? 0) * (1 - t) + (row[i + 1] ?? 0) * t
  }
  return row[0] ?? 0
}

const singleRootOf = (coefficients: readonly number[]): number =>
  bracketedRootOf((t) => valueAt(coefficients, t), 0, 1)

/**
 * The root of a continuous function between two places where its sign differs, to the last digit or nearly: false position with halved weights,
 * and a plain halving whenever that has not shortened the bracket by half in three steps.
 */
export function bracketedRootOf(f: (t: number) => number, from: number, to: number): number {
  let a = from
  let b = to
  let fa = f(a)
  let fb = f(b)
  if (fa === 0) return a
  if (fb === 0) return b
  let width = Math.abs(b - a)
  for (let step = 1; step <= 200; step += 1) {
    const slow = step % 3 === 0 && Math.abs(b - a) > width / 2
    if (step % 3 === 0) width = Math.abs(b - a)
    const secant = b - (fb * (b - a)) / (fb - fa)
    const t = slow || !(secant > Math.min(a, b) && secant < Math.max(a, b)) ? (a + b) / 2 : secant
    const ft = f(t)
    if (ft === 0 || Math.abs(b - a) <= 4e-16 * Math.max(Math.abs(a), Math.abs(b))) return t
    if (Math.sign(ft) === Math.sign(fb)) fa /= 2
    else [a, fa] = [b, fb]
    ;[b, fb] = [t, ft]
    if (t === (a + b) / 2 && t === a) return t
  }
  return b
}
