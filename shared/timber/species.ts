import { Failure } from '@shared/failure'
import { SPECIES_TABLE } from './species-table'
import type { Species } from './species-table'

/** Keys of all species, in the order of the table. */
export const SPECIES_KEYS: readonly string[] = SPECIES_TABLE.map(({ key }) => key)

/** The whole table, for lists on a screen. */
export const SPECIES: readonly Species[] = SPECIES_TABLE

const BY_KEY: ReadonlyMap<string, Species> = new Map(SPECIES_TABLE.map((species) => [species.key, species]))

/** The species of this key; an unknown one is Failure 'input-invalid' that lists the known keys. */
export function requireSpecies(key: string): Species {
  const species = BY_KEY.get(key)
  if (species !== undefined) return species
  const says = `There is no species "${key}"; use one of: ${SPECIES_KEYS.join(', ')}.`
  throw new Failure('input-invalid', { says, faults: [{ path: '/species', code: 'unknown-species', says }] })
}

/** How the board was sawn: 'flat' has the growth rings lying along its width, 'quarter' across it. */
export type Cut = 'flat' | 'quarter'
