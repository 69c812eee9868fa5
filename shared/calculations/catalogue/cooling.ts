/** Calculators of cooling time and hardness beside the weld. */
import { coolingSource, coolingTime, heatInputForCoolingTime } from '../cooling-time.ts'
import { duerenSource, hazHardnessDueren, hazHardnessYurioka, yuriokaSource } from '../haz-hardness.ts'
import { calculator, type Calculator } from './define.ts'
import { elements } from './elements.ts'
import { number, quantity } from './inputs.ts'

const f2 = (example: number) => number('f2', 'Joint factor F2', '', example, { above: 0, most: 1.5, help: 'Run on plate 1; filling pass of a butt 0.9; fillet at a corner 0.67 to 0.9, at a tee 0.45 to 0.67.' })
const f3 = (example: number) => number('f3', 'Joint factor F3', '', example, { above: 0, most: 1.5, help: 'Run on plate 1; filling pass of a butt 0.9; single-run fillet 0.67.' })
const preheat = (example: number) => quantity('t0', 'Preheat or interpass temperature', 'temperature', example, { above: -273.15, below: 500 })
const validity = 'Unalloyed and low-alloy steel; heat input 0.3 to 5 kJ/mm; preheat to about 300 °C. Usual aim 5 to 25 s.'
const steel = { c: 0.16, si: 0.35, mn: 1.45, cr: null, ni: null, mo: null, cu: null, v: null } as const
const hazOutputs = [{ key: 'hardness', label: 'Estimated hardness', dimension: 'hardness' }, { key: 'martensite', label: 'If all martensite', dimension: 'hardness' }, { key: 'bainite', label: 'If no martensite', dimension: 'hardness' }] as const
const t85 = quantity('t', 'Cooling time t8/5', 'duration', 10)

export const coolingCalculators: readonly Calculator[] = [
  calculator({
    id: 'cooling-time', title: 'Cooling time t8/5', group: 'cooling', purpose: 'Time from 800 to 500 °C for heat flow in two and three dimensions, with the thickness that divides them.',
    inputs: { heatInput: quantity('q', 'Heat input', 'heatInput', 1, { above: 0, help: 'With thermal efficiency k.' }), preheat: preheat(20), thickness: quantity('d', 'Thickness', 'length', 20), f2: f2(1), f3: f3(1) },
    outputs: [{ key: 't85', label: 'Cooling time t8/5', unit: 's', decimals: 1 }, { key: 'regime', label: 'Heat flow', words: { '2D': 'two-dimensional', '3D': 'three-dimensional' } }, { key: 'threeDimensional', label: 'In three dimensions', unit: 's', decimals: 1 }, { key: 'twoDimensional', label: 'In two dimensions', unit: 's', decimals: 1 }, { key: 'transitionThickness', label: 'Transition thickness', dimension: 'length' }], calculate: coolingTime,
    formula: ['3-D: t = (6700 − 5 T0) × Q × [1/(500 − T0) − 1/(800 − T0)] × F3', '2-D: t = (4300 − 4.3 T0) × 10⁵ × (Q/d)² × [1/(500 − T0)² − 1/(800 − T0)²] × F2', 'the longer of the two counts'], source: coolingSource, validity,
    example: { from: 'calc-g-t8-01', expect: { t85: { value: 5.29, within: 0.02 }, regime: '3D', threeDimensional: { value: 5.288, within: 0.02 }, twoDimensional: { value: 2.841, within: 0.02 } } },
  }),
  calculator({
    id: 'heat-input-for-cooling-time', title: 'Heat input for a cooling time', group: 'cooling', purpose: 'The heat input that gives a wanted t8/5 at a preheat and thickness.',
    inputs: { t85, preheat: preheat(100), thickness: quantity('d', 'Thickness', 'length', 25), f2: f2(0.9), f3: f3(0.9) },
    outputs: [{ key: 'heatInput', label: 'Heat input', dimension: 'heatInput' }, { key: 'regime', label: 'Heat flow', words: { '2D': 'two-dimensional', '3D': 'three-dimensional' } }], calculate: heatInputForCoolingTime,
    formula: ['the formulas of t8/5 solved for Q; the smaller Q counts, as the longer time does'], source: coolingSource, validity,
    example: { from: 'by hand from calc-g-t8-02: 1.2 kJ/mm gives 7.174 s in three dimensions, so 10 s needs 1.2 × 10 / 7.174', expect: { heatInput: { value: 1.6727, within: 0.001 }, regime: '3D' } },
  }),
  calculator({
    id: 'haz-hardness-yurioka', title: 'HAZ hardness by Yurioka', group: 'cooling', purpose: 'Estimates the greatest hardness beside the fusion line of a single bead; advisory only.',
    inputs: { t85, ...elements({ ...steel, nb: null, n: null, b: null }) }, outputs: hazOutputs, calculate: ({ t85: time, ...chemistry }) => hazHardnessYurioka({ chemistry, t85: time }),
    formula: ['HV = (HM + HB)/2 − (HM − HB)/2.2 × arctan X', 'X = 4 ln(t/tM) / ln(tB/tM) − 2', 'HM = 884 C (1 − 0.3 C²) + 294; HB = 145 + 130 tanh(2.65 CE II − 0.69)'], source: yuriokaSource, validity: 'C to 0.8, N to 0.01 %; boron above 0.0003 % not covered. Error about ±30 HV; never for acceptance.',
    example: { from: 'calc-g-hz-01', expect: { hardness: { value: 289.1, within: 2 }, martensite: { value: 434.4, within: 1 }, bainite: { value: 209.2, within: 1 } } },
  }),
  calculator({
    id: 'haz-hardness-dueren', title: 'HAZ hardness by Düren', group: 'cooling', purpose: 'A second estimate of the hardness beside the fusion line; advisory only.',
    inputs: { t85, ...elements(steel) }, outputs: hazOutputs, calculate: ({ t85: time, ...chemistry }) => hazHardnessDueren({ chemistry, t85: time }),
    formula: ['HV = 2019 [C (1 − 0.5 log t) + 0.3 S] + 66 (1 − 0.8 log t), kept between the limits', 'S = Si/11 + Mn/8 + Cu/9 + Cr/5 + Ni/17 + Mo/6 + V/3', 'limits 802 C + 305 and 350 (C + S) + 101'], source: duerenSource, validity: 'No limits are known. Error about ±30 HV; never for acceptance.',
    example: { from: 'calc-g-hz-02', expect: { hardness: { value: 303.8, within: 2 }, martensite: { value: 433.3, within: 1 }, bainite: { value: 231.6, within: 1 } } },
  }),
]
