/** Variables that may differ from the PQR value by a percentage. Readings that are spread are taken at their middle. */
import { between, closed, containsInterval, numericRange, open, UNKNOWN, unknownNumeric } from '../../ranges/numeric.ts'
import type { Fix, NumericRange } from '../../schemas/assessment.ts'
import type { Interval } from '../../schemas/common.ts'
import type { Process, ProcessBlock } from '../../schemas/welding.ts'
import type { Dimension, UnitSystem } from '../../units/types.ts'
import { figures, isStated, tidy, unitOf } from '../common/reading.ts'
import { intervalCures, valueAt } from '../common/cures.ts'
import { figureRule } from '../common/rule-kinds.ts'
import { names, show } from '../common/wording.ts'
import type { CouponSide, Rule, RuleContext, RuleMeta, RuleVerdict } from '../rule.ts'
import { clauseIn } from './editions.ts'

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

/** A stated range with its place in the procedure. */
export interface Line { interval: Interval | null | undefined; field: string }

export interface PercentSpec {
  meta: RuleMeta
  field: string
  label: string
  dimension: Dimension
  band: (process: Process, edition: string) => Band | null
  /** Another reading of the figure for the edition: what only one of them allows can't be told. */
  otherBand?: (process: Process, edition: string) => Band | null
  asked: (context: RuleContext) => { min: number | null; max: number | null } | null | 'fault'
  tested: (side: CouponSide, system: UnitSystem) => Ends | null
  /** Where the procedure states it, each place by itself, for cures; absent = the rule's own field. */
  lines?: (context: RuleContext) => readonly Line[]
  /** The row speaks of one value for each diameter of the filler. */
  perDiameter?: boolean
  applies?: (context: RuleContext) => boolean
}

/** The range around one PQR value; `low` and `high` differ where the most that spread readings could support is asked. */
function around(spec: PercentSpec, band: Band, low: number, high: number, system: UnitSystem): NumericRange {
  const end = band.open ? open : closed
  return between(spec.dimension, unitOf(spec.dimension, system), end(tidy(low * (1 - band.down / 100))), end(tidy(high * (1 + band.up / 100))))
}

/** What every reading between `had.min` and `had.max` allows as PQR value; empty where they lie too far apart. */
function sureOfAll(spec: PercentSpec, band: Band, had: Ends, system: UnitSystem): NumericRange {
  const end = band.open ? open : closed
  return between(spec.dimension, unitOf(spec.dimension, system), end(tidy(had.max * (1 - band.down / 100))), end(tidy(had.min * (1 + band.up / 100))))
}

/** Sizes of the filler that were used. */
const diametersOf = (side: CouponSide): number => new Set((side.block?.filler.diameters ?? []).map(({ si }) => si)).size

/** The same percentage to both sides, by process; null for a process that the row does not name. */
export const byProcess = (percent: Partial<Record<Process, number>>) => (process: Process): Band | null => {
  const figure = percent[process]
  return figure === undefined ? null : { down: figure, up: figure }
}

const bandText = ({ down, up, open: isOpen }: Band): string => (down === up && !isOpen ? `within ${down} %` : `less than ${down} % below and less than ${up} % above`)

