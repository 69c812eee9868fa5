/** 8.3.3: outside diameter of pipes (Table 9) and what a plate coupon covers of pipe. */
import { numericRange, open, UNLIMITED, unknownNumeric } from '../../../ranges/numeric.ts'
import type { NumericRange } from '../../../schemas/assessment.ts'
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { askedInterval, siSingle } from '../../common/iso-names.ts'
import { isStated } from '../../common/reading.ts'
import { bandRule, type Band } from '../../common/review-band.ts'
import { show } from '../../common/wording.ts'
import type { CouponSide, RangeContext, Rule } from '../../rule.ts'
import { freeAtLevelOne, levelOf } from '../levels.ts'
import { meta } from '../meta.ts'
import { diameterRange, mm, nothing } from '../tables.ts'

const above = (D: number): NumericRange => numericRange('length', 'mm', [{ lower: open(D), upper: UNLIMITED }])
const ROTATED = /^(?:1G|1F|2G|2F)$/

/** Whether the procedure turns its pipe in a position for which a smaller pipe is released: null = not recorded. */
function rotated(procedure: WeldingVariables): 'yes' | 'no' | 'review' | null {
  const positions = procedure.processes.flatMap((block) => block.positions)
  if (positions.length === 0) return null
  if (procedure.pipeRotated === false) return 'no'
  const flat = positions.every((position) => position === '1G' || position === '1F')
  if (procedure.pipeRotated === null || procedure.pipeRotated === undefined) return flat ? 'yes' : positions.every((position) => ROTATED.test(position)) ? null : 'no'
  return positions.every((position) => ROTATED.test(position)) ? 'yes' : 'review'
}

function plateBand(context: RangeContext, side: CouponSide): Band {
  const big = above(500)
  const small = above(150)
  const base = { clause: '8.3.3', basis: 'memory' as const }
  const turned = context.procedure ? rotated(context.procedure) : 'no'
  if (turned === 'yes') return { ...base, tested: null, sure: small, maybe: small, reason: `${side.coupon.number} is plate; pipe that turns in PA or PC is covered above 150 mm.` }
  if (turned === 'no') return { ...base, tested: null, sure: big, maybe: big, reason: `${side.coupon.number} is plate; fixed pipe is covered above 500 mm.` }
  if (turned === 'review') return { ...base, tested: null, sure: big, maybe: small, reason: `${side.coupon.number} is plate; pipe is covered above 500 mm.`, why: 'From 150 mm pipe that turns is covered in PA and PC; whether other positions are is not confirmed.' }
  return { ...base, tested: null, sure: big, maybe: small, reason: `${side.coupon.number} is plate; pipe is covered above 500 mm, above 150 mm where it turns in PA or PC.`, missing: ['procedure: pipeRotated'] }
}

function diameterBand(context: RangeContext, side: CouponSide, which: 'a' | 'b'): Band | null {
  if (levelOf(context) === '1') return { sure: mm(null, null), maybe: mm(null, null), tested: siSingle(side.variables.diameter, 'length'), reason: 'Level 1 does not limit the diameter.', clause: '8.3.3', basis: 'memory' }
  if (context.procedure?.product === 'plate') return null
  if (side.variables.product === 'plate') return context.procedure ? plateBand(context, side) : { ...plateBand(context, side), reason: `${side.coupon.number} is plate; pipe is covered above 500 mm, above 150 mm where it turns in PA or PC.` }
  const field = which === 'b' && isStated(side.variables.diameterB) ? 'diameterB' : 'diameter'
  const D = siSingle(side.variables[field], 'length')
  if (D === null) return { sure: nothing, maybe: unknownNumeric('length', 'mm'), tested: null, reason: `${side.coupon.number} does not record its diameter.`, missing: [`${side.coupon.number}: ${field}`] }
  const reading = diameterRange(D)
  return { sure: reading.sure, maybe: reading.maybe, tested: D, reason: `D = ${show(D, 'mm')}: ${reading.how} by Table 9.`, why: reading.why, clause: '8.3.3 Table 9', basis: reading.basis }
}

/** The rule for one of the two members. */
export const diameterRule = (which: 'a' | 'b'): Rule => {
  const rule = bandRule({
    meta: meta(which === 'a' ? 'diameter' : 'diameter-second', { title: which === 'a' ? 'Outside diameter' : 'Outside diameter of member B', clause: '8.3.3', basis: 'secondary', combine: 'union', statement: which === 'a' ? 'At level 2 a pipe covers half its diameter and up; where the edition of 2004 is narrower (at least 25 mm, and up to 25 mm at most twice the diameter) the figure must be looked up. Plate covers pipe above 500 mm, above 150 mm where it turns in PA or PC; pipe covers plate. Of a hollow section that is not round the smaller side counts. Level 1 does not limit it.' : 'Branch and run pipe are each judged by their own diameter.' }),
    field: which === 'a' ? 'diameter' : 'diameterB',
    at: 'weld',
    label: which === 'a' ? 'outside diameter' : 'outside diameter of member B',
    dimension: 'length',
    applies: (context) => context.procedure.product !== 'plate' && (which === 'a' || isStated(context.procedure.diameterB)),
    asked: (context) => askedInterval(which === 'a' ? context.procedure.diameter : context.procedure.diameterB, 'length'),
    band: (context, side) => (which === 'b' && !isStated((context.procedure ?? side.variables).diameterB) ? null : diameterBand(context, side, which)),
    plan: (asked) => `A pipe coupon of at most ${asked.min === null ? 'the least diameter asked' : show(asked.min * 2, 'mm')} diameter.`,
  })
  return freeAtLevelOne(rule, (context) => !isStated(which === 'a' ? context.procedure.diameter : context.procedure.diameterB))
}

export const diameter = diameterRule('a')
