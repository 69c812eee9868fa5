/** Bands of Table 7 for one coupon. */
import { intersectNumeric, outerEnds, unionNumeric, unknownNumeric } from '../../ranges/numeric.ts'
import { hasImpactTests } from '../common/iso-names.ts'
import { type Band } from '../common/review-band.ts'
import { show } from '../common/wording.ts'
import type { CouponSide, RangeContext } from '../rule.ts'
import { couponLevel, levelOf } from './levels.ts'
import { runsOf, testThickness, thickPass } from './sides.ts'
import { buttLevelOne, buttLevelTwo, mm, nothing, type Reading } from './tables.ts'

export const unknown = unknownNumeric('length', 'mm')

const IMPACT_CAP = 12

export const noThickness = ({ coupon }: CouponSide): Band => ({ sure: nothing, maybe: unknown, tested: null, reason: `${coupon.number} has no thickness recorded.`, missing: [`${coupon.number}: thickness`] })

/** A level 2 coupon keeps its level 2 range at level 1 too, and gains what the level 1 table allows. */
function levelOne(context: RangeContext, side: CouponSide, t: number, two: Reading): Reading {
  const one = buttLevelOne(t, thickPass(side, t))
  if ((couponLevel(side) ?? levelOf(context)) === '1') return one
  return { ...one, how: `${one.how} at level 1, ${two.how} at level 2`, sure: unionNumeric(one.sure, two.sure), maybe: unionNumeric(one.maybe, two.maybe), why: one.why ?? two.why }
}

function levelTwo(side: CouponSide, t: number, missing: string[]): Reading {
  const runs = side.block && runsOf(side.variables, side.block, side.coupon)
  if (runs) return buttLevelTwo(t, runs)
  missing.push(`${side.coupon.number}: technique.passesPerSide`)
  const single = buttLevelTwo(t, 'single')
  const multiple = buttLevelTwo(t, 'multiple')
  return { ...multiple, sure: intersectNumeric(single.sure, multiple.sure), maybe: unionNumeric(single.maybe, multiple.maybe), how: `${single.how} for one run, ${multiple.how} for several`, why: 'Whether the coupon was welded in one run or several isn\'t recorded.' }
}

/** Table 7 for one coupon, with the 12 mm cap where impact values are asked and none were tested. */
export function buttBand(context: RangeContext, side: CouponSide): Band {
  const t = testThickness(side.variables)
  if (t === null) return noThickness(side)
  const missing: string[] = []
  const two = levelTwo(side, t, missing)
  const first = levelOf(context) === '1' ? levelOne(context, side, t, two) : two
  const tested = hasImpactTests(side.coupon.content)
  const band: Band = { sure: first.sure, maybe: first.maybe, tested: t, reason: `t = ${show(t, 'mm')}: ${first.how} by Table 7, level ${levelOf(context)}.`, why: first.why, missing, clause: '8.3.2 Table 7', basis: first.basis }
  if (tested || context.toughness === false) return band
  const cap = mm(null, IMPACT_CAP)
  const top = outerEnds(first.maybe).upper
  if ('value' in top && top.value <= IMPACT_CAP) return band
  band.sure = intersectNumeric(first.sure, cap)
  if (context.toughness === null) return { ...band, why: `Without impact tests the coupon stops at ${IMPACT_CAP} mm where impact values are required, and whether they are isn't stated.`, missing: [...missing, 'procedure: toughnessRequired'] }
  const reason = `${band.reason} Impact values are required and the coupon has none: ${IMPACT_CAP} mm is the most.`
  if (levelOf(context) === '1') return { ...band, reason, why: `Impact values are required and the coupon has none; level 2 then stops at ${IMPACT_CAP} mm, and whether level 1 does is not known here.` }
  return { ...band, maybe: intersectNumeric(first.maybe, cap), reason }
}
