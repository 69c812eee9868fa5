/** Calculators of heat input. */
import { arcEnergyByEnergy, arcEnergyByMeter, arcEnergyByPower, asmeHeatInputSource, efficiencies, heatByBeadSize, heatByElectrodeLength, isoHeatInputSource, speedFromRunOut } from '../arc-energy.ts'
import { calculator, type Calculator } from './define.ts'
import { choice, number, quantity } from './inputs.ts'

const VALIDITY = 'Any weld; a result outside 0.1 to 10 kJ/mm is likely a slip in units.'
const energyOutputs = [{ key: 'arcEnergy', label: 'Heat input', dimension: 'heatInput' }, { key: 'kjPerIn', label: 'In kJ/in', unit: 'kJ/in', decimals: 1 }, { key: 'jPerIn', label: 'In J/in', unit: 'J/in', decimals: 0 }] as const
const isoOutputs = [{ key: 'heatInput', label: 'Heat input Q', dimension: 'heatInput' }, { key: 'arcEnergy', label: 'Arc energy E', dimension: 'heatInput' }, { key: 'efficiency', label: 'Thermal efficiency k', decimals: 1 }] as const
const meter = { voltage: quantity('v', 'Voltage', 'voltage', 24, { least: 0 }), current: quantity('i', 'Current', 'current', 180, { least: 0 }), travelSpeed: quantity('s', 'Travel speed', 'travelSpeed', 250) }
const process = choice('p', 'Process', efficiencies.map(({ number: value, what }) => ({ value, label: `${value} ${what}` })), '111')
const volumeOutputs = [{ key: 'production', label: 'In production' }, { key: 'qualified', label: 'In the qualification' }, { key: 'increase', label: 'Increase of heat input' }] as const

