import { describe, expect, it } from 'vitest'
import { answerOf } from '@shared/answer'
import { readCommissionFile } from '@shared/contracts'
import { expectWithin } from '../../helpers/expect-within'

const IN = 25.4

function answer(content: object) {
  const reading = readCommissionFile({ listel: 1, ...content })
  if (reading.kind === 'refused') throw new Error(JSON.stringify(reading.faults))
  return answerOf(reading.file)
}
/** A plain stick: a rectangle, `width` across, with a rebate. */
const stick = (width: number, rebateWidth: number, unit = 1) => ({
  sightEdgeHeight: 20 / unit,
  rebate: { width: rebateWidth, depth: 10 / unit },
  members: [{ kind: 'fillet', width, rise: 0 }],
})

describe('rails against worked examples of the trade', () => {
  it('16 × 20 in, 2 in moulding: perimeter + 8 × width + allowance = 88 1/4 in', () => {
    // A framing supplier's article on moulding lengths: seen. Its rule is for a moulding whose whole width lies outside
    // the glass (no rebate), and its 1/4 in is for the fit in all four rails: 1/16 in each way in our terms.
    const { rails } = answer({
      units: 'in',
      picture: { width: 20, height: 16, allowance: '1/16' },
      section: { ...stick(2, 0, IN) },
    })
    expectWithin((rails?.footage ?? 0) / IN, 88.25, { withinMm: 1e-9 })
  })

  it('305 × 407 mm, 66 mm moulding, 4 mm fit in all: 1956 mm', () => {
    // A framing shop's page: seen.
    const { rails } = answer({ picture: { width: 407, height: 305, allowance: 1 }, section: stick(66, 0) })
    expectWithin(rails?.footage ?? 0, 1424 + 4 + 8 * 66, { withinMm: 1e-9 })
  })

  it('8 in opening, 2 in moulding, 1/8 in rebate: outer length 11 3/4 in', () => {
    // A woodworker's page: seen.
    const { rails } = answer({ units: 'in', picture: { width: 8, height: 8 }, section: stick(2, 0.125, IN) })
    expectWithin((rails?.list[0]?.longPoint ?? 0) / IN, 11.75, { withinMm: 1e-9 })
  })

  it('a hexagon of 8 in across the flats has sides of 4.6188 in', () => {
    // A retailer's page on woodworking mathematics: seen, to four places.
    const { rails } = answer({
      units: 'in',
      frame: { sides: 6 },
      picture: { acrossFlats: 8 },
      section: { ...stick(1, 0, IN) },
    })
    expect(rails?.list).toHaveLength(6)
    expectWithin((rails?.list[0]?.rebate ?? 0) / IN, 4.6188, { withinMm: 5e-5 })
    expect(rails?.list[0]?.mitre).toBe(30)
  })

  it('the mass of a frame in basswood: volume × 1000 × 0.37 × 1.12 at 12 %', () => {
    // Density by the Wood Handbook's equation (second party), specific gravity 0.37 at 12 % (second party).
    const { rails } = answer({
      picture: { width: 900, height: 600 },
      section: stick(50, 0),
      timber: { species: 'basswood' },
    })
    // A plain stick without a rebate: outer less inner rectangle × thickness.
    const volume = (1000 * 700 - 900 * 600) * 20
    expectWithin(rails?.volume ?? 0, volume - 0, { withinRatio: 1e-12 })
    expectWithin(rails?.mass ?? 0, volume * 1e-9 * 1000 * 0.37 * 1.12, { withinRatio: 1e-9 })
  })
})

describe('gilding against a worked example of the trade', () => {
  it('the centre-line length of a 30 × 40 in frame of 3 1/2 in moulding is 2 (30 + 40) + 4 × 3 1/2 in', () => {
    // A frame-maker's notes, 2011: seen ("12.83 ft"). The stretch's own centroid lies at the middle of a flat face.
    const { finish } = answer({
      units: 'in',
      picture: { width: 40, height: 30 },
      section: stick(3.5, 0, IN),
      finish: { zones: [{ from: 0, to: 1, leaf: '3 3/8', lap: 0 }] },
    })
    const zone = finish?.zones[0]
    expectWithin((zone?.area ?? 0) / (zone?.girth ?? 1) / IN / 12, 12.83, { withinMm: 0.005 })
  })
})
