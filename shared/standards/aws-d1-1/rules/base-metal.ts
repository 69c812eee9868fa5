/** Row 29: pairs of base metals by Table 6.8. */
import { setRange, UNKNOWN_SET } from '../../../ranges/set.ts'
import type { WeldingVariables } from '../../../schemas/welding.ts'
import type { UnitSystem } from '../../../units/types.ts'
import { capital, list, names, verb } from '../../common/wording.ts'
import type { CouponSide, Rule, RuleContext } from '../../rule.ts'
import { meta } from '../meta.ts'
import { groupsOf, identity, members, type Group } from '../steels.ts'
import { isOtherMetal } from './scope.ts'

/** One member as the table sees it: a group for I and II, the steel itself otherwise. */
interface Member { name: string; group: Group | null; steel: string | null }

/** A pair with a steel of no row of the table (unlisted, or of Group IV beside another group) is only itself, steel by steel. */
const isTied = (member: Member): boolean => member.group === null || member.group === 'IV'
const nameOf = (a: Member, b: Member): string => (isTied(a) || isTied(b) ? pairName(a.steel ?? a.name, b.steel ?? b.name) : pairName(a.name, b.name))

const groupName = (group: Group): string => `Group ${group}`
export const pairName = (a: string, b: string): string => [a, b].sort().join(' to ')

/** Every way in which a member can be read over the thicknesses asked; null where the metal isn't named. */
function readings(variables: WeldingVariables, system: UnitSystem): [Member[], Member[]] | null {
  const both = members(variables, system).map(({ metal, thickness }): Member[] | null => {
    const groups = groupsOf(metal, thickness, system)
    const steel = identity(metal)
    if (groups) return groups.map((group) => ({ group, steel, name: group === 'I' || group === 'II' ? groupName(group) : (steel ?? groupName(group)) }))
    return steel === null ? null : [{ group: null, steel, name: steel }]
  })
  return both[0] && both[1] ? [both[0], both[1]] : null
}

const isLow = (member: Member): boolean => member.group === 'I' || member.group === 'II'

/**
 * Pairs that a test of two metals covers.
 * @returns `unsure`: pairs that the table does not clearly give (I to I from a test of I to II)
 */
function coveredPairs(a: Member, b: Member): { pairs: string[]; unsure: string[] } {
  const I = groupName('I')
  const II = groupName('II')
  const own = nameOf(a, b)
  if (a.group === 'I' && b.group === 'I') return { pairs: [own], unsure: [] }
  if (a.group === 'II' && b.group === 'II') return { pairs: [pairName(I, I), pairName(I, II), own], unsure: [] }
  if (isLow(a) && isLow(b)) return { pairs: [own], unsure: [pairName(I, I)] }
  const special = (member: Member): boolean => (member.group === 'III' || member.group === 'PQR') && member.steel !== null
  for (const [x, y] of [[a, b], [b, a]] as const) {
    if (special(x) && y.group === 'I') return { pairs: [own], unsure: [] }
    if (special(x) && y.group === 'II') return { pairs: [own, pairName(x.name, I)], unsure: [] }
  }
  return { pairs: [own], unsure: [] }
}

/** Steels of Group III and IV and of Table 6.9 are covered only with the same least yield strength; null where nothing recorded differs. */
function otherYield({ procedure, system }: RuleContext, sides: readonly CouponSide[]): string | null {
  for (const { metal, thickness } of members(procedure, system)) {
    const group = groupsOf(metal, thickness, system)?.[0]
    if (group === undefined || group === 'I' || group === 'II' || !metal.minYield) continue
    const asked = metal.minYield
    const same = sides.flatMap((side) => members(side.variables, system).filter((one) => identity(one.metal) === identity(metal)).flatMap((one) => one.metal.minYield ?? []))
    if (same.length > 0 && same.every(({ si }) => Math.abs(si - asked.si) > 1)) return `${identity(metal) ?? 'The steel'} is covered only with the same least yield strength: the procedure has ${asked.typed}, ${names(sides)} ${same[0]?.typed ?? ''}.`
  }
  return null
}

const lacking = (variables: WeldingVariables, system: UnitSystem): string[] =>
  members(variables, system).flatMap(({ metal, thickness }, i) => (groupsOf(metal, thickness, system) === null && identity(metal) === null ? [`baseMetals.${i === 0 ? 'a' : 'b'}.d11Group`] : []))

