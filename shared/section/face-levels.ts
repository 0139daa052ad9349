import { monotonePiecesOf, parametersAt, pointAt } from '@shared/geometry'
import type { Path, Point, Segment } from '@shared/geometry'

/** mm. A piece that rises or falls less is level; a peak or valley less high is none. */
const LEVEL_MM = 1e-6

/** A raised part of the face, or a sunk one: as wide as it is at the level of the lower of its two sides, and as high (or deep) from there. */
export interface Relief {
  readonly widthMm: number
  readonly heightMm: number
  /** Its top, or its bottom. */
  readonly at: Point
}

/** Pieces from..to (exclusive) of one vertical sense; level pieces belong to the run before them. */
interface Run {
  readonly sense: number
  readonly pieces: readonly Segment[]
}

/** Parts of the face that stand above what lies on both sides of them: a slot of the knife. One that begins or ends at an edge is open. */
export function raisedPartsOf(face: Path): readonly Relief[] {
  const runs = runsOf(face)
  return runs.flatMap((rise, index) => {
    const fall = runs[index + 1]
    if (rise.sense !== 1 || fall?.sense !== -1) return []
    const isOpen = index === 0 || (index + 2 === runs.length && !endsLevel(fall))
    return isOpen ? [] : reliefBetween(rise, fall, 1)
  })
}

function endsLevel({ pieces }: Run): boolean {
  const last = pieces.at(-1)
  return last !== undefined && Math.abs(last.end.y - last.start.y) <= LEVEL_MM
}

/** Parts of the face that lie below what is on both sides of them: a tooth of the knife. */
export function sunkPartsOf(face: Path): readonly Relief[] {
  const runs = runsOf(face)
  return runs.flatMap((fall, index) => {
    const rise = runs[index + 1]
    return fall.sense === -1 && rise?.sense === 1 ? reliefBetween(fall, rise, -1) : []
  })
}

function runsOf(face: Path): readonly Run[] {
  const runs: { sense: number; pieces: Segment[] }[] = []
  for (const piece of face.flatMap((segment) => monotonePiecesOf(segment, 'y'))) {
    const climb = piece.end.y - piece.start.y
    const sense = Math.abs(climb) <= LEVEL_MM ? 0 : Math.sign(climb)
    const last = runs.at(-1)
    if (last && (sense === 0 || last.sense === sense)) last.pieces.push(piece)
    else runs.push({ sense, pieces: [piece] })
  }
  return runs
}

/** sense 1: up and down again, a raised part; −1: down and up again, a sunk one. */
function reliefBetween(first: Run, second: Run, sense: 1 | -1): readonly Relief[] {
  const from = first.pieces[0]?.start
  const to = second.pieces.findLast((piece) => Math.abs(piece.end.y - piece.start.y) > LEVEL_MM)?.end
  const at = second.pieces[0]?.start
  if (!from || !to || !at) return []
  const level = sense === 1 ? Math.max(from.y, to.y) : Math.min(from.y, to.y)
  const heightMm = sense * (at.y - level)
  const left = crossingOf(first.pieces, level)
  const right = crossingOf([...second.pieces].reverse(), level)
  if (heightMm <= LEVEL_MM || !left || !right) return []
  return [{ widthMm: right.x - left.x, heightMm, at }]
}

/** Where a run passes a level; of several places (a level piece) the first. */
function crossingOf(pieces: readonly Segment[], level: number): Point | undefined {
  for (const piece of pieces) {
    if (Math.abs(piece.end.y - piece.start.y) <= LEVEL_MM) continue
    for (const end of [piece.start, piece.end]) if (Math.abs(end.y - level) <= LEVEL_MM) return end
    const [t] = parametersAt(piece, 'y', level)
    if (t !== undefined) return pointAt(piece, t)
  }
  return undefined
}
