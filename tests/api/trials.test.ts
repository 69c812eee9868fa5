import { randomUUID } from 'node:crypto'
import sharp from 'sharp'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { ArcRecording } from '../../shared/schemas/arc-data.ts'
import type { Page } from '../../shared/schemas/common.ts'
import type { Machine, PanelCard } from '../../shared/schemas/machines.ts'
import type { Revision } from '../../shared/schemas/records.ts'
import type { Bead, BeadContent, Trial, TrialRow } from '../../shared/schemas/trials.ts'
import { measuredTravel, pulseBead, pulseMachine } from '../fixtures/trials.ts'
import { problem, startApp, type TestApp, type TestOrganization } from './harness.ts'
import { match, signInAll, type Agents } from './content.ts'

let app: TestApp
let organization: TestOrganization
let agents: Agents
let machine: Machine
beforeAll(async () => {
  app = await startApp()
  organization = await app.makeOrganization()
  agents = await signInAll(app, organization)
  machine = (await agents.engineer.post('/api/machines').send(pulseMachine()).expect(201)).body as Machine
})
afterAll(() => app.close())

const begin = async (title = 'ER5356 on 6 mm 6061', by = agents.welder): Promise<Trial> => (await by.post('/api/trials').send({ title, goal: 'A quiet arc' }).expect(201)).body as Trial
const onMachine = (content: BeadContent): BeadContent => ({ ...content, machineId: machine.id })
const add = async (trial: Trial, body: object, by = agents.welder): Promise<Bead> => (await by.post(`/api/trials/${trial.id}/beads`).send(body).expect(201)).body as Bead
const read = async (id: string, by = agents.engineer): Promise<Trial> => (await by.get(`/api/trials/${id}`).expect(200)).body as Trial
const list = async (query: object = {}, by = agents.auditor): Promise<TrialRow[]> => ((await by.get('/api/trials').query(query).expect(200)).body as Page<TrialRow>).items

describe('the log', () => {
  it('numbers trials, and lists each by its last bead and best score', async () => {
    const trial = await begin('Bracket, quiet arc')
    expect(trial).toMatchObject({ number: expect.stringMatching(/^T-\d{3}$/) as string, title: 'Bracket, quiet arc', goal: 'A quiet arc', beads: [], bestScore: null, version: 1, may: ['save', 'record', 'discard'] })
    const first = await add(trial, { content: onMachine(pulseBead({}, { score: 4 })) })
    await add(trial, { copyOf: first.id, changes: { settings: [{ control: 'feed', value: 6.5 }], score: 2 } })
    expect(await list({ q: 'bracket er5356' })).toEqual([expect.objectContaining({ id: trial.id, beads: 2, bestScore: 4, machine: `${machine.number} Bay 9 pulse`, wire: 'ER5356 1.2 mm', metal: 'ASTM B209 6061-T6', procedureId: null, by: { id: organization.people.welder.id, name: 'Test Welder' } })])
    expect((await read(trial.id)).may).toEqual(['save', 'record', 'discard', 'promote'])
    expect((await read(trial.id, agents.auditor)).may).toEqual([])
  })

  it('saves title and goal, and shows both versions to whoever was overtaken', async () => {
    const trial = await begin()
    await agents.inspector.put(`/api/trials/${trial.id}`).set('If-Match', match(trial)).send({ title: 'Another', goal: null }).expect(200)
    const said = problem(await agents.welder.put(`/api/trials/${trial.id}`).set('If-Match', match(trial)).send({ title: 'Mine', goal: null }).expect(409))
    expect(said.current).toMatchObject({ title: 'Another', version: 2, sent: { title: 'Mine' } })
    expect(problem(await agents.welder.post('/api/trials').send({ title: ' ' }).expect(400)).detail).toMatch(/Say what setting you are after/)
  })

  it('of one organization is nobody else’s', async () => {
    const trial = await begin()
    const bead = await add(trial, { content: pulseBead() })
    const others = await signInAll(app, await app.makeOrganization())
    await others.engineer.get(`/api/trials/${trial.id}`).expect(404)
    await others.welder.post(`/api/trials/${trial.id}/beads`).send({ content: pulseBead() }).expect(404)
    await others.welder.put(`/api/beads/${bead.id}`).set('If-Match', '"1"').send({ content: pulseBead() }).expect(404)
    await others.welder.delete(`/api/beads/${bead.id}`).set('If-Match', '"1"').expect(404)
    expect(await list({}, others.auditor)).toEqual([])
    const own = await begin('Theirs', others.welder)
    expect(own.number).toBe('T-001')
    expect(problem(await others.welder.post(`/api/trials/${own.id}/beads`).send({ content: onMachine(pulseBead()) }).expect(422)).errors).toEqual([expect.objectContaining({ field: 'content.machineId' })])
  })
})

