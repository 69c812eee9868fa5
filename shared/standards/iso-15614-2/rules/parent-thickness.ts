/** 8.3.2: thickness of both members. */
import { askedInterval, siSingle } from '../../common/iso-names.ts'
import { isStated } from '../../common/reading.ts'
import { bandRule, type Band } from '../../common/review-band.ts'
import { show } from '../../common/wording.ts'
import type { CouponSide, RangeContext, Rule } from '../../rule.ts'
import { meta } from '../meta.ts'
import { bandOf, lacks, weldAsked } from '../size-bands.ts'
import { buttThickness, mm } from '../tables.ts'

function thicknessBand(context: RangeContext, side: CouponSide): Band | null {
  const t = siSingle(side.variables.thickness, 'length')
  const second = isStated(side.variables.thicknessB) ? siSingle(side.variables.thicknessB, 'length') : t
  if (t === null || second === null) return lacks(side, 'thickness')
  if (side.variables.joint.weld === 'fillet' && weldAsked(context, side) === 'groove') return null
  const thinner = Math.min(t, second)
  const runs = side.variables.processes.length > 1 ? 'multiple' : (side.block?.technique.passesPerSide ?? null)
  const reading = buttThickness(thinner, runs)
  // For the material of a fillet no table is held: the tested thickness alone is sure.
  if (weldAsked(context, side) === 'fillet') return { ...bandOf(thinner, 't', reading), sure: mm(thinner, thinner), maybe: mm(null, null), reason: `t = ${show(thinner, 'mm')}; the table for fillets is not held here.`, why: 'Which material thickness a fillet covers is not held here.' }
  return bandOf(thinner, 't', reading)
}

/** The rule for one of the two members. */
export const thicknessRule = (which: 'thickness' | 'thicknessB'): Rule =>
  bandRule({
    meta: meta(which === 'thickness' ? 'parent-thickness' : 'parent-thickness-second', { title: which === 'thickness' ? 'Parent material thickness' : 'Parent material thickness, second member', clause: '8.3.2', combine: 'union', statement: 'Butt welds: up to 3 mm 0.5t to 2t, up to 20 mm 3 mm to 2t, above that 0.8t and up, as recalled; where EN 288-4 is narrower, by single or several runs, the rest must be looked up. Both of two members are in range. Of fillets only the tested thickness is sure.' }),
    field: which,
    at: 'weld',
    label: which === 'thickness' ? 'parent material thickness' : 'thickness of the second member',
    dimension: 'length',
    applies: which === 'thickness' ? undefined : (context) => isStated(context.procedure.thicknessB),
    asked: (context) => askedInterval(context.procedure[which], 'length'),
    band: (context, side) => (which === 'thicknessB' && !isStated(context.procedure?.thicknessB) ? null : thicknessBand(context, side)),
  })

export const parentThickness = thicknessRule('thickness')
