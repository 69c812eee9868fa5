/** QW-407.2: with toughness, the coupon had the temperature range and at least 80 % of the production time at temperature. */
import { between, closed, containsInterval, UNLIMITED, unknownNumeric } from '../../../ranges/numeric.ts'
import { figures, tidy, unitOf } from '../../common/reading.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { lackWords } from '../../common/lacking.ts'
import { capital, show } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { meta } from '../meta.ts'

const base = figureRule({
  meta: meta('QW-407.2', 'pwht-time'),
  field: 'pwht.time',
  at: 'weld',
  label: 'time at heat treatment temperature',
  dimension: 'time',
  applies: (context) => context.procedure.pwht.condition !== 'none',
  asked(context) {
    const asked = figures(context.procedure.pwht.time, 'time', context.system)
    if (asked.fault) return 'fault'
    const max = asked.max ?? asked.min
    return asked.all || max === null ? null : { min: 0, max }
  },
  range(context, side) {
    if (side.variables.pwht.condition === 'none') return null
    const time = figures(side.variables.pwht.time, 'time', context.system)
    // The least time that was surely given counts.
    const had = time.min ?? time.max
    if (had === null) return { range: unknownNumeric('time', 'min'), tested: null, reason: `${side.coupon.number} has no time at temperature recorded.`, missing: [`${side.coupon.number}: pwht.time`] }
    const longest = tidy(had / 0.8)
    return { range: between('time', 'min', UNLIMITED, closed(longest)), tested: had, reason: `${show(had, 'min')} is 80 % of ${show(longest, 'min')}, the longest production time.` }
  },
  how: (context, side) => ({ how: 'time / 0.80', coupon: `${show(figures(side.variables.pwht.time, 'time', context.system).min ?? 0, 'min')} treatment` }),
})

export const pwhtTime: Rule = {
  ...base,
  check(context, sides, joined) {
    const judged = base.check(context, sides, joined)
    if (!judged || judged.verdict === 'outside') return judged
    const unit = unitOf('temperature', context.system)
    const asked = figures(context.procedure.pwht.temperature, 'temperature', context.system)
    for (const side of sides) {
      const had = figures(side.variables.pwht.temperature, 'temperature', context.system)
      const low = had.min ?? had.max
      const high = had.max ?? had.min
      const lacking = [...(asked.min === null || asked.max === null ? ['procedure: pwht.temperature'] : []), ...(low === null || high === null ? [`${side.coupon.number}: pwht.temperature`] : [])]
      if (asked.min === null || asked.max === null || low === null || high === null) return { ...judged, verdict: 'cannot-tell', sentence: `${capital(lackWords([...(judged.missing ?? []), ...lacking]))}, so the heat treatments can't be compared.`, field: 'pwht.temperature', missing: [...(judged.missing ?? []), ...lacking] }
      if (containsInterval(between('temperature', unit, closed(asked.min), closed(asked.max)), { min: low, max: high }) !== 'within') {
        return { ...judged, verdict: 'outside', sentence: `${side.coupon.number} was heat treated at ${show(low, unit)}${high === low ? '' : ` to ${show(high, unit)}`}, outside the ${show(asked.min, unit)} to ${show(asked.max, unit)} of the procedure.`, field: 'pwht.temperature', fixes: [{ kind: 'plan-coupon', label: 'Weld a coupon with that heat treatment', requirement: `A coupon heat treated at ${show(asked.min, unit)} to ${show(asked.max, unit)}.` }] }
      }
    }
    return judged
  },
}
