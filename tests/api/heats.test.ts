import { readFile } from 'node:fs/promises'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Page } from '../../shared/schemas/common.ts'
import type { Heat, HeatRow, WriteHeat } from '../../shared/schemas/heats.ts'
import { problem, startApp, type TestApp, type TestOrganization } from './harness.ts'
import { match, procedureContent, signInAll, type Agents } from './content.ts'

let app: TestApp
let organization: TestOrganization
let agents: Agents
beforeAll(async () => {
  app = await startApp()
  organization = await app.makeOrganization()
  agents = await signInAll(app, organization)
})
afterAll(() => app.close())

let count = 0
const heat = (part: Partial<WriteHeat> = {}) => ({ kind: 'heat', number: `K${(count += 1)}`, grade: 'A/SA-516 70', libraryId: 'us-a516-70', chemistryOf: 'ladle', chemistry: [{ element: 'C', percent: 0.18 }, { element: 'Mn', percent: 1.2 }, { element: 'B', percent: 0.0005, atMost: true }], ...part })
const record = async (part: Partial<WriteHeat> = {}, by = agents): Promise<Heat> => (await by.inspector.post('/api/heats').send(heat(part)).expect(201)).body as Heat
const list = async (query: object, by = agents): Promise<HeatRow[]> => ((await by.welder.get('/api/heats').query(query).expect(200)).body as Page<HeatRow>).items

