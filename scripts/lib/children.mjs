import { spawn } from 'node:child_process'
import { closeSync, mkdirSync, openSync, readFileSync } from 'node:fs'
import path from 'node:path'
import { setTimeout as sleep } from 'node:timers/promises'
import { dataDir, root } from './paths.mjs'
import { Refusal } from './steps.mjs'

/** @type {Set<import('node:child_process').ChildProcess>} */
const running = new Set()

/**
 * Has `stopCommands` end this child too.
 * @template {import('node:child_process').ChildProcess} C
 * @param {C} child
 * @returns {C}
 */
export function track(child) {
  running.add(child)
  child.once('exit', () => running.delete(child))
  child.once('error', () => running.delete(child))
  return child
}

/** Asks every command that still runs to stop. */
export function stopCommands() {
  for (const child of running) child.kill('SIGTERM')
}

/**
 * @param {string} file
 * @param {number} [lines]
 * @returns {string} the end of a log; empty when there is none
 */
export function tail(file, lines = 25) {
  try {
    return readFileSync(file, 'utf8').trimEnd().split('\n').slice(-lines).join('\n')
  } catch {
    return ''
  }
}

/** @param {string} name */
export const logFile = (name) => path.join(dataDir(), 'logs', `${name}.log`)

/**
 * Runs a command to its end in the project's folder, without stdin.
 * @param {string} command
 * @param {readonly string[]} args
 * @param {{ log?: string, env?: NodeJS.ProcessEnv }} [options] log: keep the output in that log instead of showing it
 * @returns {Promise<number>} exit code; 128 or more when a signal ended it
 */
export function run(command, args, { log, env = process.env } = {}) {
  if (log) mkdirSync(path.dirname(logFile(log)), { recursive: true })
  const output = log ? openSync(logFile(log), 'w') : 'inherit'
  return new Promise((resolve, reject) => {
    const child = track(spawn(command, args, { cwd: root, env, stdio: ['ignore', output, output] }))
    if (typeof output === 'number') closeSync(output)
    child.once('error', (error) => reject(new Refusal(`${command} could not be started: ${error.message}`)))
    child.once('exit', (code, signal) => resolve(code ?? (signal ? 128 : 1)))
  })
}

/**
 * Runs a command whose output only matters when it fails.
 * @param {string} what what it does, to begin the sentence when it fails: "Building the client"
 * @param {string} log
 * @param {string} command
 * @param {readonly string[]} args
 * @param {NodeJS.ProcessEnv} [env]
 * @throws {Refusal} with the end of its log
 */
export async function runQuietly(what, log, command, args, env) {
  const code = await run(command, args, { log, ...(env ? { env } : {}) })
  if (code !== 0) throw new Refusal(`${what} failed (exit code ${code}). The end of ${path.relative(root, logFile(log))}:\n\n${tail(logFile(log))}`)
}

/**
 * @typedef {object} Server
 * @property {number} pid
 * @property {Promise<number>} exited its exit code, when it ends
 * @property {() => Promise<number>} stop asks it to drain, insists after 30 s, resolves to its exit code
 */

/**
 * Starts server/index.ts in a process group of its own, so that Ctrl+C reaches it through `stop` alone, and waits until it answers.
 * @param {NodeJS.ProcessEnv} env with HOST and PORT
 * @param {{ log: string, seconds?: number, onLine?: (text: string) => void }} options log: name of the log
 * @returns {Promise<Server>}
 * @throws {Refusal} with the end of its log when it does not come up
 */
export async function startServer(env, { log, seconds = 60, onLine }) {
  const file = logFile(log)
  mkdirSync(path.dirname(file), { recursive: true })
  const output = onLine ? 'pipe' : openSync(file, 'w')
  const child = spawn(process.execPath, ['--import', 'tsx', '--import', './scripts/lib/leash.mjs', 'server/index.ts'], { cwd: root, env, detached: true, stdio: ['ignore', output, output, 'ipc'] })
  if (typeof output === 'number') closeSync(output)
  if (onLine) for (const stream of [child.stdout, child.stderr]) stream?.setEncoding('utf8').on('data', onLine)
  /** @type {number | undefined} */
  let ended
  const exited = /** @type {Promise<number>} */ (new Promise((resolve) => {
    child.once('exit', (code, signal) => resolve((ended = code ?? (signal ? 128 : 1))))
    child.once('error', () => resolve((ended = 1)))
  }))
  const stop = async () => {
    if (ended !== undefined) return ended
    child.kill('SIGTERM')
    const insist = setTimeout(() => child.kill('SIGKILL'), 30_000)
    const code = await exited
    clearTimeout(insist)
    return code
  }
  const address = `http://${env.HOST === '0.0.0.0' || env.HOST === '::' ? '127.0.0.1' : env.HOST}:${env.PORT}/readyz`
  const hint = () => (onLine ? '' : ` The end of ${path.relative(root, file)}:\n\n${tail(file)}`)
  for (const end = Date.now() + seconds * 1000; ; await sleep(100)) {
    if (ended !== undefined) throw new Refusal(`The server ended while starting (exit code ${ended}).${hint()}`)
    const answer = await fetch(address, { signal: AbortSignal.timeout(5000) }).catch(() => null)
    await answer?.body?.cancel()
    if (answer?.status === 200) return { pid: child.pid ?? 0, exited, stop }
    if (Date.now() > end) {
      await stop()
      throw new Refusal(`The server did not answer ${address} within ${seconds} s.${hint()}`)
    }
  }
}
