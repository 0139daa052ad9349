import type { default as Library } from 'paper'
import core from 'paper/dist/paper-core.js'
import {
  areaMomentsOf,
  boundsOf,
  lengthOf,
  pointAt,
  reversed,
  type Path,
  type Segment,
} from '@shared/geometry'
import { faceOf, measuresOf, outlineOf, withDefaults } from '@shared/section'
import type { Member, Section } from '@shared/section'

const paper = core as unknown as typeof Library

/** One measured figure; peer is the same work in a general-purpose library, ratio value / peer. */
export interface BenchRow {
  readonly name: string
  readonly value: number
  readonly unit: string
  readonly peer?: number
  readonly ratio?: number
}

const REPEATS = 400
const WARM_UP = 200

/** Members of every curved kind in turn; the same each time. */
const CYCLE: readonly Member[] = [
  { kind: 'fillet', width: 3, rise: 0 },
  { kind: 'ovolo', width: 4, rise: 3 },
  { kind: 'fillet', width: 2, rise: 0 },
  { kind: 'scotia', width: 5, rise: -1 },
  { kind: 'torus', width: 5, rise: -1 },
  { kind: 'cyma-recta', width: 6, rise: 4 },
  { kind: 'bead', width: 2, rise: 0 },
  { kind: 'cavetto', width: 4, rise: -3 },
  { kind: 'thumb', width: 3, rise: -2 },
  { kind: 'quirk', width: 1.5, rise: 0, depth: 1, shape: 'square' },
]

export function benchSection(count: number): Section {
  const members = Array.from({ length: count }, (_, index) => CYCLE[index % CYCLE.length] as Member)
  return withDefaults({ sightEdgeHeight: 40, rebate: { width: 8, depth: 20 }, members })
}

function medianMsOf(work: () => unknown): number {
  for (let i = 0; i < WARM_UP; i += 1) work()
  const times = Array.from({ length: REPEATS }, () => {
    const start = performance.now()
    work()
    return performance.now() - start
  }).sort((a, b) => a - b)
  return times[Math.floor(REPEATS / 2)] as number
}

/** The library's own path of an outline, made anew: it keeps what it has measured. */
function libraryPathOf(path: Path): InstanceType<typeof paper.Path> {
  const own = new paper.Path({ insert: false })
  const start = path[0]?.start ?? { x: 0, y: 0 }
  own.moveTo(new paper.Point(start.x, start.y))
  for (const segment of path) addTo(own, segment)
  return own
}

function addTo(own: InstanceType<typeof paper.Path>, segment: Segment): void {
  const to = new paper.Point(segment.end.x, segment.end.y)
  if (segment.kind === 'line') own.lineTo(to)
  else {
    const { x, y } = pointAt(segment, 0.5)
    own.arcTo(new paper.Point(x, y), to)
  }
}

/** Median of the library measuring a fresh path; making it is not counted. */
function libraryMsOf(path: Path): number {
  const measure = (own: InstanceType<typeof paper.Path>): number => own.area + own.length + own.bounds.width
  for (let i = 0; i < WARM_UP; i += 1) measure(libraryPathOf(path))
  const times = Array.from({ length: REPEATS }, () => {
    const own = libraryPathOf(path)
    const start = performance.now()
    measure(own)
    return performance.now() - start
  }).sort((a, b) => a - b)
  return times[Math.floor(REPEATS / 2)] as number
}

/** Area, first and second moments, width, depth and girth of a section from its members on, each time anew. */
function figuresOf(section: Section): number {
  const outline = outlineOf(section)
  const moments = areaMomentsOf(reversed(outline))
  const { min, max } = boundsOf(outline)
  const girth = lengthOf(faceOf(section).path)
  return moments.area + moments.firstX + moments.centralXX + max.x - min.x + max.y - min.y + girth
}

/** Milliseconds for the figures of 12 and 200 members, beside the library's area, length and bounds; and for everything that is measured. */
export async function run(): Promise<BenchRow[]> {
  paper.setup(new paper.Size(1, 1))
  return [12, 200].flatMap((count) => {
    const section = benchSection(count)
    const gessoed = { ...section, gesso: 0.3 }
    const value = medianMsOf(() => figuresOf(section))
    const peer = libraryMsOf(outlineOf(section))
    const what = `area, moments, width, depth, girth of ${count} members`
    return [
      { name: what, value, unit: 'ms', peer, ratio: value / peer },
      { name: `all measures of ${count} members`, value: medianMsOf(() => measuresOf(section)), unit: 'ms' },
      {
        name: `all measures of ${count} members under gesso`,
        value: medianMsOf(() => measuresOf(gessoed)),
        unit: 'ms',
      },
    ]
  })
}
