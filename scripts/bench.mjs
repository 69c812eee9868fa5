/** Installs what the benchmark needs, then runs it. */
import { readOptions } from './lib/options.mjs'
import { prepare, runTypeScript } from './lib/prepare.mjs'
import { onStopSignal } from './lib/product.mjs'
import { complain, createSteps } from './lib/steps.mjs'

const help = `npm run bench [-- options]

Measures the product on this machine, on a database of its own that is thrown away afterwards:
  cold and warm start; API look-up against the same SQL sent straight through pg;
  a PDF against Chromium's print-to-PDF of the same record's page;
  assessments per second under three standards, and the same variables in a general rule library.
Prints a table and writes .data/bench.json. Only ratios within one run compare across machines.

  --quick   shorter measurements, for trying it out
  --engine  assessments alone, without database or browser
  --help    this text`

try {
  const options = readOptions(process.argv.slice(2), { quick: { type: 'boolean' }, engine: { type: 'boolean' }, help: { type: 'boolean', short: 'h' } }, help)
  if (options.help) console.log(help)
  else {
    onStopSignal(() => { process.exitCode = 130 })
    // The measured starts must find the same ground whatever this machine's .env and shell say.
    process.env.ENV_FILE = '/dev/null'
    for (const name of ['DATABASE_URL', 'SMTP_URL', 'PORT', 'HOST', 'BASE_URL', 'DEMO', 'NODE_ENV']) delete process.env[name]
    await prepare(createSteps(), { debian: () => (options.engine ? [] : ['postgresql', 'poppler-utils', 'openssl', 'chromium', 'fonts-liberation']) })
    const code = await runTypeScript(['scripts/bench/index.ts', ...(options.quick ? ['--quick'] : []), ...(options.engine ? ['--engine'] : [])])
    process.exitCode ??= code
  }
} catch (error) {
  complain(error)
  process.exitCode = 1
}
