import type { CommissionAnswerData, CommissionFile } from '@shared/contracts'
import { clampCheckOf, speedChecksOf } from '@shared/knife'
import type { KnifeCheck } from '@shared/knife'
import { checksOf, sectionSha256, shapeSha256, woodFaceOf } from '@shared/section'
import type { Check, CheckCode, CheckOptions, Section, SectionMeasures } from '@shared/section'
import type { Point } from '@shared/geometry'
import { headRunningOf, knifeHeadOf } from './head'
import type { WrittenHead } from './head'

const pairOf = ({ x, y }: Point): [number, number] => [x, y]

/** The outline with the finished face. */
export function sectionAnswerOf(
  section: Section,
  measures: SectionMeasures,
): NonNullable<CommissionAnswerData['section']> {
  const { areaMm2, widthMm, depthMm, girthMm, centroid, secondMoments, breaks } = measures.section
  return {
    area: areaMm2,
    width: widthMm,
    depth: depthMm,
    girth: girthMm,
    centroid: pairOf(centroid),
    secondMoments: { ...secondMoments },
    breaks: breaks.map(pairOf),
    sha256: sectionSha256(section),
  }
}

/** The outline that the mill cuts, and whether it can be run. */
export function woodAnswerOf(
  file: CommissionFile,
  section: Section,
  { wood }: SectionMeasures,
): NonNullable<CommissionAnswerData['wood']> {
  return {
    area: wood.areaMm2,
    width: wood.widthMm,
    depth: wood.depthMm,
    girth: wood.girthMm,
    centroid: pairOf(wood.centroid),
    lip: wood.lipMm,
    leastWood: { thickness: wood.leastWood.thicknessMm, at: pairOf(wood.leastWood.at) },
    blank: { width: wood.blank.widthMm, thickness: wood.blank.thicknessMm, tilt: wood.blank.tiltDeg },
    swallowed: wood.swallowed.map(({ member, says }) => ({ member, says })),
    checks: allChecksOf(section, { mill: file.mill, head: file.head, stack: stackOf(file) }).flatMap(
      ({ code, severity, value, limit, at, says }) =>
        severity === 'ok'
          ? []
          : [{ code, severity, value, limit, at: [at[0], at[1]] as [number, number], says }],
    ),
    sha256: shapeSha256(section),
  }
}

/** What the checks are held against; what is absent is common practice, or not checked. */
export interface CheckBasis {
  readonly mill?: CheckOptions['mill']
  readonly head?: WrittenHead | undefined
  readonly stack?: CheckOptions['stack']
}

/** Every check of a section, those of the knife in its head among them; `ok` where all is well. */
export function allChecksOf(section: Section, { mill, head, stack }: CheckBasis): Check[] {
  const plain = checksOf(section, {
    ...(mill !== undefined && { mill }),
    ...(head !== undefined && { head }),
    ...(stack !== undefined && { stack }),
  })
  if (head === undefined) return plain
  const face = woodFaceOf(section)
  const deepest = face.breaks.reduce((low, one) => (one.y < low.y ? one : low))
  const placed = (check: KnifeCheck): Check => ({
    ...check,
    code: check.code satisfies CheckCode,
    at: pairOf(deepest),
  })
  return [
    ...plain,
    placed(clampCheckOf(face.path, knifeHeadOf(head))),
    ...speedChecksOf(headRunningOf(head)).map(placed),
  ]
}

/** What must find room in the rebate, of the one picture or of the thickest of several. */
function stackOf({ picture, pictures }: CommissionFile) {
  const all = picture === undefined ? (pictures ?? []) : [picture]
  const [first] = all
  if (first === undefined) return undefined
  const thickest = all.reduce(
    (thick, one) => ((one.thickness ?? 0) > (thick.thickness ?? 0) ? one : thick),
    first,
  )
  return { lining: thickest.lining, thickness: thickest.thickness, ...thickest.stack }
}
