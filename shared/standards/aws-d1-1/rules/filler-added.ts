/** Row 5 (GTAW): filler metal added or left out. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'

const token = (block: ProcessBlock | null): string | null => (block === null || block.filler.added === null ? null : block.filler.added ? 'with filler' : 'without filler')

export const fillerAdded = namedRule({
  meta: meta('filler_presence'),
  field: 'filler.added',
  at: 'block',
  label: 'use of filler metal',
  asked(context) {
    const value = token(context.block)
    return value ? [value] : null
  },
  tested: (_context, side) => token(side.block),
  because: 'Welding with and without filler are qualified apart.',
  setValue: (name) => name === 'with filler',
})
