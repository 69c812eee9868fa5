/** Row 6 (GTAW): cold wire feed changed to hot wire feed, or back. A wire fed by hand is cold. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'

function token(block: ProcessBlock | null): string | null {
  if (!block) return null
  if (block.mechanisation === 'manual') return 'cold wire'
  const hot = block.technique.hotWire ?? null
  return hot === null ? null : hot ? 'hot wire' : 'cold wire'
}

export const hotWire = namedRule({
  meta: meta('hot_wire'),
  field: 'technique.hotWire',
  at: 'block',
  label: 'hot or cold wire',
  applies: (context) => context.block?.filler.added !== false,
  asked(context) {
    const value = token(context.block)
    return value ? [value] : null
  },
  tested: (_context, side) => (side.block?.filler.added === false ? 'no filler' : token(side.block)),
  because: 'Hot and cold wire feed are qualified apart.',
  setValue: (name) => name === 'hot wire',
})
