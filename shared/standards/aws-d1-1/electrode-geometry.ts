/** What rows 22 to 26 (SAW) share: a spacing or an angle that may change by a printed step. */
import { between, closed, unknownNumeric } from '../../ranges/numeric.ts'
import type { ProcessBlock, Technique } from '../../schemas/welding.ts'
import type { Dimension, UnitSystem } from '../../units/types.ts'
import { figureOrNull, tidy, unitOf } from '../common/reading.ts'
import { figureRule } from '../common/rule-kinds.ts'
import { show } from '../common/wording.ts'
import type { Rule } from '../rule.ts'
import { meta } from './meta.ts'
import type { Variable } from './variables.ts'

type Measure = 'electrodeSpacing' | 'lateralSpacing' | 'parallelAngle' | 'travelAngle' | 'normalAngle'

export const several = ({ technique }: ProcessBlock): boolean => technique.electrodes === 'multiple' || (technique.electrodeCount ?? 1) > 1
export const mechanised = ({ mechanisation }: ProcessBlock): boolean => mechanisation !== 'manual' && mechanisation !== 'semiautomatic'

const value = (technique: Technique, measure: Measure, dimension: Dimension, system: UnitSystem): number | null => figureOrNull(technique[measure], dimension, system)

export function geometryRule(variable: Variable, measure: Measure, label: string, dimension: Dimension, when: (block: ProcessBlock) => boolean, room: (had: number, system: UnitSystem) => number): Rule {
  return figureRule({
    meta: meta(variable),
    field: `technique.${measure}`,
    at: 'block',
    label,
    dimension,
    ends: { min: '', max: '' },
    applies: (context) => context.block !== null && when(context.block),
    asked(context) {
      const one = context.block && value(context.block.technique, measure, dimension, context.system)
      return one === null ? null : { min: one, max: one }
    },
    range(context, side) {
      const { system } = context
      const unit = unitOf(dimension, system)
      if (!side.block) return null
      const had = value(side.block.technique, measure, dimension, system)
      if (had === null) return { range: unknownNumeric(dimension, unit), tested: null, reason: `${side.coupon.number} does not record the ${label}.`, missing: [`${side.coupon.number}: technique.${measure}`] }
      const step = room(had, system)
      return { range: between(dimension, unit, closed(tidy(had - step)), closed(tidy(had + step))), tested: had, reason: `${show(had, unit)} may change by ${show(step, unit)}.` }
    },
  })
}

/** Printed: 10 % or 3 mm (1/8 in.), whichever is greater. */
export const spacingRoom = (had: number, system: UnitSystem): number => Math.max(tidy(0.1 * had), system === 'SI' ? 3 : 1 / 8)
