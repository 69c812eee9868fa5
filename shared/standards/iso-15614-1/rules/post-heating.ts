/** 8.4.10: hydrogen release may be added, not left out or reduced. */
import { between, closed, UNLIMITED } from '../../../ranges/numeric.ts'
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { siFigures } from '../../common/iso-names.ts'
import { cannotTell, show } from '../../common/wording.ts'
import type { Rule, RuleVerdict } from '../../rule.ts'
import { meta } from '../meta.ts'

const says = (variables: WeldingVariables): boolean => variables.postHeating !== null && variables.postHeating !== undefined && (variables.postHeating.used !== null || variables.postHeating.temperature !== null || variables.postHeating.time !== null)

/** Judged where either record speaks of it. */
export const postHeating: Rule = {
  meta: meta('post-heating', { title: 'Hydrogen release', clause: '8.4.10', basis: 'read', statement: 'Post-heating for hydrogen release may be added, but not left out, and neither its temperature nor its time reduced.' }),
  field: 'postHeating',
  at: 'weld',
  label: 'Hydrogen release',
  applies: (context) => says(context.procedure) || context.coupons.some((coupon) => says(coupon.content.variables)),
  range: () => null,
  check(context, sides): RuleVerdict | null {
    if (!says(context.procedure) && !sides.some((side) => says(side.variables))) return null
    const own = context.procedure.postHeating
    const verdicts = sides.map((side): RuleVerdict => {
      const had = side.variables.postHeating
      if (!had || had.used === null) return cannotTell(`${side.coupon.number} does not record whether it was post-heated.`, [`${side.coupon.number}: postHeating`])
      if (!had.used) return { verdict: 'within', sentence: `${side.coupon.number} was welded without post-heating, which may be added but is not needed.`, asked: null, range: null }
      if (!own || own.used === null) return cannotTell(`${side.coupon.number} was post-heated; whether the procedure asks for it isn't stated.`, ['procedure: postHeating'])
      if (!own.used) return { verdict: 'outside', sentence: `${side.coupon.number} was post-heated, and the procedure leaves it out.`, asked: ['none'], range: null, fixes: [{ kind: 'plan-coupon', label: 'Weld a coupon without post-heating', requirement: 'A coupon without post-heating.' }] }
      for (const [field, dimension, unit] of [['temperature', 'temperature', '°C'], ['time', 'time', 'min']] as const) {
        const asked = siFigures(own[field], dimension)
        const tested = siFigures(had[field], dimension)
        const low = asked.min ?? asked.max
        const needed = tested.min ?? tested.max
        if (low === null || needed === null) return cannotTell(`The ${field} of post-heating isn't recorded on both sides.`, [`${low === null ? 'procedure' : side.coupon.number}: postHeating.${field}`])
        if (low < needed) return { verdict: 'outside', sentence: `Post-heating ${field} ${show(low, unit)} is below the ${show(needed, unit)} of ${side.coupon.number}.`, asked: { min: low, max: asked.max }, range: between(dimension, unit, closed(needed), UNLIMITED), field: `postHeating.${field}` }
      }
      return { verdict: 'within', sentence: `Post-heating is not less than that of ${side.coupon.number}.`, asked: null, range: null }
    })
    return verdicts.find(({ verdict }) => verdict === 'within') ?? verdicts.find(({ verdict }) => verdict === 'cannot-tell') ?? verdicts[0] ?? null
  },
}
