import { plusMinus95, printLength, printNumber } from '@shared/units'
import type { LengthUnit } from '@shared/units'

/** How lengths are written on one sheet: one unit and one number of places throughout. */
export interface LengthPrinter {
  readonly unit: LengthUnit
  /** Written once, in the title block: single dimensions carry no unit. */
  readonly unitName: string
  /** How finely the numbers are written, as a sentence. */
  readonly grain: string
  readonly length: (mm: number) => string
  /** A thickness or a tolerance so small that a 64th of an inch would falsify it: decimals in either unit. */
  readonly small: (mm: number) => string
  /** The ± about 95 % of a dimension whose standard deviation is given, mm. */
  readonly plusMinus: (standardDeviationMm: number) => string
}

/** A tenth of a millimetre is written where every number of the sheet lies on it, else a hundredth. */
const ON_GRID_MM = 1e-6
const INCH_FRACTION = 64
const MM_PER_INCH = 25.4

/** The printer for a sheet that will show these lengths, mm. */
export function lengthPrinterOf(unit: LengthUnit, shown: readonly number[]): LengthPrinter {
  if (unit === 'in') {
    return {
      unit,
      unitName: 'inches',
      grain: `Written to the nearest 1/${INCH_FRACTION} in; the DXF holds every size in full.`,
      length: (mm) => printLength(mm, { unit: 'in', fraction: INCH_FRACTION, withUnit: false }),
      small: (mm) => printNumber(mm / MM_PER_INCH, 3),
      plusMinus: (standardDeviationMm) =>
        `± ${printNumber(plusMinus95(standardDeviationMm) / MM_PER_INCH, 3)}`,
    }
  }
  const places = shown.every((mm) => Math.abs(mm - Math.round(mm * 10) / 10) <= ON_GRID_MM) ? 1 : 2
  return {
    unit,
    unitName: 'mm',
    grain: `Written to ${places === 1 ? '0.1' : '0.01'} mm; the DXF holds every size in full.`,
    length: (mm) => printLength(mm, { unit: 'mm', places, withUnit: false }),
    small: (mm) => printNumber(mm, places),
    plusMinus: (standardDeviationMm) => `± ${printNumber(plusMinus95(standardDeviationMm), places)}`,
  }
}

/** The printer for the saw: a tenth of a millimetre, or a 64th of an inch, is as fine as a stop is set. */
export function benchPrinterOf(unit: LengthUnit): LengthPrinter {
  return lengthPrinterOf(unit, [])
}
