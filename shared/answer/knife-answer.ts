import type { CommissionAnswerData, CommissionFile } from '@shared/contracts'
import { knifeCautionsOf, knifeSizeOf, knifeTable, runningFiguresOf } from '@shared/knife'
import { woodFaceOf } from '@shared/section'
import type { Section } from '@shared/section'
import { headRunningOf, knifeHeadOf } from './head'

/** The knife for the wood face; absent where the head cannot cut it, which the checks then say. */
export function knifeAnswerOf(
  section: Section,
  written: NonNullable<CommissionFile['head']>,
): CommissionAnswerData['knife'] {
  const face = woodFaceOf(section).path
  const head = knifeHeadOf(written)
  const table = knifeTable(face, head)
  const size = knifeSizeOf(face, head)
  if (table.kind === 'refused' || size.kind === 'refused') return undefined
  const running = headRunningOf(written)
  const { feedPerMarkMm, marksPerInch, peripheralSpeedMPerS } = runningFiguresOf(running)
  return {
    height: size.heightMm,
    width: size.widthMm,
    table: table.rows.map(({ x, depth, face: height }) => ({ x, depth, face: height })),
    ...(feedPerMarkMm !== undefined && { feedPerMark: feedPerMarkMm }),
    ...(marksPerInch !== undefined && { marksPerInch }),
    ...(peripheralSpeedMPerS !== undefined && { peripheralSpeed: peripheralSpeedMPerS }),
    cautions: knifeCautionsOf(running),
  }
}
