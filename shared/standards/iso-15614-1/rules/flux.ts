/** 8.5: make and designation of flux. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { sameText } from '../../common/reading.ts'
import { nameBandRule } from '../../common/review-band.ts'
import { levelTwoLimit } from '../levels.ts'
import { meta } from '../meta.ts'

const flux = (block: ProcessBlock | null): readonly string[] | null => (block?.filler.fluxTradeName && block.filler.fluxClassification ? [`${sameText(block.filler.fluxTradeName)} ${sameText(block.filler.fluxClassification)}`] : null)

export const fluxMake = levelTwoLimit(
  nameBandRule({
    meta: meta('flux', { title: 'Flux', clause: '8.5', basis: 'read', processes: ['SAW'], statement: 'The flux of submerged arc welding stays of the make and designation tested.' }),
    field: 'filler.fluxTradeName',
    at: 'block',
    label: 'flux',
    asked: (context) => flux(context.block),
    tested: (_context, side) => flux(side.block),
    because: 'Make and designation stay as tested.',
    lacks: () => ['filler.fluxTradeName', 'filler.fluxClassification'],
  }),
)
