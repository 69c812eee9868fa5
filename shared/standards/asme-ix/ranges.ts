/**
 * Range of qualification from a coupon's thickness: tables QW-451.1 to QW-451.4 and the clauses that narrow or lift them.
 * Each system has its own printed figures; they are never converted into each other.
 */
import { between, closed, intersectNumeric, UNLIMITED, unknownNumeric } from '../../ranges/numeric.ts'
import type { Basis, NumericRange } from '../../schemas/assessment.ts'
import type { Process, ProcessBlock, WeldingVariables } from '../../schemas/welding.ts'
import type { UnitSystem } from '../../units/types.ts'
import { figureOrNull, figures, isStated, single, tidy, unitOf } from '../common/reading.ts'
import { lackWords, lacksFigure } from '../common/lacking.ts'
import { show } from '../common/wording.ts'
import type { CouponSide, RangeContext } from '../rule.ts'
import { pNumber, secondMetal } from './members.ts'

/** The printed pairs (basis of the pairing: memory; figures of QW-451.1 read in 2017). */
export const FIGURES = {
  SI: { thin: 1.5, low: 10, lowMin: 1.5, highMin: 5, sideBends: 19, thick: 38, heavy: 150, thickMax: 200, pass: 13, toughness: 16, toughnessHalf: 6, similar: 6, root: 13, electrode: 6, discontinuity: 3, tensionSets: 25 },
  US: { thin: 1 / 16, low: 3 / 8, lowMin: 1 / 16, highMin: 3 / 16, sideBends: 3 / 4, thick: 1.5, heavy: 6, thickMax: 8, pass: 1 / 2, toughness: 5 / 8, toughnessHalf: 1 / 4, similar: 1 / 4, root: 1 / 2, electrode: 1 / 4, discontinuity: 1 / 8, tensionSets: 1 },
} as const

/** QW-451.1 note 3: 8 in. (200 mm) for these only; FCAW stands under GMAW (secondary). */
const NOTE_3: ReadonlySet<Process> = new Set<Process>(['SMAW', 'SAW', 'GMAW', 'FCAW', 'PAW', 'GTAW'])

/** P-Numbers whose thicker member is released from 6 mm up (QW-202.4(b)(1); secondary). */
const RELEASED: ReadonlySet<string> = new Set(['8', '41', '42', '43', '44', '45', '46', '49', '51', '52', '53', '61', '62'])

export interface Limit {
  lower: number | null
  /** null = no upper limit */
  upper: number | null
  how: { lower: string | null; upper: string | null }
  clause: string
  basis: Basis
}

/** Coupon was bent along the weld: QW-451.2 instead of QW-451.1. */
export const isLongitudinal = (side: Pick<CouponSide, 'coupon'>): boolean => {
  const { bends } = side.coupon.content
  return bends.length > 0 && bends.every((bend) => bend.kind === 'longitudinal-face' || bend.kind === 'longitudinal-root')
}

/**
 * Base metal limits of QW-451.1 (or QW-451.2 with longitudinal bends).
 * @param T coupon thickness in the system's unit, above zero
 */
export function baseMetalLimit(T: number, process: Process, system: UnitSystem, longitudinal = false): Limit {
  const f = FIGURES[system]
  const twice = 2 * T
  if (T < f.thin) return limit(T, twice, 'T', '2T', longitudinal)
  const lower = T <= f.low ? f.lowMin : f.highMin
  const band = T <= f.low ? BANDS[system].low : BANDS[system].high
  if (longitudinal || T < f.thick) return limit(lower, twice, band, '2T', longitudinal)
  if (T <= f.heavy) return NOTE_3.has(process) ? limit(lower, f.thickMax, band, BANDS[system].thick, longitudinal) : limit(lower, twice, band, '2T', longitudinal)
  return limit(lower, tidy(1.33 * T), band, '1.33T', longitudinal)
}

const limit = (lower: number | null, upper: number | null, howLower: string | null, howUpper: string | null, longitudinal: boolean): Limit => ({
  lower,
  upper,
  how: { lower: howLower, upper: howUpper },
  clause: longitudinal ? 'QW-451.2' : 'QW-451.1',
  basis: longitudinal ? 'memory' : 'read',
})

/** Rows of the table in words. */
const bandsOf = (system: UnitSystem): { low: string; high: string; thick: string } => {
  const unit = unitOf('length', system)
  const f = FIGURES[system]
  return { low: `for T up to ${show(f.low, unit)}`, high: `for T above ${show(f.low, unit)}`, thick: `for T from ${show(f.thick, unit)}` }
}
const BANDS = { SI: bandsOf('SI'), US: bandsOf('US') } as const

