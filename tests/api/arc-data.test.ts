import { createHash, randomUUID } from 'node:crypto'
import { readdir } from 'node:fs/promises'
import { request as httpRequest } from 'node:http'
import type { AddressInfo } from 'node:net'
import path from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { ArcPlot, ArcRecording, ArcRecordingRow } from '../../shared/schemas/arc-data.ts'
import type { Page } from '../../shared/schemas/common.ts'
import { certified, match, openCoupon, signInAll, type Agents } from './content.ts'
import { PASSWORD, problem, startApp, type TestApp, type TestOrganization } from './harness.ts'

/** 120 Hz, 2 ms, 400/50 A, 32/20 V: 3832 W where the meters say 3066 W (rectangular pulse). */
function recording(rows = 12_000, head = 'Time (s),Current (A),Voltage (V)'): Buffer {
  const lines = Array.from({ length: rows }, (_, k) => {
    const on = k % 100 < 24
    return `${(k / 12_000).toFixed(6)},${on ? 400 : 50},${on ? 32 : 20}`
  })
  return Buffer.from([head, ...lines].join('\n'))
}

let app: TestApp
let works: TestOrganization
let agents: Agents
beforeAll(async () => {
  app = await startApp({ env: { ARC_DATA_MAX_MB: '2' } })
  works = await app.makeOrganization()
  agents = await signInAll(app, works)
})
afterAll(() => app.close())

const send = (bytes: Buffer, { name = 'pass 2.csv', query = {}, agent = agents.welder } = {}) => agent.post('/api/arc-recordings').query(query).attach('files', bytes, name)
const upload = async (bytes = recording(), options = {}): Promise<ArcRecording> => (await send(bytes, options).expect(201)).body as ArcRecording
const attach = (one: ArcRecording, body: object, agent = agents.engineer) => agent.put(`/api/arc-recordings/${one.id}/attachment`).set('If-Match', match(one)).send(body)
/** What storage holds below the organization's recordings, unfinished ones too. */
const stored = (): Promise<string[]> => readdir(path.join(app.services.env.DATA_DIR, 'files', works.id, 'arc-data')).catch(() => [])

describe('uploading', () => {
  it('reads the file while it arrives, and keeps it untouched', async () => {
    const bytes = recording()
    const one = await upload(bytes, { name: '../../Naht 2.csv' })
    expect(one).toMatchObject({ fileName: 'Naht 2.csv', bytes: bytes.length, rows: 12_000, sha256: createHash('sha256').update(bytes).digest('hex'), attachedTo: null, heatInput: null, version: 1, may: ['attach', 'remove'] })
    expect(one.figures.averageInstantaneousPower).toBeCloseTo(3832, -1)
    expect(one.figures.meterPower).toBeCloseTo(3066, -1)
    expect(one.figures.meterError).toBeCloseTo(-20, 0)
    expect(one.figures.pulse).toMatchObject({ frequency: expect.closeTo(120, 1) as number, peakCurrent: expect.closeTo(400, 1) as number, backgroundCurrent: expect.closeTo(50, 1) as number, onTime: expect.closeTo(0.002, 4) as number })
    expect(one.plot.t.length).toBeLessThanOrEqual(2000)
    expect(Math.max(...one.plot.currentMax)).toBe(400)

    const read = await agents.auditor.get(`/api/arc-recordings/${one.id}`).expect(200)
    expect(read.headers.etag).toBe('"1"')
    expect(read.body).toEqual({ ...one, may: [] })
    const file = await agents.auditor.get(`/api/arc-recordings/${one.id}/original`).buffer(true).parse((answer, done) => {
      const parts: Buffer[] = []
      answer.on('data', (part: Buffer) => parts.push(part)).on('end', () => done(null, Buffer.concat(parts)))
    }).expect(200)
    expect((file.body as Buffer).equals(bytes)).toBe(true)
    expect(file.headers).toMatchObject({ 'content-length': String(bytes.length), 'x-content-type-options': 'nosniff' })
    expect(file.headers['content-type']).toMatch(/^text\/csv/)
    expect(file.headers['content-disposition']).toMatch(/^attachment; filename="Naht 2\.csv"/)
    await agents.auditor.get(`/api/arc-recordings/${one.id}/original`).set('If-None-Match', String(file.headers.etag)).expect(304)
  })

  it('takes what a person says of columns, units and sample rate', async () => {
    const bytes = Buffer.from(`a;b\n${Array.from({ length: 2000 }, (_, k) => `${22 + (k % 2)};0,18`).join('\n')}`)
    const asked = problem(await send(bytes).expect(422))
    expect(asked.detail).toMatch(/^pass 2\.csv: No time column was found\. Give the sample rate/)
    expect(asked.errors?.[0]).toMatchObject({ field: 'samplesPerSecond' })
    const one = await upload(bytes, { query: { time: -1, current: 1, voltage: 0, currentUnit: 'kA', samplesPerSecond: 5000 } })
    expect(one.layout).toMatchObject({ delimiter: ';', decimal: ',', columns: { time: null, current: 1, voltage: 0 }, samplesPerSecond: 5000 })
    expect(one.figures.current.mean).toBeCloseTo(180, 6)
    expect(one.figures.duration).toBeCloseTo(1999 / 5000, 6)
    expect(problem(await send(bytes, { query: { samplesPerSecond: 0 } }).expect(400)).detail).toContain('samplesPerSecond')
    expect(problem(await send(recording(50), { query: { current: 9 } }).expect(422)).errors?.[0]).toMatchObject({ field: 'columns', message: 'Column 10 was chosen for the current, but the rows have 3 columns.' })
  })

  it('answers others meanwhile, whatever the size of the pieces', async () => {
    const bytes = recording()
    const { port } = app.server.address() as AddressInfo
    const cookie = (await app.anonymous().post('/api/session').send({ email: works.people.welder.email, password: PASSWORD }).expect(200)).headers['set-cookie'] as unknown as string[]
    const form = Buffer.concat([Buffer.from('--x\r\nContent-Disposition: form-data; name="files"; filename="slow.csv"\r\n\r\n'), bytes, Buffer.from('\r\n--x--\r\n')])
    const answer = await new Promise<{ status: number; body: string }>((resolve, reject) => {
      const request = httpRequest({ port, host: '127.0.0.1', method: 'POST', path: '/api/arc-recordings', headers: { cookie: cookie.map((line) => line.split(';')[0]).join('; '), 'content-type': 'multipart/form-data; boundary=x', 'content-length': form.length } }, (response) => {
        let body = ''
        response.on('data', (part: Buffer) => (body += part.toString())).on('end', () => resolve({ status: response.statusCode ?? 0, body }))
      })
      request.on('error', reject)
      const half = Math.floor(form.length / 2) + 7
      request.write(form.subarray(0, half))
      agents.auditor.get('/api/arc-recordings').expect(200).then(() => request.end(form.subarray(half)), reject)
    })
    expect(answer.status).toBe(201)
    const again = await upload(bytes)
    expect((JSON.parse(answer.body) as ArcRecording).figures).toEqual(again.figures)
  })
})

