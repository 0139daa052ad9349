import { MutationCache, QueryClient, VueQueryPlugin } from '@tanstack/vue-query'
import { createApp, effectScope } from 'vue'
import { describe, expect, it } from 'vitest'
import { Failure } from '@shared/failure'
import { useAct } from '@/composables/use-act'

interface Input {
  readonly title: string
  readonly sizes: readonly number[]
}
const INPUT: Input = { title: 'Harbour', sizes: [1, 2] }

/** An act on a server that refuses so many times first; every operation id it was given is kept. */
function anAct({ refusals }: { refusals: number }) {
  const given: string[] = []
  const app = createApp({})
  app.use(VueQueryPlugin, { queryClient: new QueryClient({ mutationCache: new MutationCache() }) })
  const act = app.runWithContext(() =>
    effectScope(true).run(() =>
      useAct((_: Input, operationId: string) => {
        given.push(operationId)
        return given.length <= refusals
          ? Promise.reject(new Failure('out-of-service', { says: 'Not now.' }))
          : Promise.resolve('done')
      }),
    ),
  )
  if (act === undefined) throw new Error('the scope did not run')
  return { ...act, given }
}

describe('an act', () => {
  it('keeps its operation id while the same is tried again', async () => {
    const { run, given, failure } = anAct({ refusals: 2 })
    expect(await run(INPUT)).toBeUndefined()
    expect(failure.value?.details.says).toBe('Not now.')
    expect(await run({ sizes: [1, 2], title: 'Harbour' })).toBeUndefined()
    expect(await run(INPUT)).toBe('done')
    expect(failure.value).toBeUndefined()
    expect(given).toHaveLength(3)
    expect(new Set(given).size).toBe(1)
  })

  it('is another act with another input', async () => {
    const { run, given } = anAct({ refusals: 9 })
    await run(INPUT)
    await run({ ...INPUT, title: 'Orchard' })
    await run({ ...INPUT, sizes: [1, 3] })
    expect(new Set(given).size).toBe(3)
  })

  it('is another act once it was done', async () => {
    const { run, given } = anAct({ refusals: 0 })
    await run(INPUT)
    await run(INPUT)
    expect(new Set(given).size).toBe(2)
  })
})
