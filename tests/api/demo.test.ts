import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest'
import { demoSignIns, loadDemo } from '../../server/demo/load.ts'
import { DEMO_PASSWORD, FIRM } from '../../server/demo/people.ts'
import { picturesOf } from '../../server/demo/pictures.ts'
import type { Assessment } from '../../shared/schemas/assessment.ts'
import type { ArcRecording, ArcRecordingRow } from '../../shared/schemas/arc-data.ts'
import type { Page } from '../../shared/schemas/common.ts'
import type { MachineRow, PanelCard } from '../../shared/schemas/machines.ts'
import { ROLES } from '../../shared/schemas/people.ts'
import { beadFigures } from '../../shared/trials/bead-figures.ts'
import { proposeRanges } from '../../shared/trials/propose-ranges.ts'
import type { Trial, TrialRow } from '../../shared/schemas/trials.ts'
import { heatFigures } from '../../shared/library/heat-figures.ts'
import type { Heat, HeatRow } from '../../shared/schemas/heats.ts'
import type { Coupon, CouponRow, Job, JobRow, LibraryItem, LookupResult, ProcedureRecord, ProcedureRow, Revision } from '../../shared/schemas/records.ts'
import { startApp, type Agent, type TestApp } from './harness.ts'

let app: TestApp
let folder: string
let engineer: Agent
const agentOf = async (role: string): Promise<Agent> => {
  const agent = app.anonymous()
  const person = demoSignIns.find((one) => one.role === role)
  await agent.post('/api/session').send({ email: person?.email, password: person?.password }).expect(200)
  return agent
}

const load = (): Promise<void> => loadDemo(inject('databaseUrl'), { NODE_ENV: 'test', SESSION_SECRET: 's'.repeat(32), SIGNING_PASSPHRASE: 'p'.repeat(24), DATA_DIR: folder, LOG_LEVEL: 'silent' })

beforeAll(async () => {
  folder = await mkdtemp(path.join(tmpdir(), 'demo-'))
  await load()
  app = await startApp({ env: { DATA_DIR: folder } })
  engineer = await agentOf('engineer')
}, 120_000)
afterAll(async () => {
  await app.close()
  await rm(folder, { recursive: true, force: true })
})

const get = async <T>(address: string, agent: Agent = engineer): Promise<T> => (await agent.get(`/api/${address}`).expect(200)).body as T
const procedures = () => get<Page<ProcedureRow>>('procedures?limit=200')

