/** The two shapes that most variables have: a name that must be covered, and a figure that must lie inside a range. */
import { containsInterval } from '../../ranges/numeric.ts'
import { containsNames, setRange, UNKNOWN_SET } from '../../ranges/set.ts'
import type { Basis, Fix, NumericRange, QualifiedSpan } from '../../schemas/assessment.ts'
import type { ProcessBlock, WeldingVariables } from '../../schemas/welding.ts'
import { quantity } from '../../units/convert.ts'
import type { Dimension } from '../../units/types.ts'
import type { CouponSide, RangeContext, Rule, RuleContext, RuleMeta, RuleRange, RuleVerdict } from '../rule.ts'
import { betterEnd, intervalCures, valueAt } from './cures.ts'
import { fieldWords, lackWords, pathOfMissing } from './lacking.ts'
import { cannotTell, capital, couponLacks, list, names, notStated, show, showAsked, showInside, showRange, showSpan, stateFix, verb } from './wording.ts'

/** Full dotted path of a rule's field. */
export const pathOf = (context: RuleContext, rule: { at: 'weld' | 'block'; field: string }): string => (rule.at === 'block' && context.path ? `${context.path}.${rule.field}` : rule.field)

export interface NamedSpec {
  meta: RuleMeta
  field: string
  at: 'weld' | 'block'
  /** Lower case, as in "State the …". */
  label: string
  applies?: (context: RuleContext) => boolean
  /** Names that the procedure asks; null = not stated. */
  asked: (context: RuleContext) => readonly string[] | null
  /** What the coupon had; null = not recorded; undefined = the variable does not arise on this coupon. */
  tested: (context: RangeContext, side: CouponSide) => string | null | undefined
  /** Names that the coupon's value covers; the value itself where absent. */
  covers?: (value: string, context: RangeContext, side: CouponSide) => readonly string[] | 'any'
  /** Which kind of name it is (an A-Number, a composition …): names of different kinds can't be compared. */
  kind?: (name: string) => string
  /** Why, in words, for the opened reasoning. */
  because: string
  /** A name as a sentence shows it. */
  display?: (name: string) => string
  /** Value to set for a covered name; undefined where setting it is no cure. */
  setValue?: (name: string) => unknown
  /** What to weld so that the asked names would be covered. */
  plan?: (asked: readonly string[], context: RuleContext) => string
  /** Paths, beside `field`, of the entries without which a record gives no name; `field` itself where absent or empty. */
  lacks?: (variables: WeldingVariables, block: ProcessBlock | null) => readonly string[]
}

/** Entries that are missing, named as `field` is. */
function lackOf(spec: NamedSpec, variables: WeldingVariables, block: ProcessBlock | null): readonly string[] {
  const paths = spec.lacks?.(variables, block) ?? []
  return paths.length > 0 ? paths : [spec.field]
}

/** The procedure lacks an entry: the first one missing is where the finding stands. */
function namesNotStated(spec: NamedSpec, context: RuleContext, field: string, joined: QualifiedSpan | null): RuleVerdict {
  const lacking = lackOf(spec, context.procedure, context.block)
  if (lacking.length === 1 && lacking[0] === spec.field) return notStated(spec.label, field, { range: joined })
  const paths = lacking.map((path) => pathOf(context, { at: spec.at, field: path }))
  const missing = paths.map((path) => `procedure: ${path}`)
  return cannotTell(`${capital(lackWords(missing))}, so the ${spec.label} can't be judged.`, missing, { field: paths[0], range: joined, fixes: paths.map((path) => stateFix(fieldWords(path), path)) })
}

/** A variable whose value is a name: covered or not by the names that the coupon covers. */
export function namedRule(spec: NamedSpec): Rule {
  const words: Words = { display: spec.display ?? asItIs, label: capital(spec.label), because: [spec.because] }
  const rule: Rule = {
    meta: spec.meta,
    field: spec.field,
    at: spec.at,
    label: words.label,
    applies: spec.applies,
    range(context, side) {
      const value = spec.tested(context, side)
      if (value === undefined) return null
      if (value === null) {
        const lacking = lackOf(spec, side.variables, side.block)
        const missing = lacking.map((path) => `${side.coupon.number}: ${path}`)
        return { range: UNKNOWN_SET, tested: null, reason: lacking[0] === spec.field ? `${side.coupon.number} does not record the ${spec.label}.` : `${lackWords(missing)}.`, missing }
      }
      const covered = spec.covers ? spec.covers(value, context, side) : [value]
      return { range: covered === 'any' ? setRange([], ANY) : setRange(covered), tested: value, reason: spec.because }
    },
    check(context, sides, joined) {
      if (spec.applies && !spec.applies(context)) return null
      const asked = spec.asked(context)
      if (asked === null || asked.length === 0) return namesNotStated(spec, context, pathOf(context, spec), joined)
      if (joined === null) return isStatedOnly(spec.meta, context) ? { verdict: 'within', sentence: `The procedure states the ${spec.label}; without toughness no coupon limits it.`, asked: [...asked], range: null, tested: [] } : null
      return judgeNames(spec, words, context, sides, joined, asked)
    },
  }
  return rule
}

