/** QW-403.9: above 1.1 T of base metal no pass, of the coupon or of the procedure, may be thicker than 13 mm (1/2 in.). */
import { between, closed, isCertain, numericRange, UNLIMITED } from '../../../ranges/numeric.ts'
import type { NumericRange, QualifiedSpan } from '../../../schemas/assessment.ts'
import { quantity } from '../../../units/convert.ts'
import { figureOrNull, figures, single, tidy, unitOf } from '../../common/reading.ts'
import { lackWords } from '../../common/lacking.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { cannotTell, capital, list, names, show, stateFix } from '../../common/wording.ts'
import type { CouponSide, RangeContext, Rule, RuleContext, RuleVerdict } from '../../rule.ts'
import { meta } from '../meta.ts'
import { couponThickness, FIGURES, hasThickPass, lacksPassThickness, lacksThickness, unknownLength } from '../ranges.ts'
import { askedThickness } from './base-metal-thickness.ts'

/** The thickest base metal asked of either member: Infinity = no limit, null = not stated or contradictory. */
function askedTop(context: Pick<RuleContext, 'procedure' | 'system'>): number | null {
  let top = 0
  for (const which of ['a', 'b'] as const) {
    const asked = askedThickness(context, which)
    if (asked === 'fault' || (asked === null && which === 'a')) return null
    if (asked) top = Math.max(top, asked.max ?? Infinity)
  }
  return top
}

/** Whether a pass of the coupon was over the limit; null = not known. */
const couponThick = (context: RangeContext, side: CouponSide, T: number | null): boolean | null =>
  side.block ? hasThickPass(side.block, context.system, single(side.block.depositThickness, 'length', context.system) ?? T) : null

/** The thickest pass that the procedure allows: the one stated, else the whole deposit where that is no thicker than the limit. */
function askedPass({ block, system }: RuleContext): number | null {
  if (!block) return null
  const stated = figureOrNull(block.maxPassThickness, 'length', system)
  if (stated !== null && stated >= 0) return stated
  const { max } = figures(block.depositThickness, 'length', system)
  return max !== null && max <= FIGURES[system].pass ? max : null
}

const anyPass = (unit: string): NumericRange => between('length', unit, closed(0), UNLIMITED)

/** Passes of every thickness are surely covered. */
const isFree = (span: QualifiedSpan | null): boolean => span?.type === 'numeric' && span.segments.some((segment) => isCertain(segment) && segment.upper.kind === 'unlimited')

const base = figureRule({
  meta: meta('QW-403.9', 'pass-thickness', { combine: 'union' }),
  field: 'maxPassThickness',
  at: 'block',
  label: 'pass thickness',
  dimension: 'length',
  ends: { min: '', max: '' },
  applies: (context) => context.procedure.joint.weld === 'groove',
  asked(context) {
    const pass = askedPass(context)
    return pass === null ? null : { min: 0, max: pass }
  },
  range(context, side) {
    if (side.variables.joint.weld === 'fillet') return null
    const { system, procedure } = context
    const unit = unitOf('length', system)
    const { pass } = FIGURES[system]
    const T = couponThickness(side, system)
    if (T === null) return { range: unknownLength(system), tested: null, reason: `${side.coupon.number} has no single thickness recorded.`, missing: lacksThickness(side) }
    const narrow = tidy(1.1 * T)
    const tested = figureOrNull(side.block?.maxPassThickness, 'length', system)
    const top = procedure ? askedTop({ procedure, system }) : null
    if (top !== null && top <= narrow) return { range: anyPass(unit), tested, reason: `Up to ${show(narrow, unit)} (1.1T) of base metal a pass may be of any thickness.` }
    const thick = couponThick(context, side, T)
    if (thick === null) return { range: unknownLength(system), tested, reason: `Whether a pass was thicker than ${show(pass, unit)} isn't recorded; up to ${show(narrow, unit)} (1.1T) of base metal it does not matter.`, missing: [`${side.coupon.number}: maxPassThickness`] }
    if (!thick) return { range: between('length', unit, closed(0), closed(pass)), tested, reason: `No pass was thicker than ${show(pass, unit)}, so on base metal above ${show(narrow, unit)} (1.1T) none may be.` }
    return procedure
      ? { range: numericRange('length', unit, []), tested, reason: `A pass was thicker than ${show(pass, unit)}, so base metal above ${show(narrow, unit)} (1.1T) is not covered, however thin the passes are.` }
      : { range: anyPass(unit), tested, reason: `A pass was thicker than ${show(pass, unit)}: passes may be of any thickness, but the base metal is ${show(narrow, unit)} (1.1T) at most.` }
  },
  plan: (asked, context) => `A coupon so thick that the base metal stays inside 1.1T, or one welded without passes over ${show(FIGURES[context.system].pass, unitOf('length', context.system))}.`,
})

export const passThickness: Rule = {
  ...base,
  check(context, sides, joined) {
    if (context.procedure.joint.weld !== 'groove' || joined?.type !== 'numeric' || !context.block) return null
    const { system } = context
    const unit = unitOf('length', system)
    const limit = FIGURES[system].pass
    const pass = askedPass(context)
    const asked = pass === null ? null : { min: 0, max: pass }
    if (isFree(joined)) return { verdict: 'within', sentence: `The base metal stays inside 1.1 times the thickness of ${names(sides)}, where a pass may be of any thickness.`, asked, range: joined }
    const top = askedTop(context)
    const field = `${context.path}.maxPassThickness`
    const stateThickness = (): RuleVerdict => cannotTell(`Whether passes over ${show(limit, unit)} are allowed depends on the base metal thickness, which isn't stated without contradiction.`, ['procedure: thickness'], { asked, range: joined, field: 'thickness', fixes: [stateFix('base metal thickness', 'thickness')] })
    if (pass !== null && top === null && pass > limit) return stateThickness()
    const missing = [...(pass === null ? [lacksPassThickness(context)] : []), ...sides.flatMap((side) => (couponThick(context, side, couponThickness(side, system)) === null ? [`${side.coupon.number}: maxPassThickness`] : []))]
    if (joined.segments.length === 0) {
      return top === null ? stateThickness() : {
        verdict: 'outside',
        sentence: `${capital(list(sides.map((side) => `a pass of ${side.coupon.number}`)))} was thicker than ${show(limit, unit)}, so base metal above 1.1 times the coupon's thickness is not covered, however thin the passes are.`,
        asked,
        range: joined,
        fixes: [{ kind: 'plan-coupon', label: 'Weld a coupon with thinner passes', requirement: `A coupon welded without passes over ${show(limit, unit)} (QW-403.9).` }],
      }
    }
    const judged = asked && base.check(context, sides, joined)
    if (judged && judged.verdict !== 'cannot-tell') return judged
    if (missing.length === 0) return judged
    const cure = { kind: 'set' as const, label: `Limit passes to ${show(limit, unit)}`, field, value: quantity(limit, 'length', unit) }
    return cannotTell(`Above 1.1 times the coupon thickness it must be known whether any pass is thicker than ${show(limit, unit)}; ${lackWords([...new Set(missing)])}.`, [...new Set(missing)], { asked, range: joined, fixes: pass === null ? [cure, { kind: 'state', label: 'State the maximum pass thickness', field }] : [] })
  },
}
