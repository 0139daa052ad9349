import { letterBodyFrom } from './letter-body'
import type { LetterBody } from './letter-body'

export interface ReviewLetter {
  readonly workshop: string
  readonly signature: string
  readonly title: string
  readonly number: string
  readonly issueLetter: string
  readonly sha256: string
  readonly url: string
}

/** To the client's curators: an issue waits for their word. */
export function issuePutForwardLetter(letter: ReviewLetter & { readonly note: string }): LetterBody {
  return letterBodyFrom(`${letter.title}: drawing ${letter.issueLetter} is put forward`, [
    {
      kind: 'paragraph',
      text: `Drawing ${letter.issueLetter} of the frame for "${letter.title}" (${letter.number}) waits for your word. It shows which dimensions are measured, which follow a precedent and which are judged.`,
    },
    ...(letter.note === '' ? [] : [{ kind: 'paragraph', text: letter.note } as const]),
    { kind: 'link', says: 'Look at it, pin remarks, approve it or return it:', url: letter.url },
    { kind: 'rows', rows: [['Hash of the drawing (SHA-256)', letter.sha256]] },
    { kind: 'paragraph', text: `${letter.signature}\n${letter.workshop}` },
  ])
}

const DONE = { approve: 'approved', return: 'returned', withdraw: 'withdrew the approval of' } as const

/** To whoever put the issue forward: what the curator decided. */
export function issueDecidedLetter(
  letter: ReviewLetter & {
    readonly kind: keyof typeof DONE
    readonly by: string
    readonly statement: string
  },
): LetterBody {
  return letterBodyFrom(`${letter.title}: ${letter.by} ${DONE[letter.kind]} drawing ${letter.issueLetter}`, [
    {
      kind: 'paragraph',
      text: `${letter.by} ${DONE[letter.kind]} drawing ${letter.issueLetter} of ${letter.number}, ${letter.title}.`,
    },
    { kind: 'paragraph', text: letter.statement },
    { kind: 'link', says: 'Go to the review:', url: letter.url },
    { kind: 'rows', rows: [['Hash of the drawing (SHA-256)', letter.sha256]] },
  ])
}

/** To the mill: an order is held, and why. */
export function orderHeldLetter(letter: {
  readonly workshop: string
  readonly signature: string
  readonly number: string
  readonly title: string
  readonly issueLetter: string
  readonly reason: string
  readonly link: string
}): LetterBody {
  return letterBodyFrom(`Please hold knife order ${letter.number}: ${letter.title}`, [
    {
      kind: 'paragraph',
      text: `Please hold knife order ${letter.number} (issue ${letter.issueLetter}) at once: grind nothing further and run no timber until you hear from us.`,
    },
    { kind: 'paragraph', text: letter.reason },
    { kind: 'link', says: 'Please acknowledge this notice here:', url: letter.link },
    { kind: 'paragraph', text: `${letter.signature}\n${letter.workshop}` },
  ])
}
