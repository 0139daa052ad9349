import { CHORD_ERROR_MM } from '@shared/units'
import { flattened, greatestDistanceBetween, symmetricDifferenceArea } from '@shared/geometry'
import type { Point } from '@shared/geometry'
import { canonicalText } from './canonical'
import type { Member, Section } from './document'
import { faceOf } from './face'
import { plainSectionOf } from './issue-text'
import { outlineOf } from './outline'

/** One dimension, basis or member that is not the same; null where there is none. Paths are JSON pointers; a member's counts in the later section, or in the earlier where it was taken out. */
export interface SectionChange {
  readonly path: string
  readonly before: unknown
  readonly after: unknown
}

export interface SectionDifference {
  /** Area that lies in one finished outline but not in the other, mm², curves flattened to 10⁻³ mm. */
  readonly areaBetweenMm2: number
  /** Greatest distance from a point of either finished face to the other, mm. */
  readonly greatestDistanceMm: number
  /** Where that is, on either face. */
  readonly greatestAt: readonly [Point, Point]
  readonly changes: readonly SectionChange[]
}

/** How the later of two sections without faults differs from the earlier. */
export function differenceOf(earlier: Section, later: Section): SectionDifference {
  const flat = (section: Section) => flattened(outlineOf(section), CHORD_ERROR_MM)
  const greatest = greatestDistanceBetween(faceOf(earlier).path, faceOf(later).path)
  return {
    areaBetweenMm2: symmetricDifferenceArea([flat(earlier)], [flat(later)]),
    greatestDistanceMm: greatest.distance,
    greatestAt: [greatest.from, greatest.to],
    changes: changesBetween(earlier, later),
  }
}

/** Everything that is not the same in two sections, member for member: those put in or taken out are matched up first. */
export function changesBetween(earlier: Section, later: Section): readonly SectionChange[] {
  const { members: before, ...frameBefore } = plainSectionOf(earlier)
  const { members: after, ...frameAfter } = plainSectionOf(later)
  const changes: SectionChange[] = []
  compare(frameBefore, frameAfter, '', changes)
  for (const pair of matched(before, after)) {
    if (pair.before === undefined)
      changes.push({ path: `/members/${pair.after}`, before: null, after: after[pair.after] ?? null })
    else if (pair.after === undefined)
      changes.push({ path: `/members/${pair.before}`, before: before[pair.before] ?? null, after: null })
    else compare(before[pair.before], after[pair.after], `/members/${pair.after}`, changes)
  }
  return changes
}

function compare(before: unknown, after: unknown, path: string, changes: SectionChange[]): void {
  if (isRecord(before) && isRecord(after)) {
    const names = new Set([...Object.keys(before), ...Object.keys(after)])
    for (const name of names) compare(before[name], after[name], `${path}/${name}`, changes)
    return
  }
  const left = before ?? null
  const right = after ?? null
  if (canonicalText(left) !== canonicalText(right)) changes.push({ path, before: left, after: right })
}

const isRecord = (value: unknown): value is Readonly<Record<string, unknown>> =>
  typeof value === 'object' && value !== null && !Array.isArray(value)

/** Numbers of members that stand for one another. */
type Pairing =
  | { readonly before: number; readonly after: number }
  | { readonly before: number; readonly after?: undefined }
  | { readonly before?: undefined; readonly after: number }

/**
 * The least costly way from one list to the other: a member unchanged costs nothing, one of the same kind changed 2, one put in or taken out 3,
 * another kind in its place 5.
 */
function matched(before: readonly Member[], after: readonly Member[]): readonly Pairing[] {
  const textsBefore = before.map(canonicalText)
  const textsAfter = after.map(canonicalText)
  const changeCost = (i: number, j: number): number => {
    if (textsBefore[i] === textsAfter[j]) return 0
    return before[i]?.kind === after[j]?.kind ? 2 : 5
  }
  const cost = costTable(before.length, after.length, changeCost)
  const at = (i: number, j: number): number => cost[i]?.[j] ?? Infinity
  const pairs: Pairing[] = []
  let i = before.length
  let j = after.length
  while (i > 0 || j > 0) {
    if (i > 0 && j > 0 && at(i, j) === at(i - 1, j - 1) + changeCost(i - 1, j - 1)) {
      i -= 1
      j -= 1
      pairs.push({ before: i, after: j })
    } else if (i > 0 && at(i, j) === at(i - 1, j) + SINGLE_COST) {
      i -= 1
      pairs.push({ before: i })
    } else {
      j -= 1
      pairs.push({ after: j })
    }
  }
  return pairs.reverse()
}

const SINGLE_COST = 3

/** cost[i][j] is the least for the first i members of the one and the first j of the other. */
function costTable(
  countBefore: number,
  countAfter: number,
  changeCost: (i: number, j: number) => number,
): readonly (readonly number[])[] {
  const first = Array.from({ length: countAfter + 1 }, (_, j) => j * SINGLE_COST)
  const rows: number[][] = [first]
  for (let i = 1; i <= countBefore; i += 1) {
    const above = rows[i - 1] as number[]
    const row = [i * SINGLE_COST]
    for (let j = 1; j <= countAfter; j += 1) {
      const changed = (above[j - 1] as number) + changeCost(i - 1, j - 1)
      row.push(Math.min(changed, (above[j] as number) + SINGLE_COST, (row[j - 1] as number) + SINGLE_COST))
    }
    rows.push(row)
  }
  return rows
}
