import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Job, LookupResult, Revision } from '../../shared/schemas/records.ts'
import { interval } from '../../shared/units/convert.ts'
import { approved, draft, match, procedureContent, signInAll, type Agents } from './content.ts'
import { PASSWORD, problem, startApp, type TestApp } from './harness.ts'

let app: TestApp
let agents: Agents
let thin: Revision
let thick: Revision
beforeAll(async () => {
  app = await startApp()
  agents = await signInAll(app, await app.makeOrganization())
  thin = await approved(agents, procedureContent({ title: 'Thin', thickness: [3, 8] }))
  thick = await approved(agents, procedureContent({ title: 'Thick', thickness: [5, 40] }))
  await draft(agents, procedureContent({ title: 'Not released', thickness: [3, 40] }))
})
afterAll(() => app.close())

const ask = async (query: object): Promise<LookupResult> => (await agents.welder.get('/api/lookup').query(query).expect(200)).body as LookupResult
const titles = (list: readonly { title: string }[]): string[] => list.map(({ title }) => title)

describe('look-up', () => {
  it('gives approved procedures only, the closest first, with reasons', async () => {
    const found = await ask({ line: 'A516-70 6 mm SMAW 3G' })
    expect(titles(found.fits)).toEqual(['Thin', 'Thick'])
    expect(found.fits[0]).toMatchObject({ revisionId: thin.id, number: thin.number, revision: 'A', processes: ['SMAW'] })
    expect(found.fits[0]?.reasons.join()).toMatch(/3G/)
    expect(found.notRead).toEqual([])
  })

  it('shows what misses by little and why', async () => {
    const found = await ask({ metalA: 'A516-70', metalB: 'A516-70', thickness: '20 mm', process: 'SMAW', position: '3G' })
    expect(titles(found.fits)).toEqual(['Thick'])
    expect(titles(found.near)).toEqual(['Thin'])
    expect(found.near[0]?.wants.join()).toMatch(/8 mm/)
  })

  it('takes another metal of the same P-Number, not one of another', async () => {
    expect(titles((await ask({ metalA: 'A36', metalB: 'A36', thickness: '6 mm', process: 'SMAW', position: '1G' })).fits)).toHaveLength(2)
    expect((await ask({ metalA: '304L', metalB: '304L', thickness: '6 mm', process: 'SMAW', position: '1G' })).fits).toEqual([])
  })

  it('reads inches as inches', async () => {
    expect(titles((await ask({ metalA: 'A516-70', thickness: '1 in', process: 'SMAW', unitSystem: 'US' })).fits)).toEqual(['Thick'])
  })

  it('asks for a joint of a job', async () => {
    const body: unknown = (await agents.engineer.post('/api/jobs').send({ title: 'Tank', joints: [{ number: 'J1', metalA: 'A516-70', metalB: 'A516-70', process: 'SMAW', position: '3G', thickness: interval(20, undefined, 'length') }] }).expect(201)).body
    const job = body as Job
    const found = await ask({ jointId: job.joints[0]?.id })
    expect(titles(found.fits)).toEqual(['Thick'])
    expect(found.read).toContainEqual({ label: 'Joint', value: `${job.number} J1` })
    const others = await signInAll(app, await app.makeOrganization())
    await others.welder.get('/api/lookup').query({ jointId: job.joints[0]?.id }).expect(404)
    expect(((await others.welder.get('/api/lookup').query({ line: 'A516-70 SMAW' }).expect(200)).body as LookupResult).fits).toEqual([])
  })

  it('says what it could not read, and ranks nothing when it read nothing', async () => {
    const found = await ask({ line: 'zzz' })
    expect(found).toMatchObject({ fits: [], near: [] })
    expect(found.notRead.join()).toContain('zzz')
    expect(problem(await agents.welder.get('/api/lookup').query({ process: 'GLUE' }).expect(400)).errors?.[0]?.field).toBe('process')
  })

  it('leaves a withdrawn procedure out at once', async () => {
    const gone = await approved(agents, procedureContent({ title: 'Withdrawn soon', thickness: [50, 60] }))
    expect(titles((await ask({ metalA: 'A516-70', thickness: '55 mm', process: 'SMAW' })).fits)).toEqual(['Withdrawn soon'])
    await agents.supervisor.post(`/api/revisions/${gone.id}/withdrawal`).set('If-Match', match(gone)).send({ password: PASSWORD, reason: 'No longer used.' }).expect(200)
    expect((await ask({ metalA: 'A516-70', thickness: '55 mm', process: 'SMAW' })).fits).toEqual([])
    expect(thick.state).toBe('approved')
  })
})
