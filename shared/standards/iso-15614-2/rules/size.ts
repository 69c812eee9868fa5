/** 8.3.2 and 8.3.3: thickness of both members, deposit where processes are combined, throat, diameter. */
import { unknownNumeric } from '../../../ranges/numeric.ts'
import { askedInterval, siFigures, siSingle } from '../../common/iso-names.ts'
import { isStated } from '../../common/reading.ts'
import { bandRule, type Band } from '../../common/review-band.ts'
import { show } from '../../common/wording.ts'
import type { CouponSide, RangeContext, Rule } from '../../rule.ts'
import { meta } from '../meta.ts'
import { buttThickness, diameter as diameterRange, mm, nothing, throat, type Reading } from '../tables.ts'

const unknown = unknownNumeric('length', 'mm')
const lacks = (side: CouponSide, field: string): Band => ({ sure: nothing, maybe: unknown, tested: null, reason: `${side.coupon.number} does not record it.`, missing: [`${side.coupon.number}: ${field}`] })
const band = (tested: number, symbol: string, reading: Reading): Band => ({ sure: reading.sure, maybe: reading.maybe, tested, reason: `${symbol} = ${show(tested, 'mm')}: ${reading.how}.`, why: reading.why })
const weldAsked = (context: RangeContext, side: CouponSide): string => (context.procedure ?? side.variables).joint.weld

function thicknessBand(context: RangeContext, side: CouponSide): Band | null {
  const t = siSingle(side.variables.thickness, 'length')
  const second = isStated(side.variables.thicknessB) ? siSingle(side.variables.thicknessB, 'length') : t
  if (t === null || second === null) return lacks(side, 'thickness')
  if (side.variables.joint.weld === 'fillet' && weldAsked(context, side) === 'groove') return null
  const thinner = Math.min(t, second)
  const runs = side.variables.processes.length > 1 ? 'multiple' : (side.block?.technique.passesPerSide ?? null)
  const reading = buttThickness(thinner, runs)
  // For the material of a fillet no table is held: the tested thickness alone is sure.
  if (weldAsked(context, side) === 'fillet') return { ...band(thinner, 't', reading), sure: mm(thinner, thinner), maybe: mm(null, null), reason: `t = ${show(thinner, 'mm')}; the table for fillets is not held here.`, why: 'Which material thickness a fillet covers is not held here.' }
  return band(thinner, 't', reading)
}

const thickness = (which: 'thickness' | 'thicknessB'): Rule =>
  bandRule({
    meta: meta(which === 'thickness' ? 'parent-thickness' : 'parent-thickness-second', { title: which === 'thickness' ? 'Parent material thickness' : 'Parent material thickness, second member', clause: '8.3.2', combine: 'union', statement: 'Butt welds: up to 3 mm 0.5t to 2t, up to 20 mm 3 mm to 2t, above that 0.8t and up, as recalled; where EN 288-4 is narrower, by single or several runs, the rest must be looked up. Both of two members are in range.' }),
    field: which,
    at: 'weld',
    label: which === 'thickness' ? 'parent material thickness' : 'thickness of the second member',
    dimension: 'length',
    applies: which === 'thickness' ? undefined : (context) => isStated(context.procedure.thicknessB),
    asked: (context) => askedInterval(context.procedure[which], 'length'),
    band: (context, side) => (which === 'thicknessB' && !isStated(context.procedure?.thicknessB) ? null : thicknessBand(context, side)),
  })

export const parentThickness = thickness('thickness')
export const parentThicknessSecond = thickness('thicknessB')

export const depositThickness = bandRule({
  meta: meta('deposit-thickness', { title: 'Deposited thickness of each process', clause: '8.3.2', combine: 'union', statement: 'Where several processes share a joint, up to what each deposited on the coupon is sure; the rule for more is not held here.' }),
  field: 'depositThickness',
  at: 'block',
  label: 'deposit thickness',
  dimension: 'length',
  applies: (context) => context.procedure.joint.weld === 'groove' && context.procedure.processes.length > 1,
  asked(context) {
    const read = siFigures(context.block?.depositThickness, 'length')
    if (read.fault) return 'fault'
    const top = read.max ?? read.min
    return read.all ? { min: 0, max: null } : top === null ? null : { min: 0, max: top }
  },
  band(context, side) {
    if (!context.procedure || !side.block || side.variables.joint.weld === 'fillet') return null
    const s = siSingle(side.block.depositThickness, 'length') ?? (side.variables.processes.length === 1 ? siSingle(side.variables.thickness, 'length') : null)
    return s === null ? lacks(side, 'depositThickness') : { sure: mm(0, s), maybe: mm(0, null), tested: s, reason: `s = ${show(s, 'mm')} was deposited.`, why: 'How far a deposit may exceed the tested one is not held here.' }
  },
})

/** Throat stated, or leg ÷ √2 of an equal-leg fillet. */
function throats(variables: RangeContext['procedure']): { min: number | null; max: number | null } | null | 'fault' {
  const own = askedInterval(variables?.joint.filletThroat, 'length')
  if (own !== null) return own
  const leg = askedInterval(variables?.joint.filletLeg, 'length')
  const of = (value: number | null): number | null => (value === null ? null : Math.round(value * Math.SQRT1_2 * 1000) / 1000)
  return leg === null || leg === 'fault' ? leg : { min: of(leg.min), max: of(leg.max) }
}

export const filletThroat = bandRule({
  meta: meta('fillet-throat', { title: 'Fillet throat', clause: '8.3.2', combine: 'union', statement: 'Below 10 mm 0.75 to 1.5 times the tested throat; from 10 mm, 10 mm and up is sure, down to 7.5 mm must be looked up.' }),
  field: 'joint.filletThroat',
  at: 'weld',
  label: 'fillet throat',
  dimension: 'length',
  applies: (context) => context.procedure.joint.weld === 'fillet',
  asked: (context) => throats(context.procedure),
  band(context, side) {
    if (weldAsked(context, side) !== 'fillet') return null
    if (side.variables.joint.weld === 'groove') return { sure: nothing, maybe: mm(null, null), tested: null, reason: `${side.coupon.number} is a butt; its fillet range is not held here.`, why: 'Which throats a butt coupon covers is not held here.' }
    const own = throats(side.variables)
    if (own === null || own === 'fault' || own.min === null || own.min !== own.max || own.min <= 0) return lacks(side, 'joint.filletThroat')
    return band(own.min, 'a', throat(own.min))
  },
})

export const diameter = bandRule({
  meta: meta('diameter', { title: 'Outside diameter', clause: '8.3.3', combine: 'union', statement: 'Up to 25 mm 0.5D to 2D, above that 0.5D (at least 25 mm) and up, as recalled; EN 288-4 stops at 2D below 168.3 mm, so beyond that it must be looked up. What plate covers of pipe is not held here.' }),
  field: 'diameter',
  at: 'weld',
  label: 'outside diameter',
  dimension: 'length',
  applies: (context) => context.procedure.product !== 'plate',
  asked: (context) => askedInterval(context.procedure.diameter, 'length'),
  band(context, side) {
    if (context.procedure?.product === 'plate') return null
    if (side.variables.product === 'plate') return context.procedure ? { sure: nothing, maybe: mm(null, null), tested: null, reason: `${side.coupon.number} is plate; what it covers of pipe is not held here.`, why: 'What a plate coupon covers of pipe is not held here.' } : null
    const D = siSingle(side.variables.diameter, 'length')
    return D === null || D <= 0 ? lacks(side, 'diameter') : band(D, 'D', diameterRange(D))
  },
})
