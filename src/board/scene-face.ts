import type { Point } from '@shared/geometry'
import { breakKeyOf } from '@shared/section'
import type { DrawnMember } from './drawn-section'
import type { SceneModel } from './scene'
import { label } from './scene-ground'
import { faceLineOf } from './scene-palette'
import type { Palette } from './scene-palette'
import { pathDataOf } from './scene-path'
import { toCanvas } from './view-transform'
import type { View } from './view-transform'

/** CSS pixels. */
const DIAMOND = 4.6
const SELECTED_WIDTH = 5
const SELECTED_DASH = [8, 4]
const MARK_WIDTH = 7

/** A member's line, and what it was last made from. */
interface FaceItem {
  readonly line: paper.Path
  /** Ticks across a line that stands on precedent. */
  readonly marks: paper.Path
  made: string
  from: DrawnMember | undefined
}

/** The finished face, member by member, its breaks, and the words on it. A member whose place and line are the same is left alone. */
export function faceParts(scope: paper.PaperScope, palette: Palette) {
  const lines = new scope.Group()
  const items = new Map<string, FaceItem>()
  const drops = new scope.CompoundPath({
    strokeColor: palette.ink2,
    strokeWidth: 0.7,
    dashArray: [1, 3],
    opacity: 0.55,
  })
  const diamonds = new scope.CompoundPath({
    fillColor: palette.gesso,
    strokeColor: palette.ink,
    strokeWidth: 1.2,
  })
  const chosen = new scope.Path({ fillColor: palette.bole, strokeColor: palette.bole, strokeWidth: 1.2 })
  const ring = new scope.Path.Circle({
    center: [0, 0],
    radius: 13,
    strokeColor: palette.madder,
    strokeWidth: 2,
  })
  const labels = new scope.Group()

  function paint(model: SceneModel, view: View): void {
    const keys = new Set(model.drawn.members.map(({ member }) => member.key))
    for (const [key, { line, marks }] of items) {
      if (keys.has(key)) continue
      line.remove()
      marks.remove()
      items.delete(key)
    }
    for (const each of model.drawn.members) paintMember(each, each.member.key === model.selected, view)
    paintBreaks(model, view)
    paintLabels(model, view)
    ring.visible = model.place !== undefined
    if (model.place !== undefined) ring.position = new scope.Point(toCanvas(view, model.place))
  }

  function itemOf(key: string): FaceItem {
    const found = items.get(key)
    if (found !== undefined) return found
    const line = new scope.Path({ strokeCap: 'butt', strokeJoin: 'round', data: { key } })
    const marks = new scope.Path({ strokeColor: palette.ink, strokeWidth: MARK_WIDTH, dashArray: [1.2, 7] })
    lines.addChildren([line, marks])
    const item: FaceItem = { line, marks, made: '', from: undefined }
    items.set(key, item)
    return item
  }

  function paintMember(drawn: DrawnMember, isSelected: boolean, view: View): void {
    const item = itemOf(drawn.member.key)
    const { start, basis, isBroken } = drawn
    const made = [
      start.x,
      start.y,
      basis,
      isBroken,
      isSelected,
      view.pixelsPerMm,
      view.originX,
      view.originY,
    ].join()
    if (item.made === made && item.from?.member === drawn.member) return
    item.made = made
    item.from = drawn
    const look = faceLineOf(isBroken ? 'none' : basis, palette)
    const data = pathDataOf(drawn.path, view)
    item.line.pathData = data
    item.line.strokeColor = new scope.Color(isSelected ? palette.bole : look.color)
    item.line.strokeWidth = isSelected ? SELECTED_WIDTH : look.width
    item.line.dashArray = isSelected && look.dash.length > 0 ? SELECTED_DASH : look.dash
    item.marks.visible = basis === 'precedent' && !isBroken
    if (item.marks.visible) item.marks.pathData = data
    if (isSelected) lines.addChildren([item.line, item.marks])
  }

  function paintBreaks({ drawn, selectedBreak }: SceneModel, view: View): void {
    const places = drawn.breaks.map((place) => toCanvas(view, place))
    const foot = scope.view.viewSize.height
    // From each break down to the member rule, which is divided at the same places.
    drops.pathData = places.map(({ x, y }) => `M${Math.round(x) + 0.5} ${y}V${foot}`).join('')
    diamonds.pathData = places.map((place) => diamondAt(place, DIAMOND)).join('')
    const at = places.find((_, number) => breakKeyOf(drawn.draft, number) === selectedBreak)
    chosen.visible = at !== undefined
    if (at !== undefined) chosen.pathData = diamondAt(at, DIAMOND + 1.4)
  }

  function paintLabels(model: SceneModel, view: View): void {
    labels.removeChildren()
    for (const { at, text, shift } of model.labels) {
      const place = toCanvas(view, at)
      const item = label(scope, palette.ink)
      item.content = text
      item.justification = 'center'
      item.point = new scope.Point(place.x + shift.x, place.y + shift.y)
      labels.addChild(item)
    }
  }

  /** The member whose line passes within reach of a place of the canvas. */
  function keyAt(place: Point, reach: number): string | undefined {
    const hit = lines.hitTest(new scope.Point(place), { stroke: true, tolerance: reach })
    const key: unknown = hit?.item.data?.key
    return typeof key === 'string' ? key : undefined
  }
  return { paint, keyAt }
}

const diamondAt = ({ x, y }: Point, half: number): string =>
  `M${x - half} ${y}L${x} ${y - half}L${x + half} ${y}L${x} ${y + half}Z`
