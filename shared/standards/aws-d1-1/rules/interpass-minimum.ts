/** Row 36: the least interpass temperature may fall by 15 °C (25 °F), with GTAW by 55 °C (100 °F). */
import type { UnitSystem } from '../../../units/types.ts'
import { figureOrNull } from '../../common/reading.ts'
import type { CouponSide } from '../../rule.ts'
import { lowestTemperature } from '../temperature-rule.ts'

/** The lowest interpass temperature of the run sheet, else the preheat that was kept. */
function lowestInterpass(side: CouponSide, system: UnitSystem): number | null {
  const rows = side.coupon.content.runSheet.filter((row) => row.processId === side.block?.id).flatMap((row) => figureOrNull(row.interpass, 'temperature', system) ?? [])
  return rows.length > 0 ? Math.min(...rows) : figureOrNull(side.variables.preheat.minimum, 'temperature', system)
}

/** The standard sets one minimum for preheat and interpass: the procedure's minimum is compared with the lowest that the test had between passes. */
export const interpassMinimum = lowestTemperature('interpass_min', 'minimum interpass temperature', lowestInterpass)
