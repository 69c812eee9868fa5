/** Row 28: pipe diameter by Tables 6.1 and 10.9. */
import { figures, isStated } from '../../common/reading.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { meta } from '../meta.ts'
import { diameterSpan, lengthRange } from '../ranges.ts'

export const diameter = figureRule({
  meta: meta('thickness_diameter', { id: 'aws-d1-1/diameter', title: 'Diameter', statement: 'Pipe diameter outside the range that the test qualifies: a job size test its own diameter and over, one of 600 mm (24 in.) and over with more than 10 mm (3/8 in.) wall from 600 mm (24 in.), standard test pipes 20 to 100 mm (3/4 to 4 in.) or 100 mm (4 in.) and over (Table 10.9); a plate test pipe from 600 mm (24 in.) (Table 6.1).' }),
  field: 'diameter',
  at: 'weld',
  label: 'pipe diameter',
  dimension: 'length',
  applies: (context) => context.procedure.product !== 'plate',
  asked(context) {
    const { diameter: stated } = context.procedure
    const { min, max, all, fault } = figures(stated, 'length', context.system)
    if (fault) return 'fault'
    if (all) return { min: null, max: null }
    return isStated(stated) ? { min: min ?? max, max: max ?? min } : null
  },
  range(context, side) {
    const span = diameterSpan(context, side)
    // A plate procedure has no diameter to judge; the coupon's own page still shows what it covers of pipe.
    if (context.procedure?.product === 'plate') return { range: lengthRange(context.system, null, null), tested: span.tested, reason: 'The procedure is for plate.' }
    return { range: span.range, tested: span.tested, reason: span.reason, clause: span.clause, basis: span.basis, missing: span.missing }
  },
})