describe('heats and lots', () => {
  it('keep their chemistry, and are found by number, grade and library row', async () => {
    const made = await record({ number: 'ZX-901' })
    const read = (await agents.welder.get(`/api/heats/${made.id}`).expect(200)).body as Heat
    expect(read).toMatchObject({ version: 1, may: [], files: [], namedBy: [], content: { chemistry: [{ element: 'C', percent: 0.18 }, { element: 'Mn', percent: 1.2 }, { element: 'B', percent: 0.0005, atMost: true }] } })
    expect(made.may).toEqual(['save', 'attach', 'remove'])
    expect(await list({ q: 'zx-901 516' })).toEqual([expect.objectContaining({ id: made.id, files: 0 })])
    expect((await list({ libraryId: 'us-a516-70', kind: 'heat' })).map(({ id }) => id)).toContain(made.id)
    expect(await list({ libraryId: 'us-a36' })).toEqual([])
    expect(await list({ q: 'zx-901', kind: 'lot' })).toEqual([])
  })

  it('are one record for one number of one grade, told at the field', async () => {
    const made = await record()
    expect(problem(await agents.engineer.post('/api/heats').send(heat({ number: made.content.number })).expect(422)).errors).toEqual([expect.objectContaining({ field: 'number' })])
    const other = await record()
    expect(problem(await agents.engineer.put(`/api/heats/${other.id}`).set('If-Match', match(other)).send({ ...other.content, number: made.content.number }).expect(422)).errors?.[0]?.field).toBe('number')
    await record({ number: made.content.number, grade: 'A/SA-36', libraryId: 'us-a36' })
    expect(problem(await agents.engineer.post('/api/heats').send(heat({ libraryId: 'no-such-row' })).expect(422)).errors?.[0]?.field).toBe('grade')
  })

  it('refuse chemistry that can’t be, at the field', async () => {
    const refused = async (chemistry: unknown) => problem(await agents.engineer.post('/api/heats').send({ ...heat(), chemistry }).expect(400))
    expect((await refused([{ element: 'Fe', percent: 99 }, { element: 'C', percent: 2 }])).errors).toEqual([expect.objectContaining({ field: 'chemistry', message: 'The elements add up to 101 %, which is more than the whole.' })])
    expect((await refused([{ element: 'C', percent: 0.1 }, { element: 'C', percent: 0.2 }])).errors?.[0]).toMatchObject({ field: 'chemistry.1.element', message: 'C is given twice.' })
    expect((await refused([{ element: 'C', percent: -0.1 }])).errors?.[0]?.message).toBe('A share can’t be below 0 %.')
    expect((await refused([{ element: 'Xy', percent: 1 }])).errors?.[0]?.field).toBe('chemistry.0.element')
  })

  it('show both versions to whoever was overtaken', async () => {
    const made = await record()
    const saved = (await agents.administrator.put(`/api/heats/${made.id}`).set('If-Match', match(made)).send({ ...made.content, certificate: 'MC-1' }).expect(200)).body as Heat
    expect(saved).toMatchObject({ version: 2, content: { certificate: 'MC-1' } })
    expect(problem(await agents.engineer.put(`/api/heats/${made.id}`).set('If-Match', match(made)).send({ ...made.content, certificate: 'MC-2' }).expect(409)).current).toMatchObject({ version: 2, content: { certificate: 'MC-1' }, sent: { certificate: 'MC-2' } })
    await agents.engineer.put(`/api/heats/${made.id}`).send(made.content).expect(428)
  })

  it('keep certificates, unchanged, until removed, and take them along', async () => {
    const made = await record()
    const pdf = Buffer.from('%PDF-1.4\n1 0 obj<</Type/Catalog>>endobj\ntrailer<</Root 1 0 R>>\n%%EOF\n')
    const photo = await readFile('tests/fixtures/photos/macro-with-place.jpg')
    const added = (await agents.inspector.post(`/api/heats/${made.id}/files`).attach('files', pdf, 'K.pdf').attach('files', photo, 'tag.jpg').expect(201)).body as { items: { id: string; fileName: string }[] }
    expect(added.items.map(({ fileName }) => fileName)).toEqual(['K.pdf', 'tag.jpg'])
    const [certificate, tag] = added.items
    const read = await agents.welder.get(`/api/heat-files/${certificate?.id}`).expect(200)
    expect(Buffer.from(read.body as Buffer).equals(pdf)).toBe(true)
    await agents.welder.delete(`/api/heat-files/${certificate?.id}`).expect(403)
    // A file of a heat is no machine's.
    await agents.engineer.get(`/api/machine-files/${certificate?.id}`).expect(404)
    await agents.engineer.delete(`/api/heat-files/${tag?.id}`).expect(204)
    expect((await list({ q: made.content.number }))[0]?.files).toBe(1)
    const others = await signInAll(app, await app.makeOrganization())
    for (const address of [`/api/heat-files/${certificate?.id}`, `/api/heats/${made.id}`]) await others.engineer.get(address).expect(404)
    await agents.engineer.delete(`/api/heats/${made.id}`).set('If-Match', '"9"').expect(409)
    await agents.engineer.delete(`/api/heats/${made.id}`).set('If-Match', match(made)).expect(204)
    await app.drain()
    await expect(app.services.storage.get(`${organization.id}/attachments/${certificate?.id}.pdf`)).rejects.toThrow()
    await agents.engineer.get(`/api/heats/${made.id}`).expect(404)
  })

  it('stay while a record names them', async () => {
    const made = await record({ number: 'NAMED-1' })
    const content = procedureContent()
    content.variables.baseMetals.a.heatNumber = 'NAMED-1'
    await agents.engineer.post('/api/procedures').send({ content }).expect(201)
    const read = (await agents.engineer.get(`/api/heats/${made.id}`).expect(200)).body as Heat
    expect(read.namedBy).toEqual([expect.objectContaining({ kind: 'procedure', title: content.title, state: 'draft' })])
    expect(read.may).toEqual(['save', 'attach'])
    expect(problem(await agents.engineer.delete(`/api/heats/${made.id}`).set('If-Match', match(made)).expect(409)).detail).toMatch(/name heat NAMED-1/)
  })

  it('of one organization are nobody else’s', async () => {
    const others = await signInAll(app, await app.makeOrganization())
    expect(await list({}, others)).toEqual([])
    expect((await record({ number: 'ZX-901' }, others)).content.number).toBe('ZX-901')
  })
})
