import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { standards } from '../../shared/standards/index.ts'
import { STANDARD_IDS } from '../../shared/schemas/common.ts'
import type { Revision } from '../../shared/schemas/records.ts'
import type { RevisionImpacts, SideBySide, StandardDetail } from '../../shared/schemas/standards.ts'
import { approved, certified, draft, match, openCoupon, procedureContent, signInAll, type Agents } from './content.ts'
import { problem, startApp, type TestApp } from './harness.ts'

let app: TestApp
let agents: Agents
beforeAll(async () => {
  app = await startApp()
  agents = await signInAll(app, await app.makeOrganization())
})
afterAll(() => app.close())

describe('the standards', () => {
  it('are listed with their editions and how their rules are known', async () => {
    const { items } = (await agents.auditor.get('/api/standards').expect(200)).body as { items: { id: string; rules: number; bases: Record<string, number>; editions: unknown[] }[] }
    expect(items.map(({ id }) => id)).toEqual(standards.map(({ id }) => id))
    for (const { rules, bases, editions } of items) {
      expect(rules).toBeGreaterThan(0)
      expect(editions.length).toBeGreaterThan(0)
      expect(Object.values(bases).reduce((sum, count) => sum + count, 0)).toBe(rules)
    }
  })

  it.each(standards.map(({ id }) => id))('%s is told whole: every rule with its clause, classes, basis and statement', async (id) => {
    const detail = (await agents.welder.get(`/api/standards/${id}`).expect(200)).body as StandardDetail
    const kept = standards.find((standard) => standard.id === id)
    expect(detail.ruleList.map((rule) => rule.id)).toEqual(kept?.rules.filter(({ meta }) => kept.processes.some((process) => meta.classes[process])).map(({ meta }) => meta.id))
    expect(detail.outOfScope.length).toBeGreaterThan(0)
    for (const rule of detail.ruleList) {
      for (const text of [rule.title, rule.clause, rule.source, rule.statement, rule.fieldLabel]) expect(text, rule.id).not.toBe('')
      expect(rule.classes.length, rule.id).toBeGreaterThan(0)
      for (const edition of rule.editions) expect(detail.editions.map((one) => one.id)).toContain(edition)
    }
  })

  it('one that is not kept is not found, and what is none is refused', async () => {
    for (const id of STANDARD_IDS) if (!standards.some((standard) => standard.id === id)) expect(problem(await agents.welder.get(`/api/standards/${id}`)).status).toBe(404)
    expect(problem(await agents.welder.get('/api/standards/house-rules').expect(400)).errors?.[0]?.field).toBe('id')
  })
})

