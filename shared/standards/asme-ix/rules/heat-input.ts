/** QW-409.1: with toughness, heat input may not rise above the coupon's; judged at the worst corner of the procedure, or by its stated cap. */
import { heatInputMeter } from '../../../calculations/heat-input.ts'
import { between, closed, numericRange, UNKNOWN, UNLIMITED, unknownNumeric } from '../../../ranges/numeric.ts'
import type { Electrical, ProcessBlock } from '../../../schemas/welding.ts'
import type { UnitSystem } from '../../../units/types.ts'
import { figures, inUnitOf, isStated, unitOf } from '../../common/reading.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { show } from '../../common/wording.ts'
import type { CouponSide, Rule, RuleVerdict } from '../../rule.ts'
import { isInstantaneous, shownUnit, testedHeatInput, waveform } from '../heat-input-record.ts'
import { unlessHeatTreated } from '../heat-treated.ts'
import { meta } from '../meta.ts'
import { exemptByHeatTreatment } from '../ranges.ts'
import { byVolume, weldMetal } from './weld-metal.ts'

type Known = { value: number; from: string } | { missing: string[] }

/** The largest heat input that the procedure lets happen, in the judging system: the stated cap, or the worst corner of any pass. */
function asked({ electrical, passes }: ProcessBlock, system: UnitSystem): Known {
  const wave = waveform(electrical)
  if (wave === null) return { missing: ['electrical.waveformControlled'] }
  const cap = figures(electrical.heatInput, 'heatInput', system)
  const stated = cap.max ?? cap.min
  if (stated !== null) return wave && !isInstantaneous(electrical) ? { missing: ['electrical.heatInputMethod (instantaneous energy or power, because the waveform is controlled)'] } : { value: stated, from: 'the stated cap' }
  if (wave) return { missing: ['electrical.heatInput (from instantaneous energy or power, because the waveform is controlled)'] }
  // A pass with settings of its own may be hotter than the block; what it leaves open it takes from the block.
  const own = passes.filter((pass) => isStated(pass.voltage) || isStated(pass.current) || isStated(pass.travelSpeed))
  const corners = [corner(electrical, system), ...own.map((pass) => corner({ voltage: isStated(pass.voltage) ? pass.voltage : electrical.voltage, current: isStated(pass.current) ? pass.current : electrical.current, travelSpeed: isStated(pass.travelSpeed) ? pass.travelSpeed : electrical.travelSpeed }, system, ` of pass ${pass.number}`))]
  // Where every pass has its own settings the block's are not needed.
  const used = own.length === passes.length && own.length > 0 && corners[0] && 'missing' in corners[0] ? corners.slice(1) : corners
  const lacking = used.find((one) => 'missing' in one)
  if (lacking) return lacking
  return used.reduce((worst, one) => ('value' in one && 'value' in worst && one.value > worst.value ? one : worst))
}

/** Highest volts and amperes at the lowest speed. */
function corner(given: Pick<Electrical, 'voltage' | 'current' | 'travelSpeed'>, system: UnitSystem, where = ''): Known {
  const volts = figures(given.voltage, 'voltage', system)
  const amps = figures(given.current, 'current', system)
  const speed = figures(given.travelSpeed, 'travelSpeed', 'SI')
  const V = volts.max ?? volts.min
  const A = amps.max ?? amps.min
  const v = speed.min ?? speed.max
  if (V === null || A === null || v === null || v <= 0) return { missing: [...(V === null ? ['electrical.voltage'] : []), ...(A === null ? ['electrical.current'] : []), ...(v === null || v <= 0 ? ['electrical.travelSpeed'] : [])] }
  return { value: shownUnit(heatInputMeter({ voltage: V, current: A, travelSpeed: v }), system), from: `the worst corner${where}: ${V} V, ${A} A, ${show(inUnitOf(v, 'travelSpeed', system), unitOf('travelSpeed', system))}` }
}

