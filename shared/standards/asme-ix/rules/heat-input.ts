/** QW-409.1: with toughness, heat input may not rise above the coupon's; judged at the worst corner of the procedure, or by its stated cap. */
import { heatInputInstantaneous, heatInputMeter } from '../../../calculations/heat-input.ts'
import { between, closed, UNLIMITED, unknownNumeric } from '../../../ranges/numeric.ts'
import type { CouponContent, Electrical, RunRow } from '../../../schemas/welding.ts'
import type { Interval } from '../../../schemas/common.ts'
import type { UnitSystem } from '../../../units/types.ts'
import { figures, inUnitOf, tidy, unitOf } from '../../common/reading.ts'
import { figureRule } from '../../common/rule-kinds.ts'
import { show } from '../../common/wording.ts'
import type { CouponSide, Rule } from '../../rule.ts'
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

/** The largest heat input that the procedure lets happen, in the judging system. */
function asked(electrical: Electrical, system: UnitSystem): Known {
  if (electrical.heatInputMethod === 'volume') return { missing: ['electrical.heatInputMethod (weld metal volumes are not compared here)'] }
  const wave = waveform(electrical)
  if (wave === null) return { missing: ['electrical.waveformControlled'] }
  const cap = figures(electrical.heatInput, 'heatInput', system)
  const stated = cap.max ?? cap.min
  if (stated !== null) return wave && !isInstantaneous(electrical) ? { missing: ['electrical.heatInputMethod (instantaneous energy or power, because the waveform is controlled)'] } : { value: stated, from: 'the stated cap' }
  if (wave) return { missing: ['electrical.heatInput (from instantaneous energy or power, because the waveform is controlled)'] }
  const volts = figures(electrical.voltage, 'voltage', system)
  const amps = figures(electrical.current, 'current', system)
  const speed = figures(electrical.travelSpeed, 'travelSpeed', 'SI')
  const V = volts.max ?? volts.min
  const A = amps.max ?? amps.min
  const v = speed.min ?? speed.max
  if (V === null || A === null || v === null || v <= 0) return { missing: [...(V === null ? ['electrical.voltage'] : []), ...(A === null ? ['electrical.current'] : []), ...(v === null || v <= 0 ? ['electrical.travelSpeed'] : [])] }
  return { value: shownUnit(heatInputMeter({ voltage: V, current: A, travelSpeed: v }), system), from: `the worst corner: ${V} V, ${A} A, ${v} mm/min` }
}

/** Middle of what was observed, so that the coupon's figure is never made larger than what was welded. */
const middle = (interval: Interval | null): number | null => {
  const { min, max } = figures(interval, 'voltage', 'SI')
  return min !== null && max !== null ? (min + max) / 2 : (min ?? max)
}

/** Heat input of one row of the run sheet in kJ/mm; null when a reading is missing. */
function rowHeatInput(row: RunRow, wave: boolean): number | null {
  const length = row.length?.si ?? null
  if (row.instantaneousEnergy && length !== null && length > 0) return heatInputInstantaneous({ energy: row.instantaneousEnergy.si, length })
  if (wave) return null
  const voltage = middle(row.voltage)
  const current = middle(row.current)
  const arcTime = row.arcTime?.si ?? null
  const travelSpeed = middle(row.travelSpeed) ?? (length !== null && arcTime !== null && arcTime > 0 ? (length / arcTime) * 60 : null)
  return voltage === null || current === null || travelSpeed === null || travelSpeed <= 0 ? null : heatInputMeter({ voltage, current, travelSpeed })
}

function fromRunSheet(content: CouponContent, blockId: string, wave: boolean): number | null {
  let most: number | null = null
  for (const row of content.runSheet) {
    if (row.processId !== blockId) continue
    const value = rowHeatInput(row, wave)
    if (value !== null && (most === null || value > most)) most = value
  }
  return most
}

