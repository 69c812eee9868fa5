/** 8.5: backing gas of processes 14 and 15. */
import type { GasMixture } from '../../../schemas/welding.ts'
import { gasSymbol } from '../../common/iso-names.ts'
import { isNoGas } from '../../common/reading.ts'
import { nameBandRule } from '../../common/review-band.ts'
import { levelTwoLimit } from '../levels.ts'
import { meta } from '../meta.ts'
import { named } from '../named.ts'

const backing = (gas: GasMixture | null): string | null => (gas && (isNoGas(gas) ? 'no backing gas' : gasSymbol(gas)))

export const backingGas = levelTwoLimit(
  nameBandRule({
    meta: meta('backing-gas', { title: 'Backing gas', clause: '8.5', basis: 'memory', processes: ['GTAW', 'PAW'], statement: 'The backing gas keeps its symbol; a coupon without backing gas covers work with it, not the reverse.' }),
    field: 'backingGas',
    at: 'block',
    label: 'backing gas',
    applies: (context) => context.procedure.joint.weld === 'groove',
    asked: (context) => named(context.block && backing(context.block.backingGas)),
    tested: (_context, side) => named(side.block && backing(side.block.backingGas)),
    covers: (value) => (value[0] === 'no backing gas' ? { sure: 'any' } : { sure: value }),
    because: 'Without backing gas is the harder case: it covers work with it.',
  }),
)
