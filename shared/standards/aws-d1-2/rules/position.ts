/** Position: what a test position covers besides itself isn't confirmed. */
import { meta } from '../meta.ts'
import { unconfirmedName } from '../unconfirmed.ts'

export const position = unconfirmedName({
  meta: meta('position', 'Position', 'Table 3.3', 'memory', 'Position as a variable recalled; Table 3.3 could not be confirmed', 'Another position. What a test position covers besides itself is not confirmed, so another one is "cannot tell".'),
  field: 'positions',
  at: 'block',
  label: 'position',
  asked: (context) => (context.block && context.block.positions.length > 0 ? context.block.positions : null),
  tested: (_context, side) => (side.block && side.block.positions.length > 0 ? side.block.positions.join(' and ') : null),
  covers: (_value, _context, side) => side.block?.positions ?? [],
  because: 'A test position covers itself.',
})
