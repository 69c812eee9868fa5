/** Pipe diameter. */
import { isStated } from '../../common/reading.ts'
import { ends, had, statement, WHY } from '../figures-read.ts'
import { meta } from '../meta.ts'
import { unconfirmedFigure } from '../unconfirmed.ts'

export const diameter = unconfirmedFigure({
  meta: meta('diameter', 'Diameter', 'Table 3.1', 'secondary', WHY, statement('Pipe diameter outside the range that the test qualifies')),
  field: 'diameter',
  at: 'weld',
  label: 'pipe diameter',
  dimension: 'length',
  applies: (context) => context.procedure.product !== 'plate',
  asked: (context) => ends(context.procedure.diameter, 'length', context.system),
  tested: (side, system) => (isStated(side.variables.diameter) || side.variables.product !== 'plate' ? had(side.variables.diameter, 'length', system) : null),
})
