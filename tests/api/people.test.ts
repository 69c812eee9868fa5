import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Page } from '../../shared/schemas/common.ts'
import type { Person } from '../../shared/schemas/people.ts'
import { caughtMail, PASSWORD, problem, startApp, tokenIn, type Agent, type TestApp, type TestOrganization } from './harness.ts'

let app: TestApp
let works: TestOrganization
let administrator: Agent
beforeAll(async () => {
  app = await startApp()
  works = await app.makeOrganization()
  administrator = await app.agentFor(works, 'administrator')
})
afterAll(() => app.close())

let count = 0
const freshEmail = () => `person.${works.id.slice(0, 8)}.${(count += 1)}@larkfield.example`
const invite = (email: string, agent = administrator) => agent.post('/api/people').send({ name: 'Robin Vale', email, roles: ['welder', 'inspector'] })
const read = async (id: string) => (await administrator.get(`/api/people/${id}`).expect(200)).body as Person
const change = (person: Pick<Person, 'id' | 'version'>, body: object, agent = administrator) => agent.patch(`/api/people/${person.id}`).set('If-Match', `"${person.version}"`).send(body)

describe('invitations', () => {
  it('are mailed, show whose they are, work once and let the person in', async () => {
    const email = freshEmail()
    const invited = (await invite(email).expect(201)).body as Person
    expect(invited).toMatchObject({ state: 'invited', active: false, roles: ['welder', 'inspector'], email })
    await app.drain()
    const mail = await caughtMail(administrator, email)
    expect(mail.subject).toContain(works.name)
    const token = tokenIn(mail.text)
    const shown = await app.anonymous().get(`/api/invitations/${token}`).expect(200)
    expect(shown.body).toEqual({ name: 'Robin Vale', email, organization: works.name })
    await app.anonymous().post('/api/session').send({ email, password: PASSWORD }).expect(401)
    await app.anonymous().put(`/api/invitations/${token}`).send({ password: 'short' }).expect(400)
    await app.anonymous().put(`/api/invitations/${token}`).send({ password: PASSWORD }).expect(204)
    await app.anonymous().put(`/api/invitations/${token}`).send({ password: PASSWORD }).expect(410)
    await app.anonymous().post('/api/session').send({ email, password: PASSWORD }).expect(200)
    expect(await read(invited.id)).toMatchObject({ state: 'active', active: true, version: 2 })
  })

  it('can be sent again, which ends the earlier link, until they are accepted', async () => {
    const email = freshEmail()
    const invited = (await invite(email).expect(201)).body as Person
    await app.drain()
    const first = tokenIn((await caughtMail(administrator, email)).text)
    await administrator.post(`/api/people/${invited.id}/invitations`).expect(202)
    await app.drain()
    const second = tokenIn((await caughtMail(administrator, email)).text)
    await app.anonymous().get(`/api/invitations/${first}`).expect(410)
    await app.anonymous().put(`/api/invitations/${second}`).send({ password: PASSWORD }).expect(204)
    expect(problem(await administrator.post(`/api/people/${invited.id}/invitations`).expect(422)).detail).toMatch(/accepted/)
  })

  it('end after seven days', async () => {
    const email = freshEmail()
    const invited = (await invite(email).expect(201)).body as Person
    const { rows } = await app.services.database.owner.query<{ days: number }>("select round(extract(epoch from expires_at - now()) / 86400)::int as days from person_tokens where person_id = $1", [invited.id])
    expect(rows[0]?.days).toBe(7)
  })

  it('are refused for an address that has an account, here or in another organization', async () => {
    const other = await app.makeOrganization()
    for (const email of [works.people.welder.email, other.people.welder.email.toUpperCase()]) {
      const refused = problem(await invite(email).expect(409))
      expect(refused.errors?.[0]?.field).toBe('email')
    }
  })

  it('are neither kept nor mailed when the database refuses the second of two at once', async () => {
    const email = freshEmail()
    const answers = await Promise.all([invite(email), invite(email)])
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409])
    await app.drain()
    const list = (await administrator.get('/api/outbox').query({ q: email }).expect(200)).body as Page<unknown>
    expect(list.total).toBe(1)
  })
})

