/** Row 28: thickness by Tables 6.2, 6.3, 6.4 and 10.9. Position and thickness must be covered together by one test each. */
import { unionAll } from '../../../ranges/span.ts'
import type { Verdict } from '../../../schemas/assessment.ts'
import { figures, isStated, unitOf } from '../../common/reading.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { names, show } from '../../common/wording.ts'
import type { Rule, RuleContext, RuleVerdict } from '../../rule.ts'
import { meta } from '../meta.ts'
import { askedPlaces, coveredPlaces } from '../positions.ts'
import { memberCures } from '../member-cures.ts'
import { thicknessSpan } from '../ranges.ts'

/** Least and greatest thickness of both members. */
function asked(context: RuleContext): { min: number | null; max: number | null } | null | 'fault' {
  const all = [context.procedure.thickness, context.procedure.thicknessB].filter((interval) => isStated(interval)).map((interval) => figures(interval, 'length', context.system))
  if (all.length === 0 || !isStated(context.procedure.thickness)) return null
  if (all.some(({ fault }) => fault)) return 'fault'
  if (all.some((one) => one.all)) return { min: null, max: null }
  return { min: Math.min(...all.map(({ min, max }) => min ?? max ?? 0)), max: Math.max(...all.map(({ min, max }) => max ?? min ?? 0)) }
}

const base = figureRule({
  meta: meta('thickness_diameter', { combine: 'union', title: 'Thickness' }),
  cure: (context, joined) => memberCures(context, joined, 'thickness'),
  field: 'thickness',
  at: 'weld',
  label: 'thickness',
  dimension: 'length',
  asked,
  range(context, side) {
    const span = thicknessSpan(context, side)
    return { range: span.range, tested: span.tested, reason: span.reason, clause: span.clause, basis: span.basis, missing: span.missing }
  },
  how(context, side, end) {
    const span = thicknessSpan(context, side)
    return { how: span.limits?.how[end] ?? null, coupon: `${span.tested === null ? '' : `${show(span.tested, unitOf('length', context.system))} `}test` }
  },
  plan: (wanted, context) => `A test weld whose range holds ${show(wanted.min ?? 0, unitOf('length', context.system))} to ${wanted.max === null ? 'no limit' : show(wanted.max, unitOf('length', context.system))}.`,
})

const RANK: Record<Verdict, number> = { within: 0, 'cannot-tell': 1, outside: 2 }

export const thickness: Rule = {
  ...base,
  check(context, sides, joined) {
    const places = askedPlaces(context.block?.positions ?? [])
    if (sides.length < 2) return base.check(context, sides, joined)
    // A vertical test of thick plate says nothing of thick flat welds: each position is judged by the tests that cover it.
    let worst: RuleVerdict | null = null
    for (const place of places) {
      const own = sides.filter((side) => coveredPlaces(side.block?.positions ?? []).includes(place))
      if (own.length === 0) continue
      const judged = base.check(context, own, unionAll(own.map((side) => thicknessSpan(context, side).range)))
      if (judged && (!worst || RANK[judged.verdict] > RANK[worst.verdict])) worst = judged.verdict === 'within' || places.length < 2 ? judged : { ...judged, sentence: `${judged.sentence} This is for the ${place} position, which only ${names(own)} covers.` }
    }
    return worst ?? base.check(context, sides, joined)
  },
}
