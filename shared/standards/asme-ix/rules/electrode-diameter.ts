/** QW-404.7 (SMAW): with toughness, the electrode may not grow above 6 mm (1/4 in.). */
import { between, closed, containsValue, UNLIMITED, unknownNumeric } from '../../../ranges/numeric.ts'
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { quantity } from '../../../units/convert.ts'
import type { UnitSystem } from '../../../units/types.ts'
import { figure, unitOf } from '../../common/reading.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { show } from '../../common/wording.ts'
import { unlessHeatTreated } from '../heat-treated.ts'
import { meta } from '../meta.ts'
import { exemptByHeatTreatment, FIGURES } from '../ranges.ts'

const largest = (block: ProcessBlock | null, system: UnitSystem): number | null =>
  block && block.filler.diameters.length > 0 ? Math.max(...block.filler.diameters.map((diameter) => figure(diameter, 'length', system))) : null

export const electrodeDiameter = unlessHeatTreated(figureRule({
  meta: meta('QW-404.7', 'electrode-diameter'),
  field: 'filler.diameters',
  at: 'block',
  label: 'electrode diameter',
  dimension: 'length',
  cure(context, joined, field) {
    const unit = unitOf('length', context.system)
    const kept = (context.block?.filler.diameters ?? []).filter((diameter) => containsValue(joined, figure(diameter, 'length', context.system)) === 'within')
    const most = Math.max(FIGURES[context.system].electrode, ...kept.map((diameter) => figure(diameter, 'length', context.system)))
    return kept.length > 0
      ? [{ kind: 'set', label: `Leave out electrodes over ${show(most, unit)}`, field, value: kept }]
      : [{ kind: 'set', label: `Set electrode diameter to ${show(most, unit)}`, field, value: [quantity(most, 'length', unit)] }]
  },
  asked(context) {
    const max = largest(context.block, context.system)
    return max === null ? null : { min: 0, max }
  },
  range(context, side) {
    const unit = unitOf('length', context.system)
    const limit = FIGURES[context.system].electrode
    const had = largest(side.block, context.system)
    if (exemptByHeatTreatment(side.variables) === true) return { range: between('length', unit, UNLIMITED, UNLIMITED), tested: had, reason: 'The heat treatment after welding lifts the diameter limit.' }
    if (had === null) {
      const range = unknownNumeric('length', unit)
      return { range: { ...range, segments: [{ lower: closed(0), upper: closed(limit) }, ...range.segments] }, tested: null, reason: `Up to ${show(limit, unit)} the diameter is free; ${side.coupon.number} records no diameter.`, missing: [`${side.coupon.number}: filler.diameters`] }
    }
    return { range: between('length', unit, closed(0), closed(Math.max(limit, had))), tested: had, reason: `Electrodes up to ${show(Math.max(limit, had), unit)} are covered.` }
  },
}))
