import { dayFromNow, onDay } from '../days'
import { measurementOf } from '../drawing-acts'
import { orderFor, orderFrom, step } from '../order-acts'
import { LIME } from '../reasons'
import { FALLING_BACK, FLUTED, REEDED } from '../sections/from-the-drawer'
import type { Story } from '../story'
import { approved } from './approved'

/** Overdue and stuck: the order is held while a figure in the drawing is looked into. */
export async function tellOfThePilot(story: Story): Promise<void> {
  const { people, clientIds, millIds } = story
  const { maren, ines, jon } = people
  const issueId = await approved(story, {
    about: {
      clientId: clientIds.harbourMuseum,
      title: 'The pilot’s daughter',
      artist: 'Josine Halvard',
      accession: 'HM 1904.2',
      due: dayFromNow(-6),
    },
    picture: {
      name: 'The pilot’s daughter',
      measurement: measurementOf(ines, dayFromNow(-56), {
        width: [635, 635.5],
        height: [762, 763, 762.5],
        diagonals: [992.5, 991.8],
        thickness: 10,
      }),
    },
    section: FLUTED,
    designer: 'ines',
    curator: 'hanna',
    days: { taken: 60, measured: 56, drawn: 52, putForward: 48, approved: 45 },
    note: 'The flutes are from the bill, everything else from our own pattern.',
    statement: 'Five flutes as the bill says. Approved.',
  })
  const lengths = [{ length: 3660, count: 2 }]
  const orderId = await onDay(44, 10, () =>
    orderFrom(ines, issueId, millIds.riverside, orderFor(LIME, lengths, dayFromNow(-16))),
  )
  await onDay(43, 8, () => step(jon, orderId, 'acknowledge'))
  await onDay(40, 15, () => step(jon, orderId, 'quote', { price: '268.50', promised: dayFromNow(-15) }))
  await onDay(39, 9, () => step(maren, orderId, 'accept-price'))
  await onDay(11, 16, () =>
    step(ines, orderId, 'hold', {
      note: 'The museum has found a second bill, which speaks of six flutes. Nothing is ground until they have compared the two.',
    }),
  )
}

/** The price is accepted: the mill grinds. */
export async function tellOfTheOrchard(story: Story): Promise<void> {
  const { people, clientIds, millIds } = story
  const { maren, tobias, jon } = people
  const issueId = await approved(story, {
    about: {
      clientId: clientIds.harbourMuseum,
      title: 'Winter orchard',
      artist: 'Mabel Quillane',
      accession: 'HM 1926.3',
      due: dayFromNow(33),
    },
    picture: {
      name: 'Winter orchard',
      copies: 2,
      measurement: measurementOf(tobias, dayFromNow(-38), {
        width: [508, 508.5],
        height: [406.5, 406],
        diagonals: [650.8, 651],
        thickness: 9,
      }),
    },
    section: REEDED,
    designer: 'tobias',
    curator: 'hanna',
    days: { taken: 41, measured: 38, drawn: 34, putForward: 30, approved: 27 },
    note: 'From the two ends that survive; the swell between them is drawn by eye.',
    statement:
      'The swell looks right beside the pieces. Approved, one frame and one for the travelling copy.',
  })
  const lengths = [{ length: 2440, count: 3 }]
  const orderId = await onDay(26, 11, () =>
    orderFrom(tobias, issueId, millIds.riverside, orderFor(LIME, lengths, dayFromNow(12))),
  )
  await onDay(25, 8.5, () => step(jon, orderId, 'acknowledge'))
  await onDay(21, 13, () => step(jon, orderId, 'quote', { price: '194.00', promised: dayFromNow(10) }))
  await onDay(20, 9, () => step(maren, orderId, 'accept-price'))
}

/** Quoted: the manager has a price to accept. */
export async function tellOfLamplight(story: Story): Promise<void> {
  const { people, clientIds, millIds } = story
  const { ines, jon } = people
  const issueId = await approved(story, {
    about: {
      clientId: clientIds.collegeGallery,
      title: 'Lamplight, the back kitchen',
      artist: 'Edwin Sarrow',
      accession: 'TC 1911.6',
      due: dayFromNow(40),
    },
    picture: {
      name: 'Lamplight',
      measurement: measurementOf(ines, dayFromNow(-25), {
        width: [356, 356.5],
        height: [457.5, 457],
        diagonals: [579.6, 580],
        thickness: 9,
        stack: { glazing: 3, airGap: 3, backing: 3, fixings: 2 },
      }),
    },
    section: FALLING_BACK,
    designer: 'ines',
    curator: 'piers',
    days: { taken: 29, measured: 25, drawn: 21, putForward: 17, approved: 13 },
    note: 'A quiet frame that falls back to the wall, as the two that hang beside it.',
    statement: 'It will sit well with its neighbours. Approved.',
  })
  const lengths = [{ length: 2440, count: 2 }]
  const orderId = await onDay(12, 10, () =>
    orderFrom(ines, issueId, millIds.riverside, orderFor(LIME, lengths, dayFromNow(20))),
  )
  await onDay(11, 8, () => step(jon, orderId, 'acknowledge'))
  await onDay(3, 15, () =>
    step(jon, orderId, 'quote', {
      price: '226.00',
      promised: dayFromNow(18),
      note: 'Knife 140, moulding 86.',
    }),
  )
}
