import { LengthReader } from './length-reader'
import { LengthFault, lengthTokensOf, type LengthUnit } from './length-tokens'
import { doubleFrom } from './rational'
import { GREATEST_LENGTH_MM } from './tolerance'

export type ParsedLength =
  { readonly kind: 'length'; readonly mm: number } | { readonly kind: 'not-a-length'; readonly says: string }

/** Longest text that is read: the smallest double in full has 326 characters. */
const LONGEST_TEXT = 400

/**
 * A typed length in mm, worked out in exact fractions and rounded once, to the nearest double.
 *
 *     sum     = term { (+ | -) term }
 *     term    = factor { (* | /) factor }
 *     factor  = [ + | - ] ( "(" sum ")" | measure )
 *     measure = amount [ unit ] | amount feet [ - ] amount [ inches ]
 *     amount  = decimal | whole fraction | whole-fraction | fraction (only with a unit) | ½ and its like
 *
 * A bare number is in the given unit. 3 5/16 and, without spaces, 3-5/16 are 3 + 5/16; with spaces, 3 - 5/16 subtracts. In longer sums the
 * hyphen is read so only where a unit follows it (2*3-5/16"); elsewhere it is refused as ambiguous instead of guessed.
 */
export function parseLength(text: string, unit: LengthUnit): ParsedLength {
  try {
    return { kind: 'length', mm: millimetresOf(text, unit) }
  } catch (fault) {
    if (fault instanceof LengthFault) return { kind: 'not-a-length', says: fault.message }
    throw fault
  }
}

function millimetresOf(text: string, unit: LengthUnit): number {
  if (text.length > LONGEST_TEXT) {
    throw new LengthFault(`this is too long for a length: at most ${LONGEST_TEXT} characters are read`)
  }
  if (text.trim() === '') throw new LengthFault('a length is missing: write for example 84 mm or 3 5/16"')
  refuseComma(text)
  const reader = new LengthReader(lengthTokensOf(text), unit)
  const mm = doubleFrom(reader.readAll())
  if (Math.abs(mm) > GREATEST_LENGTH_MM) {
    throw new LengthFault('this length is beyond a thousand kilometres: look for a slip of the keys')
  }
  return mm
}

function refuseComma(text: string): void {
  if (!text.includes(',')) return
  const pair = /(\d+),(\d+)/.exec(text)
  const mend = pair ? `write ${pair[1]}.${pair[2]} or ${pair[1]}${pair[2]}` : 'write 3.5 or 3500'
  throw new LengthFault(`a comma could mark decimals or thousands: ${mend}`)
}
