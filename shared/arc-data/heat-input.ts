/** Heat input of a recorded weld by ASME IX QW-409.1(c) (secondary): energy over length, or power over travel speed. No process efficiency. */
import { heatInputInstantaneous } from '../calculations/heat-input.ts'
import type { Interval } from '../schemas/common.ts'
import type { ArcFigures } from '../schemas/arc-data.ts'

export interface ArcHeatInput {
  /** kJ/mm */
  heatInput: number
  how: string
}

/** What is known of the weld besides the recording. Lengths mm, speeds mm/min. */
export interface RecordedWeld {
  weldLength: number | null
  /** Of the pass or bead that it is attached to. */
  length: number | null
  travelSpeed: Interval | null
  /** e.g. "pass 2" */
  of: string
}

const shown = (value: number): string => String(Number(value.toPrecision(5)))

/** null where neither a length nor a travel speed is known. Of a range of speeds the slowest counts: it gives the most heat. */
export function arcHeatInput({ energy, averageInstantaneousPower: power, gaps }: Pick<ArcFigures, 'energy' | 'averageInstantaneousPower'> & Partial<Pick<ArcFigures, 'gaps'>>, { weldLength, length, travelSpeed, of }: RecordedWeld): ArcHeatInput | null {
  const over = weldLength ?? length
  // Energy that was not recorded is missing from the sum, while its length is not: the figure can only be too low.
  const lost = gaps && gaps.duration > 0 ? `; too low where the arc burned in the ${shown(gaps.duration)} s that were not recorded` : ''
  if (over !== null && over > 0) return { heatInput: heatInputInstantaneous({ energy, length: over }), how: `energy ${shown(energy)} J over ${shown(over)} mm${weldLength === null ? `, the length of ${of}` : ''}${lost}` }
  const ends = [travelSpeed?.min?.si, travelSpeed?.max?.si].filter((end) => end !== undefined && end > 0) as number[]
  if (ends.length === 0) return null
  const slowest = Math.min(...ends)
  return { heatInput: (power * 60) / slowest / 1000, how: `power ${shown(power)} W over ${shown(slowest)} mm/min, ${ends.length > 1 && Math.max(...ends) > slowest ? 'the slowest travel speed' : 'the travel speed'} of ${of}` }
}
