/** Heat input of an arc weld, without any process efficiency factor (ASME BPVC Section IX QW-409.1; secondary). */

/**
 * From meter readings: V × A × 60 / travel speed. For conventional (not waveform-controlled) power sources only.
 * @param input volts, amperes and mm/min
 * @returns kJ/mm
 * @throws RangeError when the travel speed is not above zero or a reading is negative
 */
export function heatInputMeter({ voltage, current, travelSpeed }: { voltage: number; current: number; travelSpeed: number }): number {
  if (!(travelSpeed > 0)) throw new RangeError('Travel speed must be above 0 mm/min to give a heat input')
  if (!(voltage >= 0) || !(current >= 0)) throw new RangeError('Voltage and current must not be negative')
  return (voltage * current * 60) / travelSpeed / 1000
}

/** What a power source with instantaneous read-out shows: the energy of the bead, or the power and the arc time. */
export type Instantaneous = { energy: number; length: number } | { power: number; arcTime: number; length: number }

/**
 * From instantaneous energy (J) or power (W) × arc time (s), over the bead length (mm).
 * @returns kJ/mm
 * @throws RangeError when the length is not above zero or a reading is negative
 */
export function heatInputInstantaneous(reading: Instantaneous): number {
  if (!(reading.length > 0)) throw new RangeError('Bead length must be above 0 mm to give a heat input')
  const energy = 'energy' in reading ? reading.energy : reading.power * reading.arcTime
  if (!(energy >= 0)) throw new RangeError('Energy must not be negative')
  return energy / reading.length / 1000
}
