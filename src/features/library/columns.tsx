/** What the library shows of each kind: its columns, and every fact of a row for the panel. */
import type { LibraryKind } from '@shared/library/library-rows.ts'
import { baseMetalRowSchema, fillerRowSchema, gasRowSchema, positionRowSchema, processRowSchema } from '@shared/library/rows.ts'
import type { LibraryItem } from '@shared/schemas/records.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { SHOWN_UNIT } from '@shared/units/convert.ts'
import { formatNumber } from '@shared/units/format.ts'
import type { ReactNode } from 'react'

export interface Fact {
  label: string
  /** null = the source lists nothing, which is never equal to another nothing. */
  value: ReactNode | null
  /** How the figure is known, where the row tells it for this column. */
  basis?: string | null
  /** Its basis stands on the row's own page only: in the list it would stand beside every row. */
  quiet?: boolean
}

export const KIND_NAMES: Record<LibraryKind, { title: string; /** In a sentence, with its article. */ one: string; kind: string; find: string; about: string }> = {
  'base-metals': { title: 'Base metals', one: 'a base metal', kind: 'Base metal', find: 'Grade, UNS, P-Number or group', about: 'Grades with their P-Numbers and groups. What a source does not list is shown as not listed, and two grades not listed are never taken for alike.' },
  'filler-metals': { title: 'Filler metals', one: 'a filler metal', kind: 'Filler metal', find: 'Classification, specification or F-Number', about: 'Classifications with their F- and A-Numbers.' },
  gases: { title: 'Gases', one: 'a gas', kind: 'Shielding gas', find: 'Mixture, ISO 14175 symbol or use', about: 'Usual mixtures by volume, and the classes they fall in.' },
  positions: { title: 'Positions', one: 'a position', kind: 'Welding position', find: '3G, PF, overhead', about: 'Test positions as ASME and AWS write them beside ISO 6947.' },
  processes: { title: 'Processes', one: 'a process', kind: 'Welding process', find: 'GMAW, 135, TIG', about: 'AWS letters beside ISO 4063 numbers.' },
}

