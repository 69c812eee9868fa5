import { assess, type AssessInput } from '../../shared/assessment/assess.ts'
import type { Figure } from './measure.ts'
import type { Caller } from './product.ts'

/** The stored procedure with the most supporting coupons, as the engine takes it. */
async function inputFrom(caller: Caller): Promise<{ input: AssessInput; number: string }> {
  const { items } = await caller.read('listProcedures', { query: { standard: 'asme-ix', state: 'approved', limit: '200' } })
  const revisions = await Promise.all(items.map((row) => caller.read('readRevision', { id: row.revisionId })))
  const revision = revisions.sort((a, b) => b.coupons.length - a.coupons.length)[0]
  const choice = revision?.content.variables.standards.find((one) => one.standard === 'asme-ix')
  if (!revision || !choice) throw new Error('The demo firm has no approved procedure under ASME IX to assess.')
  const coupons = await Promise.all(revision.coupons.map((coupon) => caller.read('readCoupon', { id: coupon.id })))
  return {
    number: revision.number,
    input: { procedure: revision.content, standard: choice.standard, edition: choice.edition, level: choice.level, coupons: coupons.map((coupon) => ({ id: coupon.id, number: coupon.number, certified: coupon.state === 'certified', content: coupon.content })) },
  }
}

/** Whole assessments a second on one core, of a stored procedure and its coupons. */
export async function measureAssessments(caller: Caller, seconds: number): Promise<Figure[]> {
  const { input, number } = await inputFrom(caller)
  const { findings } = assess(input)
  if (findings.length < 5) throw new Error(`The assessment of ${number} has ${findings.length} findings: too few to be one worth measuring.`)
  for (let i = 0; i < 200; i++) assess(input)
  const begun = performance.now()
  let count = 0
  while (performance.now() - begun < seconds * 1000) {
    for (let i = 0; i < 50; i++) assess(input)
    count += 50
  }
  const perSecond = count / ((performance.now() - begun) / 1000)
  return [{ name: 'Assessments', value: perSecond, unit: '/s', note: `${number}, ${input.coupons.length} coupon${input.coupons.length === 1 ? '' : 's'}, ${findings.length} findings, one core` }]
}
