/** Calculators of stainless steel. */
import { ferriteNumber, ferriteSource, ferriteWithDilution } from '../ferrite-number.ts'
import { ferriteRegression, pren, PREN_FORMULAS, prenFormulas, STAINLESS_DIAGRAMS, stainlessDefinitions, stainlessEquivalents } from '../stainless-equivalents.ts'
import { calculator, type Calculator } from './define.ts'
import { chemistryOf, elements, elementsOf } from './elements.ts'
import { choice, quantity } from './inputs.ts'

const modes = { A: 'austenite alone', AF: 'austenite first, then ferrite', FA: 'ferrite first, then austenite', F: 'ferrite alone' }
const ferriteOutputs = [{ key: 'ferriteNumber', label: 'Ferrite number', unit: 'FN', decimals: 1 }, { key: 'reading', label: 'Read as' }, { key: 'crEq', label: 'Cr equivalent', unit: '%' }, { key: 'niEq', label: 'Ni equivalent', unit: '%' }, { key: 'mode', label: 'Solidifies as', words: modes }] as const
const ferriteFormula = ['Cr equivalent = Cr + Mo + 0.7 Nb', 'Ni equivalent = Ni + 35 C + 20 N + 0.25 Cu', 'FN between neighbouring lines of the diagram, straight at the same Ni equivalent']
const ferriteValidity = 'Cr equivalent 17 to 31, Ni equivalent 9 to 18 and between the lines; Mn to 10, Mo to 3, N to 0.2, Si to 1 %. Never extrapolated; prediction and measured FN differ by some 4 anyway.'
const base = { c: 0.05, mn: 1.6, si: 0.4, cr: 18.75, ni: 9.9, mo: 0.08, nb: 0, n: 0.04, cu: 0 } as const
const diagrams = STAINLESS_DIAGRAMS.map((value) => ({ value, label: stainlessDefinitions[value].label }))

