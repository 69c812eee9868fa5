/** Row 14 (GMAW): any other mode of transfer. */
import { namedRule } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'

export const transferMode = namedRule({
  meta: meta('transfer_mode'),
  field: 'electrical.transferMode',
  at: 'block',
  label: 'transfer mode',
  asked: (context) => (context.block?.electrical.transferMode ? [context.block.electrical.transferMode] : null),
  tested: (_context, side) => side.block?.electrical.transferMode ?? null,
  because: 'Every mode of transfer is qualified by itself, pulsed spray apart from spray.',
  setValue: (name) => name,
})
