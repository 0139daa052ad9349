/** One pair of a DXF file: a group code and its value, a line each. */
export type Pair = readonly [code: number, value: string | number]

/** Places kept of a coordinate in the file, mm: a nanometre. */
const PLACES = 6

/** Group codes whose values are real numbers (10–59 and 140–149); the rest are whole numbers or text. */
const isReal = (code: number): boolean => (code >= 10 && code <= 59) || (code >= 140 && code <= 149)

/** The pairs as the lines of an ASCII DXF file. */
export function recordsText(pairs: readonly Pair[]): string {
  return `${pairs.map(([code, value]) => `${String(code).padStart(3)}\r\n${valueText(code, value)}`).join('\r\n')}\r\n`
}

function valueText(code: number, value: string | number): string {
  if (typeof value === 'string') return value
  if (!isReal(code)) return String(value)
  const text = value.toFixed(PLACES).replace(/(\.\d*?)0+$/, '$1')
  const whole = text.endsWith('.') ? `${text}0` : text
  return whole === '-0.0' ? '0.0' : whole
}

/** Text as the 2000 form of the file may hold it: anything beyond ASCII as \U+XXXX, carets and per cent signs as they are meant. */
export function dxfText(text: string): string {
  return [...text]
    .flatMap((character) => {
      const code = character.codePointAt(0) ?? 0
      if (code > 0xffff) return ['?']
      if (code > 0x7e || code < 0x20) return [`\\U+${code.toString(16).toUpperCase().padStart(4, '0')}`]
      if (character === '^') return ['^ ']
      return [character]
    })
    .join('')
    .replace(/%%/g, '% %')
}

/** Hands out the handles that every object of the file must have, each once, as hexadecimal text. */
export function handleSource(): () => string {
  let last = 0x0f
  return () => {
    last += 1
    return last.toString(16).toUpperCase()
  }
}
