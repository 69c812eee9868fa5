import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Coupon, CouponRow } from '../../shared/schemas/records.ts'
import type { Page } from '../../shared/schemas/common.ts'
import { certified, couponContent, draft, match, openCoupon, signInAll, type Agents } from './content.ts'
import { PASSWORD, problem, startApp, type TestApp, type TestOrganization } from './harness.ts'

let app: TestApp
let organization: TestOrganization
let agents: Agents
beforeAll(async () => {
  app = await startApp()
  organization = await app.makeOrganization()
  agents = await signInAll(app, organization)
})
afterAll(() => app.close())

const certify = (coupon: Coupon, password = PASSWORD) => agents.inspector.post(`/api/coupons/${coupon.id}/certification`).set('If-Match', match(coupon)).send({ password })

describe('opening a coupon', () => {
  it('copies what the procedure names and leaves measured values open', async () => {
    const revision = await draft(agents)
    const body: unknown = (await agents.inspector.post('/api/coupons').send({ revisionId: revision.id }).expect(201)).body
    const coupon = body as Coupon
    expect(coupon).toMatchObject({ state: 'planned', revisionId: revision.id, procedureNumber: revision.number, inspector: { id: organization.people.inspector.id } })
    expect(coupon.content.variables.processes[0]?.filler.classification).toBe('E7018')
    expect(coupon.content.variables.thickness).toBeNull()
    expect(coupon.number).toMatch(/^PQR-\d{3}$/)
  })

  it('needs a procedure or content', async () => {
    const said = problem(await agents.inspector.post('/api/coupons').send({}).expect(422))
    expect(said.errors?.[0]).toMatchObject({ field: 'revisionId' })
  })

  it('answers 404 for a revision of another organization', async () => {
    const others = await app.makeOrganization()
    const revision = await draft(await signInAll(app, others))
    await agents.inspector.post('/api/coupons').send({ revisionId: revision.id }).expect(404)
  })

  it('numbers coupons opened at the same time one after the other', async () => {
    const opened = await Promise.all(Array.from({ length: 6 }, () => openCoupon(agents)))
    expect(new Set(opened.map(({ number }) => number)).size).toBe(6)
  })
})

describe('saving a coupon', () => {
  it('moves it by what is recorded, and back', async () => {
    const whole = couponContent()
    const bare = { ...whole, runSheet: [], tension: [], bends: [] }
    let coupon = await openCoupon(agents, bare)
    const states = [coupon.state]
    for (const content of [{ ...bare, runSheet: whole.runSheet }, whole, bare]) {
      coupon = (await agents.inspector.put(`/api/coupons/${coupon.id}`).set('If-Match', match(coupon)).send({ content }).expect(200)).body as Coupon
      states.push(coupon.state)
    }
    expect(states).toEqual(['planned', 'welding', 'testing', 'planned'])
    expect(coupon.version).toBe(4)
  })

  it('gives both versions when somebody saved first', async () => {
    const coupon = await openCoupon(agents)
    const [first, second] = ['First', 'Second'].map((title) => ({ content: couponContent({ title }) }))
    await agents.inspector.put(`/api/coupons/${coupon.id}`).set('If-Match', match(coupon)).send(first).expect(200)
    const said = problem(await agents.inspector.put(`/api/coupons/${coupon.id}`).set('If-Match', match(coupon)).send(second).expect(409))
    expect(said.current).toMatchObject({ id: coupon.id, version: 2, content: { title: 'First' }, sent: { title: 'Second' } })
    const now = (await agents.inspector.get(`/api/coupons/${coupon.id}`).expect(200)).body as Coupon
    expect(now.content.title).toBe('First')
  })

  it('asks for the version', async () => {
    const coupon = await openCoupon(agents)
    await agents.inspector.put(`/api/coupons/${coupon.id}`).send({ content: couponContent() }).expect(428)
  })

  it('names the pass whose process is not there', async () => {
    const coupon = await openCoupon(agents)
    const content = couponContent()
    const runSheet = content.runSheet.map((row) => ({ ...row, processId: 'other' }))
    const said = problem(await agents.inspector.put(`/api/coupons/${coupon.id}`).set('If-Match', match(coupon)).send({ content: { ...content, runSheet } }).expect(422))
    expect(said.errors?.[0]).toMatchObject({ field: 'content.runSheet.0.processId', value: 'other' })
    expect(said.detail).toContain('Pass 1 names a process')
  })

  it('names the field, the value and what would be right', async () => {
    const coupon = await openCoupon(agents)
    const said = problem(await agents.inspector.put(`/api/coupons/${coupon.id}`).set('If-Match', match(coupon)).send({ content: { ...couponContent(), title: '  ' } }).expect(400))
    expect(said.errors?.[0]).toMatchObject({ field: 'content.title', message: 'Give the coupon a title, e.g. "12 mm plate, 3G".' })
  })
})