describe('the demo firm', () => {
  it('is loaded once, however often it is asked for', async () => {
    await load()
    const { rows } = await app.services.database.owner.query('select 1 from organizations where name = $1', [FIRM.name])
    expect(rows).toHaveLength(1)
    expect((await procedures()).total).toBe(15)
  })

  it('has a recording of a pulsed arc on the open aluminium coupon, with what the meters missed', async () => {
    const { items } = await get<Page<ArcRecordingRow>>('arc-recordings')
    expect(items).toHaveLength(1)
    const recording = await get<ArcRecording>(`arc-recordings/${items[0]?.id}`)
    expect(recording).toMatchObject({ attachedTo: 'PQR-006 pass 2', figures: { stopCount: 1, badRows: 0, alternating: false } })
    expect(recording.figures.pulse?.frequency).toBeCloseTo(110, 0)
    expect(recording.figures.current.mean).toBeCloseTo(155, -1)
    expect(recording.figures.meterError).toBeLessThan(-10)
    expect(recording.heatInput).toBeCloseTo(recording.figures.energy / 51 / 1000, 9)
  })

  it('has somebody of each role, two engineers, two welders and somebody with two roles', async () => {
    for (const role of ROLES) expect(demoSignIns.some((one) => one.role === role)).toBe(true)
    expect(demoSignIns.filter(({ role }) => role === 'engineer')).toHaveLength(2)
    expect(demoSignIns.filter(({ role }) => role === 'welder')).toHaveLength(2)
    expect(demoSignIns.some(({ role }) => role === 'inspector and supervisor')).toBe(true)
    for (const { email, password } of demoSignIns) {
      expect(password).toBe(DEMO_PASSWORD)
      await app.anonymous().post('/api/session').send({ email, password }).expect(200)
    }
  })

  it('has procedures in every state', async () => {
    const { items } = await procedures()
    const records = await Promise.all(items.map(({ id }) => get<ProcedureRecord>(`procedures/${id}`)))
    const states = records.flatMap(({ revisions }) => revisions.map(({ state }) => state))
    expect(Object.fromEntries([...new Set(states)].map((state) => [state, states.filter((one) => one === state).length]))).toEqual({ superseded: 1, approved: 9, withdrawn: 1, draft: 3, 'in-review': 2 })
  })

  it('has eleven coupons with pictures, those certified free of anything missing', async () => {
    const { items } = await get<Page<CouponRow>>('coupons?limit=200')
    expect(items.map(({ state }) => state)).toEqual(['certified', 'certified', 'certified', 'certified', 'certified', 'testing', 'welding', 'rejected', 'certified', 'certified', 'certified'])
    for (const { id, photoCount, state } of items) {
      expect(photoCount).toBe(state === 'welding' ? 1 : 3)
      const { qualifications } = await get<{ qualifications: { readyToCertify: boolean }[] }>(`coupons/${id}/qualification`)
      expect(qualifications.every(({ readyToCertify }) => readyToCertify)).toBe(state === 'certified')
    }
    const first = await get<Coupon>(`coupons/${items[0]?.id}`)
    expect(first.signatures[0]?.statement).toContain('I, Hal Ostby, acting as inspector, certify')
    const { items: photos } = await get<{ items: { id: string; tag: string }[] }>(`coupons/${items[0]?.id}/photos`)
    expect(photos.map(({ tag }) => tag)).toEqual(['plate', 'macro', 'bend'])
    await engineer.get(`/api/photos/${photos[1]?.id}/thumbnail`).expect(200)
  })

  it('has a coupon of each further code that is ready by the code itself, and a procedure within it', async () => {
    const { items } = await get<Page<CouponRow>>('coupons?limit=200')
    const coupons = await Promise.all(items.map(({ id }) => get<Coupon>(`coupons/${id}`)))
    for (const [standard, level] of [['aws-d1-1', null], ['aws-d1-2', null], ['iso-15614-1', '2']] as const) {
      const coupon = coupons.find(({ content }) => content.variables.standards[0]?.standard === standard)
      expect([standard, coupon?.state, coupon?.content.variables.standards[0]?.level]).toEqual([standard, 'certified', level])
      const { assessments } = await get<{ assessments: Assessment[] }>(`revisions/${coupon?.revisionId}/assessment`)
      expect(assessments.map((one) => [one.standard, one.verdict])).toEqual([[standard, 'within']])
      expect((coupon?.content.ndt ?? []).length).toBeGreaterThan(0)
    }
    expect(coupons.some(({ content }) => content.visual?.cracks === false)).toBe(true)
    expect(coupons.some(({ content }) => content.hardness.length > 0 && content.toughness.length > 0 && content.macros.length > 0)).toBe(true)
  })

  it('says of itself what the engine says of it', async () => {
    const { items } = await procedures()
    const judged = new Map<string, { verdict: string; revision: Revision; assessment: Assessment }>()
    for (const { number, revisionId } of items) {
      const revision = await get<Revision>(`revisions/${revisionId}`)
      const { assessments } = await get<{ assessments: Assessment[] }>(`revisions/${revisionId}/assessment`)
      const [assessment] = assessments
      if (assessment) judged.set(number, { verdict: assessment.verdict, revision, assessment })
    }
    for (const { revision, verdict } of judged.values()) if (revision.state === 'approved') expect([revision.number, revision.deviationReason === null]).toEqual([revision.number, verdict === 'within'])
    expect(judged.get('WPS-006')?.revision).toMatchObject({ state: 'approved', deviationReason: expect.stringContaining('26 mm') as string })
    expect(judged.get('WPS-009')).toMatchObject({ verdict: 'outside', revision: { state: 'draft' } })
    expect(judged.get('WPS-009')?.assessment.findings.some(({ verdict, sentence }) => verdict === 'outside' && sentence.includes('25 mm') && sentence.includes('20 mm') && sentence.includes('10 mm'))).toBe(true)
    expect(judged.get('WPS-010')).toMatchObject({ verdict: 'cannot-tell', revision: { state: 'draft' } })
  })

  it('has the pulsed aluminium procedure with its panel, and ER4043 under review', async () => {
    const { items } = await procedures()
    const content = async (number: string) => (await get<Revision>(`revisions/${items.find((one) => one.number === number)?.revisionId}`)).content.variables.processes[0]
    const er5356 = await content('WPS-005')
    expect(er5356?.filler.classification).toBe('ER5356')
    expect(er5356?.electrical.panel).toMatchObject({ machine: 'M-003', mode: 'manual pulse' })
    expect(er5356?.electrical.panel?.settings.map(({ control, value, unit }) => `${control} ${value} ${unit}`)).toEqual(['Wire feed 335 in/min', 'Voltage 23.4 V', 'Background 17.0 V', 'Frequency 120 Hz', 'Pulse on-time 1.9 ms'])
    expect(er5356?.electrical.panel?.caution).toContain('no crater fill')
    expect((await content('WPS-008'))?.filler.classification).toBe('ER4043')
  })

  it('has three machines with their limits, on which its procedures become figures to dial or are refused', async () => {
    const { items: machines } = await get<Page<MachineRow>>('machines')
    expect(machines.map(({ number, calibration }) => [number, calibration])).toEqual([['M-001', 'current'], ['M-002', 'lapsed'], ['M-003', 'due-soon']])
    const { items } = await procedures()
    const revisionOf = (number: string) => items.find((one) => one.number === number)?.revisionId ?? ''
    const card = (procedure: string, machine: number, mode: string) => get<PanelCard>(`revisions/${revisionOf(procedure)}/panel-card?machine=${machines[machine - 1]?.id}&mode=${mode}`)
    // The figures that the procedure itself writes for the machine are those of its card.
    const manual = await card('WPS-005', 3, 'manual-pulse')
    expect(manual.ready).toBe(true)
    expect(manual.lines.map(({ label, text }) => `${label} ${text}`)).toEqual(['Wire feed 335 in/min', 'Voltage 23.4 V', 'Background 17.0 V', 'Frequency 120 Hz', 'Pulse on-time 1.9 ms'])
    expect(manual.notices.map(({ code }) => code)).toContain('no-crater-fill')
    // One button for ER4043 and ER5356: dialled by the shop's points of ER5356, refused for ER4043, of which there are none.
    expect(await card('WPS-005', 3, 'pulse')).toMatchObject({ ready: true, program: 'alu-12' })
    expect((await card('WPS-008', 3, 'pulse')).notices.map(({ code, level }) => `${level} ${code}`)).toEqual(expect.arrayContaining(['refuse no-points', 'warn program-lumps']))
    expect((await card('WPS-005', 2, 'wire')).notices.filter(({ level }) => level === 'refuse').map(({ code }) => code)).toEqual(['transfer-mode', 'not-pulsed'])
    expect((await card('WPS-002', 2, 'wire')).notices.map(({ code }) => code)).toContain('calibration-lapsed')
    expect((await card('WPS-005', 1, 'pulse')).notices.map(({ code }) => code)).not.toContain('no-crater-fill')
  })

  it('has a trial on the manual pulse whose best bead can be promoted, with room where the beads show it and none where they don’t', async () => {
    const { items } = await get<Page<TrialRow>>('trials?sort=number')
    expect(items.map(({ number, beads, bestScore, machine }) => [number, beads, bestScore, machine])).toEqual([['T-001', 8, 5, 'M-003 Bay 3 pulse'], ['T-002', 3, 4, 'M-002 Bay 2 feeder']])
    const trial = await get<Trial>(`trials/${items[0]?.id}`)
    const best = trial.beads.find(({ content }) => content.score === 5)
    const { ranges, problems } = proposeRanges(trial.beads, best?.id ?? '')
    expect(problems).toEqual([])
    expect(ranges.filter(({ from }) => from === 'set').map(({ label, min, max }) => [label, min, max])).toEqual([['Wire feed', 325, 332], ['Voltage', 23, 23], ['Background', 17, 17], ['Frequency', 116, 119], ['Pulse on-time', 1.9, 1.9]])
    // What the recorder read of peak and background comes to what the meter showed, within a few amperes.
    for (const { content } of trial.beads.filter((bead) => bead.content.measured.peakCurrent !== null)) expect(Math.abs((beadFigures(content).figures.meanCurrent?.value ?? 0) - (content.measured.current?.min?.si ?? 0))).toBeLessThan(3)
  })

  it('has jobs whose joints find the procedure that they are to be welded by', async () => {
    const { items } = await get<Page<JobRow>>('jobs')
    expect(items).toHaveLength(3)
    const welder = await agentOf('welder')
    for (const { id } of items) {
      const job = await get<Job>(`jobs/${id}`)
      expect(job.joints.length).toBeGreaterThanOrEqual(5)
      expect(job.joints.length).toBeLessThanOrEqual(9)
      for (const joint of job.joints) {
        const { fits } = await get<LookupResult>(`lookup?jointId=${joint.id}`, welder)
        if (joint.procedureNumber) expect([joint.number, fits.map(({ number }) => number)]).toEqual([joint.number, expect.arrayContaining([joint.procedureNumber])])
      }
    }
  })

  it.each(['engineer', 'inspector', 'supervisor', 'welder', 'auditor'])('has something waiting for the %s', async (role) => {
    const { tasks } = await get<{ tasks: unknown[] }>('today', await agentOf(role))
    expect(tasks.length).toBeGreaterThan(0)
  })

  it('draws the same pictures each time', async () => {
    const set = { tone: 'steel', seed: 3, layers: 5, tested: true } as const
    const [one, other] = [await picturesOf(set), await picturesOf(set)]
    expect(one.map(({ jpeg }) => jpeg.toString('base64'))).toEqual(other.map(({ jpeg }) => jpeg.toString('base64')))
  })
})

