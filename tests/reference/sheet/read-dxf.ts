import DxfParser from 'dxf-parser'
import type { IArcEntity, IEntity, ILineEntity, ILwpolylineEntity, ITextEntity } from 'dxf-parser'
import type { ReadPoint } from './read-pdf'

export interface ReadDxf {
  readonly version: unknown
  readonly units: unknown
  readonly extents: { readonly min: ReadPoint; readonly max: ReadPoint }
  readonly layerNames: readonly string[]
  readonly entityKinds: ReadonlySet<string>
  /** Sampled points of each layer's lines, arcs and polylines, mm. */
  readonly layers: ReadonlyMap<string, readonly (readonly ReadPoint[])[]>
  readonly bulges: readonly number[]
  readonly texts: readonly string[]
}

const SAMPLES = 256

/** Reads a DXF with an independent parser; bulges are turned into points by the format's own rule, bulge = tan(θ/4). */
export function readDxf(text: string): ReadDxf {
  const parsed = new DxfParser().parseSync(text)
  if (parsed === null) throw new Error('the parser gave nothing back')
  const layers = new Map<string, (readonly ReadPoint[])[]>()
  const bulges: number[] = []
  const texts: string[] = []
  for (const entity of parsed.entities) {
    if (isKind<ITextEntity>(entity, 'TEXT')) texts.push(entity.text)
    if (isKind<ILwpolylineEntity>(entity, 'LWPOLYLINE')) {
      bulges.push(...entity.vertices.map(({ bulge }) => bulge ?? 0).filter((bulge) => bulge !== 0))
    }
    const points = pointsOf(entity)
    if (points.length > 0) layers.set(entity.layer, [...(layers.get(entity.layer) ?? []), points])
  }
  return {
    version: parsed.header.$ACADVER,
    units: parsed.header.$INSUNITS,
    extents: { min: parsed.header.$EXTMIN as ReadPoint, max: parsed.header.$EXTMAX as ReadPoint },
    layerNames: Object.keys(parsed.tables.layer.layers),
    entityKinds: new Set(parsed.entities.map(({ type }) => type)),
    layers,
    bulges,
    texts,
  }
}

const isKind = <Kind extends IEntity>(entity: IEntity, type: string): entity is Kind => entity.type === type

function pointsOf(entity: IEntity): ReadPoint[] {
  if (isKind<ILineEntity>(entity, 'LINE')) return entity.vertices.map(({ x, y }) => ({ x, y }))
  if (isKind<IArcEntity>(entity, 'ARC')) return alongCircle(entity)
  if (isKind<ILwpolylineEntity>(entity, 'LWPOLYLINE')) return alongPolyline(entity)
  return []
}

/** The parser gives angles in radians; an ARC runs counter-clockwise. */
function alongCircle({ center, radius, startAngle, endAngle }: IArcEntity): ReadPoint[] {
  const sweep = (endAngle - startAngle + 4 * Math.PI) % (2 * Math.PI)
  return Array.from({ length: SAMPLES + 1 }, (_, index) => {
    const angle = startAngle + (sweep * index) / SAMPLES
    return { x: center.x + radius * Math.cos(angle), y: center.y + radius * Math.sin(angle) }
  })
}

function alongPolyline({ vertices, shape }: ILwpolylineEntity): ReadPoint[] {
  const ends = shape ? [...vertices, ...vertices.slice(0, 1)] : vertices
  return ends.flatMap((vertex, index) => {
    const before = ends[index - 1]
    if (before === undefined) return [{ x: vertex.x, y: vertex.y }]
    return alongBulge(before, vertex, before.bulge ?? 0)
  })
}

function alongBulge(from: ReadPoint, to: ReadPoint, bulge: number): ReadPoint[] {
  if (bulge === 0) return [{ x: to.x, y: to.y }]
  const chord = Math.hypot(to.x - from.x, to.y - from.y)
  const sweep = 4 * Math.atan(bulge)
  const radius = chord / (2 * Math.sin(sweep / 2))
  const toCentre = radius * Math.cos(sweep / 2)
  const along = { x: (to.x - from.x) / chord, y: (to.y - from.y) / chord }
  const centre = {
    x: (from.x + to.x) / 2 - along.y * toCentre,
    y: (from.y + to.y) / 2 + along.x * toCentre,
  }
  const start = Math.atan2(from.y - centre.y, from.x - centre.x)
  return Array.from({ length: SAMPLES }, (_, index) => {
    const angle = start + (sweep * (index + 1)) / SAMPLES
    return {
      x: centre.x + Math.abs(radius) * Math.cos(angle),
      y: centre.y + Math.abs(radius) * Math.sin(angle),
    }
  })
}
