/** QW-404.23: bare (solid or metal cored), flux cored, flux coated and powder do not cover each other. */
import type { Filler } from '../../../schemas/welding.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'

const FAMILY: Record<NonNullable<Filler['productForm']>, string> = {
  solid: 'bare (solid or metal cored)',
  'metal-cored': 'bare (solid or metal cored)',
  insert: 'bare (solid or metal cored)',
  'flux-cored': 'flux cored',
  'covered-electrode': 'flux coated',
  powder: 'powder',
}
const FORM: Record<string, Filler['productForm']> = { 'bare (solid or metal cored)': 'solid', 'flux cored': 'flux-cored', 'flux coated': 'covered-electrode', powder: 'powder' }

const token = (filler: Filler | undefined): string | null => (filler?.productForm ? FAMILY[filler.productForm] : null)

export const fillerProductForm = namedRule({
  meta: meta('QW-404.23', 'filler-product-form'),
  field: 'filler.productForm',
  at: 'block',
  label: 'filler product form',
  applies: (context) => context.block?.filler.added !== false,
  asked(context) {
    const value = token(context.block?.filler)
    return value ? [value] : null
  },
  tested: (_context, side) => (side.block?.filler.added === false ? 'no filler' : token(side.block?.filler)),
  because: 'Solid and metal-cored wire are one form; flux cored, flux coated and powder are forms of their own.',
  setValue: (name) => FORM[name] ?? undefined,
})
