import { execFile } from 'node:child_process'
import { createHash } from 'node:crypto'
import { mkdtemp, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { promisify } from 'node:util'
import sharp from 'sharp'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Coupon, OutboxRow, Revision } from '../../shared/schemas/records.ts'
import { approved, certified, draft, match, openCoupon, procedureContent, signInAll, type Agents } from './content.ts'
import { PASSWORD, problem, startApp, type Agent, type TestApp } from './harness.ts'

const run = promisify(execFile)
const sha256 = (bytes: Buffer): string => createHash('sha256').update(bytes).digest('hex')

let app: TestApp
let agents: Agents
let folder: string
beforeAll(async () => {
  app = await startApp()
  agents = await signInAll(app, await app.makeOrganization())
  folder = await mkdtemp(path.join(tmpdir(), 'documents-'))
})
afterAll(async () => {
  await app.close()
  await rm(folder, { recursive: true })
})

const print = async (address: string, query: object = {}, agent: Agent = agents.welder) => {
  const answer = await agent.get(`/api/${address}/document`).query(query).buffer(true).expect(200)
  return { bytes: answer.body as Buffer, headers: answer.headers as Record<string, string> }
}

/** What an outside verifier says of the file. */
async function verified(bytes: Buffer): Promise<string> {
  const file = path.join(folder, `${sha256(bytes).slice(0, 12)}.pdf`)
  await writeFile(file, bytes)
  // pdfsig ends with 1 where it does not know the issuer, as with any certificate of a firm's own.
  return run('pdfsig', [file]).then(({ stdout }) => stdout, (error: { stdout: string }) => error.stdout)
}

const textOf = async (bytes: Buffer): Promise<string> => {
  const file = path.join(folder, `${sha256(bytes).slice(0, 12)}.pdf`)
  await writeFile(file, bytes)
  return (await run('pdftotext', ['-layout', file, '-'])).stdout
}

describe('the procedure on paper', () => {
  it('carries no signature while it is a draft', async () => {
    const revision = await draft(agents)
    const { bytes, headers } = await print(`revisions/${revision.id}`)
    expect(headers['content-type']).toBe('application/pdf')
    expect(headers['content-disposition']).toContain(`filename="${revision.number} A draft.pdf"`)
    expect(await verified(bytes)).toMatch(/does not contain any signatures/i)
    expect(await textOf(bytes)).toContain('draft')
  })

  it('is signed once approved, valid to an outside verifier, and the same bytes ever after', async () => {
    const coupon = await certified(agents)
    const revision = await approved(agents, procedureContent({ supportingCoupons: [coupon.id] }))
    const [first, again] = [await print(`revisions/${revision.id}`), await print(`revisions/${revision.id}`, {}, agents.auditor)]
    const says = await verified(first.bytes)
    expect(says).toContain('Signature is Valid')
    expect(says).toContain('Total document signed')
    expect(sha256(again.bytes)).toBe(sha256(first.bytes))
    expect(first.headers.etag).toBe(`"${sha256(first.bytes)}"`)
    const text = await textOf(first.bytes)
    for (const part of [revision.number, coupon.number, 'Test Supervisor', 'approved']) expect(text).toContain(part)
    const flipped = Buffer.from(first.bytes)
    flipped[400] = (flipped[400] ?? 0) ^ 1
    expect(await verified(flipped)).toContain('Digest Mismatch')
  })

  it('is one document however many ask for it first at the same moment', async () => {
    const revision = await approved(agents)
    const prints = await Promise.all(Array.from({ length: 4 }, () => print(`revisions/${revision.id}`)))
    expect(new Set(prints.map(({ bytes }) => sha256(bytes))).size).toBe(1)
  })

  it('is its own document in each paper and unit, and says that it was superseded', async () => {
    const revision = await approved(agents)
    const a4 = await print(`revisions/${revision.id}`)
    const letter = await print(`revisions/${revision.id}`, { paper: 'Letter', units: 'US' })
    expect(sha256(letter.bytes)).not.toBe(sha256(a4.bytes))
    expect(await verified(letter.bytes)).toContain('Signature is Valid')
    expect(problem(await agents.welder.get(`/api/revisions/${revision.id}/document`).query({ paper: 'A3' }).expect(400)).errors?.[0]?.field).toBe('paper')
    const next = (await agents.engineer.post(`/api/procedures/${revision.procedureId}/revisions`).expect(201)).body as Revision
    const inReview = (await agents.engineer.post(`/api/revisions/${next.id}/submission`).set('If-Match', match(next)).expect(200)).body as Revision
    await agents.supervisor.post(`/api/revisions/${next.id}/approval`).set('If-Match', match(inReview)).send({ password: PASSWORD, deviationReason: 'Same text.' }).expect(200)
    const old = await print(`revisions/${revision.id}`)
    expect(await textOf(old.bytes)).toContain('superseded')
    expect(sha256(old.bytes)).not.toBe(sha256(a4.bytes))
  })

  it('cannot be changed or removed on record', async () => {
    const revision = await approved(agents)
    await print(`revisions/${revision.id}`)
    for (const sql of ["update documents set sha256 = 'x' where revision_id = $1", 'delete from documents where revision_id = $1']) {
      await expect(app.services.database.owner.query(sql, [revision.id])).rejects.toMatchObject({ code: 'SB001' })
    }
  })
})

