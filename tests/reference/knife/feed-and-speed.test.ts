import { describe, it } from 'vitest'
import { peripheralSpeedOf, runningFiguresOf, waveHeightOf } from '@shared/knife'
import { expectWithin } from '../../helpers/expect-within'

const FOOT_MM = 304.8

describe('marks per inch = rpm × knives / (feed in ft/min × 12): FDMC magazine, January 2009 (read); examples computed', () => {
  it.each([
    { rpm: 7200, knives: 2, feet: 30, marks: 40 },
    { rpm: 6000, knives: 2, feet: 40, marks: 25 },
  ])('$rpm rpm, $knives knives, $feet ft/min: $marks', ({ rpm, knives, feet, marks }) => {
    const figures = runningFiguresOf({
      cuttingDiameterMm: 125,
      finishingKnives: knives,
      rpm,
      feedMmPerMin: feet * FOOT_MM,
    })
    expectWithin(figures.marksPerInch ?? 0, marks, { within: 1e-9 })
  })
})

describe('feed per knife = feed / (rpm × knives): a tool maker’s guide, p. 116 (read); examples computed', () => {
  it.each([
    { metres: 12, rpm: 6000, knives: 4, feedMm: 0.5 },
    { metres: 24, rpm: 7000, knives: 4, feedMm: 0.857 },
  ])('$metres m/min, $rpm rpm, $knives knives: $feedMm mm', ({ metres, rpm, knives, feedMm }) => {
    const figures = runningFiguresOf({
      cuttingDiameterMm: 125,
      finishingKnives: knives,
      rpm,
      feedMmPerMin: metres * 1000,
    })
    expectWithin(figures.feedPerMarkMm ?? 0, feedMm, { withinMm: 0.0005 })
  })
})

describe('peripheral speed = π·D·n: the same guide (read); examples computed', () => {
  it.each([
    [125, 6000, 39.27],
    [140, 6000, 43.98],
    [120, 7000, 43.98],
    [180, 4500, 42.41],
  ])('%i mm at %i rpm: %f m/s', (diameterMm, rpm, speed) => {
    expectWithin(peripheralSpeedOf(diameterMm, rpm), speed, { within: 0.005 })
  })
})

// P. Koch, Wood Machining Processes (from memory): f²/(8R). f 1.25, R 62.5: 0.003125, exactly 0.0031251 (computed).
describe('wave height', () => {
  it('f 1.25 mm, R 62.5 mm', () => {
    expectWithin(waveHeightOf(1.25, 62.5) ?? 0, 0.003125, { withinMm: 1e-6 })
    expectWithin(waveHeightOf(1.25, 62.5) ?? 0, 0.0031250781, { withinMm: 1e-9 })
  })
})
