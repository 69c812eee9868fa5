import type { Interval, Quantity } from '../../schemas/common.ts'
import type { Joint } from '../../schemas/welding.ts'
import { quantity } from '../../units/convert.ts'
import { isStated } from '../common/reading.ts'

/** Grooves of which one edge alone is bevelled: their angle is the bevel's. */
export const oneEdgeBevelled = (groove: Joint['groove']): boolean => groove !== null && (groove.endsWith('-bevel') || groove.endsWith('-j'))

const twice = (angle: Quantity | null): Quantity | null => angle && quantity(2 * angle.si, 'angle', '°')

/** The groove angle as the figures give it: of both edges together; where bevels alone are stated, twice the bevel. */
export function grooveAngleOf({ groove, includedAngle, bevelAngle }: Joint): Interval | null {
  if (oneEdgeBevelled(groove)) return isStated(bevelAngle) ? bevelAngle : includedAngle
  if (isStated(includedAngle) || !bevelAngle || bevelAngle.all) return includedAngle ?? bevelAngle
  return { min: twice(bevelAngle.min), max: twice(bevelAngle.max), all: false }
}