describe('certification', () => {
  it('closes the record with a signature over its content', async () => {
    const coupon = await certified(agents)
    expect(coupon.state).toBe('certified')
    expect(coupon.may).not.toContain('save')
    expect(coupon.signatures).toHaveLength(1)
    expect(coupon.signatures[0]).toMatchObject({ meaning: 'certified', role: 'inspector', contentSha256: coupon.contentSha256, person: { id: organization.people.inspector.id } })
    expect(coupon.signatures[0]?.statement).toContain(`certify that the statements in ${coupon.number} are correct`)
    await agents.inspector.put(`/api/coupons/${coupon.id}`).set('If-Match', match(coupon)).send({ content: couponContent() }).expect(409)
    await certify(coupon).expect(409)
  })

  it('is refused with exactly what the standard still misses', async () => {
    const whole = couponContent()
    const coupon = await openCoupon(agents, { ...whole, tension: whole.tension.slice(0, 1), bends: [] })
    const body: unknown = (await agents.inspector.get(`/api/coupons/${coupon.id}/qualification`).expect(200)).body
    const { qualifications } = body as { qualifications: { missing: { message: string }[]; readyToCertify: boolean }[] }
    const missing = qualifications.flatMap((one) => one.missing.map(({ message }) => message))
    expect(missing.length).toBeGreaterThan(1)
    const said = problem(await certify(coupon).expect(422))
    expect(said.errors?.map(({ message }) => message)).toEqual(missing)
  })

  it('is refused when a bend failed', async () => {
    const whole = couponContent()
    const open = whole.bends.map((bend, index) => (index === 0 ? { ...bend, openings: [{ size: { si: 6, unit: 'mm', typed: '6 mm' }, corner: false, fromInternalFlaw: null }] } : bend))
    const coupon = await openCoupon(agents, { ...whole, bends: open })
    const said = problem(await certify(coupon).expect(422))
    expect(said.errors?.filter(({ field }) => field.startsWith('content.bends.0'))).toHaveLength(1)
    expect(said.errors?.map(({ message }) => message).join()).toMatch(/B1.*6 mm/)
  })

  it('is refused with a wrong password, and nothing is signed', async () => {
    const coupon = await openCoupon(agents)
    const said = problem(await certify(coupon, 'not my password').expect(422))
    expect(said.errors?.[0]?.field).toBe('password')
    const now = (await agents.inspector.get(`/api/coupons/${coupon.id}`).expect(200)).body as Coupon
    expect(now).toMatchObject({ state: 'testing', signatures: [] })
  })

  it('rejects with the reason', async () => {
    const coupon = await openCoupon(agents)
    const body: unknown = (await agents.supervisor.post(`/api/coupons/${coupon.id}/rejection`).set('If-Match', match(coupon)).send({ password: PASSWORD, reason: 'Lack of fusion over the whole root.' }).expect(200)).body
    expect(body).toMatchObject({ state: 'rejected', signatures: [{ meaning: 'rejected', role: 'supervisor', reason: 'Lack of fusion over the whole root.' }] })
  })
})

describe('the list', () => {
  it('filters, searches and pages without repeating a row when coupons are added meanwhile', async () => {
    const own = await signInAll(app, await app.makeOrganization())
    for (const title of ['Plate one', 'Plate two', 'Pipe three', 'Plate four']) await openCoupon(own, couponContent({ title }))
    const first = (await own.inspector.get('/api/coupons').query({ sort: '-number', limit: 2 }).expect(200)).body as Page<CouponRow>
    expect(first).toMatchObject({ total: 4, items: [{ number: 'PQR-004', thickness: 10 }, { number: 'PQR-003' }] })
    await openCoupon(own, couponContent({ title: 'Plate five' }))
    const second = (await own.inspector.get('/api/coupons').query({ sort: '-number', limit: 2, cursor: first.next }).expect(200)).body as Page<CouponRow>
    expect(second.items.map(({ number }) => number)).toEqual(['PQR-002', 'PQR-001'])
    expect(second.next).toBeNull()
    const found = (await own.inspector.get('/api/coupons').query({ q: 'PLATE 516', state: 'testing', process: 'SMAW' }).expect(200)).body as Page<CouponRow>
    expect(found.total).toBe(4)
    const none = (await own.inspector.get('/api/coupons').query({ q: '100%' }).expect(200)).body as Page<CouponRow>
    expect(none.total).toBe(0)
  })

  it('refuses a cursor of another order with a sentence', async () => {
    const body: unknown = (await agents.inspector.get('/api/coupons').query({ sort: 'number', limit: 1 }).expect(200)).body
    const said = problem(await agents.inspector.get('/api/coupons').query({ sort: '-updatedAt', cursor: (body as Page<CouponRow>).next }).expect(400))
    expect(said.errors?.[0]?.field).toBe('cursor')
  })
})
