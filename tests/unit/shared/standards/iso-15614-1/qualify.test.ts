/** Extent of tests, acceptance and what is missing for certification. */
import { describe, expect, test } from 'vitest'
import type { CouponContent, NdtTest, WeldingVariables } from '@shared/schemas/welding.ts'
import { formerDiameter, hardnessLimit, judgeHardness, ultrasonicAllowed } from '@shared/standards/iso-15614-1/acceptance.ts'
import { judgeResults } from '@shared/standards/iso-15614-1/qualify.ts'
import { testedConsumablesRoute } from '@shared/standards/iso-15614-1/tested-consumables.ts'
import { judgeImpact, judgeTension, stressOf, widthShare } from '@shared/standards/common/iso-tests.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { coupon, procedure, qualified, type GivenCoupon } from './builders.ts'

const rows = (given: GivenCoupon, level: '1' | '2' = '2'): Record<string, number> => Object.fromEntries(qualified(coupon(given), level).specimens.map(({ kind, required }) => [kind, required]))
const fields = (given: GivenCoupon, level: '1' | '2' | null = null): string[] => qualified(coupon(given), level).missing.map(({ field }) => field)
const joint = (more: Partial<WeldingVariables['joint']>) => (variables: WeldingVariables): void => void Object.assign(variables.joint, more)
const fillet = joint({ weld: 'fillet', type: 'tee', filletThroat: interval(5, undefined, 'length') })
const none = (content: CouponContent): void => void (content.bends = [])

describe('extent of tests', () => {
  test('level 2', () => {
    expect(rows({ thickness: 20, content: none })).toEqual({ visual: 1, volumetric: 1, surface: 1, tension: 2, 'side-bend': 4, impact: 2, hardness: 1, macro: 1 })
    expect(rows({ thickness: 11.9, content: none })).toEqual({ visual: 1, volumetric: 1, surface: 1, tension: 2, 'face-bend': 2, 'root-bend': 2, hardness: 1, macro: 1 })
    expect(rows({ change: joint({ type: 'tee' }) })).toEqual({ visual: 1, volumetric: 1, surface: 1, hardness: 1, macro: 2 })
    expect(rows({ change: fillet })).toEqual({ visual: 1, surface: 1, hardness: 1, macro: 2 })
    expect(rows({ change: (v) => { joint({ branch: 'set-on', branchAngle: interval(90, undefined, 'angle') })(v); v.diameter = interval(50, undefined, 'length'); v.product = 'pipe' } })).toEqual({ visual: 1, surface: 1, hardness: 1, macro: 2 })
    expect(rows({ thickness: 60, b: ['1.1', 235] }).impact).toBe(5)
    expect(rows({ thickness: 60 }).impact).toBe(4)
    expect(rows({ thickness: 10, impact: true }).impact).toBe(2)
  })
  test('level 1', () => {
    expect(rows({ content: none }, '1')).toEqual({ visual: 1, tension: 2, 'side-bend': 4 })
    expect(rows({ change: fillet }, '1')).toEqual({ visual: 1, macro: 2 })
    expect(rows({ impact: true, hardness: true, content: none }, '1')).toEqual({ visual: 1, tension: 2, 'side-bend': 4, impact: 2, hardness: 1 })
    expect(fields({ change: joint({ type: 'tee' }) }, '1')).toContain('variables.joint.type')
  })
  test('hardness by groups, penetrant where not magnetic, UT where allowed', () => {
    expect(rows({ a: ['1.1', 235] }).hardness).toBeUndefined()
    expect(rows({ a: ['8.1', 210] }).hardness).toBeUndefined()
    expect(rows({ a: ['8.1', 210], b: ['1.1', 235] }).hardness).toBe(1)
    expect(rows({ a: ['43', 275], b: ['8.1', 210] }).hardness).toBeUndefined()
    expect(fields({ change: (v) => { v.baseMetals.a.iso15608 = null } })).toContain('variables.baseMetals.a.iso15608')
    expect([7.99, 8, null].map((t) => ultrasonicAllowed(t, [{ main: 1, sub: 2, text: '1.2' }]))).toEqual([false, true, null])
    expect(ultrasonicAllowed(20, [{ main: 10, sub: 1, text: '10.1' }])).toBe(false)
    const tested = (...methods: NdtTest['method'][]): string[] => fields({ a: ['8.1', 210], content: (content) => { content.ndt = methods.map((method) => ({ id: method, method, accepted: true, reportNumber: null, note: null })) } })
    expect(tested('VT', 'UT', 'MT').filter((field) => field === 'ndt')).toHaveLength(2)
    expect(tested('VT', 'RT', 'PT')).not.toContain('ndt')
  })
  test('impact values of the parent must be known from 12 mm', () => {
    const unsaid = (v: WeldingVariables): void => { v.baseMetals.a.impactSpecified = null; v.baseMetals.b.impactSpecified = null }
    expect(fields({ change: unsaid })).toContain('variables.baseMetals.a.impactSpecified')
    expect(fields({ thickness: 10, change: unsaid })).not.toContain('variables.baseMetals.a.impactSpecified')
    expect(rows({ change: (v) => { v.baseMetals.a.impactSpecified = false; v.baseMetals.b.impactSpecified = false } }).impact).toBeUndefined()
    expect(fields({ change: (v) => { v.thickness = null } })).toContain('variables.thickness')
  })
  test('longitudinal bends may replace the four where the metals differ', () => {
    const along = (content: CouponContent): void => { content.bends = (['longitudinal-face', 'longitudinal-root'] as const).map((kind) => ({ ...content.bends[0]!, id: kind, specimen: kind, kind })) }
    expect(rows({ b: ['1.1', 235], content: along })).toMatchObject({ 'longitudinal-face-bend': 1, 'longitudinal-root-bend': 1 })
    expect(rows({ content: along })['side-bend']).toBe(4)
    const flat = (content: CouponContent): void => { content.bends = (['face', 'face', 'root', 'root'] as const).map((kind, i) => ({ ...content.bends[0]!, id: `${i}`, kind })) }
    expect(rows({ content: flat })).toMatchObject({ 'face-bend': 2, 'root-bend': 2 })
    expect(qualified(coupon({ thickness: 10, b: ['1.1', 235], content: none })).specimens.find(({ kind }) => kind === 'face-bend')?.alternative).toContain('longitudinal')
  })
})

