/** Table 6.7: machine oscillation changed by more than 20 %. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { plainWords } from '../../common/reading.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { names } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { meta } from '../meta.ts'

const swings = (block: ProcessBlock | null): boolean => block?.mechanisation === 'machine' || block?.mechanisation === 'automatic'

/** Oscillation is kept as text, so only equal words can be told to be within 20 %. */
const oscillation = namedRule({
  meta: meta('cvn_oscillation'),
  field: 'technique.oscillation',
  at: 'block',
  label: 'machine oscillation',
  applies: (context) => swings(context.block),
  asked: (context) => (context.block?.technique.oscillation ? [plainWords(context.block.technique.oscillation)] : null),
  tested: (_context, side) => (side.block?.technique.oscillation ? plainWords(side.block.technique.oscillation) : null),
  because: 'With CVN machine oscillation may change by 20 %.',
})

export const cvnOscillation: Rule = {
  ...oscillation,
  check(context, sides, joined) {
    const judged = oscillation.check(context, sides, joined)
    if (judged?.verdict !== 'outside') return judged
    return { ...judged, verdict: 'cannot-tell', sentence: `Machine oscillation is written otherwise than on ${names(sides)}; whether it differs by more than 20 % must be judged by a person.`, missing: ['oscillation in figures on both sides'], fixes: [] }
  },
}
