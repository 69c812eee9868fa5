/** Table 5.2: range of gas flow, of which no figure is confirmed. */
import { figures, isNoGas, isStated } from '../../common/reading.ts'
import { cannotTell } from '../../common/wording.ts'
import { clauseIn } from '../editions.ts'
import { condition } from './meta.ts'
import { says } from './verdict.ts'

export const pqGasFlowRange = condition({
  file: 'range-gas-flow', title: 'Range of gas flow', clause: 'Table 5.2', basis: 'memory', field: 'shieldingGas.flow', at: 'block',
  source: 'To 2010 those of the qualification table, which are in doubt for gas flow; for 2015 and 2020 no figure is confirmed',
  statement: 'How wide a range of gas flow may be is not confirmed for any edition; one figure is within, a range is "cannot tell".',
  more: { classes: { GMAW: 'essential', FCAW: 'essential' } },
  applies: (_context, { shieldingGas }) => shieldingGas !== null && !isNoGas(shieldingGas) && isStated(shieldingGas.flow),
  check(context, { shieldingGas }) {
    const { min, max, all } = figures(shieldingGas?.flow, 'gasFlow', context.system)
    if (!all && (min === null || max === null || min === max)) return says('within', 'The gas flow is one figure.')
    return cannotTell('How wide a range of gas flow may be is not confirmed here; look it up in your edition.', [`the figure of ${clauseIn(context.edition, 'Table 5.2')} for gas flow`], { asked: all ? { min: null, max: null } : { min, max } })
  },
})
