import { Failure } from '@shared/failure'
import { requireSpecies } from './species'
import type { Cut } from './species'
import type { FigureStatus, Species, SpeciesFigure } from './species-table'

/** The range of moisture for which the movement coefficients are given, per cent (Table 13-5). */
export const COEFFICIENT_RANGE_PERCENT = { least: 6, greatest: 14 } as const
/** Wood neither swells nor shrinks above this moisture in eq. (13-3), per cent. */
export const FIBRE_SATURATION_PERCENT = 30

export interface MovementRequest {
  readonly species: string
  readonly cut: Cut
  /** The dimension at the first moisture, mm. */
  readonly widthMm: number
  readonly fromPercent: number
  readonly toPercent: number
  /** 'width' (the default) lies in the board's face, 'thickness' across it. */
  readonly direction?: 'width' | 'thickness'
}

export interface Movement {
  /** Change of the dimension, mm; positive is swelling. */
  readonly changeMm: number
  /** 'coefficient': eq. (13-2), both moistures within 6 to 14 %; 'shrinkage': eq. (13-3), a straight line to 30 %. */
  readonly method: 'coefficient' | 'shrinkage'
  /** How surely the species' figure that was used is the handbook's. */
  readonly status: FigureStatus
}

/**
 * Movement of a dimension between two moistures, by the Wood Handbook (FPL-GTR-190, 2010, p. 13-16): within 6 to 14 %
 * ΔD = D·C·(MF − MI), outside it ΔD = D·(MF − MI) / (30·100/S − 30 + MI). A moisture below 0 or above 30 % is Failure
 * 'input-invalid': neither equation speaks of it.
 */
export function movementOf(request: MovementRequest): Movement {
  const { widthMm, fromPercent, toPercent } = request
  refuseMoisture('/from', fromPercent)
  refuseMoisture('/to', toPercent)
  const species = requireSpecies(request.species)
  if (isWithinCoefficient(fromPercent) && isWithinCoefficient(toPercent)) {
    const { value, status } = figureAcross(species.movement, request)
    return { changeMm: widthMm * value * (toPercent - fromPercent), method: 'coefficient', status }
  }
  const { value, status } = figureAcross(species.shrinkage, request)
  const span = (FIBRE_SATURATION_PERCENT * 100) / value - FIBRE_SATURATION_PERCENT + fromPercent
  return { changeMm: (widthMm * (toPercent - fromPercent)) / span, method: 'shrinkage', status }
}

/**
 * Opening at a mitre when the rails' width changes by changeMm, mm, signed: positive opens at the back edge (swelling),
 * negative at the sight edge. The rails keep their length, so each mitre of angle θ from square turns by
 * sin θ·cos θ·ΔW/W, and the two over the mitre's length W/cos θ part by 2·sin θ·ΔW: √2·ΔW for a rectangle. First order in ΔW/W.
 */
export function mitreGapOf(changeMm: number, sides = 4): number {
  return 2 * Math.sin(Math.PI / sides) * changeMm
}

const isWithinCoefficient = (percent: number) =>
  percent >= COEFFICIENT_RANGE_PERCENT.least && percent <= COEFFICIENT_RANGE_PERCENT.greatest

/** The width of a flat-sawn board lies along the rings (tangential), that of a quarter-sawn one across them (radial). */
function figureAcross(
  figures: Species['movement'],
  { cut, direction = 'width' }: Pick<MovementRequest, 'cut' | 'direction'>,
): SpeciesFigure {
  const alongRings = (cut === 'flat') === (direction === 'width')
  return alongRings ? figures.tangential : figures.radial
}

function refuseMoisture(path: string, percent: number): void {
  if (percent >= 0 && percent <= FIBRE_SATURATION_PERCENT) return
  const says = `The moisture content is ${percent} %; wood moves between 0 and ${FIBRE_SATURATION_PERCENT} % only, give one within that.`
  throw new Failure('input-invalid', { says, faults: [{ path, code: 'out-of-range', says }] })
}
