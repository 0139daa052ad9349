import { faceOf } from '@shared/section'
import { pointAt } from '@shared/geometry'
import type { Point } from '@shared/geometry'
import type { Member, Section } from '@shared/section'

/** A place that a remark can be pinned to without a pointer. */
export interface RemarkPlace {
  readonly value: string
  readonly label: string
  readonly place: Point
  /** Number of the member (from 0); none for a break. */
  readonly member: number | null
}

/** The middle of every member, then every break. */
export function remarkPlacesOf(
  section: Section,
  nameOf: (member: Member, index: number) => string,
): readonly RemarkPlace[] {
  const { path, memberOf, breaks } = faceOf(section)
  const members = section.members.flatMap((member, index): RemarkPlace[] => {
    const own = path.filter((_, at) => memberOf[at] === index)
    const middle = own[Math.floor((own.length - 1) / 2)]
    if (middle === undefined) return []
    const place = own.length % 2 === 0 ? middle.end : pointAt(middle, 0.5)
    return [{ value: `member-${index}`, label: `Member ${nameOf(member, index)}`, place, member: index }]
  })
  const ends = breaks.map((place, index): RemarkPlace => ({
    value: `break-${index}`,
    label: breakName(index, breaks.length - 1),
    place,
    member: null,
  }))
  return [...members, ...ends]
}

function breakName(index: number, last: number): string {
  if (index === 0) return 'Break 0, the sight edge'
  return index === last ? `Break ${index}, the back edge` : `Break ${index}, after member ${index}`
}

/** The place in a list that lies nearest to a point. */
export function nearestPlaceOf(places: readonly RemarkPlace[], point: Point): RemarkPlace | undefined {
  let nearest: RemarkPlace | undefined
  let least = Infinity
  for (const each of places) {
    const distance = Math.hypot(each.place.x - point.x, each.place.y - point.y)
    if (distance >= least) continue
    least = distance
    nearest = each
  }
  return nearest
}
