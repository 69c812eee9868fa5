/** Table 6.7: least thickness with CVN, T or 16 mm (5/8 in.), whichever is less; from 3 mm (1/8 in.) where T is under 6 mm (1/4 in.). */
import { figures, unitOf } from '../../common/reading.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { show } from '../../common/wording.ts'
import { meta } from '../meta.ts'
import { memberCures } from '../member-cures.ts'
import { couponThickness, lengthRange, unknownLength } from '../ranges.ts'

/** Printed pairs: the floor, the thickness below which it falls to the least, and that least. */
const FLOOR = { SI: { floor: 16, thin: 6, least: 3 }, US: { floor: 5 / 8, thin: 1 / 4, least: 1 / 8 } } as const

export const cvnThickness = figureRule({
  meta: meta('cvn_min_thickness', { combine: 'union' }),
  field: 'thickness',
  at: 'weld',
  label: 'least thickness with CVN',
  dimension: 'length',
  cure: (context, joined) => memberCures(context, joined, 'thickness'),
  asked(context) {
    const all = [context.procedure.thickness, context.procedure.thicknessB].flatMap((interval) => (interval ? [figures(interval, 'length', context.system)] : []))
    if (all.some(({ fault }) => fault)) return 'fault'
    if (all.some((one) => one.all)) return { min: 0, max: null }
    const lows = all.flatMap(({ min, max }) => min ?? max ?? [])
    return lows.length > 0 ? { min: Math.min(...lows), max: Math.min(...lows) } : null
  },
  range(context, side) {
    const { system } = context
    const T = couponThickness(side.variables, system)
    if (T === null) return { range: unknownLength(system), tested: null, reason: `${side.coupon.number} has no thickness recorded.`, missing: [`${side.coupon.number}: thickness`] }
    const { floor, thin, least } = FLOOR[system]
    const low = T < thin ? least : Math.min(T, floor)
    return { range: lengthRange(system, low, null), tested: T, reason: `A test of ${show(T, unitOf('length', system))} gives ${show(low, unitOf('length', system))} as the least thickness with CVN.` }
  },
})

