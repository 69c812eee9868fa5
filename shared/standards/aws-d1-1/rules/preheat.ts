/** Row 35: preheat may fall by 15 °C (25 °F), with GTAW by 55 °C (100 °F). */
import { figureOrNull } from '../../common/reading.ts'
import { lowestTemperature } from '../temperature-rule.ts'

export const preheat = lowestTemperature('preheat', 'minimum preheat', (side, system) => figureOrNull(side.variables.preheat.minimum, 'temperature', system))
