import supertest from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Session } from '../../shared/schemas/people.ts'
import { baseUrl } from '../../server/config/env.ts'
import { LIMITS } from '../../server/services/throttle.ts'
import { caughtMail, PASSWORD, problem, startApp, tokenIn, type TestApp, type TestOrganization } from './harness.ts'

let app: TestApp
let works: TestOrganization
beforeAll(async () => {
  app = await startApp()
  works = await app.makeOrganization()
})
afterAll(() => app.close())

const NEW_PASSWORD = 'preheat before you strike'
const signIn = (email: string, password: string, agent = app.anonymous()) => agent.post('/api/session').send({ email, password })
const who = async (agent: ReturnType<TestApp['anonymous']>) => (await agent.get('/api/session').expect(200)).body as Session

describe('signing in', () => {
  it('tells an unknown visitor only what is open to all', async () => {
    const session = await who(app.anonymous())
    expect(session.person).toBeNull()
    expect(session.may).toContain('session.create')
    expect(session.may).not.toContain('procedures.read')
  })

  it('gives person, organization and allowed actions, whatever the case of the e-mail address', async () => {
    const agent = app.anonymous()
    const answer = await signIn(` ${works.people.engineer.email.toUpperCase()} `, PASSWORD, agent).expect(200)
    const session = answer.body as Session
    expect(session.person).toMatchObject({ id: works.people.engineer.id, roles: ['engineer'] })
    expect(session.organization?.name).toBe(works.name)
    expect(session.may).toEqual(expect.arrayContaining(['procedures.draft', 'people.read']))
    expect(session.may).not.toContain('people.manage')
    expect(await who(agent)).toEqual(session)
  })

  it('keeps the cookie from scripts and other sites, and gives a new id at sign-in', async () => {
    const agent = app.anonymous()
    const first = await signIn(works.people.welder.email, PASSWORD, agent).expect(200)
    const cookie = String(first.headers['set-cookie'])
    expect(cookie).toMatch(/HttpOnly/)
    expect(cookie).toMatch(/SameSite=Lax/)
    const second = await signIn(works.people.welder.email, PASSWORD, agent).expect(200)
    expect(String(second.headers['set-cookie']).split(';')[0]).not.toBe(cookie.split(';')[0])
  })

  it('marks the cookie secure behind a proxy that speaks TLS', async () => {
    const answer = await signIn(works.people.welder.email, PASSWORD, app.anonymous().set('X-Forwarded-Proto', 'https')).expect(200)
    expect(String(answer.headers['set-cookie'])).toMatch(/Secure/)
  })

  it('says the same of an unknown address, a wrong password and a closed account', async () => {
    const closed = await app.makeOrganization()
    await app.services.database.owner.query("update people set state = 'inactive' where id = $1", [closed.people.welder.id])
    const answers = [
      await signIn('nobody@larkfield.example', PASSWORD).expect(401),
      await signIn(works.people.welder.email, 'not the password').expect(401),
      await signIn(closed.people.welder.email, PASSWORD).expect(401),
    ].map((answer) => problem(answer).detail)
    expect(new Set(answers).size).toBe(1)
  })

  it('signs out here', async () => {
    const agent = await app.agentFor(works, 'inspector')
    await agent.delete('/api/session').expect(204)
    expect((await who(agent)).person).toBeNull()
    await agent.get('/api/people').expect(401)
  })

  it('signs out everywhere, and only the person who asked', async () => {
    const [here, there, other] = [await app.agentFor(works, 'inspector'), await app.agentFor(works, 'inspector'), await app.agentFor(works, 'engineer')]
    await here.delete('/api/sessions').expect(204)
    await here.get('/api/people').expect(401)
    await there.get('/api/people').expect(401)
    await other.get('/api/people').expect(200)
  })

  it('reads roles afresh: a role taken away is gone at the next request', async () => {
    const own = await app.makeOrganization()
    const agent = await app.agentFor(own, 'administrator')
    await app.services.database.owner.query("update people set roles = '{welder}' where id = $1", [own.people.administrator.id])
    await agent.post('/api/people').send({ name: 'New', email: 'new@larkfield.example', roles: ['welder'] }).expect(403)
  })

  it('does not bring a session back that was ended while a request was under way', async () => {
    const agent = await app.agentFor(works, 'welder')
    const { rows } = await app.services.database.owner.query<{ sid: string; sess: object; expire: Date }>('select sid, sess, expire from session where person_id = $1 order by expire desc limit 1', [works.people.welder.id])
    await agent.delete('/api/sessions').expect(204)
    await app.services.database.owner.query('insert into session (sid, sess, expire) values ($1, $2, $3)', [rows[0]?.sid, rows[0]?.sess, rows[0]?.expire])
    const cookie = await app.agentFor(works, 'welder')
    await cookie.get('/api/people').expect(200)
    const { rows: left } = await app.services.database.owner.query<{ n: number }>("select count(*)::int as n from session where sid = $1", [rows[0]?.sid])
    expect(left[0]?.n).toBe(1)
    const { findSignedIn } = await import('../../server/services/directory.ts')
    const kept = (rows[0]?.sess as { passport: { user: { id: string; organizationId: string; sessionEpoch: number } } }).passport.user
    expect(await findSignedIn(app.services.database.owner, kept)).toBeNull()
  })
})

