/** 8.3.3: outside diameter. */
import { askedInterval, siSingle } from '../../common/iso-names.ts'
import { bandRule } from '../../common/review-band.ts'
import { meta } from '../meta.ts'
import { bandOf, lacks } from '../size-bands.ts'
import { diameter as diameterRange, mm, nothing } from '../tables.ts'

export const diameter = bandRule({
  meta: meta('diameter', { title: 'Outside diameter', clause: '8.3.3', combine: 'union', statement: 'Up to 25 mm 0.5D to 2D, above that 0.5D (at least 25 mm) and up, as recalled; EN 288-4 stops at 2D below 168.3 mm, so beyond that it must be looked up. What plate covers of pipe is not held here.' }),
  field: 'diameter',
  at: 'weld',
  label: 'outside diameter',
  dimension: 'length',
  applies: (context) => context.procedure.product !== 'plate',
  asked: (context) => askedInterval(context.procedure.diameter, 'length'),
  band(context, side) {
    if (context.procedure?.product === 'plate') return null
    if (side.variables.product === 'plate') return context.procedure ? { sure: nothing, maybe: mm(null, null), tested: null, reason: `${side.coupon.number} is plate; what it covers of pipe is not held here.`, why: 'What a plate coupon covers of pipe is not held here.' } : null
    const D = siSingle(side.variables.diameter, 'length')
    return D === null || D <= 0 ? lacks(side, 'diameter') : bandOf(D, 'D', diameterRange(D))
  },
})
