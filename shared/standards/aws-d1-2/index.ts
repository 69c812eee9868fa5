/** AWS D1.2 structural aluminium: every procedure is qualified by test. */
import type { Standard } from '../rule.ts'
import { editions, PROCESSES } from './meta.ts'
import { qualify } from './qualify.ts'
import { role } from './role.ts'
import { rules } from './rules/index.ts'

export const awsD12: Standard = {
  id: 'aws-d1-2',
  name: 'AWS D1.2/D1.2M, Structural Welding Code, aluminium',
  shortName: 'AWS D1.2',
  editions,
  processes: PROCESSES,
  outOfScope: ['prequalified procedures (there are none)', 'overlay, hard-facing and build-up', 'brazing, laser and electron beam welding', 'stud welding', 'plug and slot welds', 'friction stir welding', 'castings beyond a recorded M-Number', 'steel and other metals', 'number of specimens and range of thickness (Tables 3.4 and 3.5, not confirmed)', 'visual and bend acceptance limits (not confirmed)', 'toughness', 'qualification of welders'],
  rules,
  certification: { clause: 'Clause 3', basis: 'memory', source: 'Clause 3: results recorded and certified before they support a procedure; as recalled' },
  role,
  qualify,
}
