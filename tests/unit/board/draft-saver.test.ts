import { describe, expect, it } from 'vitest'
import { Failure } from '@shared/failure'
import { applyEdit } from '@shared/section'
import type { DraftSection } from '@shared/section'
import { draftSaver } from '@/board/draft-saver'
import type { SaverPorts } from '@/board/draft-saver'
import { sessionFrom, stepTaken } from '@/board/draft-session'
import type { DraftSession, DraftWithHistory, KeptWork } from '@/board/draft-session'

const BARE: DraftSection = {
  sightEdgeHeight: 30,
  rebate: { width: 8, depth: 20 },
  backSplay: { x: 0, height: 0 },
  gesso: 0,
  tolerance: 0.2,
  members: [],
}
type Request = Parameters<SaverPorts['send']>[0]

/** A server that draws as ours does, whose answers a test may hold back, refuse or lose. */
function bench(refuse: (request: Request, time: number) => Failure | undefined = () => undefined) {
  let document = BARE
  let version = 1
  let ids = 0
  const asked: Request[] = []
  const timers: { readonly ms: number; readonly act: () => void }[] = []
  let kept: KeptWork | undefined
  const view = (): DraftWithHistory => ({ version, document, undo: null, redo: null, history: [] })
  const saver = draftSaver(sessionFrom({ version, document, undo: null, redo: null }), {
    send: async (request) => {
      asked.push(request)
      const failure = refuse(request, asked.length)
      if (failure !== undefined) throw failure
      for (const step of request.steps) if (step.act === 'do') document = applyEdit(document, step.edit).draft
      version += 1
      return view()
    },
    currentOf: (failure) =>
      failure.code === 'version-stale' ? (failure.details.draft as DraftWithHistory) : undefined,
    keep: (work) => (kept = work),
    makeOperationId: () => `op-${(ids += 1)}`,
    after: (ms, act) => {
      const timer = { ms, act }
      timers.push(timer)
      return () => void timers.splice(timers.indexOf(timer), timers.includes(timer) ? 1 : 0)
    },
    onChange: () => undefined,
  })
  const draw = (gesso: number) =>
    saver.advance((session: DraftSession) =>
      stepTaken(session, `gesso ${gesso}`, { act: 'set', field: 'gesso', value: gesso }),
    )
  return { saver, draw, asked, timers, view, kept: () => kept, server: () => document }
}

describe('saving as one draws', () => {
  it('waits for a pause and then sends the stroke as one batch', async () => {
    const { saver, draw, asked, timers, server, kept } = bench()
    draw(0.2)
    draw(0.4)
    expect(asked).toEqual([])
    expect(timers.map(({ ms }) => ms)).toEqual([400])
    expect(kept()?.waiting).toHaveLength(2)
    await saver.flush()
    expect(asked).toHaveLength(1)
    expect(asked[0]).toMatchObject({ version: 1, operationId: 'op-1' })
    expect(server().gesso).toBe(0.4)
    expect(kept()).toBeUndefined()
  })

  it('sends what was drawn during a save right after it, on the new version', async () => {
    const { saver, draw, asked } = bench()
    draw(0.2)
    const first = saver.flush()
    draw(0.6)
    await first
    expect(asked.map(({ version, operationId }) => [version, operationId])).toEqual([
      [1, 'op-1'],
      [2, 'op-2'],
    ])
  })

  it('never has two batches on their way', async () => {
    const { saver, draw, asked } = bench()
    draw(0.2)
    await Promise.all([saver.flush(), saver.flush(), saver.flush()])
    expect(asked).toHaveLength(1)
  })
})

describe('a server out of reach', () => {
  it('tries the same batch under the same operation id, ever more patiently, and keeps all meanwhile', async () => {
    const out = new Failure('out-of-service', { says: 'out' })
    const { saver, draw, asked, timers, kept } = bench((_, time) => (time <= 3 ? out : undefined))
    draw(0.2)
    await saver.flush()
    draw(0.4)
    await saver.flush()
    await saver.flush()
    expect(saver.session().trouble).toEqual({ kind: 'out-of-reach', says: 'out' })
    expect(timers.map(({ ms }) => ms)).toEqual([4000])
    expect(kept()?.sending?.operationId).toBe('op-1')
    expect(kept()?.waiting).toHaveLength(1)
    await saver.flush()
    expect(asked.map(({ operationId }) => operationId)).toEqual(['op-1', 'op-1', 'op-1', 'op-1', 'op-2'])
    expect(saver.session()).toMatchObject({ trouble: undefined, sending: undefined, waiting: [] })
  })
})

describe('a save from an older version', () => {
  const theirs: DraftWithHistory = {
    version: 7,
    document: { ...BARE, tolerance: 0.5 },
    undo: 'tolerance',
    redo: null,
    history: [],
  }
  const stale = new Failure('version-stale', { says: 'stale', draft: theirs })

  it('is held, not tried again, until a person has chosen', async () => {
    const { saver, draw, asked, timers } = bench(() => stale)
    draw(0.2)
    await saver.flush()
    expect(saver.session().trouble).toEqual({ kind: 'stale', current: theirs })
    expect(saver.session().document.gesso).toBe(0.2)
    draw(0.3)
    await saver.flush()
    expect(asked).toHaveLength(1)
    expect(timers).toEqual([])
  })

  it('can be put on top: both drawings are in what is sent next', async () => {
    const { saver, draw, asked, kept } = bench((_, time) => (time === 1 ? stale : undefined))
    draw(0.2)
    await saver.flush()
    expect(saver.putMineOnTop()).toEqual([])
    expect(saver.session().document).toMatchObject({ gesso: 0.2, tolerance: 0.5 })
    await saver.flush()
    expect(asked[1]).toMatchObject({ version: 7, operationId: 'op-2' })
    expect(kept()).toBeUndefined()
  })

  it('can be thrown away: what stands is what the other drew', async () => {
    const { saver, draw, kept } = bench(() => stale)
    draw(0.2)
    await saver.flush()
    saver.throwMineAway(theirs)
    expect(saver.session().document).toEqual(theirs.document)
    expect(saver.session().trouble).toBeUndefined()
    expect(kept()).toBeUndefined()
  })
})

describe('a save that the server would not take', () => {
  it('says why and keeps the work', async () => {
    const refusal = new Failure('input-invalid', { says: 'No such key.' })
    const { saver, draw, kept } = bench(() => refusal)
    draw(0.2)
    await saver.flush()
    expect(saver.session().trouble).toEqual({ kind: 'refused', says: 'No such key.' })
    expect(kept()?.sending?.steps).toHaveLength(1)
  })
})
