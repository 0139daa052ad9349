import { describe, expect, it } from 'vitest'
import { lineFrom, pointFrom } from '@shared/geometry'
import {
  KNIFE_CAUTIONS,
  clampCheckOf,
  knifeCautionsOf,
  knifeHeadFrom,
  knifeSizeOf,
  runningFiguresOf,
  speedChecksOf,
  waveHeightOf,
} from '@shared/knife'
import { EVERY_KIND_FACE } from '../../helpers/knife-faces'
import { expectWithin } from '../../helpers/expect-within'

const HEAD = knifeHeadFrom(140, 20)
const RUN = {
  cuttingDiameterMm: 125,
  knives: 2,
  finishingKnives: 1,
  rpm: 6000,
  maxRpm: 7000,
  feedMmPerMin: 9000,
} as const

describe('knifeSizeOf', () => {
  // The face is 66 wide and 31 deep: 66 + 2 × 5. R 70, e = 23.941410: √(70² − e²) = 65.778483, √(39² − e²) = 30.786505.
  it('gives width with overrun, height and the room left to clamp', () => {
    const size = knifeSizeOf(EVERY_KIND_FACE, HEAD)
    if (size.kind === 'refused') throw new Error(size.says)
    expectWithin(size.widthMm, 76, { withinMm: 1e-9 })
    expectWithin(size.depthMm, 31, { withinMm: 1e-9 })
    expectWithin(size.heightMm, 65.778483 - 30.786505, { withinMm: 2e-6 })
    expectWithin(size.clampRoomMm, 30.786505, { withinMm: 1e-6 })
    expect(size).not.toHaveProperty('stockHeightMm')
  })

  // 34.99 of outline and 10 to clamp: 44.99.
  it('takes the least stock height that holds outline and clamp, or says none does', () => {
    const size = knifeSizeOf(EVERY_KIND_FACE, HEAD, { stockHeightsMm: [60, 40, 50], overrunMm: 3 })
    expect(size).toMatchObject({ stockHeightMm: 50, widthMm: 72 })
    expect(knifeSizeOf(EVERY_KIND_FACE, HEAD, { stockHeightsMm: [40] })).toMatchObject({
      stockHeightMm: null,
    })
  })

  it('refuses a face too deep and an overrun below nothing', () => {
    expect(knifeSizeOf(EVERY_KIND_FACE, knifeHeadFrom(80, 20)).kind).toBe('refused')
    expect(() => knifeSizeOf(EVERY_KIND_FACE, HEAD, { overrunMm: -1 })).toThrow(/overrun is -1 mm/)
  })
})

describe('runningFiguresOf', () => {
  // 9000 / (6000 × 1) = 1.5 mm; 25.4 / 1.5 = 16.93; π · 125 · 6000 / 60 000 = 39.27 m/s; 0.75² / (62.5 + 62.4955) = 0.0045.
  it('counts finishing knives, not knives', () => {
    const figures = runningFiguresOf(RUN)
    expectWithin(figures.feedPerMarkMm ?? 0, 1.5, { withinMm: 1e-12 })
    expectWithin(figures.marksPerInch ?? 0, 16.9333, { within: 0.0001 })
    expectWithin(figures.peripheralSpeedMPerS ?? 0, 39.2699, { within: 0.0001 })
    expectWithin(figures.waveHeightMm ?? 0, 0.00450016, { withinMm: 1e-8 })
    expectWithin(runningFiguresOf({ ...RUN, finishingKnives: 2 }).feedPerMarkMm ?? 0, 0.75, {
      withinMm: 1e-12,
    })
  })

  it('leaves out what nothing is known for', () => {
    expect(runningFiguresOf({ cuttingDiameterMm: 125, feedMmPerMin: 9000 })).toEqual({})
    expect(Object.keys(runningFiguresOf({ cuttingDiameterMm: 125, rpm: 6000 }))).toEqual([
      'peripheralSpeedMPerS',
    ])
  })

  it('takes one finishing knife where none is given', () => {
    expectWithin(
      runningFiguresOf({ cuttingDiameterMm: 125, rpm: 6000, feedMmPerMin: 9000 }).feedPerMarkMm ?? 0,
      1.5,
      { withinMm: 1e-12 },
    )
  })

  it('leaves out the wave where a mark is longer than the cutting circle, and the cautions say why', () => {
    const wild = { cuttingDiameterMm: 125, rpm: 10, feedMmPerMin: 9000 }
    expect(waveHeightOf(900, 62.5)).toBeUndefined()
    expect(runningFiguresOf(wild)).not.toHaveProperty('waveHeightMm')
    expect(knifeCautionsOf(wild).join(' ')).toMatch(/no face is left/)
  })

  it('names every size that cannot be', () => {
    expect(() =>
      runningFiguresOf({ cuttingDiameterMm: 0, rpm: -1, maxRpm: Number.NaN, feedMmPerMin: 0, knives: 0 }),
    ).toThrow(/cutting circle is 0.*speed is -1.*marked on the head is NaN.*feed is 0.*number of knives is 0/)
    expect(() => runningFiguresOf({ ...RUN, finishingKnives: 3 })).toThrow(/3 finishing knives.*head of 2/)
  })
})

