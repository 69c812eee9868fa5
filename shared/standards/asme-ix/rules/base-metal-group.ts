/** QW-403.5: with toughness, the P-Number and Group Number (nonferrous: UNS number) pair must be covered. */
import { setRange } from '../../../ranges/set.ts'
import type { BaseMetal, WeldingVariables } from '../../../schemas/welding.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import type { CouponSide, Rule } from '../../rule.ts'
import { isFerrous, pNumber, secondMetal } from '../members.ts'
import { meta } from '../meta.ts'

function token(metal: BaseMetal): string | null {
  const p = pNumber(metal)
  if (p === null) return null
  if (isFerrous(metal)) return metal.groupNumber === null ? null : `P-${p} Group ${metal.groupNumber}`
  return metal.uns ? `P-${p} ${metal.uns.trim().toUpperCase()}` : null
}

/** The entries without which {@link token} can't name a member. */
function lacking(variables: WeldingVariables): string[] {
  const members = [['a', variables.baseMetals.a], ...(secondMetal(variables) === variables.baseMetals.a ? [] : [['b', variables.baseMetals.b] as const])] as const
  return members.flatMap(([which, metal]) => {
    if (pNumber(metal) === null) return [`baseMetals.${which}.pNumber`]
    if (token(metal) !== null) return []
    return [isFerrous(metal) ? `baseMetals.${which}.groupNumber` : `baseMetals.${which}.uns`]
  })
}

const pair = (a: string, b: string): string => (a <= b ? `${a} to ${b}` : `${b} to ${a}`)

function tokensOf(variables: WeldingVariables): [string, string] | null {
  const a = token(variables.baseMetals.a)
  const b = token(secondMetal(variables))
  return a === null || b === null ? null : [a, b]
}

const samePNumber = (a: string, b: string): boolean => a.split(' ')[0] === b.split(' ')[0]

/** A coupon of two Groups of one P-Number covers each to itself and each to the other. */
const ownPairs = ([a, b]: [string, string]): string[] => (a !== b && samePNumber(a, b) ? [pair(a, b), pair(a, a), pair(b, b)] : [pair(a, b)])

const base = namedRule({
  meta: meta('QW-403.5', 'base-metal-group', { combine: 'jointly' }),
  field: 'baseMetals.a.groupNumber',
  at: 'weld',
  label: 'P-Number and Group Number',
  asked(context) {
    const tokens = tokensOf(context.procedure)
    return tokens ? [pair(tokens[0], tokens[1])] : null
  },
  tested(_context, side) {
    const tokens = tokensOf(side.variables)
    return tokens ? pair(tokens[0], tokens[1]) : null
  },
  covers(value, _context, side) {
    const tokens = tokensOf(side.variables)
    return tokens ? ownPairs(tokens) : [value]
  },
  because: 'With toughness the Group Number (nonferrous: UNS number) counts beside the P-Number.',
  plan: (asked) => `A coupon of ${asked.join(', ')} with toughness tests.`,
  lacks: lacking,
})

export const baseMetalGroup: Rule = {
  ...base,
  join(_context, sides: readonly CouponSide[], ranges) {
    const values: string[] = []
    let unknown = false
    const self: string[] = []
    sides.forEach((side, i) => {
      const own = ranges[i]?.range
      if (own?.type !== 'set') return
      values.push(...own.values)
      unknown ||= own.unknown
      const tokens = tokensOf(side.variables)
      if (tokens && tokens[0] === tokens[1]) self.push(tokens[0])
    })
    // Two records that differ only in Group within one P-Number also cover the pair.
    for (const a of self) for (const b of self) if (a < b && samePNumber(a, b)) values.push(pair(a, b))
    return setRange(values, { unknown })
  },
}
