import { computed } from 'vue'
import { parseLength, printArea, printLength, printMass, printPlusMinus, printVolume } from '@shared/units'
import type { InchDivision, ParsedLength } from '@shared/units'
import { useSessionStore } from '@/stores/session'

export interface ShownLength {
  /** Decimals of a millimetre; an inch is shown by fractions instead. Default 1. */
  readonly places?: number
  /** Finest division of the inch. Default 64. */
  readonly fraction?: InchDivision
  /** Default true. */
  readonly withUnit?: boolean
}

/** Lengths as this person reads and types them; every number in and out is mm (mm², mm³, kg). */
export function useLengths() {
  const session = useSessionStore()
  const unit = computed(() => session.units)

  function print(mm: number, { places = 1, fraction = 64, withUnit = true }: ShownLength = {}): string {
    return unit.value === 'mm'
      ? printLength(mm, { unit: 'mm', places, withUnit })
      : printLength(mm, { unit: 'in', fraction, withUnit })
  }
  /** Two lengths as a pair: 914.0 × 610.0 mm */
  function printPair(first: number, second: number, shown: ShownLength = {}): string {
    const bare = unit.value === 'mm' ? { ...shown, withUnit: false } : shown
    return `${print(first, bare)} × ${print(second, shown)}`
  }
  /** ± about 95 % of a length whose standard deviation (mm) is kept. */
  const printSpread = (standardDeviationMm: number, places = 1) =>
    printPlusMinus(standardDeviationMm, { unit: unit.value, places: unit.value === 'mm' ? places : 3 })

  const parse = (text: string): ParsedLength => parseLength(text, unit.value)

  return {
    unit,
    print,
    printPair,
    printSpread,
    parse,
    printArea: (mm2: number, places?: number) => printArea(mm2, { unit: unit.value, places }),
    printVolume: (mm3: number) => printVolume(mm3, { unit: unit.value }),
    printMass: (kg: number) => printMass(kg, { unit: unit.value }),
  }
}
