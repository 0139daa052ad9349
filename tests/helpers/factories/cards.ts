import type { MillCard, SawCard } from '@shared/contracts'

export const MILL_CARD: MillCard = {
  maxWidth: 230,
  maxDepth: 45,
  wheelNose: 0.8,
  wheelWidth: 2.5,
  maxToothRatio: 2.5,
  sideClearance: { angle: 3, over: 3 },
  leastWood: 5,
  machiningAllowance: 6,
  head: {
    cuttingDiameter: 125,
    hookAngle: 20,
    knives: 2,
    finishingKnives: 1,
    rpm: 6000,
    maxRpm: 7000,
    feed: 9000,
    feedBy: 'mechanical',
  },
  lengths: [
    { length: 2440, price: '18.50' },
    { length: 3660, price: '26.00' },
  ],
}

export const SAW_CARD: SawCard = {
  name: 'Mitre saw',
  kerf: 3.2,
  margin: 2,
  endTrim: 75,
  shortestSafe: 200,
  smallestUsableOffcut: 400,
}
