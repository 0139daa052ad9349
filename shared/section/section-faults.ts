import type { Fault } from '@shared/failure'
import type { GessoStretch, Section } from './document'
import { basisFaultOf } from './member-faults'
import { saidMm } from './saying'

/** mm. Ten metres: no moulding is as great, and geometry is sound well beyond it. */
const GREATEST_SIZE = 10_000

/** Every number, wherever it stands, must be finite and of a size that a moulding can have. */
export function numberFaultsOf(section: Section): readonly Fault[] {
  const faults: Fault[] = []
  collectNumberFaults(section, '', faults)
  return faults
}

function collectNumberFaults(value: unknown, path: string, faults: Fault[]): void {
  if (typeof value === 'number') {
    if (!Number.isFinite(value))
      faults.push({ path, code: 'not-finite', says: `${path} is ${value}; it must be a finite number.` })
    else if (Math.abs(value) > GREATEST_SIZE)
      faults.push({
        path,
        code: 'out-of-range',
        says: `${path} is ${value}; it must be within ±${GREATEST_SIZE}.`,
      })
  } else if (typeof value === 'object' && value !== null) {
    for (const [name, part] of Object.entries(value)) collectNumberFaults(part, `${path}/${name}`, faults)
  }
}

/** Rules on the section's own fields; numbers are known to be finite. */
export function frameFaultsOf(section: Section): readonly Fault[] {
  return [
    ...memberCountFaults(section),
    ...sightEdgeFaults(section),
    ...rebateFaults(section),
    ...backSplayFaults(section),
    ...gessoFaults(section),
    ...notNegative('/tolerance', 'The tolerance', section.tolerance),
  ]
}

const fault = (path: string, code: string, says: string): Fault => ({ path, code, says })

function notNegative(path: string, name: string, value: number): readonly Fault[] {
  return value >= 0 ? [] : [fault(path, 'negative', `${name} is ${value} mm; it must be 0 or more.`)]
}

function memberCountFaults({ members }: Section): readonly Fault[] {
  return members.length > 0
    ? []
    : [fault('/members', 'no-members', 'The section has no members yet; put in at least one.')]
}

function sightEdgeFaults({ sightEdgeHeight, basis }: Section): readonly Fault[] {
  const faults: Fault[] = []
  if (!(sightEdgeHeight > 0))
    faults.push(
      fault(
        '/sightEdgeHeight',
        'sight-edge-too-low',
        `The sight edge is ${sightEdgeHeight} mm high; it must be more than 0.`,
      ),
    )
  const says = basisFaultOf(basis?.sightEdgeHeight)
  if (says !== undefined)
    faults.push(
      fault(
        '/basis/sightEdgeHeight/plusMinus',
        'plus-minus-negative',
        `The sight edge's height, basis: ${says}`,
      ),
    )
  return faults
}

/** x and y of the last break by the members' sizes alone, mm. */
function backEdgeOf({ members, sightEdgeHeight }: Section): { readonly x: number; readonly y: number } {
  return members.reduce((at, { width, rise }) => ({ x: at.x + width, y: at.y + rise }), {
    x: 0,
    y: sightEdgeHeight,
  })
}

function rebateFaults(section: Section): readonly Fault[] {
  const { rebate, sightEdgeHeight, members } = section
  const faults = [
    ...notNegative('/rebate/width', 'The rebate width', rebate.width),
    ...notNegative('/rebate/depth', 'The rebate depth', rebate.depth),
  ]
  if (rebate.depth > 0 && rebate.depth >= sightEdgeHeight)
    faults.push(
      fault(
        '/rebate/depth',
        'rebate-too-deep',
        `The rebate is ${rebate.depth} mm deep and the sight edge ${sightEdgeHeight} mm high; the rebate must be less deep than the sight edge is high.`,
      ),
    )
  const { x } = backEdgeOf(section)
  if (members.length > 0 && rebate.width > 0 && rebate.width >= x)
    faults.push(
      fault(
        '/rebate/width',
        'rebate-too-wide',
        `The rebate is ${rebate.width} mm wide and the section ${saidMm(x)} mm; the rebate must be narrower than the section.`,
      ),
    )
  return faults
}

function backSplayFaults(section: Section): readonly Fault[] {
  const { backSplay, rebate, members } = section
  const faults = [
    ...notNegative('/backSplay/x', 'The back splay', backSplay.x),
    ...notNegative('/backSplay/height', 'The height of the back splay', backSplay.height),
  ]
  if (members.length === 0) return faults
  const { x, y } = backEdgeOf(section)
  const room = x - rebate.width
  if (backSplay.x > 0 && backSplay.x >= room)
    faults.push(
      fault(
        '/backSplay/x',
        'back-splay-too-wide',
        `The back splay takes ${backSplay.x} mm of the back; it must leave some of the ${saidMm(room)} mm between rebate and back edge.`,
      ),
    )
  if (backSplay.height > 0 && backSplay.height > y)
    faults.push(
      fault(
        '/backSplay/height',
        'back-splay-too-high',
        `The back splay starts ${backSplay.height} mm above the wall; the back edge is only ${saidMm(y)} mm high.`,
      ),
    )
  return faults
}

function gessoFaults({ gesso, members }: Section): readonly Fault[] {
  if (typeof gesso === 'number') return notNegative('/gesso', 'The gesso', gesso)
  return gesso.flatMap((stretch, index) => {
    const path = `/gesso/${index}`
    const faults = [...notNegative(`${path}/thickness`, 'The gesso', stretch.thickness)]
    if (!isStretch(stretch, members.length))
      faults.push(
        fault(
          path,
          'stretch-out-of-range',
          `The gesso runs from break ${stretch.from} to break ${stretch.to}; it must run from one break to a later one, 0 to ${members.length}.`,
        ),
      )
    const other = gesso.findIndex(
      (earlier, place) => place < index && earlier.from < stretch.to && stretch.from < earlier.to,
    )
    if (other !== -1)
      faults.push(
        fault(
          path,
          'stretches-overlap',
          `The gesso from break ${stretch.from} to ${stretch.to} lies over that of stretch ${other + 1}; stretches must not overlap.`,
        ),
      )
    return faults
  })
}

function isStretch({ from, to }: GessoStretch, last: number): boolean {
  return Number.isInteger(from) && Number.isInteger(to) && from >= 0 && from < to && to <= last
}
