/** What a run sheet tells: travel speed from length and arc time, and the heat input of every bead. Computed, never typed. */
import type { Interval } from '../schemas/common.ts'
import type { ProcessBlock, RunRow } from '../schemas/welding.ts'
import { heatInputInstantaneous, heatInputMeter } from './heat-input.ts'

/**
 * Travel speed in mm/min from bead length (mm) and arc time (s).
 * @throws RangeError when either is not above zero
 */
export function travelSpeedFrom(length: number, arcTime: number): number {
  if (!(length > 0 && arcTime > 0)) throw new RangeError('Bead length and arc time must be above 0 to give a travel speed')
  return (length / arcTime) * 60
}

export interface Span { min: number; max: number }
export interface RowHeatInput {
  /** kJ/mm; equal ends for one reading. null when it can't be told. */
  heatInput: Span | null
  /** mm/min, read or computed. */
  travelSpeed: Span | null
  method: 'meter' | 'instantaneous-energy' | null
  /** What the row lacks, in words. */
  missing: string[]
  /** What does not agree within the row, in words. */
  doubts: string[]
  how: string | null
}

/** Both ends; a single end counts for both, as it is the only reading there is. */
function span(interval: Interval | null): Span | null {
  const [min, max] = [interval?.min?.si ?? interval?.max?.si, interval?.max?.si ?? interval?.min?.si]
  return min === undefined || max === undefined ? null : { min, max }
}

const SPEEDS_AGREE = 0.1

function speedOf(row: RunRow): { speed: Span | null; doubts: string[] } {
  const read = span(row.travelSpeed)
  const computed = row.length && row.arcTime && row.length.si > 0 && row.arcTime.si > 0 ? travelSpeedFrom(row.length.si, row.arcTime.si) : null
  const apart = read && computed !== null && (computed < read.min * (1 - SPEEDS_AGREE) || computed > read.max * (1 + SPEEDS_AGREE))
  return {
    speed: read ?? (computed === null ? null : { min: computed, max: computed }),
    doubts: apart ? [`Pass ${row.pass}: length and arc time give ${Math.round(computed)} mm/min, the travel speed reads ${Math.round(read.min)}${read.max === read.min ? '' : `–${Math.round(read.max)}`} mm/min. Check which one was measured.`] : [],
  }
}

/**
 * Heat input of one row, without process efficiency (ASME IX QW-409.1; secondary).
 * Instantaneous energy over bead length where it is recorded; else meter readings, unless the waveform is controlled, where mean
 * volts times mean amperes do not give the energy (Section IX Appendix H; read).
 * @param waveformControlled of the row's process block; null = not stated, then meter readings are taken and the doubt is named
 */
export function rowHeatInput(row: RunRow, waveformControlled: boolean | null): RowHeatInput {
  const { speed, doubts } = speedOf(row)
  const lacking = (missing: string[]): RowHeatInput => ({ heatInput: null, travelSpeed: speed, method: null, missing, doubts, how: null })
  if (row.instantaneousEnergy) {
    if (!row.length || row.length.si <= 0) return lacking(['bead length'])
    const value = heatInputInstantaneous({ energy: row.instantaneousEnergy.si, length: row.length.si })
    return { heatInput: { min: value, max: value }, travelSpeed: speed, method: 'instantaneous-energy', missing: [], doubts, how: `${row.instantaneousEnergy.si} J / ${row.length.si} mm` }
  }
  if (waveformControlled === true) return lacking(['instantaneous energy from the power source (the waveform is controlled, so volts and amperes do not give the heat input)'])
  const [voltage, current] = [span(row.voltage), span(row.current)]
  const missing = [...(voltage ? [] : ['voltage']), ...(current ? [] : ['current']), ...(speed && speed.min > 0 ? [] : ['travel speed, or bead length and arc time'])]
  if (!voltage || !current || !speed || speed.min <= 0) return lacking(missing)
  const open = waveformControlled === null ? [`Pass ${row.pass}: whether the waveform is controlled is not stated; the meter readings hold only if it is not.`] : []
  return {
    heatInput: { min: heatInputMeter({ voltage: voltage.min, current: current.min, travelSpeed: speed.max }), max: heatInputMeter({ voltage: voltage.max, current: current.max, travelSpeed: speed.min }) },
    travelSpeed: speed,
    method: 'meter',
    missing: [],
    doubts: [...doubts, ...open],
    how: `${voltage.max} V × ${current.max} A × 60 / ${Number(speed.min.toFixed(1))} mm/min`,
  }
}

export interface RunSheetSummary {
  processId: string
  passes: number
  /** kJ/mm over all rows that have one; `complete` only if every row has. */
  heatInput: Span | null
  complete: boolean
  /** Highest interpass temperature recorded, °C. */
  maxInterpass: number | null
  missing: string[]
}

/** Heat input and interpass of each process block over the run sheet, in the blocks' order. */
export function summarizeRunSheet(rows: readonly RunRow[], blocks: readonly Pick<ProcessBlock, 'id' | 'electrical'>[]): RunSheetSummary[] {
  return blocks.map(({ id, electrical }) => {
    const own = rows.filter(({ processId }) => processId === id)
    const read = own.map((row) => ({ row, reading: rowHeatInput(row, electrical.waveformControlled) }))
    const inputs = read.flatMap(({ reading }) => (reading.heatInput ? [reading.heatInput] : []))
    const interpass = own.flatMap((row) => (row.interpass ? [row.interpass.si] : []))
    return {
      processId: id,
      passes: own.length,
      heatInput: inputs.length > 0 ? { min: Math.min(...inputs.map(({ min }) => min)), max: Math.max(...inputs.map(({ max }) => max)) } : null,
      complete: own.length > 0 && inputs.length === own.length,
      maxInterpass: interpass.length > 0 ? Math.max(...interpass) : null,
      missing: read.flatMap(({ row, reading }) => reading.missing.map((what) => `Pass ${row.pass}: ${what}`)),
    }
  })
}
