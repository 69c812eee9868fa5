/** 8.4.11: holding temperature within 20 °C of that tested, at level 2. */
import { askedInterval, siFigures } from '../../common/iso-names.ts'
import { tidy } from '../../common/reading.ts'
import { bandRule } from '../../common/review-band.ts'
import { show } from '../../common/wording.ts'
import { levelTwoLimit } from '../levels.ts'
import { meta } from '../meta.ts'
import { lacking, nothing, degrees } from '../temperature-ranges.ts'

export const pwhtTemperature = levelTwoLimit(
  bandRule({
    meta: meta('pwht-temperature', { title: 'Holding temperature', clause: '8.4.11', basis: 'read', statement: 'The holding temperature stays within 20 °C of that tested, unless the application says otherwise. That is a rule of level 2.' }),
    field: 'pwht.temperature',
    at: 'weld',
    label: 'holding temperature',
    dimension: 'temperature',
    applies: (context) => context.procedure.pwht.condition !== null && context.procedure.pwht.condition !== 'none',
    asked: (context) => askedInterval(context.procedure.pwht.temperature, 'temperature'),
    band(_context, side) {
      if (side.variables.pwht.condition === 'none') return null
      const read = siFigures(side.variables.pwht.temperature, 'temperature')
      const low = read.min ?? read.max
      const high = read.max ?? read.min
      if (low === null || high === null) return lacking(side, 'pwht.temperature', 'holding temperature')
      const sure = high - low > 40 ? nothing : degrees(tidy(high - 20), tidy(low + 20))
      return { sure, maybe: degrees(tidy(low - 20), tidy(high + 20)), tested: low === high ? low : null, reason: `Held at ${low === high ? show(low, '°C') : `${show(low, '°C')} to ${show(high, '°C')}`}: 20 °C either side.`, why: 'The test was held over a range; what lies within 20 °C of only one of its ends must be judged by a person.' }
    },
  }),
)
