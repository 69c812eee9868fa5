/** Row 10: nominal diameter of electrode or wire, with a figure of its own for each process. */
import { closed, containsValue, nearest, numericRange, UNLIMITED, unknownNumeric } from '../../../ranges/numeric.ts'
import type { Segment } from '../../../schemas/assessment.ts'
import { quantity } from '../../../units/convert.ts'
import type { UnitSystem } from '../../../units/types.ts'
import { tidy, unitOf } from '../../common/reading.ts'
import { pathOf } from '../../common/rule-kinds.ts'
import { capital, couponLacks, list, names, notStated, show, showRange, verb } from '../../common/wording.ts'
import type { CouponSide, Rule } from '../../rule.ts'
import { nominalDiameters } from '../fillers.ts'
import { meta } from '../meta.ts'

/** Printed steps: larger SMAW electrode; other GTAW rod. */
const STEP = { SI: { SMAW: 0.8, GTAW: 1.6 }, US: { SMAW: 1 / 32, GTAW: 1 / 16 } } as const
const LABEL = 'electrode diameter'

/** Sizes that one tested size covers, and the figure in words. */
function covered(side: CouponSide, d: number, system: UnitSystem): { segment: Segment; words: string } {
  const unit = unitOf('length', system)
  const { SMAW, GTAW } = STEP[system]
  switch (side.block?.process) {
    case 'SMAW': return { segment: { lower: UNLIMITED, upper: closed(tidy(d + SMAW)) }, words: `up to ${show(SMAW, unit)} larger` }
    case 'GTAW': return { segment: { lower: closed(tidy(Math.max(0, d - GTAW))), upper: closed(tidy(d + GTAW)) }, words: `up to ${show(GTAW, unit)} larger or smaller` }
    case 'GMAW': return { segment: { lower: closed(d), upper: closed(d) }, words: 'no other size' }
    default: return side.block?.process === 'SAW' && side.block.filler.fluxType === 'alloy'
      ? { segment: { lower: closed(d), upper: closed(d) }, words: 'no other size, because the flux is an alloy flux' }
      : { segment: { lower: UNLIMITED, upper: closed(d) }, words: 'no larger size' }
  }
}

export const fillerDiameter: Rule = {
  meta: meta('filler_diameter'),
  field: 'filler.diameters',
  at: 'block',
  label: capital(LABEL),
  applies: (context) => context.block?.filler.added !== false,
  range(context, side) {
    const { system } = context
    const unit = unitOf('length', system)
    const had = nominalDiameters(side.block, system)
    if (side.block?.filler.added === false) return null
    if (had.length === 0) return { range: unknownNumeric('length', unit), tested: null, reason: `${side.coupon.number} records no diameter.`, missing: [`${side.coupon.number}: filler.diameters`] }
    const parts = had.map((d) => covered(side, d, system))
    return { range: numericRange('length', unit, parts.map(({ segment }) => segment)), tested: Math.max(...had), reason: `${list(had.map((d) => show(d, unit)))} ${had.length > 1 ? 'were' : 'was'} used: ${parts[0]?.words ?? ''}.` }
  },
  check(context, sides, joined) {
    if (context.block?.filler.added === false) return null
    const { system } = context
    const unit = unitOf('length', system)
    const field = pathOf(context, { at: 'block', field: 'filler.diameters' })
    const asked = nominalDiameters(context.block, system)
    if (asked.length === 0) return notStated(LABEL, field, { range: joined })
    if (joined?.type !== 'numeric') return null
    const interval = { min: Math.min(...asked), max: Math.max(...asked) }
    const verdicts = asked.map((d) => containsValue(joined, d))
    const shown = list(asked.map((d) => show(d, unit)))
    if (verdicts.every((verdict) => verdict === 'within')) return { verdict: 'within', sentence: `${capital(LABEL)} ${shown} is covered by ${names(sides)}.`, asked: interval, range: joined }
    const wrong = asked.flatMap((d, i) => (verdicts[i] === 'outside' ? [{ d, i }] : []))
    if (wrong.length === 0) return couponLacks(LABEL, 'filler.diameters', sides, interval, joined)
    const fixes = wrong.flatMap(({ d, i }) => {
      const better = nearest(joined, d)
      return better === null ? [] : [{ kind: 'set' as const, label: `Set the electrode diameter to ${show(better, unit)}`, field: `${field}.${i}`, value: quantity(better, 'length', unit) }]
    })
    return {
      verdict: 'outside',
      sentence: `${capital(LABEL)} ${list(wrong.map(({ d }) => show(d, unit)))} is not covered: ${names(sides)} ${verb(sides, 'qualifies', 'qualify')} ${showRange(joined)}.`,
      asked: interval,
      range: joined,
      fixes: [...fixes, { kind: 'plan-coupon', label: 'Weld a coupon with that size', requirement: `A coupon welded with ${list(wrong.map(({ d }) => show(d, unit)))}.` }],
      reasoning: [`Covered: ${showRange(joined)}. Asked: ${shown}.`],
    }
  },
}
