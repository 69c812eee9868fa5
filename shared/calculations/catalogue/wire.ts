/** Calculators of wire feed, current and deposition. */
import { burnOffSource, currentFromWireFeed, SHOP_WIRES, shopSettings, wireFeedFromCurrent } from '../burn-off.ts'
import { depositionRate, depositionSource, stubEfficiency, wireLengthPerMass } from '../deposition.ts'
import { calculator, type Calculator } from './define.ts'
import { choice, number, quantity } from './inputs.ts'

const material = choice('m', 'Wire material', [{ value: 'carbon-steel', label: 'Carbon steel' }, { value: 'aluminium', label: 'Aluminium' }], 'carbon-steel')
const diameter = quantity('d', 'Wire diameter', 'length', 1.2)
const extension = quantity('l', 'Electrode extension', 'length', 15, { least: 0 })
const density = number('rho', 'Density', 'g/cm³', 7.85, { above: 0, most: 25, help: 'Steel 7.85, austenitic 7.9 to 8.0, aluminium 2.70.' })
const validity = 'Spray and pulsed spray; extension 10 to 25 mm; good to about 15 %. Steel 0.6 to 1.2 mm, aluminium 0.8 to 1.2 mm.'

export const wireCalculators: readonly Calculator[] = [
  calculator({
    id: 'wire-feed-from-current', title: 'Wire feed for a current', group: 'wire', purpose: 'The wire feed that melts at a mean current, by wire material and diameter.',
    inputs: { material, diameter, current: quantity('i', 'Current', 'current', 250), extension }, outputs: [{ key: 'wireFeed', label: 'Wire feed', dimension: 'wireFeed' }], calculate: wireFeedFromCurrent,
    formula: ['wire feed = α × I + β × extension × I²', 'α and β scale with wire section'], source: burnOffSource, validity,
    example: { from: 'calc-g-wf-01', expect: { wireFeed: { value: 7.3125, within: 0.005 } } },
  }),
  calculator({
    id: 'current-from-wire-feed', title: 'Current for a wire feed', group: 'wire', purpose: 'The mean current that a wire feed draws, by wire material and diameter.',
    inputs: { material, diameter, wireFeed: quantity('w', 'Wire feed', 'wireFeed', 5), extension }, outputs: [{ key: 'current', label: 'Current', dimension: 'current' }], calculate: currentFromWireFeed,
    formula: ['I = (−α + √(α² + 4 β × extension × wire feed)) / (2 β × extension)'], source: burnOffSource, validity,
    example: { from: 'calc-g-wf-02', expect: { current: { value: 188.73, within: 0.1 } } },
  }),
  calculator({
    id: 'shop-settings', title: 'First settings by plate', group: 'wire', purpose: 'Starting current and wire feed for short-arc steel by plate thickness and wire.',
    inputs: { thickness: quantity('t', 'Plate thickness', 'length', 1.5875), wire: choice('d', 'Wire diameter', SHOP_WIRES.map(({ mm, inch }) => ({ value: String(mm), label: `${mm} mm (${inch} in)` })), '0.9') },
    outputs: [{ key: 'current', label: 'Current', dimension: 'current' }, { key: 'wireFeed', label: 'Wire feed', dimension: 'wireFeed' }, { key: 'wireFeedInPerMin', label: 'In inches', unit: 'in/min', decimals: 0 }],
    calculate: ({ thickness, wire }) => shopSettings({ thickness, wire: Number(wire) }),
    formula: ['1 A for each 0.001 in of plate', 'wire feed = 3.5 / 2 / 1.6 / 1 in/min for each ampere by wire'], source: { standard: 'Shop rule for steel, short arc, argon with CO2', edition: '', clause: '', basis: 'secondary', note: 'Typical-settings pages of several machine manuals.' }, validity: 'Steel, short arc; within the current range of each wire. Starting values only.',
    example: { from: 'calc-g-wf-03', expect: { current: { value: 62.5, within: 0.01 }, wireFeedInPerMin: { value: 100, within: 0.5 }, wireFeed: { value: 2.54, within: 0.03 } } },
  }),
  calculator({
    id: 'deposition-rate', title: 'Deposition rate', group: 'wire', purpose: 'Weld metal laid per hour of arc, from wire feed and diameter.',
    inputs: { wireDiameter: quantity('d', 'Wire diameter', 'length', 0.9), wireFeed: quantity('w', 'Wire feed', 'wireFeed', 8), density, efficiency: quantity('eff', 'Deposition efficiency', 'percent', 96, { above: 0, most: 100 }) },
    outputs: [{ key: 'depositionRate', label: 'Deposition rate', unit: 'kg/h' }, { key: 'lbPerHour', label: 'In pounds', unit: 'lb/h' }, { key: 'meltOffRate', label: 'Wire melted', unit: 'kg/h' }],
    calculate: ({ efficiency, ...rest }) => depositionRate({ ...rest, efficiency: efficiency / 100 }),
    formula: ['deposition rate = π/4 × diameter² × wire feed × 60 × density × efficiency'], source: depositionSource, validity: 'Solid wire.',
    example: { from: 'calc-g-wf-04', expect: { depositionRate: { value: 2.3012, within: 0.002 } } },
  }),
  calculator({
    id: 'wire-length', title: 'Wire length in a mass', group: 'wire', purpose: 'Metres of wire in a kilogram, inches in a pound.',
    inputs: { wireDiameter: quantity('d', 'Wire diameter', 'length', 0.889), density }, outputs: [{ key: 'metresPerKg', label: 'Length of a kilogram', unit: 'm/kg', decimals: 1 }, { key: 'inchesPerLb', label: 'Length of a pound', unit: 'in/lb', decimals: 0 }], calculate: wireLengthPerMass,
    formula: ['length = 1 / (wire section × density)'], source: depositionSource, validity: 'Solid wire.',
    example: { from: 'calc-g-wf-05', expect: { metresPerKg: { value: 203.9, within: 4.1 }, inchesPerLb: { value: 3648, within: 73 } } },
  }),
  calculator({
    id: 'stub-efficiency', title: 'Efficiency with stub loss', group: 'wire', purpose: 'What share of a covered electrode becomes weld metal when the stub is thrown away.',
    inputs: { efficiency: quantity('eff', 'Efficiency without stub', 'percent', 70, { above: 0, most: 100 }), electrodeLength: quantity('l', 'Electrode length', 'length', 350), stub: quantity('stub', 'Stub length', 'length', 50, { least: 0 }) },
    outputs: [{ key: 'efficiency', label: 'Effective efficiency', decimals: 3 }], calculate: ({ efficiency, ...rest }) => stubEfficiency({ ...rest, efficiency: efficiency / 100 }),
    formula: ['efficiency × (length − stub) / length'], source: depositionSource, validity: 'Covered electrodes.',
    example: { from: 'by hand: 0.70 × 300 / 350 = 0.6', expect: { efficiency: { value: 0.6, within: 1e-9 } } },
  }),
]