describe('acceptance', () => {
  const verdict = (given: GivenCoupon, id: string, level: '1' | '2' = '2'): string | undefined => judgeResults(coupon(given), level).find(({ testId }) => testId === id)?.verdict
  const reported = (value: number, fracture: 'base-metal' | 'weld' = 'weld') => (content: CouponContent): void => void Object.assign(content.tension[0]!, { load: null, reportedStrength: quantity(value, 'stress'), fracture })
  test('tension: the weaker parent, no five per cent at level 2', () => {
    expect(verdict({ content: reported(470) }, 't1')).toBe('pass')
    expect(verdict({ content: reported(469.9, 'base-metal') }, 't1')).toBe('fail')
    expect(verdict({ content: reported(469.9, 'base-metal') }, 't1', '1')).toBe('cannot-tell')
    expect(verdict({ content: reported(440, 'base-metal') }, 't1', '1')).toBe('fail')
    expect(verdict({ content: reported(469.9) }, 't1', '1')).toBe('fail')
    expect(verdict({ change: (v) => { v.baseMetals.b.minTensile = quantity(450, 'stress') }, content: reported(450) }, 't1')).toBe('pass')
    expect(verdict({ change: (v) => { v.baseMetals.b.minTensile = null } }, 't1')).toBe('cannot-tell')
    expect(verdict({ content: (content) => Object.assign(content.tension[0]!, { load: null }) }, 't1')).toBe('cannot-tell')
    const round = coupon().content.tension[0]!
    expect(stressOf({ ...round, kind: 'turned', diameter: quantity(10, 'length'), load: quantity(40, 'force') })).toBeCloseTo(509.3, 1)
    expect(judgeTension({ ...round, load: quantity(-1, 'force') }, { value: 1, how: '' }, { clause: '', basis: 'read' }).verdict).toBe('cannot-tell')
  })
  test('bends', () => {
    const bend = (more: Partial<CouponContent['bends'][number]>): string | undefined => verdict({ content: (content) => Object.assign(content.bends[0]!, more) }, 'b1')
    const opening = (size: number, corner: boolean, fromInternalFlaw: boolean | null) => ({ size: quantity(size, 'length'), corner, fromInternalFlaw })
    expect(bend({ openings: [opening(3, false, null)] })).toBe('pass')
    expect(bend({ openings: [opening(3.1, false, null)] })).toBe('fail')
    expect(bend({ openings: [opening(9, true, null)] })).toBe('pass')
    expect(bend({ openings: [opening(9, true, true)] })).toBe('fail')
    expect(bend({ broke: true })).toBe('fail')
    expect(judgeResults(coupon({ content: (content) => Object.assign(content.bends[0]!, { broke: true }) }), '2').find(({ testId }) => testId === 'b1')?.sentence).toContain('two more')
    expect(bend({ angle: quantity(120, 'angle') })).toBe('cannot-tell')
    expect(bend({ inspected: false })).toBe('cannot-tell')
    expect(formerDiameter(10, 20)).toBe(40)
    expect(fields({ content: (content) => Object.assign(content.bends[0]!, { formerDiameter: quantity(50, 'length') }) })).toContain('bends.0.formerDiameter')
    expect(fields({ change: (v) => { v.baseMetals.a.minElongation = null } })).toContain('variables.baseMetals.a.minElongation')
    expect(fields({ change: (v) => { v.baseMetals.a.minElongation = quantity(17, 'percent') }, content: (content) => content.bends.forEach((one) => { one.formerDiameter = quantity(48.8, 'length') }) })).not.toContain('bends.0.formerDiameter')
  })
  test('macro and non-destructive tests', () => {
    const macro = (more: Partial<CouponContent['macros'][number]>): string | undefined => verdict({ content: (content) => Object.assign(content.macros[0]!, more) }, 'm1')
    expect([macro({}), macro({ cracks: true }), macro({ fusionComplete: false }), macro({ cracks: null })]).toEqual(['pass', 'fail', 'fail', 'cannot-tell'])
    const ndt = (accepted: boolean | null): string | undefined => verdict({ content: (content) => { content.ndt![0]!.accepted = accepted } }, 'v')
    expect([ndt(true), ndt(false), ndt(null)]).toEqual(['pass', 'fail', 'cannot-tell'])
    expect(verdict({ content: (content) => { content.ndt = undefined } }, 'v')).toBeUndefined()
    expect(fields({ content: (content) => { content.ndt![1]!.accepted = false } })).toContain('ndt.1')
  })
  test('impact sets', () => {
    const set = (values: number[], required: number | null = 27, more: { size?: string | null; at?: number; requiredAt?: number | null } = {}): string =>
      judgeImpact({ id: 'i', place: 'weld', temperature: quantity(more.at ?? -20, 'temperature'), size: more.size ?? '10 x 10', values: values.map((value) => quantity(value, 'energy')), lateralExpansion: [] }, required, more.requiredAt ?? -20, { clause: '7.4.4', basis: 'memory' }).verdict
    expect(set([35, 22, 28])).toBe('pass')
    expect(set([27, 27, 27])).toBe('pass')
    expect(set([40, 18.8, 30])).toBe('fail')
    expect(set([40, 26, 26])).toBe('fail')
    expect(set([26, 27, 27])).toBe('fail')
    expect(set([40, 15, 30, 30, 30, 30])).toBe('pass')
    expect(set([20, 20, 20, 30, 30, 30])).toBe('fail')
    expect(set([30, 30])).toBe('cannot-tell')
    expect(set([30, 30, 30, 30])).toBe('cannot-tell')
    expect(set([30, 30, 30], null)).toBe('cannot-tell')
    expect(set([30, 30, 30], 27, { at: 0 })).toBe('cannot-tell')
    expect(set([22, 22, 22], 27, { size: '10 x 7.5' })).toBe('cannot-tell')
    expect(set([15, 15, 15], 27, { size: '10 x 7.5' })).toBe('fail')
    expect(set([])).toBe('cannot-tell')
    expect([widthShare('10 x 7,5'), widthShare('10 x 10'), widthShare(null), widthShare('55')]).toEqual([0.75, 1, null, null])
  })
  test('a mean is told to a tenth, unless that would hide that it fails', () => {
    const told = (values: number[]): string => judgeImpact({ id: 'i', place: 'weld', temperature: quantity(-20, 'temperature'), size: '10 x 10', values: values.map((value) => quantity(value, 'energy')), lateralExpansion: [] }, 27, -20, { clause: '7.4.4', basis: 'memory' }).sentence
    expect(told([74, 75, 75])).toContain('mean 74.7 J against 27 J')
    expect(told([26.9, 27, 27])).toContain('mean 26.9667 J is below the 27 J required')
  })
  test('hardness limits by group and condition', () => {
    const limit = (group: string, treated: boolean, strength = 400): number | null => { const [main, sub] = group.split('.').map(Number); return hardnessLimit({ main: main!, sub: sub ?? null, text: group }, treated, strength)?.sure ?? null }
    expect(['1.1', '2.1', '3.1', '4.1', '5.2', '6.4', '9.1', '9.2', '9.3'].map((group) => [limit(group, false), limit(group, true)])).toEqual([[380, 320], [380, 320], [450, 380], [380, 320], [380, 320], [null, 350], [350, 300], [450, 350], [450, 350]])
    expect(limit('9', true)).toBeNull()
    expect(limit('8.1', false)).toBeNull()
    expect(limit('3.2', false, 960)).toBe(0)
    const survey = (value: number, given: GivenCoupon, level: '1' | '2' = '2'): string => judgeHardness({ id: 'h', scale: 'HV10', place: 'weld', values: [value] }, coupon(given).content.variables, level).verdict
    expect(survey(380, {})).toBe('pass')
    expect(survey(381, {})).toBe('fail')
    expect(survey(381, {}, '1')).toBe('cannot-tell')
    expect(survey(381, { a: ['2.2', 960] })).toBe('cannot-tell')
    expect(survey(340, { a: ['5.2', 300], change: (v) => { v.pwht.condition = 'below-lower-transformation' } })).toBe('cannot-tell')
    expect(survey(351, { a: ['5.2', 300], change: (v) => { v.pwht.condition = 'below-lower-transformation' } })).toBe('fail')
    expect(survey(400, { a: ['3.1', 690], b: ['1.2', 355] })).toBe('cannot-tell')
    expect(survey(200, { a: ['8.1', 210], b: ['1.2', 355] })).toBe('cannot-tell')
    expect(survey(200, { change: (v) => { v.pwht.condition = null } })).toBe('cannot-tell')
    expect(survey(200, { change: (v) => { v.baseMetals.a.iso15608 = null } })).toBe('cannot-tell')
    const { variables } = coupon().content
    expect(judgeHardness({ id: 'h', scale: 'HV5', place: 'weld', values: [200] }, variables, '2').verdict).toBe('cannot-tell')
    expect(judgeHardness({ id: 'h', scale: 'HV10', place: 'weld', values: [] }, variables, '2').verdict).toBe('cannot-tell')
  })
})

