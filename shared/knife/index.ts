/** The knife that cuts a wood face: mm and radians; x runs from the sight edge, depths go down from the face's highest point. */
export {
  USUAL_CLAMP_ROOM_MM,
  clampRoomLeftOf,
  faceOffsetOf,
  findDepthRefusal,
  greatestDepthOf,
  knifeHeadFrom,
} from './head'
export type { DepthRefused, KnifeHead } from './head'
export { knifeFaceDepth, riseCutBy } from './face-depth'
export type { FaceDepth, KnifeSetting } from './face-depth'
export { knifeTable } from './table'
export type { KnifeRow, KnifeTable } from './table'
export { CORRECTED_NOTE, correctedOutline } from './outline'
export type { CorrectedOutline } from './outline'
export type { ArcOrLine } from './arc-fit'
export { USUAL_OVERRUN_MM, knifeSizeOf } from './size'
export type { KnifeSize, KnifeSizeOptions } from './size'
export { peripheralSpeedOf, runningFiguresOf, waveHeightOf } from './running'
export type { HeadRunning, RunningFigures } from './running'
export { HAND_FEED_SPEEDS_M_PER_S, clampCheckOf, speedChecksOf } from './run-checks'
export type { KnifeCheck } from './run-checks'
export { FEWEST_MARKS_PER_INCH, KNIFE_CAUTIONS, knifeCautionsOf } from './cautions'
