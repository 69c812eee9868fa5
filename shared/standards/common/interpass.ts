/** The highest interpass temperature of a test weld. */
import type { UnitSystem } from '../../units/types.ts'
import type { CouponSide } from '../rule.ts'
import { figure, figureOrNull } from './reading.ts'

/**
 * As recorded, or else the highest of the run sheet.
 * @returns `had` in the unit of the system, null where neither tells; `from` is what to say behind the figure
 */
export function highestInterpass({ coupon, variables }: Pick<CouponSide, 'coupon' | 'variables'>, system: UnitSystem): { had: number | null; from: string } {
  const recorded = figureOrNull(variables.preheat.interpassMaximum, 'temperature', system)
  const rows = coupon.content.runSheet.flatMap((row) => (row.interpass ? [figure(row.interpass, 'temperature', system)] : []))
  return recorded !== null || rows.length === 0 ? { had: recorded, from: '' } : { had: Math.max(...rows), from: ' (the highest of the run sheet)' }
}
