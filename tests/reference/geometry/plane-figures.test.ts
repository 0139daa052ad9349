import { describe, it } from 'vitest'
import {
  arcFromBulge,
  arcFromCentre,
  areaMomentsOf,
  arcGeometryOf,
  cubicFrom,
  ellipseFrom,
  lengthOf,
  lineFrom,
  lineMomentsOf,
  pointFrom as at,
  quarterEllipseFrom,
  signedAreaOf,
  type Outline,
  type Path,
} from '@shared/geometry'
import handbook from '../data/plane-figures.json'
import { expectWithin } from '../../helpers/expect-within'

const { figures } = handbook
const RAD_PER_DEG = Math.PI / 180

const sector = (r: number, sweep: number): Outline => {
  const arc = arcFromCentre(at(0, 0), r, -sweep / 2, sweep)
  return [lineFrom(at(0, 0), arc.start), arc, lineFrom(arc.end, at(0, 0))]
}

const segmentOfCircle = (chord: number, height: number): Outline => [
  arcFromBulge(at(0, 0), at(chord, 0), (2 * height) / chord),
  lineFrom(at(chord, 0), at(0, 0)),
]

/** What a square corner leaves outside a rounding of radius r: sides along the axes from the corner at 0. */
const spandrel = (r: number): Outline => [
  lineFrom(at(0, 0), at(r, 0)),
  arcFromCentre(at(r, r), r, -Math.PI / 2, -Math.PI / 2),
  lineFrom(at(0, r), at(0, 0)),
]

/** From the vertex along the parabola y² = (y1²/x1) x, as a cubic. */
const parabola = (x1: number, y1: number) =>
  cubicFrom(at(0, 0), at(0, y1 / 3), at(x1 / 3, (2 * y1) / 3), at(x1, y1))

// Machinery's Handbook, 31st ed. (published); pages in the data file.
describe('plane figures of the engineering handbook', () => {
  it('quarter circle', () => {
    const quarter = sector(1, Math.PI / 2)
    expectWithin(signedAreaOf(quarter), figures.quarterCircle.area, { withinMm2: 5e-5 })
    expectWithin(lengthOf([quarter[1] as Path[number]]), figures.quarterCircle.arc, { withinMm: 5e-5 })
  })

  it('centre of gravity of half, quarter and sixth of a circle to its centre', () => {
    const { half, quarter, sixth } = figures.centroidToCentre
    expectWithin(areaMomentsOf(sector(1, Math.PI)).centroid.x, half, { withinMm: 5e-5 })
    expectWithin(areaMomentsOf(sector(1, Math.PI / 2)).centroid.x, quarter, { withinMm: 5e-5 })
    expectWithin(areaMomentsOf(sector(1, Math.PI / 3)).centroid.x, sixth, { withinMm: 5e-5 })
  })

  it('spandrel: area, centroid and both worked examples', () => {
    const moments = areaMomentsOf(spandrel(1))
    expectWithin(moments.area, figures.spandrel.area, { withinMm2: 5e-5 })
    expectWithin(moments.centroid.x, figures.spandrel.centroid, { withinMm: 5e-5 })
    expectWithin(moments.centroid.y, figures.spandrel.centroid, { withinMm: 5e-5 })
    // the book's factors 0.215 r² and 0.1075 c² have three and four figures
    const { radiusIn, areaIn2, chordIn, areaOfChordIn2 } = figures.spandrelExample
    expectWithin(signedAreaOf(spandrel(radiusIn)), areaIn2, { withinMm2: 5e-4 })
    expectWithin(signedAreaOf(spandrel(chordIn / Math.SQRT2)), areaOfChordIn2, { withinMm2: 1e-3 })
  })

  it('sector', () => {
    const { radiusMm, angleDeg, areaMm2, arcMm } = figures.sector
    const found = sector(radiusMm, angleDeg * RAD_PER_DEG)
    expectWithin(signedAreaOf(found), areaMm2, { withinMm2: 0.005 })
    // the book turns degrees to radians by 0.01745
    expectWithin(lengthOf([found[1] as Path[number]]) * (0.01745 / RAD_PER_DEG), arcMm, { withinMm: 0.0005 })
  })

  it('segment of a circle', () => {
    const { radiusCm, depthCm, chordCm, angleDeg, arcCm, areaCm2 } = figures.segment
    const chord = 2 * Math.sqrt(depthCm * (2 * radiusCm - depthCm))
    const found = segmentOfCircle(chord, depthCm)
    const arc = found[0]
    if (arc?.kind !== 'arc') throw new Error('the segment begins with its arc')
    expectWithin(chord, chordCm, { withinMm: 0.005 })
    expectWithin(arcGeometryOf(arc).radius, radiusCm, { withinMm: 1e-12 })
    // the book rounds the sine before it takes the angle: 67.13 for 67.1146
    expectWithin(arcGeometryOf(arc).sweepRad / RAD_PER_DEG, angleDeg, { withinDeg: 0.02 })
    expectWithin(lengthOf([arc]), arcCm, { withinMm: 0.005 })
    expectWithin(signedAreaOf(found), areaCm2, { withinMm2: 0.005 })
  })

  it('radius from chord and rise', () => {
    const { chord, height, radius } = figures.segmentByChord
    expectWithin(arcGeometryOf(arcFromBulge(at(0, 0), at(chord, 0), (2 * height) / chord)).radius, radius, {
      withinMm: 1e-12,
    })
  })

  it('parabola: area, segment, centre of gravity of the half and of what is left', () => {
    const { x, y, area, segmentChord, segmentHeight, segmentArea } = figures.parabola
    const under = [lineFrom(at(x, y), at(x, 0)), lineFrom(at(x, 0), at(0, 0)), parabola(x, y)]
    expectWithin(-signedAreaOf(under), area, { withinMm2: 1e-9 })
    const c = segmentChord
    const cap = [
      cubicFrom(
        at(0, 0),
        at(c / 3, (4 / 3) * segmentHeight),
        at((2 * c) / 3, (4 / 3) * segmentHeight),
        at(c, 0),
      ),
      lineFrom(at(c, 0), at(0, 0)),
    ]
    expectWithin(-signedAreaOf(cap), segmentArea, { withinMm2: 1e-9 })

    const { h, w, complementH, complementW } = figures.parabolaCentroid
    const half = areaMomentsOf([
      parabola(1, 1),
      lineFrom(at(1, 1), at(1, 0)),
      lineFrom(at(1, 0), at(0, 0)),
    ]).centroid
    expectWithin(half.x, h, { withinMm: 1e-12 })
    expectWithin(half.y, w, { withinMm: 1e-12 })
    const rest = areaMomentsOf([
      parabola(1, 1),
      lineFrom(at(1, 1), at(0, 1)),
      lineFrom(at(0, 1), at(0, 0)),
    ]).centroid
    expectWithin(rest.x, complementH, { withinMm: 1e-12 })
    expectWithin(rest.y, complementW, { withinMm: 1e-12 })
  })

  it('ellipse', () => {
    const [a, b] = figures.ellipse.axesMm.map((axis) => axis / 2) as [number, number]
    const halves = [0, Math.PI].map((startRad) =>
      ellipseFrom({ centre: at(0, 0), semiX: a, semiY: b, startRad, sweepRad: Math.PI }),
    )
    expectWithin(signedAreaOf(halves), figures.ellipse.areaMm2, { withinMm2: 0.5 })
    // exact perimeter, computed: 552.587
    expectWithin(lengthOf(halves), 552.587, { withinMm: 5e-4 })
  })

  it.each(figures.regular)('regular polygon of $n sides', ({ n, perSide, perCircumradius, perInradius }) => {
    const corners = Array.from({ length: n }, (_, i) =>
      at(Math.cos((2 * Math.PI * i) / n), Math.sin((2 * Math.PI * i) / n)),
    )
    const area = signedAreaOf(corners.map((corner, i) => lineFrom(corner, corners[(i + 1) % n] ?? corner)))
    const side = 2 * Math.sin(Math.PI / n)
    const inradius = Math.cos(Math.PI / n)
    expectWithin(area, perCircumradius, { withinMm2: 5.1e-5 })
    expectWithin(area / side ** 2, perSide, { withinMm2: n === 12 ? 5e-4 : 5.1e-5 })
    expectWithin(area / inradius ** 2, perInradius, { withinMm2: 5.1e-5 })
  })
})

