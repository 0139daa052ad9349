import { requireSpecies } from '@shared/timber'
import { dayFromNow, onDay } from '../days'
import { measurementOf } from '../drawing-acts'
import { orderFor, orderFrom, step } from '../order-acts'
import { PEBBLES } from '../sections/from-photographs'
import type { Story } from '../story'
import { approved } from './approved'

/** The first-off lies on the bench and waits to be accepted; the mill does everything by telephone. */
export async function tellOfPebbles(story: Story): Promise<void> {
  const { people, clientIds, millIds } = story
  const { maren, tobias } = people
  const issueId = await approved(story, {
    about: {
      clientId: clientIds.collegeGallery,
      title: 'Pebbles, an arrangement in grey',
      artist: 'R. Tolliver Ash',
      accession: 'TC 1958.14',
      due: dayFromNow(19),
    },
    picture: {
      name: 'Pebbles',
      measurement: measurementOf(tobias, dayFromNow(-46), {
        width: [516.5, 517],
        height: [668.5, 668],
        diagonals: [845, 844.4],
        thickness: 4,
        lining: 0,
      }),
    },
    photograph: {
      file: 'pebbles-in-raking-light.jpg',
      title: 'The frame in low light from the left',
      source: 'Print in the college’s file on the gift, 184 × 240 mm',
      citation: 'Tarn College Gallery, object file TC 1958.14, print 2',
      reading: {
        scale: { from: [1434.5, 489], to: [1419.5, 1867.5], distance: 660, plusMinus: 1.5 },
        lay: { at: [1427, 1189], turn: 0, mirrored: false },
      },
    },
    section: PEBBLES,
    designer: 'tobias',
    curator: 'piers',
    days: { taken: 49, measured: 46, drawn: 43, putForward: 39, approved: 35 },
    note: 'Bare wood: what the camera saw is what the knife cuts.',
    statement: 'The low light shows every step. Approved.',
  })
  const walnut = requireSpecies('black-walnut').name
  const lengths = [{ length: 3000, count: 2 }]
  const orderId = await onDay(34, 10, () =>
    orderFrom(tobias, issueId, millIds.hilltop, orderFor(walnut, lengths, dayFromNow(5))),
  )
  const says = (note: string) => ({ note: `By telephone: ${note}` })
  await onDay(33, 9, () => step(maren, orderId, 'acknowledge', says('has the drawing.')))
  await onDay(29, 14, () =>
    step(maren, orderId, 'quote', {
      ...says('the knife and two lengths in walnut.'),
      price: '248.00',
      promised: dayFromNow(3),
    }),
  )
  await onDay(28, 9, () => step(maren, orderId, 'accept-price'))
  await onDay(2, 15, () =>
    step(tobias, orderId, 'report-first-off', { note: 'Brought over by their driver, 300 mm.' }),
  )
}
