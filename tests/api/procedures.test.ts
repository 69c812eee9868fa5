import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Page } from '../../shared/schemas/common.ts'
import type { ProcedureRecord, ProcedureRow, Revision } from '../../shared/schemas/records.ts'
import { approved, certified, draft, match, openCoupon, procedureContent, signInAll, submitted, type Agents } from './content.ts'
import { problem, startApp, type TestApp, type TestOrganization } from './harness.ts'

let app: TestApp
let organization: TestOrganization
let agents: Agents
beforeAll(async () => {
  app = await startApp()
  organization = await app.makeOrganization()
  agents = await signInAll(app, organization)
})
afterAll(() => app.close())

const save = (revision: Revision, content: object) => agents.engineer.put(`/api/revisions/${revision.id}`).set('If-Match', match(revision)).send({ content })
const read = async (id: string): Promise<Revision> => (await agents.engineer.get(`/api/revisions/${id}`).expect(200)).body as Revision

describe('a draft', () => {
  it('starts as revision A with a number of its own, and an ETag', async () => {
    const answer = await agents.engineer.post('/api/procedures').send({ content: procedureContent() }).expect(201)
    const revision = answer.body as Revision
    expect(revision).toMatchObject({ revision: 'A', state: 'draft', version: 1, author: { id: organization.people.engineer.id }, signatures: [], may: ['save', 'discard', 'submit'] })
    expect(revision.number).toMatch(/^WPS-\d{3}$/)
    expect(answer.headers.etag).toBe('"1"')
    expect(revision.contentSha256).toMatch(/^[0-9a-f]{64}$/)
  })

  it('keeps numbers as they were typed and gives equal content an equal hash', async () => {
    const [one, other] = [await draft(agents), await draft(agents)]
    expect(one.content).toEqual(procedureContent())
    expect(one.contentSha256).toBe(other.contentSha256)
  })

  it('gives every one of many started at once its own number', async () => {
    const started = await Promise.all(Array.from({ length: 8 }, () => draft(agents)))
    expect(new Set(started.map(({ number }) => number)).size).toBe(8)
  })

  it('is saved by version; who comes second gets both versions and loses nothing', async () => {
    const revision = await draft(agents)
    const saved = (await save(revision, procedureContent({ title: 'First' })).expect(200)).body as Revision
    expect(saved.version).toBe(2)
    const said = problem(await save(revision, procedureContent({ title: 'Second' })).expect(409))
    expect(said.detail).toContain('Nothing of yours is lost')
    expect(said.current).toMatchObject({ id: revision.id, version: 2, content: { title: 'First' }, sent: { title: 'Second' } })
    expect((await read(revision.id)).content.title).toBe('First')
  })

  it('lets one of two saves at the same moment through', async () => {
    const revision = await draft(agents)
    const answers = await Promise.all(['One', 'Two'].map((title) => save(revision, procedureContent({ title }))))
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
  })

  it('names field, value and what would be right', async () => {
    const said = problem(await agents.engineer.post('/api/procedures').send({ content: { ...procedureContent(), title: '' } }).expect(400))
    expect(said.detail).toContain('content.title holds "": Give the procedure a title')
  })

  it('rests only on coupons that are there', async () => {
    const elsewhere = await openCoupon(await signInAll(app, await app.makeOrganization()))
    const said = problem(await agents.engineer.post('/api/procedures').send({ content: procedureContent({ supportingCoupons: [elsewhere.id] }) }).expect(422))
    expect(said.errors?.[0]).toMatchObject({ field: 'content.supportingCoupons.0', value: elsewhere.id })
    const coupon = await openCoupon(agents)
    const revision = await draft(agents, procedureContent({ supportingCoupons: [coupon.id] }))
    expect(revision.coupons).toEqual([{ id: coupon.id, number: coupon.number, title: coupon.content.title, status: 'testing' }])
  })

  it('is discarded with its procedure, and the number is not given again', async () => {
    const revision = await draft(agents)
    await agents.engineer.delete(`/api/revisions/${revision.id}`).set('If-Match', match(revision)).expect(204)
    await agents.engineer.get(`/api/procedures/${revision.procedureId}`).expect(404)
    expect((await draft(agents)).number > revision.number).toBe(true)
  })

  it('stays once it was under review or a coupon was opened against it', async () => {
    const revision = await submitted(agents)
    const returned = (await agents.supervisor.post(`/api/revisions/${revision.id}/return`).set('If-Match', match(revision)).send({ comment: 'State the preheat.' }).expect(200)).body as Revision
    expect((await read(revision.id)).may).not.toContain('discard')
    await agents.engineer.delete(`/api/revisions/${revision.id}`).set('If-Match', match(returned)).expect(409)
    const tied = await draft(agents)
    await agents.inspector.post('/api/coupons').send({ revisionId: tied.id }).expect(201)
    expect((await read(tied.id)).may).not.toContain('discard')
    const said = problem(await agents.engineer.delete(`/api/revisions/${tied.id}`).set('If-Match', match(tied)).expect(409))
    expect(said.detail).toContain('was opened against')
  })
})

