import type { Path, Point } from '@shared/geometry'

/**
 * The one drawing model: what is on a sheet, in millimetres on paper, x to the right and y up from the lower left
 * corner. The renderers add nothing to it and leave nothing out, so that the three files agree.
 */

/** What an item belongs to. Those of MODEL_LAYERS go into the DXF at true size; the rest is the paper's. */
export type Layer =
  | 'wood'
  | 'finished-face'
  | 'rebate'
  | 'knife'
  | 'dimensions'
  | 'labels'
  | 'hatching'
  | 'frame'
  | 'title-block'
  | 'table'
  | 'notes'

export const MODEL_LAYERS = ['wood', 'finished-face', 'rebate', 'knife', 'dimensions', 'labels'] as const
export type ModelLayer = (typeof MODEL_LAYERS)[number]

/** ink is black; grey and pale are for what must not compete with it (hatching, waste, tints). */
export type Tone = 'ink' | 'grey' | 'pale' | 'white'

export type Dash = 'solid' | 'dashed'

/** Dash and gap of a dashed line, mm: 12 and 3 line widths (ISO 128-2:2020). */
export const dashPattern = (lineWidthMm: number): readonly [number, number] => [
  12 * lineWidthMm,
  3 * lineWidthMm,
]

/** Line widths, mm, from the series of ISO 128-2:2020 (wide to narrow at least 2:1); the frame line by ISO 5457. */
export const LINE_WIDTH_MM = { wide: 0.5, narrow: 0.25, fine: 0.18, frame: 0.7 } as const

/** Character heights, mm, from the series of ISO 3098 (height of a capital): notes, dimensions, headings, titles. */
export const LETTER_MM = { small: 1.8, dimension: 2.5, heading: 3.5, title: 5, shout: 10 } as const

/** Segments that follow one another, drawn with one line; closed ones may be filled. */
export interface PathItem {
  readonly kind: 'path'
  readonly layer: Layer
  readonly path: Path
  readonly closed: boolean
  /** 0 draws no line. */
  readonly lineWidthMm: number
  readonly dash: Dash
  readonly tone: Tone
  readonly fill: Tone | 'none'
}

/** Separate straight lines of one style: hatching, rules, extension lines. */
export interface LinesItem {
  readonly kind: 'lines'
  readonly layer: Layer
  readonly lines: readonly (readonly [Point, Point])[]
  readonly lineWidthMm: number
  readonly dash: Dash
  readonly tone: Tone
}

export type Anchor = 'start' | 'middle' | 'end'
export type Weight = 'regular' | 'semibold'

/** One line of text; `at` is on the baseline, at its start, middle or end. heightMm is a capital's height. */
export interface TextItem {
  readonly kind: 'text'
  readonly layer: Layer
  readonly at: Point
  readonly text: string
  readonly heightMm: number
  readonly anchor: Anchor
  readonly weight: Weight
  /** Counter-clockwise, about `at`. */
  readonly rotationRad: number
  readonly tone: Tone
}

export type DrawingItem = PathItem | LinesItem | TextItem

/** Where the section's own coordinates lie on the paper: paper = origin + scale × model. */
export interface ModelPlacement {
  readonly origin: Point
  readonly scale: number
  /** Lines that must go with the geometry wherever it is opened: what it is, its issue and hash, its cautions. */
  readonly notes: readonly string[]
}

export interface Drawing {
  readonly title: string
  readonly widthMm: number
  readonly heightMm: number
  readonly items: readonly DrawingItem[]
  /** Absent where nothing is drawn to scale (a cut list, the second page of a table). */
  readonly model?: ModelPlacement
}

type PathOptions = Partial<Pick<PathItem, 'closed' | 'dash' | 'tone' | 'fill'>>
type TextOptions = Partial<Pick<TextItem, 'anchor' | 'weight' | 'rotationRad' | 'tone'>>

/** A path on a layer, solid and in ink unless said otherwise. */
export function pathItem(layer: Layer, path: Path, lineWidthMm: number, options: PathOptions = {}): PathItem {
  return {
    kind: 'path',
    layer,
    path,
    closed: false,
    lineWidthMm,
    dash: 'solid',
    tone: 'ink',
    fill: 'none',
    ...options,
  }
}

/** Separate lines on a layer, solid and in ink unless said otherwise. */
export function linesItem(
  layer: Layer,
  lines: LinesItem['lines'],
  lineWidthMm: number,
  options: Partial<Pick<LinesItem, 'dash' | 'tone'>> = {},
): LinesItem {
  return { kind: 'lines', layer, lines, lineWidthMm, dash: 'solid', tone: 'ink', ...options }
}

/** A line of text on a layer, upright, regular and from its start unless said otherwise. */
export function textItem(
  layer: Layer,
  at: Point,
  text: string,
  heightMm: number,
  options: TextOptions = {},
): TextItem {
  return {
    kind: 'text',
    layer,
    at,
    text,
    heightMm,
    anchor: 'start',
    weight: 'regular',
    rotationRad: 0,
    tone: 'ink',
    ...options,
  }
}

/** A closed path round corners given in order. */
export function polygonPath(corners: readonly Point[]): Path {
  return corners.map((start, index) => ({
    kind: 'line',
    start,
    end: corners[(index + 1) % corners.length] ?? start,
  }))
}

/** An upright rectangle from its lower left corner. */
export function rectanglePath(left: number, bottom: number, widthMm: number, heightMm: number): Path {
  return polygonPath([
    { x: left, y: bottom },
    { x: left + widthMm, y: bottom },
    { x: left + widthMm, y: bottom + heightMm },
    { x: left, y: bottom + heightMm },
  ])
}
