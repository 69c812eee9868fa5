/** What rows 35 and 36 share: a temperature that may fall by 15 °C (25 °F), with GTAW by 55 °C (100 °F). */
import { between, closed, UNLIMITED, unknownNumeric } from '../../ranges/numeric.ts'
import type { Process } from '../../schemas/welding.ts'
import type { UnitSystem } from '../../units/types.ts'
import { figureOrNull, tidy, unitOf } from '../common/reading.ts'
import { figureRule } from '../common/rule-kinds.ts'
import { show } from '../common/wording.ts'
import type { CouponSide, Rule } from '../rule.ts'
import { meta } from './meta.ts'
import type { Variable } from './variables.ts'

const STEP = { SI: { other: 15, GTAW: 55 }, US: { other: 25, GTAW: 100 } } as const
const stepOf = (process: Process | null | undefined, system: UnitSystem): number => STEP[system][process === 'GTAW' ? 'GTAW' : 'other']

/** @param tested the temperature of the test, in the unit of the system */
export function lowestTemperature(variable: Variable, label: string, tested: (side: CouponSide, system: UnitSystem) => number | null): Rule {
  return figureRule({
    meta: meta(variable),
    field: 'preheat.minimum',
    at: 'weld',
    label,
    dimension: 'temperature',
    ends: { min: '', max: '' },
    asked(context) {
      const minimum = figureOrNull(context.procedure.preheat.minimum, 'temperature', context.system)
      return minimum === null ? null : { min: minimum, max: minimum }
    },
    range(context, side) {
      const { system } = context
      const unit = unitOf('temperature', system)
      const had = tested(side, system)
      if (had === null) return { range: unknownNumeric('temperature', unit), tested: null, reason: `${side.coupon.number} does not record the ${label}.`, missing: [`${side.coupon.number}: preheat.minimum`] }
      const step = stepOf(side.block?.process, system)
      const lowest = tidy(had - step)
      return { range: between('temperature', unit, closed(lowest), UNLIMITED), tested: had, reason: `${show(had, unit)} less ${step} gives ${show(lowest, unit)} as the lowest.` }
    },
    plan: (asked, context) => `A coupon welded with a ${label} of at most ${show(Number(asked.min) + stepOf(context.block?.process, context.system), unitOf('temperature', context.system))}.`,
  })
}
