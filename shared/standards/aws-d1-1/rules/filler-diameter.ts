/** Row 10: nominal diameter of electrode or wire, with a figure of its own for each process. */
import { closed, containsValue, nearest, numericRange, UNKNOWN, UNLIMITED, unknownNumeric } from '../../../ranges/numeric.ts'
import type { Segment } from '../../../schemas/assessment.ts'
import { quantity } from '../../../units/convert.ts'
import type { UnitSystem } from '../../../units/types.ts'
import { tidy, unitOf } from '../../common/reading.ts'
import { pathOf } from '../../common/rule-kinds.ts'
import { cannotTell, capital, couponLacks, list, names, notStated, show, showRange, verb } from '../../common/wording.ts'
import type { CouponSide, Rule } from '../../rule.ts'
import { nominalDiameters } from '../fillers.ts'
import { meta } from '../meta.ts'

/** Printed steps: larger SMAW electrode; other GTAW rod. */
const STEP = { SI: { SMAW: 0.8, GTAW: 1.6 }, US: { SMAW: 1 / 32, GTAW: 1 / 16 } } as const
const LABEL = 'electrode diameter'

/** Sizes that one tested size covers, and the figure in words. */
function covered(side: CouponSide, d: number, system: UnitSystem): { segments: Segment[]; words: string } {
  const unit = unitOf('length', system)
  const { SMAW, GTAW } = STEP[system]
  switch (side.block?.process) {
    case 'SMAW': return { segments: [{ lower: UNLIMITED, upper: closed(tidy(d + SMAW)) }], words: `up to ${show(SMAW, unit)} larger` }
    case 'GTAW': return { segments: [{ lower: closed(tidy(Math.max(0, d - GTAW))), upper: closed(tidy(d + GTAW)) }], words: `up to ${show(GTAW, unit)} larger or smaller` }
    case 'GMAW': return { segments: [{ lower: closed(d), upper: closed(d) }], words: 'no other size' }
    case 'SAW': {
      const { fluxType } = side.block.filler
      if (fluxType === 'alloy') return { segments: [{ lower: closed(d), upper: closed(d) }], words: 'no other size, because the flux is an alloy flux' }
      return fluxType === null
        ? { segments: [{ lower: closed(d), upper: closed(d) }, { lower: UNKNOWN, upper: closed(d) }], words: 'no larger size, and a smaller one only if the flux is no alloy flux' }
        : { segments: [{ lower: UNLIMITED, upper: closed(d) }], words: 'no larger size' }
    }
    default: return { segments: [{ lower: UNLIMITED, upper: closed(d) }], words: 'no larger size' }
  }
}

/** With an alloy flux a smaller size counts as well; which flux it was isn't recorded. */
const fluxOpen = (side: CouponSide): boolean => side.block?.process === 'SAW' && side.block.filler.fluxType === null

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
    return { range: numericRange('length', unit, parts.flatMap(({ segments }) => segments)), tested: Math.max(...had), reason: `${list(had.map((d) => show(d, unit)))} ${had.length > 1 ? 'were' : 'was'} used: ${parts[0]?.words ?? ''}.`, ...(fluxOpen(side) ? { missing: [`${side.coupon.number}: filler.fluxType`] } : {}) }
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
    // GTAW: that a smaller rod is limited as a larger one is, is recalled.
    const smaller = context.block?.process === 'GTAW' && sides.some((side) => nominalDiameters(side.block, system).every((d) => d > interval.min))
    const recalled = smaller ? { basis: 'memory' as const } : {}
    if (verdicts.every((verdict) => verdict === 'within')) return { verdict: 'within', sentence: `${capital(LABEL)} ${shown} is covered by ${names(sides)}.`, asked: interval, range: joined, ...recalled }
    const wrong = asked.flatMap((d, i) => (verdicts[i] === 'outside' ? [{ d, i }] : []))
    const open = sides.filter(fluxOpen)
    if (wrong.length === 0 && open.length > 0) return cannotTell(`${capital(LABEL)} ${shown} is smaller than that of ${names(sides)}, which counts with an alloy flux; the kind of flux isn't recorded.`, open.map((side) => `${side.coupon.number}: filler.fluxType`), { asked: interval, range: joined })
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
      ...recalled,
    }
  },
}
