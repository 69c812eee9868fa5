import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { libraryRows } from '../../shared/library/library-rows.ts'
import type { Page } from '../../shared/schemas/common.ts'
import type { LibraryItem } from '../../shared/schemas/records.ts'
import { toBaseMetal } from '../../shared/library/base-metals.ts'
import { toFiller } from '../../shared/library/filler-metals.ts'
import { toGasMixture } from '../../shared/library/gases.ts'
import { loadLibrary } from '../../server/services/library.ts'
import { match, procedureContent, signInAll, type Agents } from './content.ts'
import { problem, startApp, type Agent, type TestApp, type TestOrganization } from './harness.ts'

let app: TestApp
let organization: TestOrganization
let welder: Agent
beforeAll(async () => {
  app = await startApp()
  organization = await app.makeOrganization()
  welder = await app.agentFor(organization, 'welder')
})
afterAll(() => app.close())

const list = async (kind: string, query: object = {}): Promise<Page<LibraryItem>> => (await welder.get(`/api/library/${kind}`).query(query).expect(200)).body as Page<LibraryItem>
const titles = ({ items }: Page<LibraryItem>): string[] => items.map(({ title }) => title)

describe('the library', () => {
  it.each(['base-metals', 'filler-metals', 'gases', 'positions', 'processes'] as const)('holds every reference row of %s, with its source', async (kind) => {
    const expected = libraryRows().filter((row) => row.kind === kind)
    const page = await list(kind, { limit: 1 })
    expect(page.total).toBe(expected.length)
    expect(page.items[0]).toMatchObject({ key: expected[0]?.key, origin: 'reference', basis: expected[0]?.basis, source: expected[0]?.source })
    const body: unknown = (await welder.get(`/api/library/${kind}/${page.items[0]?.id}`).expect(200)).body
    expect(body).toEqual(page.items[0])
  })

  it.each<[string, string, RegExp]>([
    ['base-metals', 'A516-70', /516.*70/],
    ['base-metals', 'sa 36', /36/],
    ['base-metals', 'S31603', /316L/],
    ['base-metals', '6061', /6061/],
    ['filler-metals', 'E7018', /^E7018/],
    ['filler-metals', 'er5356', /^ER5356/],
    ['positions', '3G', /^3G/],
    ['processes', 'GMAW', /^GMAW/],
  ])('finds in %s by "%s", the best first', async (kind, q, title) => {
    expect(titles(await list(kind, { q, limit: 5 }))[0]).toMatch(title)
  })

  it('finds by P-Number, and narrows by P-Number, F-Number and process', async () => {
    const byText = await list('base-metals', { q: 'P-No. 8', limit: 200 })
    expect(byText.total).toBeGreaterThan(0)
    expect(byText.items.every(({ content }) => content.p_no === '8')).toBe(true)
    const narrowed = await list('base-metals', { pNumber: '8', limit: 200 })
    expect(new Set(narrowed.items.map(({ id }) => id))).toEqual(new Set(byText.items.map(({ id }) => id)))
    const fillers = await list('filler-metals', { fNumber: '6', process: 'GTAW', limit: 200 })
    expect(fillers.total).toBeGreaterThan(0)
    expect(fillers.items.every(({ content }) => content.f_no === 6 && (content.processes as string[]).some((written) => ['GTAW', '141'].includes(written)))).toBe(true)
    // Rows name their processes as their own standard does: by an ISO 4063 number, or with the kind of shielding.
    for (const [process, q] of [['GMAW', 'G 42 4'], ['FCAW', 'E71T-1C']] as const) expect((await list('filler-metals', { process, q })).items.length, q).toBeGreaterThan(0)
  })

  it('wants all words, and says so when nothing has them', async () => {
    expect(await list('base-metals', { q: 'A516 nonsense' })).toEqual({ items: [], next: null, total: 0 })
  })

  it.each([undefined, 'A'])('pages through everything once (q=%s)', async (q) => {
    const seen: string[] = []
    let cursor: string | null | undefined
    do {
      const page: Page<LibraryItem> = await list('base-metals', { limit: 100, ...(q && { q }), ...(cursor && { cursor }) })
      seen.push(...page.items.map(({ id }) => id))
      cursor = page.next
    } while (cursor)
    expect(new Set(seen).size).toBe(seen.length)
    expect(seen.length).toBe((await list('base-metals', { limit: 1, ...(q && { q }) })).total)
  })

  it('refuses an unknown kind, a cursor that is not its own and an id of another kind', async () => {
    expect(problem(await welder.get('/api/library/bolts').expect(400)).errors?.[0]?.field).toBe('kind')
    expect(problem(await welder.get('/api/library/gases').query({ cursor: 'abc' }).expect(400)).errors?.[0]?.field).toBe('cursor')
    const [gas] = (await list('gases', { limit: 1 })).items
    await welder.get(`/api/library/positions/${gas?.id}`).expect(404)
    const others = await app.agentFor(await app.makeOrganization(), 'welder')
    await others.get(`/api/library/gases/${gas?.id}`).expect(404)
  })
})

