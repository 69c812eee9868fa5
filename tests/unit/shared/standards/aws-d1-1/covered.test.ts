/** What a test covers is said with the clause of its own product, with its open bounds, and never for another kind of metal. */
import { describe, expect, test } from 'vitest'
import { contradictions } from '@shared/assessment/contradictions.ts'
import { qualifyCoupon } from '@shared/assessment/assess.ts'
import { withValue } from '@shared/assessment/impact-paths.ts'
import type { QualifiedRange } from '@shared/schemas/assessment.ts'
import { interval } from '@shared/units/convert.ts'
import { coupon, finding, first, judge, pair, procedure, type GivenCoupon } from './records.ts'

const rangeOf = (rule: string, given: GivenCoupon): QualifiedRange => {
  const found = qualifyCoupon(coupon(given), 'aws-d1-1', '2020', null).ranges.find(({ ruleId }) => ruleId === `aws-d1-1/${rule}`)
  if (!found) throw new Error(`no range of ${rule}`)
  return found
}
const pipe: GivenCoupon = { change: (v) => Object.assign(v, { product: 'pipe', diameter: interval(168.3, undefined, 'length') }) }

describe('what a test covers', () => {
  test('a complete-penetration plate test by the plate table, a pipe test by the pipe table', () => {
    expect(rangeOf('weld-kind', {})).toMatchObject({ clause: 'Table 6.2', basis: 'memory' })
    expect(rangeOf('weld-kind', pipe).clause).toBe('Table 10.9')
    expect(finding(pair({}, () => undefined, (v) => (v.joint.penetration = 'partial')), 'thickness')).toMatchObject({ verdict: 'within' })
  })

  test('a coupon of aluminium or stainless steel covers no base metal, and names itself only', () => {
    for (const metal of [{ specification: 'B/SB-209', grade: '6061-T6', d12MNumber: '23' }, { specification: 'A240', grade: '304L', pNumber: '8' }]) {
      const given: GivenCoupon = { change: (v) => { for (const member of [v.baseMetals.a, v.baseMetals.b]) Object.assign(member, metal) } }
      expect(rangeOf('base-metal', given)).toMatchObject({ range: { type: 'set', values: [], unknown: false }, reason: expect.stringContaining('not carbon or low-alloy steel') as string })
      expect(finding(judge(procedure(), [coupon(given)]), 'base-metal')).toMatchObject({ verdict: 'outside', sentence: 'Group II to Group II is not covered: PQR-001 qualifies no steel.' })
    }
  })

  test('gas flow on the limit itself is outside, said so, and the fixes cure it', () => {
    const wps = procedure({ processes: ['FCAW'], change: (v) => (first(v).shieldingGas!.flow = interval(16, 30, 'gasFlow')) })
    const coupons = [coupon({ processes: ['FCAW'] })]
    const found = finding(judge(wps, coupons), 'gas-flow')
    expect(found).toMatchObject({ verdict: 'outside', sentence: '16 L/min and 30 L/min are limits that are themselves not covered: PQR-001 qualifies above 16 L/min and below 30 L/min.' })
    const cured = found.fixes.reduce((content, fix) => (fix.kind === 'set' ? { ...content, variables: withValue(content.variables, fix.field, fix.value) } : content), wps)
    expect(found.fixes.filter(({ kind }) => kind === 'set')).toHaveLength(2)
    expect(finding(judge(cured, coupons), 'gas-flow').verdict).toBe('within')
    const upper = procedure({ processes: ['FCAW'], change: (v) => (first(v).shieldingGas!.flow = interval(18, 30, 'gasFlow')) })
    expect(finding(judge(upper, coupons), 'gas-flow').sentence).toBe('30 L/min is a limit that is itself not covered: PQR-001 qualifies above 16 L/min and below 30 L/min.')
  })

  test('a contradiction names the ends that are given', () => {
    const { variables } = procedure({ change: (v) => (v.diameter = { min: interval(60, undefined, 'length').min, max: null, all: false }) })
    expect(contradictions(variables).map(({ sentence }) => sentence)).toEqual(['Diameter 60 mm is given, but the product is plate.'])
  })
})