/** Deposit limit of one process in the same tables. @param t deposit of the process in the coupon */
export function depositLimit(T: number, t: number, process: Process, system: UnitSystem, longitudinal = false): Limit {
  const f = FIGURES[system]
  if (longitudinal || T < f.sideBends || t < f.sideBends) return limit(null, 2 * t, null, '2t', longitudinal)
  const base = baseMetalLimit(T, process, system)
  return limit(null, base.upper, null, base.how.upper, longitudinal)
}

/** Any pass of this block over 13 mm (1/2 in.): null = not known. A deposit that is no thicker can't hold such a pass. */
export function hasThickPass(block: ProcessBlock, system: UnitSystem, deposit: number | null): boolean | null {
  const limit = FIGURES[system].pass
  const pass = figureOrNull(block.maxPassThickness, 'length', system)
  if (pass !== null && pass >= 0) return pass > limit
  return deposit !== null && deposit <= limit ? false : null
}

/**
 * Coupon T for a member of P-Number `p`. A coupon of two unequal plates qualifies each plate's P-Number by its own T (secondary);
 * where both plates have one P-Number the thinner stands.
 */
export function couponThickness(side: Pick<CouponSide, 'variables'>, system: UnitSystem, p: string | null = null): number | null {
  const { thickness, thicknessB } = side.variables
  const first = single(thickness, 'length', system)
  if (!isStated(thicknessB)) return first
  const second = single(thicknessB, 'length', system)
  if (first === null || second === null) return null
  const matchesA = p !== null && p === pNumber(side.variables.baseMetals.a)
  const matchesB = p !== null && p === pNumber(secondMetal(side.variables))
  return matchesA === matchesB ? Math.min(first, second) : matchesA ? first : second
}

/** Which of the coupon's thicknesses is missing, or is a spread where T must be one figure. */
export function lacksThickness({ coupon, variables }: Pick<CouponSide, 'coupon' | 'variables'>): string[] {
  const { thickness, thicknessB } = variables
  const lacking = single(thickness, 'length', 'SI') === null ? ['thickness'] : []
  if (isStated(thicknessB) && single(thicknessB, 'length', 'SI') === null) lacking.push('thicknessB')
  return lacking.map((path) => `${coupon.number}: ${lacksFigure(path === 'thickness' ? thickness : thicknessB, path)}`)
}

/** Post-weld heat treatment above the upper transformation temperature, or a solution anneal of austenitic or P-No. 10H metal. */
export function exemptByHeatTreatment(variables: WeldingVariables): boolean | null {
  const { condition } = variables.pwht
  if (condition === null) return null
  if (condition === 'above-upper-transformation' || condition === 'above-upper-then-below-lower') return true
  if (condition !== 'solution-anneal') return false
  return [pNumber(variables.baseMetals.a), pNumber(secondMetal(variables))].every((p) => p === '8' || p === '10H')
}

/** Floor of QW-403.6 for a toughness coupon of thickness T. */
export function toughnessFloor(T: number, system: UnitSystem): number {
  const f = FIGURES[system]
  return T < f.toughnessHalf ? T / 2 : Math.min(T, f.toughness)
}

const length = (system: UnitSystem, lower: number | null, upper: number | null): NumericRange =>
  between('length', unitOf('length', system), lower === null ? UNLIMITED : closed(lower), upper === null ? UNLIMITED : closed(upper))

export const lengthRange = length
export const unknownLength = (system: UnitSystem): NumericRange => unknownNumeric('length', unitOf('length', system))

export interface BaseMetalSpan {
  range: NumericRange
  tested: number | null
  lower: number | null
  upper: number | null
  how: { lower: string | null; upper: string | null }
  reason: string
  clause: string
  basis: Basis
  missing: string[]
}

/** Which member of the joint is judged: `single` = both alike, `thin` or `thick` of two that differ (QW-202.4). */
export type Member = 'single' | 'thin' | 'thick'

/** Short-circuiting coupon under 13 mm in editions to 2019: 1.1 times (QW-403.10, QW-404.32; secondary). */
export const shortCircuitBinds = (edition: string, block: ProcessBlock): boolean => edition <= '2019' && block.process === 'GMAW' && block.electrical.transferMode === 'short-circuiting'

/**
 * What a groove coupon qualifies of the base metal thickness for one process, all essential limits taken together:
 * the table, a pass over 13 mm on either side, short-circuiting to 2019, and the lifts of QW-202.2, QW-202.3, QW-202.4 and QW-200.4(b).
 */