describe('certification', () => {
  test('a whole coupon is ready, and each gap is named once at its place', () => {
    expect(qualified(coupon({ impact: true, hardness: true })).readyToCertify).toBe(true)
    const bare = qualified(coupon({ impact: true, hardness: true, content: (content) => Object.assign(content, { welder: null, witness: null, reportNumber: null, laboratory: null, weldedOn: null, toughness: [], hardness: [], tension: [], macros: [], bends: [], ndt: [] }) }))
    expect(bare.readyToCertify).toBe(false)
    expect(bare.missing.map(({ field }) => field)).toEqual(['weldedOn', 'welder', 'witness', 'laboratory', 'reportNumber', 'ndt', 'ndt', 'ndt', 'tension', 'bends', 'toughness', 'hardness', 'macros'])
    expect(fields({ change0: (block) => { block.process = null } })).toContain('variables.processes.0.process')
    expect(fields({ change0: (block) => { block.filler.classification = null } })).toContain('variables.processes.0.filler.classification')
    expect(fields({ change: (v) => { v.preheat.minimum = null } })).toContain('variables.preheat.minimum')
  })
  test('the coupon\'s own level counts where none is asked; an unknown edition is named', () => {
    expect(qualified(coupon({ level: '1', content: none })).specimens.map(({ kind }) => kind)).toEqual(['visual', 'tension', 'side-bend'])
    expect(qualified(coupon({ level: null })).specimens.length).toBeGreaterThan(5)
  })
})

