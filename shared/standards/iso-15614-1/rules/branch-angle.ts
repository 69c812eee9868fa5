/** 8.3.4: branch angle. */
import { between, closed, numericRange, unknownNumeric } from '../../../ranges/numeric.ts'
import { askedInterval, siSingle } from '../../common/iso-names.ts'
import { bandRule } from '../../common/review-band.ts'
import { meta } from '../meta.ts'
import { weldType, isBranch } from '../weld-types.ts'

export const branchAngle = bandRule({
  meta: meta('branch-angle', { title: 'Branch angle', clause: '8.3.4', basis: 'memory', statement: 'A branch tested at an angle covers from that angle to the right angle; a pipe butt coupon covers branches from 60°.' }),
  field: 'joint.branchAngle',
  at: 'weld',
  label: 'branch angle',
  dimension: 'angle',
  applies: (context) => isBranch(context.procedure.joint),
  asked: (context) => askedInterval(context.procedure.joint.branchAngle, 'angle'),
  band(context, side) {
    const { joint } = side.variables
    const upTo = (lower: number): ReturnType<typeof between> => between('angle', '°', closed(lower), closed(90))
    if (!isBranch(joint)) {
      if (!context.procedure || side.variables.product === 'plate' || weldType(side.variables) !== 'butt weld') return null
      const range = upTo(60)
      return { sure: range, maybe: range, tested: null, reason: 'A pipe butt coupon covers branches from 60° to 90°.', clause: '8.4.3' }
    }
    const had = siSingle(joint.branchAngle, 'angle')
    if (had === null || had > 90) {
      const unknown = unknownNumeric('angle', '°')
      return { sure: numericRange('angle', '°', []), maybe: unknown, tested: null, reason: `${side.coupon.number} does not record its branch angle.`, missing: [`${side.coupon.number}: joint.branchAngle`] }
    }
    const range = upTo(had)
    return { sure: range, maybe: range, tested: had, reason: `Tested at ${had}°: covers ${had}° to 90°.` }
  },
})
