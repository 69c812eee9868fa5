/** The whole reference library in one list, as the database is seeded and the library page shows it. */
import { baseMetalSearch, baseMetalTitle, baseMetals } from './base-metals.ts'
import { fillerSearch, fillers } from './filler-metals.ts'
import { gasSearch, gasTitle, gases } from './gases.ts'
import { isoMainPositions, positionSource, positions } from './positions.ts'
import { processSource, processes } from './processes.ts'
import type { BaseMetalRow, FillerRow, GasRow } from './rows.ts'
import { squeeze } from './search.ts'

export const LIBRARY_KINDS = ['base-metals', 'filler-metals', 'gases', 'positions', 'processes'] as const
export type LibraryKind = (typeof LIBRARY_KINDS)[number]

export interface LibraryRow {
  kind: LibraryKind
  /** Unique within its kind. */
  key: string
  title: string
  subtitle: string
  /** What it is found by: parts separated by ` | `. */
  search: string
  basis: string
  source: string
  /** The row itself; `toBaseMetal`, `toFiller` and `toGasMixture` read it back. */
  content: Record<string, unknown>
}

const list = (parts: readonly (string | number | false | null | undefined)[]): string => parts.filter((part) => part !== null && part !== undefined && part !== false && part !== '').join(' · ')

const told = (row: { id: string; basis: string; source: string }) => ({ key: row.id, basis: row.basis, source: row.source, content: { ...row } })

/** A base metal as it is listed and found. */
export const baseMetalEntry = (row: BaseMetalRow): LibraryRow => ({
  ...told(row),
  kind: 'base-metals',
  title: baseMetalTitle(row),
  subtitle: list([row.product_form, row.p_no === null ? 'P-No. not listed' : `P-No. ${row.p_no}${row.group_no === null ? '' : ` Group ${row.group_no}`}`, row.iso_15608_subgroup && `ISO 15608 ${row.iso_15608_subgroup}`, row.uns_or_en_number]),
  search: baseMetalSearch(row),
})

/** A filler metal as it is listed and found. */
export const fillerEntry = (row: FillerRow): LibraryRow => ({
  ...told(row),
  kind: 'filler-metals',
  title: row.classification,
  subtitle: list([row.spec, row.f_no !== null && `F-No. ${row.f_no}`, row.a_no !== null && `A-No. ${row.a_no}`, row.nominal_composition]),
  search: fillerSearch(row),
})

/** A gas as it is listed and found. */
export const gasEntry = (row: GasRow): LibraryRow => ({ ...told(row), kind: 'gases', title: gasTitle(row), subtitle: list([row.symbol && `ISO 14175 ${row.symbol}`, row.awsDesignation, row.limits, row.use]), search: gasSearch(row) })

/** All rows of the five kinds, in the library's own order. */
export function libraryRows(): LibraryRow[] {
  return [
    ...baseMetals.map(baseMetalEntry),
    ...fillers.map(fillerEntry),
    ...gases.map(gasEntry),
    ...positions.map((row): LibraryRow => ({
      kind: 'positions',
      key: squeeze([row.asme_aws ?? 'orbital', row.weld_type, row.product, row.progression ?? ''].join(' ')),
      title: row.asme_aws ?? row.iso_6947,
      subtitle: list([row.weld_type, row.product, row.progression && `progression ${row.progression}`, `ISO 6947 ${row.iso_6947}`]),
      search: [row.asme_aws, row.iso_6947, row.weld_type, row.product, row.progression, isoMainPositions.find(({ symbol }) => symbol === row.iso_6947)?.name].filter(Boolean).join(' | '),
      basis: row.basis,
      source: positionSource,
      content: { ...row },
    })),
    ...processes.map((row): LibraryRow => ({
      kind: 'processes',
      key: row.aws.toLowerCase(),
      title: row.aws,
      subtitle: list([row.name, row.iso_4063.map(({ no }) => no).join(', ')]),
      search: [row.aws, row.name, ...row.iso_4063.flatMap(({ no, what }) => [no, what]), ...row.variants.map(({ code }) => code)].join(' | '),
      basis: row.k_basis ?? 'memory',
      source: processSource,
      content: { ...row },
    })),
  ]
}
