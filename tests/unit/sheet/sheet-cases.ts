import { measuresOf, withDefaults } from '@shared/section'
import type { Member, PartialSection } from '@shared/section'
import type { CutListInput, SheetInput } from '@shared/sheet'

/** A plain fillet, splay, ovolo … in turn, so that a face of any number of members stays lawful: it climbs and never turns back. */
export function climbingMembers(count: number, widthMm: number): Member[] {
  return Array.from({ length: count }, (_, index): Member => {
    const rise = 0.6 * widthMm
    switch (index % 5) {
      case 0:
        return { kind: 'fillet', width: widthMm, rise: 0 }
      case 1:
        return { kind: 'ovolo', width: widthMm, rise }
      case 2:
        return { kind: 'fillet', width: 0, rise: rise / 2 }
      case 3:
        return { kind: 'cyma-recta', width: widthMm, rise }
      default:
        return { kind: 'splay', width: widthMm, rise }
    }
  })
}

export function sectionOf(partial: Partial<PartialSection> & { members: PartialSection['members'] }) {
  return withDefaults({ sightEdgeHeight: 30, rebate: { width: 8, depth: 24 }, ...partial })
}

/** A sheet of an approved issue with everything said that can be said. */
export function aSheetInput(changes: Partial<SheetInput> = {}): SheetInput {
  const section = changes.section ?? sectionOf({ members: climbingMembers(12, 6), gesso: 0.6 })
  return {
    section,
    measures: measuresOf(section),
    unit: 'mm',
    vocabulary: 'moulding',
    workshop: 'Quayside Frames',
    commissionNumber: 'C-0007',
    title: 'Harbour at low water',
    client: 'The Northgate collection',
    accession: 'NC 1912.4',
    state: {
      kind: 'issue',
      letter: 'B',
      sha256: '9f2c41d7'.repeat(8),
      putForwardBy: 'Ines Calder',
      putForwardOn: '2026-11-20',
      approval: { by: 'M. Okafor-Lindqvist', on: '2026-11-24' },
    },
    mill: {
      orderNumber: 'K-0012',
      mill: 'Weir Lane Mouldings',
      timber: 'lime, kiln dried',
      moisture: '8 to 10 %',
      grade: 'clear, straight grained',
      jointing: 'no finger joints',
      sanding: 'to 180 grit on the face',
      quantity: '6 lengths of 3660, and 2 set-up pieces',
      firstOff: '300 long, posted before anything is run',
      seenFrom: 'the end that leaves the machine last',
      lies: 'flat back on the table, face up',
      guideEdge: 'back edge',
      surfacesCut: 'the face from the sight edge to the back edge',
      wantedBy: '2027-01-15',
      notes: 'Wrap in pairs, face to face.',
    },
    ...changes,
  }
}

export function aCutList(changes: Partial<CutListInput> = {}): CutListInput {
  const cut = (side: string, longPointMm: number, atMm: number) => ({
    ...{ frame: 'frame 1', side, longPointMm, atMm },
    mitreDeg: 45,
  })
  const rail = (side: string, longPointMm: number) => ({
    ...{ frame: 'frame 1', side, count: 1, longPointMm },
    rebateMm: longPointMm - 202,
    sightMm: longPointMm - 220,
    mitreDeg: 45,
  })
  return {
    unit: 'mm',
    vocabulary: 'moulding',
    workshop: 'Quayside Frames',
    commissionNumber: 'C-0007',
    title: 'Harbour at low water',
    issueLetter: 'B',
    sha256: '9f2c41d7'.repeat(8),
    listNumber: 2,
    printedOn: '2026-12-01',
    trueWidthMm: 110,
    batch: 'B-12',
    saw: { name: 'Mitre saw, east bench', kerfMm: 3.2, marginMm: 2, shortestSafeMm: 200 },
    rails: [rail('top', 1119), rail('right', 815), rail('bottom', 1119), rail('left', 815)],
    lengths: [
      {
        ...{ name: 'rack R-104', lengthMm: 3660, startTrimMm: 75, offcutMm: 514.4, offcutMark: 'R-131' },
        cuts: [cut('top', 1119, 75), cut('bottom', 1119, 1200.5), cut('left', 815, 2326.1)],
      },
      {
        name: 'to be ordered',
        lengthMm: 2440,
        startTrimMm: 75,
        cuts: [cut('right', 815, 75)],
        offcutMm: 1545.5,
      },
    ],
    ...changes,
  }
}
