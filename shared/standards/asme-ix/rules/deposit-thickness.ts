/** QW-404.30: deposited weld metal of each process within the t limit of QW-451. */
import { containsInterval } from '../../../ranges/numeric.ts'
import { figures, single, tidy, unitOf } from '../../common/reading.ts'
import { lackWords, lacksFigure } from '../../common/lacking.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { show } from '../../common/wording.ts'
import type { CouponSide, RangeContext, RuleContext } from '../../rule.ts'
import { meta } from '../meta.ts'
import { baseMetalLimit, couponThickness, depositLimit, FIGURES, isLongitudinal, lacksThickness, lengthRange, rootException, shortCircuitBinds, unknownLength, type Limit } from '../ranges.ts'
import { askedThickness } from './base-metal-thickness.ts'

/** What the procedure asks of the deposit: its largest figure. */
export function askedDeposit(context: RuleContext): { min: number | null; max: number | null } | null | 'fault' {
  const asked = figures(context.block?.depositThickness, 'length', context.system)
  if (asked.fault) return 'fault'
  if (asked.all) return { min: 0, max: null }
  const max = asked.max ?? asked.min
  return max === null ? null : { min: 0, max }
}

/** Limit of one coupon block, short-circuiting and the root exception included; null when T or t isn't recorded. */
export function deposit(context: RangeContext, side: CouponSide): (Limit & { t: number; T: number; reason: string }) | null {
  const { system } = context
  const unit = unitOf('length', system)
  const { block } = side
  const T = couponThickness(side, system)
  const t = single(block?.depositThickness, 'length', system)
  if (!block?.process || T === null || t === null) return null
  const limit: Limit & { t: number; T: number; reason: string } = Object.assign(depositLimit(T, t, block.process, system, isLongitudinal(side)), { t, T, reason: '' })
  const first = `t = ${show(t, unit)} on a coupon of ${show(T, unit)} gives up to ${show(limit.upper ?? 0, unit)} (${limit.how.upper ?? ''}) by ${limit.clause}.`
  if (shortCircuitBinds(context.edition, block) && t < FIGURES[system].pass) {
    const upper = tidy(1.1 * t)
    return { ...limit, upper, how: { lower: null, upper: '1.1t' }, clause: 'QW-404.32', basis: 'secondary', t, T, reason: `${first} Short-circuiting transfer holds it to ${show(upper, unit)} (1.1t) by QW-404.32.` }
  }
  // Beyond the coupon's own base metal range the root exception allows 2t and no more.
  const { procedure } = context
  const twice = 2 * t
  const asked = procedure && (limit.upper ?? 0) > twice ? askedThickness({ procedure, system }, 'a') : null
  if (asked && asked !== 'fault' && rootException(context, side, T)) {
    const own = baseMetalLimit(T, block.process, system)
    if (containsInterval(lengthRange(system, own.lower, own.upper), asked) !== 'within') return { ...limit, upper: twice, how: { lower: null, upper: '2t' }, clause: 'QW-200.4(b)', basis: 'secondary', t, T, reason: `${first} As root layers on thicker metal: ${show(twice, unit)} (2t) by QW-200.4(b).` }
  }
  limit.reason = first
  return limit
}

export const depositThickness = figureRule({
  meta: meta('QW-404.30', 'deposit-thickness', { combine: 'union' }),
  field: 'depositThickness',
  at: 'block',
  label: 'deposit thickness',
  dimension: 'length',
  // An autogenous pass leaves no deposit; fillets from a groove or fillet coupon have no size limit (QW-451.3, QW-451.4).
  applies: (context) => context.procedure.joint.weld === 'groove' && context.block?.filler.added !== false,
  asked: askedDeposit,
  range(context, side) {
    const weld = (context.procedure ?? side.variables).joint.weld
    if (weld === 'fillet' || side.variables.joint.weld === 'fillet' || side.block?.filler.added === false) return null
    const limit = deposit(context, side)
    if (!limit) {
      const missing = [...lacksThickness(side), ...(single(side.block?.depositThickness, 'length', context.system) === null ? [`${side.coupon.number}: ${lacksFigure(side.block?.depositThickness, 'depositThickness')}`] : [])]
      return { range: unknownLength(context.system), tested: null, reason: `${lackWords(missing)}.`, missing }
    }
    return { range: lengthRange(context.system, 0, limit.upper), tested: limit.t, reason: limit.reason, clause: limit.clause, basis: limit.basis }
  },
  how(context, side, end) {
    const limit = deposit(context, side)
    return { how: end === 'upper' ? (limit?.how.upper ?? null) : null, coupon: limit ? `${show(limit.t, unitOf('length', context.system))} deposit` : 'deposit' }
  },
  plan: (asked, context) => `A coupon in which this process deposits enough to qualify ${asked.max === null ? 'every thickness' : show(asked.max, unitOf('length', context.system))} (QW-451.1).`,
})
