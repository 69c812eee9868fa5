/** 8.4.8: preheat not below that of the coupon. */
import { siFigure } from '../../common/iso-names.ts'
import { tidy } from '../../common/reading.ts'
import { bandRule } from '../../common/review-band.ts'
import { show } from '../../common/wording.ts'
import { meta } from '../meta.ts'
import { lacking, degrees, STEP, WHY } from '../temperature-ranges.ts'

export const preheat = bandRule({
  meta: meta('preheat', { title: 'Preheat temperature', clause: '8.4.8', basis: 'read', combine: 'union', statement: 'The preheat is not below that of the coupon; down to 50 °C lower must be looked up, further is outside.' }),
  field: 'preheat.minimum',
  at: 'weld',
  label: 'minimum preheat',
  dimension: 'temperature',
  ends: { min: '', max: '' },
  asked(context) {
    const asked = siFigure(context.procedure.preheat.minimum, 'temperature')
    return asked === null ? null : { min: asked, max: asked }
  },
  band(_context, side) {
    const had = siFigure(side.variables.preheat.minimum, 'temperature')
    if (had === null) return lacking(side, 'preheat.minimum', 'preheat')
    return { sure: degrees(had, null), maybe: degrees(tidy(had - STEP), null), tested: had, reason: `${show(had, '°C')} at the start of the test is the lowest.`, why: WHY }
  },
  plan: (asked) => `A coupon preheated to at most ${show(asked.min ?? 0, '°C')}.`,
})
