/**
 * What a test weld qualifies of thickness and diameter: Table 6.2 (plate), 10.9 (pipe and tube), 6.3 (partial penetration), 6.4 (fillets).
 * Each system has its own printed figures; they are never converted into each other.
 */
import { between, closed, UNKNOWN, UNLIMITED, unknownNumeric } from '../../ranges/numeric.ts'
import type { Basis, NumericRange } from '../../schemas/assessment.ts'
import type { WeldingVariables } from '../../schemas/welding.ts'
import type { UnitSystem } from '../../units/types.ts'
import { figures, isStated, single, tidy, unitOf } from '../common/reading.ts'
import { show } from '../common/wording.ts'
import type { CouponSide, RangeContext } from '../rule.ts'

/** The printed pairs. */
export const FIGURES = {
  SI: { least: 3, low: 10, plateHigh: 25, pipeHigh: 20, pipeHighMin: 10, bigPipe: 600, retest: 38, undercut: 1, opening: 3, openingSum: 10, corner: 6, reinforcement: 3, concavity: 2, meltThrough: 3 },
  US: { least: 1 / 8, low: 3 / 8, plateHigh: 1, pipeHigh: 3 / 4, pipeHighMin: 3 / 8, bigPipe: 24, retest: 1.5, undercut: 1 / 32, opening: 1 / 8, openingSum: 3 / 8, corner: 1 / 4, reinforcement: 1 / 8, concavity: 1 / 16, meltThrough: 1 / 8 },
} as const

interface StandardPipe { name: string; outside: number; wall: number; large: boolean }

/** Standard test pipes of Table 10.9; outside diameter and wall in inches from the pipe size tables (memory). */
const STANDARD_PIPES: readonly StandardPipe[] = [
  { name: '2 in. Schedule 80', outside: 2.375, wall: 0.218, large: false },
  { name: '3 in. Schedule 40', outside: 3.5, wall: 0.216, large: false },
  { name: '6 in. Schedule 120', outside: 6.625, wall: 0.562, large: true },
  { name: '8 in. Schedule 80', outside: 8.625, wall: 0.5, large: true },
]
const STANDARD_RANGES = {
  SI: { small: { diameter: [20, 100], thickness: [3, 20] }, large: { diameter: [100, null], thickness: [5, null] } },
  US: { small: { diameter: [3 / 4, 4], thickness: [1 / 8, 3 / 4] }, large: { diameter: [4, null], thickness: [3 / 16, null] } },
} as const

/** A pipe is recorded to a tenth or two of a millimetre of its standard size. */
const near = (value: number, inches: number, system: UnitSystem): boolean => Math.abs(value - inches * (system === 'SI' ? 25.4 : 1)) <= (system === 'SI' ? 0.2 : 0.008)

/** The standard test pipe that a coupon is, or null. */
export function standardPipe(diameter: number, wall: number, system: UnitSystem): StandardPipe | null {
  return STANDARD_PIPES.find((pipe) => near(diameter, pipe.outside, system) && near(wall, pipe.wall, system)) ?? null
}

export type TestKind = 'complete' | 'partial' | 'fillet'

/** Which table a test weld belongs to. */
export const testKind = ({ joint }: Pick<WeldingVariables, 'joint'>): TestKind => (joint.weld === 'fillet' ? 'fillet' : joint.penetration === 'partial' ? 'partial' : 'complete')

export const isPipe = ({ product }: Pick<WeldingVariables, 'product'>): boolean => product === 'pipe'
/** Where it stands that a complete-penetration test covers fillets and partial penetration of every size: in a note of the table of the product welded. */
export const coversAll = (welded: Pick<WeldingVariables, 'product'>): [clause: string, basis: Basis] => (isPipe(welded) ? ['Table 10.9', 'read'] : ['Table 6.2', 'memory'])

/** Coupon thickness: the thinner of two unequal members. */
export function couponThickness(variables: Pick<WeldingVariables, 'thickness' | 'thicknessB'>, system: UnitSystem): number | null {
  const first = single(variables.thickness, 'length', system)
  if (!isStated(variables.thicknessB)) return first
  const second = single(variables.thicknessB, 'length', system)
  return first === null || second === null ? null : Math.min(first, second)
}

/** Groove depth of a partial-penetration test: the deposit of the block. */
export const grooveDepth = (side: Pick<CouponSide, 'block'>, system: UnitSystem): number | null => single(side.block?.depositThickness, 'length', system)

export interface Limits {
  lower: number | null
  /** null = no upper limit */
  upper: number | null
  how: { lower: string | null; upper: string | null }
  clause: string
  basis: Basis
}

