import { randomUUID } from 'node:crypto'
import type { Actor } from '@shared/access'
import type { MillCard } from '@shared/contracts'
import { takeOnClient } from '../services/clients'
import { takeOnMill } from '../services/mills'
import { addSawCard } from '../services/saws'
import { changeSettings } from '../services/settings'

/** What the demo's people and commissions hold on to. */
export interface DemoWorkshop {
  readonly clientIds: { readonly harbourMuseum: string; readonly collegeGallery: string }
  readonly millIds: { readonly riverside: string; readonly hilltop: string }
}

/** The workshop itself, its clients, its mills with their cards, its saw. All of it invented. */
export async function enterDemoWorkshop(actor: Actor): Promise<DemoWorkshop> {
  await changeSettings(actor, {
    version: 0,
    document: {
      workshop: 'Ashgrove & Lunn, frame makers',
      units: 'mm',
      vocabulary: 'moulding',
      currency: 'EUR',
      allowance: 3,
      signature: 'Maren Ashgrove\nAshgrove & Lunn, frame makers',
    },
  })
  const harbourMuseum = await takeOnClient(actor, { name: 'Harbour Museum, Osterlay' })
  const collegeGallery = await takeOnClient(actor, { name: 'Tarn College Gallery' })
  const riverside = await takeOnMill(actor, {
    name: 'Riverside Planing Mill',
    email: 'orders@riverside-planing.example',
    card: RIVERSIDE_CARD,
  })
  const hilltop = await takeOnMill(actor, {
    name: 'Hilltop Joinery',
    email: 'workshop@hilltop-joinery.example',
    card: HILLTOP_CARD,
  })
  await addSawCard(actor, { operationId: randomUUID(), document: MITRE_SAW })
  return {
    clientIds: { harbourMuseum: harbourMuseum.id, collegeGallery: collegeGallery.id },
    millIds: { riverside: riverside.mill.id, hilltop: hilltop.mill.id },
  }
}

const RIVERSIDE_CARD: MillCard = {
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

const HILLTOP_CARD: MillCard = {
  ...RIVERSIDE_CARD,
  maxWidth: 150,
  maxDepth: 32,
  wheelNose: 1.2,
  wheelWidth: 3,
  head: { ...RIVERSIDE_CARD.head, cuttingDiameter: 100, hookAngle: 15, rpm: 7000, maxRpm: 8500, feed: 6000 },
  lengths: [
    { length: 2400, price: null },
    { length: 3000, price: null },
  ],
}

const MITRE_SAW = {
  name: 'Double mitre saw',
  kerf: 3.2,
  margin: 2,
  endTrim: 75,
  shortestSafe: 200,
  smallestUsableOffcut: 400,
}
