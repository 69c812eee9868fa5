/**
 * What a run of the unit tests proves of each standard: its rules, the published cases and our own. Everything is read from the run's
 * report and from the cases' own files; nothing is counted here that did not run.
 */
import { readdirSync, readFileSync } from 'node:fs'
import path from 'node:path'

/** @typedef {{ title: string, fullName?: string, status: string, meta?: { rules?: { standard: string, name: string, count: number } } }} Test */
/** @typedef {{ testResults: { name: string, assertionResults: Test[] }[] }} CaseReport */
/** @typedef {{ id: string, standard: string, file: string }} PublishedCase */
/** @typedef {{ passed: number, failed: number, disputed: number, later: number }} Tally */
/** @typedef {{ id: string, name: string, rules: number, cases: Tally, own: { passed: number, failed: number } }} StandardRow */
/** @typedef {{ name: string, cases: Tally }} SetRow */

/** Case files whose cases belong to a standard's rules; the cases of the others stand under the name of their file. */
const OF_STANDARDS = ['asme-ix-procedure', 'aws-structural-procedure', 'iso-procedure']

/** Folder or beginning of the file's name, below the unit tests of the standards, by standard. @param {string} standard */
const testsOf = (standard) => new RegExp(`/unit/shared/standards/${standard}(?:/|-[a-z-]+\\.test\\.)`)

/**
 * The standard whose rules a case tries, by what the case names; of ISO 15614-1 also the standards that it draws on.
 * @param {string} named
 * @returns {string}
 */
export function standardOf(named) {
  if (/BPVC\.IX/.test(named)) return 'asme-ix'
  if (/D1\.2/.test(named)) return 'aws-d1-2'
  if (/D1\.1/.test(named)) return 'aws-d1-1'
  return /15614-2/.test(named) ? 'iso-15614-2' : 'iso-15614-1'
}

/**
 * @param {string} folder of the published cases
 * @returns {PublishedCase[]}
 */
export function readCases(folder) {
  const files = readdirSync(folder).filter((file) => file.endsWith('.json') && file !== 'disputed.json').sort()
  /** @type {(text: string) => { id: string, standard: string }[]} */
  const parse = JSON.parse
  return files.flatMap((file) => {
    const cases = parse(readFileSync(path.join(folder, file), 'utf8'))
    return cases.map(({ id, standard }) => ({ id, standard, file: path.basename(file, '.json') }))
  })
}

/** @returns {Tally} */
const empty = () => ({ passed: 0, failed: 0, disputed: 0, later: 0 })

/** The case id that a test's title begins with. @param {string} title */
const idIn = (title) => /^(?:disputed: )?([a-z0-9]+(?:-[a-z0-9]+)+) /.exec(title)?.[1] ?? null

/**
 * How each published case fared: its worst test counts, and a case without a test is for later.
 * @param {CaseReport} report
 * @param {readonly PublishedCase[]} cases
 * @returns {Map<string, keyof Tally>}
 */
function outcomes(report, cases) {
  const known = new Set(cases.map(({ id }) => id))
  /** @type {Map<string, keyof Tally>} */
  const found = new Map()
  for (const { title, status } of report.testResults.flatMap((file) => file.assertionResults)) {
    const id = idIn(title)
    if (id === null || !known.has(id)) continue
    const outcome = status !== 'passed' ? 'failed' : title.startsWith('disputed: ') ? 'disputed' : 'passed'
    const before = found.get(id)
    if (before === undefined || before === 'passed' || outcome === 'failed') found.set(id, outcome)
  }
  return found
}

/**
 * @param {CaseReport} report of the unit tests, as vitest's JSON reporter writes it
 * @param {readonly PublishedCase[]} cases
 * @returns {{ standards: StandardRow[], sets: SetRow[] }}
 */
export function countCases(report, cases) {
  const tests = report.testResults.flatMap(({ name, assertionResults }) => assertionResults.map((test) => ({ ...test, file: name.replaceAll('\\', '/') })))
  const standards = tests.flatMap(({ meta }) => (meta?.rules ? [{ id: meta.rules.standard, name: meta.rules.name, rules: meta.rules.count, cases: empty(), own: { passed: 0, failed: 0 } }] : []))
  /** @type {Map<string, SetRow>} */
  const sets = new Map()
  const found = outcomes(report, cases)
  for (const { id, standard, file } of cases) {
    const row = OF_STANDARDS.includes(file) ? standards.find((one) => one.id === standardOf(standard)) : undefined
    const set = sets.get(file) ?? { name: file, cases: empty() }
    if (!row) sets.set(file, set)
    ;(row ?? set).cases[found.get(id) ?? 'later'] += 1
  }
  const published = new Set(cases.map(({ id }) => id))
  for (const row of standards) {
    const pattern = testsOf(row.id)
    for (const { file, title, status } of tests) if (pattern.test(file) && !published.has(idIn(title) ?? '')) row.own[status === 'passed' ? 'passed' : 'failed'] += 1
  }
  return { standards, sets: [...sets.values()] }
}

/** @param {readonly (readonly string[])[]} rows @returns {string[]} the first column to the left, figures to the right */
function columns(rows) {
  const widths = (rows[0] ?? []).map((_, i) => Math.max(...rows.map((row) => (row[i] ?? '').length)))
  return rows.map((row) => `  ${row.map((cell, i) => (i === 0 ? cell.padEnd(widths[i] ?? 0) : cell.padStart(widths[i] ?? 0))).join('  ')}`.trimEnd())
}

/**
 * @param {{ standards: StandardRow[], sets: SetRow[] }} counted
 * @returns {string[]} two small tables, line by line
 */
export function casesLines({ standards, sets }) {
  const figures = (/** @type {Tally} */ { passed, failed, disputed, later }) => [passed, failed, disputed, later].map(String)
  return [
    ...columns([['standard', 'rules', 'cases passed', 'failed', 'disputed', 'later', 'own tests passed', 'failed'], ...standards.map(({ name, rules, cases, own }) => [name, String(rules), ...figures(cases), String(own.passed), String(own.failed)])]),
    '',
    ...columns([['other cases', 'passed', 'failed', 'disputed', 'later'], ...sets.map(({ name, cases }) => [name, ...figures(cases)])]),
  ]
}