export function baseMetalSpan(context: RangeContext, side: CouponSide, member: Member = 'single', p: string | null = null): BaseMetalSpan {
  const { system, procedure } = context
  const block = side.block
  const T = couponThickness(side, system, p)
  const unit = unitOf('length', system)
  const number = side.coupon.number
  if ((procedure ?? side.variables).joint.weld === 'fillet') return filletSpan(context, side, T)
  if (!block?.process || T === null) {
    return { range: unknownLength(system), tested: null, lower: null, upper: null, how: { lower: null, upper: null }, reason: `${number} has no single thickness recorded.`, clause: 'QW-451', basis: 'read', missing: lacksThickness(side) }
  }
  const { lower, upper, how, clause, basis } = baseMetalLimit(T, block.process, system, isLongitudinal(side))
  const reason = `T = ${show(T, unit)} gives ${show(lower ?? 0, unit)} to ${show(upper ?? 0, unit)} (${how.upper ?? ''}) by ${clause}.`
  const span: BaseMetalSpan = { range: unknownLength(system), tested: T, lower, upper, how, reason, clause, basis, missing: [] }
  const upperUnknown = narrow(context, side, block, T, span)
  const own = upperUnknown ? tidy(1.1 * T) : span.upper
  const root = lift(context, side, T, member, span)
  const sure = upperUnknown ? own : root && own !== null ? Math.max(own, root.certain) : span.upper
  span.range = sure === null || sure === span.upper ? length(system, span.lower, span.upper) : uncertainAbove(system, span.lower ?? 0, sure, span.upper)
  return span
}

/** A pass thickness that isn't recorded leaves 1.1 T certain and the rest open: two segments say exactly that. */
function uncertainAbove(system: UnitSystem, lower: number, certain: number, possible: number | null): NumericRange {
  const sure = length(system, lower, certain)
  if (possible !== null && possible <= certain) return length(system, lower, possible)
  return { ...sure, segments: [...sure.segments, { lower: closed(lower), upper: { kind: 'unknown' } }] }
}

/** The procedure's entry whose absence leaves QW-403.9 open. */
export const lacksPassThickness = ({ procedure, block }: RangeContext): string => `procedure: processes.${Math.max(0, procedure?.processes.findIndex(({ id }) => id === block?.id) ?? 0)}.maxPassThickness`

/** Holds the upper end to 1.1 T, unless it is lower already. */
function cut(span: BaseMetalSpan, T: number, unit: string, clause: string, why: string): void {
  const upper = tidy(1.1 * T)
  if (span.upper !== null && span.upper <= upper) return
  span.upper = upper
  span.how.upper = '1.1T'
  span.clause = clause
  span.basis = 'secondary'
  span.reason += ` ${why}: ${clause} holds it to ${show(upper, unit)} (1.1T).`
}

/** QW-403.9 and QW-403.10. @returns true when the upper end can't be told because a pass thickness isn't recorded */
function narrow(context: RangeContext, side: CouponSide, block: ProcessBlock, T: number, span: BaseMetalSpan): boolean {
  const { system } = context
  const unit = unitOf('length', system)
  const { pass } = FIGURES[system]
  if (T < pass && shortCircuitBinds(context.edition, block)) cut(span, T, unit, 'QW-403.10', `Short-circuiting transfer on a coupon under ${show(pass, unit)}`)
  if (block.process === 'GTAW' || block.process === 'PAW') return false
  const own = hasThickPass(block, system, single(block.depositThickness, 'length', system) ?? T)
  const asked = context.block ? hasThickPass(context.block, system, figures(context.block.depositThickness, 'length', system).max) : false
  if (own === true) cut(span, T, unit, 'QW-403.9', `A pass of the coupon was thicker than ${show(pass, unit)}`)
  else if (asked === true) cut(span, T, unit, 'QW-403.9', `The procedure allows a pass thicker than ${show(pass, unit)}`)
  else if (own === null || asked === null) {
    if (own === null) span.missing.push(`${side.coupon.number}: maxPassThickness`)
    if (asked === null) span.missing.push(lacksPassThickness(context))
    span.reason += ` Whether a pass is thicker than ${show(pass, unit)} isn't recorded, so above ${show(tidy(1.1 * T), unit)} (1.1T) it can't be told (QW-403.9).`
    return true
  }
  return false
}

/** Takes the upper limit away. */
function free(span: BaseMetalSpan, clause: string, basis: Basis, why: string): null {
  span.upper = null
  span.how.upper = null
  span.clause = clause
  span.basis = basis
  span.reason += ` ${why}: ${clause} sets no upper limit.`
  return null
}

