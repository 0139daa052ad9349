import { dayFromNow, onDay } from '../days'
import { addMeasuredPicture, drawSection, measurementOf, redraw, takeOn } from '../drawing-acts'
import { showPhotograph } from '../photographs'
import { drawer, judged } from '../reasons'
import { answer, decide, pin, putForwardNow } from '../review-acts'
import { FRIEZE } from '../sections/from-the-drawer'
import { RIDGE, TARN } from '../sections/from-photographs'
import type { Story } from '../story'

/** Issue A came back, issue B waits for the curator. */
export async function tellOfTheShipwright({ people, clientIds }: Story): Promise<void> {
  const { maren, tobias, hanna } = people
  const commissionId = await onDay(33, 9, () =>
    takeOn(maren, {
      clientId: clientIds.harbourMuseum,
      title: 'Portrait of a shipwright',
      artist: 'Unknown, about 1640',
      accession: 'HM 1889.1',
      due: dayFromNow(48),
    }),
  )
  await onDay(30, 10, () =>
    addMeasuredPicture(tobias, commissionId, {
      name: 'The panel',
      measurement: measurementOf(tobias, dayFromNow(-30), {
        width: [483, 482.5, 484],
        height: [610.5, 611, 610],
        diagonals: [779.6, 777.2],
        thickness: 8,
        allowance: 4,
      }),
    }),
  )
  await onDay(27, 13, () => drawSection(tobias, commissionId, FRIEZE))
  const issueA = await onDay(24, 15, () =>
    putForwardNow(tobias, commissionId, 'No photograph: after our pattern for a frieze of the time.'),
  )
  const remark = await onDay(21, 10, () =>
    pin(hanna, issueA, [30, 25], 'The scrolls on our fragment need 36 mm of flat between the mouldings.'),
  )
  await onDay(21, 10.5, () =>
    decide(hanna, issueA, 'return', 'Right in kind; please look at the width of the frieze.'),
  )
  await onDay(9, 11, () =>
    redraw(tobias, commissionId, 'Widened the frieze to 36', 5, (member) => ({
      ...member,
      width: 36,
      basis: { width: judged('room for the painted scrolls of the fragment, remark 1 of issue A') },
    })),
  )
  await onDay(9, 14, () => answer(tobias, remark, 'Widened to 36 in the next issue.', 'answered'))
  await onDay(9, 15, () => putForwardNow(tobias, commissionId, 'The frieze is 36 wide; nothing else moved.'))
}

/** Came back with two remarks; the draft has moved on for one of them. */
export async function tellOfTheHill({ people, clientIds }: Story): Promise<void> {
  const { maren, tobias, hanna } = people
  const commissionId = await onDay(27, 11, () =>
    takeOn(maren, {
      clientId: clientIds.harbourMuseum,
      title: 'Black Hill above the tarn',
      artist: 'Wenna Threlby',
      accession: 'HM 1947.22',
      due: dayFromNow(55),
    }),
  )
  await onDay(23, 10, () =>
    addMeasuredPicture(tobias, commissionId, {
      name: 'Black Hill',
      measurement: measurementOf(tobias, dayFromNow(-23), {
        width: [620, 620.5],
        height: [467.5, 467],
        diagonals: [776, 776.8],
        thickness: 7,
      }),
    }),
  )
  await onDay(22, 14, () =>
    showPhotograph(tobias, commissionId, {
      file: 'hill-above-the-tarn.jpg',
      title: 'The picture in its first frame',
      source: 'Small print from an album, grainy; nothing else has been found',
      citation: 'Threlby family album, leaf 9',
      reading: {
        scale: { from: [955, 196.5], to: [945, 749.5], distance: 457, plusMinus: 2 },
        lay: { at: [950, 477], turn: 0, mirrored: false },
      },
    }),
  )
  await onDay(19, 13, () => drawSection(tobias, commissionId, TARN))
  const issueId = await onDay(14, 15, () =>
    putForwardNow(tobias, commissionId, 'Widths from the print, heights mostly from our pattern no. 22.'),
  )
  const onWave = await onDay(6, 10, () =>
    pin(
      hanna,
      issueId,
      [26, 23],
      'In the print this is lighter at the top: could the wave be steeper there?',
    ),
  )
  await onDay(6, 10.25, () =>
    pin(hanna, issueId, [52, 26], 'What tells us that the outer hollow is a hollow at all?'),
  )
  await onDay(6, 10.5, () => decide(hanna, issueId, 'return', 'Two questions pinned to the drawing.'))
  await onDay(2, 11, () =>
    redraw(tobias, commissionId, 'Raised the wave by 1.5', 4, (member) => ({
      ...member,
      rise: 17.5,
      basis: { ...member.basis, rise: drawer(22) },
    })),
  )
  await onDay(2, 11.5, () =>
    answer(tobias, onWave, 'Raised by 1.5 mm after pattern no. 22, which is steeper.', 'answered'),
  )
}

/** Put forward with a photograph taken squarely; the curator looks at it. */
export async function tellOfTheRidges({ people, clientIds }: Story): Promise<void> {
  const { maren, ines } = people
  const commissionId = await onDay(20, 9, () =>
    takeOn(maren, {
      clientId: clientIds.collegeGallery,
      title: 'Three ridges, evening',
      artist: 'Wenna Threlby',
      accession: 'TC 1949.5',
      due: dayFromNow(50),
    }),
  )
  await onDay(17, 10, () =>
    addMeasuredPicture(ines, commissionId, {
      name: 'Three ridges',
      measurement: measurementOf(ines, dayFromNow(-17), {
        width: [926, 926.5],
        height: [622.5, 622],
        diagonals: [1115.4, 1116],
        thickness: 7,
      }),
    }),
  )
  await onDay(16, 14, () =>
    showPhotograph(ines, commissionId, {
      file: 'ridges-from-the-front.jpg',
      title: 'The frame from the front',
      source: 'Copy print, taken for an insurance list',
      citation: 'Tarn College Gallery, insurance list of 1951, plate 7',
      reading: {
        scale: { from: [332, 300.5], to: [2068, 300.5], distance: 914, plusMinus: 1.5 },
        lay: { at: [2068, 880], turn: 0, mirrored: false },
      },
    }),
  )
  await onDay(13, 13, () => drawSection(ines, commissionId, RIDGE))
  await onDay(5, 15, () =>
    putForwardNow(
      ines,
      commissionId,
      'Seen squarely, so the widths are sure; the heights rest on the pattern and on the light.',
    ),
  )
}
