/** Filler sizes by nominal class: 0.045 in is called 1.2 mm although it is 1.14 mm. Sizes from memory of AWS A5.02 and ISO 544. */
import type { UnitSystem } from '../units/types.ts'
import data from './data/electrodes-diameters.json' with { type: 'json' }

/** Inch label, exact inch and nominal mm of every size listed. */
export const fillerSizes: readonly { inch_label: string; inch: number; nominal_mm: number; forms: readonly string[] }[] = data.table
const TOLERANCE_MM = 0.005

/**
 * The name that a filler size goes by in the other system.
 * @param mm the exact size, e.g. 1.143
 * @returns `1.2 mm` for 0.045 in read in SI, `1/16 in` for 1.6 mm read in US; null for a size that is not listed, to be converted plainly
 */
export function fillerSizeName(mm: number, system: UnitSystem): string | null {
  const size = fillerSizes.find(({ inch, nominal_mm }) => Math.abs(inch * 25.4 - mm) <= TOLERANCE_MM || Math.abs(nominal_mm - mm) <= TOLERANCE_MM)
  if (!size) return null
  return system === 'SI' ? `${size.nominal_mm} mm` : `${size.inch_label} in`
}
