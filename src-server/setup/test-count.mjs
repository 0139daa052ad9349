import { readFileSync } from 'node:fs'

/**
 * Counts from the runner's own report. The exit code has the last word: a file that cannot be loaded, an
 * unhandled rejection or a run without a single test counts as one failure even if no test itself failed.
 */
export function countTests(reportFile, exitCode) {
  const { passed, failed, skipped } = countsIn(reportFile)
  const isSound = exitCode === 0 && passed + failed > 0
  return { passed, failed: isSound ? failed : Math.max(failed, 1), skipped }
}

function countsIn(reportFile) {
  let report
  try {
    report = JSON.parse(readFileSync(reportFile, 'utf8'))
  } catch {
    return { passed: 0, failed: 0, skipped: 0 } // the runner broke off before it could report
  }
  const unloaded = report.testResults.filter(
    ({ status, assertionResults }) =>
      status === 'failed' && assertionResults.every((one) => one.status !== 'failed'),
  )
  return {
    passed: report.numPassedTests,
    failed: report.numFailedTests + unloaded.length,
    skipped: report.numPendingTests + report.numTodoTests,
  }
}

/** `12 passed, 0 failed`; skipped ones are named only where there are any. */
export function countLine({ passed, failed, skipped }) {
  return `${passed} passed, ${failed} failed${skipped > 0 ? `, ${skipped} skipped` : ''}`
}
