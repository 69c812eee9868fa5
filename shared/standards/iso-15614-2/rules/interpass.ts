/** 8.4.9: interpass temperature. */
import { between, closed, UNLIMITED } from '../../../ranges/numeric.ts'
import { temperatureRule } from '../temperature-rule.ts'

export const interpass = temperatureRule('interpass', 'maximum interpass temperature', 'Interpass temperature', '8.4.9', 'interpassMaximum', 'Up to the interpass temperature tested is covered; more must be looked up.', (had) => between('temperature', '°C', UNLIMITED, closed(had)))
