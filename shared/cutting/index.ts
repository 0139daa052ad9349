export { compoundMitreOf, mitreAngleOf, tiltedMitreOf, unequalMitreOf } from './mitre'
export type { CompoundMitre } from './mitre'
export { coverOf, polygonCoverOf, polygonOpeningOf, rebateOpeningOf } from './rebate-opening'
export type {
  Cover,
  MeasuredOpening,
  PictureReadings,
  PolygonReadings,
  RebateOpening,
} from './rebate-opening'
export { footageOf, railsOf, totalRailLengthAt, volumeOf } from './rails'
export type { Rail, RailSide, Rails, RailsRequest } from './rails'
export { planCuts } from './plan-cuts'
export { DEFAULT_STEP_LIMIT } from './step-counter'
export type {
  CutInstance,
  CutPlan,
  DemandedRail,
  LengthsToOrder,
  OpenedLength,
  OrderRules,
  OrderableLength,
  PlanOptions,
  PlanOutcome,
  PlanProgress,
  PlannedCut,
  RackPiece,
  SawSettings,
} from './cut-instance'
