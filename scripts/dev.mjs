/** Vite with hot reload, and a server that starts again when its code changes. */
import path from 'node:path'
import { startServer } from './lib/children.mjs'
import { readOptions } from './lib/options.mjs'
import { root } from './lib/paths.mjs'
import { addressOf, onStopSignal, prepareProduct, readyText } from './lib/product.mjs'
import { complain, createSteps } from './lib/steps.mjs'

const help = `npm run dev

Prepares everything as npm start does, then serves the client through Vite with hot reload and starts the server
again whenever something below server/ or shared/ changes. Ctrl+C stops everything.`

/** @type {(() => unknown)[]} */
const closers = []
let stopping = false

async function develop() {
  if (readOptions(process.argv.slice(2), { help: { type: 'boolean', short: 'h' } }, help).help) return console.log(help)
  const stopAsked = /** @type {Promise<void>} */ (new Promise((resolve) => onStopSignal(() => {
    stopping = true
    resolve(undefined)
  })))
  const step = createSteps()
  const { environment, signIns, release } = await prepareProduct(step)
  closers.unshift(release)
  const host = environment.HOST ?? ''
  process.env.API_ORIGIN = `http://${host}:${environment.PORT}`
  const { createServer } = await import('vite')
  const vite = await step('Vite', () => createServer({ root, configFile: path.join(root, 'vite.config.ts') }).then((made) => made.listen()))
  closers.unshift(() => vite.close())
  const address = addressOf(host, vite.config.server.port)
  const serverEnvironment = { ...environment, NODE_ENV: 'development', BASE_URL: vite.resolvedUrls?.local[0]?.replace(/\/$/, '') ?? address }

  /** @type {import('./lib/children.mjs').Server | undefined} */
  let server
  let current = Promise.resolve()
  const restart = () => {
    current = current.then(async () => {
      const before = server
      server = undefined
      await before?.stop()
      if (stopping) return
      const next = await step('Server', () => startServer(serverEnvironment, { log: 'server', onLine: (text) => process.stdout.write(text) }))
      server = next
      void next.exited.then((code) => server === next && !stopping && console.error(`The server ended by itself (exit code ${code}). It starts again at the next change.`))
    }).catch(complain)
    return current
  }
  closers.unshift(() => current.then(() => server?.stop()))
  await restart()

  /** @type {NodeJS.Timeout | undefined} */
  let soon
  vite.watcher.on('all', (_event, file) => {
    if (!/^(server|shared)\//.test(path.relative(root, file))) return
    clearTimeout(soon)
    soon = setTimeout(() => void restart(), 200)
  })
  console.log(`\nReady: ${readyText(serverEnvironment.BASE_URL, signIns)}`)
  await stopAsked
}

try {
  await develop()
} catch (error) {
  if (!stopping) {
    complain(error)
    process.exitCode = 1
  }
}
for (const close of closers) await Promise.resolve(close()).catch(complain)
process.exit(process.exitCode ?? 0)
