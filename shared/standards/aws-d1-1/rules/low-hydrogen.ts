/** Row 2 (SMAW): a low-hydrogen electrode replaced by one that is not. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { isLowHydrogen } from '../fillers.ts'
import { meta } from '../meta.ts'

const LOW = 'low-hydrogen'
const OTHER = 'other than low-hydrogen'

function token(block: ProcessBlock | null): string | null {
  const low = block && isLowHydrogen(block.filler)
  return low === null ? null : low ? LOW : OTHER
}

export const lowHydrogen = namedRule({
  meta: meta('low_hydrogen'),
  field: 'filler.classification',
  at: 'block',
  label: 'kind of electrode covering',
  asked(context) {
    const value = token(context.block)
    return value ? [value] : null
  },
  tested: (_context, side) => token(side.block),
  covers: (value) => (value === OTHER ? [OTHER, LOW] : [LOW]),
  because: 'A change to low-hydrogen is free, a change away from it is not.',
})
