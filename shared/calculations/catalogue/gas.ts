/** Calculators of gas. */
import { gasClass, gasClassSource } from '../gas-class.ts'
import { flowInCfh, tigCup, wireGasFlow } from '../gas-flow.ts'
import { calculator, type Calculator } from './define.ts'
import { number, quantity, quantityIfAny } from './inputs.ts'

const share = { least: 0, most: 100 } as const

export const gasCalculators: readonly Calculator[] = [
  calculator({
    id: 'tig-cup', title: 'TIG cup', group: 'gas', purpose: 'Inside diameter of a TIG cup by its number, with a starting argon flow.',
    inputs: { cup: number('n', 'Cup number', '', 6, { above: 0, most: 32 }) }, outputs: [{ key: 'diameter', label: 'Inside diameter', unit: 'mm', decimals: 3 }, { key: 'flow', label: 'Starting flow', unit: 'L/min', decimals: 1 }, { key: 'flowCfh', label: 'Starting flow', unit: 'ft³/h', decimals: 0 }], calculate: tigCup,
    formula: ['inside diameter = number / 16 in', 'starting flow: 2 ft³/h for each number'], source: { standard: 'TIG cup number', edition: '', clause: '', basis: 'secondary', note: 'Published cup-size notes.' }, validity: 'Argon; a starting value.',
    example: { from: 'calc-g-gs-02', expect: { diameter: { value: 9.525, within: 0.03 } } },
  }),
  calculator({
    id: 'gas-flow', title: 'Gas flow units', group: 'gas', purpose: 'Litres a minute as cubic feet an hour.',
    inputs: { flow: quantity('g', 'Gas flow', 'gasFlow', 8, { least: 0 }) }, outputs: [{ key: 'cfh', label: 'Flow', unit: 'ft³/h' }], calculate: flowInCfh,
    formula: ['1 ft³/h = 0.4719 L/min'], source: { standard: 'Units', edition: '', clause: '', basis: 'memory', note: '1 ft³ = 28.316846592 L by definition.' }, validity: 'Any flow.',
    example: { from: 'calc-g-gs-02', expect: { cfh: { value: 16.95, within: 0.05 } } },
  }),
  calculator({
    id: 'wire-gas-flow', title: 'Gas flow for a wire', group: 'gas', purpose: 'A starting flow of shielding gas for MIG/MAG by wire and nozzle.',
    inputs: { wireDiameter: quantity('d', 'Wire diameter', 'length', 1.2), nozzle: quantityIfAny('n', 'Nozzle bore', 'length', 13) }, outputs: [{ key: 'from', label: 'From', dimension: 'gasFlow' }, { key: 'to', label: 'To', dimension: 'gasFlow' }], calculate: wireGasFlow,
    formula: ['10 to 12 × wire diameter in L/min, at least the nozzle bore in mm'], source: { standard: 'Shielding of MIG/MAG', edition: '', clause: '', basis: 'memory', note: 'Thumb rule.' }, validity: 'A starting value.',
    example: { from: 'by hand: 10 × 1.2 = 12 is below the bore of 13; 12 × 1.2 = 14.4', expect: { from: { value: 13, within: 1e-9 }, to: { value: 14.4, within: 1e-9 } } },
  }),
  calculator({
    id: 'gas-class', title: 'Gas class', group: 'gas', purpose: 'Class and designation of a shielding gas by ISO 14175.',
    inputs: { argon: quantityIfAny('ar', 'Argon', 'percent', 82, share), carbonDioxide: quantityIfAny('co2', 'Carbon dioxide', 'percent', 18, share), oxygen: quantityIfAny('o2', 'Oxygen', 'percent', null, share), helium: quantityIfAny('he', 'Helium', 'percent', null, share), hydrogen: quantityIfAny('h2', 'Hydrogen', 'percent', null, share), nitrogen: quantityIfAny('n2', 'Nitrogen', 'percent', null, share) },
    outputs: [{ key: 'symbol', label: 'Class' }, { key: 'designation', label: 'Designation' }], calculate: gasClass,
    formula: ['table of bands by component'], source: gasClassSource, validity: 'Volume per cent that add up to 100; Z for a mixture outside the table.',
    example: { from: 'calc-g-gs-01', expect: { symbol: 'M21', designation: 'ISO 14175-M21-ArC-18' } },
  }),
]
