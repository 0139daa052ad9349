import { mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { CommissionAnswerSchema } from '@shared/contracts'
import { compute } from '../../helpers/compute'
import { ROOT } from '../../helpers/source-files'

const PATIENCE = 30_000
const EXAMPLES = readdirSync(join(ROOT, 'examples')).filter((name) => name.endsWith('.json'))

let folder: string
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'listel-compute-'))
})
afterAll(() => rmSync(folder, { recursive: true, force: true }))

function file(content: unknown, name = 'file.json'): string {
  const path = join(folder, name)
  writeFileSync(path, typeof content === 'string' ? content : JSON.stringify(content))
  return path
}

describe('compute', () => {
  it(
    'answers every example by its published contract, all in one start and in their order',
    { timeout: PATIENCE },
    () => {
      const { status, stdout, stderr } = compute(...EXAMPLES.map((name) => `examples/${name}`))
      expect([status, stderr]).toEqual([0, ''])
      const answers: unknown[] = JSON.parse(stdout)
      expect(answers).toHaveLength(EXAMPLES.length)
      for (const answer of answers)
        expect(CommissionAnswerSchema.safeParse(answer).error?.issues).toBeUndefined()
    },
  )

  it(
    'writes the three forms of the sheet beside the answer, marked as a draft',
    { timeout: PATIENCE },
    () => {
      const out = (name: string) => join(folder, name)
      const { status } = compute(
        'examples/harbour-at-low-water.json',
        '--sheet',
        out('a.pdf'),
        '--dxf',
        out('a.dxf'),
        '--svg',
        out('a.svg'),
      )
      expect(status).toBe(0)
      expect(readFileSync(out('a.pdf')).subarray(0, 5).toString()).toBe('%PDF-')
      expect(readFileSync(out('a.dxf'), 'utf8')).toContain('AC1015')
      expect(readFileSync(out('a.svg'), 'utf8')).toContain('draft, not approved')
      expect(readdirSync(folder).filter((name) => name.endsWith('.part'))).toEqual([])
    },
  )

  it('leaves no file behind when one of them cannot be written', { timeout: PATIENCE }, () => {
    const before = readdirSync(folder)
    const { status, stdout, stderr } = compute(
      'examples/harbour-at-low-water.json',
      '--dxf',
      join(folder, 'good.dxf'),
      '--svg',
      join(folder, 'no-such-folder', 'a.svg'),
    )
    expect([status, stdout]).toEqual([2, ''])
    expect(stderr).toContain('cannot be written')
    expect(readdirSync(folder)).toEqual(before)
  })

  it(
    'says nothing on standard output, and all faults on standard error, when any file has one',
    { timeout: PATIENCE },
    () => {
      const bad = file({
        listel: 1,
        section: {
          sightEdgeHeight: 30,
          rebate: { width: 8, depth: 20 },
          members: [{ kind: 'fillet', width: -4, rise: 0 }],
        },
        colour: 'red',
      })
      const { status, stdout, stderr } = compute('examples/plan-alone.json', bad)
      expect([status, stdout]).toEqual([2, ''])
      expect(stderr).toContain('/colour')
      expect(stderr).not.toMatch(/\bat .*\.ts/)
    },
  )

  it('publishes both schemas', { timeout: PATIENCE }, () => {
    const into = JSON.parse(compute('--schema').stdout)
    expect(into.$schema).toBe('https://json-schema.org/draft/2020-12/schema')
    expect(JSON.stringify(into)).toContain('"cyma-reversa"')
    const out = JSON.parse(compute('--schema', 'out').stdout)
    expect(Object.keys(out.properties)).toEqual(
      expect.arrayContaining(['section', 'wood', 'knife', 'rails', 'plan', 'timber', 'finish']),
    )
  })

  it('refuses ten megabytes of nesting, and an option nobody knows', { timeout: PATIENCE }, () => {
    const nested = compute(file('['.repeat(5_000_000) + ']'.repeat(5_000_000)))
    expect([nested.status, nested.stdout]).toEqual([2, ''])
    const deep = compute(file(`{"listel":1,"title":${'['.repeat(200_000)}${']'.repeat(200_000)}}`))
    expect([deep.status, deep.stdout]).toEqual([2, ''])
    expect(compute('examples/no-such-file.json', '--colour').status).toBe(2)
  })
})
