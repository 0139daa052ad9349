import type { Section } from '@shared/section'
import { because, drawer, gauged, judged } from '../reasons'

const SQUARE_BACK = { x: 0, height: 0 }

/** Highest at the sight edge and falling back: quiet, for a small dark picture. */
export const FALLING_BACK: Section = {
  sightEdgeHeight: 34,
  rebate: { width: 9, depth: 20 },
  backSplay: SQUARE_BACK,
  gesso: 0.6,
  tolerance: 0.2,
  basis: { sightEdgeHeight: drawer(31) },
  members: [
    { kind: 'fillet', width: 4, rise: 0, ...because(drawer(31)) },
    { kind: 'torus', width: 13, rise: 0, ...because(drawer(31)) },
    { kind: 'fillet', width: 3, rise: 0, ...because(drawer(31)) },
    { kind: 'cyma-recta', width: 30, rise: -15, ...because(gauged(0.3), gauged(0.3)) },
    { kind: 'fillet', width: 3, rise: 0, ...because(gauged(0.2)) },
    { kind: 'bead', width: 6, rise: 0, ...because(gauged(0.2)) },
    { kind: 'fillet', width: 2.5, rise: 0, ...because(gauged(0.2)) },
    {
      kind: 'cavetto',
      width: 8,
      rise: -7,
      ...because(judged('to bring the back down to 12'), judged('as the width')),
    },
  ],
}

/** A deep hollow between two roundings, for the pair of harbours. */
export const HOLLOW: Section = {
  sightEdgeHeight: 18,
  rebate: { width: 8, depth: 12.5 },
  backSplay: { x: 4, height: 10 },
  gesso: 0.6,
  tolerance: 0.2,
  basis: { sightEdgeHeight: gauged(0.2) },
  members: [
    { kind: 'fillet', width: 3, rise: 0, ...because(gauged(0.1)) },
    { kind: 'cyma-reversa', width: 12, rise: 7, ...because(gauged(0.15), gauged(0.2)) },
    { kind: 'fillet', width: 2.5, rise: 0, ...because(gauged(0.1)) },
    { kind: 'scotia', width: 20, rise: 8, ...because(gauged(0.2), gauged(0.3)) },
    { kind: 'fillet', width: 3, rise: 0, ...because(gauged(0.1)) },
    { kind: 'torus', width: 15, rise: 0, ...because(gauged(0.2)) },
    { kind: 'fillet', width: 2.5, rise: 0, ...because(gauged(0.1)) },
    { kind: 'cyma-reversa', width: 18, rise: -13, ...because(drawer(14), drawer(14)) },
    { kind: 'fillet', width: 3, rise: 0, ...because(judged('the back edge is worn away on the piece')) },
  ],
}

/** A fluted band between two small mouldings. */
export const FLUTED: Section = {
  sightEdgeHeight: 20,
  rebate: { width: 10, depth: 14 },
  backSplay: SQUARE_BACK,
  gesso: 0.4,
  tolerance: 0.2,
  basis: { sightEdgeHeight: drawer(9) },
  members: [
    { kind: 'fillet', width: 2.5, rise: 0, ...because(drawer(9)) },
    { kind: 'bead', width: 6, rise: 0, ...because(drawer(9)) },
    { kind: 'fillet', width: 2.5, rise: 0, ...because(drawer(9)) },
    { kind: 'cavetto', width: 8, rise: 7, ...because(drawer(9), drawer(9)) },
    { kind: 'fillet', width: 3, rise: 0, ...because(drawer(9)) },
    {
      kind: 'flutes',
      width: 39,
      rise: 0,
      count: 5,
      fillet: 2.25,
      depth: 2,
      ...because(judged('five flutes are named in the bill of 1871')),
    },
    { kind: 'fillet', width: 3, rise: 0, ...because(judged('as on the other side of the flutes')) },
    { kind: 'ovolo', width: 9, rise: 8, ...because(drawer(9), drawer(9)) },
    { kind: 'fillet', width: 4, rise: 0, ...because(drawer(9)) },
    { kind: 'cyma-reversa', width: 15, rise: -18, ...because(drawer(17), drawer(17)) },
  ],
}

/** Reeds at the sight edge, a long free swell, a thumb at the back. */
export const REEDED: Section = {
  sightEdgeHeight: 17,
  rebate: { width: 7, depth: 11 },
  backSplay: SQUARE_BACK,
  gesso: 0.3,
  tolerance: 0.2,
  basis: { sightEdgeHeight: gauged(0.2) },
  members: [
    { kind: 'fillet', width: 2.5, rise: 0, ...because(gauged(0.15)) },
    { kind: 'reeds', width: 15, rise: 0, count: 3, fillet: 0, ...because(gauged(0.2)) },
    { kind: 'quirk', width: 2.6, rise: 0, depth: 2, shape: 'square', ...because(gauged(0.2)) },
    { kind: 'ovolo', width: 9, rise: 7, ...because(gauged(0.2), gauged(0.3)) },
    { kind: 'fillet', width: 2.5, rise: 0, ...because(gauged(0.15)) },
    {
      kind: 'free',
      width: 26,
      rise: 9,
      curves: [
        [
          [7, -3],
          [9, 1.5],
          [13, 5],
        ],
        [
          [17, 8.5],
          [20, 9],
          [26, 9],
        ],
      ],
      ...because(gauged(0.4), judged('drawn by eye between the two ends that survive')),
    },
    { kind: 'fillet', width: 2.5, rise: 0, ...because(gauged(0.2)) },
    { kind: 'thumb', width: 12, rise: -15, ...because(drawer(3), drawer(3)) },
  ],
}

/** A flat frieze between a small inner and a stronger outer moulding. */
export const FRIEZE: Section = {
  sightEdgeHeight: 22,
  rebate: { width: 9, depth: 15 },
  backSplay: SQUARE_BACK,
  gesso: 0.7,
  tolerance: 0.2,
  basis: { sightEdgeHeight: drawer(27) },
  members: [
    { kind: 'fillet', width: 3.5, rise: 0, ...because(drawer(27)) },
    { kind: 'cyma-recta', width: 10, rise: 7, ...because(drawer(27), drawer(27)) },
    { kind: 'fillet', width: 3, rise: 0, ...because(drawer(27)) },
    { kind: 'cavetto', width: 4, rise: -4, ...because(drawer(27), drawer(27)) },
    { kind: 'fillet', width: 32, rise: 0, ...because(judged('room for the painted scrolls')) },
    { kind: 'cavetto', width: 5, rise: 5, ...because(drawer(27), drawer(27)) },
    { kind: 'fillet', width: 2.5, rise: 0, ...because(drawer(27)) },
    { kind: 'torus', width: 12, rise: 0, ...because(drawer(28)) },
    { kind: 'fillet', width: 2.5, rise: 0, ...because(drawer(27)) },
    { kind: 'cyma-reversa', width: 15, rise: -13, ...because(drawer(28), drawer(28)) },
  ],
}
