import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Revision } from '../../shared/schemas/records.ts'
import { statementOf } from '../../shared/records/statements.ts'
import { addPerson } from '../../server/services/organizations.ts'
import { approved, certified, draft, match, openCoupon, procedureContent, signInAll, submitted, type Agents } from './content.ts'
import { PASSWORD, problem, startApp, type Agent, type TestApp, type TestOrganization } from './harness.ts'

let app: TestApp
let organization: TestOrganization
let agents: Agents
let both: Agent
beforeAll(async () => {
  app = await startApp()
  organization = await app.makeOrganization()
  agents = await signInAll(app, organization)
  const email = `both.${organization.id.slice(0, 8)}@larkfield.example`
  await app.inTenant(organization, (tenant) => addPerson(tenant, { name: 'Two Hats', email, roles: ['engineer', 'supervisor'], password: PASSWORD }))
  both = app.anonymous()
  await both.post('/api/session').send({ email, password: PASSWORD }).expect(200)
})
afterAll(() => app.close())

const approve = (revision: Revision, body: object = { password: PASSWORD, deviationReason: 'Accepted for the test.' }, agent = agents.supervisor) => agent.post(`/api/revisions/${revision.id}/approval`).set('If-Match', match(revision)).send(body)
const read = async (id: string, agent = agents.engineer): Promise<Revision> => (await agent.get(`/api/revisions/${id}`).expect(200)).body as Revision

describe('submission', () => {
  it('is the author’s act, on record', async () => {
    const revision = await submitted(agents)
    expect(revision).toMatchObject({ state: 'in-review', version: 2, may: [] })
    expect(revision.signatures).toMatchObject([{ meaning: 'authored', role: 'engineer', contentSha256: revision.contentSha256 }])
  })

  it('wants what a reviewer needs, all of it named at once', async () => {
    const whole = procedureContent()
    const [block] = whole.variables.processes
    const bare = { ...whole, variables: { ...whole.variables, thickness: null, processes: [{ ...block, process: null, positions: [] }] } }
    const revision = (await agents.engineer.post('/api/procedures').send({ content: bare }).expect(201)).body as Revision
    const said = problem(await agents.engineer.post(`/api/revisions/${revision.id}/submission`).set('If-Match', match(revision)).expect(422))
    expect(said.errors?.map(({ field }) => field)).toEqual(['content.variables.thickness', 'content.variables.processes.0.process', 'content.variables.processes.0.positions'])
  })

  it('closes the text: it cannot be saved or submitted again under review', async () => {
    const revision = await submitted(agents)
    const said = problem(await agents.engineer.put(`/api/revisions/${revision.id}`).set('If-Match', match(revision)).send({ content: procedureContent() }).expect(409))
    expect(said.detail).toContain('is in review, so it cannot be saved')
    expect(said.current).toMatchObject({ id: revision.id, state: 'in-review' })
    await agents.engineer.post(`/api/revisions/${revision.id}/submission`).set('If-Match', match(revision)).expect(409)
  })
})

describe('return', () => {
  it('gives the draft back with the comment', async () => {
    const revision = await submitted(agents)
    const body: unknown = (await agents.supervisor.post(`/api/revisions/${revision.id}/return`).set('If-Match', match(revision)).send({ comment: 'State the preheat.' }).expect(200)).body
    expect(body).toMatchObject({ state: 'draft', signatures: [{ meaning: 'authored' }, { meaning: 'returned', reason: 'State the preheat.', role: 'supervisor' }] })
    const today = (await agents.engineer.get('/api/today').expect(200)).body as { tasks: { kind: string; title: string; detail: string }[] }
    expect(today.tasks).toContainEqual(expect.objectContaining({ kind: 'returned', title: `${revision.number} A`, detail: 'Test Supervisor: State the preheat.' }))
    const said = problem(await agents.supervisor.post(`/api/revisions/${revision.id}/return`).set('If-Match', '"3"').send({ comment: ' ' }).expect(400))
    expect(said.detail).toContain('Say what should change.')
  })
})

