/** 8.3.1 and 8.4.4: parent sub-groups and filler types. */
import { materialGroup, metalName, secondMember } from '../../common/iso-names.ts'
import { sameText } from '../../common/reading.ts'
import { nameBandRule } from '../../common/review-band.ts'
import type { BaseMetal, Filler, WeldingVariables } from '../../../schemas/welding.ts'
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

/** Type of ISO 18273: the first figure of the alloy. `Al 5356`, `ER5356`, `S Al 4043A` → 5, 4. */
export function fillerType(filler: Filler): string | null {
  if (filler.added === false) return 'no filler'
  const digit = /(?:^|[^\d])([1-5])\d{3}(?!\d)/.exec(filler.classification ?? '')?.[1]
  return digit ? `type ${digit}` : filler.classification ? `designation ${sameText(filler.classification)}` : null
}

export const fillerTypeRule = nameBandRule({
  meta: meta('filler-type', { title: 'Filler type', clause: '8.4.4', statement: 'A filler covers those of its type under ISO 18273 (1 aluminium, 3 Al-Mn, 4 Al-Si, 5 Al-Mg). Whether types 4 and 5 cover each other must be looked up; that Al-Mg covers Al-Si is a rule for welders, not for procedures.' }),
  field: 'filler.classification',
  at: 'block',
  label: 'filler type',
  asked(context) {
    const type = context.block && fillerType(context.block.filler)
    return type ? [type] : null
  },
  tested(_context, side) {
    const type = side.block && fillerType(side.block.filler)
    return type ? [type] : null
  },
  covers(value) {
    const [type = ''] = value
    if (type === 'type 4' || type === 'type 5') return { sure: value, maybe: ['type 4', 'type 5'].filter((other) => other !== type), why: 'Types 4 and 5 are believed not to cover each other, which is not confirmed.' }
    return type.startsWith('type') || type === 'no filler' ? { sure: value } : { sure: value, maybe: 'any', why: 'The type can\'t be read from the designation.' }
  },
  because: 'The same type of ISO 18273 is covered.',
})