const base = figureRule({
  meta: meta('QW-409.1', 'heat-input'),
  field: 'electrical.heatInput',
  at: 'block',
  label: 'heat input',
  dimension: 'heatInput',
  asked(context) {
    const known = context.block ? asked(context.block, context.system) : null
    return known && 'value' in known ? { min: 0, max: known.value } : null
  },
  range(context, side) {
    const unit = unitOf('heatInput', context.system)
    const known = testedHeatInput(side, context.system)
    if (exemptByHeatTreatment(side.variables) === true) return { range: between('heatInput', unit, UNLIMITED, UNLIMITED), tested: 'sure' in known ? known.sure : null, reason: 'The heat treatment after welding lifts the heat input limit.' }
    if ('missing' in known) return { range: unknownNumeric('heatInput', unit), tested: null, reason: `${side.coupon.number} does not give its heat input.`, missing: known.missing.map((field) => `${side.coupon.number}: ${field}`) }
    const sure = { lower: UNLIMITED, upper: closed(known.sure) }
    const doubt = known.contradiction ? `${known.contradiction} ` : ''
    if (known.most <= known.sure) return { range: numericRange('heatInput', unit, [sure]), tested: known.sure, reason: `${doubt}${show(known.sure, unit)} (${known.from}) is the most; no efficiency factor is used.` }
    return {
      range: numericRange('heatInput', unit, [sure, { lower: UNLIMITED, upper: UNKNOWN }]),
      tested: known.sure,
      reason: `${doubt}The readings are spread (${known.from}): ${show(known.sure, unit)} was surely reached, ${show(known.most, unit)} is the most that they allow; no efficiency factor is used.`,
      missing: [`${side.coupon.number}: electrical.heatInput`],
    }
  },
  plan: (wanted, context) => `A coupon with toughness tests welded at ${show(wanted.max ?? 0, unitOf('heatInput', context.system))} or more.`,
})

/** The verdict with what a run sheet says against the record. */
function told(sides: readonly CouponSide[], system: UnitSystem, judged: RuleVerdict): RuleVerdict {
  let { sentence } = judged
  for (const side of sides) {
    const had = side.coupon.content.runSheet.length > 0 ? testedHeatInput(side, system) : null
    if (had && 'contradiction' in had && had.contradiction) sentence += ` ${had.contradiction}`
  }
  return sentence === judged.sentence ? judged : { ...judged, sentence }
}

export const heatInput: Rule = unlessHeatTreated({
  ...base,
  range: (context, side) => (byVolume(context, side) ? weldMetal.range(context, side) : base.range(context, side)),
  check(context, sides, joined) {
    if (!context.block) return null
    if (byVolume(context)) {
      const ofMetal = weldMetal.check(context, sides, joined)
      return ofMetal && { ...ofMetal, basis: 'memory' }
    }
    const known = asked(context.block, context.system)
    if ('missing' in known) {
      const first = known.missing[0]?.split(' ')[0] ?? 'electrical.heatInput'
      const free = joined?.type === 'numeric' && joined.segments.some((segment) => segment.lower.kind === 'unlimited' && segment.upper.kind === 'unlimited')
      if (free) return { verdict: 'within', sentence: 'The heat treatment after welding lifts the heat input limit.', asked: null, range: joined }
      return { verdict: 'cannot-tell', sentence: "The procedure's highest heat input can't be told.", asked: null, range: joined, field: `${context.path}.${first}`, missing: known.missing.map((field) => `procedure: ${field}`), fixes: [{ kind: 'state', label: 'State a heat input cap', field: `${context.path}.electrical.heatInput` }] }
    }
    let judged = base.check(context, sides, joined)
    if (!judged) return judged
    const reasoning = [`Asked: ${known.from}.`]
    if (judged.verdict !== 'cannot-tell') return told(sides, context.system, Object.assign(judged, { reasoning: judged.reasoning ? [...reasoning, ...judged.reasoning] : reasoning }))
    const spreads = sides.map((side) => testedHeatInput(side, context.system))
    if (spreads.every((spread) => 'most' in spread && spread.most < known.value)) {
      // Above even the most that the readings allow.
      const most = Math.max(...spreads.map((spread) => ('most' in spread ? spread.most : 0)))
      judged = base.check(context, sides, between('heatInput', unitOf('heatInput', context.system), UNLIMITED, closed(most))) ?? judged
    }
    const missing = judged.verdict === 'cannot-tell' ? sides.flatMap((side, i) => { const spread = spreads[i]; return spread && 'missing' in spread ? spread.missing.map((field) => `${side.coupon.number}: ${field}`) : [`${side.coupon.number}: electrical.heatInput`] }) : judged.missing
    return told(sides, context.system, { ...judged, missing, reasoning: [...reasoning, ...(judged.reasoning ?? [])] })
  },
})
