import { spawn, type ChildProcess } from 'node:child_process'
import { mkdtemp, rm } from 'node:fs/promises'
import { connect, type Socket } from 'node:net'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest'

const root = path.resolve(import.meta.dirname, '../..')
const running: ChildProcess[] = []
let folder: string
beforeAll(async () => {
  folder = await mkdtemp(path.join(tmpdir(), 'sidebend-process-'))
})
afterAll(async () => {
  for (const child of running) child.kill('SIGKILL')
  await rm(folder, { recursive: true, force: true })
})

interface Run {
  child: ChildProcess
  output: () => string
  ended: Promise<number | null>
}

function start(given: Record<string, string | undefined>): Run {
  const env = { PATH: process.env.PATH, NODE_ENV: 'production', DATABASE_URL: inject('databaseUrl'), SESSION_SECRET: 's'.repeat(32), SIGNING_PASSPHRASE: 'p'.repeat(24), DATA_DIR: folder, PORT: '0', ...given }
  const child = spawn(process.execPath, ['--import', 'tsx', 'server/index.ts'], { cwd: root, env, stdio: ['ignore', 'pipe', 'pipe'] })
  running.push(child)
  let text = ''
  for (const stream of [child.stdout, child.stderr]) stream.on('data', (part: Buffer) => (text += part.toString()))
  return { child, output: () => text, ended: new Promise((resolve) => child.once('exit', (code) => resolve(code))) }
}

async function listening(run: Run): Promise<number> {
  await expect.poll(() => run.output(), { timeout: 25_000, interval: 50 }).toMatch(/"msg":"listening"/)
  return Number(/"port":(\d+)/.exec(run.output())?.[1])
}

const received = (socket: Socket): Promise<string> =>
  new Promise((resolve, reject) => {
    let text = ''
    socket.on('data', (part: Buffer) => (text += part.toString())).on('close', () => resolve(text)).on('error', reject)
  })

describe('the server process', () => {
  it.each(['SIGTERM', 'SIGINT'] as const)('on %s finishes the request in progress, takes no new one, and ends with 0', async (signal) => {
    const run = start({})
    const port = await listening(run)
    expect((await fetch(`http://127.0.0.1:${port}/readyz`)).status).toBe(200)
    const body = JSON.stringify({ email: 'nobody@larkfield.example', password: 'whatever it is' })
    const socket = connect(port, '127.0.0.1')
    const answer = received(socket)
    await new Promise<void>((resolve) => socket.once('connect', resolve))
    // Half of a request, kept alive: the server must wait for the rest, and then not for the browser to hang up.
    await new Promise<void>((resolve) => socket.write(`POST /api/session HTTP/1.1\r\nHost: 127.0.0.1:${port}\r\nContent-Type: application/json\r\nContent-Length: ${body.length}\r\n\r\n${body.slice(0, 10)}`, () => resolve()))
    await expect.poll(() => fetch(`http://127.0.0.1:${port}/healthz`).then(({ status }) => status)).toBe(200)
    run.child.kill(signal)
    await expect.poll(() => run.output(), { timeout: 5000 }).toMatch(/"msg":"stopping/)
    await expect(fetch(`http://127.0.0.1:${port}/healthz`)).rejects.toThrow()
    socket.write(body.slice(10))
    expect(await answer).toMatch(/^HTTP\/1\.1 401 /)
    expect(await run.ended).toBe(0)
    expect(run.output()).toMatch(/"msg":"stopped"/)
  })

  it('says which variables are wrong, and does not start', async () => {
    const run = start({ SESSION_SECRET: 'short', PORT: '99999', DATABASE_URL: undefined })
    expect(await run.ended).toBe(1)
    expect(run.output()).toMatch(/SESSION_SECRET: .*at least 32/)
    expect(run.output()).toMatch(/PORT: /)
    expect(run.output()).toMatch(/DATABASE_URL: /)
  })
})
