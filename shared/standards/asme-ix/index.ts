/** ASME BPVC Section IX, part QW: procedure qualification of arc welds. */
import type { Standard } from '../rule.ts'
import { editions } from './editions.ts'
import { qualify } from './qualify.ts'
import { role } from './role.ts'
import { rules } from './rules/index.ts'

export const asmeIx: Standard = {
  id: 'asme-ix',
  name: 'ASME Boiler and Pressure Vessel Code, Section IX, part QW',
  shortName: 'ASME IX',
  editions,
  processes: ['SMAW', 'SAW', 'GMAW', 'FCAW', 'GTAW', 'PAW'],
  outOfScope: ['fillet mock-ups of a production assembly (QW-181.1.1)', 'corrosion-resistant overlay and hard-facing', 'clad metal', 'tube to tubesheet', 'temper bead', 'stud, resistance, friction, beam and hybrid processes', 'brazing', 'fusing'],
  rules,
  certification: { clause: 'QW-201', basis: 'secondary', source: 'Published interpretations on QW-200.2(b) and QW-201' },
  role,
  qualify,
}
