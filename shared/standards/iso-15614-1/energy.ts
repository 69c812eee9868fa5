/** Heat input Q = k·U·I/v or arc energy E = U·I/v: what a record gives of either, and how one is read in terms of the other. */
import { heatInputInstantaneous, heatInputMeter } from '../../calculations/heat-input.ts'
import type { AssessedCoupon } from '../../schemas/assessment.ts'
import type { Interval } from '../../schemas/common.ts'
import type { Electrical, ProcessBlock, RunRow } from '../../schemas/welding.ts'
import { processFactor, siFigures } from '../common/iso-names.ts'
import { tidy } from '../common/reading.ts'

/** E = arc energy, Q = heat input with the factor k, null = the record doesn't say which. */
export type EnergyKind = 'E' | 'Q' | null
export interface Energy { low: number; mean: number; high: number; kind: EnergyKind; from: string }
export type Known = Energy | { missing: string[] }

/** Waveform control: null where it isn't said and the arc is pulsed, which usually means it. */
export function waveform(electrical: Electrical): boolean | null {
  if (electrical.waveformControlled !== null) return electrical.waveformControlled
  return electrical.pulsed === true || electrical.transferMode === 'pulsed-spray' ? null : false
}

const isInstantaneous = (electrical: Electrical): boolean => electrical.heatInputMethod === 'instantaneous-energy' || electrical.heatInputMethod === 'instantaneous-power'
const statedKind = (electrical: Electrical): EnergyKind => (electrical.heatInputQuantity === 'arc-energy' ? 'E' : electrical.heatInputQuantity === 'heat-input' ? 'Q' : null)

interface Corner { low: number; mean: number; high: number }

/** Lowest, middle and highest that three intervals allow; null when one is missing. */
function corners(voltage: Interval | null, current: Interval | null, travelSpeed: Interval | number | null): Corner | null {
  const V = siFigures(voltage, 'voltage')
  const A = siFigures(current, 'current')
  const v = typeof travelSpeed === 'number' ? { min: travelSpeed, max: travelSpeed } : siFigures(travelSpeed, 'travelSpeed')
  const [v1, v2, a1, a2, s1, s2] = [V.min ?? V.max, V.max ?? V.min, A.min ?? A.max, A.max ?? A.min, v.min ?? v.max, v.max ?? v.min]
  if (v1 === null || v2 === null || a1 === null || a2 === null || s1 === null || s2 === null || s1 <= 0) return null
  return {
    low: tidy(heatInputMeter({ voltage: v1, current: a1, travelSpeed: s2 })),
    mean: tidy(heatInputMeter({ voltage: (v1 + v2) / 2, current: (a1 + a2) / 2, travelSpeed: (s1 + s2) / 2 })),
    high: tidy(heatInputMeter({ voltage: v2, current: a2, travelSpeed: s1 })),
  }
}

function rowEnergy(row: RunRow, wave: boolean): number | null {
  const length = row.length?.si ?? null
  if (row.instantaneousEnergy && length !== null && length > 0 && row.instantaneousEnergy.si >= 0) return tidy(heatInputInstantaneous({ energy: row.instantaneousEnergy.si, length }))
  if (wave) return null
  const arcTime = row.arcTime?.si ?? null
  const measured = length !== null && length > 0 && arcTime !== null && arcTime > 0 ? (length / arcTime) * 60 : null
  return corners(row.voltage, row.current, row.travelSpeed ?? measured)?.mean ?? null
}

/** The energy that a procedure lets happen (no coupon) or that a coupon had. */
export function energyOf(block: ProcessBlock, coupon?: AssessedCoupon): Known {
  const { electrical } = block
  if (electrical.heatInputMethod === 'volume') return { missing: ['electrical.heatInputMethod (weld metal volumes are not compared here)'] }
  const wave = waveform(electrical)
  if (wave === null) return { missing: ['electrical.waveformControlled'] }
  const stated = siFigures(electrical.heatInput, 'heatInput')
  const high = stated.max ?? stated.min
  if (high !== null) {
    if (wave && !isInstantaneous(electrical)) return { missing: ['electrical.heatInputMethod (instantaneous energy or power, because the waveform is controlled)'] }
    const low = stated.min ?? (coupon ? high : 0)
    return { low, mean: tidy((low + high) / 2), high, kind: statedKind(electrical), from: 'as recorded' }
  }
  const rows = (coupon?.content.runSheet ?? []).flatMap((row) => (row.processId === block.id ? (rowEnergy(row, wave) ?? []) : []))
  if (rows.length > 0) return { low: Math.min(...rows), mean: tidy(rows.reduce((a, b) => a + b, 0) / rows.length), high: Math.max(...rows), kind: 'E', from: 'from the run sheet' }
  if (wave) return { missing: ['electrical.heatInput (from instantaneous energy or power, because the waveform is controlled)'] }
  const spread = corners(electrical.voltage, electrical.current, electrical.travelSpeed)
  return spread ? { ...spread, kind: 'E', from: 'from voltage, current and travel speed' } : { missing: ['electrical.heatInput'] }
}

/** Least and greatest factor by which a figure of kind `from` reads as one of kind `to`; they differ where a kind isn't said. */
export function factors(from: EnergyKind, to: EnergyKind, block: ProcessBlock): { least: number; greatest: number } {
  const k = processFactor(block)
  const all: number[] = []
  for (const a of from === null ? (['E', 'Q'] as const) : [from]) for (const b of to === null ? (['E', 'Q'] as const) : [to]) all.push(a === b ? 1 : a === 'E' ? k : 1 / k)
  return { least: Math.min(...all), greatest: Math.max(...all) }
}
