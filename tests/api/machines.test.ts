import { readFile } from 'node:fs/promises'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Page } from '../../shared/schemas/common.ts'
import type { Machine, MachineRow, PanelCard, WriteMachine } from '../../shared/schemas/machines.ts'
import { dayWords } from '../../shared/machines/calibration.ts'
import { remindOrganization } from '../../server/services/calibration-reminders.ts'
import { calibrationRemindersJob } from '../../server/jobs/calibration-reminders.ts'
import { feederMode, machine } from '../fixtures/machines.ts'
import { steelProcedure } from '../fixtures/samples.ts'
import { caughtMail, problem, startApp, type TestApp, type TestOrganization } from './harness.ts'
import { approved, match, signInAll, type Agents } from './content.ts'

let app: TestApp
let organization: TestOrganization
let agents: Agents
beforeAll(async () => {
  app = await startApp()
  organization = await app.makeOrganization()
  agents = await signInAll(app, organization)
})
afterAll(() => app.close())

const inDays = (days: number): string => new Date(Date.now() + days * 86_400_000).toISOString().slice(0, 10)
const register = async (part: Partial<WriteMachine> = {}, by = agents): Promise<Machine> => (await by.engineer.post('/api/machines').send({ ...machine([feederMode()]), ...part }).expect(201)).body as Machine
const due = (dueOn: string | null): Partial<WriteMachine> => ({ calibration: { ...machine([]).calibration, dueOn } })
const list = async (query: object, by = agents): Promise<MachineRow[]> => ((await by.welder.get('/api/machines').query(query).expect(200)).body as Page<MachineRow>).items

describe('the register', () => {
  it('numbers machines, keeps every part, and lists what they are for', async () => {
    const made = await register({ name: 'Bay 7 feeder', location: 'Bay 7', serial: 'X-17' })
    expect(made.number).toMatch(/^M-\d{3}$/)
    expect(made.may).toEqual(['save'])
    const read = (await agents.welder.get(`/api/machines/${made.id}`).expect(200)).body as Machine
    expect(read).toMatchObject({ version: 1, may: [], content: { serial: 'X-17', modes: [{ key: 'cv', controls: [{ label: 'Wire feed', step: 0.1, shown: true }, {}] }] } })
    expect(await list({ q: 'x-17' })).toEqual([expect.objectContaining({ id: made.id, processes: ['GMAW', 'FCAW'], modes: [{ key: 'cv', name: 'Wire', kind: 'constant-voltage' }], retired: false })])
    expect(await list({ q: 'x-17', process: 'SMAW' })).toEqual([])
    expect(await list({ q: 'x-17', process: 'FCAW' })).toHaveLength(1)
  })

  it('saves what was read, and shows both versions to whoever was overtaken', async () => {
    const made = await register()
    const saved = (await agents.administrator.put(`/api/machines/${made.id}`).set('If-Match', match(made)).send({ ...made.content, location: 'Bay 9' }).expect(200)).body as Machine
    expect(saved).toMatchObject({ version: 2, content: { location: 'Bay 9' } })
    const said = problem(await agents.engineer.put(`/api/machines/${made.id}`).set('If-Match', match(made)).send({ ...made.content, location: 'Bay 1' }).expect(409))
    expect(said.current).toMatchObject({ version: 2, content: { location: 'Bay 9' }, sent: { location: 'Bay 1' } })
    await agents.engineer.put(`/api/machines/${made.id}`).send(made.content).expect(428)
  })

  it('leaves retired machines out until they are asked for', async () => {
    const made = await register({ name: 'Old rectifier', retired: true })
    expect(await list({ q: 'old rectifier' })).toEqual([])
    expect(await list({ q: 'old rectifier', retired: 'only' })).toEqual([expect.objectContaining({ id: made.id, retired: true })])
    expect(await list({ q: 'old rectifier', retired: 'with' })).toHaveLength(1)
  })

  it.each<[string, object, RegExp]>([
    ['an upside-down scale', { modes: [{ ...feederMode(), controls: [{ key: 'a', label: 'A', sets: 'voltage', min: 20, max: 10 }] }] }, /top of the scale must be above its bottom/],
    ['a mode for nothing', { modes: [{ ...feederMode(), processes: [] }] }, /Say which process/],
    ['a mode twice', { modes: [feederMode(), feederMode()] }, /Two modes carry this key/],
    ['no name', { name: ' ' }, /Name the machine/],
    ['text for a figure', { modes: [{ ...feederMode(), controls: [{ key: 'a', label: 'A', sets: 'voltage', min: 'low', max: 10 }] }] }, /modes\.0\.controls\.0\.min/],
    ['a date that is none', { calibration: { dueOn: '2026-02-30' } }, /calibration\.dueOn/],
  ])('refuses %s with a sentence at the field', async (_what, part, sentence) => {
    expect(problem(await agents.engineer.post('/api/machines').send({ ...machine([]), ...part }).expect(400)).detail).toMatch(sentence)
  })

  it('is read by everybody and kept by engineers and administrators', async () => {
    await agents.welder.post('/api/machines').send(machine([])).expect(403)
    await agents.supervisor.post('/api/machines').send(machine([])).expect(403)
    await agents.administrator.post('/api/machines').send(machine([])).expect(201)
  })

  it('of one organization is nobody else’s', async () => {
    const made = await register()
    const others = await signInAll(app, await app.makeOrganization())
    await others.engineer.get(`/api/machines/${made.id}`).expect(404)
    await others.engineer.put(`/api/machines/${made.id}`).set('If-Match', '"1"').send(made.content).expect(404)
    expect(await list({}, others)).toEqual([])
    expect((await register({}, others)).number).toBe('M-001')
  })
})

