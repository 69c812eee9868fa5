/** Rows 7 to 9 (SAW): supplemental filler added or left out, more of it, and an alloy that depends on it. */
import { between, closed, unknownNumeric } from '../../../ranges/numeric.ts'
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { figureOrNull, sameText } from '../../common/reading.ts'
import { figureRule, namedRule } from '../../common/rule-kinds.ts'
import { show } from '../../common/wording.ts'
import type { RuleContext } from '../../rule.ts'
import { meta } from '../meta.ts'

const used = (block: ProcessBlock | null): boolean | null => block?.filler.supplemental ?? null
const word = (value: boolean | null): string | null => (value === null ? null : value ? 'with supplemental filler' : 'without supplemental filler')
const isUsed = (context: RuleContext): boolean => used(context.block) === true

export const supplementalFiller = namedRule({
  meta: meta('supplemental_filler'),
  field: 'filler.supplemental',
  at: 'block',
  label: 'use of supplemental filler',
  asked(context) {
    const value = word(used(context.block))
    return value ? [value] : null
  },
  tested: (_context, side) => word(used(side.block)),
  because: 'Adding or leaving out supplemental filler counts.',
  setValue: (name) => name === 'with supplemental filler',
})

export const supplementalAmount = figureRule({
  meta: meta('supplemental_amount'),
  field: 'filler.supplementalVolume',
  at: 'block',
  label: 'amount of supplemental filler',
  dimension: 'percent',
  ends: { min: '', max: '' },
  applies: isUsed,
  asked(context) {
    const max = figureOrNull(context.block?.filler.supplementalVolume, 'percent', context.system)
    return max === null ? null : { min: 0, max }
  },
  range(context, side) {
    const had = used(side.block) === false ? 0 : figureOrNull(side.block?.filler.supplementalVolume, 'percent', context.system)
    if (had === null) return { range: unknownNumeric('percent', '%'), tested: null, reason: `${side.coupon.number} does not record how much supplemental filler it had.`, missing: [`${side.coupon.number}: filler.supplementalVolume`] }
    return { range: between('percent', '%', closed(0), closed(had)), tested: had, reason: `Not more than the ${show(had, '%')} tested.` }
  },
})

function alloy(block: ProcessBlock | null): string | null {
  if (!block) return null
  if (block.filler.supplemental === false || block.filler.supplementalAlloyElement === false) return 'no alloy from the supplement'
  if (block.filler.supplementalAlloyElement === null || block.filler.depositComposition === null) return null
  return `deposit ${sameText(block.filler.depositComposition)}`
}

export const supplementAlloy = namedRule({
  meta: meta('supplement_alloy'),
  field: 'filler.depositComposition',
  at: 'block',
  label: 'deposit composition with supplemental filler',
  applies: isUsed,
  asked(context) {
    const value = alloy(context.block)
    return value ? [value] : null
  },
  tested: (_context, side) => alloy(side.block),
  because: 'Where the alloy depends on the supplement, the deposit must stay in the chemistry that the procedure states.',
})
