import { defineStore } from 'pinia'
import { computed, ref } from 'vue'
import { CutFactRequest } from '@shared/contracts'
import type { CutListView, OutputOf } from '@shared/contracts'
import { Failure } from '@shared/failure'
import { recordCutFact } from '@/api/cut-lists'

export type CutFactInput = OutputOf<typeof CutFactRequest>

/** A fact from the bench that the server does not have yet, in the order in which it happened. */
export interface KeptFact {
  readonly listId: string
  readonly fact: CutFactInput
  /** Why the server would not take it; null while it has only not been reached. */
  readonly refused: string | null
}

const DATABASE = 'listel-bench'
const FACTS = 'facts'

/**
 * Ticks from the bench, kept on this device until the server has them: each is written down here first, sent in its order,
 * and struck out once it is taken. Without IndexedDB (a private window) they live as long as the page, which `isLasting` says.
 */
export const useKeptFactsStore = defineStore('kept-facts', () => {
  const facts = ref<readonly KeptFact[]>([])
  const isLasting = ref(true)
  const isOutOfReach = ref(false)
  let isSending = false

  const waiting = computed(() => facts.value.filter(({ refused }) => refused === null))
  const keptOf = (listId: string) => facts.value.filter((kept) => kept.listId === listId)

  /** Reads what an earlier visit left behind. */
  async function load(): Promise<void> {
    const stored = await attempt((store) => store.getAll())
    const known = new Set(facts.value.map(({ fact }) => fact.operationId))
    const left = (stored ?? [])
      .flatMap((row) => keptFrom(row) ?? [])
      .filter(({ fact }) => !known.has(fact.operationId))
    facts.value = [...left, ...facts.value].sort((a, b) =>
      a.fact.operationId.localeCompare(b.fact.operationId),
    )
  }
  /** Writes a fact down before anything else happens to it. */
  async function keep(listId: string, fact: CutFactInput): Promise<void> {
    await put({ listId, fact, refused: null })
  }
  /** Sends what is kept of a list, oldest first; gives the list as the last answer shows it. Stops where the server is out of reach. */
  async function sendKept(listId: string): Promise<CutListView | undefined> {
    if (isSending) return undefined
    isSending = true
    let latest: CutListView | undefined
    try {
      for (let next = nextOf(listId); next !== undefined; next = nextOf(listId)) {
        latest = await recordCutFact(listId, next.fact)
        isOutOfReach.value = false
        await strikeOut(next.fact.operationId)
      }
    } catch (error) {
      await noteFailure(listId, error)
    } finally {
      isSending = false
    }
    return latest
  }
  const nextOf = (listId: string) => waiting.value.find((kept) => kept.listId === listId)

  async function noteFailure(listId: string, error: unknown): Promise<void> {
    if (!(error instanceof Failure)) throw error
    isOutOfReach.value = error.code === 'out-of-service'
    const next = nextOf(listId)
    if (isOutOfReach.value || error.code === 'not-signed-in' || next === undefined) return
    await put({ ...next, refused: error.details.says ?? 'The server does not take it.' })
  }
  async function put(kept: KeptFact): Promise<void> {
    const others = facts.value.filter(({ fact }) => fact.operationId !== kept.fact.operationId)
    facts.value = [...others, kept].sort((a, b) => a.fact.operationId.localeCompare(b.fact.operationId))
    await attempt((store) =>
      store.put({ ...kept, fact: { ...kept.fact }, operationId: kept.fact.operationId }),
    )
  }
  /** The server has it, or the user throws it away. */
  async function strikeOut(operationId: string): Promise<void> {
    facts.value = facts.value.filter(({ fact }) => fact.operationId !== operationId)
    await attempt((store) => store.delete(operationId))
  }
  async function attempt<Result>(
    work: (store: IDBObjectStore) => IDBRequest<Result>,
  ): Promise<Result | undefined> {
    try {
      return await onFacts(work)
    } catch {
      // The browser withholds its database here: the facts stay in the page, and the page says so.
      isLasting.value = false
      return undefined
    }
  }

  return { facts, isLasting, isOutOfReach, waiting, keptOf, load, keep, sendKept, strikeOut }
})

function keptFrom(row: unknown): KeptFact | undefined {
  if (typeof row !== 'object' || row === null) return undefined
  const { listId, fact, refused } = row as Record<string, unknown>
  const read = CutFactRequest.safeParse(fact)
  if (typeof listId !== 'string' || !read.success) return undefined
  return { listId, fact: read.data, refused: typeof refused === 'string' ? refused : null }
}

async function onFacts<Result>(work: (store: IDBObjectStore) => IDBRequest<Result>): Promise<Result> {
  const database = await opened()
  try {
    const transaction = database.transaction(FACTS, 'readwrite')
    return await answerOf(work(transaction.objectStore(FACTS)))
  } finally {
    database.close()
  }
}

function opened(): Promise<IDBDatabase> {
  const request = indexedDB.open(DATABASE, 1)
  request.onupgradeneeded = () => request.result.createObjectStore(FACTS, { keyPath: 'operationId' })
  return answerOf(request)
}

const answerOf = <Result>(request: IDBRequest<Result>): Promise<Result> =>
  new Promise((resolve, reject) => {
    request.onsuccess = () => resolve(request.result)
    request.onerror = () => reject(request.error ?? new Error('the browser’s database did not answer'))
  })
