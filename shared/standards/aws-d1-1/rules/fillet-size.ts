/** Table 6.4: a single-pass test is the largest single pass, a multiple-pass test the smallest of several passes. */
import { closed, numericRange, UNLIMITED } from '../../../ranges/numeric.ts'
import { figures, isStated, single, unitOf } from '../../common/reading.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { cannotTell, show } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { ownMeta } from '../meta.ts'
import { unknownLength } from '../ranges.ts'

const base = figureRule({
  meta: ownMeta('fillet-size', 'Fillet size', 'Table 6.4', 'memory', 'Table 6.4; the test itself read in 2000 (4.11.2)', 'A single-pass fillet test covers its size and smaller single-pass fillets; a multiple-pass test covers its size and larger multiple-pass fillets.', { combine: 'union' }),
  field: 'joint.filletLeg',
  at: 'weld',
  label: 'fillet size',
  dimension: 'length',
  applies: (context) => context.procedure.joint.weld === 'fillet',
  asked(context) {
    const { filletLeg } = context.procedure.joint
    const { min, max, all, fault } = figures(filletLeg, 'length', context.system)
    if (fault) return 'fault'
    if (all) return { min: null, max: null }
    return isStated(filletLeg) ? { min: min ?? max, max: max ?? min } : null
  },
  range(context, side) {
    const { system } = context
    const unit = unitOf('length', system)
    const { number } = side.coupon
    if (side.variables.joint.weld !== 'fillet') return { range: numericRange('length', unit, [{ lower: UNLIMITED, upper: UNLIMITED }]), tested: null, reason: 'A groove test covers fillets of every size.' }
    const leg = single(side.variables.joint.filletLeg, 'length', system)
    const passes = side.block?.technique.passesPerSide ?? null
    if (leg === null || passes === null) return { range: unknownLength(system), tested: leg, reason: `${number} does not record its ${leg === null ? 'fillet size' : 'passes (single or multiple)'}.`, missing: [`${number}: ${leg === null ? 'joint.filletLeg' : 'technique.passesPerSide'}`] }
    const asked = context.block ? context.block.technique.passesPerSide : passes
    if (asked !== null && asked !== passes) return { range: numericRange('length', unit, []), tested: leg, reason: `${number} is a ${passes}-pass test, which covers no ${asked}-pass fillet.` }
    return passes === 'single'
      ? { range: numericRange('length', unit, [{ lower: UNLIMITED, upper: closed(leg) }]), tested: leg, reason: `A single-pass test of ${show(leg, unit)} covers single-pass fillets up to that size.` }
      : { range: numericRange('length', unit, [{ lower: closed(leg), upper: UNLIMITED }]), tested: leg, reason: `A multiple-pass test of ${show(leg, unit)} covers multiple-pass fillets from that size up.` }
  },
  plan: (wanted, context) => `A fillet test of ${context.block?.technique.passesPerSide === 'single' ? `${show(wanted.max ?? 0, unitOf('length', context.system))} in one pass` : `${show(wanted.min ?? 0, unitOf('length', context.system))} in several passes`}.`,
})

export const filletSize: Rule = {
  ...base,
  check(context, sides, joined) {
    if (context.procedure.joint.weld !== 'fillet') return null
    if (context.block?.technique.passesPerSide === null && sides.some((side) => side.variables.joint.weld === 'fillet')) {
      const field = `${context.path}.technique.passesPerSide`
      return cannotTell('Whether the fillet is laid in one pass or in several is not stated, and the sizes covered differ.', ['procedure: technique.passesPerSide'], { field, range: joined, fixes: [{ kind: 'state', label: 'State single or multiple passes', field }] })
    }
    return base.check(context, sides, joined)
  },
}
