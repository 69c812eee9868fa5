/** Properties of cures, coupons and units under ISO 15614-1 and -2. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import type { Assessment, AssessedCoupon, Finding } from '@shared/schemas/assessment.ts'
import type { Interval } from '@shared/schemas/common.ts'
import type { ProcedureContent, ProcessBlock, WeldingVariables } from '@shared/schemas/welding.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { couponTwo, judgeTwo, procedureTwo, type GivenTwo } from '../iso-15614-2/builders.ts'
import { coupon, judge, procedure, type Given, type GivenCoupon } from './builders.ts'

/** Writes what a fix sets. */
function apply(content: ProcedureContent, field: string, value: unknown): void {
  const keys = field.split('.')
  const last = keys.pop()!
  let place = content.variables as unknown as Record<string, unknown>
  for (const key of keys) {
    if (place[key] === null || place[key] === undefined) place[key] = { min: null, max: null, all: false }
    place = place[key] as Record<string, unknown>
  }
  place[last] = value
}

type Judge = (wps: ProcedureContent, coupons: readonly AssessedCoupon[]) => Assessment
const key = ({ ruleId, processId }: Finding): string => `${ruleId} ${processId ?? ''}`
const outside = (assessment: Assessment): Finding[] => assessment.findings.filter(({ verdict }) => verdict === 'outside')

/** How many findings outside had a value to set, each of which was cured by it. */
function cured(wps: ProcedureContent, coupons: readonly AssessedCoupon[], run: Judge): number {
  let count = 0
  for (const found of outside(run(wps, coupons))) {
    const sets = found.fixes.filter((fix) => fix.kind === 'set')
    if (sets.length === 0) continue
    const better = structuredClone(wps)
    for (const fix of sets) apply(better, fix.field, fix.value)
    const after = run(better, coupons).findings.find((one) => key(one) === key(found))
    expect(after?.verdict, `${found.sentence} → ${sets.map(({ label }) => label).join(', ')} → ${after?.sentence ?? ''}`).not.toBe('outside')
    count += 1
  }
  return count
}

type Change = (variables: WeldingVariables, block: ProcessBlock) => void
const size = fc.integer({ min: 10, max: 1200 }).map((n) => n / 10)
const degrees = fc.integer({ min: -20, max: 400 })
const energy = fc.integer({ min: 2, max: 60 }).map((n) => n / 10)
interface Weld { t: number; deposit: number; D: number; throat: number; preheat: number; interpass: number; heat: number; single: boolean; kind: 'plate' | 'pipe' | 'fillet' }
const weld: fc.Arbitrary<Weld> = fc.record({ t: size, deposit: size, D: size, throat: size, preheat: degrees, interpass: degrees, heat: energy, single: fc.boolean(), kind: fc.constantFrom('plate', 'pipe', 'fillet') })

const write = ({ t, deposit, D, throat, preheat, interpass, heat, single, kind }: Weld): Change => (variables, block) => {
  variables.thickness = interval(t, t, 'length')
  block.depositThickness = interval(Math.min(deposit, t), undefined, 'length')
  block.technique.passesPerSide = single ? 'single' : 'multiple'
  block.electrical.heatInput = interval(heat, heat, 'heatInput')
  Object.assign(variables.preheat, { minimum: quantity(preheat, 'temperature'), interpassMaximum: quantity(interpass, 'temperature') })
  if (kind === 'pipe') Object.assign(variables, { product: 'pipe', diameter: interval(D, D, 'length') })
  if (kind === 'fillet') Object.assign(variables.joint, { weld: 'fillet', type: 'tee', filletThroat: interval(throat, throat, 'length') })
}

const steel = (one: Weld, more: Given = {}): Given => ({ ...more, change0: (block, variables) => write(one)(variables, block) })
const aluminium = (one: Weld): GivenTwo => ({ change: write(one) })

describe('a cure', () => {
  test.each(['1', '2'] as const)('of ISO 15614-1 at level %s leaves its finding no longer outside', (level) => {
    let count = 0
    fc.assert(fc.property(weld, weld, fc.boolean(), fc.boolean(), (asked, tested, impact, hardness) => {
      const given = { impact, hardness, level }
      count += cured(procedure(steel({ ...asked, kind: tested.kind }, given)), [coupon(steel(tested, given))], (wps, coupons) => judge(wps, coupons, level))
    }), { numRuns: 120 })
    expect(count).toBeGreaterThan(20)
  })

  test('of ISO 15614-2 leaves its finding no longer outside', () => {
    let count = 0
    fc.assert(fc.property(weld, weld, (asked, tested) => {
      count += cured(procedureTwo(aluminium({ ...asked, kind: tested.kind })), [couponTwo(aluminium(tested))], judgeTwo)
    }), { numRuns: 120 })
    expect(count).toBeGreaterThan(20)
  })
})

const withinOf = (assessment: Assessment): Set<string> => new Set(assessment.findings.filter(({ verdict }) => verdict === 'within').map(key))

