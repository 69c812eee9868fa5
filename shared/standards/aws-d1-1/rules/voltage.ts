/** Row 16 (SAW, GMAW, FCAW): voltage more than 7 % off the PQR value. */
import { meta } from '../meta.ts'
import { settingRule } from '../percent.ts'

export const voltage = settingRule({ meta: meta('voltage'), setting: 'voltage', label: 'voltage', dimension: 'voltage', perDiameter: true, band: () => ({ down: 7, up: 7 }) })
