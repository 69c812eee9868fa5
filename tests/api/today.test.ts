import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Job } from '../../shared/schemas/records.ts'
import { OutboxMail } from '../../server/models/outbox-mail.ts'
import { approved, couponContent, draft, openCoupon, signInAll, submitted, type Agents } from './content.ts'
import { startApp, type Agent, type TestApp, type TestOrganization } from './harness.ts'

let app: TestApp
let organization: TestOrganization
let agents: Agents
beforeAll(async () => {
  app = await startApp()
  organization = await app.makeOrganization()
  agents = await signInAll(app, organization)
})
afterAll(() => app.close())

interface Today { tasks: { kind: string; title: string; detail: string; href: string }[]; counts: Record<string, number> }
const today = async (agent: Agent): Promise<Today> => (await agent.get('/api/today').expect(200)).body as Today

describe('what waits', () => {
  it('is nothing in a new organization', async () => {
    for (const agent of Object.values(agents)) expect((await today(agent)).tasks).toEqual([])
  })

  it('is told to each role by what it has to do', async () => {
    const [own, waiting, released] = [await draft(agents), await submitted(agents), await approved(agents)]
    const tested = await openCoupon(agents)
    const planned = await openCoupon(agents, { ...couponContent(), runSheet: [], tension: [], bends: [] })
    const job = (await agents.engineer.post('/api/jobs').send({ title: 'Tank', joints: [{ number: 'J1', revisionId: released.id }, { number: 'J2' }] }).expect(201)).body as Job
    await agents.administrator.post('/api/people').send({ name: 'New Hand', email: `new.${organization.id.slice(0, 8)}@larkfield.example`, roles: ['welder'] }).expect(201)
    await app.inTenant(organization, ({ organizationId, transaction }) => OutboxMail.create({ organizationId, recipients: ['x@larkfield.example'], subject: 'WPS-001', text: 'x', state: 'failed', error: 'refused' }, { transaction }))

    expect(await today(agents.engineer)).toMatchObject({ counts: { draft: 1, returned: 0, job: 1 } })
    expect((await today(agents.engineer)).tasks).toContainEqual(expect.objectContaining({ kind: 'draft', title: `${own.number} A`, href: `/revisions/${own.id}` }))
    expect((await today(agents.supervisor)).tasks).toContainEqual(expect.objectContaining({ kind: 'review', href: `/revisions/${waiting.id}/review`, detail: `${waiting.content.title}, by Test Engineer` }))
    const inspector = (await today(agents.inspector)).tasks
    expect(inspector).toContainEqual(expect.objectContaining({ kind: 'certify', title: tested.number, href: `/coupons/${tested.id}` }))
    expect(inspector).toContainEqual(expect.objectContaining({ kind: 'coupon', title: planned.number }))
    expect((await today(agents.welder)).tasks).toContainEqual(expect.objectContaining({ kind: 'joint', title: `Joint J1 of ${job.number}`, detail: `${released.number} A` }))
    expect((await today(agents.auditor)).tasks).toContainEqual(expect.objectContaining({ kind: 'approved', title: `${released.number} A` }))
    expect(await today(agents.administrator)).toMatchObject({ counts: { invitation: 1, mail: 1 } })
  })

  it('is told of nobody else’s organization', async () => {
    const others = await signInAll(app, await app.makeOrganization())
    for (const agent of Object.values(others)) expect((await today(agent)).tasks).toEqual([])
  })
})
