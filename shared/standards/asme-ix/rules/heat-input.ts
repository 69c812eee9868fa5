/** QW-409.1: with toughness, heat input may not rise above the coupon's; judged at the worst corner of the procedure, or by its stated cap. */
import { heatInputInstantaneous, heatInputMeter } from '../../../calculations/heat-input.ts'
import { between, closed, numericRange, UNKNOWN, UNLIMITED, unknownNumeric } from '../../../ranges/numeric.ts'
import type { CouponContent, Electrical, ProcessBlock, RunRow } from '../../../schemas/welding.ts'
import type { Interval } from '../../../schemas/common.ts'
import type { UnitSystem } from '../../../units/types.ts'
import { figures, inUnitOf, isStated, tidy, unitOf } from '../../common/reading.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { show } from '../../common/wording.ts'
import type { CouponSide, Rule } from '../../rule.ts'
import { unlessHeatTreated } from '../heat-treated.ts'
import { meta } from '../meta.ts'
import { exemptByHeatTreatment } from '../ranges.ts'

type Known = { value: number; from: string } | { missing: string[] }

/** Waveform control: null where it isn't said and the arc is pulsed, which usually means it. */
function waveform(electrical: Electrical): boolean | null {
  if (electrical.waveformControlled !== null) return electrical.waveformControlled
  return electrical.pulsed === true || electrical.transferMode === 'pulsed-spray' ? null : false
}

const isInstantaneous = (electrical: Electrical): boolean => electrical.heatInputMethod === 'instantaneous-energy' || electrical.heatInputMethod === 'instantaneous-power'

const shownUnit = (kJmm: number, system: UnitSystem): number => tidy(inUnitOf(kJmm, 'heatInput', system))

