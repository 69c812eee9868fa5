/** ISO 15614-1: procedure tests for arc welding of steels and nickel, levels 1 and 2; contents of the WPS by ISO 15609-1. */
import { NOT_HELD } from '../common/iso-15609.ts'
import type { Standard } from '../rule.ts'
import { editions } from './editions.ts'
import { PROCESSES } from './meta.ts'
import { qualify } from './qualify.ts'
import { rules } from './rules/index.ts'

export const iso15614Part1: Standard = {
  id: 'iso-15614-1',
  name: 'ISO 15614-1, welding procedure test, arc welding of steels and nickel alloys',
  shortName: 'ISO 15614-1',
  editions,
  processes: PROCESSES,
  units: 'SI',
  outOfScope: [
    'gas welding (311), strip submerged arc (122, 126) and processes beyond 111, 114, 12, 13, 14 and 15',
    'corrosion-resistant overlay (ISO 15614-7), tube to tubesheet (ISO 15614-8), finishing of castings (ISO 15614-4)',
    'beam, friction, resistance, stud and hybrid processes',
    'other routes: pre-production test (15613), tested consumables (15610), previous experience (15611), standard procedure (15612)',
    'whether the workshop stays under the manufacturer that ran the test (8.2)',
    'rows and places of hardness indents and where specimens were taken, which a record does not hold',
    'whether the part of one process in a combined test piece was tested by itself, and which process an impact set includes',
    'geometry and restraint that the test piece does not represent (6.1; ISO 15613 then)',
    ...NOT_HELD,
    'filler groups of level 1 (Annex A), nickel alloys beyond the same group (Table 6)',
  ],
  rules,
  certification: { clause: '9', basis: 'memory', source: 'ISO 15614-1:2017, 9 (recalled)' },
  // Whoever carries impact tests is asked by each rule: a coupon without them may support up to 12 mm.
  role: () => 'full',
  qualify,
}
