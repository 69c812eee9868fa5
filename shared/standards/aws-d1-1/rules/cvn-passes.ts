/** Table 6.7: a single pass per side where the test had several. */
import { namedRule } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'

export const cvnPasses = namedRule({
  meta: meta('cvn_multi_to_single'),
  field: 'technique.passesPerSide',
  at: 'block',
  label: 'passes per side',
  asked: (context) => (context.block?.technique.passesPerSide ? [context.block.technique.passesPerSide] : null),
  tested: (_context, side) => side.block?.technique.passesPerSide ?? null,
  covers: (value) => (value === 'single' ? ['single', 'multiple'] : ['multiple']),
  because: 'With CVN a change from several passes to a single pass per side counts.',
  setValue: (name) => name,
})

