/** Preheat: how far it may change isn't confirmed. */
import type { UnitSystem } from '../../../units/types.ts'
import { figureOrNull } from '../../common/reading.ts'
import type { CouponSide } from '../../rule.ts'
import { statement, WHY } from '../figures-read.ts'
import { meta } from '../meta.ts'
import { unconfirmedFigure } from '../unconfirmed.ts'

const preheatOf = (side: Pick<CouponSide, 'variables'>, system: UnitSystem): { min: number; max: number } | null => {
  const value = figureOrNull(side.variables.preheat.minimum, 'temperature', system)
  return value === null ? null : { min: value, max: value }
}

export const preheat = unconfirmedFigure({
  meta: meta('preheat', 'Preheat', 'Table 3.1', 'secondary', WHY, statement('Another preheat')),
  field: 'preheat.minimum',
  at: 'weld',
  label: 'preheat',
  dimension: 'temperature',
  ends: { min: '', max: '' },
  asked: (context) => preheatOf({ variables: context.procedure }, context.system),
  tested: preheatOf,
})
