/** 8.5: shielding gas by symbol of ISO 14175. */
import { gasSymbol } from '../../common/iso-names.ts'
import { nameBandRule } from '../../common/review-band.ts'
import { levelTwoLimit } from '../levels.ts'
import { meta } from '../meta.ts'
import { named } from '../named.ts'

export const shieldingGas = levelTwoLimit(
  nameBandRule({
    meta: meta('shielding-gas', { title: 'Shielding gas', clause: '8.5', basis: 'read', processes: ['GMAW', 'FCAW', 'GTAW', 'PAW'], classBasis: { GTAW: 'memory', PAW: 'memory' }, statement: 'The shielding gas keeps the symbol of ISO 14175 that was tested; a gas outside the symbols (Z) keeps its nominal composition. Symbols are worked out from the composition by the bands of 2008, recalled; for processes 14 and 15 the rule itself is recalled.' }),
    field: 'shieldingGas',
    at: 'block',
    label: 'shielding gas',
    asked: (context) => named(context.block && gasSymbol(context.block.shieldingGas)),
    tested: (_context, side) => named(side.block && gasSymbol(side.block.shieldingGas)),
    covers: (value) => ({ sure: value, basis: value[0]?.startsWith('Z') ? 'memory' : 'read' }),
    because: 'The symbol (main group and sub-group) is the limit.',
  }),
)
