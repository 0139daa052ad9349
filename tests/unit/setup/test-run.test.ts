import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, describe, expect, it } from 'vitest'
import { countLine, countTests } from '@server/setup/test-count.mjs'
import { projectsIn } from '@server/setup/test-projects.mjs'

const folder = mkdtempSync(join(tmpdir(), 'listel-count-'))
afterAll(() => rmSync(folder, { recursive: true }))

function reportOf(facts: Record<string, unknown>): string {
  const file = join(folder, 'report.json')
  const none = { numPassedTests: 0, numFailedTests: 0, numPendingTests: 0, numTodoTests: 0, testResults: [] }
  writeFileSync(file, JSON.stringify({ ...none, ...facts }))
  return file
}

describe('the count of a test run', () => {
  it('takes the runner’s own numbers', () => {
    const report = reportOf({ numPassedTests: 12, numPendingTests: 2, numTodoTests: 1 })
    expect(countTests(report, 0)).toEqual({ passed: 12, failed: 0, skipped: 3 })
    expect(countTests(reportOf({ numPassedTests: 1, numFailedTests: 4 }), 1).failed).toBe(4)
  })

  it('counts a file that could not be loaded as a failure', () => {
    const testResults = [
      { status: 'failed', assertionResults: [] },
      { status: 'failed', assertionResults: [{ status: 'failed' }] },
      { status: 'passed', assertionResults: [{ status: 'passed' }] },
    ]
    expect(countTests(reportOf({ numPassedTests: 1, numFailedTests: 1, testResults }), 1).failed).toBe(2)
  })

  it.each([
    ['the runner was not content though no test failed', { numPassedTests: 5 }, 1],
    ['no test ran', {}, 0],
    ['every test was skipped', { numPendingTests: 9 }, 0],
  ])('never calls it a success when %s', (_, facts, exitCode) => {
    expect(countTests(reportOf(facts), exitCode).failed).toBe(1)
  })

  it('never calls it a success without a report', () => {
    expect(countTests(join(folder, 'absent.json'), 0).failed).toBe(1)
  })

  it('is written on a line that names the skipped only where there are any', () => {
    expect(countLine({ passed: 3, failed: 0, skipped: 0 })).toBe('3 passed, 0 failed')
    expect(countLine({ passed: 3, failed: 1, skipped: 2 })).toBe('3 passed, 1 failed, 2 skipped')
  })
})

describe('the projects of a test run', () => {
  it('are all of them unless some are named', () => {
    expect([...projectsIn([])]).toEqual(['unit', 'reference', 'api', 'e2e'])
    expect([...projectsIn(['--project', 'unit', '--project=api', 'x.test.ts'])]).toEqual(['unit', 'api'])
  })

  it('are all of them when a pattern is given', () => {
    expect(projectsIn(['--project', '!e2e']).size).toBe(4)
    expect(projectsIn(['--project', 'unit', '--project', 'a*']).has('e2e')).toBe(true)
  })
})
