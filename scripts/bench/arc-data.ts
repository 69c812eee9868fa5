/** A recording of a million rows, uploaded and read, against reading the same bytes the plain way. */
import { readdir, readFile } from 'node:fs/promises'
import { endpoints } from '../../shared/schemas/endpoints.ts'
import { alternate, median, type Figure } from './measure.ts'
import type { Caller } from './product.ts'

const ROWS = 1_000_000
const RATE = 10_000

/** 120 Hz, 2 ms, 400/50 A, 32/20 V, ten thousand samples a second. */
function recordingBytes(rows: number): Buffer {
  const lines = ['Time (s),Current (A),Voltage (V)']
  for (let k = 0; k < rows; k++) {
    const on = (k * 120) % RATE < 0.24 * RATE
    lines.push(`${(k / RATE).toFixed(4)},${(on ? 400 : 50) + (k % 7) / 10},${(on ? 32 : 20) + (k % 5) / 10}`)
  }
  return Buffer.from(lines.join('\n'))
}

/** The baseline: the whole file as a string, split at lines and commas, `Number` for each field; mean power and nothing else. */
function plainly(bytes: Buffer): number {
  let energy = 0
  const lines = bytes.toString('utf8').split('\n').slice(1)
  for (const line of lines) {
    const [, current, voltage] = line.split(',')
    energy += Number(current) * Number(voltage)
  }
  return energy / lines.length
}

/** Resident memory of a process, MB: now and at its highest so far; null where the system does not tell. */
async function memoryOf(pid: number): Promise<{ now: number; highest: number } | null> {
  const status = await readFile(`/proc/${pid}/status`, 'utf8').catch(() => '')
  const megabytes = (field: string) => Number(new RegExp(`^${field}:\\s+(\\d+) kB`, 'm').exec(status)?.[1] ?? NaN) / 1024
  const read = { now: megabytes('VmRSS'), highest: megabytes('VmHWM') }
  return Number.isNaN(read.now) ? null : read
}

/** The server below the process that started it; null where the system does not tell. */
async function serverBelow(pid: number): Promise<number | null> {
  for (const one of await readdir('/proc').catch(() => [])) {
    if (!/^\d+$/.test(one)) continue
    const status = await readFile(`/proc/${one}/status`, 'utf8').catch(() => '')
    if (!new RegExp(`^PPid:\\s+${pid}$`, 'm').test(status)) continue
    if ((await readFile(`/proc/${one}/cmdline`, 'utf8').catch(() => '')).includes('server/index.ts')) return Number(one)
  }
  return null
}

async function uploadAndRemove({ cookie }: Caller, baseUrl: string, bytes: Buffer): Promise<number> {
  const form = new FormData()
  form.append('files', new Blob([new Uint8Array(bytes)], { type: 'text/csv' }), 'bench.csv')
  const begun = performance.now()
  const answer = await fetch(`${baseUrl}/api${endpoints.addArcRecording.path}`, { method: 'POST', headers: { cookie }, body: form })
  const text = await answer.text()
  const took = performance.now() - begun
  if (answer.status !== 201) throw new Error(`Uploading the recording answered ${answer.status}: ${text}`)
  const { id, rows } = endpoints.addArcRecording.response.parse(JSON.parse(text))
  if (rows !== ROWS) throw new Error(`Of ${ROWS} rows ${rows} were read.`)
  await fetch(`${baseUrl}/api/arc-recordings/${id}`, { method: 'DELETE', headers: { cookie } })
  return took
}

/** The longest that somebody else waited for an answer while it was read. */
async function slowestAnswer(caller: Caller, until: Promise<unknown>): Promise<number> {
  let slowest = 0
  let done = false
  void until.finally(() => (done = true)).catch(() => undefined)
  while (!done) {
    const begun = performance.now()
    await (await caller.get('/api/session')).arrayBuffer()
    slowest = Math.max(slowest, performance.now() - begun)
  }
  return slowest
}

/**
 * Upload and reading end to end, signed in, on the loopback.
 * @param startPid of the process that started the server, for the server's memory
 */
export async function measureArcData(caller: Caller, baseUrl: string, startPid: number, seconds: number): Promise<Figure[]> {
  const serverPid = await serverBelow(startPid)
  const bytes = recordingBytes(ROWS)
  const uploads: number[] = []
  const before = serverPid === null ? null : await memoryOf(serverPid)
  const times = await alternate(
    {
      upload: async () => {
        uploads.push(await uploadAndRemove(caller, baseUrl, bytes))
      },
      plain: () => Promise.resolve(plainly(bytes)),
    },
    seconds,
  )
  const after = serverPid === null ? null : await memoryOf(serverPid)
  const upload = uploadAndRemove(caller, baseUrl, bytes)
  const waited = await slowestAnswer(caller, upload)
  await upload
  // The first is a warm-up, as with the others.
  const took = median(uploads.slice(1))
  const plain = median(times.plain)
  const note = `median of ${uploads.length - 1}; ${(bytes.length / 1e6).toFixed(1)} MB`
  return [
    { name: 'Arc data: 1,000,000 rows', value: took / 1000, unit: 's', note: `${note}, upload to answer: stored, hashed, every figure, plot` },
    { name: 'The same bytes split and Number()ed', value: plain / 1000, unit: 's', note: `median of ${times.plain.length}, in memory, mean power only` },
    { name: 'Arc data: product / plain', value: took / plain, unit: '×', note: 'multipart, storage with sync, hash, database and JSON included' },
    { name: 'Longest wait of another meanwhile', value: waited, unit: 'ms', note: 'GET /api/session, one after the other' },
    ...(before && after ? [{ name: 'Server memory, growth at most', value: Math.max(0, after.highest - before.now), unit: 'MB' as const, note: `highest resident over what it was before, ${uploads.length} uploads` }] : []),
  ]
}
