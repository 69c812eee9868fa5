/** Table 6.7: time and temperature of the heat treatment after welding. */
import { between, closed, UNLIMITED, unknownNumeric } from '../../../ranges/numeric.ts'
import { figures, tidy, unitOf } from '../../common/reading.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { cannotTell, names, show } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { meta } from '../meta.ts'

/** Of the total time in production at least this share must have been on the test. */
const SHARE = 0.8

const time = figureRule({
  meta: meta('cvn_pwht'),
  field: 'pwht.time',
  at: 'weld',
  label: 'time of heat treatment',
  dimension: 'time',
  asked(context) {
    const { min, max, fault } = figures(context.procedure.pwht.time, 'time', context.system)
    const high = max ?? min
    return fault ? 'fault' : high === null ? null : { min: high, max: high }
  },
  range(context, side) {
    const unit = unitOf('time', context.system)
    const treated = side.variables.pwht.condition
    if (treated === 'none') return null
    const { min, max } = figures(side.variables.pwht.time, 'time', context.system)
    const had = min ?? max
    if (had === null) return { range: unknownNumeric('time', unit), tested: null, reason: `${side.coupon.number} does not record the time of its heat treatment.`, missing: [`${side.coupon.number}: pwht.time`] }
    const most = tidy(had / SHARE)
    return { range: between('time', unit, UNLIMITED, closed(most)), tested: had, reason: `${show(had, unit)} on the test is 80 % of ${show(most, unit)}.` }
  },
})

export const cvnPwht: Rule = {
  ...time,
  applies: (context) => context.procedure.pwht.condition !== null && context.procedure.pwht.condition !== 'none',
  check(context, sides, joined) {
    const { condition } = context.procedure.pwht
    if (condition === null || condition === 'none') return null
    const judged = time.check(context, sides, joined)
    if (judged?.verdict !== 'within') return judged
    const asked = figures(context.procedure.pwht.temperature, 'temperature', context.system)
    const unit = unitOf('temperature', context.system)
    for (const side of sides) {
      const had = figures(side.variables.pwht.temperature, 'temperature', context.system)
      const [low, high, from, to] = [asked.min ?? asked.max, asked.max ?? asked.min, had.min ?? had.max, had.max ?? had.min]
      if (low === null || high === null || from === null || to === null) return cannotTell('The heat treatment temperature isn\'t recorded on both sides, so a change can\'t be told.', [...(low === null ? ['procedure: pwht.temperature'] : []), ...(from === null ? [`${side.coupon.number}: pwht.temperature`] : [])], { field: 'pwht.temperature', range: joined })
      if (from < low || to > high) return { ...judged, verdict: 'outside', field: 'pwht.temperature', sentence: `${names([side])} was treated at ${show(from, unit)}${from === to ? '' : ` to ${show(to, unit)}`}, outside the ${show(low, unit)} to ${show(high, unit)} of the procedure.` }
    }
    return judged
  },
}

