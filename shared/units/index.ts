export { parseLength } from './length'
export type { ParsedLength } from './length'
export type { LengthUnit } from './length-tokens'
export {
  plusMinus95,
  printArea,
  printLength,
  printLengthExact,
  printMass,
  printNumber,
  printPlusMinus,
  printVolume,
  standardDeviationFrom95,
} from './print'
export type { InchDivision, PrintLengthOptions } from './print'
export {
  NANOMETRES_PER_MM,
  mmFromNanometres,
  mmFromSixtyFourths,
  nanometresDown,
  nanometresFrom,
  nanometresUp,
} from './nanometre'
export type { Nanometres } from './nanometre'
export { WORD_KEYS, wordOf } from './words'
export type { Vocabulary, WordKey, WordOptions } from './words'
export {
  AREA_ACCURACY_MM2,
  CHORD_ERROR_MM,
  CURVE_TO_ARC_MM,
  DIFFERENCE_ACCURACY_MM,
  FREE_END_MM,
  FREE_JOINT_RAD,
  GREATEST_LENGTH_MM,
  KNIFE_OUTLINE_MM,
  KNIFE_TABLE_MM,
  LENGTH_ACCURACY_MM,
  MEETING_MM,
  NANOMETRE_SNAP_MM,
  POLYGON_UNITS_PER_MM,
  RECTANGLE_ACCURACY_MM,
  TURN_BACK_MM,
} from './tolerance'
