import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { libraryRows } from '../../shared/library/library-rows.ts'
import type { Page } from '../../shared/schemas/common.ts'
import type { LibraryItem } from '../../shared/schemas/records.ts'
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
