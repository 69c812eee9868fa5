/** QW-403.9: a pass over 13 mm (1/2 in.), in the coupon or in the procedure, holds the base metal to 1.1 T. */
import { between, closed, UNKNOWN, UNLIMITED } from '../../../ranges/numeric.ts'
import type { NumericRange } from '../../../schemas/assessment.ts'
import { quantity } from '../../../units/convert.ts'
import { figures, single, tidy, unitOf } from '../../common/reading.ts'
import { lackWords } from '../../common/lacking.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { show } from '../../common/wording.ts'
import type { CouponSide, RangeContext, Rule, RuleContext } from '../../rule.ts'
import { meta } from '../meta.ts'
import { couponThickness, FIGURES, hasThickPass, lacksPassThickness, lacksThickness, lengthRange, unknownLength } from '../ranges.ts'
import { askedThickness } from './base-metal-thickness.ts'

/** The thickest base metal asked of either member. */
function askedTop(context: RuleContext): { min: number | null; max: number | null } | null | 'fault' {
  const a = askedThickness(context, 'a')
  const b = askedThickness(context, 'b')
  if (a === null || a === 'fault') return a
  if (b === 'fault') return b
  return { min: 0, max: a.max === null || (b && b.max === null) ? null : Math.max(a.max, b?.max ?? 0) }
}

const passes = (context: RangeContext, side: CouponSide): { coupon: boolean | null; procedure: boolean | null; T: number | null } => {
  const T = couponThickness(side, context.system)
  return {
    T,
    coupon: side.block ? hasThickPass(side.block, context.system, single(side.block.depositThickness, 'length', context.system) ?? T) : null,
    procedure: context.block ? hasThickPass(context.block, context.system, figures(context.block.depositThickness, 'length', context.system).max) : false,
  }
}

const base = figureRule({
  meta: meta('QW-403.9', 'pass-thickness', { combine: 'union' }),
  field: 'maxPassThickness',
  at: 'block',
  label: 'pass thickness',
  dimension: 'length',
  applies: (context) => context.procedure.joint.weld === 'groove',
  asked: askedTop,
  range(context, side) {
    if (side.variables.joint.weld === 'fillet') return null
    const { system } = context
    const unit = unitOf('length', system)
    const limit = show(FIGURES[system].pass, unit)
    const { T, coupon, procedure } = passes(context, side)
    if (T === null) return { range: unknownLength(system), tested: null, reason: `${side.coupon.number} has no single thickness recorded.`, missing: lacksThickness(side) }
    const narrow = tidy(1.1 * T)
    const tested = single({ min: side.block?.maxPassThickness ?? null, max: null, all: false }, 'length', system)
    if (coupon === true || procedure === true) return { range: lengthRange(system, 0, narrow), tested, reason: `${coupon ? `A pass of the coupon is thicker than ${limit}` : `The procedure allows passes thicker than ${limit}`}, so the base metal may be ${show(narrow, unit)} (1.1T) at most.` }
    if (coupon === false && procedure === false) return { range: between('length', unit, closed(0), UNLIMITED), tested, reason: `No pass is thicker than ${limit}, so this clause sets no limit.` }
    const open: NumericRange = { type: 'numeric', dimension: 'length', unit, segments: [{ lower: closed(0), upper: closed(narrow) }, { lower: closed(0), upper: UNKNOWN }] }
    return { range: open, tested, reason: `Whether a pass is thicker than ${limit} isn't recorded; up to ${show(narrow, unit)} (1.1T) it does not matter.`, missing: [...(coupon === null ? [`${side.coupon.number}: maxPassThickness`] : []), ...(procedure === null ? [lacksPassThickness(context)] : [])] }
  },
  how: (context, side) => ({ how: '1.1T, because a pass is thicker than the limit', coupon: `${show(couponThickness(side, context.system) ?? 0, unitOf('length', context.system))} coupon` }),
})

export const passThickness: Rule = {
  ...base,
  check(context, sides, joined) {
    const judged = base.check(context, sides, joined)
    if (!judged || judged.verdict === 'within') return judged
    const { system } = context
    const limit = FIGURES[system].pass
    const unit = unitOf('length', system)
    const field = `${context.path}.maxPassThickness`
    const state = sides.map((side) => passes(context, side))
    const cure = { kind: 'set' as const, label: `Limit passes to ${show(limit, unit)}`, field, value: quantity(limit, 'length', unit) }
    if (judged.verdict === 'outside') {
      const fixes = (judged.fixes ?? []).filter((fix) => fix.kind !== 'set')
      return { ...judged, fixes: state.some((s) => s.coupon === false && s.procedure === true) ? [cure, ...fixes] : fixes }
    }
    if (judged.range === null || judged.asked === null) return judged
    const missing = state.flatMap((s, i) => [...(s.coupon === null && sides[i] ? [`${sides[i].coupon.number}: maxPassThickness`] : []), ...(s.procedure === null ? [`procedure: ${field}`] : [])])
    if (missing.length === 0) return judged
    return {
      ...judged,
      sentence: `Above 1.1 times the coupon thickness it must be known whether any pass is thicker than ${show(limit, unit)}; ${lackWords([...new Set(missing)])}.`,
      missing: [...new Set(missing)],
      fixes: state.some((s) => s.procedure === null) ? [cure, { kind: 'state', label: 'State the maximum pass thickness', field }] : [],
    }
  },
}
