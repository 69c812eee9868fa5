/** Row 18: travel speed by percentage: SAW 15, GMAW and FCAW 25, GTAW 50. */
import { meta } from '../meta.ts'
import { byProcess, settingRule } from '../percent.ts'

export const travelSpeed = settingRule({
  meta: meta('travel_speed'),
  setting: 'travelSpeed',
  label: 'travel speed',
  dimension: 'travelSpeed',
  band: byProcess({ SAW: 15, GMAW: 25, FCAW: 25, GTAW: 50 }),
})
