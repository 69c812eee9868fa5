/** 8.3.1 and 8.4.4: parent sub-groups and filler types. */
import { materialGroup, metalName, secondMember } from '../../common/iso-names.ts'
import { nameBandRule } from '../../common/review-band.ts'
import type { BaseMetal, WeldingVariables } from '../../../schemas/welding.ts'
import { meta } from '../meta.ts'

const groupName = (metal: BaseMetal): string | null => materialGroup(metal)?.text ?? metalName(metal)
const pair = (a: string, b: string): string => [a, b].sort((x, y) => y.localeCompare(x, 'en', { numeric: true })).join(' to ')

function joint(variables: WeldingVariables): readonly string[] | null {
  const a = groupName(variables.baseMetals.a)
  const b = groupName(secondMember(variables))
  return a === null || b === null ? null : [pair(a, b)]
}

/** Sub-groups of 22 with no more magnesium than this one. */
const lower = (group: string): string[] => (/^22\.[2-4]$/.test(group) ? ['22.2', '22.3', '22.4'].filter((one) => one < group) : [])

export const materialGroupTwo = nameBandRule({
  meta: meta('material-group', { title: 'Parent material groups', clause: '8.3.1', statement: 'A sub-group covers itself. Whether within group 22 a sub-group of more magnesium covers one of less must be looked up.' }),
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

