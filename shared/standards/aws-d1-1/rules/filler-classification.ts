/** Row 3 (SAW, GTAW): another classification. To which processes the row belongs isn't confirmed, so a change can't be told. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { sameText } from '../../common/reading.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { names } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { classification } from '../fillers.ts'
import { meta } from '../meta.ts'

function token(block: ProcessBlock | null): string | null {
  if (!block) return null
  const wire = classification(block.filler)
  if (block.process !== 'SAW') return wire
  const flux = block.filler.fluxClassification
  return wire !== null && flux !== null ? `${wire} with ${sameText(flux)}` : null
}

const base = namedRule({
  meta: meta('filler_classification'),
  field: 'filler.classification',
  at: 'block',
  label: 'filler classification',
  applies: (context) => context.block?.filler.added !== false,
  asked(context) {
    const value = token(context.block)
    return value ? [value] : null
  },
  tested: (_context, side) => (side.block?.filler.added === false ? 'no filler' : token(side.block)),
  because: 'Any other electrode or flux-electrode classification counts, where the row applies.',
})

export const fillerClassification: Rule = {
  ...base,
  check(context, sides, joined) {
    const judged = base.check(context, sides, joined)
    if (judged?.verdict !== 'outside') return judged
    return { ...judged, verdict: 'cannot-tell', sentence: `The filler differs from that of ${names(sides)}; whether the row binds ${context.block?.process ?? 'this process'} is not confirmed here, so look it up in your edition.`, missing: ['confirmation of row 3 for this process'] }
  },
}
