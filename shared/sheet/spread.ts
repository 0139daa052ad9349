/**
 * Places for labels along one axis, at least `pitch` apart and in the order given, each as near its wanted place as
 * the others let it (least sum of squares; pool-adjacent-violators). `wanted` must be in ascending order.
 */
export function spreadApart(wanted: readonly number[], pitch: number): number[] {
  interface Pool {
    sum: number
    count: number
  }
  const pools: Pool[] = []
  wanted.forEach((place, index) => {
    pools.push({ sum: place - index * pitch, count: 1 })
    for (;;) {
      const last = pools.at(-1)
      const before = pools.at(-2)
      if (last === undefined || before === undefined || before.sum / before.count <= last.sum / last.count)
        break
      before.sum += last.sum
      before.count += last.count
      pools.pop()
    }
  })
  return pools
    .flatMap(({ sum, count }) => Array.from({ length: count }, () => sum / count))
    .map((base, index) => base + index * pitch)
}
