import type { z } from 'zod'
import type { Fault } from '@shared/failure'

/** JSON pointer (RFC 6901) of a path. */
export function pointerOf(path: readonly PropertyKey[]): string {
  return path.map((part) => '/' + String(part).replaceAll('~', '~0').replaceAll('/', '~1')).join('')
}

/** What a value is, in a few words for a message: never the whole of it. */
function shown(value: unknown): string {
  if (value === undefined) return 'missing'
  if (Array.isArray(value)) return `a list of ${value.length}`
  if (typeof value === 'object' && value !== null) return 'an object'
  const text = JSON.stringify(value) ?? String(value)
  return text.length > 60 ? text.slice(0, 57) + '…' : text
}

function valueAt(input: unknown, path: readonly PropertyKey[]): unknown {
  return path.reduce<unknown>(
    (value, part) =>
      typeof value === 'object' && value !== null ? (value as Record<PropertyKey, unknown>)[part] : undefined,
    input,
  )
}

/** Every rule that was broken, each with its place, what stands there and what must. */
export function faultsOf(error: z.ZodError, input: unknown): Fault[] {
  return error.issues.flatMap((issue) => faultsOfIssue(issue, input, []))
}

type Issue = z.core.$ZodIssue

function faultsOfIssue(issue: Issue, input: unknown, before: readonly PropertyKey[]): Fault[] {
  const path = [...before, ...issue.path]
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => ({
      path: pointerOf([...path, key]),
      code: 'unknown-key',
      says: `"${key}" is not a name known here; take it out or correct its spelling.`,
    }))
  }
  if (issue.code === 'invalid_union' && issue.errors.length > 0) {
    const nearest = nearestOf(issue.errors)
    return nearest.flatMap((inner) => faultsOfIssue(inner as Issue, input, path))
  }
  return [
    {
      path: pointerOf(path),
      code: issue.code.replaceAll('_', '-'),
      says: `is ${shown(valueAt(input, path))}; ${mendOf(issue)}`,
    },
  ]
}

/** Of the ways that all failed, the one that got furthest tells most. */
function nearestOf(ways: readonly (readonly z.core.$ZodIssue[])[]): readonly z.core.$ZodIssue[] {
  const depth = (way: readonly z.core.$ZodIssue[]) => Math.max(0, ...way.map((issue) => issue.path.length))
  return ways.reduce((best, way) => (depth(way) > depth(best) ? way : best))
}

function mendOf(issue: Issue): string {
  switch (issue.code) {
    case 'invalid_type':
      return `it must be ${articleOf(issue.expected)}`
    case 'too_small':
      return `it must be ${issue.inclusive === false ? 'more than' : 'at least'} ${String(issue.minimum)}${unitOf(issue.origin)}`
    case 'too_big':
      return `it must be ${issue.inclusive === false ? 'less than' : 'at most'} ${String(issue.maximum)}${unitOf(issue.origin)}`
    case 'invalid_value':
      return `it must be ${issue.values.map((value) => JSON.stringify(value)).join(' or ')}`
    case 'invalid_union':
      return 'discriminator' in issue && issue.discriminator !== undefined
        ? 'it must be one of the kinds known here'
        : 'no known form fits it'
    default:
      return issue.message
  }
}

function articleOf(expected: string): string {
  const names: Record<string, string> = {
    string: 'a text',
    number: 'a finite number',
    int: 'a whole number',
    array: 'a list',
    tuple: 'a list of the right length',
    object: 'an object',
    boolean: 'true or false',
  }
  return names[expected] ?? expected
}

function unitOf(origin: string): string {
  if (origin === 'string') return ' characters'
  return origin === 'array' || origin === 'tuple' ? ' entries' : ''
}
