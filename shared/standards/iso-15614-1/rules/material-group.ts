/** 8.3.1: ISO/TR 15608 groups of both members, by Table 5 with its footnotes. */
import { setRange, UNKNOWN_SET } from '../../../ranges/set.ts'
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { materialGroup as groupOf, metalName, secondMember } from '../../common/iso-names.ts'
import { fieldWords, lackWords, pathOfMissing } from '../../common/lacking.ts'
import { confirmInEdition } from '../../common/review-band.ts'
import { cannotTell, list, names, notStated, stateFix, verb } from '../../common/wording.ts'
import type { CouponSide, Rule, RuleVerdict } from '../../rule.ts'
import { coveredNames, coversGroups, foreignGroup, jointName, members, tableRow, type GroupVerdict } from '../groups.ts'
import { meta } from '../meta.ts'

const metalPair = (variables: WeldingVariables): string | null => {
  const a = metalName(variables.baseMetals.a)
  const b = metalName(secondMember(variables))
  return a === null || b === null ? null : [a, b].sort().join(' + ')
}

interface Judged extends GroupVerdict { side: CouponSide }

/** Field of the first member without a group. */
const ungrouped = (variables: WeldingVariables): string => `baseMetals.${groupOf(variables.baseMetals.a) ? 'b' : 'a'}.iso15608`

const foreign = (group: string): string => `${group} is no group of steel or nickel alloy of ISO/TR 15608 (1 to 11 and 41 to 48), for which this standard is written`

/** One coupon: the same metals always cover themselves; else the groups decide. */
function judge(procedure: WeldingVariables, side: CouponSide): Judged {
  const own = metalPair(procedure)
  if (own !== null && own === metalPair(side.variables)) return { side, covered: 'yes', missing: [], basis: 'secondary', clause: '8.3.1' }
  const asked = members(procedure)
  const test = members(side.variables)
  if (!test) return { side, covered: 'missing', missing: [`${side.coupon.number}: ${ungrouped(side.variables)}`], basis: 'secondary', clause: '8.3.1' }
  if (!asked) return { side, covered: 'missing', missing: [`procedure: ${ungrouped(procedure)}`], basis: 'secondary', clause: '8.3.1' }
  const verdict = coversGroups(test, asked)
  return { ...verdict, side, missing: verdict.missing.map((text) => text.replace('coupon: ', `${side.coupon.number}: `)) }
}

export const materialGroup: Rule = {
  meta: meta('material-group', { title: 'Parent material groups', clause: '8.3.1', basis: 'secondary', statement: 'The groups of both members stand in the columns that Table 5 gives for the test joint; groups 1, 2, 3 and 11 with a specified minimum yield no higher than tested, groups 4, 5, 6, 8 and 9 in the same or a lower sub-group, groups 7 and 10 in the same sub-group. Ungrouped metal covers itself. Rows that are doubtful, and nickel alloys beyond the same group, can\'t be told, nor can metals that are neither steel nor nickel.' }),
  field: 'baseMetals.a.iso15608',
  at: 'weld',
  label: 'Parent material groups',
  range(_context, side) {
    const strange = foreignGroup(side.variables)
    if (strange !== null) return { range: UNKNOWN_SET, tested: strange, reason: `${foreign(strange)}.`, missing: [`${side.coupon.number}: baseMetals.a.iso15608`] }
    const test = members(side.variables)
    if (!test) return { range: UNKNOWN_SET, tested: null, reason: `${side.coupon.number} has no ISO/TR 15608 group recorded; it covers its own metal only.`, missing: [`${side.coupon.number}: ${ungrouped(side.variables)}`] }
    const row = tableRow(test)
    return { range: setRange(coveredNames(test), { unknown: !row.known || row.review !== undefined }), tested: jointName(test), reason: `Test joint ${jointName(test)}: one member in each column of its row, the footnotes on yield and sub-group applied to each.`, basis: row.basis, clause: test.some(({ group }) => group.main >= 41) ? '8.3.1.3 Table 6' : '8.3.1.2 Table 5' }
  },
  check(context, sides, joined): RuleVerdict | null {
    const strange = foreignGroup(context.procedure)
    if (strange !== null) return cannotTell(`${foreign(strange)}, so nothing of it is covered here.`, [`a standard for group ${strange}`], { asked: [strange], range: joined, fixes: [stateFix('ISO/TR 15608 group', 'baseMetals.a.iso15608')] })
    const odd = sides.map((side) => foreignGroup(side.variables)).find((group) => group !== null)
    if (odd && sides.every((side) => foreignGroup(side.variables) !== null)) return cannotTell(`${foreign(odd)}, and ${names(sides)} ${verb(sides, 'gives', 'give')} it as the parent metal's.`, sides.map((side) => `${side.coupon.number}: baseMetals.a.iso15608`), { range: joined })
    const judged = sides.filter((side) => foreignGroup(side.variables) === null).map((side) => judge(context.procedure, side))
    const asked = members(context.procedure)
    const name = asked ? jointName(asked) : null
    const best = judged.find(({ covered }) => covered === 'yes') ?? judged.find(({ covered }) => covered === 'missing') ?? judged.find(({ covered }) => covered === 'review') ?? judged[0]
    if (!best) return null
    const base = { asked: name ? [name] : null, range: joined, basis: best.basis, clause: best.clause }
    if (best.covered === 'yes') return { ...base, verdict: 'within', sentence: `${name ?? 'The metal'} is covered by ${best.side.coupon.number}.` }
    if (name === null) return notStated('ISO/TR 15608 group', ungrouped(context.procedure), base)
    const plan = { kind: 'plan-coupon' as const, label: `Weld a coupon of ${name}`, requirement: `A coupon joining group ${name.replace(' to ', ' to group ')}.` }
    if (best.covered === 'missing') return { ...base, verdict: 'cannot-tell', sentence: `Whether ${names(sides)} ${verb(sides, 'covers', 'cover')} ${name} can't be told: ${lackWords(best.missing)}.`, missing: best.missing, fixes: [...best.missing.filter((text) => text.startsWith('procedure: ')).map((text) => stateFix(fieldWords(pathOfMissing(text)), pathOfMissing(text))), plan] }
    if (best.covered === 'review') return { ...base, verdict: 'cannot-tell', sentence: `Whether ${names(sides)} ${verb(sides, 'covers', 'cover')} ${name} can't be told: that entry of the table is not known here. Look it up in your edition.`, missing: [confirmInEdition(best.clause)], fixes: [plan] }
    const limits = judged.flatMap(({ side }) => { const test = members(side.variables); return test ? coveredNames(test) : [] })
    return { ...base, verdict: 'outside', sentence: `${name} is not covered: ${names(sides)} ${verb(sides, 'qualifies', 'qualify')} ${list([...new Set(limits)], 'or')}.`, fixes: [plan], reasoning: ['One member must stand in each column of the table, and both must satisfy the footnotes on yield or sub-group.'] }
  },
}
