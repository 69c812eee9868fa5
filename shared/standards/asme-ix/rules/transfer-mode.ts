/** QW-409.2: spray, globular and pulsed spray are one family, short-circuiting the other. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'

const FAMILY = ['globular', 'pulsed-spray', 'spray']

const asked = (block: ProcessBlock | null): string | null => block?.electrical.transferMode ?? null

export const transferMode = namedRule({
  meta: meta('QW-409.2', 'transfer-mode'),
  field: 'electrical.transferMode',
  at: 'block',
  label: 'transfer mode',
  asked(context) {
    const value = asked(context.block)
    return value ? [value] : null
  },
  tested: (_context, side) => asked(side.block),
  covers: (value) => (value === 'short-circuiting' ? [value] : FAMILY),
  because: 'Spray, globular and pulsed spray cover each other; short-circuiting stands alone.',
  setValue: (name) => name,
})
