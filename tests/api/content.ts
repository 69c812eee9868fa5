/** Procedure and coupon contents for API tests, and the short ways to records in a given state. */
import type { Coupon, Revision } from '../../shared/schemas/records.ts'
import { couponContentSchema, procedureContentSchema, type CouponContent, type ProcedureContent } from '../../shared/schemas/welding.ts'
import { interval, quantity } from '../../shared/units/convert.ts'
import { PASSWORD, type Agent, type TestApp, type TestOrganization } from './harness.ts'

const metal = { specification: 'A/SA-516', grade: '70', productForm: 'plate', pNumber: '1', groupNumber: 2, uns: 'K02700', minTensile: quantity(485, 'stress') }
const filler = { specification: 'A5.1', classification: 'E7018', fNumber: '4', aNumber: 1, productForm: 'covered-electrode', diameters: [quantity(3.2, 'length')] }

/** A carbon steel plate procedure, complete enough to be reviewed. */
export const procedureContent = (change: Partial<Pick<ProcedureContent, 'title' | 'supportingCoupons' | 'notes'>> & { thickness?: [number, number] } = {}): ProcedureContent => {
  const { thickness = [5, 20], ...rest } = change
  return procedureContentSchema.parse({
    title: 'Groove weld, carbon steel plate',
    ...rest,
    variables: {
      standards: [{ standard: 'asme-ix', edition: '2023' }],
      toughnessRequired: false,
      joint: { weld: 'groove', groove: 'single-v', backing: 'none', penetration: 'full', retainers: false },
      baseMetals: { a: metal, b: metal },
      thickness: interval(...thickness, 'length'),
      preheat: { minimum: quantity(10, 'temperature') },
      pwht: { condition: 'none' },
      processes: [{ id: 'p1', process: 'SMAW', mechanisation: 'manual', depositThickness: interval(3, thickness[1], 'length'), filler, positions: ['1G', '3G'], progression: 'up', electrical: { currentType: 'DCEP', current: interval(90, 130, 'current'), voltage: interval(20, 26, 'voltage') }, technique: { bead: 'both', passesPerSide: 'multiple', electrodes: 'single', peening: 'none' } }],
    },
  })
}

/** A 10 mm plate coupon with all that the standard asks for recorded: two tensions, two face and two root bends. */
export const couponContent = (change: Partial<Pick<CouponContent, 'title' | 'bends' | 'tension'>> = {}): CouponContent => {
  const tension = ['T1', 'T2'].map((specimen, index) => ({ id: `t${index}`, specimen, kind: 'reduced-section', width: quantity(19, 'length'), thickness: quantity(10, 'length'), load: quantity(100, 'force'), fracture: 'base-metal', fractureType: 'ductile' }))
  const bends = (['face', 'face', 'root', 'root'] as const).map((kind, index) => ({ id: `b${index}`, specimen: `B${index + 1}`, kind, thickness: quantity(10, 'length'), formerDiameter: quantity(40, 'length'), angle: quantity(180, 'angle'), openings: [], inspected: true }))
  return couponContentSchema.parse({
    title: '10 mm plate, 3G',
    tension,
    bends,
    ...change,
    variables: {
      standards: [{ standard: 'asme-ix', edition: '2023' }],
      toughnessRequired: false,
      joint: { weld: 'groove', groove: 'single-v', backing: 'none', penetration: 'full', retainers: false },
      baseMetals: { a: { ...metal, heatNumber: 'H-1044' }, b: { ...metal, heatNumber: 'H-1044' } },
      thickness: interval(10, undefined, 'length'),
      preheat: { minimum: quantity(20, 'temperature'), interpassMaximum: quantity(180, 'temperature') },
      pwht: { condition: 'none' },
      processes: [{ id: 'p1', process: 'SMAW', mechanisation: 'manual', depositThickness: interval(10, undefined, 'length'), filler, positions: ['3G'], progression: 'up', electrical: { currentType: 'DCEP', current: interval(100, 120, 'current'), voltage: interval(22, 24, 'voltage') }, technique: { bead: 'weave', passesPerSide: 'multiple', electrodes: 'single', peening: 'none' } }],
    },
    weldedOn: '2026-03-02',
    welder: 'T. Welder',
    welderStamp: 'W7',
    testedOn: '2026-03-09',
    laboratory: 'Bench laboratory',
    reportNumber: 'R-1',
    runSheet: [{ id: 'r1', processId: 'p1', pass: '1', layer: 'root', current: interval(105, undefined, 'current'), voltage: interval(23, undefined, 'voltage'), travelSpeed: interval(100, undefined, 'travelSpeed'), interpass: quantity(60, 'temperature') }],
  })
}

export type Agents = Record<'engineer' | 'inspector' | 'supervisor' | 'welder' | 'administrator' | 'auditor', Agent>

export async function signInAll(app: TestApp, organization: TestOrganization): Promise<Agents> {
  const roles = ['engineer', 'inspector', 'supervisor', 'welder', 'administrator', 'auditor'] as const
  return Object.fromEntries(await Promise.all(roles.map(async (role) => [role, await app.agentFor(organization, role)] as const))) as Agents
}

export const match = (record: { version: number }): string => `"${record.version}"`

export async function draft(agents: Agents, content: ProcedureContent = procedureContent()): Promise<Revision> {
  return (await agents.engineer.post('/api/procedures').send({ content }).expect(201)).body as Revision
}

export async function submitted(agents: Agents, content?: ProcedureContent): Promise<Revision> {
  const revision = await draft(agents, content)
  return (await agents.engineer.post(`/api/revisions/${revision.id}/submission`).set('If-Match', match(revision)).expect(200)).body as Revision
}

/** Approved, with a reason so that findings do not stand in the way. */
export async function approved(agents: Agents, content?: ProcedureContent, deviationReason: string | null = 'Accepted for the test.'): Promise<Revision> {
  const revision = await submitted(agents, content)
  return (await agents.supervisor.post(`/api/revisions/${revision.id}/approval`).set('If-Match', match(revision)).send({ password: PASSWORD, deviationReason }).expect(200)).body as Revision
}

export async function openCoupon(agents: Agents, content: CouponContent = couponContent(), revisionId: string | null = null): Promise<Coupon> {
  return (await agents.inspector.post('/api/coupons').send({ revisionId, content }).expect(201)).body as Coupon
}

export async function certified(agents: Agents, content?: CouponContent): Promise<Coupon> {
  const coupon = await openCoupon(agents, content)
  return (await agents.inspector.post(`/api/coupons/${coupon.id}/certification`).set('If-Match', match(coupon)).send({ password: PASSWORD }).expect(200)).body as Coupon
}
