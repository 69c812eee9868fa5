import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { describe, expect, it } from 'vitest'
import { casesLines, countCases, readCases, standardOf } from '../../../scripts/lib/cases.mjs'

const test = (title: string, status = 'passed', rules?: { standard: string; name: string; count: number }) => ({ title, status, meta: rules ? { rules } : {} })
const file = (name: string, ...tests: ReturnType<typeof test>[]) => ({ name: `/home/a/tests/unit/shared/${name}`, assertionResults: tests })
const registry = file('standards/registry.test.ts', test('ASME IX', 'passed', { standard: 'asme-ix', name: 'ASME IX', count: 70 }), test('ISO 15614-1', 'passed', { standard: 'iso-15614-1', name: 'ISO 15614-1', count: 40 }))
const cases = [
  ...['ixp-g01', 'ixp-g02', 'ixp-g03', 'ixp-g04'].map((id) => ({ id, standard: 'ASME BPVC.IX', file: 'asme-ix-procedure' })),
  { id: 'iso10-g39', standard: 'ISO 15610', file: 'iso-procedure' },
  { id: 'rec-g01', standard: 'ASME BPVC.IX', file: 'records' },
  { id: 'rec-g02', standard: 'any', file: 'records' },
]

describe('cases of a run', () => {
  const counted = countCases({
    testResults: [
      registry,
      file('standards/asme-ix-cases.test.ts', test('ixp-g01 a title'), test('ixp-g02 a title', 'failed'), test('disputed: ixp-g03 a title: a reason'), test('every case is run')),
      file('standards/asme-ix/review.test.ts', test('one'), test('two', 'failed'), test('three', 'pending')),
      file('standards/iso-15614-1/cases.test.ts', test('iso10-g39 first half'), test('iso10-g39 second half', 'failed')),
      file('standards/iso-15614-10/none.test.ts', test('of another standard')),
      file('assessment/records-cases.test.ts', test('rec-g01 a title'), test('rec-g09 is no case')),
    ],
  }, cases)

  it('counts rules, published cases and own tests of each standard as they ran', () => {
    expect(counted.standards).toEqual([
      { id: 'asme-ix', name: 'ASME IX', rules: 70, cases: { passed: 1, failed: 1, disputed: 1, later: 1 }, own: { passed: 2, failed: 2 } },
      // The worst of its tests is the case's outcome.
      { id: 'iso-15614-1', name: 'ISO 15614-1', rules: 40, cases: { passed: 0, failed: 1, disputed: 0, later: 0 }, own: { passed: 0, failed: 0 } },
    ])
  })

  it('counts other sets by file, and what has no test yet as later', () => expect(counted.sets).toEqual([{ name: 'records', cases: { passed: 1, failed: 0, disputed: 0, later: 1 } }]))

  it('shows them in columns', () => {
    const lines = casesLines(counted)
    expect(lines[0]).toMatch(/^ {2}standard +rules +cases passed +failed +disputed +later +own tests passed +failed$/)
    expect(lines[1]).toMatch(/^ {2}ASME IX +70 +1 +1 +1 +1 +2 +2$/)
    expect(lines.at(-1)).toMatch(/^ {2}records +1 +0 +0 +1$/)
  })

  it('puts the cases of a standard that has no rules into their set', () => {
    const without = countCases({ testResults: [] }, cases)
    expect(without.standards).toEqual([])
    expect(without.sets.map(({ name, cases: { later } }) => [name, later])).toEqual([['asme-ix-procedure', 4], ['iso-procedure', 1], ['records', 2]])
  })
})

it.each([['ASME BPVC.IX', 'asme-ix'], ['AWS D1.1/D1.1M', 'aws-d1-1'], ['AWS D1.2/D1.2M', 'aws-d1-2'], ['ISO 15614-1', 'iso-15614-1'], ['EN 1011-1', 'iso-15614-1'], ['ISO 15614-2', 'iso-15614-2']])('%s belongs to %s', (named, id) => expect(standardOf(named)).toBe(id))

it('reads the cases of a folder, but not the list of disputed ones', () => {
  const folder = mkdtempSync(path.join(tmpdir(), 'cases-'))
  try {
    writeFileSync(path.join(folder, 'materials.json'), JSON.stringify([{ id: 'mat-1', standard: 'ISO 14175', title: 'x' }]))
    writeFileSync(path.join(folder, 'disputed.json'), '[{ "id": "mat-1", "reason": "y" }]')
    expect(readCases(folder)).toEqual([{ id: 'mat-1', standard: 'ISO 14175', file: 'materials' }])
  } finally {
    rmSync(folder, { recursive: true })
  }
})
