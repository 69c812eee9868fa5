/** QW-410.12 (PAW): melt-in and keyhole technique do not cover each other. */
import { namedRule } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'

export const keyhole = namedRule({
  meta: meta('QW-410.12', 'keyhole'),
  field: 'technique.keyhole',
  at: 'block',
  label: 'melt-in or keyhole technique',
  asked: (context) => (context.block?.technique.keyhole ? [context.block.technique.keyhole] : null),
  tested: (_context, side) => side.block?.technique.keyhole ?? null,
  because: 'Melt-in and keyhole are two qualifications; a record that used both covers them only together.',
  setValue: (name) => name,
})
