/** Calculators of consumables, time and cost. */
import { consumptionSource, weldConsumption, weldCost } from '../weld-cost.ts'
import { gasPerMetre } from '../gas-flow.ts'
import { calculator, type Calculator } from './define.ts'
import { number, quantity } from './inputs.ts'

const inputs = {
  weldMetal: number('m', 'Weld metal', 'kg/m', 0.841), length: number('l', 'Weld length', 'm', 10), efficiency: quantity('eff', 'Deposition efficiency', 'percent', 96, { above: 0, most: 100 }), depositionRate: number('dr', 'Deposition rate', 'kg/h', 3.2),
  operatorFactor: quantity('of', 'Operator factor', 'percent', 35, { above: 0, most: 100, help: 'Share of the time with the arc burning: manual 10 to 30 %, semi-automatic 30 to 50 %, mechanised above 50 %.' }), gasFlow: quantity('g', 'Gas flow', 'gasFlow', 16, { least: 0 }), purge: number('pg', 'Purge gas', 'L', 0, { least: 0 }),
}
const fractions = <G extends { efficiency: number; operatorFactor: number }>(given: G): G => ({ ...given, efficiency: given.efficiency / 100, operatorFactor: given.operatorFactor / 100 })
const outputs = [{ key: 'filler', label: 'Filler', dimension: 'mass' }, { key: 'weldMetal', label: 'Weld metal', dimension: 'mass' }, { key: 'arcTime', label: 'Arc time', unit: 'h' }, { key: 'totalTime', label: 'Time on the job', unit: 'h' }, { key: 'gas', label: 'Gas', unit: 'L', decimals: 0 }] as const
const formula = ['filler = weld metal / efficiency', 'arc time = weld metal / deposition rate', 'time on the job = arc time / operator factor', 'gas = flow × arc time + purge']

export const costCalculators: readonly Calculator[] = [
  calculator({
    id: 'consumption', title: 'Filler, time and gas', group: 'cost', purpose: 'Filler, arc time, time on the job and gas for a length of weld.',
    inputs, outputs, calculate: (given) => weldConsumption(fractions(given)), formula, source: consumptionSource, validity: 'The deposition rate already counts the efficiency.',
    example: { from: 'calc-g-jt-06', expect: { filler: { value: 8.76, within: 0.01 }, arcTime: { value: 2.6281, within: 0.005 }, totalTime: { value: 7.509, within: 0.02 }, gas: { value: 2523, within: 12 } } },
  }),
  calculator({
    id: 'cost', title: 'Cost of a weld', group: 'cost', purpose: 'Cost of a length of weld from the shop’s own prices and rates, whole, per metre and per kilogram.',
    inputs: { ...inputs, fillerPrice: number('pf', 'Price of the filler', 'per kg', 3, { least: 0 }), gasPrice: number('pgas', 'Price of the gas', 'per m³', 5, { least: 0 }), labourRate: number('pl', 'Labour and overhead', 'per h', 60, { least: 0 }) },
    outputs: [{ key: 'total', label: 'Cost' }, { key: 'perMetre', label: 'Cost of a metre' }, { key: 'perKg', label: 'Cost of a kilogram of weld metal' }, { key: 'labourCost', label: 'Labour and overhead' }, { key: 'fillerCost', label: 'Filler' }, { key: 'gasCost', label: 'Gas' }, ...outputs], calculate: (given) => weldCost(fractions(given)),
    formula: [...formula, 'cost = filler × price + gas × price + time on the job × rate'], source: consumptionSource, validity: 'In the currency of the prices, which are the shop’s own: the example’s are made up.',
    example: { from: 'by hand from calc-g-jt-06: 8.760417 × 3 + 2.523 × 5 + 7.508929 × 60 = 26.28 + 12.62 + 450.54', expect: { total: { value: 489.43, within: 0.02 }, perMetre: { value: 48.943, within: 0.002 }, fillerCost: { value: 26.28, within: 0.01 }, gasCost: { value: 12.615, within: 0.01 }, labourCost: { value: 450.54, within: 0.01 } } },
  }),
  calculator({
    id: 'gas-per-metre', title: 'Gas per metre', group: 'cost', purpose: 'Gas that one pass takes for each metre.',
    inputs: { flow: quantity('g', 'Gas flow', 'gasFlow', 16, { least: 0 }), travelSpeed: quantity('s', 'Travel speed', 'travelSpeed', 400) }, outputs: [{ key: 'litres', label: 'Gas of a metre', unit: 'L/m', decimals: 1 }], calculate: gasPerMetre,
    formula: ['flow × 1000 / travel speed'], source: { standard: 'Arithmetic', edition: '', clause: '', basis: 'memory', note: 'Flow × time.' }, validity: 'One pass, without pre- and post-flow.',
    example: { from: 'by hand: 16 × 1000 / 400 = 40', expect: { litres: { value: 40, within: 1e-9 } } },
  }),
]