describe('what a revision changes', () => {
  it('classes every change and judges it by the coupons linked now', async () => {
    const coupon = await certified(agents)
    const first = await approved(agents, procedureContent({ supportingCoupons: [coupon.id] }))
    const opened = (await agents.engineer.post(`/api/procedures/${first.procedureId}/revisions`).expect(201)).body as Revision
    const content = procedureContent({ supportingCoupons: [coupon.id], thickness: [5, 30], title: 'Groove weld, thicker plate' })
    await agents.engineer.put(`/api/revisions/${opened.id}`).set('If-Match', match(opened)).send({ content }).expect(200)
    const told = (await agents.auditor.get(`/api/revisions/${opened.id}/impact`).expect(200)).body as RevisionImpacts
    expect(told.from).toEqual({ id: first.id, revision: first.revision })
    const [impact] = told.impacts
    expect(impact).toMatchObject({ standard: 'asme-ix', edition: '2023', overall: { standing: 'requalify', class: 'essential' } })
    const by = Object.fromEntries((impact?.changes ?? []).map((change) => [change.field, change]))
    expect(by.title).toMatchObject({ class: 'editorial', standing: 'revise only' })
    // The procedure says nothing of the pass thickness, which the range over 1.1 T hangs on.
    expect(by.thickness).toMatchObject({ class: 'essential', standing: 'cannot tell', before: '5–20 mm', after: '5–30 mm' })
    expect(by['processes.0.depositThickness']).toMatchObject({ class: 'essential', standing: 'requalify', clause: 'QW-404.30' })
    expect(by['processes.0.depositThickness']?.wanted).toMatch(/coupon/i)
    const other = await certified(agents)
    const now = (await agents.engineer.get(`/api/revisions/${opened.id}`).expect(200)).body as Revision
    await agents.engineer.put(`/api/revisions/${opened.id}`).set('If-Match', match(now)).send({ content: procedureContent({ supportingCoupons: [coupon.id, other.id], thickness: [5, 18] }) }).expect(200)
    const after = (await agents.auditor.get(`/api/revisions/${opened.id}/impact`).expect(200)).body as RevisionImpacts
    expect(after.impacts[0]?.changes.find(({ field }) => field === 'processes.0.depositThickness')?.standing).toBe('still covered')
    expect(after.impacts[0]?.changes.find(({ field }) => field === 'supportingCoupons')).toMatchObject({ class: 'editorial', after: `${coupon.number}, ${other.number}` })
  })

  it('says nothing of a first revision, and nothing to another organization', async () => {
    const first = await draft(agents)
    expect((await agents.auditor.get(`/api/revisions/${first.id}/impact`).expect(200)).body).toEqual({ revisionId: first.id, from: null, impacts: [] })
    const others = await signInAll(app, await app.makeOrganization())
    await others.auditor.get(`/api/revisions/${first.id}/impact`).expect(404)
    await agents.auditor.get(`/api/revisions/${first.id}/impact?against=${first.procedureId}`).expect(404)
  })
})

describe('a coupon under every standard', () => {
  it('has a cell for each standard in each row, and none is blank', async () => {
    const coupon = await openCoupon(agents)
    const table = (await agents.auditor.get(`/api/coupons/${coupon.id}/standards`).expect(200)).body as SideBySide
    expect(table).toMatchObject({ couponId: coupon.id, number: coupon.number, certified: false })
    expect(table.standards.map(({ standard }) => standard)).toEqual(standards.map(({ id }) => id))
    expect(table.rows.length).toBeGreaterThan(10)
    for (const { cells } of table.rows) {
      expect(cells.map(({ standard }) => standard)).toEqual(standards.map(({ id }) => id))
      for (const { words } of cells) expect(words.length).toBeGreaterThan(2)
    }
    const thickness = table.rows.find(({ variable }) => variable === 'thickness')?.cells.find(({ standard }) => standard === 'asme-ix')
    expect(thickness).toMatchObject({ state: 'range', clause: 'QW-451.1', words: '1.5 mm to 20 mm' })
    const others = await signInAll(app, await app.makeOrganization())
    await others.auditor.get(`/api/coupons/${coupon.id}/standards`).expect(404)
  })
})

describe('certified coupons to judge by', () => {
  it('gives those of the process, whole, newest first, and no other organization’s', async () => {
    const own = await signInAll(app, await app.makeOrganization())
    await openCoupon(own)
    const [one, two] = [await certified(own), await certified(own)]
    const { items } = (await own.engineer.get('/api/certified-coupons?process=SMAW').expect(200)).body as { items: { id: string; certified: boolean; content: unknown }[] }
    expect(items.map(({ id, certified: closed }) => [id, closed])).toEqual([[two.id, true], [one.id, true]])
    expect(items[0]?.content).toEqual(two.content)
    expect((await own.engineer.get('/api/certified-coupons?process=SMAW&limit=1').expect(200)).body).toMatchObject({ items: [{ id: two.id }] })
    expect((await own.engineer.get('/api/certified-coupons?process=GTAW').expect(200)).body).toEqual({ items: [] })
    await own.engineer.get('/api/certified-coupons').expect(400)
  })
})
