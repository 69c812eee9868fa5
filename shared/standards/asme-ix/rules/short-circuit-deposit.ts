/** QW-404.32, editions to 2019: a short-circuiting deposit under 13 mm (1/2 in.) holds the deposit to 1.1 t. */
import { single, tidy, unitOf } from '../../common/reading.ts'
import { lacksFigure } from '../../common/lacking.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { show } from '../../common/wording.ts'
import { meta } from '../meta.ts'
import { FIGURES, lengthRange, shortCircuitBinds, unknownLength } from '../ranges.ts'
import { askedDeposit } from './deposit-thickness.ts'

export const shortCircuitDeposit = figureRule({
  meta: meta('QW-404.32', 'short-circuit-deposit', { combine: 'union' }),
  field: 'depositThickness',
  at: 'block',
  label: 'deposit thickness',
  dimension: 'length',
  applies: (context) => context.procedure.joint.weld === 'groove' && context.block?.electrical.transferMode === 'short-circuiting',
  asked: askedDeposit,
  range(context, side) {
    if (!side.block || !shortCircuitBinds(context.edition, side.block)) return null
    const { system } = context
    const unit = unitOf('length', system)
    const t = single(side.block.depositThickness, 'length', system)
    if (t === null) return { range: unknownLength(system), tested: null, reason: `${side.coupon.number} has no single deposit thickness recorded.`, missing: [`${side.coupon.number}: ${lacksFigure(side.block.depositThickness, 'depositThickness')}`] }
    const limit = show(FIGURES[system].pass, unit)
    if (t >= FIGURES[system].pass) return { range: lengthRange(system, 0, null), tested: t, reason: `A deposit of ${limit} or more has no limit by this clause.` }
    return { range: lengthRange(system, 0, tidy(1.1 * t)), tested: t, reason: `Short-circuiting deposit under ${limit}: ${show(tidy(1.1 * t), unit)} (1.1t) at most.` }
  },
  how: (context, side) => ({ how: '1.1t, short-circuiting', coupon: `${show(single(side.block?.depositThickness, 'length', context.system) ?? 0, unitOf('length', context.system))} deposit` }),
})
