/** 8.4.8: preheat. */
import { between, closed } from '../../../ranges/numeric.ts'
import { temperatureRule } from '../temperature-rule.ts'

export const preheat = temperatureRule('preheat', 'minimum preheat', 'Preheat temperature', '8.4.8', 'minimum', 'The preheat tested is covered; a change must be looked up.', (had) => between('temperature', '°C', closed(had), closed(had)))
