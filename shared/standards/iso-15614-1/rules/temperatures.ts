/** 8.4.8 preheat, 8.4.9 interpass, 8.4.10 hydrogen release, 8.4.11 heat treatment after welding, 8.4.12 condition before welding. */
import { between, closed, numericRange, UNLIMITED, unknownNumeric } from '../../../ranges/numeric.ts'
import type { NumericRange } from '../../../schemas/assessment.ts'
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { askedInterval, materialGroup, secondMember, siFigure, siFigures } from '../../common/iso-names.ts'
import { sameText, tidy } from '../../common/reading.ts'
import { bandRule, nameBandRule } from '../../common/review-band.ts'
import { cannotTell, show } from '../../common/wording.ts'
import type { CouponSide, Rule, RuleVerdict } from '../../rule.ts'
import { levelTwoLimit } from '../levels.ts'
import { meta } from '../meta.ts'

/** Step by which a quotation of the 2017 text lets preheat fall and interpass rise; to which level it belongs is not known. */
const STEP = 50
const WHY = 'A step of 50 °C is quoted for the 2017 edition without naming the level; the 2004 text has none.'

const degrees = (lower: number | null, upper: number | null): NumericRange => between('temperature', '°C', lower === null ? UNLIMITED : closed(lower), upper === null ? UNLIMITED : closed(upper))
const unknown = unknownNumeric('temperature', '°C')
const nothing = numericRange('temperature', '°C', [])
const lacking = (side: CouponSide, field: string, what: string) => ({ sure: nothing, maybe: unknown, tested: null, reason: `${side.coupon.number} has no ${what} recorded.`, missing: [`${side.coupon.number}: ${field}`] })

export const preheat = bandRule({
  meta: meta('preheat', { title: 'Preheat temperature', clause: '8.4.8', basis: 'read', combine: 'union', statement: 'The preheat is not below that of the coupon; down to 50 °C lower must be looked up, further is outside.' }),
  field: 'preheat.minimum',
  at: 'weld',
  label: 'minimum preheat',
  dimension: 'temperature',
  ends: { min: '', max: '' },
  asked(context) {
    const asked = siFigure(context.procedure.preheat.minimum, 'temperature')
    return asked === null ? null : { min: asked, max: asked }
  },
  band(_context, side) {
    const had = siFigure(side.variables.preheat.minimum, 'temperature')
    if (had === null) return lacking(side, 'preheat.minimum', 'preheat')
    return { sure: degrees(had, null), maybe: degrees(tidy(had - STEP), null), tested: had, reason: `${show(had, '°C')} at the start of the test is the lowest.`, why: WHY }
  },
  plan: (asked) => `A coupon preheated to at most ${show(asked.min ?? 0, '°C')}.`,
})

/** Highest interpass temperature of a coupon: as recorded, else the highest of its run sheet. */
function highestInterpass({ coupon, variables }: CouponSide): number | null {
  const recorded = siFigure(variables.preheat.interpassMaximum, 'temperature')
  if (recorded !== null) return recorded
  const rows = coupon.content.runSheet.flatMap((row) => siFigure(row.interpass, 'temperature') ?? [])
  return rows.length === 0 ? null : Math.max(...rows)
}

export const interpass = bandRule({
  meta: meta('interpass', { title: 'Interpass temperature', clause: '8.4.9', basis: 'read', combine: 'union', statement: 'The interpass temperature is not above the highest of the coupon; up to 50 °C higher must be looked up, further is outside. A single run has none.' }),
  field: 'preheat.interpassMaximum',
  at: 'weld',
  label: 'maximum interpass temperature',
  dimension: 'temperature',
  ends: { min: '', max: '' },
  applies: (context) => context.procedure.processes.length > 1 || context.block?.technique.passesPerSide !== 'single' || context.procedure.preheat.interpassMaximum !== null,
  asked(context) {
    const asked = siFigure(context.procedure.preheat.interpassMaximum, 'temperature')
    return asked === null ? null : { min: asked, max: asked }
  },
  band(_context, side) {
    const had = highestInterpass(side)
    if (had === null) return lacking(side, 'preheat.interpassMaximum', 'interpass temperature')
    return { sure: degrees(null, had), maybe: degrees(null, tidy(had + STEP)), tested: had, reason: `${show(had, '°C')} was the highest of the test.`, why: WHY }
  },
  plan: (asked) => `A coupon welded with an interpass temperature of ${show(asked.max ?? 0, '°C')}.`,
})

const says = (variables: WeldingVariables): boolean => variables.postHeating !== null && variables.postHeating !== undefined && (variables.postHeating.used !== null || variables.postHeating.temperature !== null || variables.postHeating.time !== null)

