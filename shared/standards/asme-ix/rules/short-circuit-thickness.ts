/** QW-403.10, editions to 2019: a short-circuiting coupon under 13 mm (1/2 in.) holds the base metal to 1.1 T. */
import { tidy, unitOf } from '../../common/reading.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { show } from '../../common/wording.ts'
import { meta } from '../meta.ts'
import { couponThickness, FIGURES, lacksThickness, lengthRange, shortCircuitBinds, unknownLength } from '../ranges.ts'
import { askedThickness } from './base-metal-thickness.ts'

export const shortCircuitThickness = figureRule({
  meta: meta('QW-403.10', 'short-circuit-thickness', { combine: 'union' }),
  field: 'thickness',
  at: 'weld',
  label: 'base metal thickness',
  dimension: 'length',
  applies: (context) => context.procedure.joint.weld === 'groove' && context.block?.electrical.transferMode === 'short-circuiting',
  asked(context) {
    const asked = askedThickness(context, 'a')
    return asked === null || asked === 'fault' ? asked : { min: 0, max: asked.max }
  },
  range(context, side) {
    if (!side.block || !shortCircuitBinds(context.edition, side.block)) return null
    const { system } = context
    const unit = unitOf('length', system)
    const T = couponThickness(side, system)
    if (T === null) return { range: unknownLength(system), tested: null, reason: `${side.coupon.number} has no single thickness recorded.`, missing: lacksThickness(side) }
    const limit = show(FIGURES[system].pass, unit)
    if (T >= FIGURES[system].pass) return { range: lengthRange(system, 0, null), tested: T, reason: `A coupon of ${limit} or more has no limit by this clause.` }
    return { range: lengthRange(system, 0, tidy(1.1 * T)), tested: T, reason: `Short-circuiting transfer on a coupon under ${limit}: ${show(tidy(1.1 * T), unit)} (1.1T) at most.` }
  },
  how: (context, side) => ({ how: '1.1T, short-circuiting', coupon: `${show(couponThickness(side, context.system) ?? 0, unitOf('length', context.system))} coupon` }),
})
