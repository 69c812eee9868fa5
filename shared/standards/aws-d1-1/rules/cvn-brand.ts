/** Table 6.7: maker, brand or type of flux-cored electrodes (FCAW) and metal-cored ones (GMAW). */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { sameText } from '../../common/reading.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { classification } from '../fillers.ts'
import { meta } from '../meta.ts'

/** A wire of GMAW that is metal-cored by its form or by its class (E70C-…). */
const isMetalCored = ({ filler }: ProcessBlock): boolean => filler.productForm === 'metal-cored' || (filler.productForm === null && /^E\d{2,3}C-/.test(classification(filler) ?? ''))

export const cvnBrand = namedRule({
  meta: meta('cvn_brand', { classes: { FCAW: 'supplementary', GMAW: 'supplementary' } }),
  field: 'filler.tradeName',
  at: 'block',
  label: 'trade name of the electrode',
  applies: (context) => context.block?.process === 'FCAW' || (context.block !== null && isMetalCored(context.block)),
  asked: (context) => (context.block?.filler.tradeName ? [sameText(context.block.filler.tradeName)] : null),
  tested: (_context, side) => (side.block?.filler.tradeName ? sameText(side.block.filler.tradeName) : null),
  because: 'With CVN another maker, brand or type counts for cored electrodes.',
})
