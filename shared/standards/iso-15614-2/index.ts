/** ISO 15614-2: procedure tests for arc welding of aluminium; contents of the WPS by ISO 15609-1. */
import { NOT_HELD } from '../common/iso-15609.ts'
import type { Standard } from '../rule.ts'
import { editions } from './editions.ts'
import { PROCESSES } from './meta.ts'
import { qualify } from './qualify.ts'
import { rules } from './rules/index.ts'

export const iso15614Part2: Standard = {
  id: 'iso-15614-2',
  name: 'ISO 15614-2, welding procedure test, arc welding of aluminium and its alloys',
  shortName: 'ISO 15614-2',
  editions,
  processes: PROCESSES,
  units: 'SI',
  outOfScope: [
    'finishing welding of castings (ISO 15614-4)',
    'processes other than 131, 141 and 15; process 142 (edition of 2025)',
    'steels, nickel, copper and other metals; metals of groups 22 and 23 whose sub-group is not recorded',
    'other routes: pre-production test (15613), tested consumables (15610), previous experience (15611), standard procedure (15612)',
    'beam, friction, resistance, stud and hybrid processes',
    'micro sections, and who ages or anneals specimens before they are bent',
    'heat input: what the clause asks of it for aluminium is not held here',
    'material thickness of fillets, pipe covered by plate, and deposits beyond the tested one: not held here',
    ...NOT_HELD,
    'whether the workshop stays under the manufacturer that ran the test (8.2)',
  ],
  rules,
  certification: { clause: '9', basis: 'memory', source: 'ISO 15614-2:2005, 9 (recalled)' },
  role: () => 'full',
  qualify,
}
