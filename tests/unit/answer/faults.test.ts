import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { answerOf } from '@shared/answer'
import { readCommissionText } from '@shared/contracts'
import { Failure } from '@shared/failure'
import { ROOT } from '../../helpers/source-files'

const { section } = JSON.parse(readFileSync(join(ROOT, 'examples', 'harbour-at-low-water.json'), 'utf8'))

/** Every fault of a file as the command line says it: place, then words. */
function faultsOf(content: unknown): string[] {
  const text = typeof content === 'string' ? content : JSON.stringify(content)
  const reading = readCommissionText(text, Buffer.byteLength(text))
  if (reading.kind === 'refused') return reading.faults.map(({ path, says }) => `${path} ${says}`)
  try {
    answerOf(reading.file)
    return []
  } catch (error) {
    if (!(error instanceof Failure)) throw error
    return (error.details.faults ?? []).map(({ path, says }) => `${path} ${says}`)
  }
}

describe('a file with a fault', () => {
  const withMember = (member: object) => ({
    listel: 1,
    section: { ...section, gesso: 0, members: [{ kind: 'fillet', width: 10, rise: 0 }, member] },
  })
  it.each<readonly [string, unknown, string]>([
    ['an unknown key', { listel: 1, colour: 'red' }, '/colour'],
    ['a wrong version', { listel: 2 }, '/listel'],
    ['no version', {}, '/listel'],
    ['broken JSON', '{ "listel": 1, ', 'not JSON'],
    [
      'a scotia as high as it is wide',
      withMember({ kind: 'scotia', width: 6, rise: 6 }),
      '/section/members/1',
    ],
    [
      'a torus as high as it is wide',
      withMember({ kind: 'torus', width: 6, rise: -6 }),
      '/section/members/1',
    ],
    ['a cyma without a rise', withMember({ kind: 'cyma-recta', width: 6, rise: 0 }), '/section/members/1'],
    ['a width below nothing', withMember({ kind: 'fillet', width: -1, rise: 0 }), '/section/members/1/width'],
    [
      'a width beyond all sense',
      withMember({ kind: 'fillet', width: 1e308, rise: 0 }),
      '/section/members/1/width',
    ],
    [
      'a rebate deeper than the sight edge is high',
      { listel: 1, section: { ...section, rebate: { width: 9, depth: 40 } } },
      '/section/rebate',
    ],
    ['a bad fraction', { listel: 1, units: 'in', lengths: [{ length: '3 5/0' }] }, '/lengths/0/length'],
    ['a lone comma', { listel: 1, units: 'in', lengths: [{ length: '3,5' }] }, '/lengths/0/length'],
    [
      'some prices',
      { listel: 1, currency: 'EUR', lengths: [{ length: 2440, price: '1.00' }, { length: 3660 }] },
      '/lengths',
    ],
    ['a price without a currency', { listel: 1, lengths: [{ length: 2440, price: '1.00' }] }, '/currency'],
    [
      'a rail longer than every length',
      { listel: 1, lengths: [{ length: 900 }], demand: [{ id: 'a', length: 1000, count: 1 }] },
      '1000',
    ],
    ['an unknown species', { listel: 1, section, timber: { species: 'cork' } }, 'basswood'],
    [
      'a photograph of no size',
      { listel: 1, photographs: [{ id: 'p1', width: 0, height: 1, reference: {} }] },
      '/photographs/0/width',
    ],
  ])('is refused for %s, with the place and the mend', (_name, content, named) => {
    expect(faultsOf(content).join('\n')).toContain(named)
  })
})