describe('more from the coupons never turns within into outside', () => {
  test('a second coupon', () => {
    fc.assert(fc.property(weld, weld, weld, (asked, first, second) => {
      for (const [run, wps, one, two] of [
        [judge, procedure(steel(asked)), coupon(steel(first)), coupon({ ...steel(second), number: 'PQR-002' })],
        [judgeTwo, procedureTwo(aluminium(asked)), couponTwo(aluminium(first)), couponTwo({ ...aluminium(second), number: 'PQR-002' })],
      ] as const) {
        const alone = run(wps, [one])
        // Which coupon leads may change where neither agrees; where the first one does, nothing of it is lost.
        if (outside(alone).length > 0) continue
        const covered = withinOf(alone)
        for (const found of outside(run(wps, [one, two]))) expect(covered.has(key(found)), found.sentence).toBe(false)
      }
    }), { numRuns: 60 })
  })

  test('more tests on the same coupon, and level 2 in place of level 1', () => {
    fc.assert(fc.property(weld, weld, fc.boolean(), fc.boolean(), (asked, tested, impact, hardness) => {
      const wps = procedure(steel({ ...asked, kind: tested.kind }, { impact, hardness, level: '1' }))
      const made = (more: GivenCoupon): AssessedCoupon => coupon({ ...steel(tested), ...more })
      const bare = withinOf(judge(wps, [made({ impact, hardness, level: '1', impactTested: false, hardnessTested: false })], '1'))
      for (const level of ['1', '2'] as const) for (const found of outside(judge(wps, [made({ impact, hardness, level, impactTested: true, hardnessTested: true })], '1'))) expect(bare.has(key(found)), found.sentence).toBe(false)
    }), { numRuns: 60 })
  })
})

describe('levels', () => {
  test('what a level 2 coupon covers at level 2 it covers at level 1; a level 1 coupon never serves level 2', () => {
    fc.assert(fc.property(weld, weld, fc.boolean(), fc.boolean(), (asked, tested, impact, hardness) => {
      const wps = (level: '1' | '2'): ProcedureContent => procedure(steel({ ...asked, kind: tested.kind }, { impact, hardness, level }))
      const made = (level: '1' | '2'): AssessedCoupon => coupon({ ...steel(tested, { impact, hardness, level }) })
      const narrow = withinOf(judge(wps('2'), [made('2')], '2'))
      for (const found of judge(wps('1'), [made('2')], '1').findings) if (narrow.has(key(found))) expect(found.verdict, found.sentence).toBe('within')
      const reverse = judge(wps('2'), [made('1')], '2')
      expect(reverse.verdict).toBe('outside')
      expect(reverse.findings.find(({ ruleId }) => ruleId === 'iso-15614-1/level')?.verdict).toBe('outside')
    }), { numRuns: 100 })
  })
})

/** The same record, typed in US units. */
function inUS(content: { variables: WeldingVariables }): void {
  const { variables } = content
  const length = (value: number): number => value / 25.4
  const again = (one: Interval | null | undefined): Interval | null => (one ? interval(one.min && length(one.min.si), one.max && length(one.max.si), 'length', 'in') : null)
  const fahrenheit = (one: WeldingVariables['preheat']['minimum']): WeldingVariables['preheat']['minimum'] => one && quantity((one.si * 9) / 5 + 32, 'temperature', '°F')
  Object.assign(variables, { unitSystem: 'US', thickness: again(variables.thickness), diameter: again(variables.diameter) })
  variables.joint.filletThroat = again(variables.joint.filletThroat)
  Object.assign(variables.preheat, { minimum: fahrenheit(variables.preheat.minimum), interpassMaximum: fahrenheit(variables.preheat.interpassMaximum) })
  for (const block of variables.processes) {
    block.depositThickness = again(block.depositThickness)
    const { heatInput } = block.electrical
    if (heatInput) block.electrical.heatInput = interval(heatInput.min && heatInput.min.si * 25.4, heatInput.max && heatInput.max.si * 25.4, 'heatInput', 'kJ/in')
  }
}

describe('units', () => {
  const FACTORS = [0.5, 0.7, 0.75, 0.8, 1, 1.1, 1.25, 1.3, 1.5, 2]
  test('a record typed in inches, °F and kJ/in gets the same verdicts, also at every boundary', () => {
    fc.assert(fc.property(weld, fc.constantFrom(...FACTORS), fc.constantFrom(0, 20, -20, 50, -50), fc.boolean(), fc.boolean(), (tested, factor, step, wps, one) => {
      const edge = (value: number): number => Math.round(value * factor * 1e6) / 1e6
      const asked: Weld = { ...tested, t: edge(tested.t), deposit: edge(tested.deposit), D: edge(tested.D), throat: edge(tested.throat), heat: edge(tested.heat), preheat: tested.preheat + step, interpass: tested.interpass + step }
      const given = { impact: true, hardness: true }
      for (const [run, first, second] of [
        [judge, () => procedure(steel(asked, given)), () => coupon(steel(tested, given))],
        [judgeTwo, () => procedureTwo(aluminium(asked)), () => couponTwo(aluminium(tested))],
      ] as const) {
        const verdicts = (us: boolean): [string, string][] => {
          const [content, piece] = [first(), second()]
          if (us && wps) inUS(content)
          if (us && one) inUS(piece.content)
          return run(content, [piece]).findings.map((found) => [key(found), found.verdict])
        }
        expect(verdicts(true)).toEqual(verdicts(false))
      }
    }), { numRuns: 80 })
  })
})
