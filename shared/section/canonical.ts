import { Failure } from '@shared/failure'

/** With the u flag a whole pair counts as one character, so this finds lone halves only. */
const LONE_SURROGATE = /\p{Surrogate}/u

/**
 * The canonical JSON text of plain data by RFC 8785: no white space, properties in order of their UTF-16 code units, numbers and strings as
 * ECMAScript writes them. As in JSON, a property that is undefined is left out. What JSON cannot say (numbers that are not finite, lone
 * surrogates, functions, dates, undefined in a list) is Failure 'input-invalid' with its place.
 */
export const canonicalText = (value: unknown): string => textOf(value, '')

function textOf(value: unknown, path: string): string {
  if (value === null || typeof value === 'boolean') return String(value)
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) refuse(path, `it is ${value}; it must be a finite number`)
    return JSON.stringify(value)
  }
  if (typeof value === 'string') return stringText(value, path)
  if (Array.isArray(value)) return `[${value.map((item, i) => textOf(item, `${path}/${i}`)).join(',')}]`
  if (isPlainObject(value)) return objectText(value, path)
  return refuse(path, `it is a ${typeof value}, which JSON has no form for`)
}

function stringText(value: string, path: string): string {
  if (LONE_SURROGATE.test(value)) refuse(path, 'it holds half a character (a lone surrogate)')
  return JSON.stringify(value)
}

function objectText(value: Readonly<Record<string, unknown>>, path: string): string {
  const names = Object.keys(value)
    .filter((name) => value[name] !== undefined)
    .sort()
  const entries = names.map((name) => {
    const place = `${path}/${name.replaceAll('~', '~0').replaceAll('/', '~1')}`
    return `${stringText(name, place)}:${textOf(value[name], place)}`
  })
  return `{${entries.join(',')}}`
}

function isPlainObject(value: unknown): value is Readonly<Record<string, unknown>> {
  if (typeof value !== 'object' || value === null) return false
  const prototype: unknown = Object.getPrototypeOf(value)
  return prototype === Object.prototype || prototype === null
}

function refuse(path: string, what: string): never {
  const says = `${path === '' ? 'The value' : path} cannot be written as canonical JSON: ${what}.`
  throw new Failure('input-invalid', { says, faults: [{ path, code: 'not-json', says }] })
}
