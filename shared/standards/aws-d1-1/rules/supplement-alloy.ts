/** Row 9 (SAW): an alloy of the deposit that depends on the supplement. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { plainWords } from '../../common/reading.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { names } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { meta } from '../meta.ts'
import { asksSupplement } from '../supplement.ts'

function alloy(block: ProcessBlock | null): string | null {
  if (!block) return null
  if (block.filler.supplemental === false || block.filler.supplementalAlloyElement === false) return 'no alloy from the supplement'
  if (block.filler.supplementalAlloyElement === null || block.filler.depositComposition === null) return null
  return `deposit ${plainWords(block.filler.depositComposition)}`
}

const base = namedRule({
  meta: meta('supplement_alloy'),
  field: 'filler.depositComposition',
  at: 'block',
  label: 'deposit composition with supplemental filler',
  applies: asksSupplement,
  asked(context) {
    const value = alloy(context.block)
    return value ? [value] : null
  },
  tested: (_context, side) => alloy(side.block),
  lacks: (_variables, block) => (block?.filler.supplementalAlloyElement === null ? ['filler.supplementalAlloyElement'] : ['filler.depositComposition']),
  because: 'Where the alloy depends on the supplement, the deposit must stay in the chemistry that the procedure states.',
})

/** The composition is kept in words: other words may mean the same chemistry. */
export const supplementAlloy: Rule = {
  ...base,
  check(context, sides, joined) {
    const judged = base.check(context, sides, joined)
    if (judged?.verdict !== 'outside') return judged
    return { ...judged, verdict: 'cannot-tell', sentence: `The composition of the deposit is written otherwise than on ${names(sides)}; whether it stays in the chemistry that the procedure states must be judged by a person.`, missing: ['whether both compositions are the same chemistry'], fixes: [] }
  },
}
