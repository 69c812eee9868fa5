/** 8.5: plasma gas of process 15. */
import { gasName } from '../../common/reading.ts'
import { nameBandRule } from '../../common/review-band.ts'
import { levelTwoLimit } from '../levels.ts'
import { meta } from '../meta.ts'
import { named } from '../named.ts'

export const plasmaGas = levelTwoLimit(
  nameBandRule({
    meta: meta('plasma-gas', { title: 'Plasma gas', clause: '8.5', basis: 'memory', processes: ['PAW'], statement: 'The plasma gas keeps the composition tested.' }),
    field: 'plasmaGas',
    at: 'block',
    label: 'plasma gas',
    asked: (context) => named(gasName(context.block?.plasmaGas ?? null)),
    tested: (_context, side) => named(gasName(side.block?.plasmaGas ?? null)),
    because: 'The nominal composition stays as tested.',
  }),
)
