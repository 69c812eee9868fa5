/**
 * Pulsed arc: what the settings of a rectangular pulse come to, and what moves when one of them moves.
 * Mean, RMS and power follow from the definition; drop size by mass balance; detachment constants are starting data only.
 */
import { above, worksheet, written, type Calculation, type Source } from './result.ts'

export const pulseSource: Source = { standard: 'Rectangular pulse model', edition: '', clause: '', basis: 'memory', note: 'Plain arithmetic on the definition of the wave; one drop a pulse is assumed for the drop. Real ramps move the mean by some per cent.' }

export interface PulseSettings {
  /** A */
  peakCurrent: number
  backgroundCurrent: number
  /** Hz */
  frequency: number
  /** Time at peak in each pulse, ms. */
  onTime: number
  /** m/min; null = not known, then no drop is told. */
  wireFeed?: number | null
  /** mm */
  wireDiameter?: number | null
  /** V; without both no power is told. */
  peakVoltage?: number | null
  backgroundVoltage?: number | null
  /** mm/min; without it no energy per length of weld is told. */
  travelSpeed?: number | null
}

export interface PulseFigures {
  /** ms */
  period: number
  /** Share of the period at peak, 0 to 1. */
  duty: number
  /** A */
  meanCurrent: number
  rmsCurrent: number
  /** V; null without both voltages, with all of power and energy. */
  meanVoltage: number | null
  /** Average instantaneous power, W. */
  power: number | null
  /** Mean V × mean A, W: what meters would give. */
  meterPower: number | null
  /** power − meterPower, W: the part that meters miss. */
  missedPower: number | null
  /** power / meterPower. */
  powerRatio: number | null
  /** J of one pulse. */
  energyPerPulse: number | null
  /** J per mm of wire fed. */
  energyPerWire: number | null
  /** kJ/mm of weld, without efficiency. */
  energyPerLength: number | null
  /** Wire melted in each pulse, mm³: the drop if one drop leaves per pulse. */
  dropletVolume: number | null
  /** mm, of a sphere of that volume. */
  dropletDiameter: number | null
  /** Drop diameter over wire diameter. */
  dropletRatio: number | null
  /** Peak current² × on-time, A²s (n = 2). */
  detachment: number
}

/** Wire section, mm², of a diameter in mm. */
export const wireArea = (diameter: number): number => (Math.PI * diameter ** 2) / 4

/** Settings seen on a manual pulse panel (a machine's manual; secondary): outside them a figure is likely a slip. */
export const PULSE_PLAUSIBLE = { peakCurrent: [100, 565], backgroundCurrent: [10, 200], frequency: [20, 400], onTime: [1, 5] } as const

/**
 * What the settings of a manual pulse come to.
 * @returns `value` is the mean current in A; refuses a pulse that is longer than its period
 */
