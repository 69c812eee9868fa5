/** 8.3.2: parent thickness of both members (Tables 7 and 8), deposit of each process, fillet throat. */
import { intersectNumeric, outerEnds, unionNumeric, unknownNumeric } from '../../../ranges/numeric.ts'
import type { NumericRange } from '../../../schemas/assessment.ts'
import { askedInterval, hasImpactTests, siFigures, siSingle } from '../../common/iso-names.ts'
import { isStated, tidy } from '../../common/reading.ts'
import { bandRule, type Band } from '../../common/review-band.ts'
import { show } from '../../common/wording.ts'
import type { CouponSide, RangeContext, Rule } from '../../rule.ts'
import { couponLevel, levelOf } from '../levels.ts'
import { meta } from '../meta.ts'
import { askedVariables, depositOf, memberOf, runsOf, testThickness, thickPass, throatOf } from '../sides.ts'
import { buttLevelOne, buttLevelTwo, filletThickness, mm, nothing, throatRange, type Reading } from '../tables.ts'

const unknown = unknownNumeric('length', 'mm')
const IMPACT_CAP = 12

const noThickness = ({ coupon }: CouponSide): Band => ({ sure: nothing, maybe: unknown, tested: null, reason: `${coupon.number} has no thickness recorded.`, missing: [`${coupon.number}: thickness`] })

/** A level 2 coupon keeps its level 2 range at level 1 too, and gains what the level 1 table allows. */
function levelOne(context: RangeContext, side: CouponSide, t: number, two: Reading): Reading {
  const one = buttLevelOne(t, thickPass(side, t))
  if ((couponLevel(side) ?? levelOf(context)) === '1') return one
  return { ...one, how: `${one.how} at level 1, ${two.how} at level 2`, sure: unionNumeric(one.sure, two.sure), maybe: unionNumeric(one.maybe, two.maybe), why: one.why ?? two.why }
}

function levelTwo(side: CouponSide, t: number, missing: string[]): Reading {
  const runs = side.block && runsOf(side.variables, side.block, side.coupon)
  if (runs) return buttLevelTwo(t, runs)
  missing.push(`${side.coupon.number}: technique.passesPerSide`)
  const single = buttLevelTwo(t, 'single')
  const multiple = buttLevelTwo(t, 'multiple')
  return { ...multiple, sure: intersectNumeric(single.sure, multiple.sure), maybe: unionNumeric(single.maybe, multiple.maybe), how: `${single.how} for one run, ${multiple.how} for several`, why: 'Whether the coupon was welded in one run or several isn\'t recorded.' }
}

/** Table 7 for one coupon, with the 12 mm cap where impact values are asked and none were tested. */
export function buttBand(context: RangeContext, side: CouponSide): Band {
  const t = testThickness(side.variables)
  if (t === null) return noThickness(side)
  const missing: string[] = []
  const two = levelTwo(side, t, missing)
  const first = levelOf(context) === '1' ? levelOne(context, side, t, two) : two
  const tested = hasImpactTests(side.coupon.content)
  const band: Band = { sure: first.sure, maybe: first.maybe, tested: t, reason: `t = ${show(t, 'mm')}: ${first.how} by Table 7, level ${levelOf(context)}.`, why: first.why, missing, clause: '8.3.2 Table 7', basis: first.basis }
  if (tested || context.toughness === false) return band
  const cap = mm(null, IMPACT_CAP)
  const top = outerEnds(first.maybe).upper
  if ('value' in top && top.value <= IMPACT_CAP) return band
  band.sure = intersectNumeric(first.sure, cap)
  if (context.toughness === null) return { ...band, why: `Without impact tests the coupon stops at ${IMPACT_CAP} mm where impact values are required, and whether they are isn't stated.`, missing: [...missing, 'procedure: toughnessRequired'] }
  const reason = `${band.reason} Impact values are required and the coupon has none: ${IMPACT_CAP} mm is the most.`
  if (levelOf(context) === '1') return { ...band, reason, why: `Impact values are required and the coupon has none; level 2 then stops at ${IMPACT_CAP} mm, and whether level 1 does is not known here.` }
  return { ...band, maybe: intersectNumeric(first.maybe, cap), reason }
}