/** The clauses that lift the upper limit, where the procedure's weld falls under them. @returns the root exception where it is the one that lifts */
function lift(context: RangeContext, side: CouponSide, T: number, member: Member, span: BaseMetalSpan): RootException | null {
  const { system, procedure } = context
  if (!procedure) return null
  const f = FIGURES[system]
  const unit = unitOf('length', system)
  // A pass over 13 mm and short-circuiting are limits of their own, which these clauses do not lift.
  if (span.how.upper === '1.1T') return null
  if (procedure.joint.penetration === 'partial' && T >= f.thick) return free(span, 'QW-202.2(b)', 'memory', `Partial-penetration groove, coupon T at least ${show(f.thick, unit)}`)
  if (procedure.joint.work != null && T >= f.thick) return free(span, 'QW-202.3', 'memory', `Repair or build-up, coupon T at least ${show(f.thick, unit)}`)
  if (member === 'thick') {
    const first = pNumber(procedure.baseMetals.a)
    const second = pNumber(secondMetal(procedure))
    if (first !== null && second === first && RELEASED.has(first) && T >= f.similar) return free(span, 'QW-202.4(b)(1)', 'secondary', `Thicker member of P-No. ${first}, coupon T at least ${show(f.similar, unit)}`)
    if (T >= f.thick) return free(span, 'QW-202.4(b)(2)', 'secondary', `Thicker member, coupon T at least ${show(f.thick, unit)}`)
  }
  const root = rootException(context, side, T)
  if (!root || span.upper === null || root.upper <= span.upper) return null
  span.upper = root.upper
  span.how.upper = `root layers with ${root.number}`
  span.clause = 'QW-200.4(b)'
  span.basis = 'secondary'
  span.reason += ` Root layers from a coupon of at least ${show(f.root, unit)}: QW-200.4(b) lets the base metal go to the ${show(root.upper, unit)} of ${root.number}.`
  if (root.missing.length === 0) return root
  span.missing.push(...root.missing)
  span.reason += ` Above ${show(root.certain, unit)} that can't be told, because ${lackWords(root.missing)}.`
  return root
}

const ROOT_PROCESSES: ReadonlySet<Process> = new Set<Process>(['GTAW', 'SMAW', 'GMAW', 'PAW', 'SAW'])

/** What QW-200.4(b) allows: base metal surely up to `certain`, and up to `upper` where a record that lacks something proves to allow it. */
export interface RootException { upper: number; number: string; certain: number; missing: string[] }

/** QW-200.4(b): the block lays root layers only, its coupon is at least 13 mm, and a thicker coupon of another process stands in the joint. */
export function rootException(context: RangeContext, side: CouponSide, T: number): RootException | null {
  const { system, procedure, block } = context
  if (!procedure || !block?.process || !ROOT_PROCESSES.has(block.process) || T < FIGURES[system].root) return null
  if (block.passes.length === 0 || !block.passes.every((pass) => pass.layer === 'root')) return null
  const found: RootException[] = []
  for (const other of context.coupons) {
    if (other.id === side.coupon.id) continue
    const otherT = couponThickness({ variables: other.content.variables }, system)
    if (otherT === null || otherT <= T) continue
    for (const otherBlock of other.content.variables.processes) {
      const { process } = otherBlock
      if (!process || !ROOT_PROCESSES.has(process) || process === block.process || !procedure.processes.some((asked) => asked.process === process)) continue
      const { upper, missing } = baseMetalSpan({ ...context, procedure: null, block: null }, { coupon: other, variables: other.content.variables, block: otherBlock, role: 'full' })
      if (upper !== null) found.push({ upper, number: other.number, certain: missing.length === 0 ? upper : Math.min(upper, tidy(1.1 * otherT)), missing })
    }
  }
  const best = found.sort((a, b) => b.upper - a.upper || b.certain - a.certain)[0]
  return best ? { ...best, certain: Math.max(...found.map(({ certain }) => certain)) } : null
}

/** Fillets: a groove coupon covers every thickness, size and diameter (QW-451.4); so does a fillet coupon (QW-451.3). */
function filletSpan(context: RangeContext, side: CouponSide, T: number | null): BaseMetalSpan {
  const groove = side.variables.joint.weld === 'groove'
  const { system } = context
  const base = { tested: T, lower: null, upper: null, how: { lower: null, upper: null }, missing: [] }
  return groove
    ? { ...base, range: length(system, null, null), reason: 'A groove coupon of any thickness covers fillets of every size, thickness and diameter.', clause: 'QW-451.4', basis: 'read' }
    : { ...base, range: length(system, null, null), reason: 'A fillet coupon covers fillets of every size, thickness and diameter.', clause: 'QW-451.3', basis: 'secondary' }
}

/** The span with the toughness floor of QW-403.6 as its own lower limit. */
export function withFloor(system: UnitSystem, range: NumericRange, floor: number | null): NumericRange {
  return floor === null ? range : intersectNumeric(range, length(system, floor, null))
}
