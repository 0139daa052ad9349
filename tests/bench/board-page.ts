import { applyEdit, checksOf, measuresOf, sectionFromDraft } from '@shared/section'
import type { DraftSection } from '@shared/section'
import { drawnSection } from '@/board/drawn-section'
import { sceneOn } from '@/board/scene'
import type { SceneModel } from '@/board/scene'
import { fittedTo } from '@/board/view-transform'

/** What one edit took, ms: until the canvas is painted, the figures and checks after it, and until the frame was handed to the screen. */
export interface EditTimes {
  readonly paint: number
  readonly figures: number
  readonly frame: number
}

const PALETTE = {
  gesso: '#fbf8f2',
  gesso2: '#f4eee3',
  line: '#d9cfbd',
  ink: '#26211b',
  ink2: '#61574a',
  bole: '#8a3324',
  boleTint: '#efd9d0',
  leaf: '#a87b1e',
  slate: '#34566f',
  madder: '#a4123f',
}
const SIZE = { width: 860, height: 480 }
const NAMES = { glazing: '', airGap: '', thickness: '', backing: '', fixings: '' }

const nextFrame = () => new Promise<number>((resolve) => requestAnimationFrame(resolve))

/** Widens and narrows one member after another, each edit drawn and measured as the board does it. */
async function timeEdits(first: DraftSection, edits: number): Promise<EditTimes[]> {
  const canvas = document.createElement('canvas')
  canvas.style.width = `${SIZE.width}px`
  canvas.style.height = `${SIZE.height}px`
  document.body.append(canvas)
  const scene = sceneOn(canvas, PALETTE)
  const { breaks } = drawnSection(first)
  const extent = {
    min: { x: 0, y: 0 },
    max: { x: Math.max(...breaks.map(({ x }) => x)), y: Math.max(...breaks.map(({ y }) => y)) },
  }
  const view = fittedTo(extent, SIZE, { left: 90, right: 50, top: 100, bottom: 40 })
  let draft = first
  const times: EditTimes[] = []
  for (let step = 0; step < edits; step += 1) {
    await nextFrame()
    const member = draft.members[step % draft.members.length]
    if (member === undefined) break
    const by = step % 2 === 0 ? 0.05 : -0.05
    const start = performance.now()
    draft = applyEdit(draft, {
      act: 'change',
      key: member.key,
      member: { ...member, width: member.width + by },
    }).draft
    scene.paint(modelOf(draft, member.key), view, SIZE)
    const painted = performance.now()
    const section = sectionFromDraft(draft)
    measuresOf(section)
    checksOf(section)
    const measured = performance.now()
    await nextFrame()
    times.push({ paint: painted - start, figures: measured - painted, frame: performance.now() - start })
  }
  scene.close()
  return times
}

const modelOf = (draft: DraftSection, selected: string): SceneModel => ({
  drawn: drawnSection(draft),
  selected,
  selectedBreak: selected,
  stack: [],
  stackNames: NAMES,
  wallName: 'wall',
  labels: [],
  place: undefined,
  photograph: undefined,
  isLaying: false,
  unit: 'mm',
})

Object.assign(globalThis, { timeEdits })
