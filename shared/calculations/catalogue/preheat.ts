/** Calculators of preheat. */
import { hardnessControl, preheatByAnnex, preheatByTable, PREHEAT_CATEGORIES, RESTRAINTS, annexSource, hardnessControlSource, tablePreheatSource } from '../preheat-d1-1.ts'
import { combinedThickness, methodASource, preheatMethodA } from '../preheat-method-a.ts'
import { cetToUse, methodBSource, preheatMethodB } from '../preheat-method-b.ts'
import { preheatItoBessyo, preheatSeferian } from '../preheat-other.ts'
import { calculator, type Calculator } from './define.ts'
import { elements } from './elements.ts'
import { choice, number, quantity, quantityIfAny } from './inputs.ts'

const hydrogen = (example: number) => number('hd', 'Diffusible hydrogen', 'ml/100 g', example)
const heatInput = (example: number) => quantity('q', 'Heat input', 'heatInput', example, { above: 0, help: 'With thermal efficiency k.' })
const joint = choice('j', 'Joint', [{ value: 'butt', label: 'Butt' }, { value: 'corner', label: 'Corner' }, { value: 'tee', label: 'Tee fillet' }, { value: 'tee-both-sides', label: 'Tee, both fillets at once' }], 'tee')
const temperature = { above: -273.15 } as const

