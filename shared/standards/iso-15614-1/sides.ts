/** What a coupon says of the figures that the tables start from. */
import type { AssessedCoupon } from '../../schemas/assessment.ts'
import type { ProcessBlock, WeldingVariables } from '../../schemas/welding.ts'
import { siFigure, siFigures, siSingle } from '../common/iso-names.ts'
import { isStated } from '../common/reading.ts'
import type { CouponSide, RangeContext } from '../rule.ts'

/** Thickness that counts of a test piece: the thinner member of a butt; the prepared plate of a tee; branch wall set on, run wall set in or through. */
export function testThickness(variables: WeldingVariables): number | null {
  const first = siSingle(variables.thickness, 'length')
  if (!isStated(variables.thicknessB)) return first
  const second = siSingle(variables.thicknessB, 'length')
  if (first === null || second === null) return null
  const { joint } = variables
  if (joint.branch === 'set-in' || joint.branch === 'set-through') return second
  if (joint.branch === 'set-on' || (joint.type === 'tee' && joint.weld === 'groove')) return first
  return Math.min(first, second)
}

/** Single run (or one run from each side) or several, for one process of a weld; several processes make several runs. null = not recorded. */
export function runsOf(variables: WeldingVariables, block: ProcessBlock, coupon?: AssessedCoupon): 'single' | 'multiple' | null {
  if (variables.processes.length > 1) return 'multiple'
  if (block.technique.passesPerSide !== null) return block.technique.passesPerSide
  const rows = coupon?.content.runSheet.filter((row) => row.processId === block.id).length ?? 0
  return Math.max(rows, block.passes.length) > 2 ? 'multiple' : null
}

/** Deposit of a coupon's process: as recorded; the whole thickness where one process welded a full-penetration butt. */
export function depositOf(variables: WeldingVariables, block: ProcessBlock): number | null {
  const recorded = siSingle(block.depositThickness, 'length')
  if (recorded !== null || isStated(block.depositThickness)) return recorded
  return variables.processes.length === 1 && variables.joint.weld === 'groove' && variables.joint.penetration === 'full' ? testThickness(variables) : null
}

/** Throat of a fillet: stated, or leg ÷ √2 of an equal-leg fillet. */
export function throatOf(variables: WeldingVariables): { min: number | null; max: number | null } | null | 'fault' {
  for (const [interval, factor] of [[variables.joint.filletThroat, 1], [variables.joint.filletLeg, Math.SQRT1_2]] as const) {
    const read = siFigures(interval, 'length')
    if (read.fault) return 'fault'
    if (read.all) return { min: null, max: null }
    const low = read.min ?? read.max
    const high = read.max ?? read.min
    if (low !== null && high !== null) return { min: Math.round(low * factor * 1000) / 1000, max: Math.round(high * factor * 1000) / 1000 }
  }
  return null
}

/** Whether a pass was thicker than 13 mm; null = not recorded. A deposit no thicker than that can't hold such a pass. */
export function thickPass(side: CouponSide, t: number): boolean | null {
  const pass = siFigure(side.block?.maxPassThickness, 'length')
  if (pass !== null && pass >= 0) return pass > 13
  return (side.block ? (depositOf(side.variables, side.block) ?? t) : t) <= 13 ? false : null
}

/** The weld that is asked: the procedure's, or the coupon's own where it is judged by itself. */
export const askedVariables = (context: RangeContext, side: CouponSide): WeldingVariables => context.procedure ?? side.variables

/** Which of two unequal members of the procedure this is, by their greatest thickness. */
export function memberOf(procedure: WeldingVariables | null, which: 'a' | 'b'): 'single' | 'thin' | 'thick' {
  if (!procedure || !isStated(procedure.thicknessB)) return 'single'
  const a = siFigures(procedure.thickness, 'length')
  const b = siFigures(procedure.thicknessB, 'length')
  const top = (end: typeof a): number => (end.all ? Infinity : (end.max ?? end.min ?? Infinity))
  if (top(a) === top(b) && a.min === b.min) return 'single'
  const aIsThin = top(a) < top(b) || (top(a) === top(b) && (a.min ?? 0) <= (b.min ?? 0))
  return (which === 'a') === aIsThin ? 'thin' : 'thick'
}
