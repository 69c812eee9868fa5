import { gasName } from '../common/reading.ts'
import { namedRule } from '../common/rule-kinds.ts'
import type { Rule } from '../rule.ts'
import { meta } from './meta.ts'

/** What rows 19 and 21 share: the nominal composition of the gas, compared with that of the test. */
export const gasRule = (variable: 'shielding_gas' | 'gas_in_filler_spec'): Rule =>
  namedRule({
    meta: meta(variable),
    field: 'shieldingGas',
    at: 'block',
    label: 'shielding gas',
    asked(context) {
      const name = context.block && gasName(context.block.shieldingGas)
      return name ? [name] : null
    },
    tested: (_context, side) => (side.block ? gasName(side.block.shieldingGas) : null),
    because: 'The nominal composition must be that of the test.',
    display: (name) => (name === 'none' ? 'no gas' : name),
  })
