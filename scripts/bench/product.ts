import { spawn } from 'node:child_process'
import { closeSync, openSync, readFileSync } from 'node:fs'
import path from 'node:path'
import { setTimeout as sleep } from 'node:timers/promises'
import { demoSignIns } from '../../server/demo/load.ts'
import { endpoints, type EndpointName, type ResponseOf } from '../../shared/schemas/endpoints.ts'
import type { Role } from '../../shared/schemas/people.ts'
import { root } from '../lib/paths.mjs'

export interface Product {
  baseUrl: string
  /** Milliseconds from spawning `npm start`'s script to the first 200 of /readyz. */
  readyAfter: number
  /** Process that starts and watches the server; the server is its child. */
  pid: number
  stop: () => Promise<void>
}

/**
 * Starts the product as npm start does, in `folder`, and waits until it answers.
 * @throws Error with what it printed when it ends instead
 */
export async function startProduct(folder: string, port: number): Promise<Product> {
  const log = path.join(folder, 'start.log')
  const output = openSync(log, 'w')
  const begun = performance.now()
  const child = spawn(process.execPath, ['scripts/start.mjs'], { cwd: root, env: { ...process.env, DATA_DIR: folder, PORT: String(port), LOG_LEVEL: 'warn' }, stdio: ['ignore', output, output] })
  closeSync(output)
  const exited = new Promise<number>((resolve) => child.once('exit', (code) => resolve(code ?? 1)))
  const baseUrl = `http://127.0.0.1:${port}`
  const stop = async () => {
    child.kill('SIGTERM')
    const code = await exited
    if (code !== 0) throw new Error(`The product ended with exit code ${code}:\n${readFileSync(log, 'utf8')}`)
  }
  for (;;) {
    const answer = await fetch(`${baseUrl}/readyz`).catch(() => null)
    await answer?.body?.cancel()
    if (answer?.status === 200) return { baseUrl, readyAfter: performance.now() - begun, pid: child.pid ?? 0, stop }
    if (child.exitCode !== null) throw new Error(`The product did not start:\n${readFileSync(log, 'utf8')}`)
    await sleep(20)
  }
}

/** A signed-in caller of the API. */
export interface Caller {
  /** `name=value` of the session cookie. */
  cookie: string
  get: (address: string) => Promise<Response>
  /** A GET endpoint's answer, parsed by its schema. */
  read: <N extends EndpointName>(name: N, given?: { id?: string; query?: Record<string, string> }) => Promise<ResponseOf<N>>
}

/** Signs in as the demo firm's person of that role. */
export async function signInAs(baseUrl: string, role: Role): Promise<Caller> {
  const person = demoSignIns.find((one) => one.role === role)
  if (!person) throw new Error(`The demo firm has no sign-in for the role ${role}.`)
  const answer = await fetch(`${baseUrl}/api/session`, { method: 'POST', headers: { 'content-type': 'application/json' }, body: JSON.stringify({ email: person.email, password: person.password }) })
  if (!answer.ok) throw new Error(`Signing in as ${person.email} answered ${answer.status}: ${await answer.text()}`)
  const cookie = answer.headers.getSetCookie().map((line) => line.split(';')[0]).join('; ')
  const get = async (address: string) => {
    const response = await fetch(`${baseUrl}${address}`, { headers: { cookie } })
    if (!response.ok) throw new Error(`GET ${address} answered ${response.status}: ${await response.text()}`)
    return response
  }
  return {
    cookie,
    get,
    read: async (name, { id = '', query = {} } = {}) => {
      const endpoint = endpoints[name]
      const response = await get(`/api${endpoint.path.replace(':id', id)}?${new URLSearchParams(query)}`)
      return (await endpoint.response.parseAsync(await response.json())) as ResponseOf<typeof name>
    },
  }
}