describe('approval', () => {
  it('signs in exact words over exactly this content, and freezes it', async () => {
    const coupon = await certified(agents)
    const revision = await submitted(agents, procedureContent({ supportingCoupons: [coupon.id] }))
    const done = (await approve(revision, { password: PASSWORD, deviationReason: 'Accepted for the test.' }).expect(200)).body as Revision
    expect(done).toMatchObject({ state: 'approved', contentSha256: revision.contentSha256, content: revision.content })
    const signature = done.signatures.at(-1)
    expect(signature).toMatchObject({ meaning: 'approved', role: 'supervisor', contentSha256: revision.contentSha256, person: { id: organization.people.supervisor.id, name: 'Test Supervisor' } })
    const { assessments } = (await agents.supervisor.get(`/api/revisions/${revision.id}/assessment`).expect(200)).body as { assessments: { verdict: string; findings: { verdict: string; class: string }[] }[] }
    const deviations = assessments.filter(({ verdict }) => verdict !== 'within').flatMap(({ findings }) => findings.filter((finding) => finding.verdict !== 'within' && (finding.class === 'essential' || finding.class === 'supplementary'))).length
    expect(signature?.statement).toBe(statementOf({ meaning: 'approved', record: `${revision.number} revision A`, name: 'Test Supervisor', role: 'supervisor', deviations }))
    await agents.engineer.put(`/api/revisions/${revision.id}`).set('If-Match', match(done)).send({ content: procedureContent() }).expect(409)
    await agents.engineer.delete(`/api/revisions/${revision.id}`).set('If-Match', match(done)).expect(409)
    await approve(done).expect(409)
  })

  it('is not for whoever wrote on it, author or not', async () => {
    const own = (await both.post('/api/procedures').send({ content: procedureContent() }).expect(201)).body as Revision
    const inReview = (await both.post(`/api/revisions/${own.id}/submission`).set('If-Match', match(own)).expect(200)).body as Revision
    expect(inReview.may).toEqual(['return'])
    const said = problem(await approve(inReview, undefined, both).expect(403))
    expect(said.detail).toContain('somebody else has to approve it')
    const helped = await draft(agents)
    const saved = (await both.put(`/api/revisions/${helped.id}`).set('If-Match', match(helped)).send({ content: procedureContent({ title: 'Helped' }) }).expect(200)).body as Revision
    const submittedOne = (await agents.engineer.post(`/api/revisions/${helped.id}/submission`).set('If-Match', match(saved)).expect(200)).body as Revision
    expect((await read(helped.id, both)).may).not.toContain('approve')
    await approve(submittedOne, undefined, both).expect(403)
    await approve(submittedOne).expect(200)
  })

  it('asks for a reason where findings are outside or cannot be told, naming them', async () => {
    const coupon = await certified(agents)
    const revision = await submitted(agents, procedureContent({ supportingCoupons: [coupon.id], thickness: [5, 25] }))
    const said = problem(await approve(revision, { password: PASSWORD }).expect(422))
    expect(said.title).toBe('A reason is needed')
    expect(said.errors?.some(({ field, message }) => field.startsWith('content.variables.') && message.includes('25'))).toBe(true)
    expect((await read(revision.id)).state).toBe('in-review')
    const done = (await approve(revision, { password: PASSWORD, deviationReason: 'Customer accepts 25 mm, letter of 3 March.' }).expect(200)).body as Revision
    expect(done.deviationReason).toBe('Customer accepts 25 mm, letter of 3 March.')
    expect(done.signatures.at(-1)?.statement).toMatch(/accepting \d+ findings? for the reason/)
  })

  it('counts a coupon that is not certified as a finding', async () => {
    const coupon = await openCoupon(agents)
    const revision = await submitted(agents, procedureContent({ supportingCoupons: [coupon.id] }))
    const said = problem(await approve(revision, { password: PASSWORD }).expect(422))
    expect(said.errors).toContainEqual(expect.objectContaining({ field: 'content.supportingCoupons', message: expect.stringContaining(`${coupon.number} isn't certified yet`) as string }))
  })

  it('does not happen with a wrong password', async () => {
    const revision = await submitted(agents)
    const said = problem(await approve(revision, { password: 'wrong', deviationReason: 'x' }).expect(422))
    expect(said.errors?.[0]?.field).toBe('password')
    expect(await read(revision.id)).toMatchObject({ state: 'in-review', version: 2 })
  })

  it('happens once when two supervisors sign at the same moment', async () => {
    const revision = await submitted(agents)
    const answers = await Promise.all([approve(revision), approve(revision, undefined, both)])
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
    expect((await read(revision.id)).signatures.filter(({ meaning }) => meaning === 'approved')).toHaveLength(1)
  })

  it('supersedes the revision approved before, in the same act', async () => {
    const first = await approved(agents)
    const next = (await agents.engineer.post(`/api/procedures/${first.procedureId}/revisions`).expect(201)).body as Revision
    const saved = (await agents.engineer.put(`/api/revisions/${next.id}`).set('If-Match', match(next)).send({ content: procedureContent({ title: 'Second' }) }).expect(200)).body as Revision
    const inReview = (await agents.engineer.post(`/api/revisions/${next.id}/submission`).set('If-Match', match(saved)).expect(200)).body as Revision
    expect((await read(first.id)).state).toBe('approved')
    await approve(inReview).expect(200)
    expect((await read(first.id)).state).toBe('superseded')
    expect((await read(next.id)).state).toBe('approved')
  })

  it('is withdrawn by signature with the reason', async () => {
    const revision = await approved(agents)
    const address = `/api/revisions/${revision.id}/withdrawal`
    await agents.supervisor.post(address).set('If-Match', match(revision)).send({ password: PASSWORD, reason: '' }).expect(400)
    const body: unknown = (await agents.supervisor.post(address).set('If-Match', match(revision)).send({ password: PASSWORD, reason: 'Filler no longer bought.' }).expect(200)).body
    expect(body).toMatchObject({ state: 'withdrawn' })
    expect((body as Revision).signatures.at(-1)).toMatchObject({ meaning: 'withdrawn', reason: 'Filler no longer bought.' })
  })
})

