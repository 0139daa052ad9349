import { affineOf } from './photograph-lay'
import type { Lay } from './photograph-lay'
import type { View } from './view-transform'

/** A photograph lying under the drawing. */
export interface PhotographUnder {
  readonly image: HTMLImageElement
  /** Of the upright original, pixels; the image shown may be smaller. */
  readonly width: number
  readonly height: number
  readonly mmPerPixel: number
  readonly lay: Lay
  /** 0 … 1 */
  readonly opacity: number
}

/** One raster, moved and turned by its matrix alone. `repaint` is called when the picture has come. */
export function photographPart(scope: paper.PaperScope, repaint: () => void) {
  let raster: paper.Raster | undefined
  let shownImage: HTMLImageElement | undefined
  const group = new scope.Group()

  function show(image: HTMLImageElement): paper.Raster {
    if (raster !== undefined && shownImage === image) return raster
    raster?.remove()
    raster = new scope.Raster(image)
    raster.onLoad = repaint
    raster.applyMatrix = false
    group.addChild(raster)
    shownImage = image
    return raster
  }

  function paint(under: PhotographUnder | undefined, { pixelsPerMm: k, originX, originY }: View): void {
    group.visible = under !== undefined
    if (under === undefined) return
    const item = show(under.image)
    const { a, b, c, d, e, f } = affineOf(under.mmPerPixel, under.lay)
    const onto = new scope.Matrix(k * a, -k * b, k * c, -k * d, originX + k * e, originY - k * f)
    // A raster lies about its own middle.
    const shrunk = under.width / Math.max(1, under.image.naturalWidth)
    item.matrix = onto.translate(under.width / 2, under.height / 2).scale(shrunk, shrunk)
    item.opacity = under.opacity
  }
  return { paint }
}
