import { DraftSectionSchema, DraftStep, SectionEditSchema } from '@shared/contracts'
import type { Batch, KeptWork, QueuedStep } from './draft-session'

/** A place that outlives the page: the browser's local storage, or a test's. */
export type KeepingPlace = Pick<Storage, 'getItem' | 'setItem' | 'removeItem' | 'key' | 'length'>

interface KeptRecord extends KeptWork {
  /** When it was last written, ms since 1970. */
  readonly at: number
}

const PREFIX = 'listel-unsaved'
/** A page that still lives writes again well within this, ms; after it, its work is taken for left behind. */
const LEFT_BEHIND_MS = 30_000

const nameOf = (commissionId: string, page: string): string => `${PREFIX}:${commissionId}:${page}`

export function keepWork(
  place: KeepingPlace,
  commissionId: string,
  page: string,
  work: KeptWork | undefined,
  at: number,
): void {
  if (work === undefined) return place.removeItem(nameOf(commissionId, page))
  const record: KeptRecord = { ...work, at }
  place.setItem(nameOf(commissionId, page), JSON.stringify(record))
}

/** This page's own unsaved work, or else what a page that is gone has left; it is this page's from then on. */
export function takeKeptWork(
  place: KeepingPlace,
  commissionId: string,
  page: string,
  now: number,
): KeptWork | undefined {
  const own = readRecord(place.getItem(nameOf(commissionId, page)))
  if (own !== undefined) return own
  const names = Array.from({ length: place.length }, (_, index) => place.key(index))
  for (const name of names) {
    if (name === null || !name.startsWith(`${PREFIX}:${commissionId}:`)) continue
    const record = readRecord(place.getItem(name))
    if (record === undefined || now - record.at < LEFT_BEHIND_MS) continue
    place.removeItem(name)
    return record
  }
  return undefined
}

/** What was kept, if this version of the page can still read it. */
function readRecord(text: string | null): KeptRecord | undefined {
  if (text === null) return undefined
  const read = jsonOf(text)
  if (!isRecord(read) || !isRecord(read.base) || !Array.isArray(read.waiting)) return undefined
  const { base, waiting, sending, at } = read
  const document = DraftSectionSchema.safeParse(base.document)
  const steps = stepsFrom(waiting)
  const batch = sending === undefined ? undefined : batchFrom(sending)
  if (!document.success || steps === undefined || (sending !== undefined && batch === undefined))
    return undefined
  if (typeof base.version !== 'number' || typeof at !== 'number') return undefined
  return {
    base: {
      version: base.version,
      document: document.data,
      undo: nameIn(base.undo),
      redo: nameIn(base.redo),
    },
    waiting: steps,
    sending: batch,
    at,
  }
}

function batchFrom(value: unknown): Batch | undefined {
  if (!isRecord(value) || !Array.isArray(value.steps)) return undefined
  const { operationId, version } = value
  const steps = stepsFrom(value.steps)
  if (typeof operationId !== 'string' || typeof version !== 'number' || steps === undefined) return undefined
  return { operationId, version, steps }
}

function stepsFrom(values: readonly unknown[]): QueuedStep[] | undefined {
  const steps: QueuedStep[] = []
  for (const value of values) {
    if (!isRecord(value)) return undefined
    const step = DraftStep.safeParse(value.step)
    const applied = value.applied === undefined ? undefined : SectionEditSchema.safeParse(value.applied)
    if (!step.success || applied?.success === false) return undefined
    steps.push({ step: step.data, ...(applied === undefined ? {} : { applied: applied.data }) })
  }
  return steps
}

const nameIn = (value: unknown): string | null => (typeof value === 'string' ? value : null)
const isRecord = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null

function jsonOf(text: string): unknown {
  try {
    return JSON.parse(text) as unknown
  } catch {
    // Written by something else under our name: there is nothing of ours to take up.
    return undefined
  }
}
