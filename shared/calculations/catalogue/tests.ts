/** Calculators of test figures and conversions. */
import { bendFormer, bendStrain, bendStrainSource, isoFormerSource } from '../bend.ts'
import { convertHardness, HARDNESS_SCALES, hardnessScaleLabels, isoConversionSource } from '../hardness-conversion.ts'
import { charpySubSize, CHARPY_WIDTHS, tensileStrength } from '../test-figures.ts'
import { calculator, type Calculator } from './define.ts'
import { choice, number, quantity } from './inputs.ts'

export const testCalculators: readonly Calculator[] = [
  calculator({
    id: 'bend-strain', title: 'Bend strain', group: 'tests', purpose: 'Strain of the outer fibre of a bend specimen over a former.',
    inputs: { former: quantity('d', 'Former diameter', 'length', 38.1), thickness: quantity('t', 'Specimen thickness', 'length', 9.525) }, outputs: [{ key: 'strain', label: 'Outer-fibre strain', dimension: 'percent' }, { key: 'timesThickness', label: 'Former over thickness' }], calculate: bendStrain,
    formula: ['strain = 100 × t / (D + t)'], source: bendStrainSource, validity: 'Any bend over a round former.',
    example: { from: 'calc-g-hd-04', expect: { strain: { value: 20, within: 0.05 }, timesThickness: { value: 4, within: 1e-9 } } },
  }),
  calculator({
    id: 'bend-former', title: 'Bend former', group: 'tests', purpose: 'The largest former that a metal’s elongation asks for.',
    inputs: { standard: choice('std', 'Standard', [{ value: 'iso-15614-1', label: 'ISO 15614-1' }, { value: 'asme-ix', label: 'ASME Section IX' }], 'iso-15614-1'), thickness: quantity('t', 'Specimen thickness', 'length', 10), elongation: quantity('a', 'Specified minimum elongation', 'percent', 16, { above: 0, most: 100 }) },
    outputs: [{ key: 'former', label: 'Former diameter', dimension: 'length' }, { key: 'strain', label: 'Outer-fibre strain', dimension: 'percent' }], calculate: bendFormer,
    formula: ['elongation 20 % or more: 4 × t', 'below: 100 × t / A − t', 'Section IX: no more than 32-7/8 × t, no bend below 3 %'], source: isoFormerSource, validity: 'The specified minimum elongation counts, not the measured one; the lower where metals differ.',
    example: { from: 'by hand: 100 × 10 / 16 − 10 = 52.5', expect: { former: { value: 52.5, within: 1e-6 }, strain: { value: 16, within: 1e-6 } } },
  }),
  calculator({
    id: 'hardness-conversion', title: 'Hardness conversion', group: 'tests', purpose: 'Vickers, Brinell, Rockwell C and tensile strength of steel against each other.',
    inputs: { scale: choice('s', 'From', HARDNESS_SCALES.map((value) => ({ value, label: `${hardnessScaleLabels[value].label}, ${hardnessScaleLabels[value].unit}` })), 'hv'), figure: number('x', 'Figure', '', 250), standard: choice('std', 'Table', [{ value: 'iso-18265', label: 'ISO 18265' }, { value: 'astm-e140', label: 'ASTM E140' }], 'iso-18265') },
    outputs: HARDNESS_SCALES.map((key) => ({ key, label: hardnessScaleLabels[key].label, unit: hardnessScaleLabels[key].unit, decimals: key === 'hrc' ? 1 : 0 })), calculate: convertHardness,
    formula: ['straight between the rows of the table, never beyond it'], source: isoConversionSource, validity: 'Unalloyed and low-alloy steel; HV 80 to 450, HRC from HV 240. Limits in HV are judged on measured HV only.',
    example: { from: 'calc-g-hd-01', expect: { hb: { value: 238, within: 1 }, hrc: { value: 22.2, within: 0.1 }, rm: { value: 800, within: 5 } } },
  }),
  calculator({
    id: 'charpy-sub-size', title: 'Sub-size Charpy', group: 'tests', purpose: 'Impact energy asked of a narrow specimen for a full-size requirement.',
    inputs: { requirement: quantity('j', 'Full-size requirement', 'energy', 54), width: choice('w', 'Specimen width', CHARPY_WIDTHS.map((value) => ({ value: String(value), label: `${value} mm` })), '7.5') }, outputs: [{ key: 'required', label: 'Required', unit: 'J', decimals: 0 }, { key: 'requiredFtLbf', label: 'In feet', unit: 'ft·lbf', decimals: 0 }, { key: 'fromTable', label: 'From the table', words: { true: 'yes', false: 'no, in proportion to the width' } }], calculate: ({ requirement, width }) => charpySubSize({ requirement, width: Number(width) }),
    formula: ['table of ASTM A370; where it has no row, requirement × width / 10'], source: { standard: 'ASTM A370', edition: '2014', clause: 'table 9', basis: 'secondary', note: 'From a poor scan, completed from memory.' }, validity: 'Requirements of 7 to 40 ft·lbf that are a row of the table. Measured energies are never scaled up.',
    example: { from: 'calc-g-hd-02', expect: { requiredFtLbf: { value: 30, within: 0 }, required: { value: 41, within: 1 }, fromTable: true } },
  }),
  calculator({
    id: 'tensile-flat', title: 'Tensile strength, flat specimen', group: 'tests', purpose: 'Strength of a flat tension specimen from its load and section.',
    inputs: { load: quantity('f', 'Maximum load', 'force', 98.5, { least: 0 }), width: quantity('w', 'Width', 'length', 19.05), thickness: quantity('t', 'Thickness', 'length', 9.8) }, outputs: [{ key: 'strength', label: 'Tensile strength', dimension: 'stress' }, { key: 'area', label: 'Area', dimension: 'area' }], calculate: (given) => tensileStrength({ shape: 'flat', ...given }),
    formula: ['strength = load / (width × thickness)'], source: { standard: 'Tension test', edition: '', clause: '', basis: 'memory', note: 'Load over original area.' }, validity: 'Flat specimens.',
    example: { from: 'calc-g-hd-03', expect: { area: { value: 186.69, within: 0.02 }, strength: { value: 527.6, within: 0.5 } } },
  }),
  calculator({
    id: 'tensile-round', title: 'Tensile strength, turned specimen', group: 'tests', purpose: 'Strength of a turned tension specimen from its load and diameter.',
    inputs: { load: quantity('f', 'Maximum load', 'force', 70, { least: 0 }), diameter: quantity('d', 'Diameter', 'length', 12.827) }, outputs: [{ key: 'strength', label: 'Tensile strength', dimension: 'stress' }, { key: 'area', label: 'Area', dimension: 'area' }], calculate: (given) => tensileStrength({ shape: 'round', ...given }),
    formula: ['strength = load / (π/4 × diameter²)'], source: { standard: 'Tension test', edition: '', clause: '', basis: 'memory', note: 'Load over original area.' }, validity: 'Turned specimens.',
    example: { from: 'reference: a turned 0.505 in (12.827 mm) specimen has 0.2003 in² = 129.23 mm²; 70 kN gives 541.7 MPa', expect: { area: { value: 129.23, within: 0.03 }, strength: { value: 541.7, within: 0.2 } } },
  }),
]
