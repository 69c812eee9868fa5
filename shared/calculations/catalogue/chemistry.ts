/** Calculators from the chemistry of ferritic steel. */
import { aNumberCalculationSource, aNumberFromChemistry } from '../a-number.ts'
import { carbonEquivalentDefinitions, carbonEquivalents, CARBON_EQUIVALENTS } from '../carbon-equivalent.ts'
import { calculator, type Calculator } from './define.ts'
import { elements } from './elements.ts'

export const chemistryCalculators: readonly Calculator[] = [
  calculator({
    id: 'carbon-equivalents', title: 'Carbon equivalents', group: 'chemistry', purpose: 'CE (IIW), CE (AWS), Pcm, CET and CEN of a steel, side by side.',
    inputs: elements({ c: 0.18, si: 0.4, mn: 1.45, cr: 0.05, ni: 0.03, mo: 0.01, cu: 0.04, v: 0.005, nb: null, b: null, ti: null }),
    outputs: [...CARBON_EQUIVALENTS.map((key) => ({ key, label: carbonEquivalentDefinitions[key].label, unit: '%', decimals: 3 })), { key: 'accommodationFactor', label: 'A(C) of CEN', decimals: 3 }],
    calculate: carbonEquivalents,
    formula: [...CARBON_EQUIVALENTS.map((key) => `${carbonEquivalentDefinitions[key].label} = ${carbonEquivalentDefinitions[key].formula}`), 'A(C) = 0.75 + 0.25 tanh(20 × (C − 0.12))'],
    source: { standard: 'EN 1011-2 / ISO/TR 17671-2; AWS D1.1; Yurioka', edition: '', clause: 'CE, Pcm, CET, CEN', basis: 'secondary', note: 'Several published formula pages agree; composition limits recalled.' },
    validity: 'CE: C 0.05 to 0.25, Si to 0.8, Mn to 1.7, Cr to 0.9, Cu to 1.0, Ni to 2.5, Mo to 0.75, V to 0.20. Pcm: C to about 0.17. CET: C 0.05 to 0.32, Si to 0.8, Mn 0.5 to 1.9, Cr to 1.5, Cu to 0.7, Mo to 0.75, Nb to 0.06, Ni to 2.5, Ti to 0.12, V to 0.18, B to 0.005.',
    example: { from: 'calc-g-ce-01', expect: { ceIiw: { value: 0.4393, within: 0.0005 }, cet: { value: 0.3312, within: 0.0005 }, pcm: { value: 0.272, within: 0.0005 }, cen: { value: 0.444, within: 0.0005 } } },
  }),
  calculator({
    id: 'a-number', title: 'A-Number', group: 'chemistry', purpose: 'The A-Number of Section IX for the exact analysis of a deposit, and how near it is to a limit.',
    inputs: elements({ c: 0.08, cr: 0.03, mo: 0.01, ni: 0.02, mn: 1.2, si: 0.6 }),
    outputs: [{ key: 'reading', label: 'A-Number' }, { key: 'decided', label: 'Decided', words: { true: 'yes', false: 'no, see the notes' } }], calculate: aNumberFromChemistry,
    formula: ['every element must lie within the limits of the row'], source: aNumberCalculationSource, validity: 'Ferrous deposits; the weld metal counts, not the wire.',
    example: { from: 'table: mild steel deposit within the limits of A-No. 1', expect: { reading: '1', decided: true } },
  }),
]
