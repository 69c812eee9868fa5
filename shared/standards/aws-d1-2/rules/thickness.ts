/** Table 3.4, which could not be confirmed. */
import { meta } from '../meta.ts'
import { statement, thicknesses } from '../figures-read.ts'
import { unconfirmedFigure } from '../unconfirmed.ts'

export const thickness = unconfirmedFigure({
  meta: meta('thickness', 'Thickness', 'Table 3.4', 'memory', 'Table 3.4 could not be confirmed; no figure of another standard is used', statement('Thickness outside the range that the test qualifies')),
  field: 'thickness',
  at: 'weld',
  label: 'thickness',
  dimension: 'length',
  asked: (context) => thicknesses(context.procedure, context.system),
  tested(side, system) {
    const told = thicknesses(side.variables, system)
    return told === null || told === 'fault' || told.min === null || told.max === null ? null : { min: told.min, max: told.max }
  },
})
