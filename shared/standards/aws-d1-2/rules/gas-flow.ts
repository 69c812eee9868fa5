/** Flow of the shielding gas: how far it may change isn't confirmed. */
import { isNoGas } from '../../common/reading.ts'
import type { RuleContext } from '../../rule.ts'
import { ends, had, statement, WHY } from '../figures-read.ts'
import { meta } from '../meta.ts'
import { unconfirmedFigure } from '../unconfirmed.ts'

const withGas = (context: RuleContext): boolean => !!context.block && context.block.process !== 'SMAW' && !(context.block.shieldingGas && isNoGas(context.block.shieldingGas))

export const gasFlow = unconfirmedFigure({
  meta: meta('gas-flow', 'Gas flow', 'Table 3.1', 'memory', WHY, statement('Another flow of shielding gas'), { classes: { GMAW: 'essential', GTAW: 'essential', PAW: 'essential' } }),
  field: 'shieldingGas.flow',
  at: 'block',
  label: 'gas flow',
  dimension: 'gasFlow',
  applies: withGas,
  asked: (context) => ends(context.block?.shieldingGas?.flow, 'gasFlow', context.system),
  tested: (side, system) => had(side.block?.shieldingGas?.flow, 'gasFlow', system),
})