/** The largest heat input that the procedure lets happen, in the judging system: the stated cap, or the worst corner of any pass. */
function asked({ electrical, passes }: ProcessBlock, system: UnitSystem): Known {
  if (electrical.heatInputMethod === 'volume') return { missing: ['electrical.heatInputMethod (weld metal volumes are not compared here)'] }
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

/** Heat input that was surely reached (middle of the readings) and the most that they allow; one value where nothing was spread. */
interface Spread { sure: number; most: number }

/** From spread readings, kJ/mm; null when one is missing. */
function spreadOf(voltage: Interval | null, current: Interval | null, travelSpeed: Interval | number | null): Spread | null {
  const V = figures(voltage, 'voltage', 'SI')
  const A = figures(current, 'current', 'SI')
  const v = typeof travelSpeed === 'number' ? { min: travelSpeed, max: travelSpeed } : figures(travelSpeed, 'travelSpeed', 'SI')
  const ends = [V.min ?? V.max, V.max ?? V.min, A.min ?? A.max, A.max ?? A.min, v.min ?? v.max, v.max ?? v.min]
  const [v1, v2, a1, a2, s1, s2] = ends
  if (v1 == null || v2 == null || a1 == null || a2 == null || s1 == null || s2 == null || s1 <= 0) return null
  return {
    sure: heatInputMeter({ voltage: (v1 + v2) / 2, current: (a1 + a2) / 2, travelSpeed: (s1 + s2) / 2 }),
    most: heatInputMeter({ voltage: v2, current: a2, travelSpeed: s1 }),
  }
}

/** Heat input of one row of the run sheet; null when a reading is missing. */
function rowHeatInput(row: RunRow, wave: boolean): Spread | null {
  const length = row.length?.si ?? null
  if (row.instantaneousEnergy && length !== null && length > 0) {
    const value = heatInputInstantaneous({ energy: row.instantaneousEnergy.si, length })
    return { sure: value, most: value }
  }
  if (wave) return null
  const arcTime = row.arcTime?.si ?? null
  const measured = length !== null && length > 0 && arcTime !== null && arcTime > 0 ? (length / arcTime) * 60 : null
  return spreadOf(row.voltage, row.current, row.travelSpeed ?? measured)
}

/** The largest of the block's rows; null when no row gives one. */
function fromRunSheet(content: CouponContent, blockId: string, wave: boolean): Spread | null {
  let top: Spread | null = null
  for (const row of content.runSheet) {
    const value = row.processId === blockId ? rowHeatInput(row, wave) : null
    if (value) top = top ? { sure: Math.max(top.sure, value.sure), most: Math.max(top.most, value.most) } : value
  }
  return top
}

/** The largest heat input that the coupon had. */
function tested(side: CouponSide, system: UnitSystem): (Spread & { from: string }) | { missing: string[] } {
  const electrical = side.block?.electrical
  if (!electrical || !side.block) return { missing: ['electrical'] }
  if (electrical.heatInputMethod === 'volume') return { missing: ['electrical.heatInputMethod (weld metal volumes are not compared here)'] }
  const wave = waveform(electrical)
  if (wave === null) return { missing: ['electrical.waveformControlled'] }
  const recorded = figures(electrical.heatInput, 'heatInput', system)
  const stated = recorded.max ?? recorded.min
  if (stated !== null) return wave && !isInstantaneous(electrical) ? { missing: ['electrical.heatInputMethod (instantaneous energy or power, because the waveform was controlled)'] } : { sure: stated, most: stated, from: 'as recorded' }
  const shown = ({ sure, most }: Spread, from: string): Spread & { from: string } => ({ sure: shownUnit(sure, system), most: shownUnit(most, system), from })
  const sheet = fromRunSheet(side.coupon.content, side.block.id, wave)
  if (sheet) return shown(sheet, 'the largest of the run sheet')
  if (wave) return { missing: ['runSheet (instantaneous energy, because the waveform was controlled)'] }
  const spread = spreadOf(electrical.voltage, electrical.current, electrical.travelSpeed)
  return spread ? shown(spread, 'from voltage, current and travel speed') : { missing: ['electrical.heatInput'] }
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
    const known = tested(side, context.system)
    if (exemptByHeatTreatment(side.variables) === true) return { range: between('heatInput', unit, UNLIMITED, UNLIMITED), tested: 'sure' in known ? known.sure : null, reason: 'The heat treatment after welding lifts the heat input limit.' }
    if ('missing' in known) return { range: unknownNumeric('heatInput', unit), tested: null, reason: `${side.coupon.number} does not give its heat input.`, missing: known.missing.map((field) => `${side.coupon.number}: ${field}`) }
    const sure = { lower: UNLIMITED, upper: closed(known.sure) }
    if (known.most <= known.sure) return { range: numericRange('heatInput', unit, [sure]), tested: known.sure, reason: `${show(known.sure, unit)} (${known.from}) is the most; no efficiency factor is used.` }
    return {
      range: numericRange('heatInput', unit, [sure, { lower: UNLIMITED, upper: UNKNOWN }]),
      tested: known.sure,
      reason: `The readings are spread (${known.from}): ${show(known.sure, unit)} was surely reached, ${show(known.most, unit)} is the most that they allow; no efficiency factor is used.`,
      missing: [`${side.coupon.number}: electrical.heatInput`],
    }
  },
  plan: (wanted, context) => `A coupon with toughness tests welded at ${show(wanted.max ?? 0, unitOf('heatInput', context.system))} or more.`,
})

export const heatInput: Rule = unlessHeatTreated({
  ...base,
  check(context, sides, joined) {
    if (!context.block) return null
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
    if (judged.verdict !== 'cannot-tell') return Object.assign(judged, { reasoning: judged.reasoning ? [...reasoning, ...judged.reasoning] : reasoning })
    const spreads = sides.map((side) => tested(side, context.system))
    if (spreads.every((spread) => 'most' in spread && spread.most < known.value)) {
      // Above even the most that the readings allow.
      const most = Math.max(...spreads.map((spread) => ('most' in spread ? spread.most : 0)))
      judged = base.check(context, sides, between('heatInput', unitOf('heatInput', context.system), UNLIMITED, closed(most))) ?? judged
    }
    const missing = judged.verdict === 'cannot-tell' ? sides.flatMap((side, i) => { const spread = spreads[i]; return spread && 'missing' in spread ? spread.missing.map((field) => `${side.coupon.number}: ${field}`) : [`${side.coupon.number}: electrical.heatInput`] }) : judged.missing
    return { ...judged, missing, reasoning: [...reasoning, ...(judged.reasoning ?? [])] }
  },
})