export const baseMetal: Rule = {
  meta: meta('base_metal'),
  field: 'baseMetals.a.d11Group',
  at: 'weld',
  label: 'Base metal',
  range(context, side) {
    const read = readings(side.variables, context.system)
    const [a, b] = [read?.[0][0], read?.[1][0]]
    if (!read || !a || !b) return { range: UNKNOWN_SET, tested: null, reason: `${side.coupon.number} names no steel that the table knows.`, clause: 'Table 6.8', missing: lacking(side.variables, context.system).map((field) => `${side.coupon.number}: ${field}`) }
    const other = members(side.variables, context.system).find(({ metal }) => isOtherMetal(metal))
    if (other) return { range: setRange([]), tested: nameOf(a, b), reason: `${identity(other.metal) ?? 'The base metal'} is not carbon or low-alloy steel, for which the standard is written, so ${side.coupon.number} covers no base metal here.`, clause: 'Clause 1' }
    const { pairs } = coveredPairs(a, b)
    return { range: setRange(pairs), tested: nameOf(a, b), reason: `${nameOf(a, b)} covers ${list(pairs)}.`, clause: 'Table 6.8' }
  },
  check(context, sides, joined) {
    if (joined?.type !== 'set') return null
    const base = { range: joined, clause: 'Table 6.8' }
    const read = readings(context.procedure, context.system)
    if (!read) {
      const missing = lacking(context.procedure, context.system)
      const field = missing[0] ?? 'baseMetals.a.d11Group'
      return { ...base, verdict: 'cannot-tell', sentence: "A base metal of the procedure is neither named nor given a group, so whether the test covers it can't be told.", asked: null, missing: missing.map((path) => `procedure: ${path}`), field, fixes: [{ kind: 'state', label: 'State the base metal', field }] }
    }
    const asked = [...new Set(read[0].flatMap((a) => read[1].map((b) => nameOf(a, b))))]
    const missed = asked.filter((pair) => !joined.values.includes(pair))
    const yields = missed.length === 0 ? otherYield(context, sides) : null
    if (yields) return { ...base, verdict: 'outside', sentence: yields, asked, field: 'baseMetals.a.minYield', fixes: [{ kind: 'plan-coupon', label: `Weld a coupon of ${list(asked)}`, requirement: `A coupon of ${list(asked)} with that yield strength.` }] }
    if (missed.length === 0) return { ...base, verdict: 'within', sentence: `${capital(list(asked))} ${asked.length > 1 ? 'are' : 'is'} covered by ${names(sides)}.`, asked }
    const told = sides.map((side) => ({ side, read: readings(side.variables, context.system) }))
    const unread = told.filter((one) => one.read === null)
    if (joined.unknown || unread.length > 0) return { ...base, verdict: 'cannot-tell', sentence: `${names(unread.length > 0 ? unread.map(({ side }) => side) : sides)} names no steel that the table knows, so whether it covers ${list(asked)} can't be told.`, asked, missing: unread.flatMap(({ side }) => lacking(side.variables, context.system).map((field) => `${side.coupon.number}: ${field}`)) }
    const unsure = told.flatMap(({ read: pair }) => (pair?.[0][0] && pair[1][0] ? coveredPairs(pair[0][0], pair[1][0]).unsure : []))
    if (missed.every((pair) => unsure.includes(pair))) return { ...base, verdict: 'cannot-tell', sentence: `${names(sides)} joins Group I to Group II, which is no row of its own in the table; whether it also covers ${list(missed)} is not confirmed here.`, asked, missing: ['confirmation of what a test of Group I to Group II covers'] }
    const fourth = told.some(({ read: pair }) => { const [a, b] = [pair?.[0][0], pair?.[1][0]]; return a && b && (a.group === 'IV') !== (b.group === 'IV') && read.some((asks) => asks.some(({ steel, group }) => group === 'IV' && (steel === a.steel || steel === b.steel))) })
    if (fourth) return { ...base, verdict: 'cannot-tell', sentence: `${names(sides)} joins a steel of Group IV to one of another group, which is no row of the table; whether it covers ${list(missed)} is not confirmed here.`, asked, missing: ['what a test of Group IV to another group covers'] }
    // A steel that the list kept here does not name may still stand in a group.
    const unlisted = read.flat().filter((member) => member.group === null)
    if (unlisted.length > 0) {
      const field = 'baseMetals.a.d11Group'
      return { ...base, verdict: 'cannot-tell', sentence: `${list([...new Set(unlisted.map(({ name }) => name))])} is not in the list of steels kept here; state its group, else only a test of that very steel covers it.`, asked, missing: ['procedure: group of the base metal'], field, fixes: [{ kind: 'state', label: 'State the D1.1 group', field }, { kind: 'plan-coupon', label: 'Weld a coupon of that steel', requirement: `A coupon of ${list(missed)}.` }] }
    }
    return { ...base, verdict: 'outside', sentence: `${capital(list(missed))} ${missed.length > 1 ? 'are' : 'is'} not covered: ${names(sides)} ${verb(sides, 'qualifies', 'qualify')} ${joined.values.length === 0 ? 'no steel' : `${list(joined.values)} only`}.`, asked, fixes: [{ kind: 'plan-coupon', label: `Weld a coupon of ${list(missed)}`, requirement: `A coupon of ${list(missed)}.` }] }
  },
}
