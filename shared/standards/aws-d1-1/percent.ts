/** Variables that may differ from the PQR value by a percentage. Readings that are spread are taken at their middle. */
import { between, closed, containsInterval, numericRange, open, unknownNumeric } from '../../ranges/numeric.ts'
import type { NumericRange } from '../../schemas/assessment.ts'
import type { Interval } from '../../schemas/common.ts'
import type { Process, ProcessBlock } from '../../schemas/welding.ts'
import type { Dimension, UnitSystem } from '../../units/types.ts'
import { figures, tidy, unitOf } from '../common/reading.ts'
import { figureRule } from '../common/rule-kinds.ts'
import { names, show } from '../common/wording.ts'
import type { CouponSide, Rule, RuleContext, RuleMeta } from '../rule.ts'

type Setting = 'current' | 'voltage' | 'wireFeed' | 'travelSpeed'

interface Ends { min: number; max: number }

/** Smallest and largest of several intervals; `fault` when one contradicts itself, null when none has a figure. */
function hull(intervals: readonly (Interval | null | undefined)[], dimension: Dimension, system: UnitSystem): Ends | null | 'fault' {
  let ends: Ends | null = null
  for (const interval of intervals) {
    const { min, max, fault } = figures(interval, dimension, system)
    if (fault) return 'fault'
    const low = min ?? max
    const high = max ?? min
    if (low === null || high === null) continue
    ends = ends ? { min: Math.min(ends.min, low), max: Math.max(ends.max, high) } : { min: low, max: high }
  }
  return ends
}

/** What the procedure lets happen: its range for the block and for each pass. */
export function askedSetting(block: ProcessBlock | null, setting: Setting, dimension: Dimension, system: UnitSystem): { min: number | null; max: number | null } | null | 'fault' {
  if (!block) return null
  const own = block.electrical[setting]
  if (own?.all) return { min: null, max: null }
  return hull([own, ...block.passes.map((pass) => pass[setting])], dimension, system)
}

/** What was read on the coupon: as recorded for the block, else over the rows of its run sheet. */
export function testedSetting(side: CouponSide, setting: Setting, dimension: Dimension, system: UnitSystem): Ends | null {
  const { block } = side
  if (!block) return null
  const own = hull([block.electrical[setting]], dimension, system)
  const ends = own ?? hull(side.coupon.content.runSheet.filter((row) => row.processId === block.id).map((row) => row[setting]), dimension, system)
  return ends === 'fault' ? null : ends
}

/** How far below and above the PQR value one may go, per cent; `open` where the figure itself already counts. */
export interface Band { down: number; up: number; open?: boolean }

export interface PercentSpec {
  meta: RuleMeta
  field: string
  label: string
  dimension: Dimension
  band: (process: Process, edition: string) => Band | null
  asked: (context: RuleContext) => { min: number | null; max: number | null } | null | 'fault'
  tested: (side: CouponSide, system: UnitSystem) => Ends | null
  applies?: (context: RuleContext) => boolean
}

/** The range around one PQR value; `low` and `high` differ where the most that spread readings could support is asked. */
function around(spec: PercentSpec, band: Band, low: number, high: number, system: UnitSystem): NumericRange {
  const end = band.open ? open : closed
  return between(spec.dimension, unitOf(spec.dimension, system), end(tidy(low * (1 - band.down / 100))), end(tidy(high * (1 + band.up / 100))))
}

/** The same percentage to both sides, by process; null for a process that the row does not name. */
export const byProcess = (percent: Partial<Record<Process, number>>) => (process: Process): Band | null => {
  const figure = percent[process]
  return figure === undefined ? null : { down: figure, up: figure }
}

const bandText = ({ down, up, open: isOpen }: Band): string => (down === up && !isOpen ? `within ${down} %` : `less than ${down} % below and less than ${up} % above`)

/** A figure that must stay within a percentage of the PQR value. */
export function percentRule(spec: PercentSpec): Rule {
  const bandOf = (context: { edition: string }, side: CouponSide): Band | null => (side.block?.process ? spec.band(side.block.process, context.edition) : null)
  const base = figureRule({
    meta: spec.meta,
    field: spec.field,
    at: 'block',
    label: spec.label,
    dimension: spec.dimension,
    applies: spec.applies,
    asked: spec.asked,
    range(context, side) {
      const unit = unitOf(spec.dimension, context.system)
      const band = bandOf(context, side)
      if (!band) return null
      const had = spec.tested(side, context.system)
      if (!had) return { range: unknownNumeric(spec.dimension, unit), tested: null, reason: `${side.coupon.number} does not record the ${spec.label}.`, missing: [`${side.coupon.number}: ${spec.field}`] }
      const middle = tidy((had.min + had.max) / 2)
      const spread = had.min === had.max ? '' : `The readings run from ${show(had.min, unit)} to ${show(had.max, unit)}; their middle is taken as the PQR value. `
      return { range: around(spec, band, middle, middle, context.system), tested: middle, reason: `${spread}${show(middle, unit)} may differ ${bandText(band)}.` }
    },
    plan: (asked, context) => `A coupon whose ${spec.label} stands in the middle of ${show(asked.min ?? 0, unitOf(spec.dimension, context.system))} to ${show(asked.max ?? 0, unitOf(spec.dimension, context.system))}.`,
  })
  return {
    ...base,
    check(context, sides, joined) {
      const judged = base.check(context, sides, joined)
      if (judged?.verdict !== 'outside' || judged.asked === null || Array.isArray(judged.asked)) return judged
      const possible = sides.flatMap((side) => {
        const had = spec.tested(side, context.system)
        const band = bandOf(context, side)
        return had && band && had.min !== had.max ? around(spec, band, had.min, had.max, context.system).segments : []
      })
      if (possible.length === 0 || containsInterval(numericRange(spec.dimension, unitOf(spec.dimension, context.system), possible), judged.asked) !== 'within') return judged
      return { ...judged, verdict: 'cannot-tell', sentence: `${judged.sentence} The readings of ${names(sides)} are spread; which of them is the PQR value must be settled by a person.`, missing: sides.map((side) => `${side.coupon.number}: ${spec.field}`) }
    },
  }
}

/** A setting of the arc by percentage. */
export const settingRule = (spec: Omit<PercentSpec, 'field' | 'asked' | 'tested'> & { setting: Setting }): Rule =>
  percentRule({
    ...spec,
    field: `electrical.${spec.setting}`,
    asked: (context) => askedSetting(context.block, spec.setting, spec.dimension, context.system),
    tested: (side, system) => testedSetting(side, spec.setting, spec.dimension, system),
  })

