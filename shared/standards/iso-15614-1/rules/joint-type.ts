/** 8.4.3: type of joint and weld. */
import { nameBandRule } from '../../common/review-band.ts'
import { levelTwoLimit } from '../levels.ts'
import { meta } from '../meta.ts'
import { weldType } from '../weld-types.ts'

const COVERS: Readonly<Record<string, readonly string[]>> = {
  'butt weld': ['butt weld', 'partial penetration butt weld', 'fillet weld'],
  'T-joint butt weld': ['T-joint butt weld', 'fillet weld'],
  'branch connection': ['branch connection'],
  'fillet weld': ['fillet weld'],
}

export const jointType = levelTwoLimit(
  nameBandRule({
    meta: meta('joint-type', { title: 'Type of joint and weld', clause: '8.4.3', basis: 'memory', statement: 'A butt coupon covers full and partial penetration butt welds and fillets; a T-joint butt coupon covers T-joint butt welds and fillets; a pipe butt coupon also covers branches at 60° and more; a fillet coupon covers fillets. Where fillets are the main form of production a fillet coupon is asked for as well, which no record tells.' }),
    field: 'joint.weld',
    at: 'weld',
    label: 'type of weld',
    asked: (context) => [weldType(context.procedure)],
    tested: (_context, side) => [weldType(side.variables)],
    covers([value = ''], _context, side) {
      const sure = COVERS[value] ?? [value]
      if (value === 'butt weld' && side.variables.product !== 'plate') return { sure: [...sure, 'branch connection'] }
      if (value === 'butt weld') return { sure, maybe: ['branch connection'], why: 'A plate coupon covers large pipe, but whether it covers a branch is not known here.' }
      return value in COVERS ? { sure } : { sure, maybe: ['fillet weld', ...(value === 'partial penetration butt weld' ? ['butt weld'] : [])], why: 'That test piece is not one of the standard\'s own; what it covers beyond itself is not known here.' }
    },
    because: 'Butt covers partial penetration and fillet; T-joint butt covers fillet; fillet covers itself.',
  }),
)