/** Table 6.2. @param T in the system's unit; null when the table has no row for it */
export function plateLimits(T: number, system: UnitSystem): Limits | null {
  const f = FIGURES[system]
  if (T < f.least) return null
  const unlimited = T >= f.plateHigh
  return { lower: f.least, upper: unlimited ? null : tidy(2 * T), how: { lower: null, upper: unlimited ? null : '2T' }, clause: 'Table 6.2', basis: 'memory' }
}

/** Table 10.9, job size pipe. */
export function pipeLimits(T: number, system: UnitSystem): Limits | null {
  const f = FIGURES[system]
  if (T < f.least) return null
  const base = { clause: 'Table 10.9', basis: 'read' as const }
  if (T <= f.low) return { ...base, lower: f.least, upper: tidy(2 * T), how: { lower: null, upper: '2T' } }
  if (T < f.pipeHigh) return { ...base, lower: tidy(T / 2), upper: tidy(2 * T), how: { lower: 'T/2', upper: '2T' } }
  return { ...base, lower: f.pipeHighMin, upper: null, how: { lower: null, upper: null } }
}

/** Table 6.3. @param depth groove depth of the test; null when the table has no row for it */
export function partialLimits(depth: number, system: UnitSystem): Limits | null {
  const f = FIGURES[system]
  if (depth < f.least || depth > f.plateHigh) return null
  const unlimited = depth > f.low
  return { lower: f.least, upper: unlimited ? null : tidy(2 * depth), how: { lower: null, upper: unlimited ? null : 'twice the groove depth' }, clause: 'Table 6.3', basis: 'memory' }
}

export const lengthRange = (system: UnitSystem, lower: number | null, upper: number | null): NumericRange =>
  between('length', unitOf('length', system), lower === null ? UNLIMITED : closed(lower), upper === null ? UNLIMITED : closed(upper))

export const unknownLength = (system: UnitSystem): NumericRange => unknownNumeric('length', unitOf('length', system))

export interface Span { range: NumericRange; tested: number | null; limits: Limits | null; reason: string; clause: string; basis: Basis; missing: string[] }

/** The row of the standard test pipe, unless the procedure asks a diameter that only the job size row reaches. */
function standardRow(context: RangeContext, side: CouponSide, T: number): { pipe: StandardPipe; diameter: readonly [number, number | null]; thickness: readonly [number, number | null] } | null {
  const { system, procedure } = context
  const diameter = single(side.variables.diameter, 'length', system)
  const pipe = diameter === null ? null : standardPipe(diameter, T, system)
  if (!pipe) return null
  const ranges = STANDARD_RANGES[system][pipe.large ? 'large' : 'small']
  const asked = figures(procedure?.diameter, 'length', system)
  const top = asked.all ? Infinity : (asked.max ?? asked.min ?? 0)
  return ranges.diameter[1] !== null && top > ranges.diameter[1] ? null : { pipe, ...ranges }
}

/** Thickness that one test weld qualifies for the procedure's weld; without a procedure, for a weld like the test's own. */
export function thicknessSpan(context: RangeContext, side: CouponSide): Span {
  const { system } = context
  const unit = unitOf('length', system)
  const { number } = side.coupon
  const asked = testKind(context.procedure ?? side.variables)
  const tested = testKind(side.variables)
  const T = couponThickness(side.variables, system)
  const any = (reason: string, clause: string, basis: Basis): Span => ({ range: lengthRange(system, null, null), tested: T, limits: null, reason, clause, basis, missing: [] })
  if (tested === 'fillet') return any('A fillet test covers fillets on every thickness.', 'Table 6.4', 'memory')
  if (tested === 'complete' && asked !== 'complete') return any('A complete-penetration test of any thickness and diameter covers fillets and partial-penetration grooves of every size.', ...coversAll(side.variables))
  if (tested === 'partial' && asked === 'fillet') return any('A partial-penetration test covers fillets of every size on every thickness.', 'Table 6.3', 'memory')
  const depth = tested === 'partial' ? grooveDepth(side, system) : T
  const word = tested === 'partial' ? 'groove depth' : 'thickness'
  if (depth === null) return { range: unknownLength(system), tested: null, limits: null, reason: `${number} does not record its ${word}.`, clause: 'Table 6.2', basis: 'memory', missing: [`${number}: ${tested === 'partial' ? 'depositThickness' : 'thickness'}`] }
  const standard = tested === 'complete' && isPipe(side.variables) ? standardRow(context, side, depth) : null
  if (standard) {
    const [lower, upper] = standard.thickness
    return { range: lengthRange(system, lower, upper), tested: depth, limits: { lower, upper, how: { lower: null, upper: null }, clause: 'Table 10.9', basis: 'read' }, reason: `${number} is the standard test pipe ${standard.pipe.name}.`, clause: 'Table 10.9', basis: 'read', missing: [] }
  }
  const limits = tested === 'partial' ? partialLimits(depth, system) : isPipe(side.variables) ? pipeLimits(depth, system) : plateLimits(depth, system)
  if (!limits) return { range: unknownLength(system), tested: depth, limits: null, reason: `The table has no row for a test with a ${word} of ${show(depth, unit)}.`, clause: tested === 'partial' ? 'Table 6.3' : 'Table 6.2', basis: 'memory', missing: [`a test whose ${word} stands in the table`] }
  const reason = `A ${word} of ${show(depth, unit)} gives ${show(limits.lower ?? 0, unit)} to ${limits.upper === null ? 'unlimited' : show(limits.upper, unit)}${limits.how.upper ? ` (${limits.how.upper})` : ''}.`
  const base: Span = { range: lengthRange(system, limits.lower, limits.upper), tested: depth, limits, reason, clause: limits.clause, basis: limits.basis, missing: [] }
  return tested === 'complete' && side.variables.joint.groove === 'square' ? squareSpan(system, side, base, depth) : base
}

