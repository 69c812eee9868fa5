/** Table 5.3: steels that may be prequalified. */
import { list } from '../../common/wording.ts'
import { clauseIn } from '../editions.ts'
import { groupBasis } from '../steels.ts'
import { condition } from './meta.ts'
import { readMetals, unread } from './metals.ts'
import { byTest, says } from './verdict.ts'

export const pqBaseMetal = condition({
  file: 'base-metal', title: 'Prequalified base metal', clause: 'Table 5.3', basis: 'memory', field: 'baseMetals.a.specification', at: 'weld',
  source: 'Group I of Table 3.1 read in 2015; Groups II to IV and Table 6.9 from memory',
  statement: 'Both base metals stand in Group I to IV of Table 5.3. An unlisted steel is not prequalified; steels of Table 6.9 always need a test.',
  check(context) {
    const metals = readMetals(context)
    const missing = unread(metals, 'whether it is prequalified')
    if (missing) return missing
    const groups = metals.flatMap((metal) => metal.groups ?? [])
    const asked = metals.map(({ name, groups: own }) => `${name ?? 'steel'} (Group ${list(own ?? [])})`)
    const tested = metals.filter((metal) => metal.groups?.includes('PQR'))
    if (tested.length > 0) return says('outside', `${list(tested.map(({ name }) => name ?? 'The steel'))} always needs a qualification test (${clauseIn(context.edition, 'Table 6.9')}).`, { asked: tested.map(({ name }) => name ?? 'steel'), fixes: [byTest] })
    return says('within', `${list([...new Set(asked)])} ${new Set(asked).size > 1 ? 'are' : 'is'} prequalified base metal.`, { asked: [...new Set(asked)], basis: groups.every((group) => groupBasis(group) === 'read') ? 'read' : 'memory' })
  },
})
