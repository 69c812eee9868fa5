/** QW-404.14: filler metal added or taken away (GTAW, PAW). */
import { namedRule } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'

const token = (added: boolean | null | undefined): string | null => (added === true ? 'with filler' : added === false ? 'without filler' : null)

export const fillerAdded = namedRule({
  meta: meta('QW-404.14', 'filler-added'),
  field: 'filler.added',
  at: 'block',
  label: 'use of filler metal',
  asked(context) {
    const value = token(context.block?.filler.added)
    return value ? [value] : null
  },
  tested: (_context, side) => token(side.block?.filler.added),
  because: 'With and without filler metal are two qualifications.',
  setValue: (name) => name === 'with filler',
})
