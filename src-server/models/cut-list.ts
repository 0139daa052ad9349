import { Model } from 'sequelize'
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize'
import type { SawCard as SawCardDocument } from '@shared/contracts'
import type { CutListStateName } from '@shared/course'
import type { CutPlan } from '@shared/cutting'
import {
  document,
  editVersion,
  instant,
  key,
  keyOrNone,
  lengthMm,
  lengthMmOrNone,
  line,
  ownKey,
  whole,
  wholeOrNone,
  word,
  yesOrNo,
} from './columns'

/** What a list was worked out from: when any of it moves on, the list is out of date. */
export interface CutListInputs {
  readonly pictures: readonly {
    readonly pictureId: string
    readonly name: string
    readonly copies: number
    readonly measurementNo: number
  }[]
  readonly batchIds: readonly string[]
  readonly saw: SawCardDocument
  readonly sawCardId: string
}

/** Rails, saw settings and which rail comes from which length, for one approved issue. */
export class CutList extends Model<InferAttributes<CutList>, InferCreationAttributes<CutList>> {
  declare id: CreationOptional<string>
  declare commissionId: string
  declare issueId: string
  declare no: number
  declare inputs: CutListInputs
  declare state: CutListStateName
  /** Why it was opened early; empty otherwise. */
  declare openedBecause: CreationOptional<string>
  declare version: CreationOptional<number>
  declare byId: string
  declare at: Date
}

export class CutListPlan extends Model<InferAttributes<CutListPlan>, InferCreationAttributes<CutListPlan>> {
  declare id: CreationOptional<string>
  declare cutListId: string
  declare no: number
  declare document: CutPlan
  declare byId: string
  declare at: Date
}

/** One rail to be cut from one length of the plan. */
export class Cut extends Model<InferAttributes<Cut>, InferCreationAttributes<Cut>> {
  declare id: CreationOptional<string>
  declare cutListId: string
  declare no: number
  /** Place of the length in the plan, from 0. */
  declare lengthNo: number
  declare pieceId: string | null
  declare picture: string
  declare frame: string
  declare side: string
  declare lengthMm: number
  declare rebateMm: number
  declare sightMm: number
  declare mitreDeg: number
  declare atMm: number
}

/** What happened at the saw: never refused and never changed. `undo` takes back the one before it. */
export class CutFact extends Model<InferAttributes<CutFact>, InferCreationAttributes<CutFact>> {
  declare id: CreationOptional<string>
  declare cutListId: string
  declare seq: number
  declare kind: 'cut' | 'mis-cut' | 'undo' | 'offcut'
  declare cutId: string | null
  declare lengthNo: number | null
  declare trueLengthMm: number | null
  declare pieceId: string | null
  /** The list had moved on, or somebody else had ticked it already. */
  declare conflict: boolean
  declare listVersion: number
  declare operationId: string
  declare personId: string
  declare personName: string
  declare deviceTime: Date
  declare at: Date
}

export function bindCutLists(sequelize: Sequelize): void {
  CutList.init(
    {
      id: ownKey(),
      commissionId: key(),
      issueId: key(),
      no: whole(),
      inputs: document(),
      state: word(),
      openedBecause: { ...line(5000), defaultValue: '' },
      version: editVersion(),
      byId: key(),
      at: instant(),
    },
    { sequelize, tableName: 'cut_list', version: true },
  )
  CutListPlan.init(
    { id: ownKey(), cutListId: key(), no: whole(), document: document(), byId: key(), at: instant() },
    { sequelize, tableName: 'cut_plan' },
  )
  Cut.init(
    {
      id: ownKey(),
      cutListId: key(),
      no: whole(),
      lengthNo: whole(),
      pieceId: keyOrNone(),
      picture: line(200),
      frame: line(200),
      side: line(16),
      lengthMm: lengthMm(),
      rebateMm: lengthMm(),
      sightMm: lengthMm(),
      mitreDeg: lengthMm(),
      atMm: lengthMm(),
    },
    { sequelize, tableName: 'cut' },
  )
  CutFact.init(
    {
      id: ownKey(),
      cutListId: key(),
      seq: whole(),
      kind: word(),
      cutId: keyOrNone(),
      lengthNo: wholeOrNone(),
      trueLengthMm: lengthMmOrNone(),
      pieceId: keyOrNone(),
      conflict: yesOrNo(),
      listVersion: whole(),
      operationId: key(),
      personId: key(),
      personName: line(200),
      deviceTime: instant(),
      at: instant(),
    },
    { sequelize, tableName: 'cut_fact' },
  )
}
