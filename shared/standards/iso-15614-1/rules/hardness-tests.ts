/** 7.4.5: where hardness is required the coupon carries hardness tests. */
import { hasHardnessTests } from '../../common/iso-names.ts'
import { cannotTell, names } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { meta } from '../meta.ts'

/** A coupon proves hardness only with hardness tests. */
export const hardnessTests: Rule = {
  meta: meta('hardness-tests', { title: 'Hardness tests', clause: '7.4.5', basis: 'memory', statement: 'Where hardness is required, a supporting coupon carries hardness tests. Whether it is required is taken from the procedure; that level 2 asks hardness tests of the test piece, save of groups 1.1, 8 and 41 to 48, is checked when a coupon is certified.' }),
  field: 'hardnessRequired',
  at: 'weld',
  label: 'Hardness tests',
  applies: (context) => context.procedure.hardnessRequired === true,
  range: () => null,
  check(context, sides) {
    if (context.procedure.hardnessRequired !== true) return null
    const tested = sides.filter((side) => hasHardnessTests(side.coupon.content))
    if (tested.length > 0) return { verdict: 'within', sentence: `${names(tested)} was tested for hardness.`, asked: ['with hardness tests'], range: null }
    return cannotTell(`Hardness is required, and ${names(sides)} has no hardness results.`, sides.map((side) => `${side.coupon.number}: hardness`), { asked: ['with hardness tests'], fixes: [{ kind: 'plan-coupon', label: 'Test a coupon for hardness', requirement: 'HV10 results of weld, heat-affected zone and parent metal.' }] })
  },
}