describe('changing people', () => {
  it('needs the version last read, and shows the present entry when it is old', async () => {
    const person = await read(works.people.auditor.id)
    await administrator.patch(`/api/people/${person.id}`).send({ name: 'X' }).expect(428)
    await administrator.patch(`/api/people/${person.id}`).set('If-Match', 'three').send({ name: 'X' }).expect(400)
    const changed = await change(person, { name: 'Ada Auditor' }).expect(200)
    expect(changed.headers.etag).toBe(`"${person.version + 1}"`)
    const refused = problem(await change(person, { name: 'Late' }).expect(409))
    expect(refused.current).toMatchObject({ name: 'Ada Auditor', version: person.version + 1 })
  })

  it('takes access away at once, and gives it back', async () => {
    const agent = await app.agentFor(works, 'welder')
    await agent.get('/api/people').expect(200)
    const closed = (await change(await read(works.people.welder.id), { active: false }).expect(200)).body as Person
    expect(closed.state).toBe('inactive')
    await agent.get('/api/people').expect(401)
    await app.anonymous().post('/api/session').send({ email: closed.email, password: PASSWORD }).expect(401)
    await change(closed, { active: true }).expect(200)
    await agent.get('/api/people').expect(401)
    await app.agentFor(works, 'welder')
  })

  it('ends open links of a person whose access is taken away', async () => {
    const email = freshEmail()
    const invited = (await invite(email).expect(201)).body as Person
    await app.drain()
    const token = tokenIn((await caughtMail(administrator, email)).text)
    const closed = (await change(invited, { active: false }).expect(200)).body as Person
    await app.anonymous().put(`/api/invitations/${token}`).send({ password: PASSWORD }).expect(410)
    expect((await change(closed, { active: true }).expect(200)).body).toMatchObject({ state: 'invited' })
  })

  it('never leaves the organization without an administrator, not even by two who step down at once', async () => {
    const own = await app.makeOrganization()
    const agent = await app.agentFor(own, 'administrator')
    const only = (await agent.get(`/api/people/${own.people.administrator.id}`).expect(200)).body as Person
    for (const body of [{ active: false }, { roles: ['engineer'] }]) {
      expect(problem(await change(only, body, agent).expect(422)).detail).toMatch(/only active administrator/)
    }
    await change(only, { roles: ['engineer', 'administrator'] }, agent).expect(200)
    const engineer = (await agent.get(`/api/people/${own.people.engineer.id}`).expect(200)).body as Person
    const second = (await change(engineer, { roles: ['administrator'] }, agent).expect(200)).body as Person
    const answers = await Promise.all([change({ ...only, version: 2 }, { active: false }, agent), change(second, { roles: ['welder'] }, agent)])
    expect(answers.filter(({ status }) => status === 200)).toHaveLength(1)
    const { rows } = await app.services.database.owner.query<{ n: number }>("select count(*)::int as n from people where organization_id = $1 and state = 'active' and 'administrator' = any (roles)", [own.id])
    expect(rows[0]?.n).toBe(1)
  })
})

describe('lists', () => {
  it('page through everybody once, in order, and find by name, address and role', async () => {
    const own = await app.makeOrganization()
    const agent = await app.agentFor(own, 'welder')
    const seen: string[] = []
    let cursor: string | null = null
    do {
      const page: Page<Person> = (await agent.get('/api/people').query({ limit: 4, sort: '-name', ...(cursor && { cursor }) }).expect(200)).body as Page<Person>
      expect(page.total).toBe(6)
      seen.push(...page.items.map(({ name }) => name))
      cursor = page.next
    } while (cursor)
    expect(seen).toEqual(Object.values(own.people).map(({ name }) => name).sort().reverse())
    const found = (await agent.get('/api/people').query({ q: 'test WELD', role: 'welder' }).expect(200)).body as Page<Person>
    expect(found.items.map(({ id }) => id)).toEqual([own.people.welder.id])
    expect(((await agent.get('/api/people').query({ q: '%' }).expect(200)).body as Page<Person>).total).toBe(0)
    problem(await agent.get('/api/people').query({ cursor: 'bm9uc2Vuc2U' }).expect(400))
  })
})

describe('the organization', () => {
  it('is read by all and changed by its administrator with the version last read', async () => {
    const own = await app.makeOrganization()
    const agent = await app.agentFor(own, 'administrator')
    const before = await (await app.agentFor(own, 'welder')).get('/api/organization').expect(200)
    expect(before.headers.etag).toBe('"1"')
    const changed = await agent.patch('/api/organization').set('If-Match', '"1"').send({ address: 'Yard 3, Larkfield', defaultUnitSystem: 'US' }).expect(200)
    expect(changed.body).toMatchObject({ id: own.id, address: 'Yard 3, Larkfield', defaultUnitSystem: 'US', version: 2 })
    expect(problem(await agent.patch('/api/organization').set('If-Match', '"1"').send({ name: 'Late' }).expect(409)).current).toMatchObject({ version: 2 })
  })
})
