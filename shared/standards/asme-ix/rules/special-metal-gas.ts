/** QW-408.9 and QW-408.10: backing and trailing gas of metals that air harms may not be dropped or lose its inertness. */
import type { GasMixture, WeldingVariables } from '../../../schemas/welding.ts'
import { figures, isInert, isNoGas, tidy, unitOf } from '../../common/reading.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { show } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { pFamily, pNumbers } from '../members.ts'
import { meta } from '../meta.ts'

const ALWAYS: ReadonlySet<string> = new Set(['10I', '10J', '10K', '51', '52', '53', '61', '62'])

const alwaysSpecial = (variables: WeldingVariables): boolean => pNumbers(variables).some((p) => ALWAYS.has(p))
const grooveSpecial = (variables: WeldingVariables): boolean => variables.joint.weld === 'groove' && pNumbers(variables).some((p) => pFamily(p) >= 41 && pFamily(p) <= 49)

/** `none`, `inert gas` or `gas that is not inert`; null when the composition isn't known. */
function token(gas: GasMixture | null): string | null {
  if (!gas) return null
  if (isNoGas(gas)) return 'none'
  const inert = isInert(gas)
  return inert === null ? null : inert ? 'inert gas' : 'gas that is not inert'
}

/** What stands in for the coupon's gas: no gas covers all, inert only inert. */
const covers = (value: string): string[] => (value === 'none' ? ['none', 'inert gas', 'gas that is not inert'] : value === 'inert gas' ? ['inert gas'] : ['inert gas', 'gas that is not inert'])

export const backingGasSpecial = namedRule({
  meta: meta('QW-408.9', 'backing-gas-special-metals'),
  field: 'backingGas',
  at: 'block',
  label: 'backing gas',
  applies: (context) => alwaysSpecial(context.procedure) || grooveSpecial(context.procedure),
  asked(context) {
    const value = token(context.block?.backingGas ?? null)
    return value ? [value] : null
  },
  tested: (_context, side) => token(side.block?.backingGas ?? null),
  covers,
  because: 'For these metals backing gas may not be left out, nor inert gas replaced by one that is not.',
})

const trailing = namedRule({
  meta: meta('QW-408.10', 'trailing-gas-special-metals'),
  field: 'trailingGas',
  at: 'block',
  label: 'trailing gas',
  applies: (context) => alwaysSpecial(context.procedure),
  asked(context) {
    const value = token(context.block?.trailingGas ?? null)
    return value ? [value] : null
  },
  tested: (_context, side) => token(side.block?.trailingGas ?? null),
  covers,
  because: 'For these metals trailing gas may not be left out, lose its inertness, or have its flow cut by 10 % or more.',
})

export const trailingGasSpecial: Rule = {
  ...trailing,
  check(context, sides, joined) {
    const judged = trailing.check(context, sides, joined)
    if (judged?.verdict !== 'within' || !context.block?.trailingGas || isNoGas(context.block.trailingGas)) return judged
    const unit = unitOf('gasFlow', context.system)
    const flow = figures(context.block.trailingGas.flow, 'gasFlow', context.system)
    const asked = flow.min ?? flow.max
    const field = `${context.path}.trailingGas.flow`
    for (const side of sides) {
      const gas = side.block?.trailingGas
      if (!gas || isNoGas(gas)) continue
      const coupon = figures(gas.flow, 'gasFlow', context.system)
      const had = coupon.max ?? coupon.min
      if (asked === null || had === null) return { ...judged, verdict: 'cannot-tell', sentence: "The trailing gas flow isn't recorded on both sides.", field, missing: [...(asked === null ? ['procedure: trailingGas.flow'] : []), ...(had === null ? [`${side.coupon.number}: trailingGas.flow`] : [])] }
      if (asked <= tidy(0.9 * had)) return { ...judged, verdict: 'outside', sentence: `A trailing gas flow of ${show(asked, unit)} is 10 % or more below the ${show(had, unit)} of ${side.coupon.number}.`, field, fixes: [{ kind: 'plan-coupon', label: 'Weld a coupon with that flow', requirement: `A coupon with a trailing gas flow of ${show(asked, unit)}.` }] }
    }
    return judged
  },
}
