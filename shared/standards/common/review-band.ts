/**
 * Variables of which two readings are known: what both allow is covered, what neither allows is outside, and what lies
 * between can't be told until the figure is looked up in the edition. `sure` is what both allow, `maybe` what either does.
 */
import { containsInterval, numericRange, outerEnds, UNKNOWN, unionNumeric } from '../../ranges/numeric.ts'
import { setRange, UNKNOWN_SET } from '../../ranges/set.ts'
import type { Basis, Bound, Fix, NumericRange, SetRange } from '../../schemas/assessment.ts'
import type { Dimension } from '../../units/types.ts'
import type { CouponSide, RangeContext, Rule, RuleContext, RuleMeta, RuleVerdict } from '../rule.ts'
import { figureRule, pathOf } from './rule-kinds.ts'
import { cannotTell, capital, couponLacks, list, names, notStated, showAsked, showInside, showRange, stateFix, verb } from './wording.ts'

/** Range of one coupon with what is sure of it and what may be. */
export interface Band {
  sure: NumericRange
  /** Holds `sure`; equal to it where only one reading is known. */
  maybe: NumericRange
  tested: number | null
  reason: string
  /** Why the part between can't be told, as a sentence. */
  why?: string
  /** What a record lacks, where that is why; named as `PQR-1: field` or `procedure: field`. */
  missing?: readonly string[]
  clause?: string
  basis?: Basis
}

export interface BandSpec {
  meta: RuleMeta
  field: string
  at: 'weld' | 'block'
  label: string
  dimension: Dimension
  ends?: { min: string; max: string }
  applies?: (context: RuleContext) => boolean
  asked: (context: RuleContext) => { min: number | null; max: number | null } | null | 'fault'
  /** null = the variable does not arise on this coupon. */
  band: (context: RangeContext, side: CouponSide) => Band | null
  plan?: (asked: { min: number | null; max: number | null }, context: RuleContext) => string
}

const CONFIRM = 'Look the figure up in your edition.'
export const confirmInEdition = (clause: string): string => `the figure of ${clause} in your edition`

const below = (a: Bound, b: Bound): boolean => a.kind === 'unknown' || (a.kind === 'unlimited' && b.kind !== 'unlimited') || ('value' in a && 'value' in b && a.value < b.value)
const above = (a: Bound, b: Bound): boolean => a.kind === 'unknown' || (a.kind === 'unlimited' && b.kind !== 'unlimited') || ('value' in a && 'value' in b && a.value > b.value)

/** The sure part, with an unknown end on the side where more may be covered. */
export function visibleBand(sure: NumericRange, maybe: NumericRange): NumericRange {
  if (sure.segments.length === 0) return maybe.segments.length === 0 ? sure : numericRange(sure.dimension, sure.unit, [{ lower: UNKNOWN, upper: UNKNOWN }])
  const inner = outerEnds(sure)
  const outer = outerEnds(maybe)
  const segments = [...sure.segments]
  if (below(outer.lower, inner.lower)) segments.push({ lower: UNKNOWN, upper: inner.lower })
  if (above(outer.upper, inner.upper)) segments.push({ lower: inner.upper, upper: UNKNOWN })
  return segments.length === sure.segments.length ? sure : numericRange(sure.dimension, sure.unit, segments)
}

/** What was made last for two sides of one context: a rule is asked for the range and then for the verdict of the same coupons. */
function remember<T>(make: (context: RangeContext, side: CouponSide) => T): (context: RangeContext, side: CouponSide) => T {
  let of: RangeContext | null = null
  let sides: readonly [CouponSide | null, CouponSide | null] = [null, null]
  let made: readonly [T | null, T | null] = [null, null]
  return (context, side) => {
    if (of === context) {
      if (sides[0] === side) return made[0] as T
      if (sides[1] === side) return made[1] as T
    }
    const value = make(context, side)
    sides = of === context ? [side, sides[0]] : [side, null]
    made = of === context ? [value, made[0]] : [value, null]
    of = context
    return value
  }
}