describe('calibration', () => {
  it('is listed by where it stands', async () => {
    const own = await signInAll(app, await app.makeOrganization())
    for (const [name, dueOn] of [['lapsed', inDays(-1)], ['soon', inDays(10)], ['current', inDays(90)], ['unknown', null]] as const) await register({ name, ...due(dueOn) }, own)
    for (const [state, name] of [['lapsed', 'lapsed'], ['due-soon', 'soon'], ['current', 'current'], ['unknown', 'unknown']] as const) expect((await list({ calibration: state }, own)).map((row) => [row.name, row.calibration])).toEqual([[name, state]])
    expect((await list({ sort: 'calibrationDueOn' }, own)).map(({ name }) => name)).toEqual(['lapsed', 'soon', 'current', 'unknown'])
  })

  it('keeps its certificates: what they are by their bytes, unchanged, until removed', async () => {
    const made = await register()
    const pdf = Buffer.from('%PDF-1.4\n1 0 obj<</Type/Catalog>>endobj\ntrailer<</Root 1 0 R>>\n%%EOF\n')
    const photo = await readFile('tests/fixtures/photos/macro-with-place.jpg')
    const added = (await agents.engineer.post(`/api/machines/${made.id}/files`).attach('files', pdf, 'CAL 26-071.pdf').attach('files', photo, 'label.jpg').expect(201)).body as { items: { id: string; fileName: string; sha256: string }[] }
    expect(added.items.map(({ fileName }) => fileName)).toEqual(['CAL 26-071.pdf', 'label.jpg'])
    const [certificate] = added.items
    const read = await agents.welder.get(`/api/machine-files/${certificate?.id}`).expect(200)
    expect(read.headers).toMatchObject({ 'content-type': 'application/pdf', 'content-disposition': expect.stringContaining('attachment') as string })
    expect(Buffer.from(read.body as Buffer).equals(pdf)).toBe(true)
    expect(problem(await agents.engineer.post(`/api/machines/${made.id}/files`).attach('files', Buffer.from('a,b\n1,2\n'), 'log.pdf').expect(422)).detail).toContain('log.pdf')
    await agents.welder.delete(`/api/machine-files/${certificate?.id}`).expect(403)
    const others = await signInAll(app, await app.makeOrganization())
    await others.engineer.get(`/api/machine-files/${certificate?.id}`).expect(404)
    await others.engineer.delete(`/api/machine-files/${certificate?.id}`).expect(404)
    await agents.engineer.delete(`/api/machine-files/${certificate?.id}`).expect(204)
    await app.drain()
    await agents.engineer.get(`/api/machine-files/${certificate?.id}`).expect(404)
    expect(((await agents.welder.get(`/api/machines/${made.id}/files`).expect(200)).body as { items: unknown[] }).items).toHaveLength(1)
    // The bytes themselves are gone too, not only the row.
    await expect(app.services.storage.get(`${organization.id}/attachments/${certificate?.id}.pdf`)).rejects.toThrow()
  })

  it('is told of by e-mail once for each due date, and stands in Today', async () => {
    const firm = await app.makeOrganization()
    const own = await signInAll(app, firm)
    const soon = await register({ name: 'Bay 2 pulse', ...due(inDays(20)) }, own)
    await register({ name: 'Far', ...due(inDays(31)) }, own)
    await register({ name: 'Gone', retired: true, ...due(inDays(-5)) }, own)
    await app.services.queue.send(calibrationRemindersJob, {})
    await app.drain()
    const mail = await caughtMail(own.administrator, firm.people.engineer.email)
    expect(mail.subject).toBe(`Calibration of ${soon.number} Bay 2 pulse`)
    expect(mail.text).toContain(`due on ${dayWords(inDays(20))}, in 20 days`)
    expect(mail.text).not.toMatch(/Far|Gone/)
    expect(mail.text).toContain(`/machines/${soon.id}`)
    const mails = async () => ((await own.administrator.get('/api/outbox').expect(200)).body as Page<{ to: string[] }>).total
    const sent = await mails()
    expect((await own.administrator.get('/api/outbox').query({ q: firm.people.welder.email }).expect(200)).body).toMatchObject({ total: 0 })
    await app.services.queue.send(calibrationRemindersJob, {})
    await app.drain()
    expect(await mails()).toBe(sent)
    // A new certificate with a date of its own is told of again in its time.
    await own.engineer.put(`/api/machines/${soon.id}`).set('If-Match', '"1"').send({ ...soon.content, ...due(inDays(25)) }).expect(200)
    expect(await app.inTenant(firm, (tenant) => remindOrganization(app.services, tenant))).toBe(1)
    for (const role of ['engineer', 'administrator'] as const) {
      const { tasks } = (await own[role].get('/api/today').expect(200)).body as { tasks: { kind: string; title: string; detail: string; href: string }[] }
      expect(tasks).toContainEqual(expect.objectContaining({ kind: 'calibration', title: `${soon.number} Bay 2 pulse`, detail: `calibration due on ${dayWords(inDays(25))}`, href: `/machines/${soon.id}#calibration` }))
    }
    const { tasks } = (await own.welder.get('/api/today').expect(200)).body as { tasks: { kind: string }[] }
    expect(tasks.some(({ kind }) => kind === 'calibration')).toBe(false)
  })
})

