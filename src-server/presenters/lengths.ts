import type {
  CutListLineView,
  CutListView,
  PlannedCutView,
  PlannedLengthView,
  RackPieceView,
  RailsView,
} from '@shared/contracts'
import type { FrameRails } from '@shared/answer'
import type { CutPlan, OpenedLength } from '@shared/cutting'
import type { Commission, Measurement, Picture } from '../models/commission'
import type { Cut, CutFact, CutList } from '../models/cut-list'
import type { Batch, RackPiece } from '../models/rack'
import type { Issue } from '../models/review'

const DEG_PER_RAD = 180 / Math.PI

export function presentRackPiece(one: {
  readonly piece: RackPiece
  readonly batch: Batch
  readonly issue: Issue
  readonly commission: Commission
  readonly parentCode: string | null
}): RackPieceView {
  const { piece, batch, issue, commission, parentCode } = one
  return {
    id: piece.id,
    code: piece.code,
    length: piece.lengthMm,
    endTrim: [piece.trimStartMm, piece.trimEndMm],
    species: batch.species,
    finish: batch.finish,
    shapeSha256: batch.shapeSha256,
    shapeOf: `${commission.number} ${commission.title}, issue ${issue.letter}`,
    state: piece.state,
    offcutOf: parentCode,
    batch: {
      id: batch.id,
      trueWidth: batch.trueWidthMm,
      trueRebate: batch.trueRebateMm,
      at: batch.at.toISOString(),
    },
  }
}

export function presentRails(rails: {
  readonly issue: Issue | null
  readonly fromDraft: boolean
  readonly missing: readonly string[]
  readonly pictures: readonly {
    readonly picture: Picture
    readonly measurement: Measurement
    readonly frame: FrameRails
  }[]
}): RailsView {
  const { issue, fromDraft, missing, pictures } = rails
  return {
    issue: issue === null ? null : { id: issue.id, letter: issue.letter, state: issue.state },
    fromDraft,
    missing: [...missing],
    pictures: pictures.map(({ picture, measurement, frame }) => ({
      picture: { id: picture.id, name: picture.name, copies: picture.copies, measurementNo: measurement.no },
      rebateOpening: [...frame.openingMm],
      sight: [...frame.sightMm],
      outside: [...frame.outsideMm],
      cover: [...frame.coverMm],
      skewDeg: frame.skewRad * DEG_PER_RAD,
      rails: frame.rails.map(({ side, count, longPointMm, rebateMm, sightMm, mitreDeg }) => ({
        side,
        count,
        longPoint: longPointMm,
        rebate: rebateMm,
        sight: sightMm,
        mitre: mitreDeg,
      })),
      footage: frame.footageMm,
      volumeMm3: frame.volumeMm3,
    })),
  }
}

interface CutStanding {
  readonly facts: ReadonlyMap<string, CutFact>
  readonly offcuts: ReadonlyMap<number, CutFact>
}

interface WholeCutList {
  readonly list: CutList
  readonly commission: Commission
  readonly issue: Issue
  readonly plan: CutPlan
  readonly cuts: readonly Cut[]
  readonly standing: CutStanding
  readonly codes: ReadonlyMap<string, string>
  readonly outOfDate: readonly string[]
  readonly closedBecause: string | null
  readonly seesCost: boolean
}

export function presentCutList(whole: WholeCutList): CutListView {
  const { list, commission, issue, plan, outOfDate, closedBecause, seesCost } = whole
  return {
    id: list.id,
    no: list.no,
    state: list.state,
    version: list.version,
    commission: { id: commission.id, number: commission.number, title: commission.title },
    issue: { id: issue.id, letter: issue.letter, sha256: issue.sha256 },
    outOfDate: [...outOfDate],
    closedBecause,
    saw: list.inputs.saw,
    lengths: plan.opened.map((opened, no) => presentLength(whole, opened, no)),
    count: plan.count,
    // The bound is a cost where there are prices: it is no more for everybody than the cost is.
    ...(seesCost ? { cost: plan.cost } : {}),
    bound: seesCost || plan.cost === null ? String(plan.bound) : '',
    proven: plan.proven,
    toOrder: plan.toOrder.map(({ length, count }) => ({ length, count })),
    warnings: [...plan.warnings],
    at: list.at.toISOString(),
  }
}

function presentLength(
  { list, cuts, standing, codes }: WholeCutList,
  opened: OpenedLength,
  no: number,
): PlannedLengthView {
  const offcut = standing.offcuts.get(no)
  return {
    no,
    from: opened.from,
    source: opened.source,
    length: opened.length,
    trims: [...opened.trims],
    cuts: cuts
      .filter(({ lengthNo }) => lengthNo === no)
      .map((cut) => presentCut(cut, standing.facts.get(cut.id))),
    offcut: opened.offcut,
    offcutUsable: opened.isOffcutUsable && opened.offcut >= list.inputs.saw.smallestUsableOffcut,
    offcutFact:
      offcut === undefined || offcut.pieceId === null || offcut.trueLengthMm === null
        ? null
        : {
            code: codes.get(offcut.pieceId) ?? '',
            length: offcut.trueLengthMm,
            by: offcut.personName,
            at: offcut.deviceTime.toISOString(),
          },
  }
}

function presentCut(cut: Cut, fact: CutFact | undefined): PlannedCutView {
  return {
    id: cut.id,
    no: cut.no,
    side: cut.side,
    picture: cut.picture,
    frame: cut.frame,
    length: cut.lengthMm,
    rebate: cut.rebateMm,
    sight: cut.sightMm,
    mitre: cut.mitreDeg,
    at: cut.atMm,
    fact:
      fact === undefined
        ? null
        : {
            trueLength: fact.trueLengthMm,
            by: fact.personName,
            at: fact.deviceTime.toISOString(),
            kind: fact.kind === 'mis-cut' ? 'mis-cut' : 'cut',
            conflict: fact.conflict,
          },
  }
}

export function presentCutListLine(one: {
  readonly list: CutList
  readonly commission: Commission
  readonly issue: Issue
  readonly cuts: number
  readonly done: number
  readonly isOutOfDate: boolean
}): CutListLineView {
  const { list, commission, issue, cuts, done, isOutOfDate } = one
  return {
    id: list.id,
    no: list.no,
    state: list.state,
    commission: { id: commission.id, number: commission.number, title: commission.title },
    issueLetter: issue.letter,
    cuts,
    done,
    outOfDate: isOutOfDate,
    at: list.at.toISOString(),
  }
}
