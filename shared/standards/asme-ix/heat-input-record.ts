/** What a coupon's record tells of its heat input: the summary, the run sheet, and where the two contradict each other. */
import { heatInputInstantaneous, heatInputMeter } from '../../calculations/heat-input.ts'
import type { AssessedCoupon, CouponQualification } from '../../schemas/assessment.ts'
import type { Interval } from '../../schemas/common.ts'
import type { CouponContent, Electrical, RunRow } from '../../schemas/welding.ts'
import type { UnitSystem } from '../../units/types.ts'
import { figures, inUnitOf, tidy, unitOf } from '../common/reading.ts'
import { show } from '../common/wording.ts'
import type { CouponSide } from '../rule.ts'

/** Waveform control: null where it isn't said and the arc is pulsed, which usually means it. */
export function waveform(electrical: Electrical): boolean | null {
  if (electrical.waveformControlled !== null) return electrical.waveformControlled
  return electrical.pulsed === true || electrical.transferMode === 'pulsed-spray' ? null : false
}

export const isInstantaneous = (electrical: Electrical): boolean => electrical.heatInputMethod === 'instantaneous-energy' || electrical.heatInputMethod === 'instantaneous-power'

export const shownUnit = (kJmm: number, system: UnitSystem): number => tidy(inUnitOf(kJmm, 'heatInput', system))

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

/** The largest of the block's rows, and whether every row gives one; null when none does. */
function fromRunSheet(content: CouponContent, blockId: string, wave: boolean): (Spread & { complete: boolean }) | null {
  const rows = content.runSheet.filter((row) => row.processId === blockId).map((row) => rowHeatInput(row, wave))
  const read = rows.filter((value) => value !== null)
  if (read.length === 0) return null
  return { sure: Math.max(...read.map(({ sure }) => sure)), most: Math.max(...read.map(({ most }) => most)), complete: read.length === rows.length }
}

/** How far a recorded heat input may lie from the run sheet's: rounding stays inside (practice of reviewers). */
const AGREES = 0.02

export interface TestedHeatInput extends Spread { from: string; contradiction: string | null }

/** The recorded figure against the run sheet: where they differ the lower of the two supports, and the difference is named. */
function recordedAgainst(stated: number, sheet: (Spread & { complete: boolean }) | null, number: string, system: UnitSystem): TestedHeatInput {
  const unit = unitOf('heatInput', system)
  const recorded = { sure: stated, most: stated, from: 'as recorded', contradiction: null }
  if (!sheet) return recorded
  const [sure, most] = [shownUnit(sheet.sure, system), shownUnit(sheet.most, system)]
  const says = `${number} records a heat input of ${show(stated, unit)}, but the readings of its run sheet give ${sure === most ? show(sure, unit) : `${show(sure, unit)} to ${show(most, unit)}`}`
  // A row without readings may have been the hottest: then a lower run sheet contradicts nothing.
  if (sheet.complete && stated > most * (1 + AGREES)) return { sure, most, from: 'the largest of the run sheet, the lower of the two', contradiction: `${says} at most; the lower counts until the record is mended.` }
  if (stated < sure * (1 - AGREES)) return { ...recorded, from: 'as recorded, the lower of the two', contradiction: `${says}; the lower counts until the record is mended.` }
  return recorded
}


/** The largest heat input that the coupon had. */
export function testedHeatInput(side: Pick<CouponSide, 'coupon' | 'block'>, system: UnitSystem): TestedHeatInput | { missing: string[] } {
  const electrical = side.block?.electrical
  if (!electrical || !side.block) return { missing: ['electrical'] }
  if (electrical.heatInputMethod === 'volume') return { missing: ['electrical.heatInputMethod (energy, because the procedure is not limited by weld metal volume)'] }
  const wave = waveform(electrical)
  if (wave === null) return { missing: ['electrical.waveformControlled'] }
  const recorded = figures(electrical.heatInput, 'heatInput', system)
  const stated = recorded.max ?? recorded.min
  if (stated !== null) return wave && !isInstantaneous(electrical) ? { missing: ['electrical.heatInputMethod (instantaneous energy or power, because the waveform was controlled)'] } : recordedAgainst(stated, fromRunSheet(side.coupon.content, side.block.id, wave), side.coupon.number, system)
  const shown = ({ sure, most }: Spread, from: string): TestedHeatInput => ({ sure: shownUnit(sure, system), most: shownUnit(most, system), from, contradiction: null })
  const sheet = fromRunSheet(side.coupon.content, side.block.id, wave)
  if (sheet) return shown(sheet, 'the largest of the run sheet')
  if (wave) return { missing: ['runSheet (instantaneous energy, because the waveform was controlled)'] }
  const spread = spreadOf(electrical.voltage, electrical.current, electrical.travelSpeed)
  return spread ? shown(spread, 'from voltage, current and travel speed') : { missing: ['electrical.heatInput'] }
}

/** Blocks whose recorded heat input the run sheet contradicts, as what is missing before the coupon may be certified. */
export function heatInputContradictions(coupon: AssessedCoupon): CouponQualification['missing'] {
  const { unitSystem, processes } = coupon.content.variables
  return processes.flatMap((block, i) => {
    const known = testedHeatInput({ coupon, block }, unitSystem)
    return 'contradiction' in known && known.contradiction ? [{ field: `variables.processes.${i}.electrical.heatInput`, message: known.contradiction, clause: 'QW-409.1' }] : []
  })
}
