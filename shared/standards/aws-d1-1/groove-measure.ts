/** What row 33 is made of: a measure of the groove that may fall or rise by the tolerance, and no further. */
import { between, closed, UNLIMITED, unknownNumeric } from '../../ranges/numeric.ts'
import type { Fix, NumericRange } from '../../schemas/assessment.ts'
import type { Interval } from '../../schemas/common.ts'
import type { WeldingVariables } from '../../schemas/welding.ts'
import type { UnitSystem } from '../../units/types.ts'
import { figures, tidy, unitOf } from '../common/reading.ts'
import { figureRule } from '../common/rule-kinds.ts'
import { show } from '../common/wording.ts'
import type { Rule, RuleContext } from '../rule.ts'
import { meta } from './meta.ts'
import type { Variable } from './variables.ts'

export const asksGroove = (context: RuleContext): boolean => context.procedure.joint.weld === 'groove'
export const isGouged = ({ joint }: WeldingVariables): boolean => joint.backGouging !== null && joint.backGouging !== 'none'
export const isNotSquare = ({ joint }: WeldingVariables): boolean => joint.groove !== 'square'

export interface Measure { cure?: (context: RuleContext, joined: NumericRange) => readonly Fix[]; variable: Variable; field: string; label: string; dimension: 'length' | 'angle'; value: (variables: WeldingVariables) => Interval | null; may: 'fall' | 'rise'; room: (variables: WeldingVariables, system: UnitSystem) => number | null; arises: (variables: WeldingVariables) => boolean }

export function grooveMeasure({ cure, variable, field, label, dimension, value, may, room, arises }: Measure): Rule {
  return figureRule({
    meta: meta(variable),
    field,
    at: 'weld',
    label,
    dimension,
    cure,
    applies: (context) => asksGroove(context) && arises(context.procedure),
    asked(context) {
      const { min, max, all, fault } = figures(value(context.procedure), dimension, context.system)
      if (fault) return 'fault'
      if (all) return { min: null, max: null }
      const low = min ?? max
      const high = max ?? min
      return low === null || high === null ? null : { min: low, max: high }
    },
    range(context, side) {
      const { system } = context
      const unit = unitOf(dimension, system)
      if (side.variables.joint.weld === 'fillet') return null
      // A test of another groove says nothing of this measure: the groove type is judged by itself.
      if (!arises(side.variables)) return { range: between(dimension, unit, UNLIMITED, UNLIMITED), tested: null, reason: `${side.coupon.number} has a groove without ${label}.` }
      const { min, max, fault } = figures(value(side.variables), dimension, system)
      const had = may === 'fall' ? (min ?? max) : (max ?? min)
      if (had === null || fault) return { range: unknownNumeric(dimension, unit), tested: null, reason: `${side.coupon.number} does not record the ${label}.`, missing: [`${side.coupon.number}: ${field}`] }
      const step = room(side.variables, system)
      if (step === null) return { range: between(dimension, unit, UNLIMITED, UNLIMITED), tested: had, reason: `The ${label} of a backgouged root is not limited.` }
      const edge = tidy(may === 'fall' ? had - step : had + step)
      return { range: may === 'fall' ? between(dimension, unit, closed(edge), UNLIMITED) : between(dimension, unit, UNLIMITED, closed(edge)), tested: had, reason: `${show(had, unit)} may be ${show(step, unit)} ${may === 'fall' ? 'less' : 'more'}.` }
    },
  })
}
