import { describe, expect, it } from 'vitest'
import { WORD_KEYS, wordOf } from '@shared/units'

describe('wordOf', () => {
  it('says moulding, mitre and rebate in one vocabulary, molding, miter and rabbet in the other', () => {
    expect(['moulding', 'mitre', 'rebate'].map((key) => wordOf('moulding', key as 'mitre'))).toEqual([
      'moulding',
      'mitre',
      'rebate',
    ])
    expect(wordOf('molding', 'moulding')).toBe('molding')
    expect(wordOf('molding', 'mitre')).toBe('miter')
    expect(wordOf('molding', 'rebate')).toBe('rabbet')
    expect(wordOf('molding', 'cut-list')).toBe('cut list')
    expect(wordOf('moulding', 'cut-list')).toBe('cutting list')
  })

  it('makes plurals and capitals', () => {
    expect(wordOf('molding', 'length', { plural: true, capital: true })).toBe('Sticks')
    expect(wordOf('moulding', 'first-off', { plural: true })).toBe('first-offs')
    expect(wordOf('molding', 'timber', { plural: true })).toBe('lumber')
  })

  it('has two different words for every key', () => {
    expect(WORD_KEYS.length).toBe(12)
    for (const key of WORD_KEYS) expect(wordOf('moulding', key)).not.toBe(wordOf('molding', key))
  })
})
