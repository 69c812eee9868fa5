import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { assess } from '../../shared/assessment/assess.ts'
import { couponContent, procedureContent } from './content.ts'
import { problem, startApp, type Agent, type TestApp } from './harness.ts'

let app: TestApp
let auditor: Agent
beforeAll(async () => {
  app = await startApp()
  auditor = await app.agentFor(await app.makeOrganization(), 'auditor')
})
afterAll(() => app.close())

describe('judging without storing', () => {
  const request = { procedure: procedureContent({ thickness: [5, 25] }), coupons: [{ id: 'c1', number: 'PQR-1', certified: true, content: couponContent() }], standard: 'asme-ix', edition: '2023' } as const

  it('gives exactly what the engine says, and keeps nothing', async () => {
    const body: unknown = (await auditor.post('/api/assessments').send(request).expect(200)).body
    expect(body).toEqual(JSON.parse(JSON.stringify(assess({ ...request, coupons: [...request.coupons] }))))
    expect((body as { verdict: string }).verdict).toBe('outside')
    expect((await auditor.get('/api/procedures')).body).toMatchObject({ total: 0 })
    expect((await auditor.get('/api/coupons')).body).toMatchObject({ total: 0 })
  })

  it('names an edition that it does not know instead of failing', async () => {
    const body: unknown = (await auditor.post('/api/assessments').send({ ...request, edition: '1901' }).expect(200)).body
    expect(body).toMatchObject({ verdict: 'cannot-tell', findings: [{ ruleId: 'assessment/edition' }] })
  })

  it('names the field that is not right', async () => {
    const said = problem(await auditor.post('/api/assessments').send({ ...request, standard: 'house rules' }).expect(400))
    expect(said.errors?.[0]).toMatchObject({ field: 'standard', value: '"house rules"' })
  })
})
