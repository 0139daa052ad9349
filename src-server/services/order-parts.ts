import type { OrderInput, OutputOf, OrderRequest } from '@shared/contracts'
import { invalid } from '@shared/contracts'
import { Failure } from '@shared/failure'
import { headRunningOf, knifeHeadOf } from '@shared/answer'
import { clampCheckOf, knifeCautionsOf, speedChecksOf } from '@shared/knife'
import { checksOf, woodFaceOf } from '@shared/section'
import type { Section } from '@shared/section'
import type { MillText, SheetInput } from '@shared/sheet'
import { printLength } from '@shared/units'
import type { LengthUnit } from '@shared/units'
import type { Commission } from '../models/commission'
import type { Mill } from '../models/person'
import type { Issue } from '../models/review'
import type { MillCard } from '../models/workshop'
import { requireMill } from './mills'
import { sectionOfIssue } from './require-issue'
import { sheetInputOf } from './sheets'
import { readSettings } from './settings'
import type { Tx } from './transaction'

/** Everything that an order rests on, found and found good. */
export interface OrderParts {
  readonly issue: Issue
  readonly commission: Commission
  readonly section: Section
  readonly mill: Mill
  readonly card: MillCard
  readonly document: OrderInput
  readonly sheet: SheetInput
}

interface Wanted {
  readonly issue: Issue
  readonly commission: Commission
  readonly isLatest: boolean
  readonly request: Pick<OutputOf<typeof OrderRequest>, 'millId' | 'document'>
  readonly number: string
}

/** Only an approved issue that is also the latest is ordered, and only when no check of the mill's own card says stop. */
export async function requireOrderParts(tx: Tx, wanted: Wanted): Promise<OrderParts> {
  const { issue, commission, isLatest, request, number } = wanted
  if (issue.state !== 'approved' || !isLatest) {
    throw new Failure('not-ready', {
      says: isLatest
        ? `Issue ${issue.letter} is ${issue.state.replace('-', ' ')}; only an approved issue can be ordered.`
        : `Issue ${issue.letter} is not the latest any more; order from the latest approved issue.`,
    })
  }
  const { mill, card } = await requireMill(request.millId, tx)
  if (mill.state !== 'active')
    throw invalid([
      { path: '/millId', code: 'archived', says: 'names a mill that is archived; choose another.' },
    ])
  if (card === null) {
    throw new Failure('not-ready', {
      says: `${mill.name} has no card yet; enter what its machines can do first.`,
    })
  }
  const section = sectionOfIssue(issue)
  refuseStops(section, card)
  const { document: settings } = await readSettings(tx)
  const text = millTextOf({ document: request.document, mill, number, unit: settings.units })
  const sheet = await sheetInputOf({
    issue,
    commission,
    mill: text,
    cautions: knifeCautionsOf(headRunningOf(card.document.head)),
    tx,
  })
  return { issue, commission, section, mill, card, document: request.document, sheet }
}

function refuseStops(section: Section, { document: card }: MillCard): void {
  const { head, ...limits } = card
  const face = woodFaceOf(section).path
  const checks = [
    ...checksOf(section, { mill: limits }),
    clampCheckOf(face, knifeHeadOf(head)),
    ...speedChecksOf(headRunningOf(head)),
  ]
  const stops = checks.filter(({ severity }) => severity === 'stop')
  if (stops.length === 0) return
  throw new Failure('not-ready', {
    says: `The mill's card bars this section: ${stops.map(({ says }) => says).join(' ')}`,
    faults: stops.map(({ code, says }) => ({ path: '', code, says })),
  })
}

interface MillTextOf {
  readonly document: OrderInput
  readonly mill: Mill
  readonly number: string
  readonly unit: LengthUnit
}

/** What the sheet says to the mill. */
export function millTextOf({ document, mill, number, unit }: MillTextOf): MillText {
  const length = (mm: number) => printLength(mm, { unit, places: 1 })
  return {
    orderNumber: number,
    mill: mill.name,
    timber: document.species,
    moisture: `${document.moisture} % on delivery`,
    ...(document.grade === '' ? {} : { grade: document.grade }),
    jointing: 'no finger joints',
    ...(document.sanding === '' ? {} : { sanding: document.sanding }),
    quantity: lengthsText(document, unit),
    firstOff: `${length(document.firstOff)} long, ${document.setupPieces} set-up ${document.setupPieces === 1 ? 'piece' : 'pieces'} besides`,
    seenFrom: 'seen from the end that leads into the machine',
    lies: 'back down on the table, face up',
    guideEdge: 'the back edge to the guide',
    surfacesCut: 'this knife cuts the face from sight edge to back edge; rebate and back are run separately',
    ...(document.wantedBy === null ? {} : { wantedBy: document.wantedBy }),
    ...(document.notes === '' ? {} : { notes: document.notes }),
  }
}

export const lengthsText = ({ lengths }: Pick<OrderInput, 'lengths'>, unit: LengthUnit): string =>
  lengths.map(({ length, count }) => `${count} of ${printLength(length, { unit, places: 1 })}`).join(', ')
