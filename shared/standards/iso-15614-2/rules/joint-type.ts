/** 8.4.3: type of joint and weld. */
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { asTested, sameOnly } from '../as-tested.ts'

const weldType = ({ joint }: WeldingVariables): string => (joint.weld === 'fillet' ? 'fillet weld' : joint.branch || joint.branchAngle ? 'branch connection' : joint.type === 'tee' ? 'T-joint butt weld' : joint.penetration === 'partial' ? 'partial penetration butt weld' : 'butt weld')

export const jointType = asTested({
  file: 'joint-type',
  title: 'Type of joint and weld',
  clause: '8.4.3',
  field: 'joint.weld',
  at: 'weld',
  label: 'type of weld',
  statement: 'The same type of weld is covered; a fillet coupon proves no mechanical properties, so it covers no butt weld; where a fillet carries load hold a butt record too, which no record tells. What else a coupon covers must be looked up.',
  read: weldType,
  covers: (value) => (value === 'fillet weld' ? { sure: [value] } : sameOnly('Which other types of weld a coupon covers is not held here.')(value)),
})