/** A dual variable without toughness: nonessential, so the procedure only has to state it. */
const isStatedOnly = (meta: RuleMeta, context: RuleContext): boolean => context.toughness === false && !!context.block?.process && meta.classes[context.block.process] === 'dual'

const ANY = { any: true } as const
const asItIs = (name: string): string => name

/** What of a rule's wording is the same each time. */
interface Words { display: (name: string) => string; label: string; because: readonly string[] }

/** One coupon's range and the name that it was last asked for: mostly it is asked for the same again. */
interface KeptWithin { rule: string; number: string; name: string; verdict: RuleVerdict }
const lastWithin = new WeakMap<QualifiedSpan, KeptWithin>()

function judgeNames(spec: NamedSpec, words: Words, context: RuleContext, sides: readonly CouponSide[], joined: QualifiedSpan, asked: readonly string[]): RuleVerdict {
  const number = sides.length === 1 && sides[0] ? sides[0].coupon.number : null
  const name = asked.length === 1 && asked[0] !== undefined ? asked[0] : null
  const kept = number === null || name === null ? undefined : lastWithin.get(joined)
  if (kept?.name === name && kept.number === number && kept.rule === spec.meta.id) return kept.verdict
  const judged = judgeNamesAnew(spec, words, context, sides, joined, asked)
  if (number !== null && name !== null && judged.verdict === 'within') lastWithin.set(joined, { rule: spec.meta.id, number, name, verdict: judged })
  return judged
}

function judgeNamesAnew(spec: NamedSpec, words: Words, context: RuleContext, sides: readonly CouponSide[], joined: QualifiedSpan, asked: readonly string[]): RuleVerdict {
  const { display } = words
  if (joined.type !== 'set') throw new TypeError(`${spec.meta.id} compares names`)
  const verdict = containsNames(joined, asked)
  if (verdict === 'cannot-tell') return namesNotRecorded(spec, context, sides, joined, asked)
  const askedText = asked.length === 1 && asked[0] !== undefined ? display(asked[0]) : list(asked.map(display))
  if (verdict === 'within') return { verdict, sentence: `${words.label}: ${askedText} is covered by ${names(sides)}.`, asked: asked.slice(), range: joined, reasoning: words.because }
  const { kind } = spec
  const field = pathOf(context, spec)
  if (kind && !asked.every((name) => joined.values.some((value) => kind(value) === kind(name)))) {
    return cannotTell(`The procedure gives ${askedText} as its ${spec.label} and ${names(sides)} ${verb(sides, 'gives', 'give')} ${list(joined.values.map(display), 'or')}, which can't be compared.`, [`procedure: ${field}`, ...sides.map((side) => `${side.coupon.number}: ${spec.field}`)], { asked: [...asked], range: joined, fixes: [stateFix(spec.label, field)] })
  }
  const covered = joined.values.map(display)
  const fixes: Fix[] = []
  // What was welded is the surest cure; a value that is only covered comes after it.
  const { values } = joined
  const first = sides.map((side) => spec.tested(context, side)).find((name) => name !== null && name !== undefined && values.includes(name)) ?? values[0]
  if (spec.setValue && first !== undefined) {
    const value = spec.setValue(first)
    if (value !== undefined) fixes.push({ kind: 'set', label: `Set the ${spec.label} to ${display(first)}`, field, value })
  }
  fixes.push({ kind: 'plan-coupon', label: `Weld a coupon with ${askedText}`, requirement: spec.plan ? spec.plan(asked, context) : `A coupon whose ${spec.label} is ${askedText}.` })
  const missed = asked.filter((name) => !joined.values.includes(name)).map(display)
  return {
    verdict,
    sentence: `${capital(spec.label)}: ${list(missed)} is not covered; ${names(sides)} ${verb(sides, 'qualifies', 'qualify')} ${covered.length === 0 ? 'none' : `${list(covered, 'or')} only`}.`,
    asked: [...asked],
    range: joined,
    fixes,
    reasoning: [spec.because, `Covered: ${showSpan(joined)}. Asked: ${askedText}.`],
  }
}

