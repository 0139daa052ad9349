import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { canonicalText } from '@shared/section'
import type { DraftSection } from '@shared/section'
import {
  batchInHand,
  batchInTrouble,
  batchSaved,
  hasUnsaved,
  isAwaitingServer,
  keptOf,
  mineOnTop,
  redoName,
  sessionFrom,
  sessionFromKept,
  stepRedone,
  stepTaken,
  stepUndone,
  undoName,
  unsavedNames,
} from '@/board/draft-session'
import type { DraftBase, DraftSession } from '@/board/draft-session'

const BARE: DraftSection = {
  sightEdgeHeight: 30,
  rebate: { width: 8, depth: 20 },
  backSplay: { x: 0, height: 0 },
  gesso: 0,
  tolerance: 0.2,
  members: [],
}
const base = (parts: Partial<DraftBase> = {}): DraftBase => ({
  version: 3,
  document: BARE,
  undo: null,
  redo: null,
  ...parts,
})
const fillet = (key: string, width = 4) => ({ key, kind: 'fillet' as const, width, rise: 0 })
const putIn = (session: DraftSession, key: string) =>
  stepTaken(session, `put in ${key}`, {
    act: 'put-in',
    at: session.document.members.length,
    member: fillet(key),
  })
const keysOf = ({ document }: { readonly document: DraftSection }) => document.members.map(({ key }) => key)

describe('drawing', () => {
  it('shows each step at once and queues it', () => {
    const session = putIn(putIn(sessionFrom(base()), 'a'), 'b')
    expect(keysOf(session)).toEqual(['a', 'b'])
    expect(unsavedNames(session)).toEqual(['put in a', 'put in b'])
    expect(undoName(session)).toBe('put in b')
  })

  it('undoes and redoes here, and tells the server in order', () => {
    const session = stepRedone(stepUndone(stepUndone(putIn(putIn(sessionFrom(base()), 'a'), 'b'))))
    expect(keysOf(session)).toEqual(['a'])
    expect(session.waiting.map(({ step }) => step.act)).toEqual(['do', 'do', 'undo', 'undo', 'redo'])
    expect(redoName(session)).toBe('put in b')
  })

  it('comes back to the very document, whatever was drawn', () => {
    const widths = fc.array(fc.double({ min: 0.1, max: 90, noNaN: true }), { minLength: 1, maxLength: 20 })
    fc.assert(
      fc.property(widths, (list) => {
        let session = sessionFrom(base())
        for (const [index, width] of list.entries()) {
          session = stepTaken(session, 'put in', { act: 'put-in', at: 0, member: fillet(`k${index}`, width) })
        }
        const drawn = canonicalText(session.document)
        for (const _ of list) session = stepUndone(session)
        expect(canonicalText(session.document)).toBe(canonicalText(BARE))
        for (const _ of list) session = stepRedone(session)
        expect(canonicalText(session.document)).toBe(drawn)
      }),
    )
  })

  it('goes on in the server’s history once its own steps are at an end and saved', () => {
    const session = sessionFrom(base({ undo: 'gesso 0.6' }))
    expect(undoName(session)).toBe('gesso 0.6')
    const asked = stepUndone(session)
    expect(isAwaitingServer(asked)).toBe(true)
    expect(undoName(asked)).toBeUndefined()
    const sent = batchInHand(asked, () => 'op')
    const answered = batchSaved(sent, base({ version: 4, undo: null, redo: 'gesso 0.6' }))
    expect(isAwaitingServer(answered)).toBe(false)
    expect(redoName(answered)).toBe('gesso 0.6')
  })

  it('asks the server for nothing when there is nothing', () => {
    const session = sessionFrom(base())
    expect(stepUndone(session)).toBe(session)
    expect(stepRedone(session)).toBe(session)
  })
})

describe('saving', () => {
  it('sends what waits as one batch and draws on meanwhile', () => {
    const sent = batchInHand(putIn(sessionFrom(base()), 'a'), () => 'op-1')
    expect(sent.sending).toMatchObject({ operationId: 'op-1', version: 3 })
    const meanwhile = putIn(sent, 'b')
    const saved = batchSaved(meanwhile, base({ version: 4, document: { ...BARE, members: [fillet('a')] } }))
    expect(keysOf(saved)).toEqual(['a', 'b'])
    expect(unsavedNames(saved)).toEqual(['put in b'])
    expect(batchInHand(saved, () => 'op-2').sending).toMatchObject({ operationId: 'op-2', version: 4 })
  })

  it('keeps the operation id of a batch that is tried again', () => {
    const sent = batchInHand(putIn(sessionFrom(base()), 'a'), () => 'op-1')
    const again = batchInHand(batchInTrouble(sent, { kind: 'out-of-reach', says: '' }), () => 'op-2')
    expect(again.sending?.operationId).toBe('op-1')
  })

  it('parts a long row of steps into batches the server takes', () => {
    let session = sessionFrom(base())
    for (let i = 0; i < 450; i += 1) session = putIn(session, `k${i}`)
    const sent = batchInHand(session, () => 'op')
    expect(sent.sending?.steps).toHaveLength(200)
    expect(sent.waiting).toHaveLength(250)
  })

  it('takes up kept work exactly where it was', () => {
    const session = putIn(
      batchInHand(putIn(sessionFrom(base()), 'a'), () => 'op-1'),
      'b',
    )
    const again = sessionFromKept(JSON.parse(JSON.stringify(keptOf(session))) as typeof session)
    expect(canonicalText(again.document)).toBe(canonicalText(session.document))
    expect(again.sending?.operationId).toBe('op-1')
    expect(hasUnsaved(again)).toBe(true)
  })
})

describe('two who draw on one section', () => {
  const theirs = base({ version: 9, document: { ...BARE, gesso: 0.6, members: [fillet('z')] } })

  it('puts one’s own steps on top of what stands now', () => {
    const mine = batchInHand(putIn(sessionFrom(base()), 'a'), () => 'op')
    const { session, lost } = mineOnTop(putIn(mine, 'b'), theirs)
    expect(lost).toEqual([])
    // Each was put in at the place it had: first and second.
    expect(keysOf(session)).toEqual(['a', 'b', 'z'])
    expect(session.document.gesso).toBe(0.6)
    expect(session.base.version).toBe(9)
  })

  it('names the steps whose ground is gone', () => {
    const first = sessionFrom(base({ document: { ...BARE, members: [fillet('gone')] } }))
    const changed = stepTaken(first, 'widen it', { act: 'change', key: 'gone', member: fillet('gone', 9) })
    const { session, lost } = mineOnTop(putIn(changed, 'b'), theirs)
    expect(lost).toEqual(['widen it'])
    expect(keysOf(session)).toContain('b')
  })
})
