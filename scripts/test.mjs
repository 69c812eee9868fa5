/** Type-check, lint and every test, from a clean clone on. Needs nothing but Node. */
import { existsSync, readFileSync, rmSync } from 'node:fs'
import path from 'node:path'
import { casesLines, countCases, readCases } from './lib/cases.mjs'
import { run } from './lib/children.mjs'
import { readTestArgs, testSteps } from './lib/options.mjs'
import { dataDir, root } from './lib/paths.mjs'
import { prepare, runTypeScript } from './lib/prepare.mjs'
import { onStopSignal } from './lib/product.mjs'
import { complain, createSteps, duration } from './lib/steps.mjs'
import { addTotals, countReport, totalsLine } from './lib/totals.mjs'

const help = `npm test [-- steps] [-- filters and vitest options]

Installs what is missing, then runs ${testSteps.join(', ')} in this order, all of them even when one fails,
and closes with a line of totals. The exit code is 0 only when nothing failed and every step ran something.
Tests have a database of their own: a private cluster, or <name>_test_… beside the database of DATABASE_URL.

  npm test -- unit                   one step (types, lint, unit, api, e2e; several may be named)
  npm test -- unit units/parse       of one step, the files whose path has this in it
  npm test -- unit -t 'bare fraction'  of one step, the tests whose name matches
  npm test -- unit --coverage        with coverage
  --help                             this text`

/** @type {Record<'types' | 'lint', { title: string, args: string[] }>} */
const checks = {
  types: { title: 'Type-check', args: ['node_modules/typescript/bin/tsc', '-p', '.'] },
  lint: { title: 'Lint', args: ['node_modules/eslint/bin/eslint.js', '.', '--max-warnings', '0'] },
}

/**
 * @param {import('./lib/options.mjs').TestStep} step
 * @param {readonly string[]} rest
 * @returns {Promise<import('./lib/totals.mjs').Totals>}
 */
async function runStep(step, rest) {
  if (step === 'types' || step === 'lint') {
    const code = await run(process.execPath, checks[step].args)
    return code === 0 ? { passed: 1, failed: 0, skipped: 0 } : { passed: 0, failed: 1, skipped: 0 }
  }
  const file = path.join(dataDir(), 'test', `${step}.json`)
  rmSync(file, { force: true })
  const filtered = rest.length > 0
  const args = ['run', '--project', step, '--reporter=default', '--reporter=json', `--outputFile.json=${file}`, ...(filtered ? ['--passWithNoTests'] : []), ...rest]
  const code = await run(process.execPath, ['node_modules/vitest/vitest.mjs', ...args], { env: { ...process.env, NODE_ENV: 'test' } })
  const report = existsSync(file) ? /** @type {import('./lib/totals.mjs').Report} */ (JSON.parse(readFileSync(file, 'utf8'))) : null
  // Of a part of the tests the table would show what was left out as missing.
  if (step === 'unit' && report && !filtered) console.log(`\n${casesLines(countCases(report, readCases(path.join(root, 'tests/fixtures/cases')))).join('\n')}`)
  return countReport(report, code, { mayBeEmpty: filtered })
}

async function test() {
  const { help: wantsHelp, steps, rest } = readTestArgs(process.argv.slice(2))
  if (wantsHelp) return console.log(help)
  let stopped = false
  onStopSignal(() => { stopped = true })
  // Asked once .env is read.
  const needsDatabase = () => (steps.includes('api') || steps.includes('e2e')) && !process.env.DATABASE_URL
  // Unit tests verify signatures and render pages too, so only the browser and the database are left out where no step needs them.
  await prepare(createSteps(), {
    debian: () => [...(needsDatabase() ? ['postgresql'] : []), ...(steps.every((step) => step in checks) ? [] : ['poppler-utils', 'openssl']), ...(steps.includes('e2e') ? ['chromium', 'fonts-liberation'] : [])],
  })
  /** @type {{ step: string, totals: import('./lib/totals.mjs').Totals, ms: number }[]} */
  const results = []
  for (const step of steps) {
    if (stopped) break
    console.log(`\n── ${step} ──`)
    const begun = performance.now()
    results.push({ step, totals: await runStep(step, rest), ms: performance.now() - begun })
  }
  // A run that was cut short could not let its database go; this stops it unless another run uses it.
  if (needsDatabase() && (stopped || results.some(({ totals }) => totals.failed > 0))) await runTypeScript(['scripts/postgres.ts', 'release', '--test', '--user', String(process.pid)])
  const totals = addTotals(results.map((result) => result.totals))
  if (rest.length > 0 && totals.passed + totals.failed === 0) {
    console.log(`\nNo test matches ${rest.join(' ')}.`)
    totals.failed = 1
  }
  if (stopped) totals.failed = Math.max(totals.failed, 1)
  console.log(`\n── results in ${path.relative(root, path.join(dataDir(), 'test'))} ──`)
  for (const { step, totals: part, ms } of results) console.log(`  ${step.padEnd(6)} ${duration(ms).padStart(8)}  ${totalsLine(part)}`)
  if (stopped) console.log('  stopped before the end')
  console.log(`\n${totalsLine(totals)}`)
  if (totals.failed > 0) process.exitCode = 1
}

await test().catch((error) => {
  complain(error)
  console.log(`\n${totalsLine({ passed: 0, failed: 1, skipped: 0 })}`)
  process.exitCode = 1
})
