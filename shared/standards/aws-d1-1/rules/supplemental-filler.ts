/** Row 7 (SAW): supplemental filler added or left out. */
import { namedRule } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'
import { hasSupplement } from '../supplement.ts'

const word = (value: boolean | null): string | null => (value === null ? null : value ? 'with supplemental filler' : 'without supplemental filler')

export const supplementalFiller = namedRule({
  meta: meta('supplemental_filler'),
  field: 'filler.supplemental',
  at: 'block',
  label: 'use of supplemental filler',
  asked(context) {
    const value = word(hasSupplement(context.block))
    return value ? [value] : null
  },
  tested: (_context, side) => word(hasSupplement(side.block)),
  because: 'Adding or leaving out supplemental filler counts.',
  setValue: (name) => name === 'with supplemental filler',
})
