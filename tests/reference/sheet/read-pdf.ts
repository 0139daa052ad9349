import { getDocument, OPS } from 'pdfjs-dist/legacy/build/pdf.mjs'

/** A stroked or filled path as an independent reader of PDF finds it: mm from the page's lower left corner. */
export interface ReadPath {
  readonly lineWidthMm: number
  readonly isFilled: boolean
  /** Points along the path, curves sampled; a new stretch for every move. */
  readonly stretches: readonly (readonly ReadPoint[])[]
}

export interface ReadPoint {
  readonly x: number
  readonly y: number
}

export interface ReadText {
  readonly text: string
  readonly at: ReadPoint
  readonly widthMm: number
}

export interface ReadPage {
  readonly widthMm: number
  readonly heightMm: number
  readonly paths: readonly ReadPath[]
  readonly texts: readonly ReadText[]
}

const MM_PER_POINT = 25.4 / 72
const SAMPLES = 64
/** What the reader hands over for a path: its own operations and their operands in one list. */
const MOVE = 0
const LINE = 1
const CURVE = 2
const CLOSE = 4

export async function readPdf(bytes: Uint8Array): Promise<readonly ReadPage[]> {
  const document = await getDocument({ data: bytes.slice(), verbosity: 0 }).promise
  const pages: ReadPage[] = []
  for (let number = 1; number <= document.numPages; number += 1) {
    const page = await document.getPage(number)
    const [left = 0, bottom = 0, right = 0, top = 0] = page.view
    const operators = await page.getOperatorList()
    const content = await page.getTextContent()
    pages.push({
      widthMm: (right - left) * MM_PER_POINT,
      heightMm: (top - bottom) * MM_PER_POINT,
      paths: pathsOf(operators.fnArray, operators.argsArray),
      texts: content.items.flatMap((item) => {
        if (!('str' in item) || item.str.trim() === '') return []
        const [, , , , x = 0, y = 0] = item.transform as number[]
        return [
          {
            text: item.str,
            at: { x: x * MM_PER_POINT, y: y * MM_PER_POINT },
            widthMm: item.width * MM_PER_POINT,
          },
        ]
      }),
    })
  }
  await document.destroy()
  return pages
}

function pathsOf(operators: readonly number[], operands: readonly unknown[]): ReadPath[] {
  const paths: ReadPath[] = []
  let lineWidthMm = 0
  operators.forEach((operator, index) => {
    const given = operands[index] as readonly unknown[]
    if (operator === OPS.setLineWidth) lineWidthMm = Number(given[0]) * MM_PER_POINT
    if (operator !== OPS.constructPath) return
    const [painting, [numbers]] = given as [number, [ArrayLike<number> | null]]
    const isFilled = painting === OPS.fill || painting === OPS.fillStroke || painting === OPS.eoFill
    if (numbers !== null) paths.push({ lineWidthMm, isFilled, stretches: stretchesOf(Array.from(numbers)) })
  })
  return paths
}

function stretchesOf(numbers: readonly number[]): ReadPoint[][] {
  const stretches: ReadPoint[][] = []
  const pointAt = (index: number): ReadPoint => ({
    x: (numbers[index] ?? Number.NaN) * MM_PER_POINT,
    y: (numbers[index + 1] ?? Number.NaN) * MM_PER_POINT,
  })
  let index = 0
  while (index < numbers.length) {
    const kind = numbers[index]
    const stretch = stretches.at(-1) ?? []
    if (kind === MOVE) {
      stretches.push([pointAt(index + 1)])
      index += 3
    } else if (kind === LINE) {
      stretch.push(pointAt(index + 1))
      index += 3
    } else if (kind === CURVE) {
      const from = stretch.at(-1) ?? pointAt(index + 1)
      stretch.push(...alongCubic(from, pointAt(index + 1), pointAt(index + 3), pointAt(index + 5)))
      index += 7
    } else if (kind === CLOSE) {
      const start = stretch[0]
      if (start !== undefined) stretch.push(start)
      index += 1
    } else {
      throw new Error(`an operation ${kind} that this reader does not know`)
    }
  }
  return stretches
}

/** Points along a cubic by Bernstein's polynomials, its start left out. */
export function alongCubic(a: ReadPoint, b: ReadPoint, c: ReadPoint, d: ReadPoint): ReadPoint[] {
  return Array.from({ length: SAMPLES }, (_, index) => {
    const t = (index + 1) / SAMPLES
    const u = 1 - t
    const mix = (p: number, q: number, r: number, s: number) =>
      u ** 3 * p + 3 * u * u * t * q + 3 * u * t * t * r + t ** 3 * s
    return { x: mix(a.x, b.x, c.x, d.x), y: mix(a.y, b.y, c.y, d.y) }
  })
}
