import { randomUUID } from 'node:crypto'
import type { AddressInfo } from 'node:net'
import { simpleParser, type ParsedMail } from 'mailparser'
import { SMTPServer } from 'smtp-server'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Page } from '../../shared/schemas/common.ts'
import type { OutboxRow } from '../../shared/schemas/records.ts'
import { sendMailJob } from '../../server/jobs/send-mail.ts'
import { queueMail, type NewMail } from '../../server/services/mails.ts'
import { problem, startApp, type Agent, type TestApp, type TestOrganization } from './harness.ts'

const pdf = Buffer.from('%PDF-1.7 a small one')
const newMail = (more: Partial<NewMail> = {}): NewMail => ({ to: ['buyer@larkfield.example', 'site@larkfield.example'], subject: `WPS-001 ${randomUUID()}`, text: 'Attached.', attachments: [{ name: 'WPS-001 – rev. B.pdf', mediaType: 'application/pdf', bytes: pdf }], ...more })
const send = (app: TestApp, works: TestOrganization, more?: Partial<NewMail>) => app.inTenant(works, async (tenant) => (await queueMail(app.services, tenant, newMail(more))).id)
const rowOf = async (agent: Agent, id: string) => (await agent.get(`/api/outbox/${id}`).expect(200)).body as OutboxRow & { text: string }

describe('without a mail server', () => {
  let app: TestApp
  let works: TestOrganization
  let agent: Agent
  beforeAll(async () => {
    app = await startApp()
    works = await app.makeOrganization()
    agent = await app.agentFor(works, 'inspector')
  })
  afterAll(() => app.close())

  it('mail is caught and can be read with its attachment, byte for byte', async () => {
    const id = await send(app, works)
    expect(await rowOf(agent, id)).toMatchObject({ state: 'queued', attempts: 0, sentAt: null })
    await app.drain()
    expect(await rowOf(agent, id)).toMatchObject({ state: 'caught', attempts: 1, to: ['buyer@larkfield.example', 'site@larkfield.example'], text: 'Attached.', attachments: [{ name: 'WPS-001 – rev. B.pdf', bytes: pdf.length }] })
    const file = await agent.get(`/api/outbox/${id}/attachments/0`).buffer(true).parse((res, done) => {
      const parts: Buffer[] = []
      res.on('data', (part: Buffer) => parts.push(part)).on('end', () => done(null, Buffer.concat(parts)))
    }).expect(200)
    expect(file.body).toEqual(pdf)
    expect(file.headers['content-type']).toBe('application/pdf')
    expect(file.headers['content-disposition']).toContain("filename*=UTF-8''WPS-001%20%E2%80%93%20rev.%20B.pdf")
    problem(await agent.get(`/api/outbox/${id}/attachments/1`).expect(404))
    expect((await agent.get('/api/session').expect(200)).body).toMatchObject({ mailIsCaught: true })
  })

  it('the list shows the newest first, page by page, and finds by recipient', async () => {
    const own = await app.makeOrganization()
    const reader = await app.agentFor(own, 'engineer')
    const ids: string[] = []
    for (let i = 0; i < 5; i += 1) ids.push(await send(app, own, { to: [`yard${i}@larkfield.example`] }))
    const first = (await reader.get('/api/outbox').query({ limit: 3 }).expect(200)).body as Page<OutboxRow>
    const second = (await reader.get('/api/outbox').query({ limit: 3, cursor: first.next }).expect(200)).body as Page<OutboxRow>
    expect([...first.items, ...second.items].map(({ id }) => id).sort()).toEqual([...ids].sort())
    expect(first.total).toBe(5)
    expect(second.next).toBeNull()
    const times = [...first.items, ...second.items].map(({ createdAt }) => createdAt)
    expect(times).toEqual([...times].sort().reverse())
    expect(((await reader.get('/api/outbox').query({ q: 'YARD3@' }).expect(200)).body as Page<OutboxRow>).items.map(({ id }) => id)).toEqual([ids[3]])
  })

  it('a mail of a transaction that is rolled back is neither kept nor sent', async () => {
    const subject = `never ${randomUUID()}`
    await expect(app.inTenant(works, async (tenant) => {
      await queueMail(app.services, tenant, newMail({ subject }))
      throw new Error('changed my mind')
    })).rejects.toThrow('changed my mind')
    await app.drain()
    const { rows } = await app.services.database.owner.query('select 1 from outbox_mails where subject = $1', [subject])
    expect(rows).toEqual([])
  })

  it('mail with a private link is for administrators only', async () => {
    const id = await send(app, works, { text: 'Here: {link}', link: 'http://127.0.0.1/reset/secret-secret', attachments: [] })
    await app.drain()
    const administrator = await app.agentFor(works, 'administrator')
    expect((await rowOf(administrator, id)).text).toBe('Here: http://127.0.0.1/reset/secret-secret')
    problem(await agent.get(`/api/outbox/${id}`).expect(404))
    const list = (await agent.get('/api/outbox').query({ limit: 200 }).expect(200)).body as Page<OutboxRow>
    expect(list.items.map((row) => row.id)).not.toContain(id)
  })
})

