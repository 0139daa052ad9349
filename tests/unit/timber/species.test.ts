import { describe, expect, it } from 'vitest'
import { Failure } from '@shared/failure'
import { SPECIES, SPECIES_KEYS, requireSpecies } from '@shared/timber'

describe('species', () => {
  it('finds one by its key', () => {
    expect(requireSpecies('white-oak').name).toBe('Oak, white (commercial)')
  })

  it('refuses an unknown one with the list of those there are', () => {
    const attempt = () => requireSpecies('bass wood')
    expect(attempt).toThrow(Failure)
    expect(attempt).toThrow(/no species "bass wood".*basswood.*yellow-poplar/)
    try {
      attempt()
    } catch (error) {
      expect(error instanceof Failure && error.code).toBe('input-invalid')
    }
  })

  it('has each key once, in small letters with hyphens', () => {
    expect(new Set(SPECIES_KEYS).size).toBe(SPECIES.length)
    SPECIES_KEYS.forEach((key) => expect(key).toMatch(/^[a-z]+(-[a-z]+)*$/))
  })

  it('moves more along the rings than across them, in every species', () => {
    SPECIES.forEach(({ key, movement, shrinkage }) => {
      expect(movement.tangential.value, key).toBeGreaterThan(movement.radial.value)
      expect(shrinkage.tangential.value, key).toBeGreaterThan(shrinkage.radial.value)
    })
  })
})
