import { describe, expect, it } from 'vitest'
import type { DraftSection } from '@shared/section'
import { keepWork, takeKeptWork } from '@/board/kept-work'
import type { KeepingPlace } from '@/board/kept-work'
import type { KeptWork } from '@/board/draft-session'

const DOCUMENT: DraftSection = {
  sightEdgeHeight: 30,
  rebate: { width: 8, depth: 20 },
  backSplay: { x: 0, height: 0 },
  gesso: 0,
  tolerance: 0.2,
  members: [{ key: 'a', kind: 'cyma-recta', width: 12, rise: 9, arc: 50 }],
}
const edit = { act: 'set', field: 'gesso', value: 0.6 } as const
const WORK: KeptWork = {
  base: { version: 4, document: DOCUMENT, undo: 'put in', redo: null },
  sending: {
    operationId: 'op',
    version: 4,
    steps: [{ step: { act: 'do', name: 'gesso', edit }, applied: edit }],
  },
  waiting: [{ step: { act: 'undo' } }],
}

function aPlace(): KeepingPlace & { readonly all: Map<string, string> } {
  const all = new Map<string, string>()
  return {
    all,
    get length() {
      return all.size
    },
    key: (index) => [...all.keys()][index] ?? null,
    getItem: (name) => all.get(name) ?? null,
    setItem: (name, text) => void all.set(name, text),
    removeItem: (name) => void all.delete(name),
  }
}

describe('unsaved work', () => {
  it('comes back whole to the page that kept it', () => {
    const place = aPlace()
    keepWork(place, 'c1', 'page', WORK, 1000)
    expect(takeKeptWork(place, 'c1', 'page', 1001)).toMatchObject(WORK)
  })

  it('is forgotten once it is saved', () => {
    const place = aPlace()
    keepWork(place, 'c1', 'page', WORK, 1000)
    keepWork(place, 'c1', 'page', undefined, 2000)
    expect(place.all.size).toBe(0)
  })

  it('of a page that still lives is let be; of one that is gone it is taken up, once', () => {
    const place = aPlace()
    keepWork(place, 'c1', 'other', WORK, 100_000)
    expect(takeKeptWork(place, 'c1', 'page', 110_000)).toBeUndefined()
    expect(takeKeptWork(place, 'c1', 'page', 140_000)).toMatchObject(WORK)
    expect(takeKeptWork(place, 'c1', 'third', 150_000)).toBeUndefined()
  })

  it('of another commission is none of this one’s', () => {
    const place = aPlace()
    keepWork(place, 'c2', 'page', WORK, 0)
    expect(takeKeptWork(place, 'c1', 'page', 1e9)).toBeUndefined()
  })

  it.each([
    ['nothing of ours', 'gold'],
    ['a list', '[]'],
    ['no document', JSON.stringify({ base: { version: 1 }, waiting: [], at: 0 })],
    ['an unknown step', JSON.stringify({ base: WORK.base, waiting: [{ step: { act: 'fly' } }], at: 0 })],
    ['a batch without an id', JSON.stringify({ ...WORK, sending: { version: 1, steps: [] }, at: 0 })],
  ])('that cannot be read is not taken up: %s', (_, text) => {
    const place = aPlace()
    place.setItem('listel-unsaved:c1:page', text)
    expect(takeKeptWork(place, 'c1', 'page', 1e9)).toBeUndefined()
  })
})
