/** Rows 35 and 36: preheat and minimum interpass temperature may fall by 15 °C (25 °F), with GTAW by 55 °C (100 °F). */
import { between, closed, UNLIMITED, unknownNumeric } from '../../../ranges/numeric.ts'
import type { Process } from '../../../schemas/welding.ts'
import type { UnitSystem } from '../../../units/types.ts'
import { figureOrNull, tidy, unitOf } from '../../common/reading.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { show } from '../../common/wording.ts'
import type { CouponSide, Rule } from '../../rule.ts'
import { meta } from '../meta.ts'
import type { Variable } from '../variables.ts'

const STEP = { SI: { other: 15, GTAW: 55 }, US: { other: 25, GTAW: 100 } } as const
const stepOf = (process: Process | null | undefined, system: UnitSystem): number => STEP[system][process === 'GTAW' ? 'GTAW' : 'other']

/** The lowest interpass temperature of the run sheet, else the preheat that was kept. */
function lowestInterpass(side: CouponSide, system: UnitSystem): number | null {
  const rows = side.coupon.content.runSheet.filter((row) => row.processId === side.block?.id).flatMap((row) => figureOrNull(row.interpass, 'temperature', system) ?? [])
  return rows.length > 0 ? Math.min(...rows) : figureOrNull(side.variables.preheat.minimum, 'temperature', system)
}

function build(variable: Variable, label: string, tested: (side: CouponSide, system: UnitSystem) => number | null): Rule {
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

export const preheat = build('preheat', 'minimum preheat', (side, system) => figureOrNull(side.variables.preheat.minimum, 'temperature', system))
/** The standard sets one minimum for preheat and interpass: the procedure's minimum is compared with the lowest that the test had between passes. */
export const interpassMinimum = build('interpass_min', 'minimum interpass temperature', lowestInterpass)