describe('the database itself', () => {
  it.each<[string, string]>([
    ['content', `update procedure_revisions set content = jsonb_set(content, '{title}', '"forged"') where id = $1`],
    ['number', `update procedure_revisions set number = 'WPS-999' where id = $1`],
    ['author', `update procedure_revisions set author_id = (select id from people where organization_id = procedure_revisions.organization_id and id <> author_id limit 1) where id = $1`],
    ['state back to draft', `update procedure_revisions set state = 'draft' where id = $1`],
    ['the reason of its approval', `update procedure_revisions set deviation_reason = 'another' where id = $1`],
    ['existence', 'delete from procedure_revisions where id = $1'],
    ['its signatures', `update signatures set statement = 'forged' where revision_id = $1`],
    ['that it was signed', 'delete from signatures where revision_id = $1'],
    ['supporting coupons', 'delete from revision_coupons where revision_id = $1'],
  ])('refuses to change the %s of an approved revision, to its owner too', async (_what, sql) => {
    const coupon = await certified(agents)
    const revision = await approved(agents, procedureContent({ supportingCoupons: [coupon.id] }))
    await expect(app.services.database.owner.query(sql, [revision.id])).rejects.toMatchObject({ code: 'SB001' })
    const refused = app.inTenant(organization, ({ transaction }) => app.services.database.sequelize.query(sql, { bind: [revision.id], transaction }))
    await expect(refused).rejects.toThrow(sql.includes('signatures') ? /permission denied|only added/ : /revision/i)
    expect(await read(revision.id)).toMatchObject({ state: 'approved', content: revision.content, signatures: revision.signatures })
  })

  it('refuses a revision or coupon that starts out released', async () => {
    const revision = await draft(agents)
    await expect(app.services.database.owner.query(`update procedure_revisions set state = 'approved' where id = $1`, [revision.id])).rejects.toMatchObject({ code: 'SB001' })
    const coupon = await certified(agents)
    await expect(app.services.database.owner.query(`update coupons set content = '{}' where id = $1`, [coupon.id])).rejects.toMatchObject({ code: 'SB001' })
    await expect(app.services.database.owner.query('delete from coupons where id = $1', [coupon.id])).rejects.toMatchObject({ code: 'SB001' })
  })

  it('refuses a link into another organization', async () => {
    const others = await app.makeOrganization()
    const coupon = await openCoupon(await signInAll(app, others))
    const revision = await draft(agents)
    await expect(app.services.database.owner.query('insert into revision_coupons (organization_id, revision_id, coupon_id, ordinal) values ($1, $2, $3, 1)', [organization.id, revision.id, coupon.id])).rejects.toMatchObject({ code: '23503' })
  })
})
