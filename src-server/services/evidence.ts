import type { Evidence } from '@shared/contracts'
import { picturesOf } from './pictures'
import { photographsOf } from './photographs'
import type { Tx } from './transaction'

/** What an issue rests on, as it stands at this moment: measured pictures, photographs with what was read off them. */
export async function evidenceOf(tx: Tx, commissionId: string): Promise<Evidence> {
  const pictures = await picturesOf(commissionId, tx)
  const photographs = await photographsOf(commissionId, tx)
  return {
    pictures: pictures.flatMap(({ picture, measurement }) =>
      picture.state === 'open' && measurement !== null
        ? [
            {
              name: picture.name,
              copies: picture.copies,
              measurementNo: measurement.no,
              measurement: measurement.document,
            },
          ]
        : [],
    ),
    photographs: photographs
      .filter(({ photograph }) => photograph.state === 'open')
      .map(({ photograph, file, reading }) => ({
        key: photograph.key,
        title: photograph.title,
        source: photograph.source,
        citation: photograph.citation,
        sha256: file.sha256,
        readingNo: reading?.no ?? null,
        reading: reading?.document ?? null,
      })),
  }
}
