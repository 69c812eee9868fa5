/** Table 5: which groups of ISO/TR 15608 a test joint covers, with its footnotes on yield and sub-group. */
import type { BaseMetal, WeldingVariables } from '../../schemas/welding.ts'
import type { Basis } from '../../schemas/assessment.ts'
import { materialGroup, metalName, secondMember, siFigure, strangeGroup, type MaterialGroup } from '../common/iso-names.ts'

interface Row { a: readonly number[]; b: readonly number[]; basis: Basis; review?: readonly number[] }

const S = 'secondary'
const M = 'memory'
const one = (a: number, b: readonly number[], basis: Basis = S): Row => ({ a: [a], b, basis })

/** Test joint, higher group first → groups of the one member and of the other. */
const TABLE_5: Readonly<Record<string, Row>> = {
  '1-1': one(1, [1]),
  '2-2': { a: [2, 1], b: [2, 1], basis: S },
  '2-1': { a: [2, 1], b: [1], basis: S },
  '3-3': { a: [3, 2, 1], b: [3, 2, 1], basis: S },
  '3-2': { a: [3, 2, 1], b: [2, 1], basis: S },
  '3-1': { a: [3, 2, 1], b: [1], basis: S },
  '4-4': one(4, [4, 3, 2, 1]),
  '4-3': one(4, [3, 2, 1]),
  '4-2': one(4, [2, 1]),
  '4-1': one(4, [1]),
  '5-5': one(5, [5, 2, 1]),
  // The public table prints implausible rows here: identical groups are sure, the rest is for a person to look up.
  '5-4': { a: [5], b: [4], basis: M, review: [5, 4, 3, 2, 1] },
  '5-3': { a: [5], b: [3], basis: M, review: [5, 4, 3, 2, 1] },
  '5-2': { a: [5], b: [2], basis: M, review: [5, 4, 3, 2, 1] },
  '5-1': one(5, [1]),
  '6-6': one(6, [6, 5, 4, 3, 2, 1]),
  '6-5': one(6, [5, 4, 3, 2, 1]),
  '6-4': one(6, [4, 3, 2, 1]),
  '6-3': one(6, [3, 2, 1]),
  '6-2': one(6, [2, 1]),
  '6-1': one(6, [1]),
  '7-7': one(7, [7]),
  '7-6': one(7, [6, 5]),
  '7-5': one(7, [5]),
  '7-4': one(7, [4]),
  '7-3': one(7, [3, 2, 1]),
  '7-2': one(7, [2, 1]),
  '7-1': one(7, [1]),
  '8-8': one(8, [8]),
  '8-7': one(8, [7]),
  '8-6': one(8, [6, 5, 4, 2, 1]),
  '8-5': one(8, [5, 4, 2, 1]),
  '8-4': one(8, [4]),
  '8-3': one(8, [3, 2, 1]),
  '8-2': one(8, [2, 1]),
  '8-1': one(8, [1]),
  '9-9': one(9, [9]),
  '9-8': one(9, [8]),
  '9-7': one(9, [7]),
  '9-6': one(9, [6]),
  '9-5': one(9, [5]),
  '9-4': one(9, [4]),
  '9-3': one(9, [3, 2, 1]),
  '9-2': one(9, [2, 1], M),
  '9-1': one(9, [1], M),
  '10-10': one(10, [10], M),
  '10-8': one(10, [8], M),
  '10-6': one(10, [6, 4, 2, 1], M),
  '10-5': one(10, [5, 4, 2, 1], M),
  '10-3': one(10, [3, 2, 1], M),
  '10-2': one(10, [2, 1], M),
  '11-11': { a: [11], b: [11, 1], basis: M },
}

const YIELD: ReadonlySet<number> = new Set([1, 2, 3, 11])
const LOWER_SUB: ReadonlySet<number> = new Set([4, 5, 6, 8, 9])
const SAME_SUB: ReadonlySet<number> = new Set([7, 10])

/** Steels and nickel alloys: the groups of this standard. */
const isSteelOrNickel = (main: number): boolean => (main >= 1 && main <= 11) || (main >= 41 && main <= 48)

/** A recorded group that is not of this standard, or no group at all; null where there is none. */
export const foreignGroup = (variables: WeldingVariables): string | null => strangeGroup(variables, isSteelOrNickel)

/** `place`: which member of the record it is; one metal for both stands as `a`. */
export interface Member { metal: BaseMetal; group: MaterialGroup; place: 'a' | 'b' }

/** Both members of a joint, the higher group first; null where a group isn't recorded. */
export function members(variables: WeldingVariables): readonly [Member, Member] | null {
  const first = variables.baseMetals.a
  const second = secondMember(variables)
  const a = materialGroup(first)
  const b = materialGroup(second)
  if (!a || !b) return null
  const pair: [Member, Member] = [{ metal: first, group: a, place: 'a' }, { metal: second, group: b, place: second === first ? 'a' : 'b' }]
  return a.main >= b.main ? pair : [pair[1], pair[0]]
}

/** `1.2 to 8.1`, the same whichever way round it is written. */
export const jointName = ([a, b]: readonly [Member, Member]): string => [a.group.text, b.group.text].sort((x, y) => Number.parseFloat(y) - Number.parseFloat(x)).join(' to ')

