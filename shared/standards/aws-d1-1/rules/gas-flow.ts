/** Row 20: total gas flow, at 50 % above or 20 % below already a change. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { figures, isNoGas } from '../../common/reading.ts'
import { meta } from '../meta.ts'
import { percentRule } from '../percent.ts'

const usesGas = (block: ProcessBlock | null): boolean => !!block && !(block.shieldingGas && isNoGas(block.shieldingGas))

export const gasFlow = percentRule({
  meta: meta('gas_flow_up'),
  field: 'shieldingGas.flow',
  label: 'gas flow',
  dimension: 'gasFlow',
  band: () => ({ down: 20, up: 50, open: true }),
  // The figures of 2000; from which edition on the later ones hold isn't confirmed.
  otherBand: (process, edition) => (edition !== '2010' ? null : process === 'GTAW' ? { down: 25, up: 50, open: true } : { down: 10, up: 25, open: true }),
  applies: (context) => usesGas(context.block),
  asked(context) {
    const { min, max, all, fault } = figures(context.block?.shieldingGas?.flow, 'gasFlow', context.system)
    if (fault) return 'fault'
    if (all) return { min: null, max: null }
    return min === null && max === null ? null : { min: min ?? max, max: max ?? min }
  },
  tested(side, system) {
    const { min, max } = figures(side.block?.shieldingGas?.flow, 'gasFlow', system)
    const low = min ?? max
    const high = max ?? min
    return low === null || high === null ? null : { min: low, max: high }
  },
})
