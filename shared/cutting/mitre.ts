import { faultUnless, isSize, refuseFaults } from './refusal'

/** Angles of a mitre and its bevel as a saw is set for them, radians from square and from upright. */
export interface CompoundMitre {
  readonly mitreRad: number
  readonly bevelRad: number
}

/** Mitre of a regular frame of so many sides (3 or more), radians from square: π/n. */
export function mitreAngleOf(sides: number): number {
  refuseFaults(
    faultUnless(Number.isInteger(sides) && sides >= 3, '/sides', sides, 'a whole number, 3 or more'),
  )
  return Math.PI / sides
}

/**
 * Mitre of a rail that meets one of another width at a square corner, radians from square: tan θ = other width ÷ own width.
 * The two rails' angles add up to 90°; the members meet along the joint only if the section is scaled across.
 */
export function unequalMitreOf({
  ownWidthMm,
  otherWidthMm,
}: {
  readonly ownWidthMm: number
  readonly otherWidthMm: number
}): number {
  refuseFaults([
    ...faultUnless(isSize(ownWidthMm), '/ownWidth', ownWidthMm, 'more than 0 mm'),
    ...faultUnless(isSize(otherWidthMm), '/otherWidth', otherWidthMm, 'more than 0 mm'),
  ])
  return Math.atan2(otherWidthMm, ownWidthMm)
}

/**
 * Saw settings for a sprung moulding cut flat on its back. `springRad` is the angle between its back and the wall that the corner
 * turns (0 to π/2), `cornerRad` the angle between the two walls (0 to π), as carpenters' crown tables have it:
 * tan mitre = sin spring ÷ tan(corner/2), sin bevel = cos spring · cos(corner/2).
 */
export function compoundMitreOf({
  springRad,
  cornerRad,
}: {
  readonly springRad: number
  readonly cornerRad: number
}): CompoundMitre {
  refuseFaults([
    ...faultUnless(springRad >= 0 && springRad <= Math.PI / 2, '/spring', springRad, 'from 0 to π/2'),
    ...faultUnless(cornerRad > 0 && cornerRad <= Math.PI, '/corner', cornerRad, 'more than 0 and at most π'),
  ])
  return {
    mitreRad: Math.atan2(Math.sin(springRad), Math.tan(cornerRad / 2)),
    bevelRad: Math.asin(Math.cos(springRad) * Math.cos(cornerRad / 2)),
  }
}

/**
 * Mitre and bevel of a regular frame whose section is tilted by `tiltRad` from the plane of the frame (0 to π/2): the frame lies in
 * the plane of one wall, so the spring is π/2 less the tilt. No tilt gives π/n and 0.
 */
export const tiltedMitreOf = (sides: number, tiltRad: number): CompoundMitre =>
  compoundMitreOf({ springRad: Math.PI / 2 - tiltRad, cornerRad: Math.PI - 2 * mitreAngleOf(sides) })
