/**
 * What the settings of a bead come to: mean and RMS current, duty, power, drop, energy per length. Each figure says how it came about,
 * or why it can't be told. All are advisory: they never qualify anything.
 */
import { pulseFigures, wireArea } from '../calculations/pulse.ts'
import type { BeadContent } from '../schemas/trials.ts'
import { settle } from '../units/convert.ts'
import type { Dimension } from '../units/types.ts'
import { measuredSpread, settingOf, travelSpread, valueOf } from './bead-values.ts'

export const FIGURES = ['duty', 'meanCurrent', 'rmsCurrent', 'power', 'dropletVolume', 'dropletDiameter', 'energyPerLength', 'detachment'] as const
export type FigureKey = (typeof FIGURES)[number]
export const FIGURE: { readonly [F in FigureKey]: { label: string; unit: string; dimension: Dimension | null; formula: string } } = {
  duty: { label: 'Duty', unit: '', dimension: null, formula: 'frequency × on-time / 1000' },
  meanCurrent: { label: 'Mean current', unit: 'A', dimension: 'current', formula: 'duty × peak + (1 − duty) × background' },
  rmsCurrent: { label: 'RMS current', unit: 'A', dimension: 'current', formula: '√(duty × peak² + (1 − duty) × background²)' },
  power: { label: 'Average power', unit: 'W', dimension: null, formula: 'duty × peak V × peak A + (1 − duty) × background V × background A' },
  dropletVolume: { label: 'Wire per pulse', unit: 'mm³', dimension: null, formula: 'wire feed × wire section / frequency' },
  dropletDiameter: { label: 'Drop diameter', unit: 'mm', dimension: 'length', formula: '³√(6 × volume / π)' },
  energyPerLength: { label: 'Energy per length', unit: 'kJ/mm', dimension: 'heatInput', formula: 'average power × 60 / travel speed / 1000' },
  detachment: { label: 'Peak² × on-time', unit: 'A²s', dimension: null, formula: 'peak² × on-time / 1000' },
}

/** `model`: from the settings by the rectangular pulse; `measured`: read off a meter; `meters`: mean volts × mean amperes; `recorded`: volts × amperes sample by sample. */
export type How = 'model' | 'measured' | 'meters' | 'recorded'
export interface Told { value: number; how: How }
export interface BeadFigures {
  /** Pulsed by hand: frequency and on-time are known. */
  pulsed: boolean
  figures: Record<FigureKey, Told | null>
  /** Why a figure is missing, and what was assumed; sentences. */
  notes: string[]
  /** Settings that can't be together, e.g. an on-time longer than the period. */
  problems: string[]
}

/** What the figures are worked out from; storage units, null = not known. */
export interface PulseInputs { peakCurrent: number | null; backgroundCurrent: number | null; peakVoltage: number | null; backgroundVoltage: number | null; frequency: number | null; onTime: number | null; wireFeed: number | null; wireDiameter: number | null; travelSpeed: number | null }

const middleOf = (spread: { lo: number; hi: number } | null): number | null => (spread ? settle((spread.lo + spread.hi) / 2) : null)

/** @param dialled takes the wire feed as set although it was measured too: for comparing with a bead that is not welded yet */
export function pulseInputs(content: BeadContent, { dialled = false } = {}): PulseInputs {
  const of = (quantity: Parameters<typeof valueOf>[1]) => valueOf(content, quantity)?.value ?? null
  // A current that the panel sets is compared as set; one that it doesn't is known only where it was measured.
  const setOr = (quantity: Parameters<typeof valueOf>[1]) => settingOf(content, quantity) ?? of(quantity)
  return {
    peakCurrent: setOr('peakCurrent'), backgroundCurrent: setOr('backgroundCurrent'), peakVoltage: settingOf(content, 'peakVoltage'), backgroundVoltage: settingOf(content, 'backgroundVoltage'),
    frequency: settingOf(content, 'pulseFrequency'), onTime: settingOf(content, 'pulseOnTime'), wireFeed: dialled ? setOr('wireFeed') : of('wireFeed'), wireDiameter: content.wireDiameter?.si ?? null, travelSpeed: middleOf(travelSpread(content)),
  }
}

const told = (value: number | null | undefined, how: How): Told | null => (value === null || value === undefined || !Number.isFinite(value) ? null : { value, how })

/**
 * The figures of a bead.
 * @param inputs other inputs than the bead's own, e.g. with a current taken over from the bead before
 * @param recordedPower W, average instantaneous power of a recording of this bead's arc: it goes before any model
 */
