import { createPinia, setActivePinia } from 'pinia'
import { beforeEach, describe, expect, it } from 'vitest'
import { nextTick, ref } from 'vue'
import { useTypedLength } from '@/composables/use-typed-length'
import { useSessionStore } from '@/stores/session'

function workIn(units: 'mm' | 'in'): void {
  useSessionStore().session = {
    person: {
      id: '0195d0a0-0000-7000-8000-000000000001',
      name: 'Ines',
      email: 'ines@example.org',
      units,
      vocabulary: null,
    },
    memberships: [],
    workshop: { name: 'Workshop', units: 'mm', vocabulary: 'moulding', currency: 'EUR' },
  }
}

beforeEach(() => {
  setActivePinia(createPinia())
  workIn('mm')
})

describe('a typed length', () => {
  it.each([
    ['84', 84],
    ['3 5/16"', 84.1375],
    ['1/2*(3+1/4)', 1.625],
  ])('takes %s', (typed, mm) => {
    const { type, take } = useTypedLength(null)
    type(typed)
    expect(take()).toEqual({ mm })
  })

  it('never takes over what nobody typed, so that looking does not round', async () => {
    const mm = ref<number | null>(10 / 3)
    const { text, take } = useTypedLength(mm)
    await nextTick()
    expect(text.value).toBe('3.33')
    expect(take()).toBeUndefined()
  })

  it('shows short figures in full', () => {
    expect(useTypedLength(84.1375).text.value).toBe('84.1375')
    workIn('in')
    expect(useTypedLength(84.1375).text.value).toBe('3 5/16')
  })

  it('says what is wrong and keeps the text', () => {
    const { type, take, says, text } = useTypedLength(12)
    type('3 5/0')
    expect(take()).toBeUndefined()
    expect(says.value).toMatch(/^[A-Z].*\.$/)
    expect(text.value).toBe('3 5/0')
  })

  it('holds to its bounds and says them', () => {
    const { type, take, says } = useTypedLength(null, { leastMm: 1, mostMm: 50 })
    type('0.5')
    expect(take()).toBeUndefined()
    expect(says.value).toBe('It must be at least 1.00 mm.')
    type('51')
    expect(says.value).toBe('It must be at most 50.00 mm.')
    type('50')
    expect(take()).toEqual({ mm: 50 })
  })

  it('takes nothing for nothing only where it may', () => {
    const optional = useTypedLength(5, { optional: true })
    optional.type('')
    expect(optional.take()).toEqual({ mm: null })
    const needed = useTypedLength(5)
    needed.type('')
    expect(needed.take()).toBeUndefined()
    expect(needed.says.value).toBeDefined()
  })

  it('echoes what is written another way than it will be shown', () => {
    const { type, echo } = useTypedLength(null)
    type('84')
    expect(echo.value).toBeUndefined()
    type('3 5/16 in')
    expect(echo.value).toBe('= 84.138 mm')
  })

  it('gives up what was typed', () => {
    const { type, giveUp, text, says } = useTypedLength(12)
    type('rubbish')
    giveUp()
    expect([text.value, says.value]).toEqual(['12', undefined])
  })
})