/** Coupons that give no name: each with the entries that it lacks. */
function namesNotRecorded(spec: NamedSpec, context: RuleContext, sides: readonly CouponSide[], joined: QualifiedSpan, asked: readonly string[]): RuleVerdict {
  const missing = sides.flatMap((side) => (spec.tested(context, side) === null ? lackOf(spec, side.variables, side.block).map((path) => `${side.coupon.number}: ${path}`) : []))
  if (missing.length === 0 || missing.every((text) => text.endsWith(`: ${spec.field}`))) return couponLacks(spec.label, spec.field, sides, [...asked], joined)
  return cannotTell(`${lackWords(missing)}, so what is qualified can't be told.`, missing, { asked: [...asked], range: joined })
}

export interface FigureSpec {
  meta: RuleMeta
  field: string
  at: 'weld' | 'block'
  label: string
  dimension: Dimension
  /** Path below `field` of each end; '' where the field itself is the quantity. */
  ends?: { min: string; max: string }
  applies?: (context: RuleContext) => boolean
  /** null = not stated, `fault` = the record contradicts itself. */
  asked: (context: RuleContext) => { min: number | null; max: number | null } | null | 'fault'
  range: (context: RangeContext, side: CouponSide) => RuleRange | null
  join?: Rule['join']
  /** How an end comes about, e.g. `2T`, and the coupon in words, e.g. `10 mm coupon`. */
  how?: (context: RuleContext, side: CouponSide, end: 'lower' | 'upper') => { how: string | null; coupon: string }
  plan?: (asked: { min: number | null; max: number | null }, context: RuleContext) => string
  /** The set fix where it is neither an interval's nor a single quantity's. */
  cure?: (context: RuleContext, joined: NumericRange, field: string) => readonly Fix[]
}

/** A variable whose value is a figure or an interval: it must lie inside the range. */
export function figureRule(spec: FigureSpec): Rule {
  const label = capital(spec.label)
  return {
    meta: spec.meta,
    field: spec.field,
    at: spec.at,
    label,
    applies: spec.applies,
    range: spec.range,
    join: spec.join,
    check(context, sides, joined) {
      if (spec.applies && !spec.applies(context)) return null
      const asked = spec.asked(context)
      if (asked === null) return notStated(spec.label, pathOf(context, spec), { range: joined })
      if (asked === 'fault') return notStated(spec.label, pathOf(context, spec), { sentence: `${label} contradicts itself in the procedure, so it can't be judged.`, range: joined })
      if (joined === null) return null
      if (joined.type !== 'numeric') throw new TypeError(`${spec.meta.id} compares figures`)
      return judgeFigures(spec, context, sides, joined, asked)
    },
  }
}

function judgeFigures(spec: FigureSpec, context: RuleContext, sides: readonly CouponSide[], joined: NumericRange, asked: { min: number | null; max: number | null }): RuleVerdict {
  const verdict = containsInterval(joined, asked)
  if (verdict === 'cannot-tell') return figuresNotKnown(spec, context, sides, joined, asked)
  if (verdict === 'within') {
    return { verdict, sentence: `${capital(showAsked(asked, joined.unit))} lies inside ${showInside(joined)} that ${names(sides)} ${sides.length > 1 ? 'qualify' : 'qualifies'}.`, asked, range: joined }
  }
  const field = pathOf(context, spec)
  const { sentence, wrong } = miss(spec, context, sides, joined, asked)
  const fixes: Fix[] = spec.cure ? [...spec.cure(context, joined, field)] : spec.ends ? quantityCures(spec, spec.ends, joined, asked, wrong, field) : intervalCures({ label: spec.label, dimension: spec.dimension, field, current: valueAt(context.procedure, field), range: joined, asked, wrong })
  fixes.push({ kind: 'plan-coupon', label: 'Weld a coupon that covers it', requirement: spec.plan ? spec.plan(asked, context) : `A coupon that qualifies ${spec.label} ${showAsked(asked, joined.unit)}.` })
  return { verdict, sentence, asked, range: joined, fixes, reasoning: [`Covered: ${showRange(joined)}. Asked: ${showAsked(asked, joined.unit)}.`] }
}

/** A field that is one quantity, or holds its ends elsewhere. */
function quantityCures(spec: FigureSpec, ends: { min: string; max: string }, joined: NumericRange, asked: { min: number | null; max: number | null }, wrong: readonly ('min' | 'max')[], field: string): Fix[] {
  return wrong.flatMap((end) => {
    const better = betterEnd(joined, asked, end)
    return better === null ? [] : [{ kind: 'set' as const, label: `Set ${spec.label}${asked.min === asked.max ? '' : ` ${end === 'min' ? 'minimum' : 'maximum'}`} to ${show(better, joined.unit)}`, field: `${field}${ends[end]}`, value: quantity(better, spec.dimension, joined.unit) }]
  })
}

