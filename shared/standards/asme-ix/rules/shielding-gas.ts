/** QW-408.2 (GMAW, FCAW, GTAW) and QW-408.4 (PAW): the gas and its specified percentages stay as on the coupon. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { gasName } from '../../common/reading.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import type { RuleMeta, Rule } from '../../rule.ts'
import { meta } from '../meta.ts'

const build = (ruleMeta: RuleMeta, field: 'shieldingGas' | 'plasmaGas', label: string): Rule => {
  const token = (block: ProcessBlock | null): string | null => gasName(block?.[field] ?? null)
  return namedRule({
    meta: ruleMeta,
    field,
    at: 'block',
    label,
    asked(context) {
      const value = token(context.block)
      return value ? [value] : null
    },
    tested: (_context, side) => token(side.block),
    // A gas that is named without percentages that make up 100 lacks its composition.
    lacks: (_, block) => (block?.[field] ? [`${field}.components`] : []),
    because: 'Another gas, a mixture for a single gas, or another percentage is another gas; adding or leaving out gas is a change too.',
    plan: (asked) => `A coupon welded under ${asked.join(', ')}.`,
  })
}

export const shieldingGas = build(meta('QW-408.2', 'shielding-gas'), 'shieldingGas', 'shielding gas')
export const plasmaShieldingGas = build(meta('QW-408.4', 'plasma-shielding-gas', { title: 'Shielding gas composition (PAW)' }), 'shieldingGas', 'shielding gas')
export const orificeGas = build(meta('QW-408.4', 'orifice-gas', { title: 'Orifice gas composition (PAW)' }), 'plasmaGas', 'orifice gas')