describe('refusals keep nothing and say what to do', () => {
  it.each<[string, () => Buffer, RegExp]>([
    ['empty', () => Buffer.alloc(0), /is empty/],
    ['a picture', () => Buffer.from(Array.from({ length: 5000 }, (_, at) => (at * 7919) % 256)), /not a text file/],
    ['words', () => Buffer.from('just words\nand more'), /No rows of figures/],
    ['a head without rows', () => Buffer.from('Time (s),Current (A),Voltage (V)\r\n'), /No rows of figures/],
    ['one column', () => Buffer.from('A\n1.5\n2.5\n3.5\n'), /Only one column/],
    ['no arc', () => Buffer.from(recording(500).toString().replaceAll(',400,', ',4,').replaceAll(',50,', ',1,')), /No arc was found/],
    ['text in numbers in most rows', () => Buffer.from(recording(500).toString().replace(/(\n[\d.]+),50,/g, '$1,low,')), /380 of 500 rows cannot be used.*The first is row 26, “.*low,20”: the current \(column 2\) is not a number/],
    ['a row without end', () => Buffer.concat([recording(3000), Buffer.alloc(200_000, '1')]), /Row 3001 is longer than 65536 characters/],
  ])('%s', async (_what, bytes, sentence) => {
    const before = await stored()
    const said = problem(await send(bytes()).expect(422))
    expect(said.title).toBe('The recording cannot be read')
    expect(said.errors?.[0]?.message).toMatch(sentence)
    expect(await stored()).toEqual(before)
  })

  it('a few bad rows are told at the row, and left out', async () => {
    const lines = recording(1000).toString().split('\n')
    lines[500] = '0.0415,\u0000,20'
    lines[600] = '0.05'
    const { figures } = await upload(Buffer.from(lines.join('\r\n')))
    expect(figures.badRows).toBe(2)
    expect(figures.bad.map(({ row, why }) => `${row}: ${why}`)).toEqual(['501: the current (column 2) is not a number', '601: the column of the current (column 2) is missing or empty'])
  })

  it('UTF-16 with a mark is read', async () => {
    const { layout, rows } = await upload(Buffer.concat([Buffer.from([0xff, 0xfe]), Buffer.from(recording(1000).toString(), 'utf16le')]))
    expect([layout.encoding, rows]).toEqual(['utf-16le', 1000])
  })

  it('too large, announced or not', async () => {
    const before = await stored()
    const sentence = 'The recording is larger than 2 MB. Record with a lower sample rate, or split it by passes and upload each.'
    expect(problem(await send(recording(150_000)).expect(413)).detail).toBe(sentence)
    // Chunked: no Content-Length announces it.
    const chunked = agents.welder.post('/api/arc-recordings').set('Content-Type', 'multipart/form-data; boundary=x').set('Transfer-Encoding', 'chunked')
    chunked.write('--x\r\nContent-Disposition: form-data; name="files"; filename="big.csv"\r\n\r\n')
    chunked.write(recording(150_000).toString())
    chunked.write('\r\n--x--\r\n')
    expect(problem(await chunked.expect(413)).detail).toBe(sentence)
    expect(await stored()).toEqual(before)
  })

  it('no file, another field, two files, no form, or not allowed', async () => {
    expect(problem(await agents.welder.post('/api/arc-recordings').field('note', 'x').expect(422)).detail).toContain('Choose one')
    expect(problem(await agents.welder.post('/api/arc-recordings').attach('data', recording(10), 'a.csv').expect(400)).detail).toContain('in the field "files"')
    const before = await stored()
    expect(problem(await send(recording(100)).attach('files', recording(100), 'b.csv').expect(400)).detail).toContain('one recording at a time')
    expect(await stored()).toEqual(before)
    expect(problem(await agents.welder.post('/api/arc-recordings').send({}).expect(415)).detail).toContain('multipart/form-data')
    await send(recording(10), { agent: agents.auditor }).expect(403)
    await send(recording(10), { agent: app.anonymous() }).expect(401)
  })

  it('an upload that breaks off leaves nothing behind', async () => {
    const before = await stored()
    const { port } = app.server.address() as AddressInfo
    const cookie = (await app.anonymous().post('/api/session').send({ email: works.people.welder.email, password: PASSWORD }).expect(200)).headers['set-cookie'] as unknown as string[]
    await new Promise<void>((resolve) => {
      const request = httpRequest({ port, host: '127.0.0.1', method: 'POST', path: '/api/arc-recordings', headers: { cookie: cookie.map((line) => line.split(';')[0]).join('; '), 'content-type': 'multipart/form-data; boundary=x', 'content-length': 500_000 } })
      request.on('error', () => resolve())
      request.write(Buffer.concat([Buffer.from('--x\r\nContent-Disposition: form-data; name="files"; filename="slow.csv"\r\n\r\n'), recording(5000)]))
      setTimeout(() => request.destroy(), 150)
    })
    await expect.poll(stored, { timeout: 5000 }).toEqual(before)
  })
})

