/** 8.4.9: interpass temperature not above the highest of the coupon. */
import { siFigure } from '../../common/iso-names.ts'
import { tidy } from '../../common/reading.ts'
import { bandRule } from '../../common/review-band.ts'
import { show } from '../../common/wording.ts'
import type { CouponSide } from '../../rule.ts'
import { meta } from '../meta.ts'
import { lacking, degrees, STEP, WHY } from '../temperature-ranges.ts'

/** Highest interpass temperature of a coupon: as recorded, else the highest of its run sheet. */
function highestInterpass({ coupon, variables }: CouponSide): number | null {
  const recorded = siFigure(variables.preheat.interpassMaximum, 'temperature')
  if (recorded !== null) return recorded
  const rows = coupon.content.runSheet.flatMap((row) => siFigure(row.interpass, 'temperature') ?? [])
  return rows.length === 0 ? null : Math.max(...rows)
}

export const interpass = bandRule({
  meta: meta('interpass', { title: 'Interpass temperature', clause: '8.4.9', basis: 'read', combine: 'union', statement: 'The interpass temperature is not above the highest of the coupon; up to 50 °C higher must be looked up, further is outside. A single run has none.' }),
  field: 'preheat.interpassMaximum',
  at: 'weld',
  label: 'maximum interpass temperature',
  dimension: 'temperature',
  ends: { min: '', max: '' },
  applies: (context) => context.procedure.processes.length > 1 || context.block?.technique.passesPerSide !== 'single' || context.procedure.preheat.interpassMaximum !== null,
  asked(context) {
    const asked = siFigure(context.procedure.preheat.interpassMaximum, 'temperature')
    return asked === null ? null : { min: asked, max: asked }
  },
  band(_context, side) {
    const had = highestInterpass(side)
    if (had === null) return lacking(side, 'preheat.interpassMaximum', 'interpass temperature')
    return { sure: degrees(null, had), maybe: degrees(null, tidy(had + STEP)), tested: had, reason: `${show(had, '°C')} was the highest of the test.`, why: WHY }
  },
  plan: (asked) => `A coupon welded with an interpass temperature of ${show(asked.max ?? 0, '°C')}.`,
})
