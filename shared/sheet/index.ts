/** Drawings in millimetres on paper, y up, and their three renderings: PDF, SVG and DXF. */
export type {
  Anchor,
  Dash,
  Drawing,
  DrawingItem,
  Layer,
  LinesItem,
  ModelLayer,
  ModelPlacement,
  PathItem,
  TextItem,
  Tone,
  Weight,
} from './drawing'
export {
  LETTER_MM,
  LINE_WIDTH_MM,
  linesItem,
  MODEL_LAYERS,
  pathItem,
  polygonPath,
  rectanglePath,
  textItem,
} from './drawing'
export { CAPITAL_PER_EM, textCorners, textWidthMm, wrappedLines } from './lettering'
export { drawingSpaceOf, PAPERS } from './paper-sizes'
export type { Paper, Scale, Space } from './paper-sizes'
export { spreadApart } from './spread'
export { svgOf } from './svg'
export { dxfOf } from './dxf'
export { DXF_LAYERS } from './dxf-frame'
export { pdfOf } from './pdf'
export type { PdfOptions } from './pdf'
export { sheetOf, sheetsOf } from './sheet'
export type { MillText, PrintedDate, SheetInput, SheetState } from './sheet-input'
export { knifeDrawingOf } from './knife-drawing'
export type { KnifeDrawingInput } from './knife-drawing'
export { cutListPagesOf } from './cut-list'
export type { CutListInput, ListedCut, ListedLength, ListedRail } from './cut-list-input'
