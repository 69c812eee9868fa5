/** 8.3.1 and 8.4.4: parent sub-groups and filler types. */
import { UNKNOWN_SET } from '../../../ranges/set.ts'
import { materialGroup, metalName, secondMember, strangeGroup } from '../../common/iso-names.ts'
import { nameBandRule } from '../../common/review-band.ts'
import { cannotTell, names, stateFix, verb } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import type { BaseMetal, WeldingVariables } from '../../../schemas/welding.ts'
import { meta } from '../meta.ts'

const isAluminium = (main: number): boolean => main >= 21 && main <= 26

/** Sub-group, or the whole group where there are no sub-groups; the metal's own name where none is recorded. A group named without its sub-group tells nothing. */
function groupName(metal: BaseMetal): string | null {
  const group = materialGroup(metal)
  if (!group) return metalName(metal)
  return group.sub === null && (group.main === 22 || group.main === 23) ? null : group.text
}
const pair = (a: string, b: string): string => [a, b].sort((x, y) => y.localeCompare(x, 'en', { numeric: true })).join(' to ')

function joint(variables: WeldingVariables): readonly string[] | null {
  const a = groupName(variables.baseMetals.a)
  const b = groupName(secondMember(variables))
  return a === null || b === null ? null : [pair(a, b)]
}

/** Sub-groups of 22 with no more magnesium than this one. */
const lower = (group: string): string[] => (/^22\.[2-4]$/.test(group) ? ['22.2', '22.3', '22.4'].filter((one) => one < group) : [])

const bySubGroup = nameBandRule({
  meta: meta('material-group', { title: 'Parent material groups', clause: '8.3.1', statement: 'A sub-group covers itself; a metal without a group covers itself. Whether within group 22 a sub-group of more magnesium covers one of less must be looked up. Metals of other groups than 21 to 26 can\'t be told.' }),
  field: 'baseMetals.a.iso15608',
  at: 'weld',
  label: 'parent material group',
  asked: (context) => joint(context.procedure),
  tested: (_context, side) => joint(side.variables),
  covers(value, _context, side) {
    const a = groupName(side.variables.baseMetals.a) ?? ''
    const b = groupName(secondMember(side.variables)) ?? ''
    const maybe = [a, ...lower(a)].flatMap((x) => [b, ...lower(b)].map((y) => pair(x, y))).filter((name) => !value.includes(name))
    return maybe.length === 0 ? { sure: value } : { sure: value, maybe, why: 'Whether more magnesium covers less within group 22 is not confirmed.' }
  },
  because: 'The same sub-groups are covered.',
})

const foreign = (group: string): string => `${group} is no group of aluminium of ISO/TR 15608 (21 to 26), for which this standard is written`

export const materialGroupTwo: Rule = {
  ...bySubGroup,
  range(context, side) {
    const strange = strangeGroup(side.variables, isAluminium)
    return strange === null ? bySubGroup.range(context, side) : { range: UNKNOWN_SET, tested: strange, reason: `${foreign(strange)}.`, missing: [`${side.coupon.number}: baseMetals.a.iso15608`] }
  },
  check(context, sides, joined) {
    const own = strangeGroup(context.procedure, isAluminium)
    if (own !== null) return cannotTell(`${foreign(own)}, so nothing of it is covered here.`, [`a standard for group ${own}`], { asked: [own], range: joined, fixes: [stateFix('ISO/TR 15608 group', 'baseMetals.a.iso15608')] })
    const odd = sides.map((side) => strangeGroup(side.variables, isAluminium)).find((group) => group !== null)
    if (odd) return cannotTell(`${foreign(odd)}, and ${names(sides)} ${verb(sides, 'gives', 'give')} it as the parent metal's.`, sides.map((side) => `${side.coupon.number}: baseMetals.a.iso15608`), { range: joined })
    return bySubGroup.check(context, sides, joined)
  },
}
