import { Failure } from '@shared/failure'
import { LENGTH_ACCURACY_MM } from '@shared/units'
import { areaMomentsOf, arcGeometryOf, boundsOf, lengthOf, lineMomentsOf, reversed } from '@shared/geometry'
import type { Outline, Path, Point, Segment } from '@shared/geometry'
import { blankOf } from './blank'
import type { SectionBlank } from './blank'
import type { Section } from './document'
import { faceOf } from './face'
import type { Face } from './face'
import { leastWoodOf } from './least-wood'
import type { LeastWood } from './least-wood'
import { outlineWith } from './outline'
import { woodFaceUnder } from './wood-face'
import type { SwallowedMember } from './wood-face'

/** Second moments of area about the axes through the centroid, mm⁴: xx = ∫x² dA, yy = ∫y² dA, xy = ∫xy dA. */
export interface SecondMoments {
  readonly xx: number
  readonly yy: number
  readonly xy: number
}

/** What is measured of either outline. */
export interface OutlineMeasures {
  readonly areaMm2: number
  /** ∫x dA and ∫y dA from the origin of the section (foot of the sight edge on the wall), mm³. */
  readonly firstMoments: Point
  readonly centroid: Point
  readonly secondMoments: SecondMoments
  /** Greatest less least x, and y, of the true curves. */
  readonly widthMm: number
  readonly depthMm: number
  readonly greatestXMm: number
  /** Arc length of the face. */
  readonly girthMm: number
  readonly sightEdgeHeightMm: number
  readonly breaks: readonly Point[]
}

export interface WoodMeasures extends OutlineMeasures {
  /** Sight-edge height of the wood less the rebate's depth. */
  readonly lipMm: number
  readonly leastWood: LeastWood
  readonly blank: SectionBlank
  readonly swallowed: readonly SwallowedMember[]
}

/** An arc of a member: a round is convex in the wood, a hollow is not. */
export interface MemberRadius {
  readonly radiusMm: number
  readonly centre: Point
  readonly shape: 'round' | 'hollow'
}

export interface MemberMeasures {
  readonly widthMm: number
  readonly riseMm: number
  readonly radii: readonly MemberRadius[]
  /** Arc length of its face. */
  readonly lengthMm: number
}

export interface SectionMeasures {
  /** The outline with the finished face. */
  readonly section: OutlineMeasures
  /** The outline that the mill cuts. */
  readonly wood: WoodMeasures
  /** Of the finished face, in order. */
  readonly members: readonly MemberMeasures[]
}

/**
 * Everything that is measured of a section without faults. Areas and moments are closed forms (10⁻⁶ mm² and better), lengths within 10⁻⁶ mm;
 * nothing is flattened.
 */
export function measuresOf(section: Section): SectionMeasures {
  const face = faceOf(section)
  const woodFace = woodFaceUnder(section, face)
  const outline = outlineWith(section, face.path)
  const isBare = woodFace.path === face.path
  const woodOutline = isBare ? outline : outlineWith(section, woodFace.path)
  const finished = outlineMeasuresOf(outline, face)
  const wood = isBare ? finished : outlineMeasuresOf(woodOutline, woodFace)
  return {
    section: finished,
    wood: {
      ...wood,
      lipMm: wood.sightEdgeHeightMm - section.rebate.depth,
      leastWood: leastWoodOf(section, woodFace.path),
      blank: blankOf(woodOutline),
      swallowed: woodFace.swallowed,
    },
    members: memberMeasuresOf(section, face),
  }
}

/** The outline runs clockwise, so area and moments are taken of it the other way round. */
function outlineMeasuresOf(outline: Outline, { path, breaks }: Face): OutlineMeasures {
  const moments = areaMomentsOf(reversed(outline))
  const { min, max } = boundsOf(outline)
  return {
    areaMm2: moments.area,
    firstMoments: { x: moments.firstX, y: moments.firstY },
    centroid: moments.centroid,
    secondMoments: { xx: moments.centralXX, yy: moments.centralYY, xy: moments.centralXY },
    widthMm: max.x - min.x,
    depthMm: max.y - min.y,
    greatestXMm: max.x,
    girthMm: lengthOf(path, { accuracyMm: LENGTH_ACCURACY_MM }),
    sightEdgeHeightMm: breaks[0]?.y ?? 0,
    breaks,
  }
}

function memberMeasuresOf({ members }: Section, { path, memberOf }: Face): readonly MemberMeasures[] {
  const own: Segment[][] = members.map(() => [])
  for (const [index, segment] of path.entries()) own[memberOf[index] ?? 0]?.push(segment)
  return members.map(({ width, rise }, index) => {
    const segments: Path = own[index] ?? []
    return {
      widthMm: width,
      riseMm: rise,
      radii: segments.flatMap(radiusOfArc),
      lengthMm: lengthOf(segments, { accuracyMm: LENGTH_ACCURACY_MM }),
    }
  })
}

function radiusOfArc(segment: Segment): readonly MemberRadius[] {
  if (segment.kind !== 'arc' || segment.bulge === 0) return []
  const { radius, centre } = arcGeometryOf(segment)
  return [{ radiusMm: radius, centre, shape: segment.bulge < 0 ? 'round' : 'hollow' }]
}

/** Arc length of a stretch of the finished face between two breaks, and the centroid of that line, mm. */
export function girthOf(
  section: Section,
  fromBreak: number,
  toBreak: number,
): { readonly lengthMm: number; readonly centroid: Point } {
  const last = section.members.length
  const isBreak = (value: number): boolean => Number.isInteger(value) && value >= 0 && value <= last
  if (!isBreak(fromBreak) || !isBreak(toBreak) || fromBreak >= toBreak) {
    throw new Failure('input-invalid', {
      says: `A stretch of the face runs from one break to a later one, 0 to ${last}; it was given ${fromBreak} to ${toBreak}.`,
    })
  }
  const { path, memberOf } = faceOf(section)
  const stretch = path.filter((_, index) => {
    const member = memberOf[index] ?? -1
    return member >= fromBreak && member < toBreak
  })
  const { length, centroid } = lineMomentsOf(stretch, { accuracyMm: LENGTH_ACCURACY_MM })
  return { lengthMm: length, centroid }
}
