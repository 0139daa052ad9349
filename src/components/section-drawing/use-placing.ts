import { useElementSize } from '@vueuse/core'
import { computed, toValue } from 'vue'
import type { MaybeRefOrGetter, Ref } from 'vue'
import type { Bounds } from '@shared/geometry'
import type { Placing } from './path-data'

export interface PlacingOptions {
  /** Room round what is drawn, px. */
  readonly margin?: number
  readonly mostHeight?: MaybeRefOrGetter<number | undefined>
}

/** Lays a drawing into the width that it is given: as large as it can be, upright and undistorted, and 1:1 never asked for. */
export function usePlacing(
  frame: Ref<HTMLElement | null>,
  bounds: MaybeRefOrGetter<Bounds>,
  { margin = 28, mostHeight }: PlacingOptions = {},
) {
  const { width: measured } = useElementSize(frame, { width: 640, height: 0 })
  return computed((): Placing & { readonly width: number; readonly height: number } => {
    const { min, max } = toValue(bounds)
    const width = Math.max(measured.value, 120)
    const across = Math.max(max.x - min.x, 1)
    const upward = Math.max(max.y - min.y, 1)
    const most = (toValue(mostHeight) ?? 360) - 2 * margin
    const scale = Math.min((width - 2 * margin) / across, most / upward)
    return {
      scale,
      originX: (width - across * scale) / 2 - min.x * scale,
      originY: margin + max.y * scale,
      width,
      height: upward * scale + 2 * margin,
    }
  })
}
