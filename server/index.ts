import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import { createApp } from './app.ts'
import { readEnv } from './config/env.ts'
import { closeServices, openServices } from './config/services.ts'

/** How long requests in progress may take once told to stop. */
const DRAIN_MILLISECONDS = 15_000

const env = readEnv()
const services = await openServices(env)
const { log } = services
let draining = false
const server = createServer(createApp(services, { isDraining: () => draining }))
// A large recording over a slow line takes minutes; headers must come at once all the same.
server.requestTimeout = 600_000
server.headersTimeout = 20_000

await new Promise<void>((resolve, reject) => {
  server.once('error', reject)
  server.listen(env.PORT, env.HOST, resolve)
})
// Port 0 means "any free one": links in mail need the one that was given.
env.PORT = (server.address() as AddressInfo).port
await services.queue.work(services)
log.info({ host: env.HOST, port: env.PORT, mail: services.mailer.caught ? 'caught' : 'smtp' }, 'listening')

async function stop(signal: string): Promise<void> {
  if (draining) return
  draining = true
  log.info({ signal }, 'stopping: no new connections, finishing what runs')
  const closed = new Promise<void>((resolve) => server.close(() => resolve()))
  // A connection whose request has just ended is idle but kept alive by its browser: look again until none is left.
  const idle = setInterval(() => server.closeIdleConnections(), 100)
  const impatience = setTimeout(() => server.closeAllConnections(), DRAIN_MILLISECONDS)
  await closed
  clearInterval(idle)
  clearTimeout(impatience)
  await closeServices(services)
  log.info('stopped')
  process.exit(0)
}

for (const signal of ['SIGTERM', 'SIGINT'] as const) {
  process.on(signal, () => {
    stop(signal).catch((error: unknown) => {
      log.fatal({ err: error }, 'could not stop cleanly')
      process.exit(1)
    })
  })
}
