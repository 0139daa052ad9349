import { assertNever } from '@shared/failure'
import { arcGeometryOf } from '@shared/geometry'
import type { Path, Point, Segment } from '@shared/geometry'

/** How millimetres (y up) come to lie on the screen (y down): pixels per millimetre and where the origin lies, px. */
export interface Placing {
  readonly scale: number
  readonly originX: number
  readonly originY: number
}

export const placed = ({ x, y }: Point, { scale, originX, originY }: Placing): Point => ({
  x: originX + x * scale,
  y: originY - y * scale,
})
/** A place on the screen as millimetres of the section. */
export const sectionPlaceOf = ({ x, y }: Point, { scale, originX, originY }: Placing): Point => ({
  x: (x - originX) / scale,
  y: (originY - y) / scale,
})

/** The `d` of an SVG path on the screen; arcs and ellipses stay arcs. Empty for an empty path. */
export function pathDataOf(path: Path, placing: Placing, closed = false): string {
  const first = path[0]
  if (first === undefined) return ''
  const commands = path.map((segment) => commandOf(segment, placing))
  return [`M${pointText(first.start, placing)}`, ...commands, ...(closed ? ['Z'] : [])].join('')
}

function commandOf(segment: Segment, placing: Placing): string {
  const end = pointText(segment.end, placing)
  switch (segment.kind) {
    case 'line':
      return `L${end}`
    case 'arc': {
      if (segment.bulge === 0) return `L${end}`
      const { radius, sweepRad } = arcGeometryOf(segment)
      return `A${text(radius * placing.scale)} ${text(radius * placing.scale)} 0 ${flagsOf(sweepRad)} ${end}`
    }
    case 'ellipse': {
      const axes = [segment.semiX, segment.semiY]
        .map((axis) => text(Math.abs(axis) * placing.scale))
        .join(' ')
      return `A${axes} ${text((-segment.rotationRad * 180) / Math.PI)} ${flagsOf(segment.sweepRad)} ${end}`
    }
    case 'cubic':
      return `C${pointText(segment.control1, placing)} ${pointText(segment.control2, placing)} ${end}`
    default:
      return assertNever(segment)
  }
}

/** Large-arc and sweep flags; the screen's y runs down, so that a left turn is SVG's negative direction. */
const flagsOf = (sweepRad: number) => `${Math.abs(sweepRad) > Math.PI ? 1 : 0} ${sweepRad > 0 ? 0 : 1}`

function pointText(point: Point, placing: Placing): string {
  const { x, y } = placed(point, placing)
  return `${text(x)} ${text(y)}`
}
const text = (value: number) => String(Math.round(value * 1000) / 1000)