describe('assessment', () => {
  it('judges the revision by its coupons under each of its standards', async () => {
    const coupon = await certified(agents)
    const revision = await draft(agents, procedureContent({ supportingCoupons: [coupon.id], thickness: [5, 25] }))
    const body: unknown = (await agents.auditor.get(`/api/revisions/${revision.id}/assessment`).expect(200)).body
    const { assessments } = body as { assessments: { standard: string; verdict: string; findings: { verdict: string; couponIds: string[]; sentence: string }[] }[] }
    expect(assessments.map(({ standard }) => standard)).toEqual(['asme-ix'])
    const outside = assessments[0]?.findings.filter(({ verdict }) => verdict === 'outside') ?? []
    expect(outside.length).toBeGreaterThan(0)
    expect(outside[0]?.couponIds).toEqual([coupon.id])
    expect(outside[0]?.sentence).toMatch(/25/)
  })

  it('says that a coupon is not certified yet', async () => {
    const coupon = await openCoupon(agents)
    const revision = await draft(agents, procedureContent({ supportingCoupons: [coupon.id] }))
    const body: unknown = (await agents.engineer.get(`/api/revisions/${revision.id}/assessment`).expect(200)).body
    expect(JSON.stringify(body)).toContain(`${coupon.number} isn't certified yet`)
  })
})

describe('revising', () => {
  it('opens the next letter from the approved content, once', async () => {
    const first = await approved(agents, procedureContent({ title: 'Revised later' }))
    const next = (await agents.engineer.post(`/api/procedures/${first.procedureId}/revisions`).expect(201)).body as Revision
    expect(next).toMatchObject({ number: first.number, revision: 'B', state: 'draft', content: first.content })
    const said = problem(await agents.engineer.post(`/api/procedures/${first.procedureId}/revisions`).expect(409))
    expect(said.detail).toContain('revision B is draft')
    const { revisions } = (await agents.engineer.get(`/api/procedures/${first.procedureId}`).expect(200)).body as ProcedureRecord
    expect(revisions.map(({ revision, state }) => [revision, state])).toEqual([['A', 'approved'], ['B', 'draft']])
    expect((await agents.engineer.get(`/api/revisions/${first.id}`)).body as Revision).toMatchObject({ may: ['send'] })
  })

  it('needs an approved revision', async () => {
    const revision = await draft(agents)
    expect(problem(await agents.engineer.post(`/api/procedures/${revision.procedureId}/revisions`).expect(409)).detail).toContain('Finish it')
  })
})