describe('with a mail server', () => {
  const received: ParsedMail[] = []
  let refusals = 0
  let smtp: SMTPServer
  let app: TestApp
  let works: TestOrganization
  let agent: Agent
  beforeAll(async () => {
    smtp = new SMTPServer({
      authOptional: true,
      disabledCommands: ['STARTTLS', 'AUTH'],
      onData: (stream, _session, done) => {
        simpleParser(stream).then((mail) => {
          if (refusals > 0) {
            refusals -= 1
            done(new Error('busy, try later'))
            return
          }
          received.push(mail)
          done()
        }, done)
      },
    })
    await new Promise<void>((resolve) => smtp.listen(0, '127.0.0.1', resolve))
    app = await startApp({ env: { SMTP_URL: `smtp://127.0.0.1:${(smtp.server.address() as AddressInfo).port}` } })
    works = await app.makeOrganization()
    agent = await app.agentFor(works, 'administrator')
  })
  afterAll(async () => {
    await app.close()
    await new Promise<void>((resolve) => smtp.close(() => resolve()))
  })

  it('delivers text and attachment to every recipient', async () => {
    const id = await send(app, works)
    await app.drain()
    const row = await rowOf(agent, id)
    expect(row).toMatchObject({ state: 'sent', attempts: 1, error: null })
    const mail = received.find(({ subject }) => subject === row.subject)
    expect(mail?.text?.trim()).toBe('Attached.')
    expect(mail?.attachments[0]).toMatchObject({ filename: 'WPS-001 – rev. B.pdf', contentType: 'application/pdf', content: pdf })
    expect(JSON.stringify(mail?.to)).toMatch(/buyer@.*site@/)
    expect((await agent.get('/api/session').expect(200)).body).toMatchObject({ mailIsCaught: false })
  })

  it('tries again after a failure, and sends once even when the job comes twice', async () => {
    refusals = 2
    const id = await send(app, works)
    await app.services.queue.send(sendMailJob, { organizationId: works.id, mailId: id })
    await app.drain()
    const row = await rowOf(agent, id)
    expect(row.state).toBe('sent')
    expect(row.attempts).toBeGreaterThan(1)
    expect(received.filter(({ subject }) => subject === row.subject)).toHaveLength(1)
  })

  it('says failed, and why, once it has given up', async () => {
    refusals = 1000
    const id = await send(app, works)
    await app.drain()
    refusals = 0
    expect(await rowOf(agent, id)).toMatchObject({ state: 'failed', attempts: 6, error: expect.stringMatching(/busy/) as string, sentAt: null })
  })

  it('forgets a private link once it has gone out', async () => {
    const id = await send(app, works, { text: 'Here: {link}', link: 'https://larkfield.example/reset/gone-with-the-mail', attachments: [] })
    await app.drain()
    const row = await rowOf(agent, id)
    expect(received.find(({ subject }) => subject === row.subject)?.text).toContain('gone-with-the-mail')
    expect(row.text).not.toContain('gone-with-the-mail')
    const { rows } = await app.services.database.owner.query<{ link: string | null }>('select link from outbox_mails where id = $1', [id])
    expect(rows[0]?.link).toBeNull()
  })

  it('works in the background, as in production', async () => {
    await app.services.queue.work(app.services)
    const id = await send(app, works)
    await expect.poll(async () => (await rowOf(agent, id)).state, { timeout: 10_000 }).toBe('sent')
  })
})
