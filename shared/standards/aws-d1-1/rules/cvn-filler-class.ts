/** Table 6.7: any other filler classification; a filler without one can't be told apart from others. */
import { namedRule } from '../../common/rule-kinds.ts'
import { classification } from '../fillers.ts'
import { meta } from '../meta.ts'

export const cvnFillerClass = namedRule({
  meta: meta('cvn_filler_class'),
  field: 'filler.classification',
  at: 'block',
  label: 'filler classification',
  applies: (context) => context.block?.filler.added !== false,
  asked(context) {
    const value = context.block && classification(context.block.filler)
    return value ? [value] : null
  },
  tested: (_context, side) => (side.block?.filler.added === false ? 'no filler' : side.block ? classification(side.block.filler) : null),
  because: 'With CVN any other classification counts, and an unclassified filler is only itself.',
})