describe('the demo firm’s library', () => {
  it('has heats and lots with their certificates, named by its coupons, and figures that follow from them', async () => {
    const { items, total } = await get<Page<HeatRow>>('heats?sort=number&limit=50')
    expect(total).toBe(8)
    expect(items.every(({ files }) => files === 1)).toBe(true)
    const plate = items.find(({ number }) => number === 'K4471')
    const heat = await get<Heat>(`heats/${plate?.id}`)
    expect(heat.namedBy.map(({ number }) => number)).toContain('PQR-001')
    const file = await engineer.get(`/api/heat-files/${heat.files[0]?.id}`).expect(200)
    expect(Buffer.from(file.body as Buffer).subarray(0, 5).toString()).toBe('%PDF-')
    const readings = (number: string) => Object.fromEntries(heatFigures(items.find((row) => row.number === number) ?? heat.content).figures.map(({ id, reading }) => [id, reading]))
    // 0.19 + 1.14/6 + (0.06 + 0.02 + 0.003)/5 + (0.08 + 0.11)/15
    expect(readings('K4471').ceIiw).toBe('0.409')
    expect(readings('26-E7018-114').aNumber).toBe('1')
    expect(Number(readings('308-77193').ferriteNumber)).toBeGreaterThan(4)
    expect(readings('AM5-20611')).toEqual({})
  })

  it('has one grade of its own, first in the list', async () => {
    const { items } = await get<Page<LibraryItem>>('library/base-metals?limit=2')
    expect(items.map(({ origin }) => origin)).toEqual(['own', 'reference'])
    expect(items[0]?.title).toBe('LF-MS-014 Wear plate 400')
  })
})
