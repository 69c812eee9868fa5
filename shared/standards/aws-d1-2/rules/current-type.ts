/** Type of current and polarity: that of the test. */
import { namedRule } from '../../common/rule-kinds.ts'
import { meta, TABLE } from '../meta.ts'

export const currentType = namedRule({
  meta: meta('current-type', 'Current type', 'Table 3.1', 'memory', TABLE, 'Another type of current or polarity.'),
  field: 'electrical.currentType',
  at: 'block',
  label: 'current type and polarity',
  asked: (context) => (context.block?.electrical.currentType ? [context.block.electrical.currentType] : null),
  tested: (_context, side) => side.block?.electrical.currentType ?? null,
  because: 'The current must be that of the test.',
  setValue: (name) => name,
})