describe('beads', () => {
  it('copy another: settings stay but for the change, what is looked at and measured starts empty', async () => {
    const trial = await begin()
    const first = await add(trial, { content: onMachine(pulseBead({}, { score: 3, note: 'hisses', measured: measuredTravel(450), faults: [{ fault: 'soot', severity: 2 }] })) })
    const second = await add(trial, { copyOf: first.id, changes: { settings: [{ control: 'frequency', value: 112 }], note: 'better' } })
    expect(second).toMatchObject({ number: 2, version: 1, by: { id: organization.people.welder.id }, photos: [] })
    expect(second.content).toEqual({ ...first.content, settings: first.content.settings.map((one) => (one.control === 'frequency' ? { ...one, value: 112 } : one)), score: null, note: 'better', faults: [], measured: pulseBead().measured })
    expect((await read(trial.id)).beads.map(({ number }) => number)).toEqual([1, 2])
  })

  it('sent twice under one id are added once', async () => {
    const trial = await begin()
    const id = randomUUID()
    const [one, again] = [await add(trial, { id, content: pulseBead() }), await add(trial, { id, content: pulseBead({ feed: 9 }) })]
    expect(again).toEqual(one)
    expect((await read(trial.id)).beads).toHaveLength(1)
    const other = await begin()
    expect(problem(await agents.welder.post(`/api/trials/${other.id}/beads`).send({ id, content: pulseBead() }).expect(409)).detail).toMatch(/belongs to another trial/)
  })

  it('save what was read, and show both versions to whoever was overtaken', async () => {
    const trial = await begin()
    const bead = await add(trial, { content: pulseBead() })
    const saved = (await agents.inspector.put(`/api/beads/${bead.id}`).set('If-Match', match(bead)).send({ content: pulseBead({}, { score: 5 }) }).expect(200)).body as Bead
    expect(saved).toMatchObject({ version: 2, content: { score: 5 } })
    const said = problem(await agents.welder.put(`/api/beads/${bead.id}`).set('If-Match', match(bead)).send({ content: pulseBead({}, { score: 1 }) }).expect(409))
    expect(said.current).toMatchObject({ version: 2, content: { score: 5 }, sent: { score: 1 } })
    await agents.welder.put(`/api/beads/${bead.id}`).send({ content: pulseBead() }).expect(428)
    await agents.welder.delete(`/api/beads/${bead.id}`).set('If-Match', match(bead)).expect(409)
    await agents.welder.delete(`/api/beads/${bead.id}`).set('If-Match', match(saved)).expect(204)
    expect((await read(trial.id)).beads).toEqual([])
  })

  it.each<[string, object, string, RegExp]>([
    ['travel speed of nothing', { content: pulseBead({}, { measured: measuredTravel(0) }) }, 'content.measured.travelSpeed', /must be above 0/],
    ['a gas that doesn’t add up', { content: pulseBead({}, { gas: { libraryId: null, components: [{ gas: 'Ar', percent: 90 }], isoSymbol: null, name: null, flow: null } }) }, 'content.gas', /sum to 90 %/],
    ['a machine that isn’t there', { content: { ...pulseBead(), machineId: randomUUID() } }, 'content.machineId', /not in the register/],
    ['a copy of a bead that isn’t there', { copyOf: randomUUID() }, 'copyOf', /Choose a bead of this trial/],
  ])('refuse %s with a sentence at the field', async (_what, body, field, sentence) => {
    const said = problem(await agents.welder.post(`/api/trials/${(await begin()).id}/beads`).send(body).expect(422))
    expect(said.errors).toEqual([expect.objectContaining({ field, message: expect.stringMatching(sentence) as string })])
  })

  it.each<[string, object]>([['neither content nor copy', {}], ['both', { content: pulseBead(), copyOf: randomUUID() }], ['a score of 6', { content: { ...pulseBead(), score: 6 } }], ['text for a figure', { content: { ...pulseBead(), settings: [{ control: 'a', label: 'A', sets: 'voltage', value: 'high' }] } }]])('refuse %s', async (_what, body) => {
    await agents.welder.post(`/api/trials/${(await begin()).id}/beads`).send(body).expect(400)
  })
})

