import { readFileSync } from 'node:fs'

/** Nothing counted yet. */
export const none = { passed: 0, failed: 0 }

/** Two results together. */
export const add = (a, b) => ({ passed: a.passed + b.passed, failed: a.failed + b.failed })

/**
 * What vitest's JSON report says, and its exit code. A file that broke before its first test counts as one failure; so
 * does a run that failed without a failed test: it crashed, or an error came from outside the tests.
 */
export function countReport(json, code) {
  const broken = json.testResults.filter(file => file.status === 'failed' && !file.assertionResults.some(test => test.status === 'failed'))
  const failed = json.numFailedTests + broken.length
  return { passed: json.numPassedTests, failed: failed === 0 && code !== 0 ? 1 : failed }
}

/** The result of a vitest run from its report; one failure where it left none. */
export function readReport(path, code) {
  try {
    return countReport(JSON.parse(readFileSync(path, 'utf8')), code)
  } catch {
    return { passed: 0, failed: 1 }
  }
}

/** The last line of npm test. */
export const summary = ({ passed, failed }) => `${passed} passed, ${failed} failed`
