/** How much of the standards' rules the tests of the domain run through, in branches. */
import { existsSync, readFileSync, rmSync } from 'node:fs'
import path from 'node:path'
import { run } from './lib/children.mjs'
import { branchLines } from './lib/coverage.mjs'
import { readOptions } from './lib/options.mjs'
import { root } from './lib/paths.mjs'
import { complain } from './lib/steps.mjs'

const help = `npm run coverage

Runs the unit tests of shared/ once, counting the branches of shared/standards that they go through, and prints the share by
standard and in all. Fails when a test fails or when less than the share that vite.config.ts asks for is covered. Takes some minutes.
  --help   this text`

/** @type {(text: string) => import('./lib/coverage.mjs').Summary} */
const parse = JSON.parse

async function coverage() {
  const options = readOptions(process.argv.slice(2), { help: { type: 'boolean', short: 'h' } }, help)
  if (options.help) return console.log(help)
  const summary = path.join(root, 'coverage', 'coverage-summary.json')
  rmSync(summary, { force: true })
  const args = ['run', '--project', 'unit', 'tests/unit/shared', '--reporter=default', '--coverage', '--coverage.reportOnFailure', '--coverage.include=shared/standards/**/*.ts', '--coverage.exclude=tests/**']
  const code = await run(process.execPath, ['node_modules/vitest/vitest.mjs', ...args], { env: { ...process.env, NODE_ENV: 'test' } })
  if (existsSync(summary)) console.log(`\n${branchLines(parse(readFileSync(summary, 'utf8')), root).join('\n')}`)
  else console.log('\nNo coverage was written, because the run stopped before its end.')
  if (code !== 0) process.exitCode = 1
}

await coverage().catch((error) => {
  complain(error)
  process.exitCode = 1
})
