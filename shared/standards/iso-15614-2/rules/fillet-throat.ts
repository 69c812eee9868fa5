/** 8.3.2: fillet throat. */
import { askedInterval } from '../../common/iso-names.ts'
import { bandRule } from '../../common/review-band.ts'
import type { RangeContext } from '../../rule.ts'
import { meta } from '../meta.ts'
import { bandOf, lacks, weldAsked } from '../size-bands.ts'
import { mm, nothing, throat } from '../tables.ts'

/** Throat stated, or leg ÷ √2 of an equal-leg fillet. */
function throats(variables: RangeContext['procedure']): { min: number | null; max: number | null } | null | 'fault' {
  const own = askedInterval(variables?.joint.filletThroat, 'length')
  if (own !== null) return own
  const leg = askedInterval(variables?.joint.filletLeg, 'length')
  const of = (value: number | null): number | null => (value === null ? null : Math.round(value * Math.SQRT1_2 * 1000) / 1000)
  return leg === null || leg === 'fault' ? leg : { min: of(leg.min), max: of(leg.max) }
}

export const filletThroat = bandRule({
  meta: meta('fillet-throat', { title: 'Fillet throat', clause: '8.3.2', combine: 'union', statement: 'Below 10 mm 0.75 to 1.5 times the tested throat; from 10 mm, 10 mm and up is sure, down to 7.5 mm must be looked up.' }),
  field: 'joint.filletThroat',
  at: 'weld',
  label: 'fillet throat',
  dimension: 'length',
  applies: (context) => context.procedure.joint.weld === 'fillet',
  asked: (context) => throats(context.procedure),
  band(context, side) {
    if (weldAsked(context, side) !== 'fillet') return null
    if (side.variables.joint.weld === 'groove') return { sure: nothing, maybe: mm(null, null), tested: null, reason: `${side.coupon.number} is a butt; its fillet range is not held here.`, why: 'Which throats a butt coupon covers is not held here.' }
    const own = throats(side.variables)
    if (own === null || own === 'fault' || own.min === null || own.min !== own.max || own.min <= 0) return lacks(side, 'joint.filletThroat')
    return bandOf(own.min, 'a', throat(own.min))
  },
})
