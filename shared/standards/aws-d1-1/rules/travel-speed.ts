/** Row 18: travel speed by percentage: SAW 15, GMAW and FCAW 25, GTAW 50. */
import { between, closed, containsInterval } from '../../../ranges/numeric.ts'
import { unitOf } from '../../common/reading.ts'
import type { CouponSide, Rule } from '../../rule.ts'
import { meta } from '../meta.ts'
import { byProcess, settingRule, testedSetting } from '../percent.ts'

const PERCENT = { SAW: 15, GMAW: 25, FCAW: 25, GTAW: 50 } as const

const base = settingRule({
  meta: meta('travel_speed'),
  setting: 'travelSpeed',
  label: 'travel speed',
  dimension: 'travelSpeed',
  band: byProcess(PERCENT),
})

/** Speeds of every fillet test of the process: all fillet sizes may share the range from one test to the other (recalled). */
export const travelSpeed: Rule = {
  ...base,
  check(context, sides, joined) {
    const judged = base.check(context, sides, joined)
    const process = context.block?.process
    if (judged?.verdict !== 'outside' || context.procedure.joint.weld !== 'fillet' || judged.asked === null || Array.isArray(judged.asked) || !process || !(process in PERCENT)) return judged
    const speeds = context.coupons.flatMap((coupon) => {
      const { variables } = coupon.content
      return variables.joint.weld !== 'fillet' ? [] : variables.processes.flatMap((block) => { const side: CouponSide = { coupon, variables, block, role: 'full' }; return block.process === process ? (testedSetting(side, 'travelSpeed', 'travelSpeed', context.system) ?? []) : [] })
    })
    const percent = PERCENT[process as keyof typeof PERCENT] / 100
    const most = speeds.length < 2 ? null : between('travelSpeed', unitOf('travelSpeed', context.system), closed(Math.min(...speeds.map(({ min }) => min)) * (1 - percent)), closed(Math.max(...speeds.map(({ max }) => max)) * (1 + percent)))
    if (!most || containsInterval(most, judged.asked) !== 'within') return judged
    return { ...judged, verdict: 'cannot-tell', sentence: `${judged.sentence} It lies between the speeds of the fillet tests, whose range all fillet sizes may share; that is recalled and not confirmed here.`, missing: ['confirmation that fillet sizes share the range of speed of several tests'] }
  },
}
