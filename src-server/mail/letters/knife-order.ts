import type { MillText } from '@shared/sheet'
import { letterBodyFrom } from './letter-body'
import type { LetterBody, LetterPart } from './letter-body'

export interface KnifeOrderLetter {
  readonly workshop: string
  readonly signature: string
  readonly mill: string
  readonly number: string
  readonly title: string
  readonly commissionNumber: string
  readonly accession: string
  readonly issueLetter: string
  readonly sha256: string
  readonly lengths: string
  readonly asked: MillText
  readonly sheetNames: readonly string[]
  readonly notes: string
  readonly wantedBy: string | null
  readonly link: string
}

/** The order to the mill: what to grind and run, what to send back first, and where to say that it arrived. */
export function knifeOrderLetter(order: KnifeOrderLetter): LetterBody {
  return letterBodyFrom(`Knife order ${order.number}: ${order.title}, issue ${order.issueLetter}`, [
    { kind: 'paragraph', text: `To ${order.mill}` },
    {
      kind: 'paragraph',
      text: `Please grind a knife to the drawing attached and run the lengths below. The drawing is at 1:1: print it unscaled and measure the check bar, which must be 100 mm, before anything is taken from the paper. The figures on it count, never the paper.`,
    },
    { kind: 'rows', rows: rowsOf(order) },
    {
      kind: 'paragraph',
      text: 'Run no timber before the first-off is accepted in writing. Send us the first-off, or report it, and wait for our answer.',
    },
    {
      kind: 'list',
      items: [
        'Knives are balanced, clamped and set by a competent person; the speed marked on the head is never exceeded.',
        "The maker's data for head and machine, the local rules and your own licensed practice come before anything on our sheet.",
      ],
    },
    ...(order.notes === '' ? [] : [{ kind: 'paragraph', text: order.notes } as const]),
    {
      kind: 'link',
      says: 'Please say that this order has arrived, here, without an account:',
      url: order.link,
    },
    { kind: 'paragraph', text: `Attached: ${order.sheetNames.join(', ')}.` },
    { kind: 'paragraph', text: `${order.signature}\n${order.workshop}` },
  ])
}

function rowsOf(order: KnifeOrderLetter): Extract<LetterPart, { kind: 'rows' }>['rows'] {
  const { asked } = order
  const rows: readonly (readonly [string, string | null | undefined])[] = [
    ['Order', order.number],
    ['Commission', `${order.commissionNumber}, ${order.title}`],
    ['Accession number of the picture', order.accession],
    ['Issue of the drawing', order.issueLetter],
    ['Hash of the drawing (SHA-256)', order.sha256],
    ['Lengths', order.lengths],
    ['First-off', asked.firstOff],
    ['Timber', asked.timber],
    ['Moisture', asked.moisture],
    ['Grade', asked.grade],
    ['Jointing', asked.jointing],
    ['Sanding', asked.sanding],
    ['Wanted by', order.wantedBy],
  ]
  return rows.flatMap(([name, value]) =>
    value === null || value === undefined || value === '' ? [] : [[name, value] as const],
  )
}
