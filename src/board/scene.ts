import paperCore from 'paper/dist/paper-core.js'
import type { Point } from '@shared/geometry'
import { SIGHT_EDGE_KEY } from '@shared/section'
import type { DrawnSection } from './drawn-section'
import { faceParts } from './scene-face'
import { groundParts } from './scene-ground'
import type { Palette } from './scene-palette'
import { photographPart } from './scene-photograph'
import type { PhotographUnder } from './scene-photograph'
import { woodParts } from './scene-wood'
import type { StackBox } from './picture-stack'
import { toCanvas, toSection } from './view-transform'
import type { CanvasSize, View } from './view-transform'
import type { Hit } from './pointer-tool'

/** A word on the drawing, at a place of the section, moved by so many CSS pixels. */
export interface SceneLabel {
  readonly at: Point
  readonly text: string
  readonly shift: Point
}

/** Everything that is drawn besides the view. */
export interface SceneModel {
  readonly drawn: DrawnSection
  readonly selected: string | undefined
  readonly selectedBreak: string | undefined
  readonly stack: readonly StackBox[]
  readonly stackNames: Readonly<Record<StackBox['part'], string>>
  readonly wallName: string
  readonly labels: readonly SceneLabel[]
  /** A place pointed out, mm. */
  readonly place: Point | undefined
  readonly photograph: PhotographUnder | undefined
  readonly isLaying: boolean
  readonly unit: 'mm' | 'in'
}

export interface Scene {
  /** Brings the canvas up to the model and the view; only what has changed is made anew. */
  readonly paint: (model: SceneModel, view: View, size: CanvasSize) => void
  /** What lies at a place of the canvas, CSS pixels. */
  readonly hitAt: (place: Point) => Hit
  readonly close: () => void
}

/** The file that leaves out the script language has no types of its own: those of the whole serve. */
const library = paperCore as unknown as paper.PaperScope

/** How near to a break a finger or pointer must come, CSS pixels: a target of 24. */
const BREAK_REACH = 12
const FACE_REACH = 6

/** The drawing on a canvas. The paper library draws and finds what was hit; nothing is ever measured from it. */
export function sceneOn(canvas: HTMLCanvasElement, palette: Palette): Scene {
  const scope = new library.PaperScope()
  scope.setup(canvas)
  scope.view.autoUpdate = false
  const photograph = photographPart(scope, () => void scope.view.update())
  const ground = groundParts(scope, palette)
  const wood = woodParts(scope, palette)
  const face = faceParts(scope, palette)
  let shown: { readonly model: SceneModel; readonly view: View } | undefined

  function paint(model: SceneModel, view: View, size: CanvasSize): void {
    scope.activate()
    if (scope.view.viewSize.width !== size.width || scope.view.viewSize.height !== size.height) {
      scope.view.viewSize = new scope.Size(size.width, size.height)
    }
    photograph.paint(model.photograph, view)
    ground.paint(model, view, size)
    wood.paint(model, view)
    face.paint(model, view)
    shown = { model, view }
    scope.view.update()
  }

  function hitAt(place: Point): Hit {
    if (shown === undefined) return { kind: 'nothing' }
    const { model, view } = shown
    if (model.isLaying) return { kind: 'photograph' }
    return breakAt(model.drawn, view, place) ?? memberAt(model.drawn, view, place) ?? { kind: 'nothing' }
  }
  /** A line of the face first, then the wood under it. */
  function memberAt(drawn: DrawnSection, view: View, place: Point): Hit | undefined {
    const key = face.keyAt(place, FACE_REACH)
    if (key !== undefined) return { kind: 'member', key }
    if (!wood.contains(place)) return undefined
    const { x } = toSection(view, place)
    const under = drawn.members.find(({ start, end }) => start.x <= x && x < end.x)
    return under && { kind: 'member', key: under.member.key }
  }

  return {
    paint,
    hitAt,
    close() {
      scope.view.remove()
      scope.project.remove()
    },
  }
}

/** The break nearest to a place of the canvas, within reach; of two at one place the later, which has more room to move. */
function breakAt({ members, breaks }: DrawnSection, view: View, place: Point): Hit | undefined {
  let best: { readonly index: number; readonly off: number } | undefined
  for (const [index, at] of breaks.entries()) {
    const on = toCanvas(view, at)
    const off = Math.hypot(on.x - place.x, on.y - place.y)
    if (off <= BREAK_REACH && (best === undefined || off <= best.off)) best = { index, off }
  }
  if (best === undefined) return undefined
  const at = breaks[best.index] as Point
  const key = best.index === 0 ? SIGHT_EDGE_KEY : members[best.index - 1]?.member.key
  return key === undefined ? undefined : { kind: 'break', key, place: toCanvas(view, at) }
}
