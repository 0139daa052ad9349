import { defineStore } from 'pinia'
import { v7 as newId } from 'uuid'
import { computed, shallowRef } from 'vue'
import { Failure } from '@shared/failure'
import { applyEdit } from '@shared/section'
import type { SectionEdit } from '@shared/section'
import { currentDraftOf, readDraft, sendDraftEdits } from '@/api/drafts'
import { draftSaver } from '@/board/draft-saver'
import type { DraftSaver } from '@/board/draft-saver'
import {
  baseOf,
  hasUnsaved,
  isAwaitingServer,
  redoName,
  sessionFrom,
  sessionFromKept,
  stepRedone,
  stepTaken,
  stepUndone,
  undoName,
  unsavedNames,
} from '@/board/draft-session'
import type { DraftSession, KeptWork } from '@/board/draft-session'
import { keepWork, takeKeptWork } from '@/board/kept-work'

/** One per page; a reload is the same page. */
const PAGE = (sessionStorage.getItem('listel-page') ?? newId()).toString()
sessionStorage.setItem('listel-page', PAGE)

/** The draft that is open on the board, with its history and all that is not saved yet. */
export const useOpenDraftStore = defineStore('open-draft', () => {
  const commissionId = shallowRef<string>()
  const session = shallowRef<DraftSession>()
  /** A step that is being tried on the drawing, a drag for one; it is no part of the history yet. */
  const preview = shallowRef<SectionEdit>()
  /** Names of one's own steps that found no ground when they were put on top of another's. */
  const lost = shallowRef<readonly string[]>([])
  /** Whether unsaved work would outlive this page. */
  const isKeptHere = shallowRef(true)
  let saver: DraftSaver | undefined

  const document = computed(() => {
    const drawn = session.value?.document
    return drawn && preview.value ? applyEdit(drawn, preview.value).draft : drawn
  })
  const trouble = computed(() => session.value?.trouble)
  const isHeld = computed(() => trouble.value?.kind === 'stale' || trouble.value?.kind === 'refused')
  const canDraw = computed(
    () => session.value !== undefined && !isHeld.value && !isAwaitingServer(session.value),
  )
  const undo = computed(() => session.value && undoName(session.value))
  const redo = computed(() => session.value && redoName(session.value))
  const isUnsaved = computed(() => session.value !== undefined && hasUnsaved(session.value))
  const unsaved = computed(() => (session.value ? unsavedNames(session.value) : []))

  /** Opens the draft of a commission, with what this device kept of it; a server out of reach is told on unless there is such work. */
  async function open(id: string): Promise<void> {
    if (commissionId.value === id && isUnsaved.value) return
    close()
    const kept = takeKeptWork(localStorage, id, PAGE, Date.now())
    const first = kept === undefined ? sessionFrom(baseOf(await readDraft(id))) : sessionFromKept(kept)
    commissionId.value = id
    session.value = first
    saver = saverOf(id, first)
    if (kept !== undefined) await saver.flush()
  }
  function saverOf(id: string, first: DraftSession): DraftSaver {
    const own = draftSaver(first, {
      send: (request) => sendDraftEdits(id, request),
      currentOf: currentDraftOf,
      keep: (work) => keep(id, work),
      makeOperationId: newId,
      after: (ms, act) => {
        const timer = setTimeout(act, ms)
        return () => clearTimeout(timer)
      },
      onChange: (next) => {
        if (saver === own) session.value = next
      },
    })
    return own
  }
  function keep(id: string, work: KeptWork | undefined): void {
    try {
      keepWork(localStorage, id, PAGE, work, Date.now())
      isKeptHere.value = true
    } catch (error) {
      // The device has no room left: the work lives on in the page, and the person is told so.
      if (!(error instanceof DOMException)) throw error
      isKeptHere.value = false
    }
  }
  function close(): void {
    void saver?.flush()
    saver?.stop()
    saver = undefined
    session.value = undefined
    commissionId.value = undefined
    preview.value = undefined
    lost.value = []
  }

  /** Draws a step: at once here, soon on the server. */
  function take(name: string, edit: SectionEdit): void {
    preview.value = undefined
    if (canDraw.value) saver?.advance((now) => stepTaken(now, name.slice(0, 200), edit))
  }
  const stepBack = (): void => stepThrough(stepUndone)
  const stepForward = (): void => stepThrough(stepRedone)
  function stepThrough(step: (now: DraftSession) => DraftSession): void {
    if (!canDraw.value) return
    saver?.advance(step)
    if (session.value !== undefined && isAwaitingServer(session.value)) void saver?.flush()
  }
  function putMineOnTop(): void {
    lost.value = saver?.putMineOnTop() ?? []
  }
  async function throwMineAway(): Promise<void> {
    const id = commissionId.value
    if (id === undefined) return
    saver?.throwMineAway(trouble.value?.kind === 'stale' ? trouble.value.current : await readDraft(id))
  }
  /** What others drew while this page lay idle. */
  async function refresh(): Promise<void> {
    const id = commissionId.value
    if (id === undefined || isUnsaved.value) return
    try {
      const current = await readDraft(id)
      if (isUnsaved.value || commissionId.value !== id || current.version === session.value?.base.version)
        return
      saver?.throwMineAway(current)
    } catch (error) {
      // What is drawn stays as it is; the next save will say if the server is still out of reach.
      if (!(error instanceof Failure)) throw error
    }
  }
  const flush = async (): Promise<void> => saver?.flush()

  return {
    commissionId,
    session,
    document,
    preview,
    trouble,
    lost,
    isKeptHere,
    canDraw,
    isUnsaved,
    unsaved,
    undo,
    redo,
    open,
    close,
    take,
    stepBack,
    stepForward,
    putMineOnTop,
    throwMineAway,
    refresh,
    flush,
  }
})
