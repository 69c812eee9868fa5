/** 8.4.2: position; the tested ones are sure. */
import { isoPositions } from '../../common/iso-names.ts'
import { nameBandRule } from '../../common/review-band.ts'
import { meta } from '../meta.ts'

export const position = nameBandRule({
  meta: meta('position', { title: 'Welding position', clause: '8.4.2', combine: 'jointly', statement: 'The positions tested are covered; which others they cover must be looked up.' }),
  field: 'positions',
  at: 'block',
  label: 'position',
  asked: (context) => context.block && isoPositions(context.procedure, context.block),
  tested: (_context, side) => side.block && isoPositions(side.variables, side.block),
  covers: (value) => ({ sure: value, maybe: 'any', why: 'Which other positions a coupon covers is not held here.' }),
  because: 'As tested is covered.',
  lacks: () => ['positions', 'progression'],
})