export function pulseFigures(settings: PulseSettings): Calculation<PulseFigures> {
  const { peakCurrent, backgroundCurrent, frequency, onTime, wireFeed = null, wireDiameter = null, peakVoltage = null, backgroundVoltage = null, travelSpeed = null } = settings
  const sheet = worksheet(pulseSource, { advisory: true })
  sheet.need('peakCurrent', 'Peak current', peakCurrent, { above: 0, unit: 'A' })
  sheet.need('backgroundCurrent', 'Background current', backgroundCurrent, { least: 0, unit: 'A' })
  sheet.need('frequency', 'Pulse frequency', frequency, { above: 0, unit: 'Hz' })
  sheet.need('onTime', 'Time at peak', onTime, { above: 0, unit: 'ms' })
  if (wireFeed !== null) sheet.need('wireFeed', 'Wire feed', wireFeed, { above: 0, unit: 'm/min' })
  if (wireDiameter !== null) sheet.need('wireDiameter', 'Wire diameter', wireDiameter, { above: 0, unit: 'mm' })
  if (peakVoltage !== null) sheet.need('peakVoltage', 'Peak voltage', peakVoltage, { least: 0, unit: 'V' })
  if (backgroundVoltage !== null) sheet.need('backgroundVoltage', 'Background voltage', backgroundVoltage, { least: 0, unit: 'V' })
  if (travelSpeed !== null) sheet.need('travelSpeed', 'Travel speed', travelSpeed, { above: 0, unit: 'mm/min' })
  if (!sheet.refused && backgroundCurrent > peakCurrent) sheet.refuse('backgroundCurrent', `Background current of ${written(backgroundCurrent)} A is above the peak of ${written(peakCurrent)} A.`)
  const duty = (frequency * onTime) / 1000
  if (!sheet.refused && duty >= 1) sheet.refuse('onTime', `Time at peak of ${written(onTime)} ms leaves no background: at ${written(frequency)} Hz a period lasts ${written(1000 / frequency)} ms.`)
  if (sheet.refused) return sheet.stop('A')

  for (const [key, label, value, unit] of [['peakCurrent', 'Peak current', peakCurrent, 'A'], ['backgroundCurrent', 'Background current', backgroundCurrent, 'A'], ['frequency', 'Pulse frequency', frequency, 'Hz'], ['onTime', 'Time at peak', onTime, 'ms']] as const) sheet.within(label, value, PULSE_PLAUSIBLE[key][0], PULSE_PLAUSIBLE[key][1], unit)
  const rest = 1 - duty
  const period = sheet.step('period', '1000 / frequency', `1000 / ${written(frequency)}`, 1000 / frequency, 'ms')
  sheet.step('duty', 'd = frequency × time at peak / 1000', `${written(frequency)} × ${written(onTime)} / 1000`, duty)
  const meanCurrent = sheet.step('mean current', 'd × peak + (1 − d) × background', `${written(duty)} × ${written(peakCurrent)} + ${written(rest)} × ${written(backgroundCurrent)}`, duty * peakCurrent + rest * backgroundCurrent, 'A')
  const rmsCurrent = sheet.step('RMS current', '√(d × peak² + (1 − d) × background²)', `√(${written(duty)} × ${written(peakCurrent)}² + ${written(rest)} × ${written(backgroundCurrent)}²)`, Math.sqrt(duty * peakCurrent ** 2 + rest * backgroundCurrent ** 2), 'A')
  const electric = { meanVoltage: null as number | null, power: null as number | null, meterPower: null as number | null, missedPower: null as number | null, powerRatio: null as number | null, energyPerPulse: null as number | null, energyPerWire: null as number | null, energyPerLength: null as number | null }
  if (peakVoltage === null || backgroundVoltage === null) sheet.note('Without peak and background voltage no power or energy is told.')
  else {
    const meanVoltage = sheet.step('mean voltage', 'd × peak V + (1 − d) × background V', `${written(duty)} × ${written(peakVoltage)} + ${written(rest)} × ${written(backgroundVoltage)}`, duty * peakVoltage + rest * backgroundVoltage, 'V')
    const power = sheet.step('average power', 'd × peak V × peak A + (1 − d) × background V × background A', `${written(duty)} × ${written(peakVoltage)} × ${written(peakCurrent)} + ${written(rest)} × ${written(backgroundVoltage)} × ${written(backgroundCurrent)}`, duty * peakVoltage * peakCurrent + rest * backgroundVoltage * backgroundCurrent, 'W')
    const meterPower = sheet.step('mean V × mean A', 'mean voltage × mean current', `${written(meanVoltage)} × ${written(meanCurrent)}`, meanVoltage * meanCurrent, 'W')
    const missedPower = sheet.step('missed by meters', 'd × (1 − d) × (peak V − background V) × (peak A − background A)', `${written(duty)} × ${written(rest)} × ${written(peakVoltage - backgroundVoltage)} × ${written(peakCurrent - backgroundCurrent)}`, duty * rest * (peakVoltage - backgroundVoltage) * (peakCurrent - backgroundCurrent), 'W')
    Object.assign(electric, {
      meanVoltage, power, meterPower, missedPower,
      powerRatio: meterPower > 0 ? power / meterPower : null,
      energyPerPulse: power / frequency,
      energyPerWire: wireFeed === null ? null : (power * 60) / (wireFeed * 1000),
      energyPerLength: travelSpeed === null ? null : sheet.step('energy per length', 'average power × 60 / travel speed / 1000', `${written(power)} × 60 / ${written(travelSpeed)} / 1000`, (power * 60) / travelSpeed / 1000, 'kJ/mm'),
    })
  }
  const droplet = { dropletVolume: null as number | null, dropletDiameter: null as number | null, dropletRatio: null as number | null }
  if (wireFeed !== null && wireDiameter !== null) {
    const volume = sheet.step('wire melted per pulse', 'feed in mm/s × wire section / frequency', `${written((wireFeed * 1000) / 60)} × ${written(wireArea(wireDiameter))} / ${written(frequency)}`, (((wireFeed * 1000) / 60) * wireArea(wireDiameter)) / frequency, 'mm³')
    const diameter = sheet.step('drop diameter', '³√(6 × volume / π)', `³√(6 × ${written(volume)} / π)`, Math.cbrt((6 * volume) / Math.PI), 'mm')
    Object.assign(droplet, { dropletVolume: volume, dropletDiameter: diameter, dropletRatio: diameter / wireDiameter })
    sheet.note('The drop is that of one drop per pulse; a drop of 1.0 to 1.2 times the wire is the usual aim.')
  }
  return sheet.done('A', meanCurrent, { period, duty, meanCurrent, rmsCurrent, ...electric, ...droplet, detachment: peakCurrent ** 2 * (onTime / 1000) })
}