export const heatCalculators: readonly Calculator[] = [
  calculator({
    id: 'heat-input-meter', title: 'Heat input from meters', group: 'heat', purpose: 'Heat input of Section IX from volts, amperes and travel speed.',
    inputs: meter, outputs: energyOutputs, calculate: arcEnergyByMeter,
    formula: ['heat input = V × A × 60 / travel speed', 'mm/min gives J/mm, in/min gives J/in'],
    source: { ...asmeHeatInputSource, clause: 'QW-409.1(a)' }, validity: `${VALIDITY} Not for waveform-controlled output.`,
    example: { from: 'calc-g-hi-01', expect: { arcEnergy: { value: 1.0368, within: 0.001 }, kjPerIn: { value: 26.335, within: 0.02 }, jPerIn: { value: 26335, within: 20 } } },
  }),
  calculator({
    id: 'heat-input-power', title: 'Heat input from instantaneous power', group: 'heat', purpose: 'Heat input of Section IX from the power that the power source or meter shows, for any waveform.',
    inputs: { power: number('p', 'Instantaneous power', 'W', 3832, { least: 0 }), arcTime: quantity('t', 'Arc time', 'duration', 60), length: quantity('l', 'Bead length', 'length', 300) },
    outputs: energyOutputs, calculate: arcEnergyByPower,
    formula: ['heat input = power × arc time / bead length'], source: { ...asmeHeatInputSource, clause: 'QW-409.1(c)' }, validity: VALIDITY,
    example: { from: 'calc-g-hi-03', expect: { arcEnergy: { value: 0.7664, within: 0.0005 }, kjPerIn: { value: 19.467, within: 0.02 } } },
  }),
  calculator({
    id: 'heat-input-energy', title: 'Heat input from instantaneous energy', group: 'heat', purpose: 'Heat input of Section IX from the energy of the whole bead, for any waveform.',
    inputs: { energy: number('e', 'Instantaneous energy', 'J', 38000, { least: 0 }), length: quantity('l', 'Bead length', 'length', 127) },
    outputs: energyOutputs, calculate: arcEnergyByEnergy,
    formula: ['heat input = energy / bead length'], source: { ...asmeHeatInputSource, clause: 'QW-409.1(c)' }, validity: VALIDITY,
    example: { from: 'calc-g-hi-04', expect: { arcEnergy: { value: 0.29921, within: 0.0001 }, kjPerIn: { value: 7.6, within: 0.01 } } },
  }),
  calculator({
    id: 'heat-input-volume', title: 'Heat input by bead size', group: 'heat', purpose: 'Tells whether a production bead is an increase of heat input over the qualified bead, by its section.',
    inputs: { qualifiedWidth: quantity('qw', 'Bead width of the qualification', 'length', 9.5), qualifiedThickness: quantity('qt', 'Bead thickness of the qualification', 'length', 3.2), width: quantity('w', 'Bead width in production', 'length', 9), thickness: quantity('t', 'Bead thickness in production', 'length', 3.4) },
    outputs: volumeOutputs.map((output) => (output.key === 'increase' ? output : { ...output, dimension: 'area' as const })), calculate: heatByBeadSize,
    formula: ['bead section = width × thickness', 'a larger section is an increase'], source: { ...asmeHeatInputSource, clause: 'QW-409.1(b)', basis: 'memory' }, validity: 'Beads of one process and filler.',
    example: { from: 'calc-g-hi-07', expect: { qualified: { value: 30.4, within: 0.01 }, production: { value: 30.6, within: 0.01 }, increase: true } },
  }),
  calculator({
    id: 'heat-input-electrode-length', title: 'Heat input by run-out length', group: 'heat', purpose: 'Tells whether a covered electrode is run shorter than in the qualification, which is an increase of heat input.',
    inputs: { qualifiedBead: quantity('qb', 'Bead length of the qualification', 'length', 200), qualifiedElectrode: quantity('qe', 'Electrode used in the qualification', 'length', 250), bead: quantity('b', 'Bead length in production', 'length', 180), electrode: quantity('e', 'Electrode used in production', 'length', 250) },
    outputs: volumeOutputs, calculate: heatByElectrodeLength,
    formula: ['weld per electrode = bead length / electrode length used', 'a smaller figure is an increase'], source: { ...asmeHeatInputSource, clause: 'QW-409.1(b)', basis: 'memory' }, validity: 'Electrodes of one size.',
    example: { from: 'by hand: 200 / 250 = 0.8 qualified, 180 / 250 = 0.72 in production, less weld per electrode', expect: { qualified: { value: 0.8, within: 1e-9 }, production: { value: 0.72, within: 1e-9 }, increase: true } },
  }),
  calculator({
    id: 'heat-input-iso', title: 'Heat input by ISO', group: 'heat', purpose: 'Arc energy and heat input with the thermal efficiency of the process.',
    inputs: { process, ...meter }, outputs: isoOutputs, calculate: arcEnergyByMeter,
    formula: ['E = V × A × 60 / travel speed / 1000', 'Q = k × E', 'k: submerged arc 1.0; covered electrode and gas-shielded metal arc 0.8; TIG and plasma 0.6'],
    source: isoHeatInputSource, validity: VALIDITY,
    example: { from: 'calc-g-hi-02', expect: { arcEnergy: { value: 1.0368, within: 0.001 }, efficiency: { value: 0.8, within: 1e-9 }, heatInput: { value: 0.8294, within: 0.001 } } },
  }),
  calculator({
    id: 'heat-input-iso-power', title: 'Heat input by ISO from power', group: 'heat', purpose: 'Arc energy and heat input of ISO from instantaneous power, for any waveform.',
    inputs: { process: { ...process, example: '135' }, power: number('w', 'Instantaneous power', 'W', 3832, { least: 0 }), arcTime: quantity('t', 'Arc time', 'duration', 60), length: quantity('l', 'Bead length', 'length', 300) },
    outputs: isoOutputs, calculate: arcEnergyByPower,
    formula: ['E = power × arc time / length / 1000', 'Q = k × E'], source: isoHeatInputSource, validity: VALIDITY,
    example: { from: 'by hand: 3832 × 60 / 300 / 1000 = 0.7664; × 0.8 = 0.61312', expect: { arcEnergy: { value: 0.7664, within: 1e-6 }, heatInput: { value: 0.61312, within: 1e-6 } } },
  }),
  calculator({
    id: 'travel-speed', title: 'Travel speed from run-out', group: 'heat', purpose: 'Travel speed from the length of a bead and the time the arc burned.',
    inputs: { length: quantity('l', 'Bead length', 'length', 200), arcTime: quantity('t', 'Arc time', 'duration', 48) },
    outputs: [{ key: 'travelSpeed', label: 'Travel speed', dimension: 'travelSpeed' }], calculate: speedFromRunOut,
    formula: ['travel speed = length / arc time × 60'], source: isoHeatInputSource, validity: 'Any bead.',
    example: { from: 'by hand: 200 / 48 × 60 = 250 mm/min', expect: { travelSpeed: { value: 250, within: 1e-9 } } },
  }),
]
