/** 8.4.7: at most 1.25 times the heat input tested, where impact is required. */
import { between, closed, UNLIMITED } from '../../../ranges/numeric.ts'
import type { NumericRange } from '../../../schemas/assessment.ts'
import { hasImpactTests } from '../../common/iso-names.ts'
import { tidy } from '../../common/reading.ts'
import { bandRule } from '../../common/review-band.ts'
import { show } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { couponLevel, levelOf } from '../levels.ts'
import { meta } from '../meta.ts'
import { asked, nothing, UNIT, energyBand, kindText, SPREAD, unstated } from '../energy-bands.ts'

const upTo = (value: number): NumericRange => between('heatInput', UNIT, UNLIMITED, closed(tidy(value)))

const upperBase = bandRule({
  meta: meta('heat-input-maximum', { title: 'Heat input, upper limit', clause: '8.4.7', basis: 'read', class: 'supplementary', combine: 'union', statement: 'Where impact is required the heat input (or arc energy, like with like) is at most 1.25 times that of the coupon at level 2; of a level 1 coupon between 1.0 and 1.25 times it must be looked up. Heat input is k·U·I/v with k 1.0 for 121, 0.6 for 141 and 15, 0.8 for the others.' }),
  field: 'electrical.heatInput',
  at: 'block',
  label: 'heat input',
  dimension: 'heatInput',
  asked(context) {
    const energy = asked(context)
    return energy && { min: 0, max: energy.high }
  },
  band(context, side) {
    // A coupon without impact tests does not widen what one with them has shown.
    if (context.procedure && context.toughness === true && !hasImpactTests(side.coupon.content) && context.coupons.some((coupon) => coupon.id !== side.coupon.id && hasImpactTests(coupon.content) && coupon.content.variables.processes.some((block) => block.process === side.block?.process))) return { sure: nothing, maybe: nothing, tested: null, reason: `${side.coupon.number} has no impact tests, and another linked coupon has.` }
    return energyBand(context, side, (had, factor) => {
      // A level 2 coupon keeps its level 2 range at level 1.
      const one = levelOf(context) === '1' && couponLevel(side) !== '2'
      const low = tidy((one ? 1 : 1.25) * had.mean * factor.least)
      return { sure: upTo(low), maybe: upTo(1.25 * had.high * factor.greatest), reason: `${show(had.mean, UNIT)} (${had.from}, ${kindText(had.kind)}): ${one ? 'at level 1 that figure is sure' : '1.25 times it'}, ${show(low, UNIT)}.`, why: had.high > had.mean ? SPREAD : one ? 'Whether level 1 allows 25 % more is not confirmed.' : undefined, basis: one ? 'memory' : 'read' }
    })
  },
  plan: (wanted) => `A coupon with impact tests welded at ${show(tidy((wanted.max ?? 0) / 1.25), UNIT)} or more.`,
})

export const heatInputMaximum: Rule = {
  ...upperBase,
  check: (context, sides, joined) => unstated(context, "The procedure's highest heat input can't be told.") ?? upperBase.check(context, sides, joined),
}
