/** QW-403.11 with QW-424.1 (and QW-403.12 for PAW): which pairs of P-Numbers a coupon covers. */
import { setRange, UNKNOWN_SET } from '../../../ranges/set.ts'
import type { Basis } from '../../../schemas/assessment.ts'
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { rememberPair } from '../../common/remember.ts'
import { capital, list, names, verb } from '../../common/wording.ts'
import type { CouponSide, RangeContext, Rule } from '../../rule.ts'
import { identity, pairName, pNumber, secondMetal } from '../members.ts'
import { meta } from '../meta.ts'
import type { Paragraph } from '../variables.ts'

/** P-Numbers that cover downwards, itself first (QW-424.1). */
const DOWNWARD: Readonly<Record<string, readonly string[]>> = { '3': ['3', '1'], '4': ['4', '3', '1'], '5A': ['5A', '4', '3', '1'] }

/**
 * The pairs that a coupon of P-Numbers `a` and `b` covers, by QW-424.1. The coupon's own P-Number always stays on one side.
 * @returns names such as `P-4 to P-1`, and how the line of the table is known
 */
export const coveredPairs = rememberPair((a: string, b: string): { pairs: readonly string[]; basis: Basis } => {
  if (a === b) {
    const down = DOWNWARD[a]
    if (down) return { pairs: down.map((p) => pairName(a, p)), basis: 'read' }
    if (a === '15E') return { pairs: [pairName('15E', '15E'), pairName('15E', '5B'), pairName('5B', '5B')], basis: 'read' }
    return { pairs: [pairName(a, a)], basis: 'read' }
  }
  for (const [x, y] of [[a, b], [b, a]] as const) {
    if (x === '15E') return { pairs: [pairName('15E', y), pairName('5B', y)], basis: 'read' }
    const down = (x === '5A' || x === '4') && DOWNWARD[x]?.slice(1)
    if (down && down.includes(y)) return { pairs: down.map((p) => pairName(x, p)), basis: 'memory' }
  }
  return { pairs: [pairName(a, b)], basis: 'read' }
})

/** QW-403.12, plasma: only melt-in lets P-No. 1, 3, 4 and 5A cover the lower ones (memory). */
export function coveredPairsPlasma(a: string, b: string, meltIn: boolean): { pairs: readonly string[]; basis: Basis } {
  const down = a === b && meltIn ? DOWNWARD[a] : undefined
  return { pairs: down ? down.map((p) => pairName(a, p)) : [pairName(a, b)], basis: 'memory' }
}

/** P-Numbers or names of both members; null where a member isn't known by either. */
function tokens(variables: WeldingVariables): { p: [string, string] | null; own: string | null; lacking: string[] } {
  const first = variables.baseMetals.a
  const second = secondMetal(variables)
  const a = pNumber(first)
  const b = pNumber(second)
  if (a !== null && b !== null) return { p: [a, b], own: null, lacking: [] }
  const lacking = [...(a === null ? ['baseMetals.a.pNumber'] : []), ...(b === null ? [second === first ? 'baseMetals.a.pNumber' : 'baseMetals.b.pNumber'] : [])]
  const ids = [a === null ? identity(first) : `P-${a}`, b === null ? identity(second) : `P-${b}`]
  const own = ids[0] && ids[1] ? [...ids].sort().join(' to ') : null
  return { p: null, own, lacking: [...new Set(lacking)] }
}

const covered = (context: RangeContext, side: CouponSide, p: [string, string]): { pairs: readonly string[]; basis: Basis } =>
  side.block?.process === 'PAW' ? coveredPairsPlasma(p[0], p[1], side.block.technique.keyhole === 'melt-in') : coveredPairs(p[0], p[1])

const build = (paragraph: Paragraph, file: string): Rule => ({
  meta: meta(paragraph, file),
  field: 'baseMetals.a.pNumber',
  at: 'weld',
  label: 'P-Number',
  range(context, side) {
    const { p, own, lacking } = tokens(side.variables)
    if (p) {
      const { pairs, basis } = covered(context, side, p)
      return { range: setRange(pairs), tested: pairName(p[0], p[1]), reason: `${pairName(p[0], p[1])} covers ${list(pairs)}.`, basis }
    }
    // A metal without P-Number covers itself; whether it is unassigned or just not recorded can't be told from the record.
    if (own) return { range: setRange([own], { unknown: true }), tested: own, reason: `${own} has no P-Number recorded, so it covers itself.`, basis: 'memory', missing: lacking.map((field) => `${side.coupon.number}: ${field}`) }
    return { range: UNKNOWN_SET, tested: null, reason: `${side.coupon.number} has no P-Number recorded.`, missing: lacking.map((field) => `${side.coupon.number}: ${field}`) }
  },
  check(context, sides, joined) {
    if (joined?.type !== 'set') return null
    const { p, own, lacking } = tokens(context.procedure)
    if (!p) {
      const field = lacking[0] ?? 'baseMetals.a.pNumber'
      if (own && joined.values.includes(own)) return { verdict: 'within', sentence: `${own} is the metal of ${names(sides)}, which covers itself.`, asked: [own], range: joined, basis: 'memory', field }
      return { verdict: 'cannot-tell', sentence: "A base metal of the procedure has no P-Number, so its coverage can't be told.", asked: own ? [own] : null, range: joined, missing: lacking.map((path) => `procedure: ${path}`), field, fixes: [{ kind: 'state', label: 'State the P-Number', field }] }
    }
    const asked = pairName(p[0], p[1])
    let basis: Basis = 'read'
    for (const side of sides) {
      const pair = tokens(side.variables).p
      if (pair) ({ basis } = covered(context, side, pair))
    }
    if (joined.values.includes(asked)) return { verdict: 'within', sentence: `${asked} is covered by ${names(sides)}.`, asked: [asked], range: joined, basis }
    if (joined.unknown) return { verdict: 'cannot-tell', sentence: `${names(sides)} ${verb(sides, 'has', 'have')} a base metal without P-Number, so whether it covers ${asked} can't be told.`, asked: [asked], range: joined, missing: sides.flatMap((side) => tokens(side.variables).lacking.map((field) => `${side.coupon.number}: ${field}`)) }
    const keyhole = sides.some((side) => side.block?.process === 'PAW' && side.block.technique.keyhole === null && DOWNWARD[tokens(side.variables).p?.[0] ?? ''])
    if (keyhole && sides.some((side) => { const pair = tokens(side.variables).p; return pair && coveredPairsPlasma(pair[0], pair[1], true).pairs.includes(asked) })) {
      return { verdict: 'cannot-tell', sentence: `${names(sides)} covers ${asked} only if it was welded with melt-in technique, which isn't recorded.`, asked: [asked], range: joined, missing: sides.map((side) => `${side.coupon.number}: technique.keyhole`), basis: 'memory' }
    }
    return {
      verdict: 'outside',
      sentence: `${capital(asked)} is not covered: ${names(sides)} ${verb(sides, 'qualifies', 'qualify')} ${list(joined.values)} only.`,
      asked: [asked],
      range: joined,
      basis,
      fixes: [{ kind: 'plan-coupon', label: `Weld a coupon of ${asked}`, requirement: `A coupon of ${asked}.` }],
      reasoning: ["Coverage downwards keeps the coupon's own P-Number on one side; two records never make a mixed pair."],
    }
  },
})

export const baseMetalPNumber = build('QW-403.11', 'base-metal-p-number')
export const baseMetalPNumberPlasma = build('QW-403.12', 'base-metal-p-number-plasma')