it('the reminder comes by itself each morning', async () => {
  const other = await startApp()
  try {
    await other.services.queue.work(other.services)
    const { rows } = await other.services.database.owner.query('select cron, timezone from pgboss.schedule where name = $1', [calibrationRemindersJob.name])
    expect(rows).toEqual([{ cron: '15 5 * * *', timezone: 'UTC' }])
  } finally {
    await other.close()
  }
})

describe('panel cards', () => {
  const steel = () => {
    const content = steelProcedure()
    return { ...content, supportingCoupons: [], variables: { ...content.variables, processes: content.variables.processes.slice(1) } }
  }
  const draftOf = async (): Promise<{ id: string }> => (await agents.engineer.post('/api/procedures').send({ content: steel() }).expect(201)).body as { id: string }

  it('turn a revision’s ranges into the machine’s settings', async () => {
    const made = await register()
    const { id } = await draftOf()
    const card = (await agents.welder.get(`/api/revisions/${id}/panel-card`).query({ machine: made.id, mode: 'cv' }).expect(200)).body as PanelCard
    expect(card).toMatchObject({ machine: made.number, processId: 'fill', ready: true, lines: [{ control: 'feed', text: '7.8 m/min', min: 6.5, max: 9 }, { control: 'volts' }] })
    expect(card.notices.map(({ code }) => code)).toEqual(expect.arrayContaining(['not-approved', 'pass-ranges']))
    const cap = (await agents.welder.get(`/api/revisions/${id}/panel-card`).query({ machine: made.id, mode: 'cv', process: 'fill', pass: 'cap' }).expect(200)).body as PanelCard
    expect(cap).toMatchObject({ pass: 'cap', ready: true })
    const none = (await agents.welder.get(`/api/revisions/${id}/panel-card`).query({ machine: made.id, mode: 'no-such' }).expect(200)).body as PanelCard
    expect(none).toMatchObject({ ready: false, lines: [], notices: [{ level: 'refuse', code: 'no-mode' }] })
  })

  it('of an approved procedure carry no word of trial', async () => {
    const made = await register({ modes: machine([feederMode({ processes: ['SMAW'], controls: [{ key: 'amps', label: 'Amps', sets: 'current', unit: 'A', min: 5, max: 300, step: 1 }] })]).modes })
    const revision = await approved(agents)
    const card = (await agents.welder.get(`/api/revisions/${revision.id}/panel-card`).query({ machine: made.id, mode: 'cv' }).expect(200)).body as PanelCard
    expect(card.notices.map(({ code }) => code)).not.toContain('not-approved')
  })

  it('need a revision and a machine of the organization', async () => {
    const made = await register()
    const { id } = await draftOf()
    const others = await signInAll(app, await app.makeOrganization())
    await others.welder.get(`/api/revisions/${id}/panel-card`).query({ machine: made.id, mode: 'cv' }).expect(404)
    await agents.welder.get(`/api/revisions/${made.id}/panel-card`).query({ machine: made.id, mode: 'cv' }).expect(404)
    await agents.welder.get(`/api/revisions/${id}/panel-card`).query({ machine: id, mode: 'cv' }).expect(404)
    await agents.welder.get(`/api/revisions/${id}/panel-card`).query({ mode: 'cv' }).expect(400)
  })
})