describe('comparison', () => {
  interface Compared { from: { id: string } | null; to: { id: string }; changes: { field: string; label: string; before: string | null; after: string | null }[] }
  const compare = async (id: string, query: object = {}): Promise<Compared> => (await agents.supervisor.get(`/api/revisions/${id}/comparison`).query(query).expect(200)).body as Compared

  it('says what changed since the approved revision, coupons by number', async () => {
    const coupon = await certified(agents)
    const first = await approved(agents)
    expect(await compare(first.id)).toMatchObject({ from: null, changes: [] })
    const next = (await agents.engineer.post(`/api/procedures/${first.procedureId}/revisions`).expect(201)).body as Revision
    expect(await compare(next.id)).toMatchObject({ from: { id: first.id }, to: { id: next.id }, changes: [] })
    await save(next, procedureContent({ thickness: [5, 16], supportingCoupons: [coupon.id] })).expect(200)
    const { changes } = await compare(next.id)
    expect(changes.find(({ field }) => field === 'thickness')).toMatchObject({ before: expect.stringContaining('20') as string, after: expect.stringContaining('16') as string })
    expect(changes.find(({ field }) => field === 'supportingCoupons')?.after).toContain(coupon.number)
    expect(await compare(first.id, { against: next.id })).toMatchObject({ from: { id: next.id } })
  })

  it('compares revisions of one procedure only', async () => {
    const [one, other] = [await draft(agents), await draft(agents)]
    await agents.engineer.get(`/api/revisions/${one.id}/comparison`).query({ against: other.id }).expect(404)
  })
})

describe('the list', () => {
  it('shows the newest revision of each, filtered, searched and sorted', async () => {
    const own = await signInAll(app, await app.makeOrganization())
    const first = await approved(own, procedureContent({ title: 'Beam splice' }))
    await draft(own, procedureContent({ title: 'tank shell' }))
    const next = (await own.engineer.post(`/api/procedures/${first.procedureId}/revisions`).expect(201)).body as Revision
    const list = async (query: object) => (await own.welder.get('/api/procedures').query(query).expect(200)).body as Page<ProcedureRow>
    const all = await list({ sort: 'title' })
    expect(all.items.map(({ title, state, revision }) => [title, state, revision])).toEqual([['Beam splice', 'draft', 'B'], ['tank shell', 'draft', 'A']])
    expect(all.items[0]).toMatchObject({ revisionId: next.id, approvedRevisionId: first.id, processes: ['SMAW'], thicknessMin: 5, thicknessMax: 20, standards: ['asme-ix'] })
    expect((await list({ state: 'approved' })).total).toBe(0)
    expect((await list({ q: 'K02700 tank' })).items.map(({ title }) => title)).toEqual(['tank shell'])
    expect((await list({ process: 'GTAW' })).total).toBe(0)
    expect((await list({ standard: 'asme-ix', sort: '-number' })).items.map(({ number }) => number)).toEqual(['WPS-002', 'WPS-001'])
  })

  it('pages stably while procedures are added', async () => {
    const own = await signInAll(app, await app.makeOrganization())
    for (const title of ['e', 'c', 'a']) await draft(own, procedureContent({ title }))
    const seen: string[] = []
    let cursor: string | null = null
    for (const added of ['b', 'd', 'f']) {
      const body: unknown = (await own.auditor.get('/api/procedures').query({ sort: 'title', limit: 1, ...(cursor && { cursor }) }).expect(200)).body
      const page = body as Page<ProcedureRow>
      seen.push(page.items[0]?.title ?? '')
      cursor = page.next
      await draft(own, procedureContent({ title: added }))
    }
    expect(seen).toEqual(['a', 'b', 'c'])
  })

  it('holds nothing of another organization', async () => {
    const others = await signInAll(app, await app.makeOrganization())
    const revision = await draft(agents)
    expect(((await others.engineer.get('/api/procedures').expect(200)).body as Page<ProcedureRow>).total).toBe(0)
    await others.engineer.get(`/api/procedures/${revision.procedureId}`).expect(404)
    for (const path of ['', '/assessment', '/comparison', '/document']) await others.engineer.get(`/api/revisions/${revision.id}${path}`).expect(404)
    await others.engineer.put(`/api/revisions/${revision.id}`).set('If-Match', '"1"').send({ content: procedureContent() }).expect(404)
    await others.engineer.delete(`/api/revisions/${revision.id}`).set('If-Match', '"1"').expect(404)
    await others.engineer.post(`/api/revisions/${revision.id}/submission`).set('If-Match', '"1"').expect(404)
    await others.engineer.post(`/api/procedures/${revision.procedureId}/revisions`).expect(404)
  })
})
