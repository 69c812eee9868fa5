/** QW-410.11: P-No. 51 to 53 welded in a closed chamber do not cover welding outside it. */
import { namedRule } from '../../common/rule-kinds.ts'
import { pNumbers } from '../members.ts'
import { meta } from '../meta.ts'

const token = (closed: boolean | null | undefined): string | null => (closed === true ? 'closed chamber' : closed === false ? 'out of chamber' : null)

export const closedChamber = namedRule({
  meta: meta('QW-410.11', 'closed-chamber'),
  field: 'technique.closedChamber',
  at: 'block',
  label: 'welding in or out of a closed chamber',
  applies: (context) => pNumbers(context.procedure).some((p) => p === '51' || p === '52' || p === '53'),
  asked(context) {
    const value = token(context.block?.technique.closedChamber)
    return value ? [value] : null
  },
  tested: (_context, side) => token(side.block?.technique.closedChamber),
  covers: (value) => (value === 'closed chamber' ? [value] : ['closed chamber', 'out of chamber']),
  because: 'A coupon welded in the open covers the chamber; the reverse is not covered.',
  setValue: (name) => name === 'closed chamber',
})