describe('throttling', () => {
  const [byEmail, byAddress] = LIMITS['sign-in']

  it('stops guessing at one account from many addresses, says how long to wait, and lets nobody in meanwhile', async () => {
    const own = await app.makeOrganization()
    const { email } = own.people.engineer
    for (let i = 0; i < (byEmail?.tries ?? 0); i += 1) await signIn(email, `guess ${i}`).expect(401)
    const answer = await signIn(email, PASSWORD).expect(429)
    expect(Number(answer.headers['retry-after'])).toBeGreaterThan(0)
    expect(Number(answer.headers['retry-after'])).toBeLessThanOrEqual(byEmail?.windowSeconds ?? 0)
    expect(problem(answer).detail).toMatch(/Wait \d+ minutes/)
    await signIn(own.people.welder.email, PASSWORD).expect(200)
  })

  it('counts tries made at the same moment', async () => {
    const own = await app.makeOrganization()
    const answers = await Promise.all(Array.from({ length: (byEmail?.tries ?? 0) + 6 }, (_, i) => signIn(own.people.engineer.email, `guess ${i}`)))
    expect(answers.filter(({ status }) => status === 401).length).toBeLessThanOrEqual(byEmail?.tries ?? 0)
    expect(answers.some(({ status }) => status === 429)).toBe(true)
  })

  it('stops guessing at many accounts from one address', async () => {
    await app.services.database.owner.query(
      "insert into sign_in_attempts (kind, email, address) select 'sign-in', 'guess' || n || '@larkfield.example', '198.51.100.7' from generate_series(1, $1::int) n",
      [byAddress?.tries],
    )
    await signIn(works.people.welder.email, PASSWORD, supertest.agent(app.server).set('X-Forwarded-For', '198.51.100.7')).expect(429)
    await signIn(works.people.welder.email, PASSWORD).expect(200)
  })

  it('forgets old tries, and a right password does not count', async () => {
    const own = await app.makeOrganization()
    const { email } = own.people.engineer
    await app.services.database.owner.query("insert into sign_in_attempts (kind, email, address, at) select 'sign-in', $1, 'x', now() - interval '16 minutes' from generate_series(1, 40)", [email])
    for (let i = 0; i < (byEmail?.tries ?? 0) + 2; i += 1) await signIn(email, PASSWORD).expect(200)
  })
})