/** A figure that must lie inside a range of which two readings may be known. */
export function bandRule(given: BandSpec): Rule {
  const spec: BandSpec = { ...given, band: remember(given.band) }
  const base = figureRule({
    ...spec,
    range(context, side) {
      const band = spec.band(context, side)
      return band && { range: visibleBand(band.sure, band.maybe), tested: band.tested, reason: band.reason, clause: band.clause, basis: band.basis, missing: band.missing }
    },
  })
  return {
    ...base,
    check(context, sides) {
      if (spec.applies && !spec.applies(context)) return null
      const bands: Band[] = []
      for (const side of sides) {
        const band = spec.band(context, side)
        if (band) bands.push(band)
      }
      const first = bands[0]
      const asked = spec.asked(context)
      if (asked === null || asked === 'fault') return !first && asked === null ? null : base.check(context, sides, first?.sure ?? null)
      if (!first) return null
      let { sure, maybe } = first
      for (let i = 1; i < bands.length; i += 1) {
        const band = bands[i]
        if (!band) continue
        sure = unionNumeric(sure, band.sure)
        maybe = unionNumeric(maybe, band.maybe)
      }
      const settled = { clause: first.clause, basis: first.basis }
      if (containsInterval(sure, asked) === 'within' || containsInterval(maybe, asked) === 'outside') {
        const judged = base.check(context, sides, sure)
        return judged && { ...settled, ...judged }
      }
      return unsure(spec, context, sides, bands, { sure, maybe, asked })
    },
  }
}

interface Between { sure: NumericRange; maybe: NumericRange; asked: { min: number | null; max: number | null } }

function unsure(spec: BandSpec, context: RuleContext, sides: readonly CouponSide[], bands: readonly Band[], { sure, maybe, asked }: Between): RuleVerdict {
  const field = pathOf(context, spec)
  const missing = [...new Set(bands.flatMap((band) => band.missing ?? []))]
  const range = visibleBand(sure, maybe)
  const first = bands[0]
  const settled = { clause: first?.clause, basis: first?.basis, asked, range }
  if (missing.length > 0 && sure.segments.length === 0) {
    return { ...couponLacks(spec.label, spec.field, sides, asked, range), ...settled, missing, fixes: missing.filter((text) => text.startsWith('procedure: ')).map((text) => stateFix('missing value', text.slice(11))) }
  }
  const why = bands.find((band) => band.why)?.why ?? (missing.length > 0 ? `Not recorded: ${list(missing)}.` : CONFIRM)
  const fixes: Fix[] = [...missing.filter((text) => text.startsWith('procedure: ')).map((text) => stateFix('missing value', text.slice(11))), { kind: 'plan-coupon', label: 'Weld a coupon that covers it', requirement: spec.plan ? spec.plan(asked, context) : `A coupon that surely qualifies ${spec.label} ${showAsked(asked, sure.unit)}.` }]
  return cannotTell(
    `${capital(showAsked(asked, sure.unit))} lies beyond ${showInside(sure)} that ${names(sides)} surely ${verb(sides, 'qualifies', 'qualify')}. ${why}`,
    missing.length > 0 ? missing : [confirmInEdition(first?.clause ?? spec.meta.clause)],
    { ...settled, field, fixes, reasoning: [`Sure: ${showRange(sure)}. Possible: ${showRange(maybe)}. Asked: ${showAsked(asked, sure.unit)}.`] },
  )
}

/** Names that a coupon's value covers. */
export interface NameBand {
  sure: readonly string[] | 'any'
  /** More that may be covered; absent = nothing more. */
  maybe?: readonly string[] | 'any'
  why?: string
  missing?: readonly string[]
  basis?: Basis
  clause?: string
}

export interface NameBandSpec {
  meta: RuleMeta
  field: string
  at: 'weld' | 'block'
  label: string
  applies?: (context: RuleContext) => boolean
  asked: (context: RuleContext) => readonly string[] | null
  /** null = not recorded; undefined = does not arise on this coupon. */
  tested: (context: RangeContext, side: CouponSide) => readonly string[] | null | undefined
  covers?: (value: readonly string[], context: RangeContext, side: CouponSide) => NameBand
  because: string
  /** Fields that decide, where the rule's own field is only one of them. */
  lacks?: (side: CouponSide) => readonly string[]
  setValue?: (name: string) => unknown
  plan?: (asked: readonly string[], context: RuleContext) => string
}

const flags = (band: NameBand): SetRange => (band.sure === 'any' ? setRange([], { any: true }) : setRange(band.sure, { unknown: band.maybe !== undefined }))
const holds = (covered: readonly string[] | 'any' | undefined, name: string): boolean => covered === 'any' || (covered?.includes(name) ?? false)

