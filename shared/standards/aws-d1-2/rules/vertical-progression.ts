/** Vertical welding uphill or downhill. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { meta, TABLE } from '../meta.ts'

const isVertical = (block: ProcessBlock | null): boolean => (block?.positions ?? []).some((one) => ['3G', '3F', '5G', '5F', '6G', '6GR'].includes(one))
const directions = (block: ProcessBlock | null): string[] | null => (block?.progression === 'both' ? ['uphill', 'downhill'] : block?.progression ? [block.progression === 'up' ? 'uphill' : 'downhill'] : null)

export const progression = namedRule({
  meta: meta('vertical-progression', 'Vertical direction', 'Table 3.1', 'memory', TABLE, 'Vertical welding uphill instead of downhill, or back.'),
  field: 'progression',
  at: 'block',
  label: 'vertical direction',
  applies: (context) => isVertical(context.block),
  asked: (context) => directions(context.block),
  tested: (_context, side) => (isVertical(side.block) ? (directions(side.block)?.join(' and ') ?? null) : undefined),
  covers: (_value, _context, side) => directions(side.block) ?? [],
  because: 'Uphill and downhill are qualified apart.',
  setValue: (name) => (name === 'uphill' ? 'up' : 'down'),
})