/** Not enough is recorded: exactly what, of which record. */
function figuresNotKnown(spec: FigureSpec, context: RuleContext, sides: readonly CouponSide[], joined: NumericRange, asked: { min: number | null; max: number | null }): RuleVerdict {
  const missing = [...new Set(sides.flatMap((side) => spec.range(context, side)?.missing ?? []))]
  if (missing.length === 0 || missing.every((text) => text.endsWith(`: ${spec.field}`))) return couponLacks(spec.label, spec.field, sides, asked, joined)
  return cannotTell(`${capital(lackWords(missing))}, so whether ${showAsked(asked, joined.unit)} is qualified can't be told.`, missing, {
    asked,
    range: joined,
    fixes: missing.flatMap((text) => (text.startsWith('procedure: ') ? [stateFix(fieldWords(pathOfMissing(text)), pathOfMissing(text))] : [])),
  })
}

/** By what the end is set, after a figure: " (2T) that the 10 mm coupon of PQR-1 qualifies". */
function qualifiedBy(spec: FigureSpec, context: RuleContext, sides: readonly CouponSide[], end: 'lower' | 'upper'): string {
  const side = sides[0]
  const how = sides.length === 1 && side ? spec.how?.(context, side, end) : undefined
  const tag = how?.how ? ` (${how.how})` : ''
  return how && side ? `${tag} that the ${how.coupon} of ${side.coupon.number} qualifies` : ` that ${names(sides)} ${sides.length > 1 ? 'together qualify' : 'qualifies'}`
}

/** Which end is outside, and the sentence that says so with the figures. */
function miss(spec: FigureSpec, context: RuleContext, sides: readonly CouponSide[], joined: NumericRange, asked: { min: number | null; max: number | null }): { sentence: string; wrong: ('min' | 'max')[] } {
  const unit = joined.unit
  const first = joined.segments[0]
  const last = joined.segments.at(-1)
  if (!first || !last) return { sentence: `${capital(showAsked(asked, unit))} is not covered: ${names(sides)} ${verb(sides, 'qualifies', 'qualify')} nothing here.`, wrong: [] }
  const wrong: ('min' | 'max')[] = []
  const parts: string[] = []
  const low = 'value' in first.lower ? first.lower.value : null
  const high = 'value' in last.upper ? last.upper.value : null
  if (high !== null && (asked.max === null || asked.max > high)) {
    wrong.push('max')
    parts.push(`${asked.max === null ? 'No upper limit' : show(asked.max, unit)} is above the ${show(high, unit)}${qualifiedBy(spec, context, sides, 'upper')}`)
  }
  if (low !== null && (asked.min === null || asked.min < low)) {
    wrong.push('min')
    parts.push(`${asked.min === null ? 'no lower limit' : show(asked.min, unit)} is below the ${show(low, unit)}${qualifiedBy(spec, context, sides, 'lower')}`)
  }
  if (parts.length > 0) return { sentence: `${capital(parts.join(', and '))}.`, wrong }
  // A figure that stands on a bound which is itself not covered.
  if (high !== null && last.upper.kind === 'open' && asked.max === high) wrong.push('max')
  if (low !== null && first.lower.kind === 'open' && asked.min === low) wrong.push('min')
  if (wrong.length > 0) {
    const limits = [...new Set([...(wrong.includes('min') ? [low] : []), ...(wrong.includes('max') ? [high] : [])])].map((limit) => show(limit ?? 0, unit))
    return { sentence: `${list(limits)} ${limits.length > 1 ? 'are limits that are themselves' : 'is a limit that is itself'} not covered: ${names(sides)} ${verb(sides, 'qualifies', 'qualify')} ${showRange(joined)}.`, wrong }
  }
  return { sentence: `${capital(showAsked(asked, unit))} reaches into a gap: ${names(sides)} together qualify ${showRange(joined)}.`, wrong: ['min', 'max'].filter((end) => asked[end as 'min' | 'max'] !== null && containsInterval(joined, { min: asked[end as 'min' | 'max'], max: asked[end as 'min' | 'max'] }) !== 'within') as ('min' | 'max')[] }
}

const WEAKNESS: Record<Basis, number> = { read: 0, secondary: 1, 'common-practice': 2, memory: 3 }
/** The weaker of two bases, so that memory always shows through. */
export const weakest = (a: Basis, b: Basis): Basis => (WEAKNESS[a] >= WEAKNESS[b] ? a : b)
