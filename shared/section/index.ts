export { SIGHT_EDGE_KEY } from './document'
export type {
  Basis,
  Bead,
  Cavetto,
  CymaRecta,
  CymaReversa,
  DraftGessoStretch,
  DraftMember,
  DraftSection,
  Fillet,
  Flutes,
  Free,
  FreeCurve,
  GessoStretch,
  Member,
  MemberBasis,
  MemberKind,
  Ovolo,
  Pair,
  Quirk,
  Reeds,
  Scotia,
  Section,
  Splay,
  Thumb,
  Torus,
} from './document'
export { defaultArcOf, memberEndOf, memberSegments } from './member-segments'
export { SECTION_DEFAULTS, withDefaults } from './defaults'
export type { PartialMember, PartialSection } from './defaults'
export { faceOf } from './face'
export type { Face } from './face'
export { woodFaceOf } from './wood-face'
export type { SwallowedMember, WoodFace } from './wood-face'
export { outlineOf, woodOutlineOf } from './outline'
export { canonicalText } from './canonical'
export { sha256Hex } from './digest'
export { issueTextOf, plainSectionOf, sectionSha256 } from './issue-text'
export { breakKeyOf, breakNumberOf, draftFromSection, findBreakNumber, sectionFromDraft } from './draft'
export { applyEdit } from './edit'
export type { AppliedEdit, SectionEdit, SetEdit } from './edit'
export { basisCountsOf, missingBasisOf } from './basis'
export type { BasisCounts } from './basis'
export { girthOf, measuresOf } from './measures'
export type {
  MemberMeasures,
  MemberRadius,
  OutlineMeasures,
  SecondMoments,
  SectionMeasures,
  WoodMeasures,
} from './measures'
export type { SectionBlank } from './blank'
export type { LeastWood } from './least-wood'
export { faultsOfSection, requireSoundSection } from './faults'
export { checksOf } from './checks'
export { COMMON_PRACTICE_MILL, FEATHER_EDGE_DEG } from './check'
export type { Check, CheckCode, CheckOptions, CheckSeverity, MillLimits, RebateStack } from './check'
export { shapeSha256, shapeTextOf } from './shape-text'
export { dragBreak, resized } from './resize'
export type { MemberSize, ResizeOptions } from './resize'
export { describeSection } from './describe'
export type { DescribeOptions } from './describe'
export { changesBetween, differenceOf } from './difference'
export type { SectionChange, SectionDifference } from './difference'
export { gessoOver } from './gesso'
