import { assertNever, Failure } from '@shared/failure'
import { arcGeometryOf, arcsFromCurve, boundsOf } from '@shared/geometry'
import type { ArcSegment, LineSegment, Path, Point } from '@shared/geometry'
import { LETTER_MM, MODEL_LAYERS } from './drawing'
import type {
  Drawing,
  DrawingItem,
  LinesItem,
  ModelLayer,
  ModelPlacement,
  PathItem,
  TextItem,
} from './drawing'
import { blocksSection, DXF_LAYERS, headerSection, objectsSection, tablesSection } from './dxf-frame'
import type { Extents } from './dxf-frame'
import { dxfText, handleSource, recordsText } from './dxf-records'
import type { Pair } from './dxf-records'
import { LINE_PITCH, plainLine } from './lettering'
import { pathOnPaper } from './placement'

/** How far arcs may leave an ellipse or a cubic of the section, mm. */
const CURVE_ACCURACY_MM = 0.005
/** Blank between the lowest dimension and the notes beneath it, mm. */
const NOTES_GAP_MM = 8

/**
 * The drawing's section as ASCII DXF of the 2000 form: millimetres, at true size whatever the sheet's scale, the origin
 * where the line of the sight edge meets the wall plane; outlines with true arcs, no paper.
 */
export function dxfOf(drawing: Drawing): string {
  const { model } = drawing
  if (model === undefined) {
    throw new Failure('input-invalid', {
      says: 'this page holds no drawing to scale, so there is no DXF of it',
    })
  }
  const handle = handleSource()
  const spaces = { model: handle(), paper: handle() }
  const items = drawing.items.filter(isOfModel).map((item) => trueSized(item, model))
  const extents = extentsOf(items)
  const drawn = [...items, ...noteItems(model, extents)]
  const write: Writing = { handle, owner: spaces.model }
  const body: Pair[] = [
    ...tablesSection(handle, spaces),
    ...blocksSection(handle, spaces),
    [0, 'SECTION'],
    [2, 'ENTITIES'],
    ...drawn.flatMap((item) => entitiesOf(item, write)),
    [0, 'ENDSEC'],
    ...objectsSection(handle),
  ]
  return recordsText([...headerSection(extents, handle()), ...body])
}

type ModelItem = DrawingItem & { readonly layer: ModelLayer }

interface Writing {
  readonly handle: () => string
  readonly owner: string
}

function isOfModel(item: DrawingItem): item is ModelItem {
  return MODEL_LAYERS.some((layer) => layer === item.layer)
}

/** An item in the section's own millimetres. */
function trueSized(item: ModelItem, { origin, scale }: ModelPlacement): ModelItem {
  const back = (point: Point): Point => ({ x: (point.x - origin.x) / scale, y: (point.y - origin.y) / scale })
  switch (item.kind) {
    case 'path': {
      const moved = { x: -origin.x / scale, y: -origin.y / scale }
      return { ...item, path: pathOnPaper(item.path, moved, 1 / scale) }
    }
    case 'lines':
      return { ...item, lines: item.lines.map(([from, to]) => [back(from), back(to)] as const) }
    case 'text':
      return { ...item, at: back(item.at), heightMm: item.heightMm / scale }
    default:
      return assertNever(item)
  }
}

function extentsOf(items: readonly ModelItem[]): Extents {
  const points = items.flatMap((item): Point[] => {
    switch (item.kind) {
      case 'path': {
        const { min, max } = boundsOf(item.path)
        return [min, max]
      }
      case 'lines':
        return item.lines.flat()
      case 'text':
        return [item.at]
      default:
        return assertNever(item)
    }
  })
  if (points.length === 0)
    throw new Failure('input-invalid', { says: 'this page holds no section to write as DXF' })
  const xs = points.map(({ x }) => x)
  const ys = points.map(({ y }) => y)
  return {
    min: { x: Math.min(...xs), y: Math.min(...ys) },
    max: { x: Math.max(...xs), y: Math.max(...ys) },
  }
}

/** What the geometry must carry with it, in lines beneath it. */
function noteItems(model: ModelPlacement, { min }: Extents): ModelItem[] {
  return model.notes.map((text, index) => ({
    kind: 'text',
    layer: 'labels',
    at: { x: 0, y: min.y - NOTES_GAP_MM - index * LETTER_MM.dimension * LINE_PITCH },
    text,
    heightMm: LETTER_MM.dimension,
    anchor: 'start',
    weight: 'regular',
    rotationRad: 0,
    tone: 'ink',
  }))
}

function entitiesOf(item: ModelItem, write: Writing): Pair[] {
  switch (item.kind) {
    case 'path':
      return pathEntity(item, write)
    case 'lines':
      return linesEntities(item, write)
    case 'text':
      return textEntity(item, write)
    default:
      return assertNever(item)
  }
}

