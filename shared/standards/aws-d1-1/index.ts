/** AWS D1.1 structural steel: procedures qualified by test (Clause 6) and prequalified procedures (Clause 5). */
import type { Standard } from '../rule.ts'
import { editions } from './editions.ts'
import { qualify } from './qualify.ts'
import { role } from './role.ts'
import { rules } from './rules/index.ts'

export const awsD11: Standard = {
  id: 'aws-d1-1',
  name: 'AWS D1.1/D1.1M, Structural Welding Code, steel',
  shortName: 'AWS D1.1',
  editions,
  processes: ['SMAW', 'SAW', 'GMAW', 'FCAW', 'GTAW'],
  routes: ['test', 'prequalified'],
  outOfScope: ['plasma arc and every process not named above, which need the approval of the engineer', 'overlay, hard-facing and build-up', 'brazing, friction, laser and electron beam welding', 'stainless steel, aluminium and other metals that are no carbon or low-alloy steel', 'electroslag and electrogas welding', 'stud welding', 'plug and slot welds', 'details of tubular T-, Y- and K-connections', 'calculated preheat outside prequalification', 'base metal under 3 mm (1/8 in.)', 'steel of more than 690 MPa (100 ksi) yield strength', 'reinforcing bars', 'cyclic loading and the joint restrictions that follow from it', 'fabrication, inspection and repair of the finished work', 'qualification of welders'],
  rules,
  certification: { clause: 'Clause 6', basis: 'memory', source: 'Clause 6: results recorded and certified in the PQR before it supports a procedure; as recalled' },
  role,
  qualify,
}
