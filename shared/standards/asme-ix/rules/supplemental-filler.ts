/** QW-404.24: supplemental filler added, removed, or its volume changed by more than 10 %. */
import { between, closed, containsValue } from '../../../ranges/numeric.ts'
import { tidy } from '../../common/reading.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { show } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { meta } from '../meta.ts'

const token = (used: boolean | null | undefined): string | null => (used === true ? 'with supplemental filler' : used === false ? 'without supplemental filler' : null)

const base = namedRule({
  meta: meta('QW-404.24', 'supplemental-filler'),
  field: 'filler.supplemental',
  at: 'block',
  label: 'use of supplemental filler',
  asked(context) {
    const value = token(context.block?.filler.supplemental)
    return value ? [value] : null
  },
  tested: (_context, side) => token(side.block?.filler.supplemental),
  because: 'Supplemental filler may be neither added nor removed, nor its volume changed by more than 10 %.',
  // Adding it leaves its volume open, so only leaving it out is a cure.
  setValue: (name) => (name === 'with supplemental filler' ? undefined : false),
})

export const supplementalFiller: Rule = {
  ...base,
  check(context, sides, joined) {
    const judged = base.check(context, sides, joined)
    if (judged?.verdict !== 'within' || context.block?.filler.supplemental !== true) return judged
    const asked = context.block.filler.supplementalVolume ?? null
    const field = `${context.path}.filler.supplementalVolume`
    const lacking = [...(asked ? [] : ['procedure: filler.supplementalVolume']), ...sides.filter((side) => !side.block?.filler.supplementalVolume).map((side) => `${side.coupon.number}: filler.supplementalVolume`)]
    if (!asked || lacking.length > 0) return { verdict: 'cannot-tell', sentence: "The volume of supplemental filler isn't recorded on both sides, so a change of more than 10 % can't be ruled out.", asked: null, range: null, field, missing: lacking, fixes: asked ? [] : [{ kind: 'state', label: 'State the volume of supplemental filler', field }] }
    for (const side of sides) {
      const had = side.block?.filler.supplementalVolume?.si ?? 0
      const range = between('percent', '%', closed(tidy(0.9 * had)), closed(tidy(1.1 * had)))
      if (containsValue(range, asked.si) === 'within') continue
      return { verdict: 'outside', sentence: `Supplemental filler of ${show(asked.si, '%')} differs by more than 10 % from the ${show(had, '%')} of ${side.coupon.number}.`, asked: { min: asked.si, max: asked.si }, range, tested: [had], field, fixes: [{ kind: 'plan-coupon', label: 'Weld a coupon with that volume', requirement: `A coupon with ${show(asked.si, '%')} supplemental filler.` }] }
    }
    return judged
  },
}
