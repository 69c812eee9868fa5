/** The kind of weld in the standard's terms. */
import type { Joint, WeldingVariables } from '../../schemas/welding.ts'
import { isStated } from '../common/reading.ts'

export const isBranch = (joint: Joint): boolean => (joint.branch !== null && joint.branch !== undefined) || isStated(joint.branchAngle)

/** The kind of weld in the standard's terms. */
export function weldType(variables: WeldingVariables): string {
  const { joint } = variables
  if (joint.weld === 'fillet') return 'fillet weld'
  if (isBranch(joint)) return 'branch connection'
  if (joint.type === 'tee') return 'T-joint butt weld'
  if (joint.type !== 'butt') return `${joint.type} joint butt weld`
  return joint.penetration === 'partial' ? 'partial penetration butt weld' : 'butt weld'
}
