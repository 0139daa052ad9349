import type { Point } from '@shared/geometry'
import { LETTER_MM, LINE_WIDTH_MM, linesItem, textItem } from './drawing'
import type { DrawingItem, TextItem } from './drawing'
import { textWidthMm } from './lettering'
import { spreadApart } from './spread'

/** One value to be written at the end of a line that starts at its feature on the drawing. Paper mm. */
export interface Ordinate {
  readonly feature: Point
  readonly text: string
}

/** Distance between the lines of neighbouring values, and blanks between drawing, lines and letters, mm. */
const PITCH_MM = 3.8
const CLEAR_MM = 3
const LEAST_SLANT_MM = 3
const SLANT_PER_SHIFT = 0.35
const STUB_MM = 2
const LETTER_GAP_MM = 0.8
const DIMENSION_TONE = 'ink'

export type Side = 'below' | 'left' | 'right'

/** Items, and how far they reach beyond the line where they begin. */
export interface Ordinates {
  readonly items: readonly DrawingItem[]
  readonly reachMm: number
  /** The least and greatest place along the axis that letters take. */
  readonly from: number
  readonly to: number
}

/**
 * Values of one axis beside the drawing: straight from the feature to the drawing's limit, slanted where the values must
 * be spread apart, straight again to the value, so that no two values meet and no two lines cross.
 * `limit` is the drawing's edge on that side (y below, x left and right).
 */
export function ordinatesBeside(side: Side, ordinates: readonly Ordinate[], limit: number): Ordinates {
  const out = side === 'right' ? 1 : -1
  const axis = (point: Point) => (side === 'below' ? point.x : point.y)
  const at = (along: number, away: number): Point =>
    side === 'below' ? { x: along, y: away } : { x: away, y: along }
  const sorted = [...ordinates].sort((a, b) => axis(a.feature) - axis(b.feature))
  const places = spreadApart(
    sorted.map(({ feature }) => axis(feature)),
    PITCH_MM,
  )
  const shifts = sorted.map(({ feature }, index) => Math.abs((places[index] ?? 0) - axis(feature)))
  const greatest = Math.max(0, ...shifts)
  const slant = greatest < 0.05 ? 0 : Math.max(LEAST_SLANT_MM, greatest * SLANT_PER_SHIFT)
  const knee = limit + out * CLEAR_MM
  const foot = knee + out * slant
  const end = foot + out * STUB_MM
  const lines = sorted.flatMap(({ feature }, index) => {
    const along = axis(feature)
    const place = places[index] ?? along
    return [
      [feature, at(along, knee)],
      [at(along, knee), at(place, foot)],
      [at(place, foot), at(place, end)],
    ] as const
  })
  const texts = sorted.map(({ text }, index) =>
    valueText(side, text, places[index] ?? 0, end + out * LETTER_GAP_MM),
  )
  const widest = Math.max(0, ...sorted.map(({ text }) => textWidthMm(text, LETTER_MM.dimension)))
  return {
    items: [linesItem('dimensions', lines, LINE_WIDTH_MM.fine, { tone: DIMENSION_TONE }), ...texts],
    reachMm: CLEAR_MM + slant + STUB_MM + LETTER_GAP_MM + widest,
    from: Math.min(...places) - LETTER_MM.dimension / 2,
    to: Math.max(...places) + LETTER_MM.dimension / 2,
  }
}

/** The value at its line's end, centred on the line; below the drawing it is read from the right. */
function valueText(side: Side, text: string, place: number, away: number): TextItem {
  const half = LETTER_MM.dimension / 2
  if (side === 'below') {
    return textItem('dimensions', { x: place + half, y: away }, text, LETTER_MM.dimension, {
      anchor: 'end',
      rotationRad: Math.PI / 2,
    })
  }
  return textItem('dimensions', { x: away, y: place - half }, text, LETTER_MM.dimension, {
    anchor: side === 'left' ? 'end' : 'start',
  })
}
