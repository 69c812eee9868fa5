/**
 * Arc energy and heat input of an arc weld: by meters, by instantaneous energy or power, and by volume.
 * Section IX knows no process efficiency; ISO multiplies by k. The two are never mixed: `arcEnergy` and `heatInput` are apart.
 */
import { processes } from '../library/processes.ts'
import { heatInputInstantaneous, heatInputMeter } from './heat-input.ts'
import { above, worksheet, written, type Calculation, type Source, type Worksheet } from './result.ts'

export const asmeHeatInputSource: Source = { standard: 'ASME BPVC Section IX', edition: '2021', clause: 'QW-409.1', basis: 'secondary', note: 'Three ways (a) meters, (b) volume, (c) instantaneous energy or power; Appendix H of 2023 was read, the formulas come from published descriptions. The detail of (b) is recalled.' }
export const isoHeatInputSource: Source = { standard: 'ISO/TR 18491 and ISO/TR 17671-1 (EN 1011-1)', edition: '2015 / 2002', clause: 'thermal efficiency table', basis: 'secondary', note: 'Efficiency k from teaching pages of a welding institute, two that agree.' }

/** ISO 4063 numbers with a thermal efficiency, with what they mean. Sub-processes inherit from the two-digit group. */
export const efficiencies: readonly { number: string; what: string; k: number }[] = processes.flatMap(({ iso_4063, thermal_efficiency_k: k }) => (k === null ? [] : iso_4063.map(({ no, what }) => ({ number: no, what, k }))))

export interface ArcEnergyFigures {
  /** kJ/mm, without efficiency. */
  arcEnergy: number
  kjPerIn: number
  jPerIn: number
  /** k and k × arc energy (kJ/mm); null where no process is given, as in Section IX. */
  efficiency: number | null
  heatInput: number | null
}

/** Warns of a likely slip in units. */
const plausible = (sheet: Worksheet, energy: number): void => {
  if (energy < 0.1 || energy > 10) sheet.outside(`An arc energy of ${written(energy)} kJ/mm is outside 0.1 to 10 kJ/mm, our own bounds for a likely slip; check the units of each figure.`)
}

function finish(sheet: Worksheet, energy: number, process: string | null): Calculation<ArcEnergyFigures> {
  plausible(sheet, energy)
  const [kjPerIn, jPerIn] = [energy * 25.4, energy * 25400]
  sheet.step('in inches', 'kJ/mm × 25.4', `${written(energy)} × 25.4`, kjPerIn, 'kJ/in')
  if (process === null) return sheet.done('kJ/mm', energy, { arcEnergy: energy, kjPerIn, jPerIn, efficiency: null, heatInput: null })
  const k = efficiencies.find(({ number }) => number === process)?.k
  if (k === undefined) {
    sheet.refuse('process', `Process ${process} has no thermal efficiency in the table; choose an arc process by its ISO 4063 number.`)
    return sheet.stop('kJ/mm')
  }
  const heatInput = sheet.step('heat input', 'Q = k × E', `${k} × ${written(energy)}`, k * energy, 'kJ/mm')
  return sheet.done('kJ/mm', heatInput, { arcEnergy: energy, kjPerIn, jPerIn, efficiency: k, heatInput })
}

/**
 * From meters: V × A × 60 / travel speed. For output that is not waveform-controlled.
 * @param given V, A, mm/min; `process` an ISO 4063 number for the ISO heat input, null for Section IX
 * @returns kJ/mm; `value` is the heat input with k where a process is given, else the arc energy
 */
export function arcEnergyByMeter({ voltage, current, travelSpeed, process = null }: { voltage: number; current: number; travelSpeed: number; process?: string | null }): Calculation<ArcEnergyFigures> {
  const sheet = worksheet(process === null ? asmeHeatInputSource : isoHeatInputSource)
  sheet.need('voltage', 'Voltage', voltage, { least: 0, unit: 'V' })
  sheet.need('current', 'Current', current, { least: 0, unit: 'A' })
  sheet.need('travelSpeed', 'Travel speed', travelSpeed, { above: 0, unit: 'mm/min' })
  if (sheet.refused) return sheet.stop('kJ/mm')
  const energy = heatInputMeter({ voltage, current, travelSpeed })
  sheet.step('arc energy', 'E = V × A × 60 / travel speed / 1000', `${written(voltage)} × ${written(current)} × 60 / ${written(travelSpeed)} / 1000`, energy, 'kJ/mm')
  sheet.note('Holds for output that is not waveform-controlled; with pulsed and like waveforms take instantaneous energy or power.')
  return finish(sheet, energy, process)
}

/**
 * From instantaneous energy (J) over the bead length (mm).
 * @returns kJ/mm
 */
export function arcEnergyByEnergy({ energy, length, process = null }: { energy: number; length: number; process?: string | null }): Calculation<ArcEnergyFigures> {
  const sheet = worksheet(process === null ? asmeHeatInputSource : isoHeatInputSource)
  sheet.need('energy', 'Instantaneous energy', energy, { least: 0, unit: 'J' })
  sheet.need('length', 'Bead length', length, { above: 0, unit: 'mm' })
  if (sheet.refused) return sheet.stop('kJ/mm')
  const value = heatInputInstantaneous({ energy, length })
  sheet.step('arc energy', 'E = energy / length / 1000', `${written(energy)} / ${written(length)} / 1000`, value, 'kJ/mm')
  return finish(sheet, value, process)
}