/** Table 8 for the material of a fillet; a butt coupon stands with its own thickness. Two test members: what both give is sure. */
function filletBand(context: RangeContext, side: CouponSide): Band {
  if (levelOf(context) === '1') return { sure: mm(null, null), maybe: mm(null, null), tested: siSingle(side.variables.thickness, 'length'), reason: 'Level 1 does not limit the material thickness of fillets.', clause: '8.3.2 Table 8', basis: 'memory' }
  const first = siSingle(side.variables.thickness, 'length')
  const second = isStated(side.variables.thicknessB) ? siSingle(side.variables.thicknessB, 'length') : first
  if (first === null || second === null) return noThickness(side)
  const a = filletThickness(first)
  const b = filletThickness(second)
  const sure = intersectNumeric(a.sure, b.sure)
  const unequal = first === second ? undefined : 'The coupon\'s two members differ; a thickness that only one of them covers must be looked up.'
  return { sure, maybe: unionNumeric(a.maybe, b.maybe), tested: first, reason: `t = ${show(first, 'mm')}${first === second ? '' : ` and ${show(second, 'mm')}`}: ${a.how} by Table 8.`, why: unequal ?? a.why, clause: '8.3.2 Table 8', basis: 'memory' }
}

const FREE_THICKER = 30

function parentBand(context: RangeContext, side: CouponSide, which: 'a' | 'b'): Band | null {
  if (which === 'b' && !isStated(context.procedure?.thicknessB)) return null
  const asked = askedVariables(context, side).joint.weld
  if (asked === 'fillet') return filletBand(context, side)
  if (side.variables.joint.weld === 'fillet') return null
  const band = buttBand(context, side)
  const t = testThickness(side.variables)
  if (memberOf(context.procedure, which) !== 'thick' || t === null || t < FREE_THICKER) return band
  const sets = context.toughness !== false && !hasImpactTests(side.coupon.content)
  if (sets) return band
  return { ...band, sure: mm(null, null), maybe: mm(null, null), reason: `The test piece is ${show(t, 'mm')}, ${FREE_THICKER} mm or more: the thicker member is not limited.`, why: undefined, missing: undefined, basis: 'secondary' }
}

const build = (which: 'a' | 'b'): Rule =>
  bandRule({
    meta: meta(which === 'a' ? 'parent-thickness' : 'parent-thickness-second', {
      title: which === 'a' ? 'Parent material thickness' : 'Parent material thickness, second member',
      clause: '8.3.2',
      basis: 'memory',
      combine: 'union',
      statement: which === 'a' ? 'Butt welds by Table 7: at level 2 by rows of the test thickness for one run or several, at level 1 by wider rows; 12 mm at most where impact values are required and the coupon has none. Fillets by Table 8 at level 2, without limit at level 1.' : 'Of two unequal members the thinner is in range; the thicker too, unless the test piece was 30 mm or more.',
    }),
    field: which === 'a' ? 'thickness' : 'thicknessB',
    at: 'weld',
    label: which === 'a' ? 'parent material thickness' : 'thickness of the second member',
    dimension: 'length',
    applies: which === 'a' ? undefined : (context) => isStated(context.procedure.thicknessB),
    asked: (context) => askedInterval(which === 'a' ? context.procedure.thickness : context.procedure.thicknessB, 'length'),
    band: (context, side) => parentBand(context, side, which),
    plan: (asked) => `A coupon of level 2 whose range holds ${show(asked.min ?? 0, 'mm')} to ${asked.max === null ? 'every thickness' : show(asked.max, 'mm')} (8.3.2).`,
  })

export const parentThickness = build('a')
export const parentThicknessSecond = build('b')

/** Deposit of one process: 2s below 20 mm; from there 2s and the parent's upper limit are two readings. */
function depositBand(context: RangeContext, side: CouponSide): Band | null {
  if (askedVariables(context, side).joint.weld === 'fillet' || side.variables.joint.weld === 'fillet' || !side.block || side.block.filler.added === false) return null
  const s = depositOf(side.variables, side.block)
  if (s === null) return { sure: nothing, maybe: unknown, tested: null, reason: `${side.coupon.number} does not record the deposit of this process.`, missing: [`${side.coupon.number}: depositThickness`] }
  const twice = tidy(2 * s)
  const range = mm(0, twice)
  const base = { tested: s, clause: '8.3.2 Table 7' }
  if (s < 20) return { ...base, sure: range, maybe: range, reason: `s = ${show(s, 'mm')}: up to 2s, ${show(twice, 'mm')}.`, basis: 'secondary' }
  const parent = outerEnds(buttBand({ ...context, toughness: false }, side).maybe).upper
  const top = 'value' in parent ? parent.value : null
  const sure = top === null ? range : mm(0, Math.min(twice, top))
  const maybe: NumericRange = mm(0, top === null ? null : Math.max(twice, top))
  return { ...base, sure, maybe, reason: `s = ${show(s, 'mm')}, 20 mm or more: the upper limit of the parent thickness, which is not confirmed; ${show(Math.min(twice, top ?? twice), 'mm')} is sure.`, basis: 'memory', why: 'From 20 mm deposit the limit is believed to be the parent\'s upper limit, not 2s; look it up.' }
}