describe('a forgotten password', () => {
  const askReset = (email: string) => app.anonymous().post('/api/password-resets').send({ email })

  it('answers the same for every address, and mails only those that have an account', async () => {
    const administrator = await app.agentFor(works, 'administrator')
    await askReset('nobody@larkfield.example').expect(202)
    await askReset(works.people.welder.email).expect(202)
    await app.drain()
    expect((await caughtMail(administrator, works.people.welder.email)).subject).toMatch(/new password/)
    const { rows } = await app.services.database.owner.query("select 1 from outbox_mails where 'nobody@larkfield.example' = any (recipients)")
    expect(rows).toHaveLength(0)
  })

  it('gives a link that works once, ends every session, and lets the new password in', async () => {
    const own = await app.makeOrganization()
    const { email } = own.people.engineer
    const administrator = await app.agentFor(own, 'administrator')
    const elsewhere = await app.agentFor(own, 'engineer')
    await askReset(email).expect(202)
    await app.drain()
    const token = tokenIn((await caughtMail(administrator, email)).text)
    const stored = await app.services.database.owner.query<{ hex: string }>("select encode(token_sha256, 'hex') as hex from person_tokens where person_id = $1", [own.people.engineer.id])
    expect(stored.rows).toHaveLength(1)
    expect(stored.rows[0]?.hex).not.toContain(token)
    const use = () => app.anonymous().put(`/api/password-resets/${token}`).send({ password: NEW_PASSWORD })
    const both = await Promise.all([use(), use()])
    expect(both.map(({ status }) => status).sort()).toEqual([204, 410])
    expect(problem(await use().expect(410)).detail).toMatch(/Ask for a new one/)
    await elsewhere.get('/api/people').expect(401)
    await signIn(email, PASSWORD).expect(401)
    await signIn(email, NEW_PASSWORD).expect(200)
  })

  it('points links at the address set for the product, whatever Host the request claimed', async () => {
    const own = await app.makeOrganization()
    const { email } = own.people.engineer
    await app.anonymous().post('/api/password-resets').set({ Host: 'elsewhere.example', 'X-Forwarded-Host': 'elsewhere.example' }).send({ email }).expect(202)
    await app.drain()
    const { text } = await caughtMail(await app.agentFor(own, 'administrator'), email)
    expect(text).toMatch(new RegExp(`\\n${baseUrl(app.services.env)}/reset-password/[\\w-]{43}\\n`))
    expect(text).not.toContain('elsewhere')
  })

  it('refuses a link that is too old, one that a newer has replaced, and one of another kind', async () => {
    const own = await app.makeOrganization()
    const { email } = own.people.engineer
    const administrator = await app.agentFor(own, 'administrator')
    const link = async () => {
      await askReset(email).expect(202)
      await app.drain()
      return tokenIn((await caughtMail(administrator, email)).text)
    }
    const [older, newer] = [await link(), await link()]
    await app.anonymous().put(`/api/password-resets/${older}`).send({ password: NEW_PASSWORD }).expect(410)
    await app.anonymous().get(`/api/invitations/${newer}`).expect(410)
    await app.services.database.owner.query("update person_tokens set expires_at = now() - interval '1 second' where person_id = $1", [own.people.engineer.id])
    await app.anonymous().put(`/api/password-resets/${newer}`).send({ password: NEW_PASSWORD }).expect(410)
    await app.anonymous().put(`/api/password-resets/${'x'.repeat(43)}`).send({ password: NEW_PASSWORD }).expect(410)
  })

  it('stops asking for link after link', async () => {
    const email = 'again.and.again@larkfield.example'
    for (let i = 0; i < (LIMITS.reset[0]?.tries ?? 0); i += 1) await askReset(email).expect(202)
    await askReset(email).expect(429)
  })
})

describe('the own account', () => {
  it('changes the password after the present one, keeps this browser in and ends the others', async () => {
    const own = await app.makeOrganization()
    const [here, there] = [await app.agentFor(own, 'engineer'), await app.agentFor(own, 'engineer')]
    const wrong = await here.put('/api/account/password').send({ currentPassword: 'not it at all', newPassword: NEW_PASSWORD }).expect(422)
    expect(problem(wrong).errors?.[0]?.field).toBe('currentPassword')
    await here.put('/api/account/password').send({ currentPassword: PASSWORD, newPassword: 'short' }).expect(400)
    await there.get('/api/people').expect(200)
    await here.put('/api/account/password').send({ currentPassword: PASSWORD, newPassword: NEW_PASSWORD }).expect(204)
    await here.get('/api/people').expect(200)
    await there.get('/api/people').expect(401)
    await signIn(own.people.engineer.email, NEW_PASSWORD).expect(200)
  })

  it('counts wrong passwords at a signed-in keyboard too', async () => {
    const own = await app.makeOrganization()
    const agent = await app.agentFor(own, 'engineer')
    for (let i = 0; i < (LIMITS.confirm[0]?.tries ?? 0); i += 1) await agent.put('/api/account/password').send({ currentPassword: `guess ${i}`, newPassword: NEW_PASSWORD }).expect(422)
    await agent.put('/api/account/password').send({ currentPassword: PASSWORD, newPassword: NEW_PASSWORD }).expect(429)
  })

  it('changes name, units and theme', async () => {
    const agent = await app.agentFor(works, 'auditor')
    const answer = await agent.patch('/api/account').send({ unitSystem: 'US', theme: 'night', name: 'A. Uditor' }).expect(200)
    expect((answer.body as Session).person).toMatchObject({ unitSystem: 'US', theme: 'night', name: 'A. Uditor' })
    expect((await who(agent)).person).toMatchObject({ unitSystem: 'US', theme: 'night' })
  })
})
