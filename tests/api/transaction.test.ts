import { describe, expect, it } from 'vitest'
import { useApplication } from '../helpers/application'
import { crossOver, failAfterWriting } from '../helpers/deadlock'
import { aClient } from '../helpers/factories/people'

useApplication()

describe('a transaction', () => {
  it('is tried again after a deadlock, so that both of two get through', async () => {
    const a = await aClient()
    const b = await aClient()
    expect(await crossOver(a, b)).toBe(3)
    await a.reload()
    await b.reload()
    // Whoever came last wrote both: one took a first and b second, the other the reverse.
    expect([
      ['there 1', 'there 2'],
      ['back 2', 'back 1'],
    ]).toContainEqual([a.name, b.name])
  })

  it('leaves nothing of itself when it fails', async () => {
    const client = await aClient({ name: 'untouched' })
    await expect(failAfterWriting(client)).rejects.toThrow('failed on purpose')
    await client.reload()
    expect(client.name).toBe('untouched')
  })
})