describe('route by tested consumables', () => {
  const free = (variables: WeldingVariables): void => { Object.assign(variables.preheat, { minimum: null, interpassMaximum: null }); variables.processes[0]!.electrical.heatInput = null }
  const route = (change: (variables: WeldingVariables) => void = () => {}, a: readonly [string, number] = ['1.1', 235]): ReturnType<typeof testedConsumablesRoute> => testedConsumablesRoute(procedure({ a, change: (v) => { free(v); change(v) } }).variables)
  test('is open inside its scope and closed by whatever is specified', () => {
    expect(route().available).toBe('yes')
    expect(route((v) => { v.thickness = interval(3, 41, 'length') }).available).toBe('no')
    expect(route((v) => { v.thickness = interval(3, 21, 'length') }, ['22.1', 100]).available).toBe('no')
    expect(route(undefined, ['1.2', 355]).reasons).toEqual(['group 1.2 is not among 21, 1.1, 8.1, 22.1, 22.2'])
    expect(route((v) => { v.thickness = null }).available).toBe('cannot-tell')
    expect(route((v) => { v.thickness = { min: null, max: null, all: true } }).available).toBe('no')
    expect(route((v) => { v.toughnessRequired = true }).available).toBe('no')
    expect(route((v) => { v.hardnessRequired = null }).available).toBe('cannot-tell')
    expect(route((v) => { v.preheat.minimum = quantity(21, 'temperature') }).available).toBe('no')
    expect(route((v) => { v.preheat.interpassMaximum = quantity(150, 'temperature') }).available).toBe('no')
    expect(route((v) => { v.processes[0]!.electrical.heatInput = interval(1, 2, 'heatInput') }).available).toBe('no')
    expect(route((v) => { v.pwht.condition = null }).available).toBe('cannot-tell')
    expect(route((v) => { v.pwht.condition = 'solution-anneal' }).available).toBe('no')
    expect(route((v) => { v.baseMetals.a.iso15608 = null }).available).toBe('cannot-tell')
    expect(route((v) => { fillet(v); v.joint.filletThroat = interval(0.9, 4, 'length') }).available).toBe('no')
    expect(route((v) => { fillet(v); v.joint.filletThroat = null }).available).toBe('cannot-tell')
    expect(route(fillet).available).toBe('yes')
  })
})