type Covered = 'yes' | 'no' | { unknown: string }
const NO: Covered = 'no'

/** What is not recorded: of the coupon's member, or of the procedure's where that is null. */
const lacks = (tested: Member | null, asked: Member, field: string): Covered => ({ unknown: tested ? `coupon: baseMetals.${tested.place}.${field}` : `procedure: baseMetals.${asked.place}.${field}` })

/** Footnotes a to c for one member in the place of a member of the test. */
function footnote(asked: Member, tested: Member): Covered {
  const same = metalName(asked.metal)
  if (same !== null && same === metalName(tested.metal)) return 'yes'
  if (YIELD.has(asked.group.main)) {
    const limit = siFigure(tested.metal.minYield, 'stress')
    const own = siFigure(asked.metal.minYield, 'stress')
    if (limit === null || own === null) return lacks(own === null ? null : tested, asked, 'minYield')
    return own <= limit ? 'yes' : NO
  }
  if (asked.group.main !== tested.group.main) return 'yes'
  if (asked.group.main >= 41) return asked.group.text === tested.group.text ? 'yes' : NO
  if (asked.group.sub === null || tested.group.sub === null) return lacks(asked.group.sub === null ? null : tested, asked, 'iso15608')
  if (SAME_SUB.has(asked.group.main)) return asked.group.sub === tested.group.sub ? 'yes' : NO
  return LOWER_SUB.has(asked.group.main) && asked.group.sub <= tested.group.sub ? 'yes' : NO
}

const both = (a: Covered, b: Covered): Covered => (a === 'no' || b === 'no' ? NO : a === 'yes' ? b : a)
const either = (a: Covered, b: Covered): Covered => (a === 'yes' || b === 'yes' ? 'yes' : a === 'no' ? b : a)

/** What the table has for a test joint; nickel alloys and pairs that it is not known to print cover the identical pair. */
export function tableRow(test: readonly [Member, Member]): Row & { known: boolean } {
  const [a, b] = test
  const row = TABLE_5[`${a.group.main}-${b.group.main}`]
  return row ? { ...row, known: true } : { a: [a.group.main], b: [b.group.main], basis: 'memory', known: false }
}

export interface GroupVerdict { covered: 'yes' | 'no' | 'review' | 'missing'; missing: readonly string[]; basis: Basis; clause: string }

/**
 * Whether a test joint covers a production joint, each member of which must stand in one column and satisfy the footnotes.
 * `review`: the table's entry for it is not known here.
 */
export function coversGroups(test: readonly [Member, Member], asked: readonly [Member, Member]): GroupVerdict {
  const row = tableRow(test)
  const nickel = test.some(({ group }) => group.main >= 41)
  const base = { missing: [], basis: row.basis, clause: nickel ? '8.3.1.3 Table 6' : '8.3.1.2 Table 5' }
  const inColumns = (x: Member, y: Member): Covered => (row.a.includes(x.group.main) && row.b.includes(y.group.main) ? both(footnote(x, test[0]), footnote(y, test[1])) : NO)
  let covered = either(inColumns(asked[0], asked[1]), inColumns(asked[1], asked[0]))
  // Two members of one group: either of the test's may stand for either of the joint's.
  if (test[0].group.main === test[1].group.main) {
    const swapped = (x: Member, y: Member): Covered => (row.a.includes(x.group.main) && row.b.includes(y.group.main) ? both(footnote(x, test[1]), footnote(y, test[0])) : NO)
    covered = either(covered, either(swapped(asked[0], asked[1]), swapped(asked[1], asked[0])))
  }
  if (covered === 'yes') return { ...base, covered: 'yes' }
  if (covered !== 'no') return { ...base, covered: 'missing', missing: [covered.unknown] }
  const mains = asked.map(({ group }) => group.main)
  // Of Table 6 only the same group is held: whatever else of nickel a nickel coupon may cover must be looked up.
  const ofNickel = nickel && mains.some((main) => main >= 41)
  const related = ofNickel || (row.review ? mains.some((main) => row.a.includes(main)) && mains.every((main) => row.review?.includes(main)) && !mains.every((main) => test.some(({ group }) => group.main === main)) : !row.known && mains.some((main) => test.some(({ group }) => group.main === main)))
  return { ...base, covered: related ? 'review' : 'no', basis: related ? 'memory' : row.basis }
}

/** The table's row in words, with what the footnotes leave of each group. */
export function coveredNames(test: readonly [Member, Member]): string[] {
  const row = tableRow(test)
  const name = (main: number, tested: Member): string => {
    if (YIELD.has(main)) {
      const limit = siFigure(tested.metal.minYield, 'stress')
      return `group ${main}${limit === null ? '' : ` (yield up to ${Math.round(limit)} MPa)`}`
    }
    if (main !== tested.group.main || tested.group.sub === null) return `group ${main}`
    return SAME_SUB.has(main) ? tested.group.text : LOWER_SUB.has(main) && tested.group.sub > 1 ? `${main}.1 to ${tested.group.text}` : tested.group.text
  }
  return row.a.flatMap((a) => row.b.map((b) => `${name(a, test[0])} with ${name(b, test[1])}`))
}
