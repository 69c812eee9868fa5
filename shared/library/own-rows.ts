/** Rows of the library that an organization writes itself: made whole, so that they are searched, shown and copied as reference rows are. */
import type { OwnBaseMetal, OwnFiller, OwnGas, WriteLibraryItem } from '../schemas/library.ts'
import { classifyGas } from './gases.ts'
import { baseMetalEntry, fillerEntry, gasEntry, type LibraryRow } from './library-rows.ts'
import { baseMetalRowSchema, fillerRowSchema, gasRowSchema, type BaseMetalRow, type FillerRow, type GasRow } from './rows.ts'
import { squeeze } from './search.ts'

/** Basis of every figure of an own row. */
const OWN_BASIS = 'own'
const basisOf = (value: unknown): string | null => (value === null ? null : OWN_BASIS)
const keyOf = (...parts: string[]): string => `own-${parts.map(squeeze).filter(Boolean).join('-') || 'row'}`.slice(0, 80)

const baseMetalRow = (id: string, { iso_15608, ...given }: OwnBaseMetal): BaseMetalRow => ({
  ...given, id, grade: given.grade === '' ? '—' : given.grade, aliases: [],
  iso_15608_group: iso_15608?.split('.')[0] ?? null, iso_15608_subgroup: iso_15608?.includes('.') ? iso_15608 : null,
  basis: OWN_BASIS, p_no_basis: basisOf(given.p_no), group_no_basis: basisOf(given.group_no), iso_15608_basis: basisOf(iso_15608), properties_basis: OWN_BASIS,
})

const fillerRow = (id: string, given: OwnFiller): FillerRow => ({ ...given, id, processes: given.processes.map((process) => process.toUpperCase()), current_types: [], positions: [], basis: OWN_BASIS, a_no_basis: basisOf(given.a_no), properties_basis: OWN_BASIS, uns_basis: basisOf(given.uns) })

const gasRow = (id: string, given: OwnGas): GasRow => ({ ...given, id, symbol: classifyGas(given.components).symbol, limits: null, basis: OWN_BASIS })

/**
 * The whole row of what somebody wrote.
 * @param key of the row that is changed; a new one gets a key of its name, which the caller makes unique
 */
export function ownRow(written: WriteLibraryItem, key?: string): LibraryRow {
  switch (written.kind) {
    case 'base-metals':
      return baseMetalEntry(baseMetalRow(key ?? keyOf(written.content.spec, written.content.grade, written.content.product_form), written.content))
    case 'filler-metals':
      return fillerEntry(fillerRow(key ?? keyOf(written.content.classification, written.content.spec), written.content))
    case 'gases':
      return gasEntry(gasRow(key ?? keyOf(written.content.name), written.content))
  }
}

/**
 * A row as it can be written: an own one to change, a reference one to start an own one from.
 * @throws ZodError when the content is not of that kind
 */
export function asWritten(kind: WriteLibraryItem['kind'], content: unknown): WriteLibraryItem {
  switch (kind) {
    case 'base-metals': {
      const { spec, grade, uns_or_en_number, product_form, p_no, group_no, iso_15608_group, iso_15608_subgroup, aws_d1_1_group, aws_d1_2_m_no, min_tensile_mpa, min_yield_mpa, min_elongation_pct, nominal_composition, density_kg_m3, source, note } = baseMetalRowSchema.parse(content)
      const d11 = (['I', 'II', 'III', 'IV'] as const).find((group) => group === aws_d1_1_group) ?? null
      return { kind, content: { spec, grade: grade === '—' ? '' : grade, uns_or_en_number, product_form, p_no, group_no, iso_15608: iso_15608_subgroup ?? iso_15608_group, aws_d1_1_group: d11, aws_d1_2_m_no, min_tensile_mpa, min_yield_mpa, min_elongation_pct, nominal_composition, density_kg_m3, source, note } }
    }
    case 'filler-metals': {
      const { spec, classification, uns, f_no, a_no, iso_9606_filler_group, hydrogen_designator, min_tensile_mpa, min_yield_mpa, min_elongation_pct, nominal_composition, processes, diameters_mm, source, notes } = fillerRowSchema.parse(content)
      const group = (['FM1', 'FM2', 'FM3', 'FM4', 'FM5', 'FM6'] as const).find((one) => one === iso_9606_filler_group) ?? null
      return { kind, content: { spec, classification, uns, f_no, a_no, iso_9606_filler_group: group, hydrogen_designator, min_tensile_mpa, min_yield_mpa, min_elongation_pct, nominal_composition, processes, diameters_mm, source, notes } }
    }
    case 'gases': {
      const { name, awsDesignation, components, use, source } = gasRowSchema.parse(content)
      return { kind, content: { name, awsDesignation, components, use, source } }
    }
  }
}