describe('photos', () => {
  it('are kept untouched with a small one, shown with the bead, and go with it', async () => {
    const trial = await begin()
    const bead = await add(trial, { content: pulseBead() })
    const jpeg = await sharp({ create: { width: 800, height: 600, channels: 3, background: '#999' } }).jpeg().toBuffer()
    const sent = await agents.welder.post(`/api/beads/${bead.id}/photos`).attach('files', jpeg, 'bead 1.jpg').expect(201)
    const [photo] = (sent.body as { items: Bead['photos'] }).items
    expect(photo).toMatchObject({ fileName: 'bead 1.jpg', mediaType: 'image/jpeg', width: 800, height: 600 })
    expect((await read(trial.id)).beads[0]?.photos).toEqual([photo])
    expect(Buffer.compare((await agents.auditor.get(`/api/bead-photos/${photo?.id}`).expect(200)).body as Buffer, jpeg)).toBe(0)
    expect((await agents.auditor.get(`/api/bead-photos/${photo?.id}/thumbnail`).expect(200)).type).toBe('image/jpeg')
    // A bead's photo is not reached as a machine's file.
    await agents.auditor.get(`/api/machine-files/${photo?.id}`).expect(404)
    await agents.welder.delete(`/api/bead-photos/${photo?.id}`).expect(204)
    await agents.auditor.get(`/api/bead-photos/${photo?.id}`).expect(404)
  })

  it('take no papers', async () => {
    const bead = await add(await begin(), { content: pulseBead() })
    const pdf = Buffer.from('%PDF-1.4\n1 0 obj<</Type/Catalog>>endobj\ntrailer<</Root 1 0 R>>\n%%EOF\n')
    expect(problem(await agents.welder.post(`/api/beads/${bead.id}/photos`).attach('files', pdf, 'report.pdf').expect(422)).detail).toMatch(/report\.pdf is a paper/)
  })
})

describe('recordings of the arc', () => {
  it('stay when their bead or its trial goes, attached to nothing', async () => {
    const trial = await begin()
    const beads = [await add(trial, { content: pulseBead() }), await add(trial, { content: pulseBead() })]
    const csv = Buffer.from(`t,I,U\n${Array.from({ length: 400 }, (_, index) => `${(index / 1000).toFixed(3)},${index % 10 < 3 ? 350 : 60},${index % 10 < 3 ? 28 : 19}`).join('\n')}\n`)
    const attached: string[] = []
    for (const bead of beads) {
      const recording = (await agents.welder.post('/api/arc-recordings').attach('files', csv, 'bead.csv').expect(201)).body as ArcRecording
      await agents.welder.put(`/api/arc-recordings/${recording.id}/attachment`).set('If-Match', match(recording)).send({ beadId: bead.id, weldLength: 150 }).expect(200)
      attached.push(recording.id)
    }
    const beadOf = async (id: string | undefined) => ((await agents.welder.get(`/api/arc-recordings/${id}`).expect(200)).body as ArcRecording).attachment.beadId
    expect(await beadOf(attached[0])).toBe(beads[0]?.id)
    await agents.welder.delete(`/api/beads/${beads[0]?.id}`).set('If-Match', '"1"').expect(204)
    expect([await beadOf(attached[0]), await beadOf(attached[1])]).toEqual([null, beads[1]?.id])
    await agents.welder.delete(`/api/trials/${trial.id}`).set('If-Match', match(trial)).expect(204)
    expect(await beadOf(attached[1])).toBeNull()
  })
})

