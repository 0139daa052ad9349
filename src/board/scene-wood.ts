import { lineFrom } from '@shared/geometry'
import type { Path, Point } from '@shared/geometry'
import type { DrawnSection } from './drawn-section'
import type { SceneModel } from './scene'
import type { Palette } from './scene-palette'
import { pathDataOf } from './scene-path'
import { toCanvas } from './view-transform'
import type { View } from './view-transform'

/** Between two lines of the hatch, CSS pixels, measured along x. */
const HATCH = 11

/** How solid the wood and the gesso are drawn: less over a photograph, which is to be seen through them. */
const SOLID = { tint: 0.86, gesso: 0.9 }
const SEEN_THROUGH = { tint: 0.3, gesso: 0.3 }

/** The wood: its tint, the hatch (one path behind one mask), the sides that are not the face, and the wood face under gesso. */
export function woodParts(scope: paper.PaperScope, palette: Palette) {
  const gesso = new scope.Path({ fillColor: palette.gesso })
  const tint = new scope.Path({ fillColor: palette.boleTint })
  const mask = new scope.Path({ clipMask: true })
  const hatch = new scope.Path({ strokeColor: palette.bole, strokeWidth: 0.7, opacity: 0.32 })
  const hatched = new scope.Group([mask, hatch])
  hatched.clipped = true
  const sides = new scope.Path({ strokeColor: palette.ink, strokeWidth: 1.6, strokeJoin: 'miter' })
  const woodFace = new scope.Path({ strokeColor: palette.ink2, strokeWidth: 1 })

  function paint({ drawn, photograph }: SceneModel, view: View): void {
    const solid = photograph === undefined ? SOLID : SEEN_THROUGH
    tint.opacity = solid.tint
    gesso.opacity = solid.gesso
    const face = drawn.members.flatMap(({ path }) => path)
    const back = sidesOf(drawn)
    const wood = drawn.woodFace ?? face
    const outline = pathDataOf([...wood, ...back], view)
    const isGessoed = drawn.woodFace !== undefined
    // Before the first member there is no wood, only where it will begin.
    tint.visible = drawn.members.length > 0
    hatched.visible = tint.visible
    gesso.visible = isGessoed
    if (isGessoed) gesso.pathData = `${pathDataOf([...face, ...back], view)}Z`
    tint.pathData = `${outline}Z`
    mask.pathData = `${outline}Z`
    sides.pathData = pathDataOf(back, view)
    woodFace.visible = isGessoed
    if (isGessoed) woodFace.pathData = pathDataOf(wood, view)
    paintHatch(drawn, view)
  }

  /** One line to and fro at 45°; its turns lie outside the mask. Held to the wall plane, so that it does not swim while one draws. */
  function paintHatch({ breaks }: DrawnSection, view: View): void {
    const { min, max } = extentOn(breaks, view)
    const height = max.y - min.y
    const first = Math.floor((min.x - height - view.originX) / HATCH)
    const last = Math.ceil((max.x - view.originX) / HATCH)
    const parts: string[] = []
    for (let i = first; i <= last; i += 1) {
      const x = view.originX + i * HATCH
      const [foot, head] = [`${x} ${max.y}`, `${x + height} ${min.y}`]
      parts.push((i - first) % 2 === 0 ? `${foot}L${head}` : `${head}L${foot}`)
    }
    hatch.pathData = `M${parts.join('L')}`
  }

  return {
    paint,
    contains: ({ x, y }: Point): boolean => tint.visible && tint.contains(new scope.Point(x, y)),
  }
}

/** A strip round everything that can be wood, CSS pixels: members' curves reach beyond their breaks by no more than their width. */
function extentOn(breaks: readonly Point[], view: View): { readonly min: Point; readonly max: Point } {
  const greatest = breaks.reduce((most, { x, y }) => ({ x: Math.max(most.x, x), y: Math.max(most.y, y) }), {
    x: 1,
    y: 1,
  })
  const widest = breaks.reduce((most, { x }, index) => Math.max(most, x - (breaks[index - 1]?.x ?? 0)), 0)
  const topLeft = toCanvas(view, { x: 0, y: greatest.y + widest })
  const bottomRight = toCanvas(view, { x: greatest.x, y: 0 })
  return { min: { x: topLeft.x - 4, y: topLeft.y - 4 }, max: { x: bottomRight.x + 4, y: bottomRight.y + 4 } }
}

/** Back edge, back, rebate and sight edge, from the end of the face round to its start. */
function sidesOf({ draft, breaks }: DrawnSection): Path {
  const { rebate, backSplay } = draft
  const top = breaks.at(-1) as Point
  const first = breaks[0] as Point
  const isSplayed = backSplay.x > 0 && backSplay.height > 0
  const back = isSplayed
    ? [
        { x: top.x, y: backSplay.height },
        { x: top.x - backSplay.x, y: 0 },
      ]
    : [{ x: top.x, y: 0 }]
  const isRebated = rebate.width > 0 && rebate.depth > 0
  const rebated = isRebated
    ? [
        { x: rebate.width, y: 0 },
        { x: rebate.width, y: rebate.depth },
        { x: 0, y: rebate.depth },
      ]
    : [{ x: 0, y: 0 }]
  const corners = top === first ? [...rebated.slice(-1), first] : [top, ...back, ...rebated, first]
  return corners.slice(1).map((end, index) => lineFrom(corners[index] as Point, end))
}
