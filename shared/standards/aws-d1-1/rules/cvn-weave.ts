/** Table 6.7: weave beads in vertical welding where the test had stringer beads. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'
import { askedPlaces } from '../positions.ts'

const isStringer = (block: ProcessBlock | null): string | null => (block?.technique.bead === 'stringer' ? 'stringer beads' : block?.technique.bead ? 'weave beads' : null)

export const cvnWeave = namedRule({
  meta: meta('cvn_vertical_weave'),
  field: 'technique.bead',
  at: 'block',
  label: 'bead in vertical welding',
  applies: (context) => askedPlaces(context.block?.positions ?? []).includes('vertical'),
  asked(context) {
    const value = isStringer(context.block)
    return value ? [value] : null
  },
  tested: (_context, side) => isStringer(side.block),
  covers: (value) => (value === 'weave beads' ? ['weave beads', 'stringer beads'] : ['stringer beads']),
  because: 'With CVN a change from stringer to weave counts in vertical welding.',
  setValue: (name) => (name === 'stringer beads' ? 'stringer' : 'weave'),
})