const detachmentSource: Source = { standard: 'Detachment parameter', edition: '', clause: '', basis: 'memory', note: 'Textbook relation; n is about 2 for steel, published fits lie from 1.1 to 2.3. Constants are starting data of low confidence.' }
/** Starting windows of peak² × on-time, A²s, for 1.2 mm wire; recalled, to be replaced by the shop's own. */
export const DETACHMENT_START: readonly { wire: string; gas: string; from: number; to: number }[] = [
  { wire: 'carbon steel 1.2 mm', gas: 'argon-rich', from: 350, to: 650 },
  { wire: 'stainless steel 1.2 mm', gas: 'argon-rich', from: 400, to: 500 },
  { wire: 'aluminium 1.2 mm', gas: 'argon', from: 100, to: 150 },
]

/** Ip^n × tp with tp in seconds; ms in, A^n·s out. */
export function detachmentParameter({ peakCurrent, onTime, exponent = 2 }: { peakCurrent: number; onTime: number; exponent?: number }): Calculation<{ detachment: number }> {
  const sheet = worksheet(detachmentSource, { advisory: true })
  sheet.need('peakCurrent', 'Peak current', peakCurrent, { above: 0, unit: 'A' })
  sheet.need('onTime', 'Time at peak', onTime, { above: 0, unit: 'ms' })
  sheet.need('exponent', 'Exponent n', exponent, { above: 0 })
  if (sheet.refused) return sheet.stop('A^n·s')
  sheet.within('Exponent n', exponent, 1.1, 2.3)
  const detachment = sheet.step('detachment parameter', 'peak^n × time at peak in s', `${written(peakCurrent)}^${written(exponent)} × ${written(onTime / 1000)}`, peakCurrent ** exponent * (onTime / 1000), exponent === 2 ? 'A²s' : 'A^n·s')
  return sheet.done(exponent === 2 ? 'A²s' : 'A^n·s', detachment, { detachment })
}

/** Settings that bring another one along; null where the aim can't be reached. */
export const bringAlong = {
  /** Hz for a drop of `ratio` times the wire: 1.5 × feed / (ratio³ × diameter). m/min and mm in. */
  frequencyForDrop: ({ wireFeed, wireDiameter, ratio }: { wireFeed: number; wireDiameter: number; ratio: number }): number | null => (wireFeed > 0 && wireDiameter > 0 && ratio > 0 ? (1.5 * ((wireFeed * 1000) / 60)) / (ratio ** 3 * wireDiameter) : null),
  /** Hz that gives a wanted mean current, other settings fixed; null when it lies outside background to peak. */
  frequencyForMean: ({ meanCurrent, peakCurrent, backgroundCurrent, onTime }: { meanCurrent: number; peakCurrent: number; backgroundCurrent: number; onTime: number }): number | null => (meanCurrent > backgroundCurrent && meanCurrent < peakCurrent && onTime > 0 ? (1000 * (meanCurrent - backgroundCurrent)) / (peakCurrent - backgroundCurrent) / onTime : null),
  /** ms at another peak with the same detachment parameter. */
  onTimeForPeak: ({ peakCurrent, onTime, newPeak, exponent = 2 }: { peakCurrent: number; onTime: number; newPeak: number; exponent?: number }): number | null => (peakCurrent > 0 && onTime > 0 && newPeak > 0 ? onTime * (peakCurrent / newPeak) ** exponent : null),
  /** Hz at another feed with the same drop volume. */
  frequencyForFeed: ({ frequency, wireFeed, newFeed }: { frequency: number; wireFeed: number; newFeed: number }): number | null => (frequency > 0 && wireFeed > 0 && newFeed > 0 ? (frequency * newFeed) / wireFeed : null),
} as const