export const stainlessCalculators: readonly Calculator[] = [
  calculator({
    id: 'ferrite-number', title: 'Ferrite number', group: 'stainless', purpose: 'Ferrite number of a stainless weld metal by the WRC-1992 diagram.',
    inputs: elements(base), outputs: ferriteOutputs, calculate: ferriteNumber, formula: ferriteFormula, source: ferriteSource, validity: ferriteValidity,
    example: { from: 'calc-g-ss-01', expect: { crEq: { value: 18.83, within: 0.005 }, niEq: { value: 12.45, within: 0.005 }, ferriteNumber: { value: 3.2, within: 2 } } },
  }),
  calculator({
    id: 'ferrite-dilution', title: 'Ferrite number with dilution', group: 'stainless', purpose: 'Ferrite number of a weld between two base metals, from their analyses, the filler and the dilution.',
    inputs: {
      dilution: quantity('d', 'Dilution by both base metals', 'percent', 30, { least: 0, most: 100 }), shareOfA: quantity('sa', 'Share of base metal A in it', 'percent', 50, { least: 0, most: 100 }),
      ...elementsOf('a', 'Base metal A', { c: 0.17, mn: 1.3, si: 0.3, cr: 0.05, ni: 0.05, mo: 0.01, nb: 0, n: 0.005, cu: 0.05 }), ...elementsOf('b', 'Base metal B', { c: 0.02, mn: 1.6, si: 0.4, cr: 18.2, ni: 8.1, mo: 0.2, nb: 0, n: 0.07, cu: 0.2 }), ...elementsOf('f', 'Filler', { c: 0.02, mn: 1.8, si: 0.4, cr: 23.5, ni: 13, mo: 0.1, nb: 0, n: 0.05, cu: 0.1 }),
    },
    outputs: ferriteOutputs,
    calculate: ({ dilution, shareOfA, ...given }) => {
      const baseB = chemistryOf(given, 'b')
      // Left empty as a whole: both members are of metal A.
      return ferriteWithDilution({ dilution, shareOfA, baseA: chemistryOf(given, 'a'), baseB: Object.keys(baseB).length > 0 ? baseB : null, filler: chemistryOf(given, 'f') })
    },
    formula: ['weld = dilution × base + (1 − dilution) × filler, for each element', ...ferriteFormula], source: ferriteSource, validity: ferriteValidity,
    example: { from: 'by hand: Cr equivalent 0.15 × 0.06 + 0.15 × 18.4 + 0.7 × 23.6 = 19.289; Ni equivalent 0.15 × 6.1125 + 0.15 × 10.25 + 0.7 × 14.725 = 12.761875', expect: { crEq: { value: 19.289, within: 1e-6 }, niEq: { value: 12.761875, within: 1e-6 } } },
  }),
  calculator({
    id: 'stainless-equivalents', title: 'Chromium and nickel equivalents', group: 'stainless', purpose: 'Equivalents of a stainless steel by five diagrams.',
    inputs: { diagram: choice('d', 'Diagram', diagrams, 'delong'), ...elements({ c: 0.04, mn: 1.5, si: 0.6, cr: 19.5, ni: 10, mo: 0.2, nb: 0, n: 0.05, cu: null, ti: null }) },
    outputs: [{ key: 'crEq', label: 'Cr equivalent', unit: '%' }, { key: 'niEq', label: 'Ni equivalent', unit: '%' }, { key: 'ratio', label: 'Cr over Ni equivalent' }],
    calculate: ({ diagram, ...chemistry }) => stainlessEquivalents(diagram, chemistry),
    formula: STAINLESS_DIAGRAMS.map((each) => `${stainlessDefinitions[each].label}: Cr equivalent ${stainlessDefinitions[each].cr}; Ni equivalent ${stainlessDefinitions[each].ni}`),
    source: { standard: 'WRC-1992, WRC-1988, DeLong, Schaeffler, Hammar–Svensson', edition: '', clause: 'equivalents', basis: 'memory', note: 'The two WRC pairs as quoted by published sources, the others recalled.' }, validity: 'Stainless weld metal; each pair belongs to its own diagram.',
    example: { from: 'calc-g-ss-05', expect: { crEq: { value: 20.6, within: 0.005 }, niEq: { value: 13.45, within: 0.005 } } },
  }),
  calculator({
    id: 'pren', title: 'Pitting resistance number', group: 'stainless', purpose: 'PREN of a stainless steel by the formula that the specification names.',
    inputs: { formula: choice('f', 'Formula', PREN_FORMULAS.map((value) => ({ value, label: prenFormulas[value] })), 'usual'), ...elements({ cr: 22.37, mo: 3.21, n: 0.177, w: null }) },
    outputs: [{ key: 'pren', label: 'PREN', decimals: 1 }, { key: 'formula', label: 'Formula' }], calculate: ({ formula, ...chemistry }) => pren(chemistry, formula),
    formula: PREN_FORMULAS.map((each) => prenFormulas[each]), source: { standard: 'PREN', edition: '', clause: '', basis: 'secondary', note: 'Note of a stainless steel association.' }, validity: 'A ranking, not a limit of service; state the formula beside the figure.',
    example: { from: 'calc-g-ss-04', expect: { pren: { value: 35.795, within: 0.01 } } },
  }),
  calculator({
    id: 'ferrite-regression', title: 'Ferrite by regression', group: 'stainless', purpose: 'A second opinion on the ferrite of austenitic weld metal, by regression on composition.',
    inputs: elements({ c: 0.04, mn: 1.5, si: 0.6, cr: 19.5, ni: 10, mo: 0.2, nb: 0, n: 0.05, cu: 0.1, ti: 0 }),
    outputs: [{ key: 'ferriteNumber', label: 'Ferrite number', unit: 'FN', decimals: 1 }, { key: 'crEq', label: 'Cr equivalent', unit: '%' }, { key: 'niEq', label: 'Ni equivalent', unit: '%' }], calculate: ferriteRegression,
    formula: ['S = (Cr equivalent + Ni equivalent) / 100, r = Cr equivalent / Ni equivalent (Hammar–Svensson)', 'FN = 54.22 − 126.26 S + (−48.11 + 37.14 S) r + (−0.23 + 61.95 S) r²'], source: { standard: 'Ferrite regression, Welding in the World', edition: '', clause: 'doi 10.1007/bf03321381', basis: 'secondary', note: 'Printed in the abstract.' }, validity: 'S 0.30 to 0.40 and r 1.22 to 2.00, cooling 10 to 1000 °C/s; stated error about +1 ± 2 FN.',
    example: { from: 'by hand: equivalents 20.674 and 12.155, S 0.32829, r 1.700864', expect: { crEq: { value: 20.674, within: 1e-6 }, niEq: { value: 12.155, within: 1e-6 }, ferriteNumber: { value: 9.8496, within: 0.001 } } },
  }),
]
