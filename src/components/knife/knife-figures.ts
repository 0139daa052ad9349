import type { MillCard, Measurement } from '@shared/contracts'
import {
  clampCheckOf,
  correctedOutline,
  knifeCautionsOf,
  knifeHeadFrom,
  knifeSizeOf,
  knifeTable,
  runningFiguresOf,
  speedChecksOf,
} from '@shared/knife'
import type { CorrectedOutline, HeadRunning, KnifeSize, KnifeTable, RunningFigures } from '@shared/knife'
import { checksOf, woodFaceOf } from '@shared/section'
import type { Check, RebateStack, Section } from '@shared/section'
import type { Vocabulary } from '@shared/units'

/** One line of what was checked, by whichever part checked it. */
export interface CheckLine {
  readonly code: string
  readonly severity: Check['severity']
  readonly says: string
  readonly cure?: string
}

export interface KnifeFigures {
  readonly size: KnifeSize | { readonly kind: 'refused'; readonly says: string }
  readonly table: KnifeTable
  readonly outline: CorrectedOutline | { readonly kind: 'refused'; readonly says: string }
  readonly running: RunningFigures
  readonly cautions: readonly string[]
}

/** The knife of a section in a mill's head; the wood face is what it cuts. */
export function knifeFiguresOf(section: Section, { head }: MillCard): KnifeFigures {
  const face = woodFaceOf(section).path
  const knifeHead = knifeHeadFrom(head.cuttingDiameter, head.hookAngle)
  return {
    size: knifeSizeOf(face, knifeHead),
    table: knifeTable(face, knifeHead),
    outline: correctedOutline(face, knifeHead),
    running: runningFiguresOf(runningOf(head)),
    cautions: knifeCautionsOf(runningOf(head)),
  }
}

const SEVERITIES = ['stop', 'warn', 'note', 'ok'] as const satisfies readonly Check['severity'][]

/** Every check of a section against a mill's card and what lies in the rebate, the gravest first. */
export function checkLinesOf(
  section: Section,
  card: MillCard,
  { stack, vocabulary }: { readonly stack: RebateStack; readonly vocabulary: Vocabulary },
): readonly CheckLine[] {
  const { head } = card
  const face = woodFaceOf(section).path
  const lines: CheckLine[] = [
    ...checksOf(section, {
      mill: card,
      head: { cuttingDiameter: head.cuttingDiameter },
      stack,
      vocabulary,
    }),
    clampCheckOf(face, knifeHeadFrom(head.cuttingDiameter, head.hookAngle)),
    ...speedChecksOf(runningOf(head)),
  ]
  return lines.sort((a, b) => SEVERITIES.indexOf(a.severity) - SEVERITIES.indexOf(b.severity))
}

const runningOf = (head: MillCard['head']): HeadRunning => ({
  cuttingDiameterMm: head.cuttingDiameter,
  knives: head.knives,
  finishingKnives: head.finishingKnives,
  rpm: head.rpm,
  maxRpm: head.maxRpm,
  feedMmPerMin: head.feed,
  feedBy: head.feedBy,
})

/** What must find room in the rebate by the measurements at hand: the deepest of each part. */
export function stackOf(measurements: readonly Measurement[]): RebateStack {
  const deepest = (parts: readonly (number | null)[]) => {
    const known = parts.filter((part) => part !== null)
    return known.length === 0 ? undefined : Math.max(...known)
  }
  return {
    lining: deepest(measurements.map(({ lining }) => lining)),
    thickness: deepest(measurements.map(({ thickness }) => thickness)),
    glazing: deepest(measurements.map(({ stack }) => stack.glazing)),
    airGap: deepest(measurements.map(({ stack }) => stack.airGap)),
    backing: deepest(measurements.map(({ stack }) => stack.backing)),
    fixings: deepest(measurements.map(({ stack }) => stack.fixings)),
  }
}
