import { dayFromNow, onDay } from '../days'
import { addMeasuredPicture, drawSection, measurementOf, redraw, takeOn } from '../drawing-acts'
import { showPhotograph } from '../photographs'
import { seen } from '../reasons'
import { UPLAND } from '../sections/from-photographs'
import type { Story } from '../story'

/** A photograph is up, and the section is being drawn over it; the back is not read yet. */
export async function tellOfTheUpland({ people, clientIds }: Story): Promise<void> {
  const { ines, maren } = people
  const commissionId = await onDay(12, 9, () =>
    takeOn(maren, {
      clientId: clientIds.harbourMuseum,
      title: 'Upland with two valleys',
      artist: 'Corvin Aldous',
      accession: 'HM 1952.9',
      due: dayFromNow(62),
    }),
  )
  await onDay(8, 10, () =>
    addMeasuredPicture(ines, commissionId, {
      name: 'Upland',
      measurement: measurementOf(ines, dayFromNow(-8), {
        width: [774.5, 775, 774.5],
        height: [571, 571.5],
        diagonals: [962.8, 962],
        thickness: 9,
      }),
    }),
  )
  await onDay(7, 14, () =>
    showPhotograph(ines, commissionId, {
      file: 'upland-from-the-right.jpg',
      title: 'The old frame, from the right',
      source: 'Copy of a plate taken before the frame was lost; scale along the right rail',
      citation: 'Harbour Museum, plates, box 14, no. 3',
      reading: {
        scale: { from: [1902, 397], to: [1893, 1536.5], distance: 559, plusMinus: 2 },
        lay: { at: [1897.5, 970.5], turn: 0, mirrored: false },
      },
    }),
  )
  await onDay(3, 10, () => drawSection(ines, commissionId, UPLAND))
  await onDay(2, 16, () =>
    redraw(ines, commissionId, 'Made the hollow 30 wide', 6, (member) => ({
      ...member,
      width: 30,
      basis: { ...member.basis, width: seen(0.5) },
    })),
  )
}

/** Taken on and measured; no photograph of the old frame has come to light. */
export async function tellOfTheLinnet({ people, clientIds }: Story): Promise<void> {
  const { tobias, maren } = people
  const commissionId = await onDay(4, 15, () =>
    takeOn(maren, {
      clientId: clientIds.collegeGallery,
      title: 'Girl with a linnet',
      artist: 'Philippa Orne',
      accession: 'TC 1933.11',
      due: dayFromNow(75),
    }),
  )
  await onDay(1, 10, () =>
    addMeasuredPicture(tobias, commissionId, {
      name: 'Girl with a linnet',
      measurement: measurementOf(tobias, dayFromNow(-1), {
        width: [305.5, 306],
        height: [381, 380.5],
        diagonals: [488.2, 488.6],
        thickness: 12,
      }),
    }),
  )
}