describe('the qualification record on paper', () => {
  it('is signed once certified, with the coupon’s photos', async () => {
    const open = await openCoupon(agents)
    const picture = await sharp({ create: { width: 300, height: 200, channels: 3, background: '#888' } }).jpeg().toBuffer()
    await agents.inspector.post(`/api/coupons/${open.id}/photos`).attach('files', picture, 'face.jpg').expect(201)
    expect(await verified((await print(`coupons/${open.id}`)).bytes)).toMatch(/does not contain any signatures/i)
    const coupon = (await agents.inspector.post(`/api/coupons/${open.id}/certification`).set('If-Match', match(open)).send({ password: PASSWORD }).expect(200)).body as Coupon
    const { bytes } = await print(`coupons/${coupon.id}`)
    expect(await verified(bytes)).toContain('Signature is Valid')
    expect(await textOf(bytes)).toContain(sha256(picture).slice(0, 8))
  })
})

describe('e-mail', () => {
  it('sends the stored document itself, to everybody named', async () => {
    const revision = await approved(agents, procedureContent({ title: 'Sent to the client' }))
    const answer = await agents.engineer.post(`/api/revisions/${revision.id}/mails`).send({ to: ['client@larkfield.example', 'shop@larkfield.example'], message: 'As agreed.' }).expect(202)
    await app.drain()
    const mail = (await agents.administrator.get(`/api/outbox/${(answer.body as OutboxRow).id}`).expect(200)).body as OutboxRow & { text: string }
    expect(mail).toMatchObject({ state: 'caught', to: ['client@larkfield.example', 'shop@larkfield.example'], subject: `${revision.number} revision A: Sent to the client` })
    const attached = (await agents.administrator.get(`/api/outbox/${mail.id}/attachments/0`).buffer(true).expect(200)).body as Buffer
    const { bytes } = await print(`revisions/${revision.id}`)
    expect(sha256(attached)).toBe(sha256(bytes))
    const { rows } = await app.services.database.owner.query<{ sha256: string }>('select sha256 from documents where revision_id = $1', [revision.id])
    expect(rows).toEqual([{ sha256: sha256(attached) }])
    expect(mail.text).toContain(sha256(attached))
    expect(await verified(attached)).toContain('Signature is Valid')
  })

  it('sends certified records likewise, and nothing that is not released', async () => {
    const coupon = await certified(agents)
    await agents.inspector.post(`/api/coupons/${coupon.id}/mails`).send({ to: ['client@larkfield.example'] }).expect(202)
    const open = await openCoupon(agents)
    expect(problem(await agents.inspector.post(`/api/coupons/${open.id}/mails`).send({ to: ['client@larkfield.example'] }).expect(409)).detail).toContain('only a certified record is sent out')
    const revision = await draft(agents)
    expect(problem(await agents.engineer.post(`/api/revisions/${revision.id}/mails`).send({ to: ['client@larkfield.example'] }).expect(409)).detail).toContain('only an approved revision is sent out')
    const said = problem(await agents.engineer.post(`/api/revisions/${revision.id}/mails`).send({ to: ['nobody'] }).expect(400))
    expect(said.errors?.[0]).toMatchObject({ field: 'to.0', message: 'Write an e-mail address like name@example.com.' })
  })

  it('answers 404 across organizations', async () => {
    const others = await signInAll(app, await app.makeOrganization())
    const [coupon, revision] = [await certified(agents), await approved(agents)]
    await others.engineer.post(`/api/revisions/${revision.id}/mails`).send({ to: ['client@larkfield.example'] }).expect(404)
    await others.inspector.post(`/api/coupons/${coupon.id}/mails`).send({ to: ['client@larkfield.example'] }).expect(404)
    await others.inspector.get(`/api/coupons/${coupon.id}/document`).expect(404)
    await others.inspector.get(`/api/coupons/${coupon.id}/qualification`).expect(404)
  })
})
