/** 8.3.2: parent thickness, Tables 7 and 8. */
import { intersectNumeric, unionNumeric } from '../../../ranges/numeric.ts'
import { askedInterval, hasImpactTests, siSingle } from '../../common/iso-names.ts'
import { isStated } from '../../common/reading.ts'
import { bandRule, type Band } from '../../common/review-band.ts'
import { show } from '../../common/wording.ts'
import type { CouponSide, RangeContext, Rule } from '../../rule.ts'
import { levelOf } from '../levels.ts'
import { meta } from '../meta.ts'
import { askedVariables, memberOf, testThickness } from '../sides.ts'
import { filletThickness, mm } from '../tables.ts'
import { noThickness, buttBand } from '../thickness-bands.ts'

/** Table 8 for the material of a fillet; a butt coupon stands with its own thickness. Of two unequal members each is held to its match, thin to thin. */
function filletBand(context: RangeContext, side: CouponSide, which: 'a' | 'b'): Band {
  if (levelOf(context) === '1') return { sure: mm(null, null), maybe: mm(null, null), tested: siSingle(side.variables.thickness, 'length'), reason: 'Level 1 does not limit the material thickness of fillets.', clause: '8.3.2 Table 8', basis: 'memory' }
  const first = siSingle(side.variables.thickness, 'length')
  const second = isStated(side.variables.thicknessB) ? siSingle(side.variables.thicknessB, 'length') : first
  if (first === null || second === null) return noThickness(side)
  const a = filletThickness(first)
  const b = filletThickness(second)
  const member = memberOf(context.procedure, which)
  const match = first === second || member === 'single' ? null : (member === 'thin') === (first < second) ? a : b
  const sure = match ? match.sure : intersectNumeric(a.sure, b.sure)
  const unequal = first === second ? undefined : 'The coupon\'s two members differ; a thickness that only one of them covers must be looked up.'
  return { sure, maybe: unionNumeric(a.maybe, b.maybe), tested: match === b ? second : first, reason: `t = ${show(first, 'mm')}${first === second ? '' : ` and ${show(second, 'mm')}`}: ${(match ?? a).how} by Table 8.`, why: unequal ?? a.why, clause: '8.3.2 Table 8', basis: 'memory' }
}

const FREE_THICKER = 30

function parentBand(context: RangeContext, side: CouponSide, which: 'a' | 'b'): Band | null {
  if (which === 'b' && !isStated(context.procedure?.thicknessB)) return null
  const asked = askedVariables(context, side).joint.weld
  if (asked === 'fillet') return filletBand(context, side, which)
  if (side.variables.joint.weld === 'fillet') return null
  const band = buttBand(context, side)
  const t = testThickness(side.variables)
  if (memberOf(context.procedure, which) !== 'thick' || t === null || t < FREE_THICKER) return band
  const sets = context.toughness !== false && !hasImpactTests(side.coupon.content)
  if (sets) return band
  return { ...band, sure: mm(null, null), maybe: mm(null, null), reason: `The test piece is ${show(t, 'mm')}, ${FREE_THICKER} mm or more: the thicker member is not limited.`, why: undefined, missing: undefined, basis: 'secondary' }
}

/** The rule for one of the two members. */
export const thicknessRule = (which: 'a' | 'b'): Rule =>
  bandRule({
    meta: meta(which === 'a' ? 'parent-thickness' : 'parent-thickness-second', {
      title: which === 'a' ? 'Parent material thickness' : 'Parent material thickness, second member',
      clause: '8.3.2',
      basis: 'memory',
      combine: 'union',
      statement: which === 'a' ? 'Butt welds by Table 7: at level 2 by rows of the test thickness for one run or several, at level 1 by wider rows; 12 mm at most where impact values are required and the coupon has none. Where the editions are recalled differently, and at the row limits of level 1, the figure must be looked up. Fillets by Table 8 at level 2, without limit at level 1.' : 'Of two unequal members the thinner is in range; the thicker too, unless the test piece was 30 mm or more. Of a fillet each member is held to its match on the coupon, thin to thin.',
    }),
    field: which === 'a' ? 'thickness' : 'thicknessB',
    at: 'weld',
    label: which === 'a' ? 'parent material thickness' : 'thickness of the second member',
    dimension: 'length',
    applies: which === 'a' ? undefined : (context) => isStated(context.procedure.thicknessB),
    asked: (context) => askedInterval(which === 'a' ? context.procedure.thickness : context.procedure.thicknessB, 'length'),
    band: (context, side) => parentBand(context, side, which),
    plan: (asked) => `A coupon of level 2 whose range holds ${show(asked.min ?? 0, 'mm')} to ${asked.max === null ? 'every thickness' : show(asked.max, 'mm')} (8.3.2).`,
  })

export const parentThickness = thicknessRule('a')