describe('a part of it', () => {
  it('is read again in more detail', async () => {
    const one = await upload()
    const part = (await agents.auditor.get(`/api/arc-recordings/${one.id}/plot`).query({ from: 0.5, to: 0.52 }).expect(200)).body as ArcPlot
    expect(part.t.length).toBeGreaterThan(235)
    expect(part.currentMin).toEqual(part.currentMax)
    expect(part.t.every((t) => t >= 0.5 && t <= 0.52)).toBe(true)
    expect(problem(await agents.auditor.get(`/api/arc-recordings/${one.id}/plot`).query({ from: 1, to: 1 }).expect(400)).detail).toContain('must end after it begins')
    expect((await agents.auditor.get(`/api/arc-recordings/${one.id}/plot`).query({ from: 800, to: 900 }).expect(200)).body).toMatchObject({ t: [] })
  })
})

describe('attaching', () => {
  it('to a pass gives its heat input by QW-409.1(c), from length or travel speed', async () => {
    const coupon = await openCoupon(agents)
    const one = await upload()
    const byLength = (await attach(one, { couponId: coupon.id, runRowId: 'r1', weldLength: 38.3 }).expect(200)).body as ArcRecording
    expect(byLength).toMatchObject({ attachedTo: `${coupon.number} pass 1`, version: 2, attachment: { couponId: coupon.id, runRowId: 'r1', beadId: null, weldLength: 38.3 } })
    expect(byLength.heatInput).toBeCloseTo(one.figures.energy / 38.3 / 1000, 12)
    expect(byLength.heatInputHow).toContain('over 38.3 mm')
    // The pass was welded at 100 mm/min.
    const bySpeed = (await attach(byLength, { couponId: coupon.id, runRowId: 'r1' }).expect(200)).body as ArcRecording
    expect(bySpeed.heatInput).toBeCloseTo((one.figures.averageInstantaneousPower * 60) / 100 / 1000, 9)
    expect(bySpeed.heatInputHow).toContain('100 mm/min, the travel speed of pass 1')
    const inspector = (await agents.inspector.get(`/api/arc-recordings/${one.id}`).expect(200)).body as ArcRecording
    expect(inspector.may).toEqual(['attach', 'remove', 'write-energy'])

    const list = (await agents.auditor.get('/api/arc-recordings').query({ couponId: coupon.id }).expect(200)).body as Page<ArcRecordingRow>
    expect(list.items.map(({ id, attachedTo }) => [id, attachedTo])).toEqual([[one.id, `${coupon.number} pass 1`]])
    const found = (await agents.auditor.get('/api/arc-recordings').query({ q: coupon.number }).expect(200)).body as Page<ArcRecordingRow>
    expect(found.items.map(({ id }) => id)).toContain(one.id)

    const off = (await attach(bySpeed, {}).expect(200)).body as ArcRecording
    expect(off).toMatchObject({ attachedTo: null, heatInput: null, version: 4 })
    expect(problem(await attach(bySpeed, {}).expect(409)).current).toMatchObject({ version: 4 })
    await agents.engineer.put(`/api/arc-recordings/${one.id}/attachment`).send({}).expect(428)
  })

  it('to a trial bead takes the bead’s travel speed', async () => {
    const { owner } = app.services.database
    const [trial, bead] = [randomUUID(), randomUUID()]
    await owner.query("insert into trials (id, organization_id, number, title, created_by) values ($1, $2, 'DL-901', 'T', $3)", [trial, works.id, works.people.engineer.id])
    await owner.query('insert into beads (id, organization_id, trial_id, number, content, welded_by) values ($1, $2, $3, 4, $4, $5)', [bead, works.id, trial, JSON.stringify({ measured: { length: null, travelSpeed: { min: { si: 400, unit: 'mm/min', typed: '400' }, max: { si: 500, unit: 'mm/min', typed: '500' }, all: false } } }), works.people.welder.id])
    const one = (await attach(await upload(), { beadId: bead }).expect(200)).body as ArcRecording
    expect(one.attachedTo).toBe('DL-901 bead 4')
    expect(one.heatInput).toBeCloseTo((one.figures.averageInstantaneousPower * 60) / 400 / 1000, 9)
    const list = (await agents.auditor.get('/api/arc-recordings').query({ beadId: bead }).expect(200)).body as Page<ArcRecordingRow>
    expect(list.items).toHaveLength(1)
  })

  it('refuses what does not go together, field by field', async () => {
    const coupon = await openCoupon(agents)
    const one = await upload(recording(500))
    for (const [body, field] of [
      [{ couponId: randomUUID() }, 'couponId'],
      [{ couponId: coupon.id, runRowId: 'none' }, 'runRowId'],
      [{ runRowId: 'r1' }, 'runRowId'],
      [{ beadId: randomUUID() }, 'beadId'],
      [{ couponId: coupon.id, beadId: randomUUID() }, 'beadId'],
    ] as const) {
      expect(problem(await attach(one, body).expect(422)).errors?.[0]?.field).toBe(field)
    }
    expect(problem(await attach(one, { weldLength: 0 }).expect(400)).detail).toContain('weldLength')
  })

  it('is closed with the coupon: neither moved nor removed, nor added', async () => {
    const coupon = await openCoupon(agents)
    const one = (await attach(await upload(recording(500)), { couponId: coupon.id }).expect(200)).body as ArcRecording
    await agents.inspector.post(`/api/coupons/${coupon.id}/certification`).set('If-Match', match(coupon)).send({ password: PASSWORD }).expect(200)
    expect(problem(await attach(one, {}).expect(409)).detail).toContain('its recordings are part of the record')
    await agents.engineer.delete(`/api/arc-recordings/${one.id}`).expect(409)
    expect(((await agents.engineer.get(`/api/arc-recordings/${one.id}`).expect(200)).body as ArcRecording).may).toEqual([])
    const closed = await certified(agents)
    expect(problem(await attach(await upload(recording(500)), { couponId: closed.id }).expect(409)).title).toBe('The record is closed')
  })
})

describe('removing', () => {
  it('takes the file with it', async () => {
    const one = await upload(recording(500))
    const before = await stored()
    await agents.welder.delete(`/api/arc-recordings/${one.id}`).expect(204)
    await app.drain()
    expect((await stored()).length).toBe(before.length - 1)
    await agents.welder.get(`/api/arc-recordings/${one.id}/original`).expect(404)
  })
})

it('is another organization’s to nobody', async () => {
  const one = await upload(recording(500))
  const other = await signInAll(app, await app.makeOrganization())
  for (const end of ['', '/original', '/plot?from=0&to=1']) await other.engineer.get(`/api/arc-recordings/${one.id}${end}`).expect(404)
  await other.engineer.put(`/api/arc-recordings/${one.id}/attachment`).set('If-Match', '"1"').send({}).expect(404)
  await other.engineer.delete(`/api/arc-recordings/${one.id}`).expect(404)
  expect(((await other.engineer.get('/api/arc-recordings').expect(200)).body as Page<ArcRecordingRow>).items).toEqual([])
})
