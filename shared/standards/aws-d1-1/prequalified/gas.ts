/** Table 5.7: shielding gas. The table is not confirmed, so no figure of it is used. */
import { isNoGas } from '../../common/reading.ts'
import { cannotTell } from '../../common/wording.ts'
import { clauseIn } from '../editions.ts'
import { condition } from './meta.ts'
import { says } from './verdict.ts'

export const pqGas = condition({
  file: 'gas', title: 'Prequalified shielding gas', clause: 'Table 5.7', basis: 'memory', field: 'shieldingGas', at: 'block',
  source: 'Table 5.7 recalled with doubt; no figure of it is used',
  statement: 'The gas is the one used to classify the electrode, one of Table 5.7, or one that the maker tested by the A5 specification. The table is not confirmed, so a gas is always "cannot tell" here.',
  more: { classes: { GMAW: 'essential', FCAW: 'essential' } },
  check(context, block) {
    const field = `${context.path}.shieldingGas`
    if (!block.shieldingGas) return cannotTell('The shielding gas is not stated.', ['procedure: shieldingGas'], { field, fixes: [{ kind: 'state', label: 'State the shielding gas, or that none is used', field }] })
    if (isNoGas(block.shieldingGas)) return block.process === 'FCAW' ? says('within', 'Self-shielded: no gas is used.', { asked: ['none'] }) : says('outside', 'GMAW without a shielding gas is not prequalified.', { asked: ['none'] })
    return cannotTell(`Whether the gas is prequalified must be looked up: it is when the electrode was classified with it, when ${clauseIn(context.edition, 'Table 5.7')} lists it, or when the maker tested it by the A5 specification.`, [`the gas in ${clauseIn(context.edition, 'Table 5.7')} or in the electrode's classification`], { field })
  },
})
