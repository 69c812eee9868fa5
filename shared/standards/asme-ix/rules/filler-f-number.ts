/** QW-404.4: any change of F-Number is essential, up or down; a filler that is not listed covers only itself. */
import type { Filler } from '../../../schemas/welding.ts'
import { sameText } from '../../common/reading.ts'
import { remember } from '../../common/remember.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'

/** `F-6`, `unlisted`, or null where nothing is written. */
const listed = remember((written) => {
  const f = written.trim().toUpperCase().replace(/^F(-?\s*NO\.?)?[\s-]*/, '')
  return f === '' ? null : /^(NONE|UNLISTED|N\/A)$/.test(f) ? 'unlisted' : `F-${f}`
})

/** `F-6`, or the filler's own name where it is recorded as not listed; null when not recorded. */
function token(filler: Filler): string | null {
  const f = filler.fNumber ? listed(filler.fNumber) : null
  if (f !== 'unlisted') return f
  const name = filler.tradeName ?? filler.classification
  return name ? `filler ${sameText(name)}` : null
}

export const fillerFNumber = namedRule({
  meta: meta('QW-404.4', 'filler-f-number'),
  field: 'filler.fNumber',
  at: 'block',
  label: 'F-Number',
  applies: (context) => context.block?.filler.added !== false,
  asked(context) {
    const value = context.block && token(context.block.filler)
    return value ? [value] : null
  },
  tested: (_context, side) => (side.block?.filler.added === false ? 'no filler' : side.block ? token(side.block.filler) : null),
  because: 'Every F-Number stands alone for a procedure; the welder\'s downward coverage does not exist here.',
  setValue: (name) => (name.startsWith('F-') ? name.slice(2) : undefined),
  plan: (asked) => `A coupon welded with ${asked.join(', ')} filler.`,
  // A filler recorded as not listed is known by its name.
  lacks: (_, block) => (block?.filler.fNumber?.trim() ? ['filler.tradeName'] : []),
})
