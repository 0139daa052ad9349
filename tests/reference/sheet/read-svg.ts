import { JSDOM } from 'jsdom'
import { alongCubic } from './read-pdf'
import type { ReadPoint } from './read-pdf'

export interface ReadSvg {
  readonly widthMm: number
  readonly heightMm: number
  /** Sampled points of each layer's paths, mm from the lower left corner. */
  readonly layers: ReadonlyMap<string, readonly (readonly ReadPoint[])[]>
  readonly texts: readonly string[]
  readonly elementNames: readonly string[]
}

const SAMPLES = 256

/** Reads an SVG with an XML parser and samples its path data by the rules of the SVG 1.1 recommendation (appendix F.6 for arcs). */
export function readSvg(text: string): ReadSvg {
  const document = new JSDOM(text, { contentType: 'image/svg+xml' }).window.document
  const root = document.documentElement
  const [, , viewWidth = 0, viewHeight = 0] = (root.getAttribute('viewBox') ?? '').split(' ').map(Number)
  const layers = new Map<string, (readonly ReadPoint[])[]>()
  for (const element of root.querySelectorAll('path')) {
    const layer = element.getAttribute('data-layer') ?? ''
    const stretches = stretchesOf(element.getAttribute('d') ?? '', viewHeight)
    layers.set(layer, [...(layers.get(layer) ?? []), ...stretches])
  }
  return {
    widthMm: lengthOf(root.getAttribute('width'), viewWidth),
    heightMm: lengthOf(root.getAttribute('height'), viewHeight),
    layers,
    texts: [...root.querySelectorAll('text')].map((element) => element.textContent ?? ''),
    elementNames: [...root.querySelectorAll('*')].map((element) => element.nodeName),
  }
}

/** The page's size must be in mm and equal to its view box, or nothing is at true size. */
function lengthOf(attribute: string | null, view: number): number {
  const size = /^([\d.]+)mm$/.exec(attribute ?? '')?.[1]
  if (Number(size) !== view) throw new Error(`size ${attribute} against a view box of ${view}`)
  return view
}

function stretchesOf(data: string, height: number): ReadPoint[][] {
  const tokens = data.split(/[\s,]+/)
  const stretches: ReadPoint[][] = []
  let index = 0
  const next = (): number => {
    const value = Number(tokens[index])
    if (!Number.isFinite(value)) throw new Error(`not a number: ${tokens[index]}`)
    index += 1
    return value
  }
  const nextPoint = (): ReadPoint => ({ x: next(), y: height - next() })
  while (index < tokens.length) {
    const command = tokens[index]
    index += 1
    const stretch = stretches.at(-1) ?? []
    const from = stretch.at(-1) ?? { x: 0, y: 0 }
    if (command === 'M') stretches.push([nextPoint()])
    else if (command === 'L') stretch.push(nextPoint())
    else if (command === 'C') stretch.push(...alongCubic(from, nextPoint(), nextPoint(), nextPoint()))
    else if (command === 'A') {
      const arc = { rx: next(), ry: next(), turnDeg: next(), isLarge: next() === 1, isSweep: next() === 1 }
      stretch.push(...alongArc(from, nextPoint(), arc))
    } else if (command === 'Z') stretch.push(stretch[0] ?? from)
    else throw new Error(`a path command ${command} that this reader does not know`)
  }
  return stretches
}

interface SvgArc {
  readonly rx: number
  readonly ry: number
  readonly turnDeg: number
  readonly isLarge: boolean
  readonly isSweep: boolean
}

/** F.6.5 of SVG 1.1, with y up: the turn and the sweep's sense change sign. */
function alongArc(
  from: ReadPoint,
  to: ReadPoint,
  { rx, ry, turnDeg, isLarge, isSweep }: SvgArc,
): ReadPoint[] {
  const turn = (-turnDeg * Math.PI) / 180
  const sweepsLeft = !isSweep
  const cos = Math.cos(turn)
  const sin = Math.sin(turn)
  const halfX = (cos * (from.x - to.x) + sin * (from.y - to.y)) / 2
  const halfY = (-sin * (from.x - to.x) + cos * (from.y - to.y)) / 2
  const excess = (halfX / rx) ** 2 + (halfY / ry) ** 2
  const away = Math.sqrt(Math.max(0, 1 / excess - 1)) * (isLarge === sweepsLeft ? -1 : 1)
  const centreX = away * ((rx * halfY) / ry)
  const centreY = away * ((-ry * halfX) / rx)
  const start = Math.atan2((halfY - centreY) / ry, (halfX - centreX) / rx)
  const end = Math.atan2((-halfY - centreY) / ry, (-halfX - centreX) / rx)
  let sweep = end - start
  if (sweepsLeft && sweep < 0) sweep += 2 * Math.PI
  if (!sweepsLeft && sweep > 0) sweep -= 2 * Math.PI
  const midX = (from.x + to.x) / 2
  const midY = (from.y + to.y) / 2
  return Array.from({ length: SAMPLES }, (_, index) => {
    const angle = start + (sweep * (index + 1)) / SAMPLES
    const u = centreX + rx * Math.cos(angle)
    const v = centreY + ry * Math.sin(angle)
    return { x: midX + cos * u - sin * v, y: midY + sin * u + cos * v }
  })
}
