/** A temperature of which only what was tested is sure. */
import { between, numericRange, UNLIMITED, unknownNumeric } from '../../ranges/numeric.ts'
import type { NumericRange } from '../../schemas/assessment.ts'
import type { Quantity } from '../../schemas/common.ts'
import type { WeldingVariables } from '../../schemas/welding.ts'
import { siFigure } from '../common/iso-names.ts'
import { bandRule } from '../common/review-band.ts'
import { show } from '../common/wording.ts'
import type { Rule } from '../rule.ts'
import { meta } from './meta.ts'

/** @param sure what a tested temperature surely covers; whatever else must be looked up */
export const temperatureRule = (file: string, label: string, title: string, clause: string, field: 'minimum' | 'interpassMaximum', statement: string, sure: (had: number) => NumericRange): Rule => {
  const read = (variables: WeldingVariables): Quantity | null => variables.preheat[field]
  return bandRule({
    meta: meta(file, { title, clause, statement }),
    field: `preheat.${field}`,
    at: 'weld',
    label,
    dimension: 'temperature',
    ends: { min: '', max: '' },
    asked(context) {
      const value = siFigure(read(context.procedure), 'temperature')
      return value === null ? null : { min: value, max: value }
    },
    band(_context, side) {
      const had = siFigure(read(side.variables), 'temperature')
      const unknown = unknownNumeric('temperature', '°C')
      if (had === null) return { sure: numericRange('temperature', '°C', []), maybe: unknown, tested: null, reason: `${side.coupon.number} has no ${label} recorded.`, missing: [`${side.coupon.number}: preheat.${field}`] }
      return { sure: sure(had), maybe: between('temperature', '°C', UNLIMITED, UNLIMITED), tested: had, reason: `${show(had, '°C')} was tested.`, why: `How far the ${label} may differ from the tested one is not held here.` }
    },
  })
}
