/** QW-403.8: base metal thickness inside the range that QW-451 gives, as narrowed and lifted by the other clauses. */
import { figures, isStated, unitOf } from '../../common/reading.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { show } from '../../common/wording.ts'
import type { Rule, RuleContext } from '../../rule.ts'
import { memberOf, pNumber, secondMetal } from '../members.ts'
import { meta } from '../meta.ts'
import { baseMetalSpan, couponThickness } from '../ranges.ts'

/** What the procedure asks of a member's thickness. */
export function askedThickness(context: Pick<RuleContext, 'procedure' | 'system'>, which: 'a' | 'b'): { min: number | null; max: number | null } | null | 'fault' {
  const interval = which === 'a' ? context.procedure.thickness : context.procedure.thicknessB
  const asked = figures(interval, 'length', context.system)
  if (asked.fault) return 'fault'
  if (asked.all) return { min: null, max: null }
  if (asked.min === null && asked.max === null) return null
  // One figure typed alone is that thickness, not "from there on".
  return { min: asked.min ?? asked.max, max: asked.max ?? asked.min }
}

export const memberP = (context: Pick<RuleContext, 'procedure'> | { procedure: null }, which: 'a' | 'b'): string | null =>
  context.procedure ? pNumber(which === 'a' ? context.procedure.baseMetals.a : secondMetal(context.procedure)) : null

const build = (which: 'a' | 'b', file: string): Rule =>
  figureRule({
    meta: meta('QW-403.8', file, which === 'a' ? { combine: 'union' } : { combine: 'union', title: 'T qualified, second member', clause: 'QW-202.4' }),
    field: which === 'a' ? 'thickness' : 'thicknessB',
    at: 'weld',
    label: which === 'a' ? 'base metal thickness' : 'thickness of the second member',
    dimension: 'length',
    applies: which === 'a' ? undefined : (context) => isStated(context.procedure.thicknessB),
    asked: (context) => askedThickness(context, which),
    range(context, side) {
      if (which === 'b' && !isStated(context.procedure?.thicknessB)) return null
      if (context.procedure?.joint.weld === 'groove' && side.variables.joint.weld === 'fillet') return null
      const span = baseMetalSpan(context, side, memberOf(context, which), memberP(context, which))
      return { range: span.range, tested: span.tested, reason: span.reason, clause: span.clause, basis: span.basis, missing: span.missing }
    },
    how(context, side, end) {
      const span = baseMetalSpan(context, side, memberOf(context, which), memberP(context, which))
      const T = couponThickness(side, context.system, memberP(context, which))
      return { how: span.how[end], coupon: T === null ? 'coupon' : `${show(T, unitOf('length', context.system))} coupon` }
    },
    plan: (asked, context) => `A groove coupon whose range holds ${show(asked.min ?? 0, unitOf('length', context.system))} to ${asked.max === null ? 'no limit' : show(asked.max, unitOf('length', context.system))} (QW-451.1).`,
  })

export const baseMetalThickness = build('a', 'base-metal-thickness')
export const baseMetalThicknessB = build('b', 'base-metal-thickness-second')
