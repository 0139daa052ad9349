/** Timber: species figures, moisture, movement, density, blanks. Lengths mm, moisture in per cent of ovendry mass. */
export { SPECIES, SPECIES_KEYS, requireSpecies } from './species'
export type { Cut } from './species'
export type { FigureStatus, Species, SpeciesFigure } from './species-table'
export { EMC_HUMIDITIES_PERCENT, EMC_TEMPERATURES_C, equilibriumMoistureOf } from './moisture'
export type { Climate } from './moisture'
export { COEFFICIENT_RANGE_PERCENT, FIBRE_SATURATION_PERCENT, mitreGapOf, movementOf } from './movement'
export type { Movement, MovementRequest } from './movement'
export {
  USUAL_MOISTURE_PERCENT,
  basicGravityFrom,
  densityFromGravity,
  densityOf,
  gravityFromBasic,
  massOf,
} from './density'
export {
  BOARD_FOOT_MM3,
  NOMINAL_THICKNESSES,
  blankFor,
  boardFeetOf,
  cubicMetresOf,
  nominalThicknessMmOf,
  withWaste,
} from './blank'
export type { Blank, BlankRequest, NominalThickness } from './blank'
export { HANGING_CAUTION, MOVEMENT_CAUTION, timberCautionsOf } from './cautions'
export type { TimberCautionRequest } from './cautions'
