import { fork } from 'node:child_process'
import path from 'node:path'
import { track } from './children.mjs'
import { runTypeScript } from './prepare.mjs'
import { root } from './paths.mjs'
import { Refusal } from './steps.mjs'

/** @typedef {{ role: string, email: string, password: string }} SignIn */

/**
 * Database up, tables as this version wants them, reference library and demo firm loaded.
 * @param {import('./steps.mjs').Step} step
 * @param {{ demo: boolean, environment: NodeJS.ProcessEnv }} options
 * @returns {Promise<{ url: string, signIns: SignIn[] }>}
 * @throws {Refusal} in a sentence
 */
export async function prepareDatabase(step, { demo, environment }) {
  const worker = track(fork(path.join(root, 'scripts/lib/database-worker.ts'), { cwd: root, env: environment, execArgv: ['--import', 'tsx'], stdio: ['ignore', 'inherit', 'inherit', 'ipc'] }))
  /**
   * @template T
   * @param {'database' | 'migrate' | 'demo'} act
   * @param {string} [url]
   * @returns {Promise<T>}
   */
  const ask = (act, url) =>
    new Promise((resolve, reject) => {
      const ended = () => reject(new Refusal(`The step "${act}" ended before it was done.`))
      worker.once('exit', ended)
      worker.once('message', (/** @type {{ answer?: T, error?: string }} */ message) => {
        worker.off('exit', ended)
        if (message.error !== undefined) reject(new Refusal(message.error))
        else resolve(/** @type {T} */ (message.answer))
      })
      worker.send({ act, url, user: process.pid })
    })
  try {
    const url = await step('PostgreSQL', async (note) => {
      const answer = /** @type {{ url: string, detail: string }} */ (await ask('database'))
      note(answer.detail)
      return answer.url
    })
    await step('Tables', async (note) => {
      const { applied } = /** @type {{ applied: string[] }} */ (await ask('migrate', url))
      note(applied.length > 0 ? `applied ${applied.length} migration${applied.length === 1 ? '' : 's'}` : 'up to date')
    })
    if (!demo) return { url, signIns: [] }
    const signIns = await step('Library and demo', async (note) => {
      const answer = /** @type {{ signIns: SignIn[] }} */ (await ask('demo', url))
      note('Larkfield Fabrication')
      return answer.signIns
    })
    return { url, signIns }
  } finally {
    if (worker.connected) worker.disconnect()
  }
}

/** Ends this process's use of the private cluster, which stops unless somebody else uses it. */
export const releaseDatabase = () => runTypeScript(['scripts/postgres.ts', 'release', '--user', String(process.pid)])
