/** Row 18: travel speed by percentage: SAW 15, GMAW and FCAW 25, GTAW 50. */
import type { Process } from '../../../schemas/welding.ts'
import { meta } from '../meta.ts'
import { settingRule } from '../percent.ts'

const PERCENT: Partial<Record<Process, number>> = { SAW: 15, GMAW: 25, FCAW: 25, GTAW: 50 }

export const travelSpeed = settingRule({
  meta: meta('travel_speed'),
  setting: 'travelSpeed',
  label: 'travel speed',
  dimension: 'travelSpeed',
  band(process) {
    const percent = PERCENT[process]
    return percent === undefined ? null : { down: percent, up: percent }
  },
})
