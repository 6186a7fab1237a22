import { describe, expect, it } from 'vitest'
import { add, countReport, none, readReport, summary } from '../../../scripts/lib/results.mjs'

const file = (status: string, ...tests: string[]) => ({ status, assertionResults: tests.map(status => ({ status })) })

describe('countReport', () => {
  it('takes the counts of a good run', () => {
    const report = { numPassedTests: 2, numFailedTests: 0, testResults: [file('passed', 'passed', 'passed')] }
    expect(countReport(report, 0)).toEqual({ passed: 2, failed: 0 })
  })

  it('counts a failed test once', () => {
    const report = { numPassedTests: 1, numFailedTests: 1, testResults: [file('failed', 'passed', 'failed')] }
    expect(countReport(report, 1)).toEqual({ passed: 1, failed: 1 })
  })

  it('counts a file that broke before its first test', () => {
    const report = { numPassedTests: 1, numFailedTests: 0, testResults: [file('passed', 'passed'), file('failed')] }
    expect(countReport(report, 1)).toEqual({ passed: 1, failed: 1 })
  })

  it('counts an error from outside the tests', () => {
    const report = { numPassedTests: 1, numFailedTests: 0, testResults: [file('passed', 'passed')] }
    expect(countReport(report, 1)).toEqual({ passed: 1, failed: 1 })
  })
})

describe('the last line', () => {
  it('sums the runs', () => {
    expect(summary([{ passed: 3, failed: 0 }, { passed: 2, failed: 1 }].reduce(add, none))).toBe('5 passed, 1 failed')
  })

  it('counts a run that left no report as failed', () => {
    expect(readReport('/nowhere/report.json', 1)).toEqual({ passed: 0, failed: 1 })
  })
})
