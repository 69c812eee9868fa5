import { stopCommands } from './children.mjs'
import { prepareDatabase, releaseDatabase } from './database.mjs'
import { ensureSecrets, mergeEnv } from './environment.mjs'
import { dataDir } from './paths.mjs'
import { choosePort } from './ports.mjs'
import { prepare } from './prepare.mjs'

/** The port when nobody asks for another. */
export const usualPort = 4400

/**
 * @param {string} host
 * @param {number} port
 * @returns {string} address to open in a browser on this machine
 */
export const addressOf = (host, port) => `http://${['127.0.0.1', '0.0.0.0', '::', '::1'].includes(host) ? 'localhost' : host}:${port}`

/**
 * Everything that the server stands on, for start and dev alike.
 * @param {import('./steps.mjs').Step} step
 * @returns {Promise<{ environment: NodeJS.ProcessEnv, signIns: import('./database.mjs').SignIn[], release: () => Promise<void> }>}
 *   environment: of the server, with PORT and HOST settled; release: stops the private database unless somebody else uses it
 */
export async function prepareProduct(step) {
  await prepare(step, { debian: () => [...(process.env.DATABASE_URL ? [] : ['postgresql']), 'poppler-utils', 'openssl'] })
  const secrets = await step('Secrets', (note) => {
    const { secrets, made } = ensureSecrets()
    note(made.length > 0 ? `made ${made.join(' and ')}` : 'kept')
    return secrets
  })
  const demo = process.env.DEMO !== '0' && process.env.DEMO !== 'false'
  const isPrivate = !process.env.DATABASE_URL
  const release = async () => void (isPrivate && (await releaseDatabase()))
  try {
    const host = process.env.HOST || '127.0.0.1'
    const port = await choosePort(process.env.PORT, usualPort, host)
    const settled = mergeEnv([process.env, secrets, { HOST: host, PORT: String(port), DATA_DIR: dataDir(), DEMO: demo ? '1' : '0' }])
    const { url, signIns } = await prepareDatabase(step, { demo, environment: settled })
    return { environment: { ...settled, PORT: String(port), DATA_DIR: dataDir(), DATABASE_URL: url }, signIns, release }
  } catch (error) {
    await release()
    throw error
  }
}

/**
 * Calls `stop` once when somebody asks this process to end, or when the npm that started it is gone; asking again ends it at once.
 * @param {() => void} stop
 */
export function onStopSignal(stop) {
  let asked = 0
  const ask = () => {
    // npm passes on a signal that a terminal has sent to everybody already: that echo is no second request.
    if (asked && Date.now() - asked > 1000) process.exit(130)
    if (asked) return
    asked = Date.now()
    stopCommands()
    stop()
  }
  for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) process.on(signal, ask)
  // Started by npm, and npm was killed: nobody is left to stop this process.
  const parent = process.ppid
  if (process.env.npm_lifecycle_event) setInterval(() => process.ppid !== parent && !asked && ask(), 1000).unref()
}

/**
 * What stands on the terminal once all is up.
 * @param {string} address
 * @param {readonly import('./database.mjs').SignIn[]} signIns none without the demo firm
 * @returns {string} the address, one line a sign-in in columns, and how to stop
 */
export function readyText(address, signIns) {
  const width = (/** @type {'role' | 'email'} */ key) => Math.max(...signIns.map((row) => row[key].length))
  const rows = signIns.map((row) => `    ${row.role.padEnd(width('role'))}  ${row.email.padEnd(width('email'))}  ${row.password}`)
  return [address, '', ...(rows.length > 0 ? ['  Demo sign-ins:', ...rows, ''] : []), 'Ctrl+C stops it.'].join('\n')
}
