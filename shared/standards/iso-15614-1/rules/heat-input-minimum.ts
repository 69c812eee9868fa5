/** 8.4.7: at least 0.75 times the heat input tested, where hardness is required. */
import { between, closed, UNLIMITED } from '../../../ranges/numeric.ts'
import type { NumericRange } from '../../../schemas/assessment.ts'
import { hasHardnessTests } from '../../common/iso-names.ts'
import { tidy } from '../../common/reading.ts'
import { bandRule } from '../../common/review-band.ts'
import { show, stateFix } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { levelOf } from '../levels.ts'
import { meta } from '../meta.ts'
import { asked, UNIT, energyBand, kindText, SPREAD, unstated } from '../energy-bands.ts'

const from = (value: number): NumericRange => between('heatInput', UNIT, closed(tidy(value)), UNLIMITED)

const lowerBase = bandRule({
  meta: meta('heat-input-minimum', { title: 'Heat input, lower limit', clause: '8.4.7', basis: 'read', combine: 'union', statement: 'Where hardness is required the heat input is at least 0.75 times that of the coupon at level 2. Level 1 has no lower limit; without hardness requirements there is none.' }),
  field: 'electrical.heatInput',
  at: 'block',
  label: 'heat input',
  dimension: 'heatInput',
  asked(context) {
    const energy = asked(context)
    return energy && { min: energy.low, max: energy.high }
  },
  band(context, side) {
    const required = context.procedure ? context.procedure.hardnessRequired !== false : hasHardnessTests(side.coupon.content) || side.variables.hardnessRequired === true
    if (!required || levelOf(context) === '1') return null
    return energyBand(context, side, (had, factor) => {
      const high = tidy(0.75 * had.mean * factor.greatest)
      return { sure: from(high), maybe: from(0.75 * had.low * factor.least), reason: `${show(had.mean, UNIT)} (${had.from}, ${kindText(had.kind)}): 0.75 times it, ${show(high, UNIT)}.`, why: had.low < had.mean ? SPREAD : undefined }
    })
  },
  plan: (wanted) => `A coupon with hardness tests welded at ${show(tidy((wanted.min ?? 0) / 0.75), UNIT)} or less.`,
})

export const heatInputMinimum: Rule = {
  ...lowerBase,
  check(context, sides, joined) {
    const { hardnessRequired } = context.procedure
    if (hardnessRequired === false || levelOf(context) === '1') return { verdict: 'within', class: 'not-a-variable', sentence: levelOf(context) === '1' ? 'Level 1 has no lower limit of heat input.' : 'Hardness is not required, so heat input has no lower limit.', asked: null, range: null, tested: [] }
    const judged = unstated(context, "The procedure's lowest heat input can't be told.") ?? lowerBase.check(context, sides, joined)
    if (judged?.verdict === 'within' || hardnessRequired === true || !judged) return judged
    return { ...judged, verdict: 'cannot-tell', sentence: `${judged.sentence} It matters only if hardness is required, which isn't stated.`, missing: ['procedure: hardnessRequired', ...(judged.missing ?? [])], fixes: [stateFix('hardness requirement', 'hardnessRequired'), ...(judged.fixes ?? [])] }
  },
}
