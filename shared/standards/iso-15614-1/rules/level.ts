/** Introduction and 8.1: the level to which the coupon was tested against the level that is asked. */
import { nameBandRule } from '../../common/review-band.ts'
import { couponLevel, levelOf } from '../levels.ts'
import { meta } from '../meta.ts'

const name = (level: '1' | '2'): string => `level ${level}`

export const level = nameBandRule({
  meta: meta('level', { title: 'Level of the qualification', clause: 'Introduction', basis: 'read', source: 'Foreword of a national adoption, 2017; trade article', statement: 'A level 2 coupon serves level 1 too; a level 1 coupon does not serve level 2. Where no level is named, level 2 applies.' }),
  field: 'standards',
  at: 'weld',
  label: 'level',
  asked: (context) => [name(levelOf(context))],
  tested(context, side) {
    const had = couponLevel(side)
    return had === null ? (context.procedure ? null : [name(levelOf(context))]) : [name(had)]
  },
  covers: ([had]) => ({ sure: had === 'level 2' ? ['level 2', 'level 1'] : ['level 1'] }),
  because: 'Level 2 holds level 1; level 1 does not hold level 2.',
  lacks: () => ['standards (a test to ISO 15614-1 and its level)'],
  plan: () => 'A coupon tested to level 2, or the missing level 2 tests on the level 1 coupon.',
})