describe('the organization’s own rows', () => {
  let agents: Agents
  beforeAll(async () => {
    agents = await signInAll(app, organization)
  })
  const metal = (part: object = {}) => ({ kind: 'base-metals', content: { spec: 'LF 12', grade: 'Duro 400', product_form: 'plate', p_no: null, iso_15608: '3.1', min_tensile_mpa: 780, min_yield_mpa: 650, source: 'Data sheet of the mill, 2026', ...part } })
  const add = async (body: object) => (await agents.engineer.post('/api/library').send(body).expect(201)).body as LibraryItem

  it('are found by type-ahead before the reference, shown as own, and copied into a record as any row', async () => {
    const made = await add(metal())
    expect(made).toMatchObject({ origin: 'own', basis: 'own', title: 'LF 12 Duro 400', source: 'Data sheet of the mill, 2026', version: 1 })
    expect((await list('base-metals', { q: 'duro 400' })).items[0]?.id).toBe(made.id)
    expect((await list('base-metals', { limit: 1 })).items[0]?.id).toBe(made.id)
    expect(toBaseMetal(made.content)).toMatchObject({ libraryId: made.key, specification: 'LF 12', grade: 'Duro 400', iso15608: '3.1', pNumber: null, minTensile: { si: 780 } })
    const wire = await add({ kind: 'filler-metals', content: { spec: 'LF wire', classification: 'LFW-70', f_no: 6, processes: ['gmaw'], source: 'Maker' } })
    expect(titles(await list('filler-metals', { q: 'lfw', process: 'GMAW' }))).toEqual(['LFW-70'])
    expect(toFiller(wire.content)).toMatchObject({ libraryId: wire.key, classification: 'LFW-70', fNumber: '6', productForm: 'solid' })
    const gas = await add({ kind: 'gases', content: { name: 'Bay mix', components: [{ gas: 'Ar', percent: 92 }, { gas: 'CO2', percent: 8 }], source: 'Contract with the gas works' } })
    expect(toGasMixture(gas.content)).toMatchObject({ libraryId: gas.key, isoSymbol: 'M20', name: 'Bay mix' })
    expect(titles(await list('gases', { q: 'bay mix' }))[0]).toBe('Bay mix')
  })

  it.each<[string, object, string, RegExp]>([
    ['gas that does not add up', { kind: 'gases', content: { name: 'X', components: [{ gas: 'Ar', percent: 80 }, { gas: 'CO2', percent: 15 }], source: 's' } }, 'content.components', /add up to 95 %; a mixture is 100 %/],
    ['a P-Number that does not exist', metal({ p_no: '12' }), 'content.p_no', /no P-Number 12/],
    ['a P-Number that is divided', metal({ p_no: '5' }), 'content.p_no', /5A, 5B, 5C/],
    ['a Group Number of aluminium', metal({ p_no: '23', group_no: 1 }), 'content.group_no', /no Group Numbers/],
    ['a group of ISO 15608 that does not exist', metal({ iso_15608: '1.7' }), 'content.iso_15608', /no group 1.7/],
    ['a yield above the tensile strength', metal({ min_yield_mpa: 900 }), 'content.min_yield_mpa', /above the tensile strength/],
    ['figures from nowhere', metal({ source: ' ' }), 'content.source', /where the figures come from/],
    ['an F-Number that does not exist', { kind: 'filler-metals', content: { spec: 'a', classification: 'b', f_no: 7, processes: ['GMAW'], source: 's' } }, 'content.f_no', /no F-Number 7/],
    ['an A-Number of aluminium', { kind: 'filler-metals', content: { spec: 'a', classification: 'b', f_no: 23, a_no: 1, processes: ['GMAW'], source: 's' } }, 'content.a_no', /ferrous/],
    ['a process that nobody knows', { kind: 'filler-metals', content: { spec: 'a', classification: 'b', processes: ['glue'], source: 's' } }, 'content.processes', /“glue” is no process/],
  ])('refuse %s at the field', async (_what, body, field, sentence) => {
    const { errors } = problem(await agents.engineer.post('/api/library').send(body).expect(400))
    expect(errors?.map((one) => one.field)).toContain(field)
    expect(errors?.find((one) => one.field === field)?.message).toMatch(sentence)
  })

  it('are changed under If-Match, once each, and only own ones', async () => {
    const made = await add(metal({ grade: 'Duro 500' }))
    expect(problem(await agents.engineer.post('/api/library').send(metal({ grade: 'Duro 500' })).expect(422)).errors?.[0]?.field).toBe('content.spec')
    const address = `/api/library/base-metals/${made.id}`
    const saved = (await agents.administrator.put(address).set('If-Match', match(made)).send(metal({ grade: 'Duro 500 S' })).expect(200)).body as LibraryItem
    expect(saved).toMatchObject({ key: made.key, title: 'LF 12 Duro 500 S', version: 2 })
    expect(problem(await agents.engineer.put(address).set('If-Match', match(made)).send(metal()).expect(409)).current).toMatchObject({ title: 'LF 12 Duro 500 S' })
    expect(problem(await agents.engineer.put(address).set('If-Match', match(saved)).send({ kind: 'gases', content: { name: 'X', components: [{ gas: 'Ar', percent: 100 }], source: 's' } }).expect(400)).errors?.[0]?.field).toBe('kind')
    const [reference] = (await list('base-metals', { q: 'A516-70' })).items
    expect(problem(await agents.engineer.put(`/api/library/base-metals/${reference?.id}`).set('If-Match', '"1"').send(metal()).expect(403)).detail).toMatch(/is a reference row/)
    await agents.engineer.delete(`/api/library/base-metals/${reference?.id}`).set('If-Match', '"1"').expect(403)
    await agents.inspector.delete(address).set('If-Match', match(saved)).expect(403)
    const others = await app.agentFor(await app.makeOrganization(), 'engineer')
    await others.delete(address).set('If-Match', match(saved)).expect(404)
  })

  it('stay while something names them, and go when nothing does', async () => {
    const made = await add(metal({ grade: 'Duro 600' }))
    const content = procedureContent()
    content.variables.baseMetals.b = toBaseMetal(made.content)
    const revision = (await agents.engineer.post('/api/procedures').send({ content }).expect(201)).body as { id: string; version: number }
    const heat = (await agents.inspector.post('/api/heats').send({ kind: 'heat', number: 'D600-1', grade: made.title, libraryId: made.key }).expect(201)).body as { id: string; version: number }
    const address = `/api/library/base-metals/${made.id}`
    const { items } = (await welder.get(`${address}/uses`).expect(200)).body as { items: { kind: string; id: string }[] }
    expect(items.map(({ kind, id }) => [kind, id])).toEqual([['procedure', revision.id], ['heat', heat.id]])
    expect(problem(await agents.engineer.delete(address).set('If-Match', match(made)).expect(409)).detail).toMatch(/D600-1 name LF 12 Duro 600, so it stays/)
    await agents.engineer.delete(`/api/revisions/${revision.id}`).set('If-Match', match(revision)).expect(204)
    await agents.engineer.delete(address).set('If-Match', match(made)).expect(409)
    await agents.engineer.delete(`/api/heats/${heat.id}`).set('If-Match', match(heat)).expect(204)
    await agents.engineer.delete(address).set('If-Match', match(made)).expect(204)
    expect((await list('base-metals', { q: 'duro 600' })).total).toBe(0)
  })

  it('outlive a renewal of the reference rows', async () => {
    const made = await add(metal({ grade: 'Duro 700' }))
    await app.inTenant(organization, (tenant) => loadLibrary(tenant))
    expect((await list('base-metals', { q: 'duro 700' })).items).toEqual([made])
  })

  it('name the uses of gases, fillers, positions and processes too', async () => {
    const content = procedureContent()
    const [block] = content.variables.processes
    const [filler] = (await list('filler-metals', { q: 'E7018' })).items
    const [gas] = (await list('gases', { q: '82/18' })).items
    if (!block || !filler || !gas) throw new Error('the sample has a process')
    block.filler.libraryId = filler.key
    block.shieldingGas = toGasMixture(gas.content)
    const revision = (await agents.engineer.post('/api/procedures').send({ content }).expect(201)).body as { id: string }
    const [position] = (await list('positions', { q: '3G' })).items
    const [process] = (await list('processes', { q: 'SMAW' })).items
    for (const item of [filler, gas, position, process]) {
      const { items } = (await welder.get(`/api/library/${item?.kind}/${item?.id}/uses`).expect(200)).body as { items: { id: string }[] }
      expect(items.map(({ id }) => id), item?.title).toContain(revision.id)
    }
  })
})
