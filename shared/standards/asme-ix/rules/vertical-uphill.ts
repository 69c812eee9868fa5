/** QW-405.2, editions to 2017: with toughness, only vertical uphill covers vertical uphill; it covers all positions. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'

const VERTICAL: ReadonlySet<string> = new Set(['3G', '3F', '5G', '5F', '6G', '6GR'])
const OTHER = 'positions other than vertical uphill'
const STRINGER = 'vertical uphill, stringer'
const WEAVE = 'vertical uphill, weave'

/** What the block does at worst (procedure) or surely did (coupon); null when position, direction or bead isn't stated. */
function token(block: ProcessBlock | null): string | null {
  if (!block || block.positions.length === 0) return null
  if (!block.positions.some((position) => VERTICAL.has(position))) return OTHER
  if (block.progression === 'down') return OTHER
  if (block.progression === null || block.technique.bead === null) return null
  return block.technique.bead === 'stringer' ? STRINGER : WEAVE
}

export const verticalUphill = namedRule({
  meta: meta('QW-405.2', 'vertical-uphill'),
  field: 'positions',
  at: 'block',
  label: 'position, direction and bead of vertical welding',
  asked(context) {
    const value = token(context.block)
    return value ? [value] : null
  },
  tested: (_context, side) => token(side.block),
  covers: (value) => (value === WEAVE ? [WEAVE, STRINGER, OTHER] : value === STRINGER ? [STRINGER, OTHER] : [OTHER]),
  lacks: (_, block) => (!block || block.positions.length === 0 ? ['positions'] : [...(block.progression === null ? ['progression'] : []), ...(block.technique.bead === null ? ['technique.bead'] : [])]),
  because: 'Vertical uphill covers all positions; no other position covers it, and uphill stringer beads do not cover weaving.',
})