/** Judged where either record speaks of it. */
export const postHeating: Rule = {
  meta: meta('post-heating', { title: 'Hydrogen release', clause: '8.4.10', basis: 'read', statement: 'Post-heating for hydrogen release may be added, but not left out, and neither its temperature nor its time reduced.' }),
  field: 'postHeating',
  at: 'weld',
  label: 'Hydrogen release',
  applies: (context) => says(context.procedure) || context.coupons.some((coupon) => says(coupon.content.variables)),
  range: () => null,
  check(context, sides): RuleVerdict | null {
    if (!says(context.procedure) && !sides.some((side) => says(side.variables))) return null
    const own = context.procedure.postHeating
    const verdicts = sides.map((side): RuleVerdict => {
      const had = side.variables.postHeating
      if (!had || had.used === null) return cannotTell(`${side.coupon.number} does not record whether it was post-heated.`, [`${side.coupon.number}: postHeating`])
      if (!had.used) return { verdict: 'within', sentence: `${side.coupon.number} was welded without post-heating, which may be added but is not needed.`, asked: null, range: null }
      if (!own || own.used === null) return cannotTell(`${side.coupon.number} was post-heated; whether the procedure asks for it isn't stated.`, ['procedure: postHeating'])
      if (!own.used) return { verdict: 'outside', sentence: `${side.coupon.number} was post-heated, and the procedure leaves it out.`, asked: ['none'], range: null, fixes: [{ kind: 'plan-coupon', label: 'Weld a coupon without post-heating', requirement: 'A coupon without post-heating.' }] }
      for (const [field, dimension, unit] of [['temperature', 'temperature', '°C'], ['time', 'time', 'min']] as const) {
        const asked = siFigures(own[field], dimension)
        const tested = siFigures(had[field], dimension)
        const low = asked.min ?? asked.max
        const needed = tested.min ?? tested.max
        if (low === null || needed === null) return cannotTell(`The ${field} of post-heating isn't recorded on both sides.`, [`${low === null ? 'procedure' : side.coupon.number}: postHeating.${field}`])
        if (low < needed) return { verdict: 'outside', sentence: `Post-heating ${field} ${show(low, unit)} is below the ${show(needed, unit)} of ${side.coupon.number}.`, asked: { min: low, max: asked.max }, range: between(dimension, unit, closed(needed), UNLIMITED), field: `postHeating.${field}` }
      }
      return { verdict: 'within', sentence: `Post-heating is not less than that of ${side.coupon.number}.`, asked: null, range: null }
    })
    return verdicts.find(({ verdict }) => verdict === 'within') ?? verdicts.find(({ verdict }) => verdict === 'cannot-tell') ?? verdicts[0] ?? null
  },
}

const CONDITION: Readonly<Record<string, string>> = { none: 'no heat treatment after welding' }
const condition = (variables: WeldingVariables): readonly string[] | null => (variables.pwht.condition === null ? null : [CONDITION[variables.pwht.condition] ?? variables.pwht.condition.replaceAll('-', ' ')])

export const pwhtCondition = nameBandRule({
  meta: meta('pwht', { title: 'Heat treatment after welding', clause: '8.4.11', basis: 'read', statement: 'Heat treatment after welding may be neither added nor left out, and its kind stays as tested.' }),
  field: 'pwht.condition',
  at: 'weld',
  label: 'heat treatment after welding',
  asked: (context) => condition(context.procedure),
  tested: (_context, side) => condition(side.variables),
  because: 'Neither added nor omitted; the kind stays as tested.',
})

export const pwhtTemperature = levelTwoLimit(
  bandRule({
    meta: meta('pwht-temperature', { title: 'Holding temperature', clause: '8.4.11', basis: 'read', statement: 'The holding temperature stays within 20 °C of that tested, unless the application says otherwise. That is a rule of level 2.' }),
    field: 'pwht.temperature',
    at: 'weld',
    label: 'holding temperature',
    dimension: 'temperature',
    applies: (context) => context.procedure.pwht.condition !== null && context.procedure.pwht.condition !== 'none',
    asked: (context) => askedInterval(context.procedure.pwht.temperature, 'temperature'),
    band(_context, side) {
      if (side.variables.pwht.condition === 'none') return null
      const read = siFigures(side.variables.pwht.temperature, 'temperature')
      const low = read.min ?? read.max
      const high = read.max ?? read.min
      if (low === null || high === null) return lacking(side, 'pwht.temperature', 'holding temperature')
      const sure = high - low > 40 ? nothing : degrees(tidy(high - 20), tidy(low + 20))
      return { sure, maybe: degrees(tidy(low - 20), tidy(high + 20)), tested: low === high ? low : null, reason: `Held at ${low === high ? show(low, '°C') : `${show(low, '°C')} to ${show(high, '°C')}`}: 20 °C either side.`, why: 'The test was held over a range; what lies within 20 °C of only one of its ends must be judged by a person.' }
    },
  }),
)

/** Groups whose condition before welding counts: precipitation-hardening steels and nickel alloys. */
const hardens = (variables: WeldingVariables): boolean => [variables.baseMetals.a, secondMember(variables)].some((metal) => { const group = materialGroup(metal); return group !== null && ((group.main === 3 && group.sub === 3) || (group.main === 7 && group.sub === 3)) })
const before = (variables: WeldingVariables): readonly string[] | null => {
  const list = [variables.baseMetals.a, secondMember(variables)].map((metal) => metal.condition)
  return list.every((text) => text) ? [list.map((text) => sameText(text ?? '')).sort().join(' and ')] : null
}

export const initialHeatTreatment = nameBandRule({
  meta: meta('initial-heat-treatment', { title: 'Condition before welding', clause: '8.4.12', basis: 'read', statement: 'Of precipitation-hardening parent metal (groups 3.3 and 7.3) the heat-treatment condition before welding stays as tested.' }),
  field: 'baseMetals.a.condition',
  at: 'weld',
  label: 'condition of the parent metal before welding',
  applies: (context) => hardens(context.procedure),
  asked: (context) => before(context.procedure),
  tested: (_context, side) => before(side.variables),
  because: 'The condition before welding stays as tested.',
})