export const preheatCalculators: readonly Calculator[] = [
  calculator({
    id: 'preheat-method-b', title: 'Preheat by ISO/TR 17671-2 method B', group: 'preheat', purpose: 'Preheat against cold cracking from CET, thickness, hydrogen and heat input.',
    inputs: { cet: number('cet', 'CET', '%', 0.35, { least: 0, most: 100 }), thickness: quantity('t', 'Thickness of the thicker part', 'length', 30), hydrogen: hydrogen(5), heatInput: heatInput(1.5), ambient: quantity('ta', 'Temperature of the steel', 'temperature', 20, temperature), yieldStrength: quantityIfAny('re', 'Yield strength', 'stress', null) },
    outputs: [{ key: 'formula', label: 'By the formula', dimension: 'temperature' }, { key: 'required', label: 'Preheat needed' }, { key: 'preheat', label: 'Preheat, up to the next 5 °C', dimension: 'temperature' }], calculate: preheatMethodB,
    formula: ['Tp = 697 CET + 160 tanh(d/35) + 62 HD^0.35 + (53 CET − 32) Q − 328'], source: methodBSource, validity: 'CET 0.20 to 0.50, thickness 10 to 90 mm, hydrogen 1 to 20 ml/100 g, heat input 0.5 to 4.0 kJ/mm, yield to about 1000 MPa.',
    example: { from: 'calc-g-ph-01', expect: { formula: { value: 115.8, within: 0.5 }, required: true, preheat: { value: 120, within: 0 } } },
  }),
  calculator({
    id: 'cet-to-use', title: 'CET for method B', group: 'preheat', purpose: 'Which CET decides: the parent metal’s or the weld metal’s.',
    inputs: { parent: number('p', 'CET of the parent metal', '%', 0.3, { least: 0, most: 100 }), weldMetal: number('w', 'CET of the weld metal', '%', 0.29, { least: 0, most: 100 }) },
    outputs: [{ key: 'cet', label: 'CET to use', unit: '%', decimals: 3 }, { key: 'decides', label: 'Decides', words: { parent: 'the parent metal', 'weld-metal': 'the weld metal' } }], calculate: cetToUse,
    formula: ['parent if at least 0.03 above the weld metal, else weld metal + 0.03'], source: methodBSource, validity: 'As method B.',
    example: { from: 'by hand: 0.30 is less than 0.29 + 0.03, so 0.32', expect: { cet: { value: 0.32, within: 1e-9 }, decides: 'weld-metal' } },
  }),
  calculator({
    id: 'preheat-method-a', title: 'Preheat by ISO/TR 17671-2 method A', group: 'preheat', purpose: 'Works out what the curves of method A are entered with, and keeps the preheat that you read there.',
    inputs: { ce: number('ce', 'CE (IIW)', '%', 0.43, { least: 0, most: 100 }), hydrogen: number('hd', 'Diffusible hydrogen', 'ml/100 g', 5, { least: 0 }), joint, thickness: quantity('t1', 'Thickness (through plate of a tee)', 'length', 20), thicknessB: quantity('t2', 'Second thickness (standing plate)', 'length', 12), heatInput: heatInput(1.5), readFromStandard: quantityIfAny('tp', 'Preheat read from the standard', 'temperature', null, temperature) },
    outputs: [{ key: 'preheat', label: 'Preheat read', dimension: 'temperature' }, { key: 'scale', label: 'Hydrogen scale' }, { key: 'combinedThickness', label: 'Combined thickness', dimension: 'length' }], calculate: preheatMethodA,
    formula: ['hydrogen scale: A over 15, B over 10, C over 5, D over 3, E up to 3 ml/100 g', 'combined thickness: sum of the paths of heat'], source: methodASource, validity: 'The curves stand in the standard alone; none is kept here. C 0.05 to 0.25, Si to 0.8, Mn to 1.7 % and further limits of CE.',
    example: { from: 'calc-g-ph-03 (5 ml/100 g is scale D) and calc-g-ph-04', expect: { preheat: null, scale: 'D', combinedThickness: { value: 52, within: 0.01 } } },
  }),
  calculator({
    id: 'combined-thickness', title: 'Combined thickness', group: 'preheat', purpose: 'The sum of the thicknesses by which heat leaves a joint.',
    inputs: { joint, thickness: quantity('t1', 'Thickness (through plate of a tee)', 'length', 20), thicknessB: quantity('t2', 'Second thickness (standing plate)', 'length', 12) },
    outputs: [{ key: 'combinedThickness', label: 'Combined thickness', dimension: 'length' }], calculate: combinedThickness,
    formula: ['butt and corner: t1 + t2', 'tee: 2 × through plate + standing plate', 'both fillets at once: half of that'], source: { ...methodASource, note: 'Sums by joint from published help pages; the average over 75 mm, and the half for both fillets at once, are recalled.' }, validity: 'Each thickness averaged over 75 mm from the weld.',
    example: { from: 'calc-g-ph-04', expect: { combinedThickness: { value: 52, within: 0.01 } } },
  }),
  calculator({
    id: 'preheat-d1-1-table', title: 'Preheat by D1.1 Table 5.8', group: 'preheat', purpose: 'Minimum preheat and interpass temperature of a prequalified procedure, by category and thickness.',
    inputs: { category: choice('c', 'Category', PREHEAT_CATEGORIES.map((value) => ({ value, label: { A: 'A: Group I steels, not low-hydrogen', B: 'B: Group I and II steels, low-hydrogen', C: 'C: higher-strength steels', D: 'D: with consumables of H8 or less' }[value] })), 'B'), thickness: quantity('t', 'Thickness of the thickest part', 'length', 25), system: choice('u', 'Figures', [{ value: 'SI', label: 'Metric' }, { value: 'US', label: 'Inch' }], 'SI') },
    outputs: [{ key: 'preheat', label: 'Minimum preheat', dimension: 'temperature' }, { key: 'fahrenheit', label: 'In Fahrenheit', unit: '°F', decimals: 0 }, { key: 'onlyIfCold', label: 'Only when the steel is cold' }], calculate: preheatByTable,
    formula: ['table by category and thickest part; bands closed at the top'], source: tablePreheatSource, validity: 'Thickness from 3 mm (1/8 in); prequalified base metals.',
    example: { from: 'table: category B, over 20 to 38 mm, 10 °C', expect: { preheat: { value: 10, within: 0 }, fahrenheit: { value: 50, within: 0 }, onlyIfCold: false } },
  }),
  calculator({
    id: 'preheat-d1-1-annex', title: 'Preheat by the D1.1 annex', group: 'preheat', purpose: 'Preheat by hydrogen control: susceptibility index, restraint and thickness.',
    inputs: { pcm: number('pcm', 'Pcm', '%', 0.23, { least: 0, most: 100 }), hydrogen: number('hd', 'Diffusible hydrogen', 'ml/100 g', 10, { above: 0, help: 'H1 5, H2 10, H3 30, or the measured value.' }), restraint: choice('r', 'Restraint', RESTRAINTS.map((value) => ({ value, label: value })), 'medium'), thickness: quantity('t', 'Thickness', 'length', 25.4) },
    outputs: [{ key: 'preheat', label: 'Minimum preheat', dimension: 'temperature' }, { key: 'toUse', label: 'Preheat, up to the next 5 °C', dimension: 'temperature' }, { key: 'fahrenheit', label: 'In Fahrenheit', unit: '°F', decimals: 0 }, { key: 'index', label: 'Susceptibility index' }, { key: 'group', label: 'Group that counts' }, { key: 'groupByPcm', label: 'Group by bands of Pcm' }, { key: 'band', label: 'Thickness band' }, { key: 'required', label: 'Above ambient' }], calculate: preheatByAnnex,
    formula: ['index = 12 Pcm + log10(H), rounded to one decimal for the group', 'where the bands of Pcm give a later letter, that one counts', 'preheat from the table by restraint, thickness and group'], source: annexSource, validity: 'Index to 7.0. Most cells are recalled: check against the code’s table.',
    example: { from: 'calc-g-ph-05 for the index, which alone gives C; H2 below Pcm 0.28 is D, the later letter; table: medium, over 3/4 to 1-1/2 in, group D, 230 °F', expect: { index: { value: 3.76, within: 0.005 }, group: 'D', groupByPcm: 'D', fahrenheit: { value: 230, within: 0 }, preheat: { value: 110, within: 1e-9 }, toUse: { value: 110, within: 0 } } },
  }),
  calculator({
    id: 'hardness-control-d1-1', title: 'Hardness control of the D1.1 annex', group: 'preheat', purpose: 'States what the charts of the annex are entered with for a fillet weld, and keeps the energy that you read there.',
    inputs: { ceAws: number('ce', 'CE (AWS)', '%', 0.5, { least: 0, most: 100 }), hardness: choice('h', 'Critical hardness', [{ value: '350', label: '350 HV' }, { value: '400', label: '400 HV' }], '400'), readEnergy: quantityIfAny('e', 'Least energy read from the code', 'heatInput', null) },
    outputs: [{ key: 'readEnergy', label: 'Least energy of a single pass', dimension: 'heatInput' }, { key: 'ceAws', label: 'CE (AWS)', unit: '%', decimals: 3 }, { key: 'hardness', label: 'Critical hardness', dimension: 'hardness' }], calculate: ({ hardness, ...rest }) => hardnessControl({ ...rest, hardness: hardness === '350' ? 350 : 400 }),
    formula: ['critical cooling rate from CE (AWS) and hardness, then energy from a chart: read in the code'], source: hardnessControlSource, validity: 'Fillet welds. The charts stand in the code alone; none is kept here.',
    example: { from: 'no figure until one is read from the code', expect: { readEnergy: null, ceAws: { value: 0.5, within: 0 } } },
  }),
  calculator({
    id: 'preheat-ito-bessyo', title: 'Preheat by Ito–Bessyo', group: 'preheat', purpose: 'A second opinion on preheat from Pcm, hydrogen and thickness.',
    inputs: { pcm: number('pcm', 'Pcm', '%', 0.25, { least: 0, most: 100 }), hydrogen: number('hd', 'Diffusible hydrogen (glycerine)', 'ml/100 g', 3, { least: 0 }), thickness: quantity('t', 'Thickness', 'length', 30) },
    outputs: [{ key: 'preheat', label: 'Preheat', dimension: 'temperature' }, { key: 'toUse', label: 'Preheat, up to the next 5 °C', dimension: 'temperature' }, { key: 'pc', label: 'Pc', unit: '%', decimals: 3 }], calculate: preheatItoBessyo,
    formula: ['Pc = Pcm + H/60 + t/600', 'T0 = 1440 Pc − 392'], source: { standard: 'Ito–Bessyo', edition: '', clause: '', basis: 'memory', note: 'Recalled.' }, validity: 'Thickness 19 to 50 mm; hydrogen 1 to 5 ml/100 g by the glycerine method; C 0.07 to 0.22 %.',
    example: { from: 'by hand: Pc 0.25 + 0.05 + 0.05 = 0.35; 1440 × 0.35 − 392 = 112', expect: { pc: { value: 0.35, within: 1e-9 }, preheat: { value: 112, within: 1e-6 }, toUse: { value: 115, within: 0 } } },
  }),
  calculator({
    id: 'preheat-seferian', title: 'Preheat by Séférian', group: 'preheat', purpose: 'A conservative preheat from chemistry and thickness.',
    inputs: { thickness: quantity('t', 'Thickness', 'length', 20), ...elements({ c: 0.2, mn: 0.9, cr: 0, ni: 0, mo: 0 }) },
    outputs: [{ key: 'preheat', label: 'Preheat', dimension: 'temperature' }, { key: 'toUse', label: 'Preheat, up to the next 5 °C', dimension: 'temperature' }, { key: 'carbonTotal', label: 'C total', unit: '%', decimals: 3 }], calculate: ({ thickness, ...chemistry }) => preheatSeferian({ chemistry, thickness }),
    formula: ['C chem = C + (Mn + Cr)/9 + Ni/18 + 7 Mo/90', 'C total = C chem × (1 + 0.005 × thickness)', 'Tp = 350 √(C total − 0.25), 0 below'], source: { standard: 'Séférian', edition: '', clause: '', basis: 'memory', note: 'Recalled.' }, validity: 'No limits are known; conservative.',
    example: { from: 'by hand: 0.2 + 0.1 = 0.3; × 1.1 = 0.33; 350 × √0.08 = 98.995', expect: { carbonTotal: { value: 0.33, within: 1e-9 }, preheat: { value: 98.995, within: 0.001 }, toUse: { value: 100, within: 0 } } },
  }),
]
