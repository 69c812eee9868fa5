/** A cure must cure: set fixes applied to the draft leave the finding no longer outside. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import type { Finding } from '@shared/schemas/assessment.ts'
import type { ProcedureContent, WeldingVariables } from '@shared/schemas/welding.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { coupon, finding, first, judge, pair, procedure, type Arc } from './records.ts'

/** The draft with every set fix of a finding applied. */
function cured(wps: ProcedureContent, { fixes }: Finding): ProcedureContent {
  const copy = structuredClone(wps)
  for (const fix of fixes) {
    if (fix.kind !== 'set') continue
    const path = fix.field.split('.')
    const last = path.pop() ?? ''
    const parent = path.reduce<Record<string, unknown>>((at, key) => at[key] as Record<string, unknown>, copy.variables as unknown as Record<string, unknown>)
    parent[last] = structuredClone(fix.value)
  }
  return copy
}

const stray = fc
  .record({
    preheat: fc.option(fc.integer({ min: 0, max: 300 })), interpass: fc.option(fc.integer({ min: 50, max: 300 })), service: fc.option(fc.integer({ min: 20, max: 120 })),
    filler: fc.option(fc.constantFrom('ER4043', 'ER5356', 'ER5183', 'ER5554', 'ER1100')), current: fc.option(fc.constantFrom('AC' as const, 'DCEN' as const)), transfer: fc.option(fc.constantFrom('short-circuiting' as const, 'globular' as const)),
    treated: fc.option(fc.constantFrom('within-range' as const, 'solution-anneal' as const)), progression: fc.option(fc.constantFrom('up' as const, 'down' as const, 'both' as const)), unbacked: fc.boolean(),
  })
  .map((given) => (v: WeldingVariables): void => {
    const block = first(v)
    if (given.preheat !== null) v.preheat.minimum = quantity(given.preheat, 'temperature')
    if (given.interpass !== null) v.preheat.interpassMaximum = quantity(given.interpass, 'temperature')
    if (given.service !== null) v.serviceTemperature = quantity(given.service, 'temperature')
    if (given.filler) block.filler.classification = given.filler
    if (given.current) block.electrical.currentType = given.current
    if (given.transfer && block.process === 'GMAW') block.electrical.transferMode = given.transfer
    if (given.treated) v.pwht.condition = given.treated
    if (given.progression) Object.assign(block, { positions: ['3G'], progression: given.progression })
    if (given.unbacked) v.joint.backing = 'none'
  })

describe('cures', () => {
  test('what the set fixes give is no longer outside', () => {
    let offered = 0
    fc.assert(fc.property(fc.constantFrom<Arc>('GMAW', 'GTAW', 'PAW'), fc.constantFrom<'SI' | 'US'>('SI', 'US'), fc.constantFrom('6061-T6', '5083-H116', '3003-O'), stray, (process, system, alloy, change) => {
      const given = { process, system, alloy }
      const tested = coupon({ ...given, change: (v) => { Object.assign(first(v), { positions: ['3G'], progression: 'up' }) } })
      const wps = procedure({ ...given, change })
      for (const found of judge(wps, [tested]).findings) {
        if (found.verdict !== 'outside' || !found.fixes.some(({ kind }) => kind === 'set')) continue
        offered += 1
        const after = judge(cured(wps, found), [tested]).findings.find(({ ruleId }) => ruleId === found.ruleId)
        expect(after?.verdict === 'outside' ? `${found.ruleId}: ${found.sentence} → ${after.sentence} (${JSON.stringify(found.fixes)})` : 'cured').toBe('cured')
      }
    }), { numRuns: 200 })
    expect(offered).toBeGreaterThan(100)
  }, 120_000)
  test('another F-Number is cured by another filler, not by another number', () => {
    const found = finding(pair({}, () => undefined, (v) => { first(v).filler.classification = 'ER4043' }), 'f-number')
    expect(found.verdict).toBe('outside')
    expect(found.fixes.map(({ kind }) => kind)).toEqual(['plan-coupon'])
  })
})

describe('the unit in which a figure was typed', () => {
  test('never changes a verdict at the boundary', () => {
    const thick = (unit: string, value: number) => finding(pair({ system: 'US' }, (v) => { v.thickness = interval(0.5, undefined, 'length', 'in') }, (v) => { v.thickness = interval(value, undefined, 'length', unit) }), 'thickness').verdict
    expect([thick('in', 0.5), thick('mm', 12.7), thick('mm', 12.71)]).toEqual(['within', 'within', 'cannot-tell'])
    const hot = (unit: string, value: number) => finding(pair({ system: 'US' }, () => undefined, (v) => { v.preheat.interpassMaximum = quantity(value, 'temperature', unit) }), 'highest-temperature').verdict
    expect([hot('°F', 250), hot('°C', (250 - 32) / 1.8), hot('°F', 251)]).toEqual(['within', 'within', 'outside'])
  })
})