export const depositThickness = bandRule({
  meta: meta('deposit-thickness', { title: 'Deposited thickness of each process', clause: '8.3.2 Table 7', basis: 'secondary', combine: 'union', statement: 'Each process may deposit up to twice what it deposited in the coupon, where that was less than 20 mm; from 20 mm the parent thickness limits it. There is no lower limit.' }),
  field: 'depositThickness',
  at: 'block',
  label: 'deposit thickness',
  dimension: 'length',
  applies: (context) => context.procedure.joint.weld === 'groove' && context.block?.filler.added !== false,
  asked(context) {
    const { procedure, block } = context
    const read = siFigures(block?.depositThickness, 'length')
    if (read.fault) return 'fault'
    if (read.all) return { min: 0, max: null }
    const stated = read.max ?? read.min
    if (stated !== null) return { min: 0, max: stated }
    // One process fills the whole joint.
    const whole = procedure.processes.length === 1 ? siFigures(procedure.thickness, 'length') : null
    const top = whole && !whole.fault ? (whole.max ?? whole.min) : null
    return top === null ? null : { min: 0, max: top }
  },
  band: depositBand,
  plan: (asked) => `A coupon in which this process deposits at least half of ${asked.max === null ? 'what is asked' : show(asked.max, 'mm')}.`,
})

function throatBand(context: RangeContext, side: CouponSide): Band | null {
  if (askedVariables(context, side).joint.weld !== 'fillet' || !side.block) return null
  const free = mm(null, null)
  const clause = '8.3.2 Table 8'
  if (levelOf(context) === '1') return { sure: free, maybe: free, tested: null, reason: 'Level 1 does not limit the throat.', clause, basis: 'memory' }
  const runs = runsOf(side.variables, side.block, side.coupon)
  const butt = side.variables.joint.weld === 'groove'
  const own = butt ? null : throatOf(side.variables)
  const a = butt ? depositOf(side.variables, side.block) : own && own !== 'fault' && own.min === own.max ? own.min : null
  if (runs === 'multiple') return { sure: free, maybe: free, tested: a, reason: 'Several runs: the throat is not limited.', clause, basis: 'memory' }
  if (a === null || a <= 0) return { sure: nothing, maybe: unknown, tested: null, reason: `${side.coupon.number} does not record ${butt ? 'its deposit' : 'its throat'}.`, missing: [`${side.coupon.number}: ${butt ? 'depositThickness' : 'joint.filletThroat'}`] }
  const reading = throatRange(a, 'single', siSingle(side.variables.thickness, 'length'))
  const from = butt ? `The deposit of ${show(a, 'mm')} of the butt coupon stands for the throat` : `a = ${show(a, 'mm')}`
  if (runs === null) return { sure: reading.sure, maybe: free, tested: a, reason: `${from}: ${reading.how} for one run; several runs are not limited.`, missing: [`${side.coupon.number}: technique.passesPerSide`], clause, basis: 'memory' }
  return { sure: reading.sure, maybe: reading.maybe, tested: a, reason: `${from}: ${reading.how} by Table 8.`, why: reading.why, clause, basis: 'memory' }
}

export const filletThroat = bandRule({
  meta: meta('fillet-throat', { title: 'Fillet throat', clause: '8.3.2 Table 8', basis: 'memory', combine: 'union', statement: 'At level 2 a single-run fillet covers throats from 0.75 to 1.5 times the tested one; several runs are not limited. A butt coupon stands for the fillet with its deposited thickness. Level 1 does not limit it.' }),
  field: 'joint.filletThroat',
  at: 'weld',
  label: 'fillet throat',
  dimension: 'length',
  applies: (context) => context.procedure.joint.weld === 'fillet',
  asked: (context) => throatOf(context.procedure),
  band: throatBand,
})
