import type { Pair } from './dxf-records'
import { MODEL_LAYERS } from './drawing'
import type { ModelLayer } from './drawing'

/**
 * What a drawing file of the 2000 form (AC1015) must hold besides its entities: header, tables, the two layout blocks and
 * the root dictionary, each with its handle and owner, as the format's published reference asks.
 */

/** The layers as they are named in the file, with the line width that belongs to each, hundredths of a millimetre. */
export const DXF_LAYERS: Record<ModelLayer, { readonly name: string; readonly width: number }> = {
  wood: { name: 'WOOD', width: 50 },
  'finished-face': { name: 'FINISHED_FACE', width: 25 },
  rebate: { name: 'REBATE', width: 50 },
  knife: { name: 'KNIFE_CORRECTED', width: 50 },
  dimensions: { name: 'DIMENSIONS', width: 25 },
  labels: { name: 'TEXT', width: 25 },
}

/** Index 7 draws black on white ground and white on black. */
const GROUND_CONTRAST = 7
const MILLIMETRES = 4

export interface Extents {
  readonly min: { readonly x: number; readonly y: number }
  readonly max: { readonly x: number; readonly y: number }
}

export function headerSection({ min, max }: Extents, nextHandle: string): Pair[] {
  return [
    [0, 'SECTION'],
    [2, 'HEADER'],
    [9, '$ACADVER'],
    [1, 'AC1015'],
    [9, '$DWGCODEPAGE'],
    [3, 'ANSI_1252'],
    [9, '$INSBASE'],
    [10, 0],
    [20, 0],
    [30, 0],
    [9, '$EXTMIN'],
    [10, min.x],
    [20, min.y],
    [30, 0],
    [9, '$EXTMAX'],
    [10, max.x],
    [20, max.y],
    [30, 0],
    [9, '$MEASUREMENT'],
    [70, 1],
    [9, '$INSUNITS'],
    [70, MILLIMETRES],
    [9, '$HANDSEED'],
    [5, nextHandle],
    [0, 'ENDSEC'],
  ]
}

/** Handles of the two block records, which own the blocks and the entities. */
export interface Spaces {
  readonly model: string
  readonly paper: string
}

export function tablesSection(handle: () => string, spaces: Spaces): Pair[] {
  return [
    [0, 'SECTION'],
    [2, 'TABLES'],
    ...table('VPORT', handle, []),
    ...table('LTYPE', handle, ['ByBlock', 'ByLayer', 'Continuous'].map(lineType)),
    ...table('LAYER', handle, ['0', ...MODEL_LAYERS.map((layer) => DXF_LAYERS[layer].name)].map(layerRecord)),
    ...table('STYLE', handle, [textStyle]),
    ...table('VIEW', handle, []),
    ...table('UCS', handle, []),
    ...table('APPID', handle, [
      {
        kind: 'APPID',
        fields: [
          [100, 'AcDbRegAppTableRecord'],
          [2, 'ACAD'],
          [70, 0],
        ],
      },
    ]),
    ...table('DIMSTYLE', handle, []),
    ...table('BLOCK_RECORD', handle, [
      blockRecord('*Model_Space', spaces.model),
      blockRecord('*Paper_Space', spaces.paper),
    ]),
    [0, 'ENDSEC'],
  ]
}

interface TableRecord {
  readonly kind: string
  readonly fields: readonly Pair[]
  readonly handle?: string
}

function table(kind: string, handle: () => string, records: readonly TableRecord[]): Pair[] {
  const own = handle()
  const isDimensionStyles = kind === 'DIMSTYLE'
  return [
    [0, 'TABLE'],
    [2, kind],
    [5, own],
    [330, '0'],
    [100, 'AcDbSymbolTable'],
    [70, records.length],
    ...(isDimensionStyles ? ([[100, 'AcDbDimStyleTable']] as const) : []),
    ...records.flatMap((record): Pair[] => [
      [0, record.kind],
      [5, record.handle ?? handle()],
      [330, own],
      [100, 'AcDbSymbolTableRecord'],
      ...record.fields,
    ]),
    [0, 'ENDTAB'],
  ]
}

const lineType = (name: string): TableRecord => ({
  kind: 'LTYPE',
  fields: [
    [100, 'AcDbLinetypeTableRecord'],
    [2, name],
    [70, 0],
    [3, name === 'Continuous' ? 'Solid line' : ''],
    [72, 65],
    [73, 0],
    [40, 0],
  ],
})

function layerRecord(name: string): TableRecord {
  const layer = MODEL_LAYERS.map((key) => DXF_LAYERS[key]).find((entry) => entry.name === name)
  return {
    kind: 'LAYER',
    fields: [
      [100, 'AcDbLayerTableRecord'],
      [2, name],
      [70, 0],
      [62, GROUND_CONTRAST],
      [6, 'Continuous'],
      [370, layer?.width ?? 25],
      [390, '0'],
    ],
  }
}

const textStyle: TableRecord = {
  kind: 'STYLE',
  fields: [
    [100, 'AcDbTextStyleTableRecord'],
    [2, 'Standard'],
    [70, 0],
    [40, 0],
    [41, 1],
    [50, 0],
    [71, 0],
    [42, 2.5],
    [3, 'txt'],
    [4, ''],
  ],
}

const blockRecord = (name: string, handle: string): TableRecord => ({
  kind: 'BLOCK_RECORD',
  handle,
  fields: [
    [100, 'AcDbBlockTableRecord'],
    [2, name],
    [340, '0'],
  ],
})

export function blocksSection(handle: () => string, spaces: Spaces): Pair[] {
  return [
    [0, 'SECTION'],
    [2, 'BLOCKS'],
    ...block('*Model_Space', spaces.model, handle, []),
    ...block('*Paper_Space', spaces.paper, handle, [[67, 1]]),
    [0, 'ENDSEC'],
  ]
}

function block(name: string, owner: string, handle: () => string, space: readonly Pair[]): Pair[] {
  return [
    [0, 'BLOCK'],
    [5, handle()],
    [330, owner],
    [100, 'AcDbEntity'],
    ...space,
    [8, '0'],
    [100, 'AcDbBlockBegin'],
    [2, name],
    [70, 0],
    [10, 0],
    [20, 0],
    [30, 0],
    [3, name],
    [1, ''],
    [0, 'ENDBLK'],
    [5, handle()],
    [330, owner],
    [100, 'AcDbEntity'],
    ...space,
    [8, '0'],
    [100, 'AcDbBlockEnd'],
  ]
}

export function objectsSection(handle: () => string): Pair[] {
  const root = handle()
  const groups = handle()
  return [
    [0, 'SECTION'],
    [2, 'OBJECTS'],
    [0, 'DICTIONARY'],
    [5, root],
    [330, '0'],
    [100, 'AcDbDictionary'],
    [281, 1],
    [3, 'ACAD_GROUP'],
    [350, groups],
    [0, 'DICTIONARY'],
    [5, groups],
    [330, root],
    [100, 'AcDbDictionary'],
    [281, 1],
    [0, 'ENDSEC'],
    [0, 'EOF'],
  ]
}
