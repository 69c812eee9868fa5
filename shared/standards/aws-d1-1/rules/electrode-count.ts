/** Row 11 (SAW, GMAW, FCAW): another number of electrodes. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'

/** `several` without a number can't be compared. */
function token(block: ProcessBlock | null): string | null {
  if (!block) return null
  const { electrodes, electrodeCount } = block.technique
  if (electrodeCount) return electrodeCount === 1 ? 'one electrode' : `${electrodeCount} electrodes`
  return electrodes === 'single' ? 'one electrode' : null
}

export const electrodeCount = namedRule({
  meta: meta('electrode_count'),
  field: 'technique.electrodeCount',
  at: 'block',
  label: 'number of electrodes',
  asked(context) {
    const value = token(context.block)
    return value ? [value] : null
  },
  tested: (_context, side) => token(side.block),
  because: 'Any other number of electrodes counts.',
  setValue: (name) => (name === 'one electrode' ? 1 : Number.parseInt(name, 10)),
})
