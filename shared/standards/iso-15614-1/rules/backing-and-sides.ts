/** 8.4.3: sides and backing. */
import type { Joint } from '../../../schemas/welding.ts'
import { nameBandRule } from '../../common/review-band.ts'
import { levelTwoLimit } from '../levels.ts'
import { meta } from '../meta.ts'

/** Sides and backing in the standard's terms; null where the record does not say. */
export function sidesAndBacking(joint: Joint): string | null {
  const { backing, backGouging, weldedFromBothSides } = joint
  const both = weldedFromBothSides ?? (backing === 'weld-metal' || (joint.groove?.startsWith('double') ?? false) || (backGouging !== null && backGouging !== 'none') ? true : backing !== null && backing !== 'none' ? false : null)
  if (both === null) return null
  if (both) return backGouging === null ? null : backGouging === 'none' ? 'both sides, not gouged' : 'both sides, gouged'
  if (backing === null) return null
  return backing === 'none' ? 'one side, no backing' : backing === 'consumable-insert' ? 'one side, consumable insert' : 'one side, with backing'
}

const ORDER = ['one side, no backing', 'one side, with backing', 'both sides, not gouged', 'both sides, gouged']

export const backingAndSides = levelTwoLimit(
  nameBandRule({
    meta: meta('backing-and-sides', { title: 'Sides and backing', clause: '8.4.3', basis: 'memory', statement: 'A coupon welded from one side without backing covers backing and both sides; with backing it covers backing and both sides; both sides without gouging covers gouging. None of them covers the open root.' }),
    field: 'joint.backing',
    at: 'weld',
    label: 'sides and backing',
    applies: (context) => context.procedure.joint.weld === 'groove',
    asked(context) {
      const value = sidesAndBacking(context.procedure.joint)
      return value ? [value] : null
    },
    tested(_context, side) {
      if (side.variables.joint.weld === 'fillet') return undefined
      const value = sidesAndBacking(side.variables.joint)
      return value ? [value] : null
    },
    covers([value = '']) {
      const from = ORDER.indexOf(value)
      return from < 0 ? { sure: [value], maybe: 'any', why: 'How a consumable insert stands among the kinds of backing is not known here.' } : { sure: ORDER.slice(from), maybe: from === 0 ? ['one side, consumable insert'] : undefined }
    },
    because: 'Each covers itself and what follows: one side without backing, one side with backing, both sides, both sides gouged.',
    lacks: () => ['joint.backing', 'joint.weldedFromBothSides', 'joint.backGouging'],
  }),
)
