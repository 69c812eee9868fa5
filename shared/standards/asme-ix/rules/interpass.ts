/** QW-406.3: with toughness the highest interpass temperature may rise by 55 °C (100 °F) above the coupon's, and no more. */
import { between, closed, UNLIMITED, unknownNumeric } from '../../../ranges/numeric.ts'
import { highestInterpass } from '../../common/interpass.ts'
import { figureOrNull, tidy, unitOf } from '../../common/reading.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { show } from '../../common/wording.ts'
import type { CouponSide, RangeContext } from '../../rule.ts'
import { unlessHeatTreated } from '../heat-treated.ts'
import { meta } from '../meta.ts'
import { exemptByHeatTreatment } from '../ranges.ts'
import { TEMPERATURE_STEP } from './preheat.ts'

function interpassInWords(context: RangeContext, side: CouponSide): string {
  const { had } = highestInterpass(side, context.system)
  return had === null ? 'interpass temperature' : `${show(had, unitOf('temperature', context.system))} interpass temperature`
}

export const interpass = unlessHeatTreated(figureRule({
  meta: meta('QW-406.3', 'interpass'),
  field: 'preheat.interpassMaximum',
  at: 'weld',
  label: 'maximum interpass temperature',
  dimension: 'temperature',
  ends: { min: '', max: '' },
  asked(context) {
    const maximum = figureOrNull(context.procedure.preheat.interpassMaximum, 'temperature', context.system)
    return maximum === null ? null : { min: maximum, max: maximum }
  },
  range(context, side) {
    const { system } = context
    const unit = unitOf('temperature', system)
    const { had, from } = highestInterpass(side, system)
    if (exemptByHeatTreatment(side.variables) === true) return { range: between('temperature', unit, UNLIMITED, UNLIMITED), tested: had, reason: 'The heat treatment after welding lifts the interpass limit.' }
    if (had === null) return { range: unknownNumeric('temperature', unit), tested: null, reason: `${side.coupon.number} has no interpass temperature recorded.`, missing: [`${side.coupon.number}: preheat.interpassMaximum`] }
    const highest = tidy(had + TEMPERATURE_STEP[system])
    return { range: between('temperature', unit, UNLIMITED, closed(highest)), tested: had, reason: `${show(had, unit)}${from} plus ${TEMPERATURE_STEP[system]} gives ${show(highest, unit)} as the highest interpass temperature.` }
  },
  how: (context, side) => ({ how: `${show(TEMPERATURE_STEP[context.system], unitOf('temperature', context.system))} above`, coupon: interpassInWords(context, side) }),
}))
