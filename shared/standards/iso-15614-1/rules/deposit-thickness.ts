/** 8.3.2: deposit of each process. */
import { outerEnds } from '../../../ranges/numeric.ts'
import type { NumericRange } from '../../../schemas/assessment.ts'
import { siFigures } from '../../common/iso-names.ts'
import { tidy } from '../../common/reading.ts'
import { bandRule, type Band } from '../../common/review-band.ts'
import { show } from '../../common/wording.ts'
import type { CouponSide, RangeContext } from '../../rule.ts'
import { meta } from '../meta.ts'
import { askedVariables, depositOf } from '../sides.ts'
import { mm, nothing } from '../tables.ts'
import { unknown, buttBand } from '../thickness-bands.ts'

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