/** The largest heat input that the coupon had. */
function tested(side: CouponSide, system: UnitSystem): Known {
  const electrical = side.block?.electrical
  if (!electrical || !side.block) return { missing: ['electrical'] }
  if (electrical.heatInputMethod === 'volume') return { missing: ['electrical.heatInputMethod (weld metal volumes are not compared here)'] }
  const wave = waveform(electrical)
  if (wave === null) return { missing: ['electrical.waveformControlled'] }
  const recorded = figures(electrical.heatInput, 'heatInput', system)
  const stated = recorded.max ?? recorded.min
  if (stated !== null) return wave && !isInstantaneous(electrical) ? { missing: ['electrical.heatInputMethod (instantaneous energy or power, because the waveform was controlled)'] } : { value: stated, from: 'as recorded' }
  const sheet = fromRunSheet(side.coupon.content, side.block.id, wave)
  if (sheet !== null) return { value: shownUnit(sheet, system), from: 'the largest of the run sheet' }
  if (wave) return { missing: ['runSheet (instantaneous energy, because the waveform was controlled)'] }
  const voltage = middle(electrical.voltage)
  const current = middle(electrical.current)
  const travelSpeed = middle(electrical.travelSpeed)
  if (voltage === null || current === null || travelSpeed === null || travelSpeed <= 0) return { missing: ['electrical.heatInput'] }
  return { value: shownUnit(heatInputMeter({ voltage, current, travelSpeed }), system), from: `${voltage} V, ${current} A, ${travelSpeed} mm/min` }
}

const base = figureRule({
  meta: meta('QW-409.1', 'heat-input'),
  field: 'electrical.heatInput',
  at: 'block',
  label: 'heat input',
  dimension: 'heatInput',
  asked(context) {
    const known = context.block ? asked(context.block.electrical, context.system) : null
    return known && 'value' in known ? { min: 0, max: known.value } : null
  },
  range(context, side) {
    const unit = unitOf('heatInput', context.system)
    const known = tested(side, context.system)
    const value = 'value' in known ? known.value : null
    if (exemptByHeatTreatment(side.variables) === true) return { range: between('heatInput', unit, UNLIMITED, UNLIMITED), tested: value, reason: 'The heat treatment after welding lifts the heat input limit.' }
    if ('missing' in known) return { range: unknownNumeric('heatInput', unit), tested: null, reason: `${side.coupon.number} does not give its heat input.`, missing: known.missing.map((field) => `${side.coupon.number}: ${field}`) }
    return { range: between('heatInput', unit, UNLIMITED, closed(known.value)), tested: known.value, reason: `${show(known.value, unit)} (${known.from}) is the most; no efficiency factor is used.` }
  },
  plan: (wanted, context) => `A coupon with toughness tests welded at ${show(wanted.max ?? 0, unitOf('heatInput', context.system))} or more.`,
})

export const heatInput: Rule = {
  ...base,
  check(context, sides, joined) {
    if (!context.block) return null
    const known = asked(context.block.electrical, context.system)
    if ('missing' in known) {
      const first = known.missing[0]?.split(' ')[0] ?? 'electrical.heatInput'
      const free = joined?.type === 'numeric' && joined.segments.some((segment) => segment.lower.kind === 'unlimited' && segment.upper.kind === 'unlimited')
      if (free) return { verdict: 'within', sentence: 'The heat treatment after welding lifts the heat input limit.', asked: null, range: joined }
      return { verdict: 'cannot-tell', sentence: "The procedure's highest heat input can't be told.", asked: null, range: joined, field: `${context.path}.${first}`, missing: known.missing.map((field) => `procedure: ${field}`), fixes: [{ kind: 'state', label: 'State a heat input cap', field: `${context.path}.electrical.heatInput` }] }
    }
    const judged = base.check(context, sides, joined)
    if (!judged) return judged
    const missing = judged.verdict === 'cannot-tell' ? sides.flatMap((side) => { const side_ = tested(side, context.system); return 'missing' in side_ ? side_.missing.map((field) => `${side.coupon.number}: ${field}`) : [] }) : judged.missing
    return { ...judged, missing, reasoning: [`Asked: ${known.from}.`, ...(judged.reasoning ?? [])] }
  },
}
