/** QW-403.6: with toughness the base metal may not be thinner than the floor that the toughness coupon's thickness gives. */
import { intersectNumeric, numericRange, unionNumeric } from '../../../ranges/numeric.ts'
import type { NumericRange } from '../../../schemas/assessment.ts'
import { isStated, unitOf } from '../../common/reading.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { show } from '../../common/wording.ts'
import type { CouponSide, RangeContext, Rule, RuleRange } from '../../rule.ts'
import { memberOf } from '../members.ts'
import { unlessHeatTreated } from '../heat-treated.ts'
import { meta } from '../meta.ts'
import { baseMetalSpan, couponThickness, exemptByHeatTreatment, lacksThickness, lengthRange, toughnessFloor, unknownLength, withFloor } from '../ranges.ts'
import { askedThickness, memberP } from './base-metal-thickness.ts'

const floorOf = (context: RangeContext, side: CouponSide, which: 'a' | 'b'): { floor: number | null; T: number | null } => {
  const T = couponThickness(side, context.system, memberP(context, which))
  if (T === null) return { floor: null, T }
  return { floor: exemptByHeatTreatment(side.variables) === true ? 0 : toughnessFloor(T, context.system), T }
}

function rangeFor(context: RangeContext, side: CouponSide, which: 'a' | 'b'): RuleRange | null {
  if ((context.procedure ?? side.variables).joint.weld === 'fillet' || side.variables.joint.weld === 'fillet') return null
  if (which === 'b' && !isStated(context.procedure?.thicknessB)) return null
  const { system } = context
  const unit = unitOf('length', system)
  const { floor, T } = floorOf(context, side, which)
  if (floor === null || T === null) return { range: unknownLength(system), tested: null, reason: `${side.coupon.number} has no single thickness recorded.`, missing: lacksThickness(side) }
  const reason = floor === 0 ? 'The heat treatment after welding takes away the toughness floor.' : `With toughness a ${show(T, unit)} coupon covers no metal under ${show(floor, unit)}.`
  if (side.role === 'toughness-only') return { range: lengthRange(system, floor, null), tested: T, reason }
  const span = baseMetalSpan(context, side, memberOf(context, which), memberP(context, which))
  if (side.role === 'mechanical' && context.toughness === true) return { range: span.range, tested: T, reason: `${side.coupon.number} carries no toughness tests; its range counts together with a toughness coupon's floor.`, missing: span.missing }
  return { range: withFloor(system, span.range, floor === 0 ? null : floor), tested: T, reason, missing: span.missing }
}

/** Full records stand alone; a mechanical record and a toughness record pair up (QW-401.1): maximum of the one, greater minimum of both. */
function join(which: 'a' | 'b', context: RangeContext, sides: readonly CouponSide[], ranges: readonly (RuleRange | null)[]): NumericRange | null {
  const parts: NumericRange[] = []
  for (const [i, side] of sides.entries()) {
    const own = ranges[i]?.range
    if (own?.type !== 'numeric') continue
    if (side.role === 'full' || context.toughness !== true) parts.push(own)
    if (side.role !== 'mechanical' || context.toughness !== true) continue
    for (const tough of sides) {
      const floor = tough.role === 'mechanical' ? null : floorOf(context, tough, which).floor
      if (floor !== null) parts.push(intersectNumeric(own, lengthRange(context.system, floor, null)))
    }
  }
  const [first, ...more] = parts
  if (first) return more.reduce((joined, part) => unionNumeric(joined, part), first)
  return ranges.some((range) => range) ? numericRange('length', unitOf('length', context.system), []) : null
}

const build = (which: 'a' | 'b', file: string): Rule =>
  unlessHeatTreated(figureRule({
    meta: meta('QW-403.6', file, { combine: 'union', ...(which === 'b' ? { title: 'Minimum T with toughness, second member' } : {}) }),
    field: which === 'a' ? 'thickness' : 'thicknessB',
    at: 'weld',
    label: which === 'a' ? 'base metal thickness' : 'thickness of the second member',
    dimension: 'length',
    applies: (context) => context.procedure.joint.weld === 'groove' && (which === 'a' || isStated(context.procedure.thicknessB)),
    asked: (context) => askedThickness(context, which),
    range: (context, side) => rangeFor(context, side, which),
    join: (context, sides, ranges) => join(which, context, sides, ranges),
    how(context, side, end) {
      const { T } = floorOf(context, side, which)
      return { how: end === 'lower' ? 'with toughness' : null, coupon: T === null ? 'coupon' : `${show(T, unitOf('length', context.system))} coupon` }
    },
  }))

export const toughnessThickness = build('a', 'toughness-thickness')
export const toughnessThicknessB = build('b', 'toughness-thickness-second')
