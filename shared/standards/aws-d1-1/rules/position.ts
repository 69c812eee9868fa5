/** Row 27: positions by Tables 6.1 and 10.8. */
import { setRange } from '../../../ranges/set.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import type { Rule } from '../../rule.ts'
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

export const position: Rule = {
  ...base,
  range(context, side) {
    const range = base.range(context, side)
    if (!range || range.range.type !== 'set' || !side.block) return range
    const basis = positionBasis(side.block.positions, side.variables)
    // What a fixed horizontal pipe fillet covers besides itself isn't confirmed.
    const unknown = side.block.positions.includes('5F')
    return { ...range, range: setRange(range.range.values, { unknown: range.range.unknown || unknown }), basis, clause: side.variables.product === 'plate' ? 'Table 6.1' : 'Table 10.8', ...(unknown ? { missing: ['what a test in 5F covers besides 5F'] } : {}) }
  },
}
