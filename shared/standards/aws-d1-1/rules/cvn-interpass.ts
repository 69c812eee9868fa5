/** Table 6.7: the highest interpass temperature may rise by 56 °C (100 °F) above that of the test, and no more. */
import { between, closed, UNLIMITED, unknownNumeric } from '../../../ranges/numeric.ts'
import { highestInterpass } from '../../common/interpass.ts'
import { figureOrNull, tidy, unitOf } from '../../common/reading.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { show } from '../../common/wording.ts'
import { meta } from '../meta.ts'

const STEP = { SI: 56, US: 100 } as const

export const cvnInterpass = figureRule({
  meta: meta('cvn_max_interpass'),
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
    if (had === null) return { range: unknownNumeric('temperature', unit), tested: null, reason: `${side.coupon.number} has no interpass temperature recorded.`, missing: [`${side.coupon.number}: preheat.interpassMaximum`] }
    return { range: between('temperature', unit, UNLIMITED, closed(tidy(had + STEP[system]))), tested: had, reason: `${show(had, unit)}${from} may rise by ${STEP[system]}.` }
  },
})

