/** CVN toughness: prequalification alone does not show it. */
import { cannotTell } from '../../common/wording.ts'
import { condition } from './meta.ts'
import { byTest } from './verdict.ts'

export const pqToughness = condition({
  file: 'toughness', title: 'CVN toughness', clause: 'Clause 5', basis: 'memory', field: 'toughnessRequired', at: 'weld',
  source: 'No source for prequalified work with specified CVN',
  statement: 'Where CVN toughness is specified, meeting Clause 5 does not show it: a test weld for CVN is needed, so prequalification alone is "cannot tell".',
  applies: (context) => context.procedure.toughnessRequired === true,
  check: () => cannotTell('CVN toughness is required, and a prequalified procedure has no test that shows it.', ['a test weld with CVN specimens'], { fixes: [byTest] }),
})