/** A square groove qualified without backgouging reaches only to the test thickness (read for tubes; memory for plate). */
function squareSpan(system: UnitSystem, side: CouponSide, span: Span, T: number): Span {
  const { backGouging } = side.variables.joint
  const unit = unitOf('length', system)
  if (backGouging !== null && backGouging !== 'none') return span
  const lower = span.limits?.lower ?? 0
  const basis: Basis = isPipe(side.variables) ? 'read' : 'memory'
  const sure = lengthRange(system, lower, T)
  if (backGouging === 'none') return { ...span, range: sure, limits: span.limits && { ...span.limits, upper: T, how: { ...span.limits.how, upper: 'T, square groove without backgouging' } }, reason: `A square groove without backgouging reaches up to the test thickness, ${show(T, unit)}.`, basis }
  return { ...span, range: { ...sure, segments: [...sure.segments, { lower: closed(lower), upper: UNKNOWN }] }, reason: `A square groove reaches beyond ${show(T, unit)} only if it was backgouged, which isn't recorded.`, basis, missing: [`${side.coupon.number}: joint.backGouging`] }
}

/** Pipe diameter that one test weld qualifies. */
export function diameterSpan(context: RangeContext, side: CouponSide): Span {
  const { system } = context
  const f = FIGURES[system]
  const unit = unitOf('length', system)
  const { number } = side.coupon
  const asked = testKind(context.procedure ?? side.variables)
  const span = (lower: number | null, upper: number | null, tested: number | null, reason: string, clause: string, basis: Basis): Span => ({ range: lengthRange(system, lower, upper), tested, limits: { lower, upper, how: { lower: null, upper: null }, clause, basis }, reason, clause, basis, missing: [] })
  const tested = testKind(side.variables)
  if (tested === 'complete' && asked !== 'complete') return span(null, null, null, 'A complete-penetration test of any diameter covers fillets and partial-penetration grooves on every diameter.', ...coversAll(side.variables))
  if (!isPipe(side.variables)) return span(f.bigPipe, null, null, `A plate test covers pipe from ${show(f.bigPipe, unit)} outside diameter, and welds along the axis of any pipe.`, 'Table 6.1', 'read')
  const D = single(side.variables.diameter, 'length', system)
  const T = couponThickness(side.variables, system)
  if (D === null || T === null) return { range: unknownLength(system), tested: D, limits: null, reason: `${number} does not record its ${D === null ? 'diameter' : 'wall thickness'}.`, clause: 'Table 10.9', basis: 'read', missing: [`${number}: ${D === null ? 'diameter' : 'thickness'}`] }
  const standard = standardRow(context, side, T)
  if (standard) return span(standard.diameter[0], standard.diameter[1], D, `${number} is the standard test pipe ${standard.pipe.name}.`, 'Table 10.9', 'read')
  if (D >= f.bigPipe && T > f.low) return span(f.bigPipe, null, D, `A test pipe of ${show(f.bigPipe, unit)} or more covers ${show(f.bigPipe, unit)} and over.`, 'Table 10.9', 'read')
  return span(D, null, D, 'A job size test pipe covers its own diameter and over.', 'Table 10.9', 'read')
}
