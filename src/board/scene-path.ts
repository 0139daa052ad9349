import type { Path, Point } from '@shared/geometry'
import { drawableOf } from './curve-drawing'
import { toCanvas } from './view-transform'
import type { View } from './view-transform'

/** Segments as the path data of a canvas item, in CSS pixels. */
export function pathDataOf(path: Path, view: View): string {
  const first = path[0]
  if (first === undefined) return ''
  const at = (point: Point): string => {
    const { x, y } = toCanvas(view, point)
    return `${x} ${y}`
  }
  let data = `M${at(first.start)}`
  for (const segment of path) {
    const drawable = drawableOf(segment)
    if (drawable === 'line') data += `L${at(segment.end)}`
    else
      for (const { control1, control2, end } of drawable)
        data += `C${at(control1)} ${at(control2)} ${at(end)}`
  }
  return data
}