describe('checks', () => {
  it('stops a speed above the one marked on the head, and only that', () => {
    expect(speedChecksOf({ ...RUN, rpm: 7001 })).toMatchObject([
      { severity: 'stop', value: 7001, limit: 7000 },
    ])
    expect(speedChecksOf({ ...RUN, rpm: 7000 })).toMatchObject([{ severity: 'ok' }])
    expect(speedChecksOf({ cuttingDiameterMm: 125, maxRpm: 7000 })).toEqual([])
  })

  it('warns where the marked speed is not known', () => {
    const [check] = speedChecksOf({ cuttingDiameterMm: 125, rpm: 6000 })
    expect(check).toMatchObject({ code: 'speed', severity: 'warn' })
  })

  // 125 mm at 6000 is 39.3 m/s, below 40; at 7000 45.8; 225 mm at 7000 82.5.
  it('warns of a peripheral speed unusual for hand feed', () => {
    const manual = { ...RUN, feedBy: 'manual' as const }
    expect(speedChecksOf(manual)[1]).toMatchObject({ severity: 'warn', limit: 40 })
    expect(speedChecksOf({ ...manual, rpm: 7000 }).length).toBe(1)
    expect(speedChecksOf({ ...manual, rpm: 7000, cuttingDiameterMm: 225 })[1]).toMatchObject({ limit: 70 })
    expect(speedChecksOf({ ...RUN, feedBy: 'mechanical' }).length).toBe(1)
  })

  it('stops a face that leaves no room to clamp', () => {
    expect(clampCheckOf(EVERY_KIND_FACE, HEAD)).toMatchObject({ code: 'clamp', severity: 'ok', value: 31 })
    const deep = [lineFrom(pointFrom(0, 60), pointFrom(5, 10))]
    const check = clampCheckOf(deep, HEAD)
    expect(check).toMatchObject({ code: 'clamp', severity: 'stop', value: 50 })
    // 70 − √(23.941410² + 10²) = 44.054073
    expectWithin(check.limit, 44.054073, { withinMm: 1e-6 })
    expect(check.says).toMatch(/at most 44\.05 mm/)
  })
})

describe('knifeCautionsOf', () => {
  it('always has the standing ones', () => {
    expect(knifeCautionsOf({ cuttingDiameterMm: 125 })).toEqual(KNIFE_CAUTIONS)
    expect(KNIFE_CAUTIONS.join(' ')).toMatch(/competent person.*marked on the head.*maker’s data/)
  })

  it('adds those for hand feed and for too few marks', () => {
    expect(knifeCautionsOf({ ...RUN, feedBy: 'manual' }).join(' ')).toMatch(/only tools marked for it/)
    expect(knifeCautionsOf(RUN)).toEqual(KNIFE_CAUTIONS)
    expect(knifeCautionsOf({ ...RUN, feedMmPerMin: 12_000 }).join(' ')).toMatch(/12\.7 knife marks/)
  })
})
