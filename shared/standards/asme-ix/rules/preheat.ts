/** QW-406.1: preheat may fall by 55 °C (100 °F) below the coupon's, and no more. */
import { between, closed, UNLIMITED, unknownNumeric } from '../../../ranges/numeric.ts'
import { figure, figureOrNull, tidy, unitOf } from '../../common/reading.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { show } from '../../common/wording.ts'
import type { CouponSide, RangeContext } from '../../rule.ts'
import { meta } from '../meta.ts'

/** The printed step of each system; older editions print 56 °C. */
export const TEMPERATURE_STEP = { SI: 55, US: 100 } as const

/** The coupon's temperature in words, e.g. `20 °C preheat`. */
export function inWords(context: RangeContext, side: CouponSide, which: 'minimum' | 'interpassMaximum', label: string): string {
  const had = side.variables.preheat[which]
  return had ? `${show(figure(had, 'temperature', context.system), unitOf('temperature', context.system))} ${label}` : label
}

export const preheat = figureRule({
  meta: meta('QW-406.1', 'preheat'),
  field: 'preheat.minimum',
  at: 'weld',
  label: 'minimum preheat',
  dimension: 'temperature',
  ends: { min: '', max: '' },
  asked(context) {
    const minimum = figureOrNull(context.procedure.preheat.minimum, 'temperature', context.system)
    return minimum === null ? null : { min: minimum, max: minimum }
  },
  range(context, side) {
    const { system } = context
    const unit = unitOf('temperature', system)
    const had = figureOrNull(side.variables.preheat.minimum, 'temperature', system)
    if (had === null) return { range: unknownNumeric('temperature', unit), tested: null, reason: `${side.coupon.number} has no preheat recorded.`, missing: [`${side.coupon.number}: preheat.minimum`] }
    const lowest = tidy(had - TEMPERATURE_STEP[system])
    return { range: between('temperature', unit, closed(lowest), UNLIMITED), tested: had, reason: `${show(had, unit)} less ${TEMPERATURE_STEP[system]} gives ${show(lowest, unit)} as the lowest preheat.`, basis: 'read' }
  },
  how: (context, side) => ({ how: `${show(TEMPERATURE_STEP[context.system], unitOf('temperature', context.system))} below`, coupon: inWords(context, side, 'minimum', 'preheat') }),
  plan: (asked, context) => `A coupon welded with a preheat of at most ${show(Number(asked.min) + TEMPERATURE_STEP[context.system], unitOf('temperature', context.system))}.`,
})