export function beadFigures(content: BeadContent, inputs: PulseInputs = pulseInputs(content), recordedPower: number | null = null): BeadFigures {
  const figures = Object.fromEntries(FIGURES.map((key) => [key, null])) as Record<FigureKey, Told | null>
  const [notes, problems]: [string[], string[]] = [[], []]
  const { peakCurrent, backgroundCurrent, frequency, onTime, wireFeed, wireDiameter } = inputs
  const travelSpeed = inputs.travelSpeed !== null && inputs.travelSpeed > 0 ? inputs.travelSpeed : null
  if (inputs.travelSpeed !== null && travelSpeed === null) problems.push('Travel speed must be above 0 mm/min.')
  const pulsed = frequency !== null && onTime !== null && frequency > 0 && onTime > 0
  if (pulsed) {
    const duty = settle((frequency * onTime) / 1000)
    if (duty >= 1) problems.push(`An on-time of ${onTime} ms leaves no background: at ${frequency} Hz a period lasts ${settle(1000 / frequency).toFixed(2)} ms.`)
    else figures.duty = told(duty, 'model')
    if (wireFeed !== null && wireDiameter !== null && wireFeed > 0 && wireDiameter > 0) {
      const volume = (((wireFeed * 1000) / 60) * wireArea(wireDiameter)) / frequency
      figures.dropletVolume = told(volume, 'model')
      figures.dropletDiameter = told(Math.cbrt((6 * volume) / Math.PI), 'model')
    } else notes.push(wireDiameter === null ? 'Without the wire’s diameter no drop is told.' : 'Without a wire feed in a unit (a bare scale says none) no drop is told: measure it by cut length.')
    if (peakCurrent !== null && backgroundCurrent !== null) {
      const pulse = pulseFigures({ peakCurrent, backgroundCurrent, frequency, onTime, wireFeed: null, wireDiameter: null, peakVoltage: inputs.peakVoltage, backgroundVoltage: inputs.backgroundVoltage, travelSpeed })
      problems.push(...pulse.problems.map(({ message }) => message).filter((message) => duty < 1 || !message.includes('leaves no background')))
      if (pulse.figures) {
        const { meanCurrent, rmsCurrent, power, energyPerLength, detachment } = pulse.figures
        Object.assign(figures, { meanCurrent: told(meanCurrent, 'model'), rmsCurrent: told(rmsCurrent, 'model'), power: told(power, 'model'), energyPerLength: told(energyPerLength, 'model'), detachment: told(detachment, 'model') })
      }
    } else notes.push('Peak and background current are not both known: the panel does not set them, so a recorder that samples the pulse has to tell. Until then mean and RMS current can’t be worked out from the settings.')
  }
  const [current, voltage] = [middleOf(measuredSpread(content, 'current')), middleOf(measuredSpread(content, 'voltage'))]
  figures.meanCurrent ??= told(current, 'measured')
  if (recordedPower !== null) {
    figures.power = told(recordedPower, 'recorded')
    figures.energyPerLength = travelSpeed === null ? null : told((recordedPower * 60) / travelSpeed / 1000, 'recorded')
  }
  if (!figures.power && problems.length === 0) {
    const [amps, volts] = [current ?? settingOf(content, 'current'), voltage ?? settingOf(content, 'voltage')]
    if (amps !== null && volts !== null) {
      figures.power = told(amps * volts, 'meters')
      figures.energyPerLength = travelSpeed !== null ? told((amps * volts * 60) / travelSpeed / 1000, 'meters') : null
      const asSet = [...(current === null ? ['amperes'] : []), ...(voltage === null ? ['volts'] : [])]
      if (asSet.length > 0) notes.push(`Power counts the ${asSet.join(' and ')} as set, not as measured: arc volts are lower than those at the terminals, and amperes move with the stick-out.`)
      if (pulsed) notes.push('Power is mean volts × mean amperes. In a pulsed arc that is off, by a fifth for a usual pulse and to either side: attach a recording of the arc for the true figure.')
    } else if (pulsed) notes.push('Without the voltages of peak and background, or mean volts and amperes off a meter, no power or energy is told.')
  }
  if (figures.power && travelSpeed === null) notes.push('Without travel speed, or length and arc time, no energy per length is told.')
  return { pulsed, figures, notes, problems }
}

/** Usual aims; starting points, never limits. */
export const DROP_RATIO = { low: 0.8, high: 1.3, aim: 1.1, basis: 'common practice: one drop per pulse lies near the wire’s diameter, 0.8 to 1.3 times' } as const
export const DUTY = { low: 0.1, high: 0.5, basis: 'common practice' } as const