export type PulseSetting = 'peakVoltage' | 'wireFeed' | 'backgroundCurrent' | 'frequency' | 'onTime'
/** What raising one setting does, others fixed. Mean current and drop are exact for the model, the arc length is the usual direction (recalled). */
export const PULSE_EFFECTS: readonly { setting: PulseSetting; label: string; meanCurrent: string; meanPower: string; droplet: string; arcLength: 'longer' | 'shorter'; watch: string }[] = [
  { setting: 'peakVoltage', label: 'Peak voltage or trim', meanCurrent: 'up a little', meanPower: 'up', droplet: 'same', arcLength: 'longer', watch: 'Undercut and a wandering arc when high, stubbing when low.' },
  { setting: 'wireFeed', label: 'Wire feed', meanCurrent: 'same', meanPower: 'nearly same', droplet: 'up in proportion', arcLength: 'shorter', watch: 'Stubbing when it goes up and neither frequency nor time at peak follows.' },
  { setting: 'backgroundCurrent', label: 'Background current', meanCurrent: 'up by (1 − duty) × the change', meanPower: 'up', droplet: 'same', arcLength: 'longer', watch: 'Drops leave in the background when it is above the spray transition.' },
  { setting: 'frequency', label: 'Frequency', meanCurrent: 'up by time at peak × (peak − background) × the change', meanPower: 'up', droplet: 'down in proportion', arcLength: 'longer', watch: 'When high: duty must stay below 1, and drops get smaller than the wire.' },
  { setting: 'onTime', label: 'Time at peak', meanCurrent: 'up by frequency × (peak − background) × the change', meanPower: 'up', droplet: 'same', arcLength: 'longer', watch: 'Several drops per pulse when the detachment parameter is high.' },
]

const sampledSource: Source = { standard: 'Sampled volts and amperes', edition: '', clause: '', basis: 'memory', note: 'Multiply sample by sample, then average over time; the definition of average power.' }
export interface SampledFigures { power: number; meanVoltage: number; meanCurrent: number; rmsVoltage: number; rmsCurrent: number; meterPower: number }

/**
 * Averages of sampled data.
 * @param steps seconds that each sample stands for; left out = equal steps
 * @returns `value` is the average instantaneous power, W
 */
export function sampledPower({ voltages, currents, steps }: { voltages: readonly number[]; currents: readonly number[]; steps?: readonly number[] }): Calculation<SampledFigures> {
  const sheet = worksheet(sampledSource)
  if (voltages.length === 0) sheet.refuse('voltages', 'No samples are given.')
  else if (voltages.length !== currents.length) sheet.refuse('currents', `There are ${voltages.length} voltages but ${currents.length} currents; each sample needs both.`)
  else if (steps && steps.length !== voltages.length) sheet.refuse('steps', `There are ${voltages.length} samples but ${steps.length} time steps.`)
  const bad = [...voltages, ...currents].findIndex((value) => !Number.isFinite(value))
  if (!sheet.refused && bad >= 0) sheet.refuse(bad < voltages.length ? 'voltages' : 'currents', `Sample ${(bad % voltages.length) + 1} is no number.`)
  if (!sheet.refused && steps?.some((step) => !(step > 0))) sheet.refuse('steps', 'Every time step must be above 0 s.')
  if (sheet.refused) return sheet.stop('W')
  let [time, volts, amps, power, volts2, amps2] = [0, 0, 0, 0, 0, 0]
  voltages.forEach((voltage, index) => {
    const [current, step] = [currents[index] ?? 0, steps?.[index] ?? 1]
    time += step
    volts += voltage * step
    amps += current * step
    power += voltage * current * step
    volts2 += voltage ** 2 * step
    amps2 += current ** 2 * step
  })
  const [meanVoltage, meanCurrent] = [volts / time, amps / time]
  sheet.step('average power', 'mean of V × A', `over ${voltages.length} samples`, power / time, 'W')
  const meterPower = sheet.step('mean V × mean A', 'mean voltage × mean current', `${written(meanVoltage)} × ${written(meanCurrent)}`, meanVoltage * meanCurrent, 'W')
  if (above(Math.abs(meterPower - power / time), Math.abs(power / time) * 0.05)) sheet.note('Mean volts times mean amperes is more than 5 % off the true power: meters can\'t be used for this arc.')
  return sheet.done('W', power / time, { power: power / time, meanVoltage, meanCurrent, rmsVoltage: Math.sqrt(volts2 / time), rmsCurrent: Math.sqrt(amps2 / time), meterPower })
}
