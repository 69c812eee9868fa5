/** Row 8 (SAW): more supplemental filler than tested. */
import { between, closed, unknownNumeric } from '../../../ranges/numeric.ts'
import { figureOrNull } from '../../common/reading.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { show } from '../../common/wording.ts'
import { meta } from '../meta.ts'
import { asksSupplement, hasSupplement } from '../supplement.ts'

export const supplementalAmount = figureRule({
  meta: meta('supplemental_amount'),
  field: 'filler.supplementalVolume',
  at: 'block',
  label: 'amount of supplemental filler',
  dimension: 'percent',
  ends: { min: '', max: '' },
  applies: asksSupplement,
  asked(context) {
    const max = figureOrNull(context.block?.filler.supplementalVolume, 'percent', context.system)
    return max === null ? null : { min: 0, max }
  },
  range(context, side) {
    const had = hasSupplement(side.block) === false ? 0 : figureOrNull(side.block?.filler.supplementalVolume, 'percent', context.system)
    if (had === null) return { range: unknownNumeric('percent', '%'), tested: null, reason: `${side.coupon.number} does not record how much supplemental filler it had.`, missing: [`${side.coupon.number}: filler.supplementalVolume`] }
    return { range: between('percent', '%', closed(0), closed(had)), tested: had, reason: `Not more than the ${show(had, '%')} tested.` }
  },
})
