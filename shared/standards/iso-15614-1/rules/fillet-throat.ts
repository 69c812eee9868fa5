/** 8.3.2: fillet throat, Table 8. */
import { siSingle } from '../../common/iso-names.ts'
import { bandRule, type Band } from '../../common/review-band.ts'
import { show } from '../../common/wording.ts'
import type { CouponSide, RangeContext } from '../../rule.ts'
import { freeAtLevelOne, levelOf } from '../levels.ts'
import { meta } from '../meta.ts'
import { askedVariables, depositOf, runsOf, throatOf } from '../sides.ts'
import { mm, nothing, throatRange } from '../tables.ts'
import { unknown } from '../thickness-bands.ts'

function throatBand(context: RangeContext, side: CouponSide): Band | null {
  if (askedVariables(context, side).joint.weld !== 'fillet' || !side.block) return null
  const free = mm(null, null)
  const clause = '8.3.2 Table 8'
  if (levelOf(context) === '1') return { sure: free, maybe: free, tested: null, reason: 'Level 1 does not limit the throat.', clause, basis: 'memory' }
  const runs = runsOf(side.variables, side.block, side.coupon)
  const butt = side.variables.joint.weld === 'groove'
  const own = butt ? null : throatOf(side.variables)
  const a = butt ? depositOf(side.variables, side.block) : own && own !== 'fault' && own.min === own.max ? own.min : null
  if (runs === 'multiple') return { sure: free, maybe: free, tested: a, reason: 'Several runs: the throat is not limited.', clause, basis: 'memory' }
  if (a === null || a <= 0) return { sure: nothing, maybe: unknown, tested: null, reason: `${side.coupon.number} does not record ${butt ? 'its deposit' : 'its throat'}.`, missing: [`${side.coupon.number}: ${butt ? 'depositThickness' : 'joint.filletThroat'}`] }
  const reading = throatRange(a, 'single', siSingle(side.variables.thickness, 'length'))
  const from = butt ? `The deposit of ${show(a, 'mm')} of the butt coupon stands for the throat` : `a = ${show(a, 'mm')}`
  if (runs === null) return { sure: reading.sure, maybe: free, tested: a, reason: `${from}: ${reading.how} for one run; several runs are not limited.`, missing: [`${side.coupon.number}: technique.passesPerSide`], clause, basis: 'memory' }
  return { sure: reading.sure, maybe: reading.maybe, tested: a, reason: `${from}: ${reading.how} by Table 8.`, why: reading.why, clause, basis: 'memory' }
}

const limited = bandRule({
  meta: meta('fillet-throat', { title: 'Fillet throat', clause: '8.3.2 Table 8', basis: 'memory', combine: 'union', statement: 'At level 2 a single-run fillet covers throats from 0.75 to 1.5 times the tested one; several runs are not limited. A butt coupon stands for the fillet with its deposited thickness. From 30 mm material only the tested throat is sure. Level 1 does not limit it.' }),
  field: 'joint.filletThroat',
  at: 'weld',
  label: 'fillet throat',
  dimension: 'length',
  applies: (context) => context.procedure.joint.weld === 'fillet',
  asked: (context) => throatOf(context.procedure),
  band: throatBand,
})

export const filletThroat = freeAtLevelOne(limited, (context) => throatOf(context.procedure) === null)
