/** Table 6.7: another position changed to vertical up. A vertical-up test covers the toughness of every position. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'
import { askedPlaces } from '../positions.ts'

const UP = 'vertical up'
const OTHER = 'other than vertical up'

function upToken(block: ProcessBlock | null): string | null {
  if (!block || block.positions.length === 0) return null
  if (!askedPlaces(block.positions).some((place) => place === 'vertical' || place === '5F') || block.progression === 'down') return OTHER
  return block.progression === null ? null : UP
}

export const cvnVerticalUp = namedRule({
  meta: meta('cvn_vertical_up'),
  field: 'positions',
  at: 'block',
  label: 'position and direction with CVN',
  asked(context) {
    const value = upToken(context.block)
    return value ? [value] : null
  },
  tested: (_context, side) => upToken(side.block),
  covers: (value) => (value === UP ? [UP, OTHER] : [OTHER]),
  lacks: (_variables, block) => [block?.positions.length === 0 ? 'positions' : 'progression'],
  because: 'A vertical-up test covers the toughness of every position; no other position covers vertical up.',
})

