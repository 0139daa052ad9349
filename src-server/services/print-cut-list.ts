import type { Actor } from '@shared/access'
import { measuresOf } from '@shared/section'
import { cutListPagesOf, pdfOf } from '@shared/sheet'
import type { CutListInput, ListedRail } from '@shared/sheet'
import { printLength } from '@shared/units'
import { fileAnswer } from '../files/file-answer'
import type { FileAnswer } from '../files/file-answer'
import { readSheetFonts } from '../files/sheet-fonts'
import type { Cut } from '../models/cut-list'
import { today } from './clock'
import { readCutList } from './cut-lists'
import type { WholeCutList } from './cut-lists'
import { latestBatchOf } from './rails'
import { sectionOfIssue } from './require-issue'
import { readSettings } from './settings'
import type { Settings } from '@shared/contracts'

/** The cut list as the bench hangs it up: settings, lengths, rails to tick, cautions. */
export async function printCutList(actor: Actor, id: string): Promise<FileAnswer> {
  const whole = await readCutList(actor, id)
  const { document: settings } = await readSettings()
  const input = await inputOf(whole, settings)
  const bytes = await pdfOf(cutListPagesOf(input), {
    fonts: await readSheetFonts(),
    createdAt: whole.list.at.toISOString(),
    fileId: whole.list.id.replaceAll('-', ''),
    title: `Cut list ${whole.list.no}, ${whole.commission.title}`,
    author: settings.workshop,
  })
  return fileAnswer({
    from: { bytes },
    type: 'application/pdf',
    name: `${whole.commission.number}-cut-list-${whole.list.no}.pdf`,
    inline: true,
    cache: 'never',
  })
}

async function inputOf(whole: WholeCutList, settings: Settings): Promise<CutListInput> {
  const { list, commission, issue, plan, cuts, outOfDate, closedBecause } = whole
  const { saw } = list.inputs
  const batch = await latestBatchOf(issue.shapeSha256)
  const barred = closedBecause ?? (outOfDate.length > 0 ? `Out of date. ${outOfDate.join(' ')}` : undefined)
  return {
    unit: settings.units,
    vocabulary: settings.vocabulary,
    workshop: settings.workshop,
    commissionNumber: commission.number,
    title: commission.title,
    issueLetter: issue.letter,
    sha256: issue.sha256,
    listNumber: list.no,
    printedOn: today(),
    trueWidthMm: batch?.trueWidthMm ?? measuresOf(sectionOfIssue(issue)).wood.widthMm,
    ...(barred !== undefined && { barred }),
    saw: { name: saw.name, kerfMm: saw.kerf, marginMm: saw.margin, shortestSafeMm: saw.shortestSafe },
    rails: railsOf(cuts),
    lengths: plan.opened.map((opened, no) => ({
      name:
        opened.source === 'rack'
          ? opened.from
          : `new, ${printLength(opened.length, { unit: settings.units })}`,
      lengthMm: opened.length,
      startTrimMm: opened.trims[0],
      cuts: cuts
        .filter(({ lengthNo }) => lengthNo === no)
        .map(({ frame, side, lengthMm, mitreDeg, atMm }) => ({
          frame,
          side,
          longPointMm: lengthMm,
          mitreDeg,
          atMm,
        })),
      offcutMm: opened.offcut,
    })),
    cautions: plan.warnings,
  }
}

const railsOf = (cuts: readonly Cut[]): ListedRail[] =>
  [...cuts]
    .sort((a, b) => a.frame.localeCompare(b.frame, 'en', { numeric: true }) || a.no - b.no)
    .map(({ frame, side, lengthMm, rebateMm, sightMm, mitreDeg }) => ({
      frame,
      side,
      count: 1,
      longPointMm: lengthMm,
      rebateMm,
      sightMm,
      mitreDeg,
    }))
