import type { DraftStepInput } from '@shared/contracts'
import { Failure } from '@shared/failure'
import {
  batchInHand,
  batchInTrouble,
  batchSaved,
  hasUnsaved,
  keptOf,
  mineOnTop,
  sessionFrom,
  baseOf,
} from './draft-session'
import type { DraftBase, DraftSession, DraftWithHistory, KeptWork, Trouble } from './draft-session'

/** What a saver needs of the world around it. */
export interface SaverPorts {
  readonly send: (request: {
    readonly version: number
    readonly operationId: string
    readonly steps: DraftStepInput[]
  }) => Promise<DraftBase>
  /** The draft that a stale refusal carries. */
  readonly currentOf: (failure: Failure) => DraftWithHistory | undefined
  readonly keep: (work: KeptWork | undefined) => void
  readonly makeOperationId: () => string
  /** Calls back after so many ms; gives the way to call it off. */
  readonly after: (ms: number, act: () => void) => () => void
  readonly onChange: (session: DraftSession) => void
}

/** Drawing pauses this long before it is sent, ms, so that one stroke is one save. */
export const SAVE_PAUSE_MS = 400
/** Waits between tries while the server is out of reach, ms; the last one holds. */
const RETRY_MS = [1000, 2000, 4000, 8000] as const

export interface DraftSaver {
  readonly session: () => DraftSession
  /** Takes the session a function further, shows it, keeps it, and sees that it is sent. */
  readonly advance: (step: (session: DraftSession) => DraftSession) => void
  /** Tries now instead of at the next turn; resolves when nothing is on its way. */
  readonly flush: () => Promise<void>
  /** After a refusal: draws one's own steps on what the server has; gives the names of those that could not be. */
  readonly putMineOnTop: () => readonly string[]
  readonly throwMineAway: (current: DraftBase) => void
  readonly stop: () => void
}

/** Sends what is drawn, in order and one batch at a time, and keeps all that is not saved where a reload finds it. */
export function draftSaver(first: DraftSession, ports: SaverPorts): DraftSaver {
  let session = first
  let callOff: (() => void) | undefined
  let running: Promise<void> | undefined
  let tries = 0
  let isStopped = false

  function become(next: DraftSession): void {
    session = next
    ports.keep(hasUnsaved(next) ? keptOf(next) : undefined)
    ports.onChange(next)
  }
  function sendAfter(ms: number): void {
    callOff?.()
    callOff = isStopped ? undefined : ports.after(ms, () => void flush())
  }
  /** A refusal waits for a person; everything else is tried by itself. */
  const isHeld = (): boolean => session.trouble?.kind === 'stale' || session.trouble?.kind === 'refused'

  async function flush(): Promise<void> {
    callOff?.()
    running ??= sendAll().finally(() => (running = undefined))
    await running
  }
  async function sendAll(): Promise<void> {
    while (hasUnsaved(session) && !isHeld() && !isStopped) {
      become(batchInHand(session, ports.makeOperationId))
      if (!(await sendOne())) return
    }
  }
  async function sendOne(): Promise<boolean> {
    const batch = session.sending
    if (batch === undefined) return false
    try {
      const steps = batch.steps.map(({ step }) => step)
      const answer = await ports.send({ version: batch.version, operationId: batch.operationId, steps })
      tries = 0
      become(batchSaved(session, answer))
      return true
    } catch (error) {
      const trouble = troubleOf(error)
      become(batchInTrouble(session, trouble))
      if (trouble.kind === 'out-of-reach') {
        sendAfter(RETRY_MS[Math.min(tries, RETRY_MS.length - 1)] ?? SAVE_PAUSE_MS)
        tries += 1
      }
      return false
    }
  }
  function troubleOf(error: unknown): Trouble {
    if (!(error instanceof Failure)) throw error
    const current = ports.currentOf(error)
    if (current !== undefined) return { kind: 'stale', current }
    const says = error.details.says ?? error.code
    return WAITS_FOR_ANOTHER_TRY.has(error.code) ? { kind: 'out-of-reach', says } : { kind: 'refused', says }
  }

  return {
    session: () => session,
    advance(step) {
      const next = step(session)
      if (next === session) return
      become(next)
      if (hasUnsaved(next) && running === undefined && !isHeld()) sendAfter(SAVE_PAUSE_MS)
    },
    flush,
    putMineOnTop() {
      const { trouble } = session
      if (trouble?.kind !== 'stale') return []
      const { session: next, lost } = mineOnTop(session, trouble.current)
      become(next)
      sendAfter(0)
      return lost
    },
    throwMineAway(current) {
      become(sessionFrom(baseOf(current)))
    },
    stop() {
      isStopped = true
      callOff?.()
    },
  }
}

/** Nothing is wrong with what was sent: the server, the network or the sign-in will be there again. */
const WAITS_FOR_ANOTHER_TRY: ReadonlySet<string> = new Set([
  'out-of-service',
  'too-many-tries',
  'not-signed-in',
])
