import { connect } from 'node:net'
import type { AddressInfo } from 'node:net'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { PASSWORD, problem, startApp, type Agent, type TestApp, type TestOrganization } from './harness.ts'

let app: TestApp
let works: TestOrganization
let agent: Agent
beforeAll(async () => {
  app = await startApp()
  works = await app.makeOrganization()
  agent = await app.agentFor(works, 'administrator')
})
afterAll(() => app.close())

describe('requests from other sites', () => {
  const host = () => `127.0.0.1:${(app.server.address() as AddressInfo).port}`
  const cases: [string, () => Record<string, string>, boolean][] = [
    ['a program that is no browser', () => ({}), true],
    ['our own page', () => ({ 'Sec-Fetch-Site': 'same-origin', Origin: `http://${host()}` }), true],
    ['our own page in a browser without Sec-Fetch-Site', () => ({ Origin: `http://${host()}` }), true],
    ['another site', () => ({ 'Sec-Fetch-Site': 'cross-site', Origin: 'https://elsewhere.example' }), false],
    ['another site that a browser only names in Origin', () => ({ Origin: 'https://elsewhere.example' }), false],
    ['a sibling host of the same site', () => ({ 'Sec-Fetch-Site': 'same-site', Origin: 'https://other.larkfield.example' }), false],
    ['a page of no origin, as in a sandboxed frame', () => ({ Origin: 'null' }), false],
    ['an address typed by hand', () => ({ 'Sec-Fetch-Site': 'none' }), false],
    ['another port of this machine', () => ({ Origin: 'http://127.0.0.1:1' }), false],
  ]
  it.each(cases)('%s', async (_name, headers, allowed) => {
    const answer = await agent.patch('/api/account').set(headers()).send({ theme: 'day' })
    if (allowed) expect(answer.status).toBe(200)
    else expect(problem(answer)).toMatchObject({ status: 403, detail: expect.stringMatching(/another site/) as string })
    await agent.get('/api/session').set(headers()).expect(200)
  })

  it('sign-in is guarded too, so that nobody is signed in as somebody else', async () => {
    await app.anonymous().post('/api/session').set({ 'Sec-Fetch-Site': 'cross-site' }).send({ email: works.people.welder.email, password: PASSWORD }).expect(403)
  })

  it('takes BASE_URL as our own address behind a proxy', async () => {
    const proxied = await startApp({ env: { BASE_URL: 'https://weld.larkfield.example/' } })
    try {
      const browser = await proxied.agentFor(works, 'welder')
      await browser.patch('/api/account').set('Origin', 'https://weld.larkfield.example').send({ theme: 'day' }).expect(200)
      await browser.patch('/api/account').set('Origin', 'https://elsewhere.example').send({ theme: 'day' }).expect(403)
    } finally {
      await proxied.close()
    }
  })
})

describe('headers', () => {
  it('forbid inline scripts, foreign content and framing by others, on pages, answers and problems alike', async () => {
    for (const address of ['/', '/api/session', '/api/docs', '/api/nothing', '/healthz']) {
      const { headers } = await app.anonymous().get(address)
      const csp = String(headers['content-security-policy'])
      expect(csp, address).toContain("script-src 'self';")
      expect(csp).toContain("default-src 'self'")
      expect(csp).toContain("object-src 'none'")
      expect(csp).toContain("frame-ancestors 'self'")
      expect(csp).not.toContain('upgrade-insecure-requests')
      expect(/script-src[^;]*unsafe/.test(csp)).toBe(false)
      expect(headers['x-content-type-options']).toBe('nosniff')
      expect(headers['x-powered-by']).toBeUndefined()
      expect(headers['strict-transport-security']).toBeUndefined()
    }
  })

  it('ask for TLS only where the product is served over it', async () => {
    const secure = await startApp({ env: { BASE_URL: 'https://weld.larkfield.example', NODE_ENV: 'production' } })
    try {
      const { headers } = await secure.anonymous().get('/api/session')
      expect(headers['strict-transport-security']).toMatch(/max-age=\d{7,}/)
      expect(headers['content-security-policy']).toContain('upgrade-insecure-requests')
    } finally {
      await secure.close()
    }
  })

  it('keep answers of the API out of caches', async () => {
    expect((await agent.get('/api/people').expect(200)).headers['cache-control']).toBe('no-store')
  })

  it('carry a request id: the caller’s own when it is plain, else a new one, also in the problem', async () => {
    const given = await agent.get('/api/nothing').set('X-Request-Id', 'proxy-1234.abcd').expect(404)
    expect(given.headers['x-request-id']).toBe('proxy-1234.abcd')
    expect(problem(given).requestId).toBe('proxy-1234.abcd')
    const made = await agent.get('/api/nothing').set('X-Request-Id', 'bad id "quoted"').expect(404)
    expect(made.headers['x-request-id']).toMatch(/^[0-9a-f-]{36}$/)
  })
})

