import type { DrawingItem } from './drawing'
import { LINE_WIDTH_MM, linesItem, pathItem, rectanglePath } from './drawing'
import { drawingSpaceOf } from './paper-sizes'
import type { Paper } from './paper-sizes'

/** Printers leave this much of the paper's edge blank, mm: centring marks start inside it. */
const UNPRINTABLE_MM = 5

/** The frame line and the four centring marks of ISO 5457; the marks stand in the border, clear of the drawing. */
export function paperFrame(paper: Pick<Paper, 'widthMm' | 'heightMm'>): DrawingItem[] {
  const { widthMm, heightMm } = paper
  const { left, bottom, right, top } = drawingSpaceOf(paper)
  const marks = [
    [
      { x: UNPRINTABLE_MM, y: heightMm / 2 },
      { x: left, y: heightMm / 2 },
    ],
    [
      { x: right, y: heightMm / 2 },
      { x: widthMm - UNPRINTABLE_MM, y: heightMm / 2 },
    ],
    [
      { x: widthMm / 2, y: UNPRINTABLE_MM },
      { x: widthMm / 2, y: bottom },
    ],
    [
      { x: widthMm / 2, y: top },
      { x: widthMm / 2, y: heightMm - UNPRINTABLE_MM },
    ],
  ] as const
  return [
    pathItem('frame', rectanglePath(left, bottom, right - left, top - bottom), LINE_WIDTH_MM.frame, {
      closed: true,
    }),
    linesItem('frame', marks, LINE_WIDTH_MM.frame),
  ]
}
