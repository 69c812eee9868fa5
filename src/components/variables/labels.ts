/** What a field is called and how its value reads, for conflicts and messages: "GMAW: Amps", "180–240 A". */
import type { Interval, Quantity } from '@shared/schemas/common.ts'
import type { BaseMetal, Filler, GasMixture, Pass, ProcessBlock } from '@shared/schemas/welding.ts'
import { formatInterval, formatQuantity } from '@shared/units/format.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { findingField } from '@/lib/draft/paths.ts'
import type { WeldContent } from './context.ts'
import { BLOCK_SECTIONS, coveredPaths, placedRows, type PlacedRow } from './catalogue.ts'
import { choiceInWords, wordOf } from './options.ts'

const ROOT: Record<string, string> = { title: 'Title', scope: 'Scope', notes: 'Notes', supportingCoupons: 'Supporting coupons', 'variables.standards': 'Standards', 'variables.processes': 'Order of the processes' }

/** The row that a path points at or into: the longest path that leads to it. */
export function rowFor(path: string, rows: readonly PlacedRow[]): PlacedRow | null {
  const field = findingField(path)
  const reach = rows.flatMap((row) => coveredPaths(row).map((at) => ({ row, at })))
  return reach.filter(({ at }) => field === at || field.startsWith(`${at}.`)).sort((a, b) => b.at.length - a.at.length)[0]?.row ?? null
}

/** `processes#fill.positions` → `processes.1.positions`, by the blocks of one content. */
const byIndex = (path: string, blocks: readonly ProcessBlock[]): string => path.replace(/processes#([^.]+)/, (_all, id: string) => `processes.${Math.max(0, blocks.findIndex((block) => block.id === id))}`)

/** A field's name as a person would say it, with the process where there are several. */
export function labelOf(path: string, content: WeldContent): string {
  const known = ROOT[path]
  if (known) return known
  const { processes } = content.variables
  const indexed = byIndex(path, processes)
  const block = processes[Number(/processes\.(\d+)/.exec(indexed)?.[1] ?? -1)]
  const lead = block && processes.length > 1 ? `${block.process ?? 'Process'}: ` : ''
  if (block && /processes\.\d+$/.test(indexed)) return `${block.process ?? 'Process'}: the whole process`
  const row = rowFor(indexed, placedRows(processes))
  return `${lead}${row?.spec.label ?? indexed.split('.').at(-1) ?? indexed}`
}

const or = (text: string | null | undefined) => (text === null || text === undefined || text === '' ? 'not stated' : text)

export const metalInWords = (metal: BaseMetal): string => [metal.specification, metal.grade].filter(Boolean).join(' ')
export const gasInWords = (gas: GasMixture): string => (gas.components.length > 0 ? gas.components.map(({ gas: name, percent }) => `${name} ${percent} %`).join(' + ') : (gas.name ?? gas.isoSymbol ?? ''))
export const fillerInWords = (filler: Filler): string => (filler.added === false ? 'none, autogenous' : [filler.classification, filler.specification && `(${filler.specification})`].filter(Boolean).join(' '))

const plain = (value: unknown): string => (typeof value === 'string' || typeof value === 'number' ? String(value) : JSON.stringify(value))

/** The value at a path, as read in `system`. */
export function valueInWords(path: string, value: unknown, content: WeldContent, system: UnitSystem): string {
  if (value === null || value === undefined || value === '') return 'not stated'
  if (path === 'supportingCoupons') return `${(value as string[]).length} linked`
  if (path === 'variables.standards') return (value as WeldContent['variables']['standards']).map(choiceInWords).join(', ')
  if (path === 'variables.processes') return (value as ProcessBlock[]).map(({ process }) => process ?? 'not stated').join(', ')
  const { processes } = content.variables
  const indexed = byIndex(path, processes)
  if (/processes[.#][^.]+$/.test(path)) return `${(value as ProcessBlock).process ?? 'A process'}, with everything in it`
  const row = rowFor(indexed, placedRows(processes))
  if (typeof value === 'boolean') return value ? 'yes' : 'no'
  if (!row) return plain(value)
  const { spec } = row
  switch (spec.kind) {
    case 'interval':
      return or(formatInterval(value as Interval, spec.dimension, system).text)
    case 'quantity':
      return formatQuantity(value as Quantity, spec.dimension, system).text
    case 'choice':
      return wordOf(spec.options, plain(value))
    case 'pair':
      if (spec.of.kind === 'quantity') return formatQuantity(value as Quantity, spec.of.dimension, system).text
      return typeof value === 'object' ? or(metalInWords(value as BaseMetal)) : plain(value)
    case 'metal':
      return or(metalInWords(value as BaseMetal))
    case 'filler':
      return or(fillerInWords(value as Filler))
    case 'gas': {
      const gas = value as GasMixture
      return [or(gasInWords(gas)), gas.flow && formatInterval(gas.flow, 'gasFlow', system).text].filter(Boolean).join(', ')
    }
    case 'sizes':
      return or((value as Quantity[]).map((size) => formatQuantity(size, 'length', system).text).join(', '))
    case 'positions':
      return or((value as string[]).join(', '))
    case 'passes':
      return `${(value as Pass[]).length} rows: ${(value as Pass[]).map(({ number }) => number).join(', ')}`
    case 'panel':
      return (value as { settings: { control: string; value: string; unit: string }[] }).settings.map((one) => `${one.control} ${one.value} ${one.unit}`.trim()).join(', ')
    default:
      return plain(value)
  }
}

/** What a finding misses, with fields by their names on the sheet: `procedure: maxPassThickness` → "Thickest pass, on the sheet". */
export function missingInWords(missing: readonly string[], content: WeldContent): string[] {
  const said = missing.map((text) => {
    const [, record, field] = /^([^:]+): ([\w.]+)$/.exec(text) ?? []
    if (!record || !field) return text
    const label = rowFor(field, placedRows(content.variables.processes)) ? labelOf(field, content) : (namedInBlock(field) ?? field)
    return `${label}, on ${record === 'procedure' ? 'this sheet' : record}`
  })
  return [...new Set(said)]
}

/** A coupon's field is told from the block, without its index. */
const namedInBlock = (field: string): string | null => BLOCK_ROWS.filter(({ path }) => field === path || field.startsWith(`${path}.`)).sort((a, b) => b.path.length - a.path.length)[0]?.label ?? null
const BLOCK_ROWS = BLOCK_SECTIONS.flatMap(({ rows }) => rows)
