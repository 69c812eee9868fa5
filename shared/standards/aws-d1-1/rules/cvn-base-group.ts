/** Table 6.7: any other base metal group. */
import type { WeldingVariables } from '../../../schemas/welding.ts'
import type { UnitSystem } from '../../../units/types.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'
import { groupsOf, identity, members } from '../steels.ts'

/** Group of each member, in one name whichever way round; the steel itself where it has no group. Null where neither is known. */
function groupPair(variables: WeldingVariables, system: UnitSystem): string | null {
  const told = members(variables, system).map(({ metal, thickness }) => {
    const groups = groupsOf(metal, thickness, system)
    return groups ? `Group ${groups.map((group) => (group === 'PQR' ? `of ${identity(metal) ?? 'PQR'}` : group)).join(' and ')}` : identity(metal)
  })
  return told.some((one) => one === null) ? null : told.sort().join(' to ')
}

export const cvnBaseGroup = namedRule({
  meta: meta('cvn_base_group'),
  field: 'baseMetals.a.d11Group',
  at: 'weld',
  label: 'base metal group',
  asked(context) {
    const pair = groupPair(context.procedure, context.system)
    return pair ? [pair] : null
  },
  tested: (context, side) => groupPair(side.variables, context.system),
  because: 'With CVN any other base metal group counts.',
})
