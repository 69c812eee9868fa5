/**
 * The rows of a procedure's sheet, in document order, as data: the drafting form, the read-only sheet, the placing of findings and the
 * names of fields in a conflict all read it. Paths are from the weld's variables; those of a process block start at the block.
 */
import type { ProcessBlock, WeldingVariables } from '@shared/schemas/welding.ts'
import * as words from './options.ts'
import { BLOCK_SECTIONS } from './process-rows.ts'
import type { RecordKind, RowSpec, SectionSpec } from './row-spec.ts'
import { APPLICATION, BASE_METALS, JOINT, PREHEAT, PWHT } from './weld-rows.ts'

export type { RecordKind, RowSpec, SectionSpec } from './row-spec.ts'
export { APPLICATION, BASE_METALS, BLOCK_SECTIONS, JOINT, PREHEAT, PWHT }

/** The system of units that the record's figures are judged in; it stands with the scope. */
export const WRITTEN_IN: RowSpec = { kind: 'choice', path: 'unitSystem', label: 'Written in', options: words.UNIT_SYSTEMS, always: true }

/** Where a row stands: its path from the variables, with the block's prefix. */
export interface PlacedRow {
  spec: RowSpec
  path: string
  sectionId: string
}

const pathsOf = (spec: RowSpec): readonly string[] => [spec.path, ...(spec.kind === 'pair' ? spec.paths : []), ...(spec.also ?? [])]

/** Every row of a procedure with these blocks, in document order. */
export function placedRows(blocks: readonly unknown[]): PlacedRow[] {
  const at = (section: SectionSpec, prefix: string, id: string): PlacedRow[] => section.rows.map((spec) => ({ spec, path: `${prefix}${spec.path}`, sectionId: id }))
  return [
    { spec: WRITTEN_IN, path: WRITTEN_IN.path, sectionId: 'scope' },
    ...at(JOINT, '', 'joint'),
    ...at(BASE_METALS, '', 'base-metals'),
    ...at(APPLICATION, '', 'application'),
    ...blocks.flatMap((_, index) => BLOCK_SECTIONS.flatMap((section) => at(section, `processes.${index}.`, blockSectionId(index, section.id)))),
    ...at(PREHEAT, '', 'preheat'),
    ...at(PWHT, '', 'pwht'),
  ]
}

/** Whether a row arises for such a weld on such a record, whatever is stated in it. */
export const isOffered = (spec: RowSpec, weld: WeldingVariables, block: ProcessBlock | null, record: RecordKind): boolean => !spec.when || spec.when(weld, block, record)

export const blockSectionId = (index: number, section: string): string => `process-${index + 1}-${section}`

/** All paths whose findings belong to a placed row. */
export function coveredPaths(row: PlacedRow): string[] {
  const prefix = row.path.slice(0, row.path.length - row.spec.path.length)
  return pathsOf(row.spec).map((path) => `${prefix}${path}`)
}