describe('promotion', () => {
  const standards = [{ standard: 'asme-ix', edition: '2023', level: null }]
  const log = async (): Promise<{ trial: Trial; best: Bead }> => {
    const trial = await begin()
    await add(trial, { content: onMachine(pulseBead({ feed: 5.5 }, { score: 4 })) })
    const best = await add(trial, { content: onMachine(pulseBead({ feed: 6 }, { score: 5 })) })
    await add(trial, { content: onMachine(pulseBead({ feed: 6.8 }, { score: 1, faults: [{ fault: 'spatter', severity: 3 }] })) })
    return { trial, best }
  }

  it('makes a draft with ranges from the beads, linked with the trial, and its panel card dials on that machine', async () => {
    const { trial, best } = await log()
    const revision = (await agents.engineer.post(`/api/trials/${trial.id}/promotion`).send({ beadId: best.id, title: 'Bracket', standards }).expect(201)).body as Revision
    expect(revision).toMatchObject({ state: 'draft', revision: 'A', content: { title: 'Bracket', variables: { baseMetals: { a: { libraryId: 'us-b209-6061-t6', pNumber: '23' } }, processes: [{ filler: { classification: 'ER5356', fNumber: '22' }, electrical: { wireFeed: { min: { si: 5.5 }, max: { si: 6 } }, panel: { machine: machine.number } } }] } } })
    const after = await read(trial.id)
    expect(after).toMatchObject({ procedureId: revision.procedureId, procedureNumber: revision.number, may: ['save', 'record'] })
    const card = (await agents.welder.get(`/api/revisions/${revision.id}/panel-card`).query({ machine: machine.id, mode: 'manual-pulse' }).expect(200)).body as PanelCard
    expect(card).toMatchObject({ ready: true, lines: [{ label: 'Wire feed', min: 5.5, max: 6 }, {}, {}, { label: 'Frequency', value: 100 }, {}] })
    expect(problem(await agents.engineer.post(`/api/trials/${trial.id}/promotion`).send({ beadId: best.id, title: 'Again', standards }).expect(409)).detail).toMatch(/came of T-\d{3} already/)
    expect(problem(await agents.welder.delete(`/api/trials/${trial.id}`).set('If-Match', match(after)).expect(409)).detail).toMatch(/stays on record/)
  })

  it('may be done anew when its draft is discarded', async () => {
    const { trial, best } = await log()
    const revision = (await agents.engineer.post(`/api/trials/${trial.id}/promotion`).send({ beadId: best.id, title: 'Bracket', standards }).expect(201)).body as Revision
    await agents.engineer.delete(`/api/revisions/${revision.id}`).set('If-Match', match(revision)).expect(204)
    const after = await read(trial.id)
    expect(after).toMatchObject({ procedureId: null, procedureNumber: null })
    await agents.welder.delete(`/api/trials/${trial.id}`).set('If-Match', match(after)).expect(204)
    await agents.engineer.get(`/api/trials/${trial.id}`).expect(404)
  })

  it('refuses a bad bead, and leaves nothing behind', async () => {
    const { trial } = await log()
    const bad = (await read(trial.id)).beads.at(-1)
    const before = ((await agents.engineer.get('/api/procedures').expect(200)).body as Page<unknown>).total
    expect(problem(await agents.engineer.post(`/api/trials/${trial.id}/promotion`).send({ beadId: bad?.id, title: 'Bad', standards }).expect(422)).detail).toMatch(/scored 1: choose a bead that you would weld again/)
    expect(((await agents.engineer.get('/api/procedures').expect(200)).body as Page<unknown>).total).toBe(before)
    expect((await read(trial.id)).procedureId).toBeNull()
  })
})
