/** Heat treatment after welding. */
import { namedRule } from '../../common/rule-kinds.ts'
import { meta, TABLE } from '../meta.ts'

export const pwht = namedRule({
  meta: meta('pwht', 'Postweld heat treatment', 'Table 3.1', 'secondary', TABLE, 'Heat treatment after welding added, left out or changed in kind.'),
  field: 'pwht.condition',
  at: 'weld',
  label: 'heat treatment after welding',
  asked: (context) => (context.procedure.pwht.condition ? [context.procedure.pwht.condition] : null),
  tested: (_context, side) => side.variables.pwht.condition,
  because: 'The same heat treatment after welding.',
  display: (name) => (name === 'none' ? 'no heat treatment' : name.replaceAll('-', ' ')),
  setValue: (name) => name,
})