/** A name that must be covered, of which two readings may be known. */
export function nameBandRule(spec: NameBandSpec): Rule {
  const read = remember((context, side): { value: readonly string[] | null | undefined; band: NameBand | null | undefined } => {
    const value = spec.tested(context, side)
    return { value, band: value === null || value === undefined ? value : spec.covers ? spec.covers(value, context, side) : { sure: value } }
  })
  const lacking = (side: CouponSide): string[] => (spec.lacks?.(side) ?? [spec.field]).map((field) => `${side.coupon.number}: ${field}`)
  const rule: Rule = {
    meta: spec.meta,
    field: spec.field,
    at: spec.at,
    label: capital(spec.label),
    applies: spec.applies,
    range(context, side) {
      const { value, band } = read(context, side)
      if (band === undefined || value === undefined) return null
      if (band === null || value === null) return { range: UNKNOWN_SET, tested: null, reason: `${side.coupon.number} does not record the ${spec.label}.`, missing: lacking(side) }
      return { range: flags(band), tested: list(value), reason: !band.why ? spec.because : band.sure !== 'any' && band.sure.length === 0 ? band.why : `${spec.because} ${band.why}`, basis: band.basis, clause: band.clause, missing: band.missing }
    },
    check(context, sides, joined) {
      if (spec.applies && !spec.applies(context)) return null
      const field = pathOf(context, spec)
      const asked = spec.asked(context)
      if (asked === null || asked.length === 0) return notStated(spec.label, field, { range: joined })
      const bands: NameBand[] = []
      const lacks: string[] = []
      for (const side of sides) {
        const { band } = read(context, side)
        if (band) bands.push(band)
        else if (band === null) lacks.push(...lacking(side))
      }
      if (bands.length === 0 && lacks.length === 0) return null
      return judgeNames({ spec, context, sides, field, asked, bands, joined, lacks })
    },
  }
  return rule
}

interface NamesAsked { spec: NameBandSpec; context: RuleContext; sides: readonly CouponSide[]; field: string; asked: readonly string[]; bands: readonly NameBand[]; joined: RuleVerdict['range']; lacks: readonly string[] }

const covers = (bands: readonly NameBand[], name: string): boolean => bands.some((band) => holds(band.sure, name))

function judgeNames({ spec, context, sides, field, asked, bands: known, joined, lacks }: NamesAsked): RuleVerdict {
  const basis = known[0]?.basis
  const clause = known[0]?.clause
  const askedText = list(asked)
  if (asked.every((name) => covers(known, name))) return { verdict: 'within', sentence: `${capital(spec.label)}: ${askedText} is covered by ${names(sides)}.`, asked: [...asked], range: joined, basis, clause, reasoning: [spec.because] }
  const settled = { basis, clause, asked: [...asked], range: joined }
  const missed = asked.filter((name) => !covers(known, name))
  const plan: Fix = { kind: 'plan-coupon', label: `Weld a coupon with ${list(missed)}`, requirement: spec.plan ? spec.plan(missed, context) : `A coupon whose ${spec.label} is ${list(missed)}.` }
  if (lacks.length > 0) return { ...couponLacks(spec.label, spec.field, sides, [...asked], joined), missing: lacks }
  const wide = known.filter((band) => missed.every((name) => holds(band.sure, name) || holds(band.maybe, name)))
  if (wide.length > 0) {
    const missing = [...new Set(wide.flatMap((band) => band.missing ?? []))]
    const why = wide.find((band) => band.why)?.why ?? CONFIRM
    const state = missing.filter((text) => text.startsWith('procedure: ')).map((text) => stateFix('missing value', text.slice(11)))
    return { ...settled, ...cannotTell(`Whether ${names(sides)} ${verb(sides, 'covers', 'cover')} ${spec.label} ${list(missed)} can't be told. ${why}`, missing.length > 0 ? missing : [confirmInEdition(settled.clause ?? spec.meta.clause)], { asked: [...asked], range: joined, field, fixes: [...state, plan] }) }
  }
  const covered = [...new Set(known.flatMap((band) => (band.sure === 'any' ? [] : band.sure)))]
  const first = covered[0]
  const value = first === undefined ? undefined : spec.setValue?.(first)
  return {
    ...settled,
    verdict: 'outside',
    sentence: `${capital(spec.label)}: ${list(missed)} is not covered; ${names(sides)} ${verb(sides, 'qualifies', 'qualify')} ${covered.length === 0 ? 'none' : `${list(covered, 'or')} only`}.`,
    fixes: [...(value === undefined ? [] : [{ kind: 'set' as const, label: `Set the ${spec.label} to ${first ?? ''}`, field, value }]), plan],
    reasoning: [spec.because, `Covered: ${list(covered, 'or')}. Asked: ${askedText}.`],
  }
}
