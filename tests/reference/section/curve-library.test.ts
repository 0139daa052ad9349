import fc from 'fast-check'
import type { default as Library } from 'paper'
import core from 'paper/dist/paper-core.js'
import { beforeAll, describe, expect, it } from 'vitest'
import { arcGeometryOf, pointAt, type Path, type Segment } from '@shared/geometry'
import { faceOf, measuresOf, outlineOf } from '@shared/section'
import { anySection } from '../../helpers/arbitraries-section'
import { expectWithin } from '../../helpers/expect-within'

// The package types its core, which runs without a page, only by the name of the whole.
const paper = core as unknown as typeof Library

beforeAll(() => {
  paper.setup(new paper.Size(1, 1))
})

/**
 * The same path in a general-purpose vector library (paper 0.12.20), which shares no code with ours. It knows cubics only: an arc becomes the cubics
 * that it makes of one itself, at most a quarter circle each, 0.028 % too great in a circle's area; ellipses are scaled circles to it.
 */
function inLibrary(path: Path, isClosed: boolean): InstanceType<typeof paper.Path> {
  const own = new paper.Path({ insert: false })
  const start = path[0]?.start
  if (start) own.moveTo(new paper.Point(start.x, start.y))
  for (const segment of path) addTo(own, segment)
  if (isClosed) own.closePath()
  return own
}

/** A form of arcTo that the library has and its types leave out: end, radii, rotation, clockwise, large. */
interface EllipticArcs {
  arcTo(
    to: InstanceType<typeof paper.Point>,
    radius: InstanceType<typeof paper.Size>,
    rotation: number,
    isClockwise: boolean,
    isLarge: boolean,
  ): void
}

function addTo(own: InstanceType<typeof paper.Path>, segment: Segment): void {
  const to = new paper.Point(segment.end.x, segment.end.y)
  switch (segment.kind) {
    case 'line':
      return own.lineTo(to)
    case 'arc': {
      const { x, y } = pointAt(segment, 0.5)
      return own.arcTo(new paper.Point(x, y), to)
    }
    case 'ellipse': {
      // the library's arcs by the flags of vector graphics: radii, rotation, clockwise (y down there, up here), large
      const radius = new paper.Size(segment.semiX, segment.semiY)
      return (own as unknown as EllipticArcs).arcTo(to, radius, 0, segment.sweepRad > 0, false)
    }
    default: {
      const { control1, control2 } = segment
      return own.cubicCurveTo([control1.x, control1.y], [control2.x, control2.y], to)
    }
  }
}

/** What the library's cubics can be out on the arcs of a face: 0.028 % of the circles', as caps between chord and arc have at most their area. */
function arcAreaOf(path: Path): number {
  return path.reduce((sum, segment) => {
    if (segment.kind === 'arc')
      return (
        sum +
        (Math.PI * arcGeometryOf(segment).radius ** 2 * Math.abs(Math.atan(segment.bulge))) / (Math.PI / 2)
      )
    return segment.kind === 'ellipse' ? sum + (Math.PI * segment.semiX * segment.semiY) / 4 : sum
  }, 0)
}

const LIBRARY_ARC_AREA = 0.0003
const LIBRARY_ARC_LENGTH = 0.0003

describe('a general-purpose curve library', () => {
  it('finds the same area of any section, as nearly as its arcs allow', () => {
    fc.assert(
      fc.property(anySection(), (section) => {
        const theirs = Math.abs(inLibrary(outlineOf(section), true).area)
        const allowed = 1e-6 + LIBRARY_ARC_AREA * arcAreaOf(faceOf(section).path)
        expectWithin(measuresOf(section).section.areaMm2, theirs, { withinMm2: allowed })
      }),
    )
  })

  it('finds the same girth, width and depth', () => {
    fc.assert(
      fc.property(anySection(), (section) => {
        const { girthMm, widthMm, depthMm } = measuresOf(section).section
        expectWithin(inLibrary(faceOf(section).path, false).length, girthMm, {
          withinMm: 1e-5 + LIBRARY_ARC_LENGTH * girthMm,
        })
        const { width, height } = inLibrary(outlineOf(section), true).bounds
        expectWithin(width, widthMm, { withinMm: 0.005 })
        expectWithin(height, depthMm, { withinMm: 0.005 })
      }),
    )
  })

  it('differs where it must: a section one ten-thousandth larger is told apart', () => {
    fc.assert(
      fc.property(anySection(), (section) => {
        const { areaMm2 } = measuresOf(section).section
        const taller = measuresOf({ ...section, sightEdgeHeight: section.sightEdgeHeight * 1.0001 }).section
        expect(taller.areaMm2).toBeGreaterThan(areaMm2)
      }),
      { numRuns: 20 },
    )
  })
})
