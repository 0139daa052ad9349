import { gridOf, toCanvas } from './view-transform'
import type { Palette } from './scene-palette'
import type { SceneModel } from './scene'
import type { CanvasSize, View } from './view-transform'

/** CSS pixels. */
const WALL_BAND = 7
const LABEL_INSET = 12
/** A box lower than this, or with less room beside the wood, goes without its name. */
const LEAST_NAMED = 11
const NAME_WIDTH = 46

/** What the section stands on: grid, wall, and the picture's stack. */
export function groundParts(scope: paper.PaperScope, palette: Palette) {
  const minor = new scope.CompoundPath({ strokeColor: palette.line, strokeWidth: 0.5, opacity: 0.45 })
  const major = new scope.CompoundPath({ strokeColor: palette.line, strokeWidth: 1, opacity: 0.7 })
  const band = new scope.Path.Rectangle({ point: [0, 0], size: [1, WALL_BAND], fillColor: palette.line })
  const wall = new scope.Path({ strokeColor: palette.ink2, strokeWidth: 1.5 })
  const wallLabel = label(scope, palette.ink2)
  const boxes = new scope.Group()
  let grid = ''

  function paint({ stack, stackNames, wallName, unit }: SceneModel, view: View, size: CanvasSize): void {
    paintGrid(unit, view, size)
    const y = Math.round(view.originY)
    band.bounds = new scope.Rectangle(0, y, size.width, WALL_BAND)
    wall.removeSegments()
    wall.addSegments([segment(0, y), segment(size.width, y)])
    wallLabel.point = new scope.Point(LABEL_INSET, y + WALL_BAND + 16)
    wallLabel.content = wallName
    paintStack(stack, stackNames, view)
  }

  function paintGrid(unit: 'mm' | 'in', view: View, { width, height }: CanvasSize): void {
    const now = [unit, view.pixelsPerMm, view.originX, view.originY, width, height].join()
    if (now === grid) return
    grid = now
    const { stepMm, major: every } = gridOf(view, unit)
    const step = stepMm * view.pixelsPerMm
    const lines: Record<'minor' | 'major', string[]> = { minor: [], major: [] }
    const put = (index: number, text: string): void => {
      lines[index % every === 0 ? 'major' : 'minor'].push(text)
    }
    for (let i = Math.ceil(-view.originX / step); view.originX + i * step <= width; i += 1) {
      const x = Math.round(view.originX + i * step) + 0.5
      put(i, `M${x} 0V${height}`)
    }
    for (let i = Math.ceil((view.originY - height) / step); view.originY - i * step >= 0; i += 1) {
      const y = Math.round(view.originY - i * step) + 0.5
      put(i, `M0 ${y}H${width}`)
    }
    minor.pathData = lines.minor.join('')
    major.pathData = lines.major.join('')
  }

  function paintStack(stack: SceneModel['stack'], names: SceneModel['stackNames'], view: View): void {
    boxes.removeChildren()
    for (const { part, top, bottom, right } of stack) {
      const from = toCanvas(view, { x: right, y: top })
      const to = toCanvas(view, { x: right, y: bottom })
      if (part !== 'airGap') {
        const outline = new scope.Path([
          segment(-2, from.y),
          segment(from.x, from.y),
          segment(to.x, to.y),
          segment(-2, to.y),
        ])
        outline.strokeColor = new scope.Color(palette.slate)
        outline.strokeWidth = 1.2
        outline.dashArray = [5, 3]
        boxes.addChild(outline)
      }
      if (to.y - from.y < LEAST_NAMED || from.x < LABEL_INSET + NAME_WIDTH) continue
      const name = label(scope, palette.slate)
      name.content = names[part]
      name.point = new scope.Point(LABEL_INSET, (from.y + to.y) / 2 + 4)
      boxes.addChild(name)
    }
  }

  const segment = (x: number, y: number): paper.Segment => new scope.Segment(new scope.Point(x, y))
  return { paint }
}

export function label(scope: paper.PaperScope, color: string): paper.PointText {
  return new scope.PointText({
    point: [0, 0],
    fillColor: color,
    fontFamily: 'Work Sans, sans-serif',
    fontSize: 12,
  })
}
