/** Prequalified GMAW and FCAW need constant voltage. */
import { cannotTell } from '../../common/wording.ts'
import { condition } from './meta.ts'
import { byTest, says } from './verdict.ts'

export const pqPowerSource = condition({
  file: 'power-source', title: 'Constant-voltage power source', clause: 'Clause 5', basis: 'memory', field: 'electrical.powerSource', at: 'block',
  source: 'Clause 5 as recalled',
  statement: 'Prequalified GMAW and FCAW need a constant-voltage power source.',
  more: { classes: { GMAW: 'essential', FCAW: 'essential' } },
  check(context, block) {
    const field = `${context.path}.electrical.powerSource`
    const { powerSource } = block.electrical
    if (powerSource === null) return cannotTell('The output of the power source is not stated; prequalified work needs constant voltage.', ['procedure: electrical.powerSource'], { field, fixes: [{ kind: 'state', label: 'State the output of the power source', field }] })
    if (powerSource === 'constant-current') return says('outside', 'A constant-current power source is not prequalified for this process.', { asked: ['constant current'], fixes: [{ kind: 'set', label: 'Set the power source to constant voltage', field, value: 'constant-voltage' }, byTest] })
    return says('within', 'The power source is constant voltage.', { asked: ['constant voltage'] })
  },
})
