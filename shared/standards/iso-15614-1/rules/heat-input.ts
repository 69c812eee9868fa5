/** 8.4.7: heat input at most 1.25 times that tested where impact is required, at least 0.75 times where hardness is. */
import { between, closed, numericRange, UNLIMITED, unknownNumeric } from '../../../ranges/numeric.ts'
import type { NumericRange } from '../../../schemas/assessment.ts'
import { hasHardnessTests, hasImpactTests } from '../../common/iso-names.ts'
import { tidy } from '../../common/reading.ts'
import { bandRule, type Band } from '../../common/review-band.ts'
import { cannotTell, names, notStated, show, stateFix } from '../../common/wording.ts'
import type { CouponSide, RangeContext, Rule, RuleContext, RuleVerdict } from '../../rule.ts'
import { energyOf, factors, waveform, type Energy, type EnergyKind } from '../energy.ts'
import { levelOf } from '../levels.ts'
import { meta } from '../meta.ts'

const UNIT = 'kJ/mm'
const upTo = (value: number): NumericRange => between('heatInput', UNIT, UNLIMITED, closed(tidy(value)))
const from = (value: number): NumericRange => between('heatInput', UNIT, closed(tidy(value)), UNLIMITED)
const nothing = numericRange('heatInput', UNIT, [])
const unknown = unknownNumeric('heatInput', UNIT)
const KIND: Readonly<Record<'E' | 'Q', string>> = { E: 'arc energy', Q: 'heat input with k' }
const kindText = (kind: EnergyKind): string => (kind ? KIND[kind] : 'heat input or arc energy, not said which')

function askedKind(context: RangeContext, had: EnergyKind): EnergyKind {
  if (!context.block) return had
  const known = energyOf(context.block)
  return 'missing' in known ? had : known.kind
}

/** Band of one coupon: `limit` builds it from the tested energy and the factors that turn it into what the procedure states. */
function energyBand(context: RangeContext, side: CouponSide, limit: (had: Energy, factor: { least: number; greatest: number }) => Pick<Band, 'sure' | 'maybe' | 'reason' | 'why' | 'basis'>): Band | null {
  if (!side.block) return null
  const had = energyOf(side.block, side.coupon)
  if ('missing' in had) return { sure: nothing, maybe: unknown, tested: null, reason: `${side.coupon.number} does not give its heat input.`, missing: had.missing.map((field) => `${side.coupon.number}: ${field}`) }
  const to = askedKind(context, had.kind)
  const factor = context.procedure ? factors(had.kind, to, side.block) : { least: 1, greatest: 1 }
  const band = limit(had, factor)
  const unsaid = factor.least !== factor.greatest
  return { ...band, tested: had.mean, why: unsaid ? `${kindText(null).replace(/^h/, 'H')}: the process factor k may or may not be in the figures. ${band.why ?? ''}`.trim() : band.why, missing: unsaid ? [...(had.kind === null ? [`${side.coupon.number}: electrical.heatInputQuantity`] : []), ...(to === null ? ['procedure: electrical.heatInputQuantity'] : [])] : undefined }
}

const asked = (context: RuleContext): Energy | null => {
  const known = context.block ? energyOf(context.block) : null
  return known && !('missing' in known) ? known : null
}

/** What the procedure lacks to tell its own heat input. */
function unstated(context: RuleContext, sentence: string): RuleVerdict | null {
  if (!context.block) return null
  const known = energyOf(context.block)
  if (!('missing' in known)) return null
  const first = known.missing[0]?.split(' ')[0] ?? 'electrical.heatInput'
  return cannotTell(sentence, known.missing.map((field) => `procedure: ${context.path}.${field}`), { field: `${context.path}.${first}`, fixes: [stateFix('heat input', `${context.path}.electrical.heatInput`)] })
}

const SPREAD = 'The readings of the coupon are spread; the mean counts unless the record says that the specimens lay where the highest or lowest was.'

const upperBase = bandRule({
  meta: meta('heat-input-maximum', { title: 'Heat input, upper limit', clause: '8.4.7', basis: 'read', class: 'supplementary', combine: 'union', statement: 'Where impact is required the heat input (or arc energy, like with like) is at most 1.25 times that of the coupon at level 2; at level 1 between 1.0 and 1.25 times it must be looked up. Heat input is k·U·I/v with k 1.0 for 121, 0.6 for 141 and 15, 0.8 for the others.' }),
  field: 'electrical.heatInput',
  at: 'block',
  label: 'heat input',
  dimension: 'heatInput',
  asked(context) {
    const energy = asked(context)
    return energy && { min: 0, max: energy.high }
  },
  band(context, side) {
    // A coupon without impact tests does not widen what one with them has shown.
    if (context.procedure && context.toughness === true && !hasImpactTests(side.coupon.content) && context.coupons.some((coupon) => coupon.id !== side.coupon.id && hasImpactTests(coupon.content) && coupon.content.variables.processes.some((block) => block.process === side.block?.process))) return { sure: nothing, maybe: nothing, tested: null, reason: `${side.coupon.number} has no impact tests, and another linked coupon has.` }
    return energyBand(context, side, (had, factor) => {
      const one = levelOf(context) === '1'
      const low = tidy((one ? 1 : 1.25) * had.mean * factor.least)
      return { sure: upTo(low), maybe: upTo(1.25 * had.high * factor.greatest), reason: `${show(had.mean, UNIT)} (${had.from}, ${kindText(had.kind)}): ${one ? 'at level 1 that figure is sure' : '1.25 times it'}, ${show(low, UNIT)}.`, why: had.high > had.mean ? SPREAD : one ? 'Whether level 1 allows 25 % more is not confirmed.' : undefined, basis: one ? 'memory' : 'read' }
    })
  },
  plan: (wanted) => `A coupon with impact tests welded at ${show(tidy((wanted.max ?? 0) / 1.25), UNIT)} or more.`,
})

