/** Table 6.3: a partial-penetration test covers groove depths up to its own. */
import { figures, isStated, single, unitOf } from '../../common/reading.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { show } from '../../common/wording.ts'
import { ownMeta } from '../meta.ts'
import { lengthRange, testKind, unknownLength } from '../ranges.ts'

export const grooveDepth = figureRule({
  meta: ownMeta('groove-depth', 'Groove depth (partial penetration)', 'Table 6.3', 'memory', 'Table 6.3 as recalled', 'A partial-penetration test covers grooves up to the depth tested; a complete-penetration test covers every depth.'),
  field: 'depositThickness',
  at: 'block',
  label: 'groove depth',
  dimension: 'length',
  applies: (context) => testKind(context.procedure) === 'partial',
  asked(context) {
    const deposit = context.block?.depositThickness
    const { min, max, all, fault } = figures(deposit, 'length', context.system)
    if (fault) return 'fault'
    if (all) return { min: 0, max: null }
    return isStated(deposit) ? { min: 0, max: max ?? min } : null
  },
  range(context, side) {
    const { system } = context
    const kind = testKind(side.variables)
    if (kind === 'fillet') return null
    if (kind === 'complete') return { range: lengthRange(system, null, null), tested: null, reason: 'A complete-penetration test covers every groove depth.' }
    const depth = single(side.block?.depositThickness, 'length', system)
    if (depth === null) return { range: unknownLength(system), tested: null, reason: `${side.coupon.number} does not record its groove depth.`, missing: [`${side.coupon.number}: depositThickness`] }
    return { range: lengthRange(system, 0, depth), tested: depth, reason: `Up to the ${show(depth, unitOf('length', system))} tested.` }
  },
})
