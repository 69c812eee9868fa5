/** Table 5.2: heat treatment after welding. */
import { cannotTell } from '../../common/wording.ts'
import { condition } from './meta.ts'
import { FOUR, says } from './verdict.ts'

export const pqPwht = condition({
  file: 'pwht', title: 'Postweld heat treatment', clause: 'Table 5.2', basis: 'memory', field: 'pwht.condition', at: 'weld',
  source: 'Table 5.2 as recalled; conditions for heat treatment are not kept here',
  statement: 'The procedure states whether it is heat treated after welding. Which heat treatments are prequalified is not confirmed.',
  more: FOUR,
  check(context) {
    const value = context.procedure.pwht.condition
    if (value === 'none') return says('within', 'No heat treatment after welding.', { asked: ['none'] })
    if (value === null) return cannotTell('Whether the weld is heat treated is not stated.', ['procedure: pwht.condition'], { field: 'pwht.condition', fixes: [{ kind: 'set', label: 'Set heat treatment to none', field: 'pwht.condition', value: 'none' }] })
    return cannotTell('Which heat treatments are prequalified is not confirmed here; look it up in your edition.', ['conditions for prequalified heat treatment'], { asked: [value] })
  },
})
