/** QW-409.4: AC or DC and its polarity; supplementary with toughness, else to be stated. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'

/** Balanced alternating current is alternating current. */
const token = (block: ProcessBlock | null): string | null => (block?.electrical.currentType === 'AC-balanced' ? 'AC' : (block?.electrical.currentType ?? null))

export const currentType = namedRule({
  meta: meta('QW-409.4', 'current-type'),
  field: 'electrical.currentType',
  at: 'block',
  label: 'current type and polarity',
  asked(context) {
    const value = token(context.block)
    return value ? [value] : null
  },
  tested: (_context, side) => token(side.block),
  because: 'AC, DC electrode positive and DC electrode negative are three; none covers another.',
  setValue: (name) => name,
})
