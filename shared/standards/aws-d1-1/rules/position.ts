/** Row 27: positions by Tables 6.1 and 10.8. */
import { setRange } from '../../../ranges/set.ts'
import type { Basis } from '../../../schemas/assessment.ts'
import { namedRule, weakest } from '../../common/rule-kinds.ts'
import { list, names, verb } from '../../common/wording.ts'
import type { CouponSide, Rule } from '../../rule.ts'
import { meta } from '../meta.ts'
import { askedPlaces, coveredPlaces, positionBasis } from '../positions.ts'

const base = namedRule({
  meta: meta('position', { combine: 'jointly' }),
  field: 'positions',
  at: 'block',
  label: 'position',
  asked: (context) => (context.block && context.block.positions.length > 0 ? askedPlaces(context.block.positions) : null),
  tested: (_context, side) => (side.block && side.block.positions.length > 0 ? side.block.positions.join(' and ') : null),
  covers: (_value, _context, side) => coveredPlaces(side.block?.positions ?? []),
  because: 'A test position covers what the table gives for a procedure; the wider rows are for welders.',
  plan: (asked) => `A coupon whose test positions cover ${asked.join(', ')}.`,
})

const clauseOf = (side: CouponSide): string => (side.variables.product === 'plate' ? 'Table 6.1' : 'Table 10.8')

export const position: Rule = {
  ...base,
  range(context, side) {
    const range = base.range(context, side)
    if (!range || range.range.type !== 'set' || !side.block) return range
    const { positions } = side.block
    // What a fixed horizontal pipe fillet covers besides itself, and what else covers it, isn't confirmed.
    const unknown = positions.includes('5F')
    return { ...range, range: setRange(range.range.values, { unknown: range.range.unknown || unknown }), basis: positionBasis(positions, side.variables), clause: clauseOf(side), ...(unknown ? { missing: ['what tests cover 5F, and what a test in 5F covers besides it'] } : {}) }
  },
  check(context, sides, joined) {
    const judged = base.check(context, sides, joined)
    const first = sides[0]
    if (!judged || !first) return judged
    const settled = { ...judged, clause: clauseOf(first), basis: sides.map((side) => positionBasis(side.block?.positions ?? [], side.variables)).reduce<Basis>(weakest, 'read') }
    if (judged.asked === null || sides.some((side) => (side.block?.positions.length ?? 0) === 0)) return settled
    const missed = askedPlaces(context.block?.positions ?? []).filter((place) => joined?.type !== 'set' || !joined.values.includes(place))
    const onlyFixed = judged.verdict === 'outside' && missed.every((place) => place === '5F')
    if (judged.verdict !== 'cannot-tell' && !onlyFixed) return settled
    return { ...settled, verdict: 'cannot-tell', missing: ['what tests cover 5F, and what a test in 5F covers besides it'], fixes: judged.fixes ?? [], sentence: `Whether ${names(sides)} ${verb(sides, 'covers', 'cover')} ${list(askedPlaces(context.block?.positions ?? []))} can't be told: what covers a fixed pipe fillet (5F), and what such a test covers besides itself, is not confirmed here.` }
  },
}
