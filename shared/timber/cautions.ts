import { EMC_HUMIDITIES_PERCENT } from './moisture'
import type { Climate } from './moisture'
import type { Movement } from './movement'
import { requireSpecies } from './species'

/** Said with every mass: the frame's weight decides nothing by itself. */
export const HANGING_CAUTION =
  'The mass is that of the wood alone: picture, glazing, backing, gesso and fittings come on top. Fixings, wires and walls are for the institution’s own rigging practice; ask them before anything is hung.'

/** Said with every movement of the width. */
export const MOVEMENT_CAUTION =
  'Movement is worked out from the species’ mean figures for a board that follows the room’s air all through; a real board may move more or less, and later.'

export interface TimberCautionRequest {
  readonly species: string
  readonly climates: readonly Climate[]
  /** Whether a mass is told. */
  readonly hasMass: boolean
  readonly movement?: Movement
}

/** The cautions that belong beside timber figures, in plain English; never empty where a mass or a movement is told. */
export function timberCautionsOf(request: TimberCautionRequest): string[] {
  const { species, climates, hasMass, movement } = request
  return [
    ...(hasMass ? [HANGING_CAUTION, ...gravityCautions(species)] : []),
    ...(movement === undefined ? [] : [MOVEMENT_CAUTION, ...movementCautions(species, movement)]),
    ...climateCautions(climates),
  ]
}

function gravityCautions(key: string): string[] {
  const { name, gravity } = requireSpecies(key)
  return gravity.status === 'from memory' ? [unsure(`The density of ${name}`)] : []
}

function movementCautions(key: string, movement: Movement): string[] {
  const { name } = requireSpecies(key)
  const beyond =
    'One of the two moistures lies outside 6 to 14 %, where movement is only a straight line from the total shrinkage: take it as a rough figure.'
  return [
    ...(movement.method === 'shrinkage' ? [beyond] : []),
    ...(movement.status === 'from memory' ? [unsure(`The movement of ${name}`)] : []),
  ]
}

function climateCautions(climates: readonly Climate[]): string[] {
  const { least, greatest } = EMC_HUMIDITIES_PERCENT
  const isOutside = climates.some(
    ({ humidityPercent }) => humidityPercent < least || humidityPercent > greatest,
  )
  return isOutside
    ? [
        `A humidity lies outside ${least} to ${greatest} %, beyond the published table: its moisture content is the equation’s alone.`,
      ]
    : []
}

const unsure = (subject: string) =>
  `${subject} is given from memory of the published table; compare it with the table before relying on it.`
