import { GREATEST_LENGTH_MM } from '@shared/units'
import type { Fault } from '@shared/failure'
import type { CutInstance, DemandedRail, OrderableLength, RackPiece, SawSettings } from './cut-instance'
import { isDecimal } from './decimal'
import { faultUnless, isAmount, isSize, refuseFaults } from './refusal'

/** Rails in all that one plan takes. */
const RAILS_AT_MOST = 20_000

/** Refuses numbers that cannot be planned with, all of them at once, each with its place. */
export function refuseInstance(instance: CutInstance): void {
  const { demand, lengths, rack, saw } = instance
  const rails = demand.reduce((sum, { count }) => sum + count, 0)
  refuseFaults([
    ...demand.flatMap(railFaults),
    ...lengths.flatMap(lengthFaults),
    ...rack.flatMap(rackFaults),
    ...sawFaults(saw),
    ...orderFaults(instance),
    ...priceFaults(lengths),
    ...repeatedIds('/rack', rack),
    ...repeatedIds('/demand', demand),
    ...faultUnless(
      !(rails > RAILS_AT_MOST),
      '/demand',
      `${rails} rails in all`,
      `${RAILS_AT_MOST} rails or fewer`,
    ),
  ])
}

const isPlannable = (mm: number) => isSize(mm) && mm <= GREATEST_LENGTH_MM
const isWhole = (count: number, least: number) => Number.isSafeInteger(count) && count >= least

const railFaults = ({ length, count, mitre }: DemandedRail, index: number): Fault[] => [
  ...faultUnless(isPlannable(length), `/demand/${index}/length`, length, 'more than 0 mm'),
  ...faultUnless(isWhole(count, 1), `/demand/${index}/count`, count, 'a whole number, 1 or more'),
  ...faultUnless(mitre >= 0 && mitre < 90, `/demand/${index}/mitre`, mitre, '0° or more and less than 90°'),
]

const lengthFaults = ({ length, price, count }: OrderableLength, index: number): Fault[] => [
  ...faultUnless(isPlannable(length), `/lengths/${index}/length`, length, 'more than 0 mm'),
  ...faultUnless(
    price === undefined || isDecimal(price),
    `/lengths/${index}/price`,
    price,
    'a decimal such as 18.50',
  ),
  ...faultUnless(
    count === undefined || isWhole(count, 0),
    `/lengths/${index}/count`,
    count,
    'a whole number, 0 or more',
  ),
]

const rackFaults = ({ length, endTrim = [0, 0] }: RackPiece, index: number): Fault[] => [
  ...faultUnless(isPlannable(length), `/rack/${index}/length`, length, 'more than 0 mm'),
  ...endTrim.flatMap((mm, end) =>
    faultUnless(isPlannableAmount(mm), `/rack/${index}/endTrim/${end}`, mm, '0 mm or more'),
  ),
]

const isPlannableAmount = (mm: number) => isAmount(mm) && mm <= GREATEST_LENGTH_MM

const sawFaults = (saw: SawSettings): Fault[] =>
  (['kerf', 'margin', 'endTrim', 'shortestSafe', 'smallestUsableOffcut'] as const).flatMap((name) =>
    faultUnless(isPlannableAmount(saw[name]), `/saw/${name}`, saw[name], '0 mm or more'),
  )

const orderFaults = ({ order }: CutInstance): Fault[] =>
  order === undefined
    ? []
    : [
        ...faultUnless(
          isWhole(order.setupPieces, 0),
          '/order/setupPieces',
          order.setupPieces,
          'a whole number, 0 or more',
        ),
        ...faultUnless(isPlannableAmount(order.firstOff), '/order/firstOff', order.firstOff, '0 mm or more'),
        ...faultUnless(
          isAmount(order.reserve),
          '/order/reserve',
          order.reserve,
          '0 or more, such as 0.1 for 10 %',
        ),
      ]

const priceFaults = (lengths: readonly OrderableLength[]): Fault[] => {
  const priced = lengths.filter(({ price }) => price !== undefined).length
  const says = 'If any length has a price all must have one; give each its price or none.'
  return priced === 0 || priced === lengths.length ? [] : [{ path: '/lengths', code: 'some-priced', says }]
}

function repeatedIds(path: string, rows: readonly { readonly id: string }[]): Fault[] {
  const seen = new Set<string>()
  return rows.flatMap(({ id }, index) => {
    const isNew = !seen.has(id)
    seen.add(id)
    return faultUnless(isNew, `${path}/${index}/id`, id, 'an id of its own')
  })
}
