import { computed, ref, toValue, watch } from 'vue'
import type { MaybeRefOrGetter } from 'vue'
import { printLengthExact } from '@shared/units'
import { useLengths } from './use-lengths'

export interface TypedLengthOptions {
  /** Least length that is taken, mm. */
  readonly leastMm?: MaybeRefOrGetter<number | undefined>
  readonly mostMm?: MaybeRefOrGetter<number | undefined>
  /** Whether nothing at all may stand there. */
  readonly optional?: MaybeRefOrGetter<boolean | undefined>
  /** Decimals of a millimetre shown while nobody types. Default 2, without trailing noughts. */
  readonly places?: number
}

export type TypedLength =
  { readonly kind: 'length'; readonly mm: number | null } | { readonly kind: 'wrong'; readonly says: string }

/**
 * A length as it is being typed. The text is the user's until they leave it; only a text they changed is taken over, so
 * that looking at a length never rounds it to what is shown of it.
 */
export function useTypedLength(mm: MaybeRefOrGetter<number | null>, options: TypedLengthOptions = {}) {
  const { parse, print, unit } = useLengths()
  const text = ref('')
  const isEdited = ref(false)

  const shown = computed(() => {
    const value = toValue(mm)
    return value === null ? '' : shownLength(value)
  })
  function shownLength(value: number): string {
    const exact = printLengthExact(value, unit.value)
    if (unit.value === 'mm') {
      const places = options.places ?? 2
      return exact.length <= 12 ? exact.replace(/ mm$/, '') : print(value, { places, withUnit: false })
    }
    return print(value, { withUnit: false })
  }
  watch(shown, (next) => !isEdited.value && (text.value = next), { immediate: true })

  const typed = computed<TypedLength>(() => {
    if (text.value.trim() === '' && toValue(options.optional)) return { kind: 'length', mm: null }
    const parsed = parse(text.value)
    if (parsed.kind === 'not-a-length') return { kind: 'wrong', says: sentence(parsed.says) }
    const bound = boundBroken(parsed.mm)
    return bound === undefined ? parsed : { kind: 'wrong', says: bound }
  })
  function boundBroken(value: number): string | undefined {
    const [least, most] = [toValue(options.leastMm), toValue(options.mostMm)]
    if (least !== undefined && value < least) return `It must be at least ${print(least, { places: 2 })}.`
    if (most !== undefined && value > most) return `It must be at most ${print(most, { places: 2 })}.`
    return undefined
  }

  /** What the text means, where it says it another way than it will be shown. */
  const echo = computed(() => {
    if (!isEdited.value || typed.value.kind !== 'length' || typed.value.mm === null) return undefined
    const plain = /^\s*\d+(\.\d+)?\s*$/.test(text.value)
    return plain ? undefined : `= ${print(typed.value.mm, { places: 3 })}`
  })
  /** Takes the text over; undefined when it was not changed or cannot be taken. */
  function take(): { readonly mm: number | null } | undefined {
    if (!isEdited.value || typed.value.kind === 'wrong') return undefined
    const taken = { mm: typed.value.mm }
    isEdited.value = false
    text.value = taken.mm === null ? '' : shownLength(taken.mm)
    return taken
  }
  function type(next: string): void {
    text.value = next
    isEdited.value = true
  }
  /** Throws away what was typed. */
  function giveUp(): void {
    isEdited.value = false
    text.value = shown.value
  }
  const says = computed(() => (isEdited.value && typed.value.kind === 'wrong' ? typed.value.says : undefined))
  return { text, type, take, giveUp, echo, says, typed, isEdited, unit }
}

const sentence = (says: string) =>
  says.charAt(0).toUpperCase() + says.slice(1) + (/[.!?]$/.test(says) ? '' : '.')
