/** Which processes may be prequalified. */
import { cannotTell } from '../../common/wording.ts'
import { condition } from './meta.ts'
import { byTest, says } from './verdict.ts'

export const pqProcess = condition({
  file: 'process', title: 'Prequalified process', clause: 'Clause 5', basis: 'read', field: 'process', at: 'block',
  source: '3.2.1 and 3.2.2 read in 2000; footnote c of Table 5.1 read in 2020',
  statement: 'SMAW, SAW, FCAW and GMAW (not short-circuiting) may be prequalified; GTAW, short-circuiting GMAW and every other process need a test.',
  check(context, block) {
    const { process } = block
    if (process === 'GTAW') return says('outside', 'GTAW is never prequalified; it needs a qualification test.', { asked: ['GTAW'], fixes: [byTest] })
    if (process !== 'GMAW') return says('within', `${process ?? ''} may be prequalified.`, { asked: process ? [process] : null })
    const { transferMode } = block.electrical
    const field = `${context.path}.electrical.transferMode`
    if (transferMode === null) return cannotTell('GMAW may be prequalified with spray, pulsed spray or globular transfer, not with short-circuiting; the transfer mode is not stated.', ['procedure: electrical.transferMode'], { field, fixes: [{ kind: 'state', label: 'State the transfer mode', field }] })
    if (transferMode === 'short-circuiting') return says('outside', 'Short-circuiting GMAW is never prequalified; it needs a qualification test.', { asked: [transferMode], field, fixes: [{ kind: 'set', label: 'Set the transfer mode to spray', field, value: 'spray' }, byTest] })
    return says('within', `GMAW with ${transferMode.replace('-', ' ')} transfer may be prequalified.`, { asked: [transferMode] })
  },
})