function entity(kind: string, layer: ModelLayer, { handle, owner }: Writing): Pair[] {
  return [
    [0, kind],
    [5, handle()],
    [330, owner],
    [100, 'AcDbEntity'],
    [8, DXF_LAYERS[layer].name],
  ]
}

const linesEntities = (item: LinesItem & { layer: ModelLayer }, write: Writing): Pair[] =>
  item.lines.flatMap(([start, end]) => lineEntity({ kind: 'line', start, end }, item.layer, write))

function lineEntity({ start, end }: LineSegment, layer: ModelLayer, write: Writing): Pair[] {
  return [
    ...entity('LINE', layer, write),
    [100, 'AcDbLine'],
    [10, start.x],
    [20, start.y],
    [30, 0],
    [11, end.x],
    [21, end.y],
    [31, 0],
  ]
}

function pathEntity(item: PathItem & { layer: ModelLayer }, write: Writing): Pair[] {
  const segments = arcsAndLinesOf(item.path)
  const [first, ...rest] = segments
  if (first === undefined) return []
  if (item.fill === 'ink' && item.closed) return solidEntity(segments, item.layer, write)
  if (rest.length > 0 || item.closed) return outlineEntity(segments, item, write)
  return first.kind === 'line' ? lineEntity(first, item.layer, write) : arcEntity(first, item.layer, write)
}

function arcsAndLinesOf(path: Path): (LineSegment | ArcSegment)[] {
  return path.flatMap((segment) => {
    switch (segment.kind) {
      case 'line':
      case 'arc':
        return [segment]
      case 'ellipse':
      case 'cubic':
        return arcsFromCurve(segment, CURVE_ACCURACY_MM)
      default:
        return assertNever(segment)
    }
  })
}

/** An ARC runs counter-clockwise from its start angle: a clockwise one is written from its end. */
function arcEntity(arc: ArcSegment, layer: ModelLayer, write: Writing): Pair[] {
  const { centre, radius, startRad, sweepRad } = arcGeometryOf(arc)
  const from = sweepRad > 0 ? startRad : startRad + sweepRad
  return [
    ...entity('ARC', layer, write),
    [100, 'AcDbCircle'],
    [10, centre.x],
    [20, centre.y],
    [30, 0],
    [40, radius],
    [100, 'AcDbArc'],
    [50, degreesOf(from)],
    [51, degreesOf(from + Math.abs(sweepRad))],
  ]
}

/** An angle as degrees from 0 to less than 360. */
const degreesOf = (rad: number): number => ((((rad * 180) / Math.PI) % 360) + 360) % 360

function outlineEntity(
  segments: readonly (LineSegment | ArcSegment)[],
  { layer, closed }: PathItem & { layer: ModelLayer },
  write: Writing,
): Pair[] {
  const last = segments.at(-1)
  const vertices = segments.map((segment) => ({
    at: segment.start,
    bulge: segment.kind === 'arc' ? segment.bulge : 0,
  }))
  if (!closed && last !== undefined) vertices.push({ at: last.end, bulge: 0 })
  return [
    ...entity('LWPOLYLINE', layer, write),
    [100, 'AcDbPolyline'],
    [90, vertices.length],
    [70, closed ? 1 : 0],
    [43, 0],
    ...vertices.flatMap(({ at, bulge }): Pair[] => [[10, at.x], [20, at.y], ...bulgePair(bulge)]),
  ]
}

const bulgePair = (bulge: number): Pair[] => (bulge === 0 ? [] : [[42, bulge]])

/** A filled arrowhead. SOLID takes its corners in a bow-tie order; a triangle repeats the third. */
function solidEntity(
  segments: readonly (LineSegment | ArcSegment)[],
  layer: ModelLayer,
  write: Writing,
): Pair[] {
  const corners = segments.slice(0, 3).map(({ start }) => start)
  const repeated = corners.at(-1)
  if (repeated === undefined) return []
  return [
    ...entity('SOLID', layer, write),
    [100, 'AcDbTrace'],
    ...[...corners, repeated].flatMap(({ x, y }, index): Pair[] => [
      [10 + index, x],
      [20 + index, y],
      [30 + index, 0],
    ]),
  ]
}

const HORIZONTAL: Record<TextItem['anchor'], number> = { start: 0, middle: 1, end: 2 }

function textEntity(item: TextItem & { layer: ModelLayer }, write: Writing): Pair[] {
  const justified = HORIZONTAL[item.anchor]
  return [
    ...entity('TEXT', item.layer, write),
    [100, 'AcDbText'],
    [10, item.at.x],
    [20, item.at.y],
    [30, 0],
    [40, item.heightMm],
    [1, dxfText(plainLine(item.text))],
    [50, degreesOf(item.rotationRad)],
    [7, 'Standard'],
    [72, justified],
    ...(justified === 0
      ? []
      : ([
          [11, item.at.x],
          [21, item.at.y],
          [31, 0],
        ] as const)),
    [100, 'AcDbText'],
  ]
}
