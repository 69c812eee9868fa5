import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Page } from '../../shared/schemas/common.ts'
import type { Job, JobRow } from '../../shared/schemas/records.ts'
import { interval } from '../../shared/units/convert.ts'
import { approved, draft, match, signInAll, type Agents } from './content.ts'
import { problem, startApp, type TestApp } from './harness.ts'

let app: TestApp
let agents: Agents
beforeAll(async () => {
  app = await startApp()
  agents = await signInAll(app, await app.makeOrganization())
})
afterAll(() => app.close())

const joint = (number: string, more: object = {}) => ({ number, metalA: 'A516-70', metalB: 'A516-70', process: 'SMAW', thickness: interval(12, undefined, 'length'), position: '3G', ...more })
const open = async (joints: object[], more: object = {}): Promise<Job> => (await agents.engineer.post('/api/jobs').send({ title: 'Settling tank', customer: 'Larkfield Water', joints, ...more }).expect(201)).body as Job
const save = (job: Job, joints: object[]) => agents.engineer.put(`/api/jobs/${job.id}`).set('If-Match', match(job)).send({ title: job.title, joints })

describe('jobs', () => {
  it('keep their joints in order, with the procedure that each is welded by', async () => {
    const revision = await approved(agents)
    const job = await open([joint('J2'), joint('J1', { revisionId: revision.id })])
    expect(job.number).toMatch(/^JOB-\d{3}$/)
    expect(job.joints.map(({ number, procedureNumber }) => [number, procedureNumber])).toEqual([['J2', null], ['J1', revision.number]])
    expect(job.joints[0]?.thickness?.min?.typed).toBe('12 mm')
    const { items } = (await agents.welder.get('/api/jobs').query({ q: 'settling' }).expect(200)).body as Page<JobRow>
    expect(items.find(({ id }) => id === job.id)).toMatchObject({ joints: 2, assigned: 1 })
  })

  it('change, drop, add and trade the numbers of joints in one save', async () => {
    const job = await open([joint('J1', { mark: 'shell' }), joint('J2', { mark: 'roof' }), joint('J3')])
    const [one, two] = job.joints
    const body: unknown = (await save(job, [{ ...joint('J2', { mark: 'shell' }), id: one?.id }, { ...joint('J1', { mark: 'roof' }), id: two?.id }, joint('J4')]).expect(200)).body
    const saved = body as Job
    expect(saved.version).toBe(2)
    expect(saved.joints.map(({ id, number, mark }) => [id, number, mark])).toEqual([[one?.id, 'J2', 'shell'], [two?.id, 'J1', 'roof'], [expect.any(String), 'J4', null]])
    const said = problem(await save(job, []).expect(409))
    expect(said.current).toMatchObject({ version: 2, joints: [{ number: 'J2' }, { number: 'J1' }, { number: 'J4' }], sent: { joints: [] } })
  })

  it('refuse joints that do not fit, each by its field', async () => {
    const notReleased = await draft(agents)
    const elsewhere = await signInAll(app, await app.makeOrganization())
    const foreign = await approved(elsewhere)
    const said = problem(await agents.engineer.post('/api/jobs').send({ title: 'x', joints: [joint('J1', { revisionId: notReleased.id }), joint('J1', { revisionId: foreign.id }), { ...joint('J3'), id: foreign.id }] }).expect(422))
    expect(said.errors?.map(({ field }) => field).sort()).toEqual(['joints.0.revisionId', 'joints.1.number', 'joints.1.revisionId', 'joints.2.id'])
    expect(said.detail).toContain('Joint J1 is in the list twice')
    expect(problem(await agents.engineer.post('/api/jobs').send({ title: '' }).expect(400)).detail).toContain('Name the job')
  })

  it('keep a procedure that was superseded since, but take no new one that is', async () => {
    const first = await approved(agents)
    const job = await open([joint('J1', { revisionId: first.id })])
    await agents.supervisor.post(`/api/revisions/${first.id}/withdrawal`).set('If-Match', match(first)).send({ password: 'a bead every ten minutes', reason: 'No longer used.' }).expect(200)
    const kept = (await save(job, [{ ...joint('J1', { revisionId: first.id }), id: job.joints[0]?.id }]).expect(200)).body as Job
    await save(kept, [{ ...joint('J1', { revisionId: first.id }), id: job.joints[0]?.id }, joint('J2', { revisionId: first.id })]).expect(422)
  })

  it('are not there for another organization', async () => {
    const job = await open([])
    const others = await signInAll(app, await app.makeOrganization())
    await others.engineer.get(`/api/jobs/${job.id}`).expect(404)
    await others.engineer.put(`/api/jobs/${job.id}`).set('If-Match', '"1"').send({ title: 'x' }).expect(404)
    expect(((await others.engineer.get('/api/jobs').expect(200)).body as Page<JobRow>).total).toBe(0)
  })
})
