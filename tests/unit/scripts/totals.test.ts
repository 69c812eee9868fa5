import { describe, expect, it } from 'vitest'
import { addTotals, countReport, totalsLine } from '../../../scripts/lib/totals.mjs'

const report = (given: Partial<Parameters<typeof countReport>[0] & object>) => ({ numPassedTests: 0, numFailedTests: 0, numPendingTests: 0, numTodoTests: 0, testResults: [], ...given })
const file = (status: string, tests: string[]) => ({ name: 'a.test.ts', status, assertionResults: tests.map((one) => ({ status: one, title: one })) })

describe('countReport', () => {
  it('counts what the runner counted', () => {
    expect(countReport(report({ numPassedTests: 4, numFailedTests: 1, numPendingTests: 2, numTodoTests: 1, testResults: [file('failed', ['passed', 'failed'])] }), 1)).toEqual({ passed: 4, failed: 1, skipped: 3 })
  })

  it.each([
    ['no report was written', null, 1],
    ['no report was written although the exit code is 0', null, 0],
    ['a file did not load', report({ numPassedTests: 4, testResults: [file('failed', [])] }), 1],
    ['every test passed but the run failed', report({ numPassedTests: 4, testResults: [file('passed', ['passed'])] }), 1],
    ['no test ran', report({}), 0],
    ['every test was skipped', report({ numPendingTests: 3 }), 0],
  ])('has one failure when %s', (_what, given, exitCode) => {
    expect(countReport(given, exitCode).failed).toBe(1)
  })

  it('lets a filter choose nothing, but not fail silently', () => {
    expect(countReport(report({}), 0, { mayBeEmpty: true })).toEqual({ passed: 0, failed: 0, skipped: 0 })
    expect(countReport(report({}), 1, { mayBeEmpty: true }).failed).toBe(1)
  })

  it('does not count a failed test twice through its file and the exit code', () => {
    expect(countReport(report({ numFailedTests: 1, testResults: [file('failed', ['failed'])] }), 1).failed).toBe(1)
  })
})

describe('totalsLine', () => {
  it('is plain', () => {
    expect(totalsLine(addTotals([{ passed: 1, failed: 0, skipped: 0 }, { passed: 40, failed: 2, skipped: 0 }]))).toBe('41 passed, 2 failed')
    expect(totalsLine({ passed: 3, failed: 0, skipped: 2 })).toBe('3 passed, 0 failed, 2 skipped')
    expect(totalsLine(addTotals([]))).toBe('0 passed, 0 failed')
  })
})
