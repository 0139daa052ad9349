/**
 * Species data of the Wood Handbook (USDA Forest Products Laboratory, FPL-GTR-190, 2010; FPL-GTR-282, 2021): movement
 * coefficients of Table 13-5, shrinkage of Table 4-3, specific gravity at 12 % moisture of Tables 5-3. A work of the
 * government of the United States.
 */

/**
 * How surely a figure is the handbook's: read in the handbook's own page; read in another text that cites the table; or
 * written down from memory of it, to be checked against the handbook before anything is made to depend on it.
 */
export type FigureStatus = 'published' | 'second-party' | 'from memory'

export interface SpeciesFigure {
  readonly value: number
  readonly status: FigureStatus
}

export interface Species {
  readonly key: string
  readonly name: string
  /** Change of a dimension per unit of it per per cent of moisture, from 6 to 14 %. Table 13-5. */
  readonly movement: { readonly radial: SpeciesFigure; readonly tangential: SpeciesFigure }
  /** Green to ovendry, per cent of the green dimension. Table 4-3. */
  readonly shrinkage: { readonly radial: SpeciesFigure; readonly tangential: SpeciesFigure }
  /** Ovendry mass and volume at 12 % of moisture, or green (`at`), over the density of water. Tables 5-3 and 5-5. */
  readonly gravity: SpeciesFigure & { readonly at: 12 | 'green' }
}

type Row = readonly [
  key: string,
  name: string,
  movement: readonly [radial: SpeciesFigure, tangential: SpeciesFigure],
  shrinkage: readonly [radial: SpeciesFigure, tangential: SpeciesFigure],
  gravity: SpeciesFigure & { readonly at: 12 | 'green' },
]

const published = (value: number): SpeciesFigure => ({ value, status: 'published' })
const secondParty = (value: number): SpeciesFigure => ({ value, status: 'second-party' })
const fromMemory = (value: number): SpeciesFigure => ({ value, status: 'from memory' })
const dry = (figure: SpeciesFigure) => ({ ...figure, at: 12 as const })
const green = (figure: SpeciesFigure) => ({ ...figure, at: 'green' as const })

// prettier-ignore
const ROWS: readonly Row[] = [
  ['basswood', 'Basswood (lime), American', [published(0.00230), published(0.00330)], [published(6.6), published(9.3)], dry(secondParty(0.37))],
  ['beech', 'Beech, American', [published(0.00190), published(0.00431)], [published(5.5), published(11.9)], dry(secondParty(0.64))],
  ['white-ash', 'Ash, white', [published(0.00169), published(0.00274)], [published(4.9), published(7.8)], dry(secondParty(0.60))],
  ['quaking-aspen', 'Aspen, quaking', [published(0.00119), published(0.00234)], [fromMemory(3.5), fromMemory(6.7)], dry(fromMemory(0.38))],
  ['yellow-birch', 'Birch, yellow', [published(0.00256), published(0.00338)], [published(7.3), published(9.5)], dry(secondParty(0.62))],
  ['butternut', 'Butternut', [published(0.00116), published(0.00223)], [published(3.4), published(6.4)], dry(secondParty(0.38))],
  ['black-cherry', 'Cherry, black', [published(0.00126), published(0.00248)], [published(3.7), published(7.1)], dry(secondParty(0.50))],
  ['chestnut', 'Chestnut, American', [published(0.00116), published(0.00234)], [published(3.4), published(6.7)], dry(secondParty(0.43))],
  ['red-alder', 'Alder, red', [published(0.00151), published(0.00256)], [published(4.4), published(7.3)], dry(fromMemory(0.41))],
  ['american-elm', 'Elm, American', [published(0.00144), published(0.00338)], [fromMemory(4.2), fromMemory(9.5)], dry(fromMemory(0.50))],
  ['hickory', 'Hickory, true', [secondParty(0.00259), secondParty(0.00411)], [fromMemory(7.0), fromMemory(10.5)], dry(fromMemory(0.72))],
  ['red-maple', 'Maple, red', [published(0.00137), published(0.00289)], [fromMemory(4.0), fromMemory(8.2)], dry(secondParty(0.54))],
  ['sugar-maple', 'Maple, sugar', [published(0.00165), published(0.00353)], [fromMemory(4.8), fromMemory(9.9)], dry(secondParty(0.63))],
  ['red-oak', 'Oak, red (commercial)', [published(0.00158), published(0.00369)], [fromMemory(4.0), fromMemory(8.6)], dry(secondParty(0.63))],
  ['white-oak', 'Oak, white (commercial)', [published(0.00180), published(0.00365)], [published(5.6), published(10.5)], dry(secondParty(0.68))],
  ['black-walnut', 'Walnut, black', [published(0.00190), published(0.00274)], [published(5.5), published(7.8)], dry(secondParty(0.55))],
  ['sweetgum', 'Sweetgum', [published(0.00183), published(0.00365)], [published(5.3), published(10.2)], dry(fromMemory(0.52))],
  ['sycamore', 'Sycamore, American', [published(0.00172), published(0.00296)], [published(5.0), published(8.4)], dry(fromMemory(0.49))],
  ['yellow-poplar', 'Yellow-poplar (tulipwood)', [secondParty(0.00158), secondParty(0.00289)], [published(4.6), published(8.2)], dry(secondParty(0.42))],
  ['douglas-fir', 'Douglas-fir, coast', [secondParty(0.00165), secondParty(0.00267)], [published(4.8), published(7.6)], dry(secondParty(0.48))],
  ['white-fir', 'Fir, white', [published(0.00112), fromMemory(0.00245)], [published(3.3), published(7.0)], dry(fromMemory(0.39))],
  ['western-redcedar', 'Western redcedar', [secondParty(0.00111), secondParty(0.00234)], [published(2.4), published(5.0)], dry(fromMemory(0.32))],
  ['eastern-white-pine', 'Pine, eastern white', [secondParty(0.00071), secondParty(0.00212)], [fromMemory(2.1), fromMemory(6.1)], dry(secondParty(0.35))],
  ['western-white-pine', 'Pine, western white', [fromMemory(0.00141), fromMemory(0.00259)], [fromMemory(4.1), fromMemory(7.4)], dry(fromMemory(0.38))],
  ['ponderosa-pine', 'Pine, ponderosa', [fromMemory(0.00133), fromMemory(0.00216)], [fromMemory(3.9), fromMemory(6.2)], dry(fromMemory(0.40))],
  ['sugar-pine', 'Pine, sugar', [fromMemory(0.00099), fromMemory(0.00194)], [fromMemory(2.9), fromMemory(5.6)], dry(fromMemory(0.36))],
  ['mahogany', 'Mahogany', [fromMemory(0.00172), fromMemory(0.00238)], [fromMemory(3.0), fromMemory(4.1)], green(fromMemory(0.45))],
  ['teak', 'Teak', [secondParty(0.00101), secondParty(0.00186)], [fromMemory(2.5), fromMemory(5.8)], green(fromMemory(0.55))],
]

export const SPECIES_TABLE: readonly Species[] = ROWS.map(([key, name, movement, shrinkage, gravity]) => ({
  key,
  name,
  movement: { radial: movement[0], tangential: movement[1] },
  shrinkage: { radial: shrinkage[0], tangential: shrinkage[1] },
  gravity,
}))