/** Set fixes that bring one stated range inside. */
export function lineCures(spec: Pick<PercentSpec, 'dimension' | 'label'>, { system }: RuleContext, range: NumericRange, { interval, field }: Line): Fix[] {
  const { min, max, all, fault } = figures(interval, spec.dimension, system)
  if (fault || !isStated(interval)) return []
  const asked = all ? { min: null, max: null } : { min: min ?? max, max: max ?? min }
  if (containsInterval(range, asked) !== 'outside') return []
  const wrong = (['min', 'max'] as const).filter((end) => asked[end] === null || containsInterval(range, { min: asked[end], max: asked[end] }) !== 'within')
  return intervalCures({ label: spec.label, dimension: spec.dimension, field, current: interval, range, asked, wrong })
}

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
      if (spec.perDiameter && diametersOf(side) > 1 && had.min !== had.max) {
        const sure = sureOfAll(spec, band, had, context.system)
        const most = around(spec, band, had.min, had.max, context.system)
        return { range: numericRange(spec.dimension, unit, [...sure.segments, ...most.segments.flatMap(({ lower, upper }) => [{ lower, upper: UNKNOWN }, { lower: UNKNOWN, upper }])]), tested: null, reason: `Several diameters were used, with readings from ${show(had.min, unit)} to ${show(had.max, unit)}; the value of each diameter isn't told apart, so only what every reading allows is sure.`, missing: [`${side.coupon.number}: ${spec.field}`] }
      }
      const middle = tidy((had.min + had.max) / 2)
      const spread = had.min === had.max ? '' : `The readings run from ${show(had.min, unit)} to ${show(had.max, unit)}; their middle is taken as the PQR value. `
      return { range: around(spec, band, middle, middle, context.system), tested: middle, reason: `${spread}${show(middle, unit)} may differ ${bandText(band)}.` }
    },
    cure: (context, joined, field) => (spec.lines?.(context) ?? [{ interval: valueAt(context.procedure, field) as Interval | null, field }]).flatMap((line) => lineCures(spec, context, joined, line)),
    plan: (asked, context) => `A coupon whose ${spec.label} stands in the middle of ${show(asked.min ?? 0, unitOf(spec.dimension, context.system))} to ${show(asked.max ?? 0, unitOf(spec.dimension, context.system))}.`,
  })
  return {
    ...base,
    check(context, sides, joined) {
      const judged = base.check(context, sides, joined)
      const doubted = judged && inDoubt(spec, context, sides, judged)
      if (doubted) return doubted
      if (judged?.verdict === 'cannot-tell' && spec.perDiameter && judged.asked !== null && !Array.isArray(judged.asked) && sides.every((side) => diametersOf(side) > 1)) {
        // What no reading of any diameter would allow is outside whichever it is.
        const most = numericRange(spec.dimension, unitOf(spec.dimension, context.system), sides.flatMap((side) => { const had = spec.tested(side, context.system); const band = bandOf(context, side); return had && band ? around(spec, band, had.min, had.max, context.system).segments : [{ lower: UNKNOWN, upper: UNKNOWN }] }))
        return containsInterval(most, judged.asked) === 'outside' ? base.check(context, sides, most) : judged
      }
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

/** Where two readings of the figure are known, what only one of them allows can't be told; null where both agree. */
function inDoubt(spec: PercentSpec, context: RuleContext, sides: readonly CouponSide[], judged: RuleVerdict): RuleVerdict | null {
  const process = context.block?.process
  const other = process ? spec.otherBand?.(process, context.edition) : null
  if (!other || judged.verdict === 'cannot-tell' || judged.asked === null || Array.isArray(judged.asked)) return null
  const ranges = sides.flatMap((side) => { const had = spec.tested(side, context.system); const middle = had && tidy((had.min + had.max) / 2); return middle === null ? [] : around(spec, other, middle, middle, context.system).segments })
  if (containsInterval(numericRange(spec.dimension, unitOf(spec.dimension, context.system), ranges), judged.asked) === judged.verdict) return null
  return { ...judged, verdict: 'cannot-tell', sentence: `Of the ${spec.label} two readings of the figure are known for this edition, ${bandText(other)} and another, and they do not agree here; look it up.`, missing: [`the figure of ${clauseIn(context.edition, spec.meta.clause)} for ${spec.label}`], fixes: [] }
}

/** A setting of the block and of every pass, each with its place. */
export const settingLines = ({ block, path }: Pick<RuleContext, 'block' | 'path'>, setting: Setting): Line[] => (block ? [{ interval: block.electrical[setting], field: `${path}.electrical.${setting}` }, ...block.passes.map((pass, i) => ({ interval: pass[setting], field: `${path}.passes.${i}.${setting}` }))] : [])

/** A setting of the arc by percentage. */
export const settingRule = (spec: Omit<PercentSpec, 'field' | 'asked' | 'tested' | 'lines'> & { setting: Setting }): Rule =>
  percentRule({
    ...spec,
    field: `electrical.${spec.setting}`,
    asked: (context) => askedSetting(context.block, spec.setting, spec.dimension, context.system),
    tested: (side, system) => testedSetting(side, spec.setting, spec.dimension, system),
    lines: (context) => settingLines(context, spec.setting),
  })

