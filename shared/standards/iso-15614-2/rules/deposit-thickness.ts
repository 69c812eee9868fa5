/** 8.3.2: deposit where processes are combined. */
import { siFigures, siSingle } from '../../common/iso-names.ts'
import { bandRule } from '../../common/review-band.ts'
import { show } from '../../common/wording.ts'
import { meta } from '../meta.ts'
import { lacks } from '../size-bands.ts'
import { mm } from '../tables.ts'

export const depositThickness = bandRule({
  meta: meta('deposit-thickness', { title: 'Deposited thickness of each process', clause: '8.3.2', combine: 'union', statement: 'Where several processes share a joint, up to what each deposited on the coupon is sure; the rule for more is not held here.' }),
  field: 'depositThickness',
  at: 'block',
  label: 'deposit thickness',
  dimension: 'length',
  applies: (context) => context.procedure.joint.weld === 'groove' && context.procedure.processes.length > 1,
  asked(context) {
    const read = siFigures(context.block?.depositThickness, 'length')
    if (read.fault) return 'fault'
    const top = read.max ?? read.min
    return read.all ? { min: 0, max: null } : top === null ? null : { min: 0, max: top }
  },
  band(context, side) {
    if (!context.procedure || !side.block || side.variables.joint.weld === 'fillet') return null
    const s = siSingle(side.block.depositThickness, 'length') ?? (side.variables.processes.length === 1 ? siSingle(side.variables.thickness, 'length') : null)
    return s === null ? lacks(side, 'depositThickness') : { sure: mm(0, s), maybe: mm(0, null), tested: s, reason: `s = ${show(s, 'mm')} was deposited.`, why: 'How far a deposit may exceed the tested one is not held here.' }
  },
})