/**
 * From instantaneous power (W), arc time (s) and bead length (mm).
 * @returns kJ/mm
 */
export function arcEnergyByPower({ power, arcTime, length, process = null }: { power: number; arcTime: number; length: number; process?: string | null }): Calculation<ArcEnergyFigures> {
  const sheet = worksheet(process === null ? asmeHeatInputSource : isoHeatInputSource)
  sheet.need('power', 'Instantaneous power', power, { least: 0, unit: 'W' })
  sheet.need('arcTime', 'Arc time', arcTime, { above: 0, unit: 's' })
  sheet.need('length', 'Bead length', length, { above: 0, unit: 'mm' })
  if (sheet.refused) return sheet.stop('kJ/mm')
  const value = heatInputInstantaneous({ power, arcTime, length })
  sheet.step('arc energy', 'E = power × arc time / length / 1000', `${written(power)} × ${written(arcTime)} / ${written(length)} / 1000`, value, 'kJ/mm')
  return finish(sheet, value, process)
}

/** Travel speed of covered electrodes from the run-out: length (mm) over arc time (s). mm/min. */
export function speedFromRunOut({ length, arcTime }: { length: number; arcTime: number }): Calculation<{ travelSpeed: number }> {
  const sheet = worksheet(isoHeatInputSource)
  sheet.need('length', 'Run-out length', length, { above: 0, unit: 'mm' })
  sheet.need('arcTime', 'Arc time', arcTime, { above: 0, unit: 's' })
  if (sheet.refused) return sheet.stop('mm/min')
  const travelSpeed = sheet.step('travel speed', 'length / arc time × 60', `${written(length)} / ${written(arcTime)} × 60`, (length / arcTime) * 60, 'mm/min')
  return sheet.done('mm/min', travelSpeed, { travelSpeed })
}

export interface VolumeFigures { qualified: number; production: number; increase: boolean }
const volumeSource: Source = { ...asmeHeatInputSource, clause: 'QW-409.1(b)', basis: 'memory' }

/**
 * Volume method by bead size: width × thickness of the production bead against that of the qualification; mm in, mm² out.
 * An equal section is no increase.
 */
export function heatByBeadSize({ qualifiedWidth, qualifiedThickness, width, thickness }: { qualifiedWidth: number; qualifiedThickness: number; width: number; thickness: number }): Calculation<VolumeFigures> {
  const sheet = worksheet(volumeSource)
  for (const [input, label, value] of [['qualifiedWidth', 'Bead width of the qualification', qualifiedWidth], ['qualifiedThickness', 'Bead thickness of the qualification', qualifiedThickness], ['width', 'Bead width in production', width], ['thickness', 'Bead thickness in production', thickness]] as const) sheet.need(input, label, value, { above: 0, unit: 'mm' })
  if (sheet.refused) return sheet.stop('mm²')
  const qualified = sheet.step('bead of the qualification', 'width × thickness', `${written(qualifiedWidth)} × ${written(qualifiedThickness)}`, qualifiedWidth * qualifiedThickness, 'mm²')
  const production = sheet.step('bead in production', 'width × thickness', `${written(width)} × ${written(thickness)}`, width * thickness, 'mm²')
  const increase = above(production, qualified)
  sheet.note(increase ? 'The bead is larger than the one qualified: an increase of heat input.' : 'The bead is not larger than the one qualified: no increase of heat input.')
  return sheet.done('mm²', production, { qualified, production, increase })
}

/**
 * Volume method by electrode: weld length per length of electrode used (mm/mm). Less weld from the same electrode is an increase of heat input.
 */
export function heatByElectrodeLength({ qualifiedBead, qualifiedElectrode, bead, electrode }: { qualifiedBead: number; qualifiedElectrode: number; bead: number; electrode: number }): Calculation<VolumeFigures> {
  const sheet = worksheet(volumeSource)
  for (const [input, label, value] of [['qualifiedBead', 'Bead length of the qualification', qualifiedBead], ['qualifiedElectrode', 'Electrode length used in the qualification', qualifiedElectrode], ['bead', 'Bead length in production', bead], ['electrode', 'Electrode length used in production', electrode]] as const) sheet.need(input, label, value, { above: 0, unit: 'mm' })
  if (sheet.refused) return sheet.stop('')
  const qualified = sheet.step('qualification', 'bead length / electrode length', `${written(qualifiedBead)} / ${written(qualifiedElectrode)}`, qualifiedBead / qualifiedElectrode)
  const production = sheet.step('production', 'bead length / electrode length', `${written(bead)} / ${written(electrode)}`, bead / electrode)
  const increase = above(qualified, production)
  sheet.note(increase ? 'Each length of electrode makes less weld than in the qualification: an increase of heat input.' : 'Each length of electrode makes no less weld than in the qualification: no increase of heat input.')
  return sheet.done('', production, { qualified, production, increase })
}
