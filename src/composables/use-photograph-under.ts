import { computed, shallowRef, toValue, watch } from 'vue'
import type { MaybeRefOrGetter } from 'vue'
import type { PhotographView } from '@shared/contracts'
import type { Point } from '@shared/geometry'
import { firstLay, layMovedBy, mmPerPixelOf } from '@/board/photograph-lay'
import type { Lay } from '@/board/photograph-lay'
import type { PhotographUnder } from '@/board/scene-photograph'
import { photographAddress, useAddReading } from './use-photographs'

/** The photograph under the drawing, if one is chosen, and how it lies while that is being changed. */
export function usePhotographUnder(
  commissionId: MaybeRefOrGetter<string>,
  photographs: MaybeRefOrGetter<readonly PhotographView[]>,
) {
  const chosenId = shallowRef<string>()
  const opacity = shallowRef(0.5)
  const isLaying = shallowRef(false)
  const image = shallowRef<HTMLImageElement>()
  const imageFault = shallowRef<string>()
  /** How it lies now; what is kept of it is in the photograph's reading. */
  const lay = shallowRef<Lay>()
  const keeping = useAddReading(commissionId)

  const open = computed(() => toValue(photographs).filter(({ state }) => state === 'open'))
  const chosen = computed(() => open.value.find(({ id }) => id === chosenId.value))
  const scale = computed(() => chosen.value?.reading?.document.scale ?? undefined)
  const mmPerPixel = computed(() => scale.value && mmPerPixelOf(scale.value))
  const keptLay = computed(() => chosen.value?.reading?.document.lay ?? undefined)
  const isMoved = computed(
    () => lay.value !== undefined && JSON.stringify(lay.value) !== JSON.stringify(keptLay.value),
  )

  watch(
    () => [chosen.value?.id, chosen.value?.reading?.no] as const,
    ([id], before) => {
      const photograph = chosen.value
      lay.value = photograph && (keptLay.value ?? firstLay(photograph.width, photograph.height))
      if (id !== before?.[0]) void fetchImage(photograph)
    },
  )

  async function fetchImage(photograph: PhotographView | undefined): Promise<void> {
    image.value = undefined
    imageFault.value = undefined
    if (photograph === undefined) return
    const coming = new Image()
    coming.src = photographAddress(photograph.id, 'screen')
    try {
      await coming.decode()
      if (chosen.value?.id === photograph.id) image.value = coming
    } catch {
      // The browser says no more than that it could not be decoded.
      imageFault.value = 'The photograph did not come. Choose it again, or look at it under Evidence.'
    }
  }

  const under = computed<PhotographUnder | undefined>(() => {
    const photograph = chosen.value
    if (!photograph || !image.value || mmPerPixel.value === undefined || lay.value === undefined)
      return undefined
    const { width, height } = photograph
    return {
      image: image.value,
      width,
      height,
      mmPerPixel: mmPerPixel.value,
      lay: lay.value,
      opacity: opacity.value,
    }
  })

  function choose(id: string | undefined): void {
    chosenId.value = chosenId.value === id ? undefined : id
    isLaying.value = false
  }
  /** 0 … 1 */
  function show(strength: number): void {
    opacity.value = strength
  }
  /** Takes it in hand, so that pointer and arrows move it and not the drawing. */
  function take(inHand: boolean): void {
    isLaying.value = inHand
  }
  function moveBy(byMm: Point): void {
    if (lay.value !== undefined && mmPerPixel.value !== undefined)
      lay.value = layMovedBy(mmPerPixel.value, lay.value, byMm)
  }
  function turnTo(turn: number): void {
    if (lay.value !== undefined) lay.value = { ...lay.value, turn }
  }
  function mirror(mirrored: boolean): void {
    if (lay.value !== undefined) lay.value = { ...lay.value, mirrored }
  }
  /** Keeps how it lies as the photograph's next reading. */
  async function keep(): Promise<void> {
    const photograph = chosen.value
    if (photograph === undefined || lay.value === undefined) return
    const document = { scale: scale.value ?? null, lay: lay.value }
    if ((await keeping.run({ photographId: photograph.id, document })) !== undefined) isLaying.value = false
  }
  function giveBack(): void {
    const photograph = chosen.value
    lay.value = photograph && (keptLay.value ?? firstLay(photograph.width, photograph.height))
    isLaying.value = false
  }

  return {
    open,
    chosen,
    scale,
    mmPerPixel,
    opacity,
    isLaying,
    isMoved,
    lay,
    under,
    imageFault,
    isKeeping: keeping.isRunning,
    failure: keeping.failure,
    choose,
    show,
    take,
    moveBy,
    turnTo,
    mirror,
    keep,
    giveBack,
  }
}

export type UnderDrawing = ReturnType<typeof usePhotographUnder>
