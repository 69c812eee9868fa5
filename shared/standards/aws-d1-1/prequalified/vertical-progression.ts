/** Vertical welds run upward. */
import { cannotTell, notStated } from '../../common/wording.ts'
import { askedPlaces } from '../positions.ts'
import { condition } from './meta.ts'
import { FOUR, says } from './verdict.ts'

export const pqProgression = condition({
  file: 'vertical-progression', title: 'Vertical welding upward', clause: 'Clause 5', basis: 'memory', field: 'progression', at: 'block', more: FOUR,
  source: 'Clause 5 as recalled',
  statement: 'Vertical welds run upward in every pass; downward only to mend undercut, or on tubes where the standard allows it.',
  applies: (_context, block) => askedPlaces(block.positions).includes('vertical'),
  check(context, block) {
    const field = `${context.path}.progression`
    if (block.progression === null) return notStated('vertical progression', field)
    if (block.progression === 'up') return says('within', 'Vertical welds run upward.', { asked: ['uphill'] })
    if (context.procedure.product !== 'plate') return cannotTell('Downward welding is allowed on some tubes; where, must be looked up.', ['where downward welding of tubes is allowed'], { asked: ['downhill'] })
    return says('outside', 'Downward vertical welding is not prequalified (but to mend undercut).', { asked: ['downhill'], fixes: [{ kind: 'set', label: 'Set the progression to uphill', field, value: 'up' }] })
  },
})
