import type { CommissionAnswerData, CommissionFile } from '@shared/contracts'
import { planCuts } from '@shared/cutting'
import type { DemandedRail } from '@shared/cutting'
import { Failure } from '@shared/failure'
import { placed } from './rails-answer'
import type { RailedPicture } from './rails-answer'

const NO_SAW = { kerf: 0, margin: 0, endTrim: 0, shortestSafe: 0, smallestUsableOffcut: 0 }

/** Which rail comes from which length; absent without lengths and rack, or without rails. Throws no-plan as a fault naming the length needed. */
export function planAnswerOf(
  file: CommissionFile,
  railed: readonly RailedPicture[],
): CommissionAnswerData['plan'] {
  const { lengths = [], rack = [], saw = NO_SAW, order } = file
  const demand = file.demand ?? demandOf(railed)
  if (demand.length === 0 || (lengths.length === 0 && rack.length === 0)) return undefined
  const outcome = placed('', () =>
    planCuts({
      demand: demand.map(({ id, length, count, mitre, frame, side }) => ({
        id,
        length,
        count,
        mitre,
        ...(frame !== undefined && { frame }),
        ...(side !== undefined && { side }),
      })),
      lengths: lengths.map(({ length, price, count }) => ({
        length,
        ...(price !== undefined && { price }),
        ...(count !== undefined && { count }),
      })),
      rack: rack.map(({ id, length, endTrim }) => ({
        id,
        length,
        ...(endTrim !== undefined && { endTrim }),
      })),
      saw,
      ...(order !== undefined && { order }),
    }),
  )
  if (outcome.kind === 'no-plan') {
    const path = file.demand === undefined ? '/lengths' : '/demand'
    throw new Failure('input-invalid', {
      says: outcome.says,
      faults: [{ path, code: outcome.reason, says: outcome.says }],
    })
  }
  const { plan } = outcome
  return {
    opened: plan.opened.map(({ from, source, length, cuts, offcut }) => ({
      from,
      source,
      length,
      cuts: cuts.map(({ id, copy, length: cut, at }) => ({ id, copy, length: cut, at })),
      offcut,
    })),
    count: plan.count,
    cost: plan.cost,
    bound: plan.bound,
    proven: plan.proven,
    toOrder: plan.toOrder.map(({ length, count }) => ({ length, count })),
    warnings: [...plan.warnings],
  }
}

/** What pictures, section and frame ask for: one row a side of each picture. */
const demandOf = (railed: readonly RailedPicture[]): DemandedRail[] =>
  railed.flatMap(({ name, frame }) =>
    frame.rails.map(({ side, count, longPointMm, mitreDeg }) => ({
      id: name === undefined ? side : `${name}, ${side}`,
      length: longPointMm,
      count,
      mitre: mitreDeg,
      ...(name !== undefined && { frame: name }),
      side,
    })),
  )
