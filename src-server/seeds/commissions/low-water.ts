import { randomUUID } from 'node:crypto'
import { readCutList } from '../../services/cut-lists'
import { makeCutList } from '../../services/plan-cuts'
import { addToRack } from '../../services/rack'
import { openCutList, recordCut } from '../../services/record-cut'
import { dayFromNow, onDay, timeOn } from '../days'
import { addMeasuredPicture, drawSection, measurementOf, takeOn } from '../drawing-acts'
import { orderFor, orderFrom, step } from '../order-acts'
import { LIME } from '../reasons'
import { decide, putForwardNow } from '../review-acts'
import { HOLLOW } from '../sections/from-the-drawer'
import type { Story } from '../story'

/** Three studies and the canvas they led to, in one moulding: delivered, and half cut. */
export async function tellOfLowWater(story: Story): Promise<void> {
  const commissionId = await drawnLowWater(story)
  const { tobias, hanna } = story.people
  const issueId = await onDay(58, 15, () =>
    putForwardNow(
      tobias,
      commissionId,
      'Taken from the 210 mm of old moulding kept with the canvas; the back edge is worn away there.',
    ),
  )
  await onDay(55, 10, () =>
    decide(hanna, issueId, 'approve', 'Agrees with the piece in our store. Please go ahead.'),
  )
  await deliver(story, issueId)
  await cutHalf(story, commissionId, issueId)
}

async function drawnLowWater({ people, clientIds }: Story): Promise<string> {
  const { maren, tobias } = people
  const commissionId = await onDay(70, 9, () =>
    takeOn(maren, {
      clientId: clientIds.harbourMuseum,
      title: 'Low water: three studies and the canvas',
      artist: 'Aurel Tessmark',
      accession: 'HM 1931.7 to 10',
      due: dayFromNow(12),
    }),
  )
  await onDay(66, 11, async () => {
    await addMeasuredPicture(tobias, commissionId, {
      name: 'Studies on panel, three alike',
      copies: 3,
      measurement: measurementOf(tobias, dayFromNow(-66), {
        width: [420.5, 421, 420],
        height: [301, 300.5, 300.5],
        diagonals: [516.5, 517.2],
        thickness: 6,
        stack: { glazing: null, airGap: null, backing: 3, fixings: 2 },
      }),
    })
    await addMeasuredPicture(tobias, commissionId, {
      name: 'The canvas',
      measurement: measurementOf(tobias, dayFromNow(-66), {
        width: [1016, 1017, 1016.5],
        height: [762, 761.5],
        diagonals: [1270.2, 1268.8],
        thickness: 10,
      }),
    })
  })
  await onDay(62, 13, () => drawSection(tobias, commissionId, HOLLOW))
  return commissionId
}

async function deliver({ people, millIds }: Story, issueId: string): Promise<void> {
  const { maren, tobias, jon } = people
  const lengths = [{ length: 3660, count: 5 }]
  const orderId = await onDay(54, 9.5, () =>
    orderFrom(tobias, issueId, millIds.riverside, orderFor(LIME, lengths, dayFromNow(-20))),
  )
  await onDay(53, 8, () => step(jon, orderId, 'acknowledge'))
  await onDay(50, 14, () => step(jon, orderId, 'quote', { price: '312.00', promised: dayFromNow(-24) }))
  await onDay(49, 9, () => step(maren, orderId, 'accept-price'))
  await onDay(36, 16, () =>
    step(jon, orderId, 'report-first-off', { note: 'Posted today, 300 mm, marked with the order number.' }),
  )
  await onDay(33, 11, () =>
    step(tobias, orderId, 'accept-first-off', {
      note: 'Laid on the drawing: within a quarter of a millimetre everywhere.',
    }),
  )
  await onDay(30, 10, () =>
    addToRack(tobias, {
      operationId: randomUUID(),
      length: 1240,
      count: 1,
      endTrim: [0, 0],
      species: LIME,
      finish: '',
      issueId,
      trueWidth: null,
      trueRebate: null,
    }),
  )
  await onDay(22, 10, () =>
    step(jon, orderId, 'deliver-rest', {
      note: 'Five lengths, wrapped.',
      batch: { trueWidth: 78.8, trueRebate: 8.1, lengths },
    }),
  )
}

async function cutHalf({ people }: Story, commissionId: string, issueId: string): Promise<void> {
  const { tobias, sam } = people
  const listId = await onDay(5, 14, () =>
    makeCutList(tobias, commissionId, {
      operationId: randomUUID(),
      issueId,
      lengths: null,
      useRack: true,
      order: { setupPieces: 0, firstOff: 0, reserve: 0 },
    }),
  )
  await onDay(4, 9, () => openCutList(tobias, listId, { operationId: randomUUID(), reason: '' }))
  const { cuts, plan, list } = await readCutList(sam, listId)
  const first = plan.opened
    .slice(0, 2)
    .flatMap((_, lengthNo) => cuts.filter((cut) => cut.lengthNo === lengthNo))
  for (const [index, cut] of first.entries()) {
    const offBy = [0, 0.2, -0.1, 0.1][index % 4] ?? 0
    await onDay(1, 9 + index / 6, () =>
      recordCut(sam, listId, {
        operationId: randomUUID(),
        listVersion: list.version,
        kind: 'cut',
        cutId: cut.id,
        lengthNo: null,
        trueLength: Math.round((cut.lengthMm + offBy) * 10) / 10,
        deviceTime: timeOn(1, 9 + index / 6).toISOString(),
      }),
    )
  }
}
