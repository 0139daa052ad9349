import type { Member, Section } from '@shared/section'
import { because, drawer, judged, seen } from '../reasons'

const SQUARE_BACK = { x: 0, height: 0 }

/** Seen from the right: widths are read as far as the outer round; the back is still to be settled. */
const UPLAND_MEMBERS: readonly Member[] = [
  { kind: 'fillet', width: 5, rise: 0, ...because(seen(0.3)) },
  { kind: 'cyma-reversa', width: 18, rise: 10, ...because(seen(0.4), drawer(19)) },
  { kind: 'fillet', width: 0, rise: -2, basis: { rise: judged('the shadow line beside the bead') } },
  { kind: 'bead', width: 8, rise: 0, ...because(seen(0.4)) },
  { kind: 'fillet', width: 4, rise: 0, ...because(seen(0.4)) },
  {
    kind: 'cavetto',
    width: 31,
    rise: 26,
    ...because(seen(0.5), judged('from the depth of its shadow on the left rail')),
  },
  { kind: 'fillet', width: 5, rise: 0, ...because(seen(0.4)) },
  { kind: 'ovolo', width: 22, rise: -3, arc: 76, ...because(seen(0.5)) },
  { kind: 'cyma-recta', width: 16, rise: -27 },
]

export const UPLAND: Section = {
  sightEdgeHeight: 18,
  rebate: { width: 8, depth: 12 },
  backSplay: SQUARE_BACK,
  gesso: 0.7,
  tolerance: 0.2,
  basis: { sightEdgeHeight: judged('the picture must clear the wall behind 12 of rebate') },
  members: UPLAND_MEMBERS,
}

/** Seen squarely from the front: widths are sure, heights are not. */
export const RIDGE: Section = {
  sightEdgeHeight: 15,
  rebate: { width: 8, depth: 10 },
  backSplay: { x: 3, height: 8 },
  gesso: 0.6,
  tolerance: 0.2,
  basis: { sightEdgeHeight: judged('as much lip as the old backboard leaves room for') },
  members: [
    { kind: 'fillet', width: 4, rise: 0, ...because(seen(0.25)) },
    { kind: 'cavetto', width: 16, rise: 12, ...because(seen(0.3), drawer(6)) },
    { kind: 'fillet', width: 5, rise: 0, ...because(seen(0.3)) },
    {
      kind: 'ovolo',
      width: 20,
      rise: 6,
      ...because(seen(0.3), judged('from the even fall of light across it')),
    },
    {
      kind: 'splay',
      width: 14,
      rise: -16,
      ...because(seen(0.4), judged('from the shadow it throws on the wall')),
    },
  ],
}

/** A small grainy print; the first reading of it, which came back. */
export const TARN: Section = {
  sightEdgeHeight: 15,
  rebate: { width: 7, depth: 10 },
  backSplay: SQUARE_BACK,
  gesso: 0.5,
  tolerance: 0.2,
  basis: { sightEdgeHeight: drawer(22) },
  members: [
    { kind: 'fillet', width: 4, rise: 0, ...because(seen(0.6)) },
    { kind: 'bead', width: 6, rise: 0, ...because(seen(0.7)) },
    { kind: 'fillet', width: 3, rise: 0, ...because(seen(0.7)) },
    {
      kind: 'cyma-recta',
      width: 27,
      rise: 16,
      ...because(seen(0.9), judged('the print is too soft to tell')),
    },
    { kind: 'fillet', width: 6, rise: 0, ...because(seen(0.8)) },
    { kind: 'cavetto', width: 12, rise: -9, ...because(seen(0.9), drawer(22)) },
    { kind: 'splay', width: 6, rise: -7, ...because(seen(1.1), drawer(22)) },
  ],
}

/** Raking light on bare walnut. */
export const PEBBLES: Section = {
  sightEdgeHeight: 14,
  rebate: { width: 6, depth: 9 },
  backSplay: SQUARE_BACK,
  gesso: 0,
  tolerance: 0.15,
  basis: { sightEdgeHeight: judged('5 of lip over a board of 4 and its fixings') },
  members: [
    { kind: 'fillet', width: 6, rise: 0, ...because(seen(0.3)) },
    {
      kind: 'splay',
      width: 8,
      rise: 5,
      ...because(seen(0.3), judged('from the shadow it throws on the sight edge')),
    },
    { kind: 'fillet', width: 24, rise: 0, ...because(seen(0.3)) },
    {
      kind: 'scotia',
      width: 12,
      rise: 4,
      ...because(seen(0.3), judged('from the shadow of its outer edge')),
    },
    { kind: 'fillet', width: 10, rise: 0, ...because(seen(0.3)) },
    { kind: 'splay', width: 4, rise: -5, ...because(seen(0.4), judged('as the sight edge is eased')) },
  ],
}
