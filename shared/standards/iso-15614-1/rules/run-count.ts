/** 8.4.3: single or multiple runs. */
import { nameBandRule } from '../../common/review-band.ts'
import { levelTwoLimit } from '../levels.ts'
import { meta } from '../meta.ts'
import { runsOf } from '../sides.ts'

export const runCount = levelTwoLimit(
  nameBandRule({
    meta: meta('run-count', { title: 'Single or multiple runs', clause: '8.4.3', basis: 'memory', statement: 'For one process a change from several runs to a single run (or one from each side), or the reverse, is not covered.' }),
    field: 'technique.passesPerSide',
    at: 'block',
    label: 'number of runs',
    asked(context) {
      const runs = context.block && (context.block.technique.passesPerSide ?? runsOf(context.procedure, context.block))
      return runs ? [runs] : null
    },
    tested(_context, side) {
      const runs = side.block && (side.block.technique.passesPerSide ?? runsOf(side.variables, side.block, side.coupon))
      return runs ? [runs] : null
    },
    because: 'Single and multiple runs do not stand for each other.',
    setValue: (name) => name,
  }),
)