export const heatInputMaximum: Rule = {
  ...upperBase,
  check: (context, sides, joined) => unstated(context, "The procedure's highest heat input can't be told.") ?? upperBase.check(context, sides, joined),
}

const lowerBase = bandRule({
  meta: meta('heat-input-minimum', { title: 'Heat input, lower limit', clause: '8.4.7', basis: 'read', combine: 'union', statement: 'Where hardness is required the heat input is at least 0.75 times that of the coupon at level 2. Level 1 has no lower limit; without hardness requirements there is none.' }),
  field: 'electrical.heatInput',
  at: 'block',
  label: 'heat input',
  dimension: 'heatInput',
  asked(context) {
    const energy = asked(context)
    return energy && { min: energy.low, max: energy.high }
  },
  band(context, side) {
    const required = context.procedure ? context.procedure.hardnessRequired !== false : hasHardnessTests(side.coupon.content) || side.variables.hardnessRequired === true
    if (!required || levelOf(context) === '1') return null
    return energyBand(context, side, (had, factor) => {
      const high = tidy(0.75 * had.mean * factor.greatest)
      return { sure: from(high), maybe: from(0.75 * had.low * factor.least), reason: `${show(had.mean, UNIT)} (${had.from}, ${kindText(had.kind)}): 0.75 times it, ${show(high, UNIT)}.`, why: had.low < had.mean ? SPREAD : undefined }
    })
  },
  plan: (wanted) => `A coupon with hardness tests welded at ${show(tidy((wanted.min ?? 0) / 0.75), UNIT)} or less.`,
})

export const heatInputMinimum: Rule = {
  ...lowerBase,
  check(context, sides, joined) {
    const { hardnessRequired } = context.procedure
    if (hardnessRequired === false || levelOf(context) === '1') return { verdict: 'within', class: 'not-a-variable', sentence: levelOf(context) === '1' ? 'Level 1 has no lower limit of heat input.' : 'Hardness is not required, so heat input has no lower limit.', asked: null, range: null, tested: [] }
    const judged = unstated(context, "The procedure's lowest heat input can't be told.") ?? lowerBase.check(context, sides, joined)
    if (judged?.verdict === 'within' || hardnessRequired === true || !judged) return judged
    return { ...judged, verdict: 'cannot-tell', sentence: `${judged.sentence} It matters only if hardness is required, which isn't stated.`, missing: ['procedure: hardnessRequired', ...(judged.missing ?? [])], fixes: [stateFix('hardness requirement', 'hardnessRequired'), ...(judged.fixes ?? [])] }
  },
}

/** Change of control between conventional and waveform-controlled power sources. */
export const waveformControl: Rule = {
  meta: meta('waveform', { title: 'Waveform control', clause: '8.4.7', basis: 'memory', statement: 'Where the waveform is controlled, energy comes from instantaneous values in coupon and production alike; a change of control must be looked up, where heat input counts.' }),
  field: 'electrical.waveformControlled',
  at: 'block',
  label: 'Waveform control',
  applies: (context) => context.toughness !== false || context.procedure.hardnessRequired !== false,
  range: () => null,
  check(context, sides) {
    if (!context.block || (context.toughness === false && context.procedure.hardnessRequired === false)) return null
    const own = waveform(context.block.electrical)
    if (own === null) return notStated('waveform control', `${context.path}.electrical.waveformControlled`)
    const had = sides.map((side) => (side.block ? waveform(side.block.electrical) : null))
    if (had.includes(own)) return { verdict: 'within', sentence: `Waveform control is as on ${names(sides)}.`, asked: [own ? 'controlled' : 'not controlled'], range: null }
    if (had.includes(null)) return cannotTell(`${names(sides)} does not record whether the waveform was controlled.`, sides.map((side) => `${side.coupon.number}: electrical.waveformControlled`))
    return cannotTell(`The waveform is ${own ? '' : 'not '}controlled, and on ${names(sides)} it was ${own ? 'not ' : ''}so. What the clause says of that change is not known here.`, ['the clause on waveform-controlled current in your edition'], { asked: [own ? 'controlled' : 'not controlled'] })
  },
}

/** A coupon proves hardness only with hardness tests. */
export const hardnessTests: Rule = {
  meta: meta('hardness-tests', { title: 'Hardness tests', clause: '7.4.5', basis: 'memory', statement: 'Where hardness is required, a supporting coupon carries hardness tests; parents in groups 1.1, 8 and 41 to 48 need none of their own at level 2.' }),
  field: 'hardnessRequired',
  at: 'weld',
  label: 'Hardness tests',
  applies: (context) => context.procedure.hardnessRequired === true,
  range: () => null,
  check(context, sides) {
    if (context.procedure.hardnessRequired !== true) return null
    const tested = sides.filter((side) => hasHardnessTests(side.coupon.content))
    if (tested.length > 0) return { verdict: 'within', sentence: `${names(tested)} was tested for hardness.`, asked: ['with hardness tests'], range: null }
    return cannotTell(`Hardness is required, and ${names(sides)} has no hardness results.`, sides.map((side) => `${side.coupon.number}: hardness`), { asked: ['with hardness tests'], fixes: [{ kind: 'plan-coupon', label: 'Test a coupon for hardness', requirement: 'HV10 results of weld, heat-affected zone and parent metal.' }] })
  },
}
