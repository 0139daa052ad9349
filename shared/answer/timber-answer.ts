import type { CommissionAnswerData, CommissionFile } from '@shared/contracts'
import type { SectionMeasures } from '@shared/section'
import {
  blankFor,
  boardFeetOf,
  equilibriumMoistureOf,
  mitreGapOf,
  movementOf,
  requireSpecies,
  timberCautionsOf,
  USUAL_MOISTURE_PERCENT,
} from '@shared/timber'
import type { FrameRails } from './frame-rails'
import { placed } from './rails-answer'

type Timber = NonNullable<CommissionFile['timber']>
type Climate = NonNullable<Timber['workshop']>

const moistureOf = (path: string, { temperature, humidity }: Climate): number =>
  placed(path, () => equilibriumMoistureOf({ temperatureC: temperature, humidityPercent: humidity }))

/** Moisture of the wood as it leaves the workshop, per cent; 12 where no climate is given. */
export const workshopMoistureOf = ({ workshop }: Timber): number =>
  workshop === undefined
    ? USUAL_MOISTURE_PERCENT
    : equilibriumMoistureOf({ temperatureC: workshop.temperature, humidityPercent: workshop.humidity })

/** Blank, board feet, moistures and what the section moves between them. */
export function timberAnswerOf(
  file: CommissionFile,
  timber: Timber,
  {
    measures,
    frames,
  }: { readonly measures: SectionMeasures | undefined; readonly frames: readonly FrameRails[] },
): NonNullable<CommissionAnswerData['timber']> {
  placed('/timber', () => requireSpecies(timber.species))
  const workshop = timber.workshop && moistureOf('/timber/workshop', timber.workshop)
  const gallery = timber.gallery && moistureOf('/timber/gallery', timber.gallery)
  const movement =
    measures === undefined || workshop === undefined || gallery === undefined
      ? undefined
      : placed('/timber', () =>
          movementOf({
            species: timber.species,
            cut: timber.cut,
            widthMm: measures.wood.widthMm,
            fromPercent: workshop,
            toPercent: gallery,
          }),
        )
  const blank =
    measures === undefined
      ? undefined
      : placed('/mill', () =>
          blankFor({
            widthMm: measures.wood.blank.widthMm,
            thicknessMm: measures.wood.blank.thicknessMm,
            machiningAllowanceMm: file.mill?.machiningAllowance ?? 0,
          }),
        )
  const footageMm = frames.reduce((sum, frame) => sum + frame.footageMm, 0)
  const sides = file.frame?.sides ?? 4
  return {
    ...(blank !== undefined && {
      blank: { thickness: blank.thicknessMm, width: blank.widthMm, nominal: blank.label },
      ...(frames.length > 0 && { boardFeet: boardFeetOf(blank, footageMm) }),
    }),
    ...((workshop !== undefined || gallery !== undefined) && {
      emc: { ...(workshop !== undefined && { workshop }), ...(gallery !== undefined && { gallery }) },
    }),
    ...(movement !== undefined && {
      movement: movement.changeMm,
      mitreGap: mitreGapOf(movement.changeMm, sides),
    }),
    cautions: timberCautionsOf({
      species: timber.species,
      climates: [timber.workshop, timber.gallery].flatMap((climate) =>
        climate === undefined
          ? []
          : [{ temperatureC: climate.temperature, humidityPercent: climate.humidity }],
      ),
      hasMass: frames.length > 0,
      ...(movement !== undefined && { movement }),
    }),
  }
}