// List of centroids, an encyclopaedia's table (published): quarter ellipse 4a/3π, 4b/3π; arcs 2r/π.
describe('list of centroids', () => {
  it('quarter ellipse', () => {
    const quarter = quarterEllipseFrom(at(5, 0), at(0, 2), 'upright')
    const { area, centroid } = areaMomentsOf([
      lineFrom(at(0, 0), at(5, 0)),
      quarter,
      lineFrom(at(0, 2), at(0, 0)),
    ])
    expectWithin(area, (Math.PI * 10) / 4, { withinMm2: 1e-12 })
    expectWithin(centroid.x, 20 / (3 * Math.PI), { withinMm: 1e-12 })
    expectWithin(centroid.y, 8 / (3 * Math.PI), { withinMm: 1e-12 })
  })

  it('quarter and half of a circle as lines', () => {
    const quarter = lineMomentsOf([arcFromCentre(at(0, 0), 3, 0, Math.PI / 2)]).centroid
    expectWithin(quarter.x, 6 / Math.PI, { withinMm: 1e-12 })
    expectWithin(quarter.y, 6 / Math.PI, { withinMm: 1e-12 })
    const half = lineMomentsOf([arcFromCentre(at(0, 0), 3, 0, Math.PI)]).centroid
    expectWithin(half.y, 6 / Math.PI, { withinMm: 1e-12 })
  })

  it('segments of 60° and 90° (computed): area, height, centroid', () => {
    expectWithin(signedAreaOf(segmentOfCircle(1, 0.1339746)), 0.0905861, { withinMm2: 1e-7 })
    const chord = Math.SQRT2
    const { area, centroid } = areaMomentsOf(segmentOfCircle(chord, 0.2928932))
    expectWithin(area, 0.2853982, { withinMm2: 1e-7 })
    expectWithin(Math.SQRT1_2 - centroid.y, 0.8258717, { withinMm: 1e-7 })
  })
})

// Bulge = tan(angle/4), negative clockwise: the DXF reference's group 42 (published); values computed.
describe('bulge', () => {
  it.each([
    [30, 0.1316525],
    [45, 0.1989124],
    [60, 0.2679492],
    [90, 0.4142136],
    [120, 0.5773503],
    [180, 1],
    [270, 2.4142136],
  ])('of %d° is %d, and the sagitta bulge × chord / 2', (degrees, bulge) => {
    const arc = arcFromCentre(at(1, 2), 10, 0.3, degrees * RAD_PER_DEG)
    expectWithin(arc.bulge, bulge, { within: 5e-8 })
    expectWithin(arcFromCentre(at(1, 2), 10, 0.3, -degrees * RAD_PER_DEG).bulge, -bulge, { within: 5e-8 })
    const chord = Math.hypot(arc.end.x - arc.start.x, arc.end.y - arc.start.y)
    const sagitta = 10 * (1 - Math.cos((degrees * RAD_PER_DEG) / 2))
    expectWithin((arc.bulge * chord) / 2, sagitta, { withinMm: 1e-12 })
  })
})
