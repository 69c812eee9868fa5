/** Variables whose limits aren't confirmed: what was tested covers itself, anything else can't be told. */
import { closed, numericRange, UNKNOWN, unknownNumeric } from '../../ranges/numeric.ts'
import { setRange } from '../../ranges/set.ts'
import type { Dimension, UnitSystem } from '../../units/types.ts'
import { unitOf } from '../common/reading.ts'
import { figureRule, namedRule, type NamedSpec } from '../common/rule-kinds.ts'
import { names, show } from '../common/wording.ts'
import type { CouponSide, Rule, RuleContext, RuleMeta } from '../rule.ts'

export interface UnconfirmedFigure {
  meta: RuleMeta
  field: string
  at: 'weld' | 'block'
  label: string
  dimension: Dimension
  ends?: { min: string; max: string }
  applies?: (context: RuleContext) => boolean
  asked: (context: RuleContext) => { min: number | null; max: number | null } | null | 'fault'
  /** What the coupon had; null = not recorded, undefined = the variable does not arise on it. */
  tested: (side: CouponSide, system: UnitSystem) => { min: number; max: number } | null | undefined
}

/** A figure of which only the tested value is sure. */
export function unconfirmedFigure(spec: UnconfirmedFigure): Rule {
  const base = figureRule({
    ...spec,
    range(context, side) {
      const unit = unitOf(spec.dimension, context.system)
      const had = spec.tested(side, context.system)
      if (had === undefined) return null
      if (had === null) return { range: unknownNumeric(spec.dimension, unit), tested: null, reason: `${side.coupon.number} does not record the ${spec.label}.`, missing: [`${side.coupon.number}: ${spec.field}`] }
      const shown = had.min === had.max ? show(had.min, unit) : `${show(had.min, unit)} to ${show(had.max, unit)}`
      return { range: numericRange(spec.dimension, unit, [{ lower: closed(had.min), upper: closed(had.max) }, { lower: UNKNOWN, upper: UNKNOWN }]), tested: had.min === had.max ? had.min : null, reason: `${shown} was tested; how far it may change is not confirmed.` }
    },
  })
  return {
    ...base,
    check(context, sides, joined) {
      const judged = base.check(context, sides, joined)
      if (judged?.verdict !== 'cannot-tell' || judged.asked === null || sides.some((side) => spec.tested(side, context.system) === null)) return judged
      return { ...judged, sentence: `The ${spec.label} is not that of ${names(sides)}, and how far it may change is not confirmed here; look it up in your edition.`, missing: [`the figure of ${spec.meta.clause} for ${spec.label}`] }
    },
  }
}

/** A name of which only the tested value is sure. */
export function unconfirmedName(spec: NamedSpec): Rule {
  const base = namedRule(spec)
  return {
    ...base,
    range(context, side) {
      const range = base.range(context, side)
      return range?.range.type === 'set' ? { ...range, range: setRange(range.range.values, { unknown: true }) } : range
    },
    check(context, sides, joined) {
      const judged = base.check(context, sides, joined)
      if (judged?.verdict !== 'cannot-tell' || judged.asked === null || sides.some((side) => spec.tested(context, side) === null)) return judged
      return { ...judged, sentence: `The ${spec.label} is not that of ${names(sides)}, and what a test covers besides itself is not confirmed here; look it up in your edition.`, missing: [`what ${spec.meta.clause} gives for ${spec.label}`] }
    },
  }
}
