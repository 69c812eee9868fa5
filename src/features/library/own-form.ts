/** What the form of an own row asks for, by kind. */
import { asWritten } from '@shared/library/own-rows.ts'
import { D1_1_GROUPS, FILLER_GROUPS, type OwnKind } from '@shared/schemas/library.ts'
import type { Option } from '@/components/fields/text.tsx'

interface Common { name: string; label: string; optional?: boolean; description?: string; placeholder?: string; wide?: boolean }
export type OwnField = Common & ({ kind: 'text'; max: number } | { kind: 'paragraph'; max: number } | { kind: 'figure' } | { kind: 'stress' } | { kind: 'choice'; options: readonly Option[] } | { kind: 'words' } | { kind: 'sizes' } | { kind: 'parts' })

const options = (values: readonly string[]): Option[] => values.map((value) => ({ value, label: value }))
const strengths: OwnField[] = [
  { kind: 'stress', name: 'min_tensile_mpa', label: 'Tensile, minimum', optional: true },
  { kind: 'stress', name: 'min_yield_mpa', label: 'Yield, minimum', optional: true },
  { kind: 'figure', name: 'min_elongation_pct', label: 'Elongation, minimum, %', optional: true },
]
const source: OwnField = { kind: 'text', name: 'source', label: 'Where the figures come from', max: 300, placeholder: 'e.g. data sheet of the mill, 2026', description: 'Stands beside the row wherever it is shown.', wide: true }

export const OWN_FIELDS: Readonly<Record<OwnKind, readonly OwnField[]>> = {
  'base-metals': [
    { kind: 'text', name: 'spec', label: 'Standard or specification', max: 80, placeholder: 'e.g. EN 10025-6' },
    { kind: 'text', name: 'grade', label: 'Grade', max: 80, optional: true, placeholder: 'e.g. S690QL' },
    { kind: 'text', name: 'product_form', label: 'Product form', max: 80, placeholder: 'e.g. plate' },
    { kind: 'text', name: 'uns_or_en_number', label: 'UNS or EN number', max: 20, optional: true },
    { kind: 'text', name: 'p_no', label: 'P-Number', max: 6, optional: true, description: 'Only where ASME IX lists it.' },
    { kind: 'figure', name: 'group_no', label: 'Group Number', optional: true },
    { kind: 'text', name: 'iso_15608', label: 'ISO/TR 15608 group', max: 8, optional: true, placeholder: 'e.g. 3.1' },
    { kind: 'choice', name: 'aws_d1_1_group', label: 'AWS D1.1 group', options: options(D1_1_GROUPS), optional: true },
    { kind: 'text', name: 'aws_d1_2_m_no', label: 'AWS D1.2 M-Number', max: 6, optional: true },
    ...strengths,
    { kind: 'text', name: 'nominal_composition', label: 'Nominal composition', max: 120, optional: true, placeholder: 'e.g. 2.25Cr-1Mo', description: 'Compared with that of fillers.' },
    { kind: 'figure', name: 'density_kg_m3', label: 'Density, kg/m³', optional: true },
    source,
    { kind: 'paragraph', name: 'note', label: 'Note', max: 600, optional: true, wide: true },
  ],
  'filler-metals': [
    { kind: 'text', name: 'classification', label: 'Classification', max: 60, placeholder: 'e.g. ER80S-Ni1' },
    { kind: 'text', name: 'spec', label: 'Specification', max: 80, placeholder: 'e.g. AWS A5.28' },
    { kind: 'words', name: 'processes', label: 'Processes', placeholder: 'e.g. GMAW, 135' },
    { kind: 'figure', name: 'f_no', label: 'F-Number', optional: true },
    { kind: 'figure', name: 'a_no', label: 'A-Number', optional: true, description: 'Of the deposit; ferrous only.' },
    { kind: 'choice', name: 'iso_9606_filler_group', label: 'ISO 9606 filler group', options: options(FILLER_GROUPS), optional: true },
    { kind: 'text', name: 'uns', label: 'UNS', max: 20, optional: true },
    { kind: 'text', name: 'hydrogen_designator', label: 'Hydrogen designator', max: 40, optional: true, placeholder: 'e.g. H4' },
    ...strengths,
    { kind: 'text', name: 'nominal_composition', label: 'Nominal composition', max: 120, optional: true, placeholder: 'e.g. 1Ni', description: 'Compared with that of base metals.' },
    { kind: 'sizes', name: 'diameters_mm', label: 'Sizes, mm', optional: true, placeholder: 'e.g. 0.9, 1.2' },
    source,
    { kind: 'paragraph', name: 'notes', label: 'Note', max: 600, optional: true, wide: true },
  ],
  gases: [
    { kind: 'text', name: 'name', label: 'Name', max: 80, placeholder: 'e.g. Bay mix 92/8' },
    { kind: 'text', name: 'awsDesignation', label: 'AWS A5.32 designation', max: 40, optional: true },
    { kind: 'text', name: 'use', label: 'Use', max: 200, optional: true },
    { kind: 'parts', name: 'components', label: 'Parts by volume', wide: true },
    source,
  ],
}

const EMPTY: Readonly<Record<OwnKind, Record<string, unknown>>> = {
  'base-metals': { spec: '', grade: '', product_form: '', uns_or_en_number: null, p_no: null, group_no: null, iso_15608: null, aws_d1_1_group: null, aws_d1_2_m_no: null, min_tensile_mpa: null, min_yield_mpa: null, min_elongation_pct: null, nominal_composition: null, density_kg_m3: null, source: '', note: null },
  'filler-metals': { classification: '', spec: '', processes: [], f_no: null, a_no: null, iso_9606_filler_group: null, uns: null, hydrogen_designator: null, min_tensile_mpa: null, min_yield_mpa: null, min_elongation_pct: null, nominal_composition: null, diameters_mm: [], source: '', notes: null },
  gases: { name: '', awsDesignation: null, use: null, components: [{ gas: 'Ar', percent: 82 }, { gas: 'CO2', percent: 18 }], source: '' },
}

/** What the form starts from: nothing, an own row that is changed, or a row that an own one is started from (whose source is no longer its own). */
export function startOf(kind: OwnKind, content: unknown, fresh: boolean): Record<string, unknown> {
  if (content === null) return EMPTY[kind]
  const written = asWritten(kind, content).content
  return fresh ? { ...written, source: '' } : { ...written }
}

/** A figure typed with a point or a comma; null for nothing, NaN for what is no figure, which the schema then refuses in words. */
export function asFigure(text: unknown): number | null {
  if (typeof text === 'number') return text
  if (typeof text !== 'string' || text.trim() === '') return null
  return Number(text.trim().replace(',', '.'))
}
