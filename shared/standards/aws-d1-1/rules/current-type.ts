/** Row 13: another type of current or polarity. The SMAW column isn't confirmed. */
import { namedRule } from '../../common/rule-kinds.ts'
import { names } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { meta } from '../meta.ts'

const base = namedRule({
  meta: meta('current_polarity'),
  field: 'electrical.currentType',
  at: 'block',
  label: 'current type and polarity',
  asked: (context) => (context.block?.electrical.currentType ? [context.block.electrical.currentType] : null),
  tested: (_context, side) => side.block?.electrical.currentType ?? null,
  because: 'Any other current or polarity counts.',
  setValue: (name) => name,
})

export const currentType: Rule = {
  ...base,
  check(context, sides, joined) {
    const judged = base.check(context, sides, joined)
    if (judged?.verdict !== 'outside' || context.block?.process !== 'SMAW') return judged
    return { ...judged, verdict: 'cannot-tell', sentence: `${judged.sentence} Whether this counts for SMAW is not confirmed here (asked: ${context.block.electrical.currentType ?? ''}; ${names(sides)}); look it up in your edition.`, missing: ['confirmation of row 13 for SMAW'] }
  },
}
