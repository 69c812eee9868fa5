/** 8.4.12: condition of precipitation-hardening parent metal before welding. */
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { materialGroup, secondMember } from '../../common/iso-names.ts'
import { sameText } from '../../common/reading.ts'
import { nameBandRule } from '../../common/review-band.ts'
import { meta } from '../meta.ts'

/** Groups whose condition before welding counts: precipitation-hardening steels. Nickel alloys that harden aren't told apart by their group. */
const hardens = (variables: WeldingVariables): boolean => [variables.baseMetals.a, secondMember(variables)].some((metal) => { const group = materialGroup(metal); return group !== null && ((group.main === 3 && group.sub === 3) || (group.main === 7 && group.sub === 3)) })

const before = (variables: WeldingVariables): readonly string[] | null => {
  const list = [variables.baseMetals.a, secondMember(variables)].map((metal) => metal.condition)
  return list.every((text) => text) ? [list.map((text) => sameText(text ?? '')).sort().join(' and ')] : null
}

export const initialHeatTreatment = nameBandRule({
  meta: meta('initial-heat-treatment', { title: 'Condition before welding', clause: '8.4.12', basis: 'read', statement: 'Of precipitation-hardening parent metal (groups 3.3 and 7.3) the heat-treatment condition before welding stays as tested. Nickel alloys that harden so are not told apart by their group.' }),
  field: 'baseMetals.a.condition',
  at: 'weld',
  label: 'condition of the parent metal before welding',
  applies: (context) => hardens(context.procedure),
  asked: (context) => before(context.procedure),
  tested: (_context, side) => before(side.variables),
  because: 'The condition before welding stays as tested.',
})
