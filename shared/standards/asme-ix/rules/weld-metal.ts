/**
 * QW-409.1(b): weld metal volume in place of heat input. With one wire of one size the volume per length of weld rises just as the length of
 * wire fed per length of bead, so that is what is compared; no deposition efficiency is needed. The wording of the method is from memory.
 */
import { between, closed, numericRange, UNKNOWN, UNLIMITED, unknownNumeric } from '../../../ranges/numeric.ts'
import type { Interval } from '../../../schemas/common.ts'
import type { ProcessBlock } from '../../../schemas/welding.ts'
import type { UnitSystem } from '../../../units/types.ts'
import { figures, isStated, tidy, unitOf } from '../../common/reading.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { show } from '../../common/wording.ts'
import type { CouponSide, RangeContext, Rule } from '../../rule.ts'
import { meta } from '../meta.ts'
import { exemptByHeatTreatment } from '../ranges.ts'

const WIRE: readonly (string | null)[] = ['GMAW', 'FCAW', 'SAW']

/** The procedure is limited by weld metal volume; a coupon by itself is read by its own method. */
export const byVolume = (context: RangeContext, side?: CouponSide): boolean => (context.block ?? side?.block)?.electrical.heatInputMethod === 'volume'

const unitFor = (system: UnitSystem): string => { const unit = unitOf('length', system); return `${unit} of wire per ${unit}` }

interface Fed { sure: number; most: number }

/** Wire fed per length of bead: by the middle of the readings and at most; null when one is missing. */
function fed(wireFeed: Interval | null, travelSpeed: Interval | null): Fed | null {
  const feed = figures(wireFeed, 'wireFeed', 'SI')
  const speed = figures(travelSpeed, 'travelSpeed', 'SI')
  const [f1, f2, s1, s2] = [feed.min ?? feed.max, feed.max ?? feed.min, speed.min ?? speed.max, speed.max ?? speed.min]
  if (f1 === null || f2 === null || s1 === null || s2 === null || s1 <= 0) return null
  // Wire feed is kept in m/min, travel speed in mm/min.
  return { sure: tidy((500 * (f1 + f2)) / ((s1 + s2) / 2)), most: tidy((1000 * f2) / s1) }
}

const larger = (a: Fed | null, b: Fed): Fed => (a ? { sure: Math.max(a.sure, b.sure), most: Math.max(a.most, b.most) } : b)

/** The most that any pass of the procedure may feed; what a pass leaves open it takes from the block. */
function askedOf({ electrical, passes }: ProcessBlock): number | null {
  let top: Fed | null = fed(electrical.wireFeed, electrical.travelSpeed)
  for (const pass of passes) {
    if (!isStated(pass.wireFeed) && !isStated(pass.travelSpeed)) continue
    const own = fed(isStated(pass.wireFeed) ? pass.wireFeed : electrical.wireFeed, isStated(pass.travelSpeed) ? pass.travelSpeed : electrical.travelSpeed)
    if (!own) return null
    top = larger(top, own)
  }
  return top?.most ?? null
}

/** What the coupon fed: the largest of its run sheet, else of its summary. */
function testedOf({ coupon }: CouponSide, block: ProcessBlock): Fed | null {
  let top: Fed | null = null
  for (const row of coupon.content.runSheet) {
    const own = row.processId === block.id ? fed(row.wireFeed, row.travelSpeed) : null
    if (own) top = larger(top, own)
  }
  return top ?? fed(block.electrical.wireFeed, block.electrical.travelSpeed)
}

/** One wire of one size and form, in both records: only then a length of wire stands for a volume. */
function sameWire(a: ProcessBlock, b: ProcessBlock): boolean {
  const [one, more] = a.filler.diameters
  const [other, others] = b.filler.diameters
  return !!one && !!other && !more && !others && Math.abs(one.si - other.si) < 0.01 && a.filler.productForm !== null && a.filler.productForm === b.filler.productForm && a.filler.supplemental === false && b.filler.supplemental === false
}

export const weldMetal: Rule = figureRule({
  meta: meta('QW-409.1', 'heat-input'),
  field: 'electrical.wireFeed',
  at: 'block',
  label: 'weld metal per length (wire feed over travel speed)',
  dimension: 'wireFeed',
  asked(context) {
    const most = context.block && WIRE.includes(context.block.process) ? askedOf(context.block) : null
    return most === null ? null : { min: 0, max: most }
  },
  range(context, side) {
    const unit = unitFor(context.system)
    const { block } = side
    const unknown = (reason: string, field: string): ReturnType<Rule['range']> => ({ range: unknownNumeric('weldMetal', unit), tested: null, reason, missing: [`${side.coupon.number}: ${field}`] })
    if (exemptByHeatTreatment(side.variables) === true) return { range: between('weldMetal', unit, UNLIMITED, UNLIMITED), tested: null, reason: 'The heat treatment after welding lifts the limit of weld metal volume.' }
    if (!block || !WIRE.includes(block.process)) return unknown('Bead sizes are not recorded, so the weld metal volume of this process can\'t be compared.', 'electrical.heatInputMethod (meter readings or energy, because bead sizes are not compared)')
    if (context.block && !sameWire(block, context.block)) return unknown('Weld metal is compared by the length of wire, which takes one wire of one size and form in coupon and procedure.', 'filler.diameters (one size, the same as the procedure\'s)')
    const had = testedOf(side, block)
    if (!had) return unknown(`${side.coupon.number} does not record wire feed and travel speed.`, 'electrical.wireFeed')
    const sure = { lower: UNLIMITED, upper: closed(had.sure) }
    return had.most > had.sure
      ? { range: numericRange('weldMetal', unit, [sure, { lower: UNLIMITED, upper: UNKNOWN }]), tested: had.sure, reason: `The readings are spread: ${show(had.sure, unit)} was surely reached, ${show(had.most, unit)} is the most that they allow.`, basis: 'memory', missing: [`${side.coupon.number}: electrical.wireFeed (as one figure)`] }
      : { range: numericRange('weldMetal', unit, [sure]), tested: had.sure, reason: `${show(had.sure, unit)} is the most that was fed.`, basis: 'memory' }
  },
  // A ratio has no field of its own that could be set.
  cure: () => [],
  plan: (asked, context) => `A coupon with toughness tests welded with ${show(asked.max ?? 0, unitFor(context.system))} or more of the same wire.`,
})
