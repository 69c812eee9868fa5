/** Shielding gas: that of the test. */
import { gasName } from '../../common/reading.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { meta, TABLE } from '../meta.ts'

export const shieldingGas = namedRule({
  meta: meta('shielding-gas', 'Shielding gas', 'Table 3.1', 'memory', TABLE, 'Another shielding gas or mixture.', { classes: { GMAW: 'essential', GTAW: 'essential', PAW: 'essential' } }),
  field: 'shieldingGas',
  at: 'block',
  label: 'shielding gas',
  asked(context) {
    const name = context.block && gasName(context.block.shieldingGas)
    return name ? [name] : null
  },
  tested: (_context, side) => (side.block ? gasName(side.block.shieldingGas) : null),
  because: 'The gas must be that of the test.',
  display: (name) => (name === 'none' ? 'no gas' : name),
})