const stress = (mpa: number | null, system: UnitSystem) => (mpa === null ? null : `${formatNumber(mpa, 'stress', SHOWN_UNIT[system].stress)} ${SHOWN_UNIT[system].stress}`)
const percent = (value: number | null) => (value === null ? null : `${value} %`)
const listed = (values: readonly (string | number)[], between = ', ') => (values.length === 0 ? null : values.join(between))
/** Every fact of a row in the order of the panel; the first `shown` of them are the list's columns. */
export function factsOf({ kind, content }: Pick<LibraryItem, 'kind' | 'content'>, system: UnitSystem): { shown: Fact[]; more: Fact[] } {
  switch (kind) {
    case 'base-metals': {
      const row = baseMetalRowSchema.parse(content)
      return {
        shown: [
          { label: 'Product form', value: row.product_form },
          { label: 'P-Number', value: row.p_no, basis: row.p_no_basis },
          { label: 'Group', value: row.group_no, basis: row.group_no_basis },
          { label: 'ISO 15608', value: row.iso_15608_subgroup ?? row.iso_15608_group, basis: row.iso_15608_basis },
          { label: 'UNS or EN', value: row.uns_or_en_number },
          { label: 'Tensile, min.', value: stress(row.min_tensile_mpa, system), basis: row.properties_basis, quiet: true },
        ],
        more: [
          { label: 'Yield, min.', value: stress(row.min_yield_mpa, system), basis: row.properties_basis, quiet: true },
          { label: 'Elongation, min.', value: percent(row.min_elongation_pct), basis: row.properties_basis, quiet: true },
          { label: 'AWS D1.1 group', value: row.aws_d1_1_group },
          { label: 'AWS D1.2 M-Number', value: row.aws_d1_2_m_no },
          { label: 'Composition', value: row.nominal_composition },
          { label: 'Density', value: row.density_kg_m3 === null ? null : `${row.density_kg_m3} kg/m³` },
          { label: 'Also called', value: listed(row.aliases) },
          { label: 'Note', value: row.note },
        ],
      }
    }
    case 'filler-metals': {
      const row = fillerRowSchema.parse(content)
      return {
        shown: [
          { label: 'Specification', value: row.spec },
          { label: 'F-Number', value: row.f_no },
          { label: 'A-Number', value: row.a_no, basis: row.a_no_basis },
          { label: 'Processes', value: listed(row.processes) },
          { label: 'Composition', value: row.nominal_composition },
          { label: 'Tensile, min.', value: stress(row.min_tensile_mpa, system), basis: row.properties_basis, quiet: true },
        ],
        more: [
          { label: 'Yield, min.', value: stress(row.min_yield_mpa, system), basis: row.properties_basis, quiet: true },
          { label: 'Elongation, min.', value: percent(row.min_elongation_pct), basis: row.properties_basis, quiet: true },
          { label: 'UNS', value: row.uns, basis: row.uns_basis },
          { label: 'ISO 9606 filler group', value: row.iso_9606_filler_group },
          { label: 'Hydrogen', value: row.hydrogen_designator },
          { label: 'Current', value: listed(row.current_types) },
          { label: 'Positions', value: listed(row.positions) },
          { label: 'Sizes', value: listed(row.diameters_mm.map((size) => formatNumber(size, 'length', SHOWN_UNIT[system].length)), ', ') && `${row.diameters_mm.map((size) => formatNumber(size, 'length', SHOWN_UNIT[system].length)).join(', ')} ${SHOWN_UNIT[system].length}` },
          { label: 'Note', value: row.notes },
        ],
      }
    }
    case 'gases': {
      const row = gasRowSchema.parse(content)
      return {
        shown: [
          { label: 'Parts by volume', value: listed(row.components.map(({ gas, percent: share }) => `${gas} ${share} %`), ' + ') ?? row.limits },
          // Worked out from the parts by the table of the standard, which is remembered.
          { label: 'ISO 14175', value: row.symbol, basis: row.id.startsWith('iso-') ? row.basis : 'memory', quiet: true },
          { label: 'AWS A5.32', value: row.awsDesignation },
          { label: 'Use', value: row.use },
        ],
        more: [
          { label: 'Name', value: row.name },
          { label: 'Limits of the class', value: row.limits },
        ],
      }
    }
    case 'positions': {
      const row = positionRowSchema.parse(content)
      return {
        shown: [
          { label: 'ISO 6947', value: row.iso_6947 },
          { label: 'Weld', value: row.weld_type },
          { label: 'Product', value: row.product },
          { label: 'Progression', value: row.progression ?? 'either' },
        ],
        more: [{ label: 'Note', value: row.note }],
      }
    }
    case 'processes': {
      const row = processRowSchema.parse(content)
      return {
        shown: [
          { label: 'Name', value: row.name },
          { label: 'ISO 4063', value: listed(row.iso_4063.map(({ no }) => no)) },
          { label: 'Thermal efficiency k', value: row.thermal_efficiency_k, basis: row.k_basis },
        ],
        more: [
          { label: 'Numbers', value: row.iso_4063.length === 0 ? null : row.iso_4063.map(({ no, what }) => <span key={no} className="block">{no} <span className="text-soft">{what}</span></span>) },
          { label: 'Variants', value: row.variants.length === 0 ? null : row.variants.map(({ code, what }) => <span key={code} className="block">{code} <span className="text-soft">{what}</span></span>) },
          { label: 'Mechanisation', value: listed(row.mechanisation) },
          { label: 'Note', value: row.note },
        ],
      }
    }
  }
}

export const BASIS_WORD: Record<string, string> = { read: 'read', secondary: 'secondary', memory: 'from memory', 'common-practice': 'common practice', derived: 'derived', own: 'own' }
export const BASIS_SENTENCE: Record<string, string> = {
  read: 'Read in the published text.',
  secondary: 'From a secondary source: check it in your edition.',
  memory: 'From memory: confirm it in your edition before a decision rests on it.',
  'common-practice': 'Common practice, not a figure of a standard.',
  own: 'Written by your own organization: it stands for its figures.',
}

/** What is listed, or plainly that nothing is; two that are not listed are never equal. */
export const Said = ({ value }: { value: Fact['value'] }) => (value === null || value === '' ? <span className="text-soft">not listed</span> : <>{value}</>)

/** Basis of a figure in a word; memory is marked. */
export const BasisWord = ({ basis }: { basis: string | null | undefined }) => (basis ? <span className={basis === 'memory' ? 'text-straw-deep' : 'text-soft'}>{BASIS_WORD[basis] ?? basis}</span> : null)

/** A fact in a list: the figure, and that it is from memory where the others of its row are not. */
export const Listed = ({ facts, at }: { facts: readonly Fact[]; at: number }) => {
  const { value, basis, quiet } = facts[at] ?? { value: null, basis: null, quiet: true }
  const told = facts.some((fact) => fact.value !== null && fact.basis && !fact.quiet && fact.basis !== 'memory')
  return (
    <>
      <Said value={value} />
      {value !== null && basis === 'memory' && !quiet && told && <span className="text-sm text-straw-deep"> from memory</span>}
    </>
  )
}
