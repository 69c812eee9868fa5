/** From a clean clone to the running product. Needs nothing but Node. */
import { ensureBuild } from './lib/build.mjs'
import { logFile, startServer, tail } from './lib/children.mjs'
import { readOptions } from './lib/options.mjs'
import { addressOf, onStopSignal, prepareProduct, readyText } from './lib/product.mjs'
import { complain, createSteps, duration, Refusal } from './lib/steps.mjs'

const help = `npm start [-- options]

Installs what is missing, starts a private PostgreSQL (or uses DATABASE_URL), brings the tables up to date,
loads the reference library and the demo firm, builds the client and serves it. Ctrl+C stops everything.

  --verbose   show the server's log here instead of keeping it in .data/logs/server.log
  --help      this text

.env.example lists every variable; a file named .env is read.`

let stopping = false
/** @type {() => Promise<void>} */
let release = () => Promise.resolve()
/** @type {import('./lib/children.mjs').Server | undefined} */
let server

async function start() {
  const options = readOptions(process.argv.slice(2), { verbose: { type: 'boolean' }, help: { type: 'boolean', short: 'h' } }, help)
  if (options.help) return console.log(help)
  const begun = performance.now()
  console.log('Sidebend is starting.')
  const stopAsked = /** @type {Promise<number>} */ (new Promise((resolve) => onStopSignal(() => {
    stopping = true
    resolve(0)
  })))
  const step = createSteps()
  const product = await prepareProduct(step)
  release = product.release
  await step('Client', async (note) => note((await ensureBuild()) ? 'built' : 'up to date'))
  const host = product.environment.HOST ?? ''
  const port = Number(product.environment.PORT)
  const address = product.environment.BASE_URL ?? addressOf(host, port)
  const running = await step('Server', async (note) => {
    server = await startServer({ ...product.environment, NODE_ENV: process.env.NODE_ENV ?? 'production', BASE_URL: address }, { log: 'server', ...(options.verbose ? { onLine: (text) => process.stdout.write(text) } : {}) })
    note(`process ${server.pid}`)
    return server
  })
  if (stopping) return
  console.log(`\nReady after ${duration(performance.now() - begun)}: ${readyText(address, product.signIns)}`)
  const code = await Promise.race([stopAsked, running.exited])
  if (!stopping) throw new Refusal(`The server ended by itself (exit code ${code}). The end of .data/logs/server.log:\n\n${tail(logFile('server'))}`)
}

try {
  await start()
} catch (error) {
  if (!stopping) {
    complain(error)
    process.exitCode = 1
  }
}
if (stopping) console.log('\nStopping: the server finishes what it has begun, then the database stops.')
const left = (await server?.stop()) ?? 0
if (stopping && left !== 0) {
  console.error(`The server did not end cleanly (exit code ${left}). See .data/logs/server.log.`)
  process.exitCode = 1
}
await release().catch(complain)
process.exit(process.exitCode ?? 0)