describe('malformed requests', () => {
  const send = (body: string, type = 'application/json') => agent.patch('/api/account').set('Content-Type', type).send(body)

  it('that are no JSON', async () => {
    for (const body of ['{"name":', 'name=x', '"text"', '{"name":"x"}}', '[1,', '\u0000']) expect(problem(await send(body)).status, body).toBe(400)
  })
  it('that are too large', async () => {
    expect(problem(await send(JSON.stringify({ name: 'x'.repeat(1_100_000) }))).status).toBe(413)
  })
  it('of another content type', async () => {
    for (const type of ['text/plain', 'application/x-www-form-urlencoded', 'multipart/form-data; boundary=x', 'application/xml']) expect(problem(await send('{"name":"x"}', type)).status, type).toBe(415)
  })
  it('in an encoding or character set that is not read here', async () => {
    expect(problem(await send('{}', 'application/json; charset=latin1')).status).toBe(415)
    expect(problem(await agent.patch('/api/account').set({ 'Content-Type': 'application/json', 'Content-Encoding': 'zz' }).send('{}')).status).toBe(415)
    expect(problem(await agent.patch('/api/account').set({ 'Content-Type': 'application/json', 'Content-Encoding': 'gzip' }).send('{}')).status).toBe(400)
  })
  it('with NUL characters in body, key, query or path; a written backslash-u is only text', async () => {
    expect(problem(await agent.patch('/api/account').send({ name: 'a\0b' })).detail).toMatch(/NUL/)
    expect(problem(await agent.patch('/api/account').send({ 'na\0me': 'b' })).detail).toMatch(/NUL/)
    expect(problem(await agent.get('/api/people?q=a%00b')).status).toBe(400)
    expect(problem(await agent.get('/api/library/base-metals/%00')).status).toBe(400)
    await agent.patch('/api/account').send({ name: 'Test \\u0000 Administrator' }).expect(200)
  })
  it('with a lone surrogate, a broken % sequence, repeated or unknown query fields', async () => {
    expect((await agent.patch('/api/account').set('Content-Type', 'application/json').send('{"name":"\\ud800"}')).status).toBeLessThan(500)
    expect(problem(await agent.get('/api/people/%E0%A4%A')).status).toBe(400)
    expect(problem(await agent.get('/api/people?limit=1&limit=2')).errors?.[0]?.field).toBe('limit')
    expect((await agent.get('/api/people?q=%E0%A4%A')).status).toBeLessThan(500)
  })
  it('name field, value and what would be right', async () => {
    const refused = problem(await agent.post('/api/people').send({ name: '', email: 'not-an-address', roles: ['boss'] }).expect(400))
    expect(refused.errors?.map(({ field }) => field)).toEqual(['name', 'email', 'roles.0'])
    expect(refused.detail).toMatch(/name.*Write the name/)
    expect(refused.errors?.[1]).toMatchObject({ value: '"not-an-address"', message: expect.stringMatching(/name@example.com/) as string })
  })
  it('with a bad id or method answer 4xx', async () => {
    expect(problem(await agent.get('/api/people/17').expect(400)).errors?.[0]?.field).toBe('id')
    expect(problem(await agent.post('/api/organization').send({}).expect(404)).title).toBe('Not found')
  })
  it('that are not even HTTP do not end the server', async () => {
    const { port } = app.server.address() as AddressInfo
    await new Promise<void>((resolve) => {
      const socket = connect(port, '127.0.0.1', () => socket.end('NONSENSE\r\n\r\n'))
      socket.on('close', () => resolve()).on('error', () => resolve()).resume()
    })
    await agent.get('/api/session').expect(200)
  })
})

describe('the log', () => {
  it('has the request with its id, and neither passwords, cookies nor links’ secrets', async () => {
    const browser = app.anonymous()
    const secret = 'penetrant under black light'
    const signedIn = await browser.post('/api/session').set('X-Request-Id', 'log-test-0001').send({ email: works.people.welder.email, password: PASSWORD }).expect(200)
    await browser.put('/api/account/password').set('Authorization', 'Bearer hidden-bearer').send({ currentPassword: PASSWORD, newPassword: secret }).expect(204)
    await browser.put(`/api/password-resets/${'t'.repeat(43)}`).send({ password: secret }).expect(410)
    await browser.get(`/api/invitations/${'u'.repeat(43)}`).expect(410)
    await browser.get(`/reset-password/${'v'.repeat(43)}`)
    await browser.get(`/invitation/${'v'.repeat(43)}?from=mail`)
    const log = app.logs.join('')
    const cookie = String(signedIn.headers['set-cookie']).split(';')[0]?.split('=')[1] ?? ''
    expect(cookie.length).toBeGreaterThan(20)
    for (const hidden of [PASSWORD, secret, cookie, decodeURIComponent(cookie), 'hidden-bearer', 't'.repeat(43), 'u'.repeat(43), 'v'.repeat(43)]) expect(log).not.toContain(hidden)
    expect(log).toContain('log-test-0001')
    expect(log).toContain('/api/password-resets/[hidden]')
    expect(log).toContain('/invitation/[hidden]?from=mail')
  })

  it('redacts secrets that somebody logs by mistake', () => {
    app.services.log.info({ body: { password: 'slip-1' }, token: 'slip-2', req: { headers: { cookie: 'slip-3' } } }, 'a slip')
    expect(app.logs.join('')).not.toMatch(/slip-\d/)
  })
})
